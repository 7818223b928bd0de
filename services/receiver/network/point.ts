import { decibel } from '../numeric/exp-log';
import { bisect, brent, minimum } from '../numeric/roots';
import { TWO_PI, type Farad, type Hertz } from '../units';
import { capacitanceNeeded, topAdmittance, voltagePerField } from './solve';
import type { Plan } from './plan';

/** Where the moving part of the set stands, and the capacitance across the top. */
export interface Setting {
  /** Turns of a slider, henry of a variable inductance; null for a fixed coil. */
  position: number | null;
  c: Farad;
}

/**
 * Tunes the set to f, coil included, with the detector as `loadG` says. A capacitor is set to C_need whether or not it
 * can; a coil without one is held to its ends. Leaves the coil at that position.
 * @see evaluate.md rule 7
 */
export function tuneTo(plan: Plan, f: Hertz): Setting {
  const { circuit, mode, nominal: x } = plan;
  if (mode === 'capacitor') return { position: null, c: capacitanceNeeded(circuit, f) };
  const needed = (position: number): Farad => {
    plan.moveTo(x, position);
    return capacitanceNeeded(circuit, f);
  };
  const { positionMin, positionMax } = circuit;
  if (mode === 'slider-capacitor') {
    const turns = largestTurns(needed, positionMin, positionMax, circuit.cMin, circuit.cMax);
    return { position: turns, c: needed(turns) };
  }
  const c = circuit.cMax;
  const over = (position: number): Farad => needed(position) - c;
  let position: number;
  if (over(positionMax) >= 0) position = positionMax;
  else if (over(positionMin) <= 0) position = positionMin;
  else position = brent(over, positionMin, positionMax);
  plan.moveTo(x, position);
  return { position, c };
}

/**
 * Largest whole number of turns whose needed capacitance lies between the ends; the most turns where none does. More
 * turns need less capacitance, so the largest that still needs cMin is found by halving.
 */
export function largestTurns(
  needed: (turns: number) => Farad,
  least: number,
  most: number,
  cMin: Farad,
  cMax: Farad,
): number {
  if (needed(least) < cMin) return most;
  let low = least;
  let high = most + 1;
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (needed(middle) >= cMin) low = middle;
    else high = middle;
  }
  return needed(low) <= cMax ? low : most;
}

/** Step of the derivative in Q, relative. */
const STEP = 1e-6;

/** Q of the tuned circuit at f: f/(2 G) d(Im Y + w C)/df at the top. @see receiver.md C3 */
export function qAt(plan: Plan, f: Hertz, c: Farad): number {
  const { circuit } = plan;
  const susceptance = (at: Hertz): number => {
    topAdmittance(circuit, at);
    return circuit.topIm + TWO_PI * at * c;
  };
  const step = f * STEP;
  const slope = (susceptance(f + step) - susceptance(f - step)) / (2 * step);
  topAdmittance(circuit, f);
  const g = circuit.topRe + (c > 0 ? TWO_PI * f * c * circuit.foilTan : 0);
  return (f * slope) / (2 * g);
}

const ROOT_2 = 1.4142135623730951;

/** Width between the -3 dB points of the detector's voltage, or null where one does not exist. */
export function bandwidthAt(f: Hertz, response: (f: Hertz) => number): Hertz | null {
  const peak = minimum((at) => -response(at), 0.9 * f, 1.1 * f);
  const half = response(peak) / ROOT_2;
  const over = (at: Hertz): number => response(at) - half;
  if (!(over(0.5 * f) < 0) || !(over(1.6 * f) < 0)) return null;
  return bisect(over, peak, 1.6 * f) - bisect(over, peak, 0.5 * f);
}

/** Response one step aside over the response at f, in decibel: the worse side. */
export function adjacentAt(f: Hertz, step: Hertz, response: (f: Hertz) => number): number {
  const own = response(f);
  const sides = f - step > 0 ? [response(f - step), response(f + step)] : [response(f + step)];
  return decibel(Math.max(...sides) / own);
}

/** Detector volts per V/m at a fixed setting. */
export function responseAt(plan: Plan, c: Farad): (f: Hertz) => number {
  return (f) => voltagePerField(plan.circuit, f, c);
}
