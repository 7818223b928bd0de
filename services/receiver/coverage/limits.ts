import { log } from '../numeric/exp-log';
import type { Plan } from '../network/plan';
import { variance } from '../network/values';
import { reachOf } from './reach';

/** Step of the central differences, relative. */
const STEP = 1e-3;

export interface LimitShare {
  path: string;
  end: 'lo' | 'hi';
  share: number;
}

/** First-order share of each value in the variance of each end, largest first; what moves nothing is left out. */
export function limitsOf(plan: Plan, points: Float64Array): LimitShare[] {
  const x = Float64Array.from(plan.nominal);
  const found: { path: string; lo: number; hi: number }[] = [];
  let [sumLo, sumHi] = [0, 0];
  for (const index of plan.values.spread()) {
    const entry = plan.values.entries[index];
    if (entry === undefined) continue;
    const width = variance(entry, log);
    const step = Math.abs(entry.centre) * STEP;
    if (!(width > 0) || step === 0) continue;
    x[index] = entry.centre + step;
    const up = reachOf(plan, x, points);
    x[index] = entry.centre - step;
    const down = reachOf(plan, x, points);
    x[index] = entry.centre;
    const slopeLo = (up.lo - down.lo) / (2 * step);
    const slopeHi = (up.hi - down.hi) / (2 * step);
    const item = { path: entry.path, lo: slopeLo * slopeLo * width, hi: slopeHi * slopeHi * width };
    sumLo += item.lo;
    sumHi += item.hi;
    found.push(item);
  }
  const shares: LimitShare[] = [];
  for (const { path, lo, hi } of found) {
    if (lo > 0) shares.push({ path, end: 'lo', share: lo / sumLo });
    if (hi > 0) shares.push({ path, end: 'hi', share: hi / sumHi });
  }
  // The sort keeps the order of the design among equals, so that the same file gives the same list.
  return shares.sort((a, b) => b.share - a.share);
}
