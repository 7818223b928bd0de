import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { applyChanges, evaluate, type Change } from '@/services/receiver';
import { aSet, aSolenoid } from './builders';
import { nearDesign } from './near-design';

/** Paths and ends of the three spreads a capacitor-tuned near set has. */
function endsOf(design: unknown, paths: readonly string[]): [path: string, ends: [number, number]][] {
  return paths.map((path) => {
    const spread = path
      .split('.')
      .reduce<unknown>(
        (at, key) =>
          at !== null && typeof at === 'object' ? Object.entries(at).find(([name]) => name === key)?.[1] : undefined,
        design,
      );
    if (spread === null || typeof spread !== 'object' || !('nominal' in spread) || !('tol' in spread))
      throw new TypeError(`No spread at ${path}.`);
    const [nominal, tol] = [Number(spread.nominal), Number(spread.tol)];
    return [path, [nominal * (1 - tol), nominal * (1 + tol)]];
  });
}

describe('the corners', () => {
  test(
    'are the worst of every combination of ends, each worked out as an exact design of its own',
    { timeout: 120_000 },
    () => {
      // A fold is the bottom of a curve, so its place is known to seven digits.
      let compared = 0;
      fc.assert(
        fc.property(nearDesign, (design) => {
          if (design.tuning.kind !== 'capacitor') return;
          const { corners } = evaluate(design, { boxes: 0 }).reach;
          const ends = endsOf(design, ['coil.formerDiameter', 'tuning.min', 'tuning.max']);
          let [lo, hi] = [0, Infinity];
          for (let bits = 0; bits < 8; bits += 1) {
            const changes = ends.map(([path, pair], place): Change => ({
              path,
              from: null,
              to: pair[(bits >> place) & 1 ? 1 : 0],
            }));
            const { nominal } = evaluate(applyChanges(design, changes), { boxes: 0 }).reach;
            lo = Math.max(lo, nominal.lo);
            hi = Math.min(hi, nominal.hi);
          }
          expect(corners.lo / lo).toBeCloseTo(1, 6);
          expect(corners.hi / hi).toBeCloseTo(1, 6);
          compared += 1;
        }),
        { numRuns: 24, seed: 20261201, endOnFailure: true },
      );
      expect(compared).toBeGreaterThan(6);
    },
  );

  test('of a set whose every part has a tolerance lie outside its boxes', () => {
    const t = (nominal: number) => ({ nominal, tol: 0.03 });
    const design = aSet({
      aerial: { kind: 'wire', vertical: t(6), horizontal: t(12), radius: t(0.0005), siteFactor: t(1.1) },
      earth: { kind: 'resistance', r: { nominal: 50, tol: 1, dist: 'log-uniform' } },
      coupling: { kind: 'series-c', c: t(12e-12) },
      coil: { ...aSolenoid, formerDiameter: t(0.05), pitch: t(0.0006), q: t(150), cSelf: t(3e-12) },
      tuning: { kind: 'capacitor', min: t(12e-12), max: t(5e-10), law: 'capacitance' },
      stray: t(4e-12),
    });
    const { reach, limits } = evaluate(design, { boxes: 0 });
    expect(reach.corners.lo).toBeGreaterThan(reach.nominal.lo * 1.02);
    expect(reach.corners.hi).toBeLessThan(reach.nominal.hi * 0.98);
    expect(new Set(limits.map((limit) => limit.path)).size).toBeGreaterThanOrEqual(10);
  });
});
