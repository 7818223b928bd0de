/** Seeded random numbers of a test; the same seed gives the same circuits, wires and coils. */
export interface Chance {
  linear(min: number, max: number): number;
  log(min: number, max: number): number;
  whole(min: number, max: number): number;
  coin(): boolean;
  of<T>(list: readonly T[]): T;
}

export function chanceFrom(seed: number): Chance {
  let state = seed >>> 0;
  const next = (): number => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    // The upper bits of this generator are the good ones; mixed once more for the lower.
    const mixed = Math.imul(state ^ (state >>> 16), 0x45d9f3b) >>> 0;
    return (mixed ^ (mixed >>> 16)) >>> 0;
  };
  const unit = (): number => (next() + 0.5) / 4294967296;
  const linear = (min: number, max: number): number => min + (max - min) * unit();
  return {
    linear,
    log: (min, max) => min * Math.exp(Math.log(max / min) * unit()),
    whole: (min, max) => min + Math.floor((max - min + 1) * unit()),
    coin: () => unit() < 0.5,
    of(list) {
      const picked = list[Math.floor(list.length * unit())];
      if (picked === undefined) throw new RangeError('There is nothing to pick from.');
      return picked;
    },
  };
}
