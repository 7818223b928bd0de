import { at } from '../numeric/cells';
import { exp, log } from '../numeric/exp-log';

/** Step of the logarithmic derivatives, relative. */
const STEP = 1e-3;

/**
 * Stand-in for a slow table of nine inductances: its nominal cells times each value's ratio to the power of its
 * sensitivity. Exact to first order in the logarithms; below 0.1 % for tolerances of a few percent.
 * @see coils-and-capacitors.md B3 and J
 */
export function bySensitivity(
  nominal: Float64Array,
  indices: readonly number[],
  table: (x: Float64Array, into: Float64Array) => void,
): (into: Float64Array, x: Float64Array) => void {
  const centre = new Float64Array(9);
  table(nominal, centre);
  const x = Float64Array.from(nominal);
  const up = new Float64Array(9);
  const down = new Float64Array(9);
  const width = log(1 + STEP) - log(1 - STEP);
  const slopes = indices.map((index) => {
    const slope = new Float64Array(9);
    const value = at(nominal, index);
    if (value === 0) return slope;
    x[index] = value * (1 + STEP);
    table(x, up);
    x[index] = value * (1 - STEP);
    table(x, down);
    x[index] = value;
    for (let cell = 0; cell < 9; cell += 1) {
      if (at(centre, cell) > 0) slope[cell] = (log(at(up, cell)) - log(at(down, cell))) / width;
    }
    return slope;
  });
  const logs = new Float64Array(indices.length);
  return (into, drawn) => {
    for (let i = 0; i < indices.length; i += 1) {
      const index = indices[i] ?? 0;
      const value = at(nominal, index);
      logs[i] = value === 0 || at(drawn, index) === value ? 0 : log(at(drawn, index) / value);
    }
    for (let cell = 0; cell < 9; cell += 1) {
      let sum = 0;
      for (let i = 0; i < indices.length; i += 1) {
        const slope = slopes[i];
        if (slope !== undefined && at(logs, i) !== 0) sum += at(slope, cell) * at(logs, i);
      }
      into[cell] = sum === 0 ? at(centre, cell) : at(centre, cell) * exp(sum);
    }
  };
}
