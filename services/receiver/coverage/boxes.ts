import { topAdmittance } from '../network/solve';
import type { Plan } from '../network/plan';
import { clopperPearson } from '../numeric/quantiles';
import { TWO_PI } from '../units';
import { BLOCK, samplerOf, type Sampler } from './draws';
import { oneNodeCounter, type Counter } from './one-node';

export interface Share {
  covered: number;
  boxes: number;
  low: number;
  high: number;
}

export interface BoxOptions {
  seed: number;
  boxes: number;
  confidence: number;
  onProgress?: ((done: number, total: number) => void) | undefined;
  /** Draws stop once more boxes than this have missed: whoever asks only whether a share is reached knows enough. */
  mostMissed?: number | undefined;
}

/** Whether the circuit as filled reaches both edges of the band: no root, two solves. */
function covers(plan: Plan, x: Float64Array): boolean {
  const { circuit, design, mode } = plan;
  const { lo, hi } = design.band;
  if (!circuit.sound) return false;
  // C_need as `capacitanceNeeded` has it; a call that returns a fraction would put each on the heap.
  topAdmittance(circuit, lo);
  if (!(-circuit.topIm / (TWO_PI * lo) <= circuit.cMax)) return false;
  if (mode !== 'capacitor') plan.moveTo(x, circuit.positionMin);
  topAdmittance(circuit, hi);
  return -circuit.topIm / (TWO_PI * hi) >= circuit.cMin;
}

/** Boxes of any circuit form that cover, each by the solver. */
export function generalCounter(plan: Plan, sampler: Sampler): Counter {
  const x = Float64Array.from(plan.nominal);
  return (count) => {
    let covered = 0;
    for (let box = 0; box < count; box += 1) {
      if (sampler.possible[box] !== 1) continue;
      sampler.row(box, x);
      plan.fill(x);
      if (covers(plan, x)) covered += 1;
    }
    return covered;
  };
}

/** Share of simulated boxes that cover the band, with its limits: sampling noise only, not wrong assumptions. */
export function boxesOf(plan: Plan, options: BoxOptions): Share {
  const { seed, boxes, confidence, onProgress, mostMissed = boxes } = options;
  const { entries } = plan.values;
  const indices = plan.values.spread();
  let covered = 0;
  if (indices.length === 0) {
    plan.fill(plan.nominal);
    covered = covers(plan, plan.nominal) ? boxes : 0;
    onProgress?.(boxes, boxes);
  } else {
    const sampler = samplerOf(entries, indices, seed);
    const counter = oneNodeCounter(plan, sampler, indices) ?? generalCounter(plan, sampler);
    plan.circuit.drawing = true;
    let done = 0;
    while (done < boxes && done - covered <= mostMissed) {
      const count = Math.min(BLOCK, boxes - done);
      sampler.draw(count);
      covered += counter(count);
      done += count;
      onProgress?.(done, boxes);
    }
    plan.circuit.drawing = false;
    plan.fill(plan.nominal);
  }
  const { low, high } = clopperPearson(covered, boxes, confidence);
  return { covered, boxes, low, high };
}
