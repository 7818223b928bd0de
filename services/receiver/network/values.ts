import { howeFactor } from '../numeric/quantiles';
import type { Limits } from '../schema/limits';
import { centre, type Distribution, type Value } from '../schema/value';

/** Coverage and confidence of the tolerance interval that a measured lot has at the corners. */
const LOT_COVERAGE = 0.99;
const LOT_CONFIDENCE = 0.95;

/** One value that the circuit reads, with its spread. */
export interface Entry {
  path: string;
  centre: number;
  tol: number;
  dist: Distribution;
  bin: number;
  lot: { n: number; s: number } | null;
  /** Whether any lot was measured, however small. */
  lotSize: number | null;
  limits: Limits;
}

/** Every value the circuit reads, in the order of the design; a reader keeps the index. */
export class Values {
  readonly entries: Entry[] = [];

  add(path: string, value: Value, limits: Limits): number {
    const spread = typeof value === 'number' ? null : value;
    const lot = spread?.lot;
    this.entries.push({
      path,
      centre: centre(value),
      tol: spread?.tol ?? 0,
      dist: spread?.dist ?? 'uniform',
      bin: spread?.bin ?? 0,
      lot: lot !== undefined && lot.n >= 3 && lot.s !== undefined ? { n: lot.n, s: lot.s } : null,
      lotSize: lot?.n ?? null,
      limits,
    });
    return this.entries.length - 1;
  }

  nominal(): Float64Array {
    return Float64Array.from(this.entries, (entry) => entry.centre);
  }

  /** Indices of the values that have a spread. */
  spread(): number[] {
    return this.entries.flatMap((entry, index) => (hasSpread(entry) ? [index] : []));
  }
}

export function hasSpread({ centre, tol, lot }: Entry): boolean {
  return lot !== null || (tol > 0 && centre !== 0);
}

/** The two ends of a value for corner work, held at the limits of its field. */
export function cornerEnds({ centre, tol, dist, lot, limits }: Entry): [number, number] {
  const [least, most] = limits;
  let ends: [number, number];
  if (lot !== null) {
    const k = howeFactor(lot.n, LOT_COVERAGE, LOT_CONFIDENCE);
    ends = [centre - k * lot.s, centre + k * lot.s];
  } else if (dist === 'log-uniform') ends = [centre / (1 + tol), centre * (1 + tol)];
  else ends = [centre - Math.abs(centre) * tol, centre + Math.abs(centre) * tol];
  return [Math.min(most, Math.max(least, ends[0])), Math.min(most, Math.max(least, ends[1]))];
}

/** Variance of a value's own distribution, first order. @see evaluate.md rule 8 */
export function variance({ centre, tol, dist, bin, lot }: Entry, ln: (x: number) => number): number {
  if (lot !== null) return lot.s * lot.s;
  const square = centre * centre;
  if (dist === 'normal') return (square * tol * tol) / 9;
  if (dist === 'binned') return (square * (bin * bin + bin * tol + tol * tol)) / 3;
  if (dist === 'log-uniform') {
    const width = ln(1 + tol);
    return (square * width * width) / 3;
  }
  return (square * tol * tol) / 3;
}
