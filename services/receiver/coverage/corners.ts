import { at } from '../numeric/cells';
import { capacitanceNeeded } from '../network/solve';
import type { Plan } from '../network/plan';
import { cornerEnds } from '../network/values';
import type { Hertz } from '../units';
import { branchEnd, fallsTo, reachOf, type Ends } from './reach';

/** Up to this many values every combination of ends is tried; above, each end goes by its sign. */
const MOST_COMBINED = 12;

/** How each spread value moves the ends, as found at its own two ends with the others nominal. */
interface Pull {
  index: number;
  ends: [number, number];
  lo: number;
  hi: number;
}

/**
 * Worst reach over the corners of the spread values: highest low end, lowest high end. Corners bound everything and are
 * pessimistic. Values that move neither end are left out: they double the work and change nothing.
 */
export function cornersOf(plan: Plan, points: Float64Array, nominal: Ends): Ends {
  const pulls: Pull[] = [];
  const x = Float64Array.from(plan.nominal);
  for (const index of plan.values.spread()) {
    const entry = plan.values.entries[index];
    if (entry === undefined) continue;
    const ends = cornerEnds(entry);
    x[index] = ends[0];
    const low = reachOf(plan, x, points);
    x[index] = ends[1];
    const high = reachOf(plan, x, points);
    x[index] = entry.centre;
    if (low.lo !== high.lo || low.hi !== high.hi || low.lo !== nominal.lo || low.hi !== nominal.hi) {
      pulls.push({ index, ends, lo: high.lo - low.lo, hi: high.hi - low.hi });
    }
  }
  const worst = { ...nominal };
  const guess = (key: 'lo' | 'hi'): void => {
    for (const pull of pulls) {
      const upIsWorse = key === 'lo' ? pull.lo > 0 : pull.hi < 0;
      x[pull.index] = pull.ends[upIsWorse ? 1 : 0];
    }
    const reached = reachOf(plan, x, points);
    worst.lo = Math.max(worst.lo, reached.lo);
    worst.hi = Math.min(worst.hi, reached.hi);
  };
  guess('lo');
  guess('hi');
  if (pulls.length <= MOST_COMBINED) combineAll(plan, points, pulls, x, worst);
  return worst;
}

/**
 * Every combination. Most are dismissed by one or two solves at the worst ends found so far: if C_need is already at or
 * below Cmax at the worst low end, this corner's low end lies no higher; the high end likewise where the branch cannot
 * fold below it.
 */
function combineAll(plan: Plan, points: Float64Array, found: readonly Pull[], x: Float64Array, worst: Ends): void {
  const { circuit, mode, values } = plan;
  // The coil's geometry turns over last: its inductances are the dearest to work out.
  const isCoil = ({ index }: Pull): boolean => values.entries[index]?.path.startsWith('coil.') ?? false;
  const pulls = [...found.filter((pull) => !isCoil(pull)), ...found.filter(isCoil)];
  const foldFree = mode === 'capacitor' && cannotFold(plan, points, pulls, x, worst.hi);
  const combinations = 1 << pulls.length;
  for (let bits = 0; bits < combinations; bits += 1) {
    for (let place = 0; place < pulls.length; place += 1) {
      const pull = pulls[place];
      if (pull !== undefined) x[pull.index] = pull.ends[(bits >>> place) & 1 ? 1 : 0];
    }
    plan.fill(x);
    if (capacitanceNeeded(circuit, worst.lo) > circuit.cMax) {
      worst.lo = Math.max(worst.lo, fallsTo(plan, points, circuit.cMax));
    }
    if (mode !== 'capacitor') {
      plan.moveTo(x, circuit.positionMin);
      if (capacitanceNeeded(circuit, worst.hi) <= circuit.cMin) {
        worst.hi = Math.min(worst.hi, fallsTo(plan, points, circuit.cMin));
      }
    } else if (
      capacitanceNeeded(circuit, worst.hi) <= circuit.cMin ||
      !(foldFree || fallsThroughout(plan, points, worst.hi))
    ) {
      const lo = fallsTo(plan, points, circuit.cMax);
      worst.hi = Math.min(worst.hi, branchEnd(plan, points, lo, circuit.cMin));
    }
  }
}

/** How far above the worst high end the corner of largest parts must fall for no other corner to fold below it. */
const CLEARANCE = 1.1;

/**
 * Whether no corner folds below f. A fold is a resonance of the aerial circuit, and every resonance moves down when any
 * inductance or capacitance grows: the corner with every part at its larger end has the lowest one.
 */
function cannotFold(plan: Plan, points: Float64Array, pulls: readonly Pull[], x: Float64Array, f: Hertz): boolean {
  for (const pull of pulls) x[pull.index] = pull.ends[1];
  plan.fill(x);
  return falls(plan, points, CLEARANCE * f);
}

/**
 * Whether C_need falls all the way up to f. For aerial, detector and capacitor at the top the only falling part of the
 * aerial's susceptance lies where its reactance is above minus its resistance, so one look at f settles it; else the
 * scan is walked.
 */
function fallsThroughout(plan: Plan, points: Float64Array, f: Hertz): boolean {
  const { circuit } = plan;
  if (circuit.sections > 1 || circuit.primary) return falls(plan, points, f);
  capacitanceNeeded(circuit, f);
  const size = circuit.aerialYr * circuit.aerialYr + circuit.aerialYi * circuit.aerialYi;
  const resistance = circuit.aerialYr / size;
  const reactance = -circuit.aerialYi / size;
  return reactance <= -resistance;
}

function falls(plan: Plan, points: Float64Array, f: Hertz): boolean {
  let before = Infinity;
  for (let i = 0; i < points.length; i += 1) {
    const point = at(points, i);
    if (point > f) return true;
    const now = capacitanceNeeded(plan.circuit, point);
    if (now > before) return false;
    before = now;
  }
  return true;
}
