import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { invertComplex, invertSymmetric } from '@/services/receiver/numeric/complex';
import { normalQuantile, normalQuantiles } from '@/services/receiver/numeric/quantiles';

describe('a quick form gives what the plain one gives', () => {
  test('the inverse of a symmetric matrix by cofactors is that by elimination', () => {
    const cell = fc.double({ min: -1, max: 1, noNaN: true });
    const matrix = fc.tuple(fc.integer({ min: 1, max: 3 }), fc.array(cell, { minLength: 18, maxLength: 18 }));
    fc.assert(
      fc.property(matrix, ([n, cells]) => {
        const parts = [0, 9].map((from) => {
          const half = new Float64Array(9);
          for (let i = 0; i < n; i += 1) {
            for (let j = 0; j <= i; j += 1) {
              // Heavy on the diagonal, as impedances of coils coupled less than wholly are.
              const value = (cells[from + i * 3 + j] ?? 0) + (i === j ? 4 : 0);
              half[i * n + j] = value;
              half[j * n + i] = value;
            }
          }
          return half;
        });
        const [re = new Float64Array(9), im = new Float64Array(9)] = parts;
        const [quickRe, quickIm] = [Float64Array.from(re), Float64Array.from(im)];
        const order = new Int32Array(3);
        invertComplex(n, re, im, order);
        invertSymmetric(n, quickRe, quickIm, order);
        for (let i = 0; i < n * n; i += 1) {
          expect(Math.abs((quickRe[i] ?? NaN) - (re[i] ?? NaN))).toBeLessThan(1e-14);
          expect(Math.abs((quickIm[i] ?? NaN) - (im[i] ?? NaN))).toBeLessThan(1e-14);
        }
      }),
      { numRuns: 2000 },
    );
  });

  test('a column of normal quantiles has the same digits as each by itself', () => {
    const p = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.array(p, { minLength: 1, maxLength: 64 }), (all) => {
        const column = Float64Array.from(all);
        normalQuantiles(column, new Float64Array(all.length), all.length);
        expect([...column]).toEqual(all.map(normalQuantile));
      }),
      { numRuns: 500 },
    );
  });
});
