import { Disclosure } from '@/components/ui/disclosure';
import { Sign } from '@/components/ui/sign';
import { signWords } from '@/components/devices/status-sign';
import type { Finding } from '@/services/kits/rules';
import { figureOf, signOf } from './verdict-words';

const tones = {
  stops: 'text-crimson',
  note: 'text-ochre',
  info: 'text-ink',
  clears: 'text-pine',
  waiting: 'text-ink2',
};

/** Stops and notes in full; information folded away. */
export function FindingList({ findings }: { findings: readonly Finding[] }) {
  const judged = findings.filter(({ severity }) => severity !== 'info');
  const infos = findings.filter(({ severity }) => severity === 'info');
  return (
    <section aria-labelledby="findings-title" className="border-t-2 border-ink pt-3">
      <h3 id="findings-title" className="font-display text-panel">
        Findings
      </h3>
      {judged.length === 0 && <p className="py-2">No rule stops it and none asks for a note.</p>}
      <ul>
        {judged.map((finding) => (
          <FindingRow key={`${finding.code} ${finding.path}`} finding={finding} />
        ))}
      </ul>
      {infos.length > 0 && (
        <Disclosure
          summary={infos.length === 1 ? 'One more, for information' : `${infos.length} more, for information`}
        >
          <ul>
            {infos.map((finding) => (
              <FindingRow key={`${finding.code} ${finding.path}`} finding={finding} />
            ))}
          </ul>
        </Disclosure>
      )}
    </section>
  );
}

export function FindingRow({ finding }: { finding: Finding }) {
  const sign = signOf(finding.severity);
  const figure = figureOf(finding);
  return (
    <li className="flex gap-3.5 border-b border-rule py-2.5 last:border-0">
      <Sign kind={sign} size={20} className="mt-0.5 shrink-0" />
      <div className="min-w-0 flex-1">
        <p>
          <b className={tones[sign]}>{signWords[sign]}.</b> {finding.message}
        </p>
        {finding.remedy && <p className="text-caption text-ink2">{finding.remedy.text}</p>}
      </div>
      {figure !== null && <span className="shrink-0 font-figures font-semibold">{figure}</span>}
    </li>
  );
}
