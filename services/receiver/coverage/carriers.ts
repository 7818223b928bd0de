import { capacitanceNeeded } from '../network/solve';
import type { Plan } from '../network/plan';
import { largestTurns } from '../network/point';
import type { Hertz } from '../units';
import type { Ends } from './reach';

/** More carriers than any band has; a finer step is looked at in this many places. */
const MOST = 4096;

/** Whether the set can be tuned to f. @see evaluate.md rule 7 */
export function tunable(plan: Plan, f: Hertz): boolean {
  const { circuit, mode, nominal } = plan;
  const needed = (position: number): number => {
    plan.moveTo(nominal, position);
    return capacitanceNeeded(circuit, f);
  };
  if (mode === 'capacitor') {
    const c = capacitanceNeeded(circuit, f);
    return c >= circuit.cMin && c <= circuit.cMax;
  }
  const { positionMin, positionMax } = circuit;
  let can: boolean;
  if (mode === 'slider-capacitor') {
    const turns = largestTurns(needed, positionMin, positionMax, circuit.cMin, circuit.cMax);
    const c = needed(turns);
    can = c >= circuit.cMin && c <= circuit.cMax;
  } else {
    can = needed(positionMax) <= circuit.cMax && needed(positionMin) >= circuit.cMin;
  }
  plan.moveTo(nominal, positionMax);
  return can;
}

/** First carrier strictly inside the reach that cannot be tuned; null where all can. The circuit stands as nominal. */
export function uncoveredCarrier(plan: Plan, reach: Ends): Hertz | null {
  const { firstCarrier, lastCarrier, step } = plan.design.band;
  const count = Math.floor((lastCarrier - firstCarrier) / step + 1e-9) + 1;
  const stride = Math.max(1, Math.ceil(count / MOST));
  for (let n = 0; n < count; n += stride) {
    const f = firstCarrier + n * step;
    if (f > reach.lo && f < reach.hi && !tunable(plan, f)) return f;
  }
  return null;
}
