import type { Circuit } from './circuit';

/** Writes what it knows into a circuit from the vector of values. Allocates nothing. */
export type Filler = (x: Float64Array, circuit: Circuit) => void;

/** Writes the coil at a position: turns of a slider, henry of a variable inductance; ignored by a fixed coil. */
export type CoilFiller = (x: Float64Array, circuit: Circuit, position: number) => void;

/** Tells whether the numbers handed in are those of the call before, and keeps them. */
export function sameAsBefore(size: number): (...numbers: number[]) => boolean {
  const kept = new Float64Array(size).fill(NaN);
  return (...numbers) => {
    let same = true;
    for (let i = 0; i < size; i += 1) {
      const number = numbers[i] ?? NaN;
      if (kept[i] !== number) {
        kept[i] = number;
        same = false;
      }
    }
    return same;
  };
}
