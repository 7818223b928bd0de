import fc from 'fast-check';
import { applyChanges, type Change, type DesignInput } from '@/services/receiver';
import { anyDesign } from './any-design';

/** Dotted paths of every number of a design, its tolerances and lots among them. */
export function numbersOf(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return [path];
  if (value === null || typeof value !== 'object') return [];
  return Object.entries(value).flatMap(([key, item]) => numbersOf(item, path === '' ? key : `${path}.${key}`));
}

function numberAt(design: unknown, path: string): number {
  const found = path
    .split('.')
    .reduce<unknown>(
      (at, key) =>
        at !== null && typeof at === 'object' ? Object.entries(at).find(([name]) => name === key)?.[1] : undefined,
      design,
    );
  return typeof found === 'number' ? found : NaN;
}

/** What a number may turn into: a power of ten up or down, an end of a usual limit, a slip of sign or unit. */
const twists: fc.Arbitrary<(x: number) => number> = fc.oneof(
  { weight: 6, arbitrary: fc.double({ min: -5, max: 5, noNaN: true }).map((power) => (x: number) => x * 10 ** power) },
  { weight: 2, arbitrary: fc.double({ min: -1, max: 1, noNaN: true }).map((power) => (x: number) => x * 10 ** power) },
  { weight: 2, arbitrary: fc.constantFrom(0, 1, 1e-12, 1e-9, 1e-3, 0.98, 0.5, 1e3, 1e8).map((y) => () => y) },
  {
    weight: 1,
    arbitrary: fc.constantFrom(
      (x: number) => -x,
      Math.round,
      (x: number) => x + 1,
      (x: number) => x / 2,
    ),
  },
);

/**
 * A design of any form with one to four of its numbers twisted out of what is usual. Many are refused; what the form lets
 * through is stranger than any kit, and has to be judged all the same.
 */
export const wildDesign: fc.Arbitrary<DesignInput> = fc
  .tuple(anyDesign, fc.array(fc.tuple(fc.nat(), twists), { minLength: 1, maxLength: 4 }))
  .map(([design, picks]) => {
    const paths = numbersOf(design);
    const changes = picks.map(([place, twist]): Change => {
      const path = paths[place % paths.length] ?? 'stray';
      return { path, from: null, to: twist(numberAt(design, path)) };
    });
    // The changes keep the form of the file: numbers stay numbers.
    return applyChanges(design, changes) as DesignInput;
  });
