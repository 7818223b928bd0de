import type { Choice, Rank, Settled } from './ask';

/** A combination that may clear, or does, with what ranks it. */
export interface Candidate {
  choice: Choice;
  cost: number;
  builds: number;
  /** Smaller of the two nominal margins, or a bound above it. */
  margin: number;
  /** False while the margin is only bounded. */
  exact: boolean;
}

/** Negative where a comes first: by cost, margin or how many the store builds, then by margin or cost, then by the lists. */
export function inOrder(rank: Rank, a: Candidate, b: Candidate): number {
  const byMargin = b.margin - a.margin;
  const byCost = a.cost - b.cost;
  const first = rank === 'cost' ? byCost : rank === 'margin' ? byMargin : b.builds - a.builds;
  if (first !== 0) return first;
  const second = rank === 'margin' ? byCost : byMargin;
  return second !== 0 ? second : inListOrder(a.choice, b.choice);
}

function inListOrder(a: Choice, b: Choice): number {
  for (let i = 0; i < a.length; i += 1) {
    const apart = (a[i] ?? 0) - (b[i] ?? 0);
    if (apart !== 0) return apart;
  }
  return 0;
}

/** The same parts in the same circuit, whatever the turns and where the taps are. */
export function partsKey([
  former,
  wire,
  ,
  coupling,
  ,
  detectorTap,
  capacitor,
  detector,
  earphone,
  back,
]: Choice): string {
  return [former, wire, coupling, detectorTap > 0 ? 1 : 0, capacitor, detector, earphone, back].join(' ');
}

/** The list: in order, so many windings of the same parts, so many designs. */
export function listed(
  { rank, most, windingsEach }: Pick<Settled, 'rank' | 'most' | 'windingsEach'>,
  clears: readonly Candidate[],
): Candidate[] {
  const taken = new Map<string, number>();
  const list: Candidate[] = [];
  for (const candidate of [...clears].sort((a, b) => inOrder(rank, a, b))) {
    const key = partsKey(candidate.choice);
    const count = taken.get(key) ?? 0;
    if (count >= windingsEach) continue;
    taken.set(key, count + 1);
    list.push(candidate);
    if (list.length === most) break;
  }
  return list;
}
