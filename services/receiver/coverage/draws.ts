import { at } from '../numeric/cells';
import { asinh, exp, log } from '../numeric/exp-log';
import { normalAbove, normalQuantile, normalQuantiles, studentQuantileAbove } from '../numeric/quantiles';
import { advance, mulberry32, streamSeed, unitDraw } from '../numeric/random';
import type { Entry } from '../network/values';

/** Turns a uniform draw into a value of its part. */
type Drawer = (u: number) => number;

/** Probability of a normal value below -3 sigma. */
const NORMAL_FROM = 1.3498980316300933e-3;
const NORMAL_SPAN = 1 - 2 * NORMAL_FROM;

/** @see evaluate.md rule 8; sigma of a normal value is a third of its tolerance, cut at +-3 sigma */
function drawerOf(entry: Entry): Drawer {
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

/** Boxes drawn at a time. */
export const BLOCK = 512;
/** Passing values of one column, never kept from one call to the next. */
const SCRATCH = new Float64Array(BLOCK);

/** Draws blocks of boxes, a column a value, each value from its own stream. Allocates nothing once it stands. */
export interface Sampler {
  /** Draws the next boxes, at most a block of them. */
  draw(count: number): void;
  /** Columns of the block, in the order of the indices. */
  columns: readonly Float64Array[];
  /** 1 where every drawn value lies within the limits of its field. */
  possible: Uint8Array;
  /** Writes the values of one box of the block into a row. */
  row(box: number, x: Float64Array): void;
}

interface Stream {
  entry: Entry;
  index: number;
  state: number;
  column: Float64Array;
  drawer: Drawer;
}

export function samplerOf(entries: readonly Entry[], indices: readonly number[], seed: number): Sampler {
  const streams = indices.map((index): Stream => {
    const entry = entries[index];
    if (entry === undefined) throw new RangeError(`No value ${index} in this design.`);
    return {
      entry,
      index,
      state: streamSeed(seed, entry.path),
      column: new Float64Array(BLOCK),
      drawer: drawerOf(entry),
    };
  });
  const possible = new Uint8Array(BLOCK);
  return {
    columns: streams.map(({ column }) => column),
    possible,
    draw(count) {
      possible.fill(1);
      for (const stream of streams) {
        stream.state = drawInto(stream, count);
        withinLimits(stream, count, possible);
      }
    },
    row(box, x) {
      for (let i = 0; i < streams.length; i += 1) {
        const stream = streams[i];
        if (stream !== undefined) x[stream.index] = at(stream.column, box);
      }
    },
  };
}

/** Fills a column and returns the stream's state after it. A uniform value, the commonest, has a loop without calls. */
function drawInto({ entry, state, column, drawer }: Stream, count: number): number {
  // As a signed 32-bit number the state stays off the heap; the bits are the same.
  let now = state | 0;
  if (entry.lot === null && entry.dist === 'uniform') {
    const { centre: x, tol: t } = entry;
    for (let i = 0; i < count; i += 1) {
      now = advance(now) | 0;
      column[i] = x * (1 + t * (2 * unitDraw(mulberry32(now)) - 1));
    }
  } else if (entry.lot === null && entry.dist === 'normal') {
    const { centre: x, tol: t } = entry;
    for (let i = 0; i < count; i += 1) {
      now = advance(now) | 0;
      column[i] = NORMAL_FROM + unitDraw(mulberry32(now)) * NORMAL_SPAN;
    }
    normalQuantiles(column, SCRATCH, count);
    for (let i = 0; i < count; i += 1) column[i] = x * (1 + (t / 3) * at(column, i));
  } else {
    for (let i = 0; i < count; i += 1) {
      now = advance(now) | 0;
      column[i] = drawer(unitDraw(mulberry32(now)));
    }
  }
  return now >>> 0;
}

function withinLimits({ entry, column }: Stream, count: number, possible: Uint8Array): void {
  const [least, most] = entry.limits;
  for (let i = 0; i < count; i += 1) {
    const drawn = at(column, i);
    if (!(drawn >= least && drawn <= most)) possible[i] = 0;
  }
}
