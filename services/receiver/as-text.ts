import { shownFrequency, shownPercent, shownQuantity } from './findings/finding';
import type { Finding, Severity, Verdict } from './verdict';

const WORD: Record<Severity, string> = { stop: 'stops', note: 'note', info: 'info' };

function span({ lo, hi }: { lo: number; hi: number }): string {
  return `${shownFrequency(lo)} to ${shownFrequency(hi)}`;
}

function line(finding: Finding): string {
  const remedy = finding.remedy === null ? '' : `\n    ${finding.remedy.text}`;
  return `  ${WORD[finding.severity]} ${finding.code}: ${finding.message}${remedy}`;
}

/** A verdict in words, for people at a terminal. */
export function asText(verdict: Verdict): string {
  const { reach, share, points, detector, earphone, findings, margins } = verdict;
  const lines = [
    verdict.outcome === 'clears' ? 'The design clears.' : 'The design is stopped.',
    '',
    `Reach ${span(reach.nominal)}; margins ${shownPercent(margins.lo)} at the low end, ${shownPercent(margins.hi)} at the high end.`,
    `In the worst combination of parts ${span(reach.corners)}.`,
    `With half the aerial ${span(reach.aerialHalf)}, with twice the aerial ${span(reach.aerialDouble)}.`,
  ];
  if (share !== null) {
    lines.push(
      `${share.covered} of ${share.boxes} simulated boxes cover the band; at least ${shownPercent(share.low, 2)} is sure.`,
    );
  }
  for (const { f, c, turns, q, sourceR, inputR } of points) {
    const at = turns === null ? '' : `, ${turns.toFixed(1)} turns`;
    const loaded = q === null ? '' : `, Q ${q.toFixed(1)}`;
    const source =
      sourceR === null || inputR === null
        ? ''
        : `, source ${shownQuantity(sourceR, 'Ω')}, detector ${shownQuantity(inputR, 'Ω')}`;
    lines.push(`At ${shownFrequency(f)}: ${shownQuantity(c, 'F')}${at}${loaded}${source}.`);
  }
  if (detector.relative !== null) lines.push(`Detector: ${shownPercent(detector.relative, 0)} of a germanium diode.`);
  if (earphone.level !== null)
    lines.push(`Earphone: ${earphone.level.toFixed(0)} dB above threshold at the stated place.`);
  if (findings.length > 0) lines.push('', 'Findings', ...findings.map(line));
  lines.push(
    '',
    `Engine ${verdict.engine}, rules ${verdict.rules.version}, seed ${verdict.seed}, design ${verdict.digest.slice(0, 16)}.`,
  );
  return `${lines.join('\n')}\n`;
}
