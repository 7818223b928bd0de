import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { invertComplex } from '@/services/receiver/numeric/complex';
import { bisect, brent, minimum } from '@/services/receiver/numeric/roots';

const RUNS = { numRuns: 400, seed: 20261205 };
const part = fc.double({ min: -1, max: 1, noNaN: true });

/** Real and imaginary parts of up to four nodes, rows scaled apart as admittances of parts are; never singular. */
const networks = fc.integer({ min: 1, max: 4 }).chain((n) =>
  fc.record({
    n: fc.constant(n),
    re: fc.array(part, { minLength: n * n, maxLength: n * n }),
    im: fc.array(part, { minLength: n * n, maxLength: n * n }),
    scale: fc.array(fc.double({ min: -6, max: 6, noNaN: true }), { minLength: n, maxLength: n }),
  }),
);

describe('the solution of up to four nodes', () => {
  test('times the network is one, whatever the magnitudes of its parts', () => {
    fc.assert(
      fc.property(networks, ({ n, re, im, scale }) => {
        const place = (i: number, j: number): number => i * n + j;
        const [a, b] = [new Float64Array(n * n), new Float64Array(n * n)];
        for (let i = 0; i < n; i += 1) {
          for (let j = 0; j < n; j += 1) {
            const size = 10 ** (scale[i] ?? 0);
            // A heavy diagonal keeps the network away from a singular one.
            a[place(i, j)] = size * ((re[place(i, j)] ?? 0) + (i === j ? 5 : 0));
            b[place(i, j)] = size * (im[place(i, j)] ?? 0);
          }
        }
        const [x, y] = [Float64Array.from(a), Float64Array.from(b)];
        expect(invertComplex(n, x, y, new Int32Array(4))).toBe(true);
        for (let i = 0; i < n; i += 1) {
          for (let j = 0; j < n; j += 1) {
            let [real, imaginary] = [0, 0];
            for (let k = 0; k < n; k += 1) {
              const [ar, ai, xr, xi] = [a[place(i, k)], b[place(i, k)], x[place(k, j)], y[place(k, j)]].map(Number);
              real += (ar ?? NaN) * (xr ?? NaN) - (ai ?? NaN) * (xi ?? NaN);
              imaginary += (ar ?? NaN) * (xi ?? NaN) + (ai ?? NaN) * (xr ?? NaN);
            }
            // Rows i and j differ in magnitude by what their scales do.
            const unit = 10 ** ((scale[i] ?? 0) - (scale[j] ?? 0));
            expect(Math.abs(real - (i === j ? 1 : 0))).toBeLessThan(1e-12 * Math.max(1, unit));
            expect(Math.abs(imaginary)).toBeLessThan(1e-12 * Math.max(1, unit));
          }
        }
      }),
      RUNS,
    );
  });

  test('needs a change of rows where a node has nothing of its own', () => {
    const [re, im] = [Float64Array.from([0, 2, 4, 0]), new Float64Array(4)];
    expect(invertComplex(2, re, im, new Int32Array(2))).toBe(true);
    expect([...re]).toEqual([0, 0.25, 0.5, 0]);
  });

  test('is refused where a node hangs on nothing', () => {
    expect(invertComplex(2, Float64Array.from([1, 1, 0, 0]), new Float64Array(4), new Int32Array(2))).toBe(false);
  });
});

describe('a bracketed root', () => {
  const cubics = fc.record({
    root: fc.double({ min: -10, max: 10, noNaN: true }),
    below: fc.double({ min: 0.01, max: 20, noNaN: true }),
    above: fc.double({ min: 0.01, max: 20, noNaN: true }),
    steep: fc.double({ min: -3, max: 6, noNaN: true }),
  });

  test('is found inside its bracket, by interpolation and by halving alike', () => {
    fc.assert(
      fc.property(cubics, ({ root, below, above, steep }) => {
        const slope = 10 ** steep;
        const f = (x: number): number => slope * (x - root) * (1 + (x - root) * (x - root));
        for (const found of [brent(f, root - below, root + above), bisect(f, root - below, root + above)])
          expect(Math.abs(found - root)).toBeLessThan(1e-11);
      }),
      RUNS,
    );
  });

  test('of a leap is the place of the leap', () => {
    const leap = (x: number): number => (x < 0.3 ? -1 : 1e9);
    expect(brent(leap, 0, 1)).toBeCloseTo(0.3, 12);
    expect(bisect(leap, 0, 1)).toBeCloseTo(0.3, 12);
  });

  test('stays at the nearer end where the bracket holds none', () => {
    expect(brent((x) => x + 1, 0, 5)).toBe(0);
    expect(brent((x) => x - 6, 0, 5)).toBe(5);
  });

  test('ends at the bottom of a valley for a minimum', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 9, noNaN: true }), (bottom) => {
        expect(minimum((x) => (x - bottom) * (x - bottom), 0.5, 10)).toBeCloseTo(bottom, 6);
      }),
      RUNS,
    );
  });
});
