import { normalQuantile } from '@/services/receiver/numeric/quantiles';
import { advance, mulberry32, streamSeed, unitDraw } from '@/services/receiver/numeric/random';

/** A set with one node by its bare numbers; `tol` is the half width of a value that is drawn. */
export interface BareSet {
  lo: number;
  hi: number;
  aerial: { r: number; l: number; c: number; cTol: number };
  coupling: number;
  coil: { l: number; tol: number; q: number; cSelf: number };
  min: { c: number; tol: number };
  max: { c: number; tol: number };
  stray: number;
  cj: number;
}

/**
 * The share of boxes as one would write it for this one circuit and nothing else: a typed array a part, one loop, the
 * closed form of `receiver.md` C1 with everything that stays the same taken out. The engine's rate is held against it.
 */
export function coveredByHand(set: BareSet, seed: number, boxes: number): number {
  const l = new Float64Array(boxes);
  const min = new Float64Array(boxes);
  const max = new Float64Array(boxes);
  const c = new Float64Array(boxes).fill(set.aerial.c);
  let state = streamSeed(seed, 'coil.l');
  const from = 1.3498980316300933e-3;
  for (let i = 0; i < boxes; i += 1) {
    state = advance(state);
    l[i] = set.coil.l * (1 + (set.coil.tol / 3) * normalQuantile(from + unitDraw(mulberry32(state)) * (1 - 2 * from)));
  }
  uniform(min, set.min.c, set.min.tol, streamSeed(seed, 'tuning.min'));
  uniform(max, set.max.c, set.max.tol, streamSeed(seed, 'tuning.max'));
  if (set.aerial.cTol > 0) uniform(c, set.aerial.c, set.aerial.cTol, streamSeed(seed, 'aerial.c'));
  const [w1, w2] = [2 * Math.PI * set.lo, 2 * Math.PI * set.hi];
  const across = set.coil.cSelf + set.stray + set.cj;
  const { r } = set.aerial;
  const fixed1 = w1 * set.aerial.l - 1 / (w1 * set.coupling);
  const fixed2 = w2 * set.aerial.l - 1 / (w2 * set.coupling);
  const loss = 1 + 1 / (set.coil.q * set.coil.q);
  let covered = 0;
  for (let i = 0; i < boxes; i += 1) {
    const ci = c[i] ?? 0;
    const li = (l[i] ?? 0) * loss;
    const x1 = fixed1 - 1 / (w1 * ci);
    const x2 = fixed2 - 1 / (w2 * ci);
    const need1 = x1 / ((r * r + x1 * x1) * w1) + 1 / (w1 * w1 * li) - across;
    const need2 = x2 / ((r * r + x2 * x2) * w2) + 1 / (w2 * w2 * li) - across;
    if (need1 <= (max[i] ?? 0) && need2 >= (min[i] ?? 0)) covered += 1;
  }
  return covered;
}

function uniform(into: Float64Array, x: number, tol: number, seed: number): void {
  let state = seed;
  for (let i = 0; i < into.length; i += 1) {
    state = advance(state);
    into[i] = x * (1 + tol * (2 * unitDraw(mulberry32(state)) - 1));
  }
}
