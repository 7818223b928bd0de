import { brent, minimum } from '../numeric/roots';
import { capacitanceNeeded } from '../network/solve';
import type { Plan } from '../network/plan';
import { exp, log } from '../numeric/exp-log';
import { LIGHT_SPEED, TWO_PI, type Farad, type Hertz } from '../units';

export interface Ends {
  lo: Hertz;
  hi: Hertz;
}

/** Steps of the scan from 0.3 of the band's lower edge to 3 times the upper one. */
const STEPS = 200;
/** Electrical length beyond which the line model of a wire does not hold. */
const LONGEST_WIRE = 2.2;

/** The scan's frequencies for a band; a wire aerial ends it where its model ends. */
export function scanPoints({ design, circuit }: Plan): Float64Array {
  const f0 = 0.3 * design.band.lo;
  let f1 = 3 * design.band.hi;
  if (circuit.wire)
    f1 = Math.min(f1, (LONGEST_WIRE * LIGHT_SPEED) / (TWO_PI * (circuit.vertical + circuit.horizontal)));
  const rate = log(f1 / f0) / STEPS;
  const points = new Float64Array(STEPS + 1);
  for (let i = 0; i < STEPS; i += 1) points[i] = f0 * exp(rate * i);
  points[STEPS] = f1;
  return points;
}

/** First frequency at which C_need has fallen to c: the scan's first point, the root in the first interval, or its end. */
export function fallsTo(plan: Plan, points: Float64Array, c: Farad): Hertz {
  const { circuit } = plan;
  const over = (f: Hertz): Farad => capacitanceNeeded(circuit, f) - c;
  let before = points[0] ?? NaN;
  if (over(before) <= 0) return before;
  for (let i = 1; i < points.length; i += 1) {
    const f = points[i] ?? NaN;
    if (over(f) <= 0) return brent(over, before, f);
    before = f;
  }
  return before;
}

/**
 * Where the branch that starts at `lo` ends: the first root at c going up, or the fold where C_need turns to rise.
 * @see evaluate.md rule 6
 */
export function branchEnd(plan: Plan, points: Float64Array, lo: Hertz, c: Farad): Hertz {
  const { circuit } = plan;
  const over = (f: Hertz): Farad => capacitanceNeeded(circuit, f) - c;
  let previous = over(lo);
  if (previous <= 0) return lo;
  let beforeLast = lo;
  let last = lo;
  for (let i = 0; i < points.length; i += 1) {
    const f = points[i] ?? NaN;
    if (f <= lo) continue;
    const now = over(f);
    if (now <= 0) return brent(over, last, f);
    if (now > previous) {
      const fold = minimum(over, beforeLast, f);
      return over(fold) <= 0 ? brent(over, beforeLast, fold) : fold;
    }
    previous = now;
    beforeLast = last;
    last = f;
  }
  return last;
}

/** Reach of the circuit for a row of values. */
export function reachOf(plan: Plan, x: Float64Array, points: Float64Array): Ends {
  plan.fill(x);
  return reachAsFilled(plan, x, points);
}

/** Reach of the circuit as it is filled, coil at its largest inductance. */
export function reachAsFilled(plan: Plan, x: Float64Array, points: Float64Array): Ends {
  const { circuit, mode } = plan;
  const lo = fallsTo(plan, points, circuit.cMax);
  if (mode === 'capacitor') return { lo, hi: branchEnd(plan, points, lo, circuit.cMin) };
  plan.moveTo(x, circuit.positionMin);
  const hi = fallsTo(plan, points, circuit.cMin);
  plan.moveTo(x, circuit.positionMax);
  return { lo, hi };
}

/** Margins at both ends, relative to the band's edges. @see receiver.md D1 */
export function marginsOf(ends: Ends, band: Ends): Ends {
  return { lo: 1 - ends.lo / band.lo, hi: ends.hi / band.hi - 1 };
}

/** Scan points inside the band where C_need rises: the aerial circuit itself resonates there. */
export function risesInside(plan: Plan, points: Float64Array): Hertz | null {
  const { circuit, design, mode } = plan;
  if (mode !== 'capacitor') return null;
  let before = Infinity;
  let last = NaN;
  for (let i = 0; i < points.length; i += 1) {
    const f = points[i] ?? NaN;
    if (f < design.band.lo || f > design.band.hi) continue;
    const now = capacitanceNeeded(circuit, f);
    if (now > before) return last;
    before = now;
    last = f;
  }
  return null;
}
