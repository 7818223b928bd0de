import { capacitanceNeeded } from '../network/solve';
import type { Plan } from '../network/plan';
import { possible } from '../network/values';
import { clopperPearson } from '../numeric/quantiles';
import { samplerOf } from './draws';

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
}

/** Boxes between two reports of progress. */
const REPORT = 500;

/** Whether the circuit as filled reaches both edges of the band: no root, two solves. */
function covers(plan: Plan, x: Float64Array): boolean {
  const { circuit, design, mode } = plan;
  if (!circuit.sound || !(capacitanceNeeded(circuit, design.band.lo) <= circuit.cMax)) return false;
  if (mode !== 'capacitor') plan.moveTo(x, circuit.positionMin);
  return capacitanceNeeded(circuit, design.band.hi) >= circuit.cMin;
}

/** Share of simulated boxes that cover the band, with its limits: sampling noise only, not wrong assumptions. */
export function boxesOf(plan: Plan, options: BoxOptions): Share {
  const { seed, boxes, confidence, onProgress } = options;
  const { entries } = plan.values;
  const indices = plan.values.spread();
  let covered = 0;
  const x = Float64Array.from(plan.nominal);
  if (indices.length === 0) {
    plan.fill(x);
    covered = covers(plan, x) ? boxes : 0;
  } else {
    const sampler = samplerOf(entries, indices, seed);
    plan.circuit.drawing = true;
    for (let box = 0; box < boxes; box += 1) {
      sampler.next(x);
      if (possible(entries, x)) {
        plan.fill(x);
        if (covers(plan, x)) covered += 1;
      }
      if (onProgress !== undefined && (box + 1) % REPORT === 0) onProgress(box + 1, boxes);
    }
    plan.circuit.drawing = false;
    plan.fill(plan.nominal);
  }
  if (onProgress !== undefined && (boxes % REPORT !== 0 || indices.length === 0)) onProgress(boxes, boxes);
  const { low, high } = clopperPearson(covered, boxes, confidence);
  return { covered, boxes, low, high };
}
