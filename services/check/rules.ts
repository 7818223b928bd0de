import { type Finding, findingKey, notesIn, stopsIn } from '../kits/rules';
import type { VersionState } from '../kits/schemas';

export interface Judged {
  state: VersionState;
  /** Hash of the frozen content now, and the one the checker read. */
  contentHash: string;
  readHash: string;
  findings: readonly Finding[];
  reasons: Readonly<Record<string, string>>;
}

/** A reason this short says nothing. */
export const REASON_LENGTH = 10;

/** Everything that keeps a version from being released, a sentence each. No role takes any of them away. */
export function releaseBlockers({ state, contentHash, readHash, findings, reasons }: Judged): string[] {
  const blockers: string[] = [];
  if (state !== 'in-check') blockers.push(notWaiting(state));
  if (contentHash !== readHash) blockers.push('Its content is not what you read. Open the sheet again.');
  const stops = stopsIn(findings);
  if (stops.length === 1) blockers.push(`One finding stops it: ${stops[0]?.message ?? ''}`);
  if (stops.length > 1)
    blockers.push(`${stops.length} findings stop it: ${stops.map(({ message }) => message).join(' ')}`);
  const missing = missingReasons(findings, reasons);
  if (missing.length > 0) {
    blockers.push(missing.length === 1 ? 'One note has no reason yet.' : `${missing.length} notes have no reason yet.`);
  }
  return blockers;
}

export function missingReasons(findings: readonly Finding[], reasons: Readonly<Record<string, string>>): Finding[] {
  return notesIn(findings).filter((note) => (reasons[findingKey(note)] ?? '').trim().length < REASON_LENGTH);
}

export function holdBlockers({
  state,
  contentHash,
  readHash,
}: Pick<Judged, 'state' | 'contentHash' | 'readHash'>): string[] {
  const blockers: string[] = [];
  if (state !== 'in-check') blockers.push(notWaiting(state));
  if (contentHash !== readHash) blockers.push('Its content is not what you read. Open the sheet again.');
  return blockers;
}

function notWaiting(state: VersionState): string {
  switch (state) {
    case 'draft':
      return 'It was called back and is a draft again.';
    case 'held':
      return 'It is held already. A new version answers it.';
    case 'released':
      return 'It is released already.';
    case 'withdrawn':
      return 'It is withdrawn.';
    case 'in-check':
      return 'It waits in check.';
  }
}
