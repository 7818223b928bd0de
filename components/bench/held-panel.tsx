import { StatusSign } from '@/components/devices/status-sign';
import { Disclosure } from '@/components/ui/disclosure';
import type { VersionView } from '@/services/kits/schemas';
import { showMoment } from '@/services/time';

/** What the check room said of the held version, and what this one does about it. */
export function HeldPanel({
  held,
  letter,
  number,
}: {
  held: NonNullable<VersionView['held']>;
  letter: string;
  number: number;
}) {
  const isOwn = held.letter === letter;
  return (
    <section
      aria-label="What the check room said"
      className="rounded-panel border-1.5 border-crimson bg-crimson-wash px-4 py-3.5"
    >
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1">
        <StatusSign kind="stops" word={`${number} ${held.letter} was held`} />
        <span className="text-caption">{`by ${held.by}, ${showMoment(held.at)}`}</span>
      </div>
      <p className="mt-1 whitespace-pre-line">{held.remark}</p>
      <ul className="mt-1 list-disc pl-5 text-caption">
        {held.findings
          .filter(({ severity }) => severity === 'stop')
          .map(({ code, message }) => (
            <li key={code + message}>{message}</li>
          ))}
      </ul>
      {!isOwn && (
        <Disclosure
          summary={
            held.changes.length === 0
              ? 'Nothing has changed since'
              : held.changes.length === 1
                ? 'One change since'
                : `${held.changes.length} changes since`
          }
          isOpen={held.changes.length > 0}
        >
          <ul className="text-table">
            {held.changes.map(({ what, from, to }) => (
              <li key={what}>
                <b>{what.charAt(0).toLocaleUpperCase('en-GB') + what.slice(1)}</b>: {from ?? 'not there'} →{' '}
                {to ?? 'taken out'}
              </li>
            ))}
          </ul>
        </Disclosure>
      )}
    </section>
  );
}
