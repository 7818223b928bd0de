import type { Verdict } from '../receiver';
import type { Circuit, FrozenLine, VersionContent, VersionState } from './schemas';
import { type Finding, versionFindings } from './version-findings';

export { designFile } from './design-file';
export { type DesignOutcome, designOf, valuesAt } from './design-of';
export { type Difference, differences, quantityWords } from './differences';
export { type FindingField, fieldOf } from './finding-place';
export { type PartWanted, type VersionChange, nearestPart, versionChange, withChange } from './remedy-changes';
export { type Finding, versionFindings, wireNeeded } from './version-findings';

/** Letters of versions leave out I, O, Q, S, X and Z (ASME Y14.35); after Y comes AA. */
const letters = 'ABCDEFGHJKLMNPRTUVWY';

export function letterAfter(letter: string | null): string {
  if (!letter) return 'A';
  const last = letters.indexOf(letter.slice(-1));
  const rest = letter.slice(0, -1);
  if (last < letters.length - 1) return rest + letters.charAt(last + 1);
  return letterAfter(rest || null) + 'A';
}

/** The letter that comes last: AA is after Y, so the longer one wins. */
export function latestLetter(all: readonly string[]): string | null {
  const place = (letter: string) => [...letter].reduce((sum, one) => sum * 21 + letters.indexOf(one) + 1, 0);
  return all.reduce<string | null>((last, one) => (last === null || place(one) > place(last) ? one : last), null);
}

/** What a new kit starts from: a hand winding of 80 turns, a capacitor to the aerial, 6 m up and 12 m along. */
export function firstCircuit(): Circuit {
  return {
    // 4 % is the reference's tolerance of a solenoid wound from nominal parts.
    winding: { turns: 80, pitch: null, aerialTap: null, detectorTap: null, tolerance: 0.04 },
    coupling: 'series-c',
    detectorAt: 'top',
    aerial: { vertical: 6, horizontal: 12, siteFactor: { nominal: 1.1, tol: 0.18, dist: 'uniform' } },
    earth: { kind: 'resistance', r: { nominal: 50, tol: 1, dist: 'log-uniform' } },
    stray: { nominal: 1e-11, tol: 0.5, dist: 'uniform' },
    place: { field: 0.01, stations: [] },
  };
}

/** Which state may follow which. A held version is answered by a new one, a released one can only be withdrawn. */
const moves: Record<VersionState, readonly VersionState[]> = {
  draft: ['in-check'],
  'in-check': ['draft', 'held', 'released'],
  held: [],
  released: ['withdrawn'],
  withdrawn: [],
};

export const mayBecome = (from: VersionState, to: VersionState) => moves[from].includes(to);

/** Millimetres, milligrams or pieces of a line times the part's mass a metre, a gram or a piece. */
export function lineMass(line: Pick<FrozenLine, 'quantity' | 'part'>): number {
  if (!line.part) return 0;
  const perThousand = line.part.unit === 'metre' || line.part.unit === 'gram';
  return perThousand
    ? Math.round((line.quantity * line.part.massMilligrams) / 1000)
    : line.quantity * line.part.massMilligrams;
}

export const contentMass = (content: Pick<VersionContent, 'lines'>) =>
  content.lines.reduce((sum, line) => sum + lineMass(line), 0);

const rank: Record<Finding['severity'], number> = { stop: 0, note: 1, info: 2 };

/** The engine's findings and the version's own, stops first. */
export function allFindings(verdict: Verdict, content: VersionContent): Finding[] {
  return [...verdict.findings, ...versionFindings(content)].sort((a, b) => rank[a.severity] - rank[b.severity]);
}

export const stopsIn = (findings: readonly Finding[]) => findings.filter((finding) => finding.severity === 'stop');
export const notesIn = (findings: readonly Finding[]) => findings.filter((finding) => finding.severity === 'note');

/** Names a finding in a checker's reasons: its code and where it points. */
export const findingKey = (finding: Pick<Finding, 'code' | 'path'>) => `${finding.code} ${finding.path}`;

/** What every box of a version needs from the store, by part code; prints are made, not picked. */
export function partsOfBox(content: Pick<VersionContent, 'lines'>): Map<string, number> {
  const needed = new Map<string, number>();
  for (const { part, quantity } of content.lines) {
    if (part && part.values.kind !== 'print') needed.set(part.code, (needed.get(part.code) ?? 0) + quantity);
  }
  return needed;
}
