import { within } from '../invalid-input';
import { capacitanceNeeded } from '../network/solve';
import { exp, log } from '../numeric/exp-log';
import { parseDesign } from '../parse';
import { prepared } from '../survey';
import type { Hertz } from '../units';
import { BLOCK, samplerOf } from './draws';

export interface ContourOptions {
  seed?: number | undefined;
  boxes?: number | undefined;
  /** Frequencies of the contour; they reach a quarter beyond the band. */
  points?: number | undefined;
}

export interface Contour {
  f: Hertz[];
  /** Share of boxes whose reach includes f. */
  share: number[];
}

/** Chance that a box reaches each frequency, for the contour of the reach rail: the same draws as the verdict's boxes. */
export function contour(input: unknown, { seed = 1, boxes = 2000, points = 61 }: ContourOptions = {}): Contour {
  within('seed', seed, 0, 4294967295);
  within('boxes', boxes, 1, 200000);
  within('points', points, 2, 1000);
  const design = parseDesign(input);
  const { plan } = prepared(design);
  const { circuit, mode, values } = plan;
  const low = design.band.lo / 1.25;
  const rate = log((design.band.hi * 1.25) / low) / (points - 1);
  const f = Array.from({ length: points }, (_, i) => low * exp(rate * i));
  const covered = new Float64Array(points);
  const x = Float64Array.from(plan.nominal);
  const sampler = samplerOf(values.entries, values.spread(), seed);
  const floor = new Uint8Array(points);
  circuit.drawing = true;
  for (let box = 0; box < boxes; box += 1) {
    if (box % BLOCK === 0) sampler.draw(Math.min(BLOCK, boxes - box));
    if (sampler.possible[box % BLOCK] !== 1) continue;
    sampler.row(box % BLOCK, x);
    plan.fill(x);
    if (!circuit.sound) continue;
    for (let i = 0; i < points; i += 1) {
      const c = capacitanceNeeded(circuit, f[i] ?? NaN);
      floor[i] = c <= circuit.cMax && (mode !== 'capacitor' || c >= circuit.cMin) ? 1 : 0;
    }
    if (mode !== 'capacitor') plan.moveTo(x, circuit.positionMin);
    for (let i = 0; i < points; i += 1) {
      if (floor[i] !== 1) continue;
      if (mode === 'capacitor' || capacitanceNeeded(circuit, f[i] ?? NaN) >= circuit.cMin)
        covered[i] = (covered[i] ?? 0) + 1;
    }
  }
  return { f, share: Array.from(covered, (count) => count / boxes) };
}
