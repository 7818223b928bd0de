'use client';

import { figureOf, signOf } from '@/components/bench/verdict-words';
import { signWords } from '@/components/devices/status-sign';
import { TextArea } from '@/components/ui/field';
import { Sign } from '@/components/ui/sign';
import type { Cleared, Sheet } from '@/services/check/schemas';
import { REASON_LENGTH } from '@/services/check/rules';
import { type Finding, findingKey, notesIn, stopsIn } from '@/services/kits/rules';

export interface FindingsColumnProps {
  sheet: Pick<Sheet, 'findings' | 'cleared'>;
  reasons: Readonly<Record<string, string>>;
  /** Absent where the reader may not judge, or it is judged. */
  onReason?: (key: string, text: string) => void;
}

/** Stops first, then notes with their reasons, then what clears and by which figure, information last. */
export function FindingsColumn({ sheet, reasons, onReason }: FindingsColumnProps) {
  const { findings, cleared } = sheet;
  const infos = findings.filter(({ severity }) => severity === 'info');
  return (
    <section aria-labelledby="sheet-findings">
      <h2 id="sheet-findings" className="mb-1 font-display text-panel">
        {countWords(findings)}
      </h2>
      <ul>
        {stopsIn(findings).map((finding) => (
          <StopRow key={findingKey(finding)} finding={finding} />
        ))}
        {notesIn(findings).map((finding) => (
          <NoteRow
            key={findingKey(finding)}
            finding={finding}
            reason={reasons[findingKey(finding)] ?? ''}
            onReason={onReason}
          />
        ))}
        {cleared.map((one) => (
          <ClearedRow key={one.code + one.title} cleared={one} />
        ))}
        {infos.map((finding) => (
          <Row key={findingKey(finding)} finding={finding} />
        ))}
      </ul>
    </section>
  );
}

const numbers = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine'];
const counted = (count: number, word: string) => `${numbers[count] ?? count} ${word}${count === 1 ? '' : 's'}`;

function countWords(findings: readonly Finding[]): string {
  return `Findings: ${counted(stopsIn(findings).length, 'stop')}, ${counted(notesIn(findings).length, 'note')}`;
}

function StopRow({ finding }: { finding: Finding }) {
  const figure = figureOf(finding);
  return (
    <li className="-mx-3 my-1.5 flex gap-3.5 rounded-panel border-1.5 border-crimson bg-crimson-wash px-3 py-2.5">
      <Sign kind="stops" size={20} className="mt-0.5 shrink-0" />
      <div className="min-w-0 flex-1">
        <p>
          <b className="text-crimson">Stops.</b> {finding.message}
        </p>
        {finding.remedy && <p className="text-caption">{finding.remedy.text}</p>}
      </div>
      {figure !== null && <span className="shrink-0 font-figures font-semibold text-crimson">{figure}</span>}
    </li>
  );
}

function NoteRow(props: { finding: Finding; reason: string; onReason: FindingsColumnProps['onReason'] | undefined }) {
  const { finding, reason, onReason } = props;
  const key = findingKey(finding);
  const isShort = reason.trim() !== '' && reason.trim().length < REASON_LENGTH;
  return (
    <Row finding={finding}>
      {onReason ? (
        <TextArea
          id={`reason-${key.replaceAll(/[^A-Za-z0-9]/g, '-')}`}
          label={`Reason for the note: ${finding.message}`}
          labelHidden
          placeholder="Your reason for letting this stand"
          rows={2}
          maxLength={500}
          value={reason}
          onChange={(event) => onReason(key, event.target.value)}
          error={isShort ? `Say it in at least ${REASON_LENGTH} characters.` : undefined}
          frameClassName="mt-2"
        />
      ) : (
        reason !== '' && <p className="mt-1 border-l-2 border-edge pl-3 font-signature">{reason}</p>
      )}
    </Row>
  );
}

const tones = {
  stops: 'text-crimson',
  note: 'text-ochre',
  info: 'text-ink',
  clears: 'text-pine',
  waiting: 'text-ink2',
};

function Row({ finding, children }: { finding: Finding; children?: React.ReactNode }) {
  const sign = signOf(finding.severity);
  const figure = figureOf(finding);
  return (
    <li className="flex gap-3.5 border-b border-rule py-3">
      <Sign kind={sign} size={20} className="mt-0.5 shrink-0" />
      <div className="min-w-0 flex-1">
        <div className="flex gap-3">
          <p className="min-w-0 flex-1">
            <b className={tones[sign]}>{signWords[sign]}.</b> {finding.message}
          </p>
          {figure !== null && <span className="shrink-0 font-figures font-semibold">{figure}</span>}
        </div>
        {finding.remedy && <p className="text-caption text-ink2">{finding.remedy.text}</p>}
        {children}
      </div>
    </li>
  );
}

function ClearedRow({ cleared }: { cleared: Cleared }) {
  return (
    <li className="flex gap-3.5 border-b border-rule py-3">
      <Sign kind="clears" size={20} className="mt-0.5 shrink-0" />
      <div className="min-w-0 flex-1">
        <p className="font-bold">
          <span className="sr-only">Clears. </span>
          {cleared.title}
        </p>
        <p className="text-caption text-ink2">{cleared.text}</p>
      </div>
      <span className="shrink-0 font-figures font-semibold">{cleared.figure}</span>
    </li>
  );
}
