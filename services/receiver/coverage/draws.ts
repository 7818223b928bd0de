import { at } from '../numeric/cells';
import { asinh, exp, log } from '../numeric/exp-log';
import { normalAbove, normalQuantile, studentQuantileAbove } from '../numeric/quantiles';
import { advance, mulberry32, streamSeed, unitDraw } from '../numeric/random';
import type { Entry } from '../network/values';

/** Turns a uniform draw into a value of its part. */
export type Drawer = (u: number) => number;

/** Probability of a normal value below -3 sigma. */
const NORMAL_FROM = 1.3498980316300933e-3;
const NORMAL_SPAN = 1 - 2 * NORMAL_FROM;

/** @see evaluate.md rule 8; sigma of a normal value is a third of its tolerance, cut at +-3 sigma */
export function drawerOf(entry: Entry): Drawer {
  const { centre: x, tol: t, bin: b, dist, lot } = entry;
  if (lot !== null) {
    const quantile = studentTable(lot.n - 1);
    const width = lot.s * Math.sqrt(1 + 1 / lot.n);
    return (u) => x + width * quantile(u);
  }
  if (dist === 'normal') return (u) => x * (1 + (t / 3) * normalQuantile(NORMAL_FROM + u * NORMAL_SPAN));
  if (dist === 'binned') {
    return (u) => (u < 0.5 ? x * (1 - (b + (t - b) * (1 - 2 * u))) : x * (1 + b + (t - b) * (2 * u - 1)));
  }
  if (dist === 'log-uniform') {
    const width = log(1 + t);
    return (u) => x * exp(width * (2 * u - 1));
  }
  return (u) => x * (1 + t * (2 * u - 1));
}

/** Nodes a unit of the normal scale, and how far it reaches (a draw of 32 bits ends at 6.4). */
const NODES = 20;
const REACH = 7;

/**
 * Quantile of Student's t through a table over the normal scale, where its inverse hyperbolic sine is smooth; cubic
 * between the nodes, 1e-8 of the value.
 */
function studentTable(freedom: number): Drawer {
  const size = REACH * NODES + 3;
  const table = new Float64Array(size + 1);
  for (let i = 0; i <= size; i += 1) table[i] = asinh(studentQuantileAbove(normalAbove(i / NODES), freedom));
  return (u) => {
    const z = normalQuantile(u);
    const place = Math.abs(z) * NODES;
    const i = Math.min(Math.floor(place), size - 2);
    const s = place - i;
    const p0 = i === 0 ? -at(table, 1) : at(table, i - 1);
    const p1 = at(table, i);
    const p2 = at(table, i + 1);
    const p3 = at(table, i + 2);
    // Cubic through four neighbours at -1, 0, 1, 2.
    const value =
      (-s * (s - 1) * (s - 2) * p0) / 6 +
      ((s + 1) * (s - 1) * (s - 2) * p1) / 2 -
      ((s + 1) * s * (s - 2) * p2) / 2 +
      ((s + 1) * s * (s - 1) * p3) / 6;
    const t = 0.5 * (exp(value) - exp(-value));
    return z < 0 ? -t : t;
  };
}

/** Draws a row of values a box, each value from its own stream. */
export interface Sampler {
  next(x: Float64Array): void;
}

export function samplerOf(entries: readonly Entry[], indices: readonly number[], seed: number): Sampler {
  const states = new Uint32Array(indices.length);
  const drawers = indices.map((index) => drawerOf(entries[index] ?? missing(index)));
  indices.forEach((index, place) => {
    states[place] = streamSeed(seed, entries[index]?.path ?? '');
  });
  return {
    next(x) {
      for (let place = 0; place < indices.length; place += 1) {
        const state = advance(states[place] ?? 0);
        states[place] = state;
        const draw = drawers[place];
        if (draw !== undefined) x[indices[place] ?? 0] = draw(unitDraw(mulberry32(state)));
      }
    },
  };
}

function missing(index: number): never {
  throw new RangeError(`No value ${index} in this design.`);
}
