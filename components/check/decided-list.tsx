import Link from 'next/link';
import { ReachRail } from '@/components/charts/reach-rail';
import { Plate } from '@/components/devices/plate';
import { WindingMark } from '@/components/devices/winding-mark';
import { Empty } from '@/components/ui/empty';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';
import type { QueueEntry } from '@/services/check/schemas';
import { showDate } from '@/services/time';

/** Released or held versions, the newest decision first, each with who decided and what was said. */
export function DecidedList({
  entries,
  empty,
}: {
  entries: readonly QueueEntry[];
  empty: { title: string; text: string };
}) {
  if (entries.length === 0) {
    return (
      <Empty drawing={<SvgDrawing drawing={partDrawing('coil-tube')} width={90} />} title={empty.title}>
        {empty.text}
      </Empty>
    );
  }
  return (
    <ul className="border-t-2 border-ink">
      {entries.map((entry) => (
        <li
          key={entry.versionId}
          className="relative grid grid-cols-[minmax(0,1fr)] items-center gap-x-6 gap-y-1 border-b border-rule py-3.5 hover:bg-card md:grid-cols-[24rem_minmax(8rem,18rem)_minmax(0,1fr)]"
        >
          <Link
            href={`/check/${entry.versionId}`}
            className="flex min-h-target min-w-0 flex-wrap items-center gap-x-3 gap-y-1 before:absolute before:inset-0"
          >
            <Plate kit={entry.kitNumber} version={entry.letter} size="row" />
            <b className="min-w-0">{entry.kitName}</b>
            <span className="ml-auto">
              <WindingMark state={entry.state} />
            </span>
          </Link>
          <ReachRail
            size="list"
            band={entry.band}
            nominal={entry.reach?.nominal ?? null}
            worst={entry.reach?.corners ?? null}
          />
          <div className="min-w-0">
            {entry.decision && (
              <>
                <p className="text-caption text-ink2">{`${entry.decision.by}, ${showDate(entry.decision.at)}`}</p>
                {entry.decision.remark !== '' && <p>{entry.decision.remark}</p>}
              </>
            )}
          </div>
        </li>
      ))}
    </ul>
  );
}
