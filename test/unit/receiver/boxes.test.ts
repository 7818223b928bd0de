import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { boxesOf, generalCounter } from '@/services/receiver/coverage/boxes';
import { BLOCK, samplerOf } from '@/services/receiver/coverage/draws';
import { oneNodeCounter } from '@/services/receiver/coverage/one-node';
import { parseDesign } from '@/services/receiver/parse';
import { prepared } from '@/services/receiver/survey';
import type { DesignInput } from '@/services/receiver';
import { aSet, aSolenoid } from './builders';

const tol = fc.double({ min: 0, max: 0.3, noNaN: true });
const spread = (nominal: number) =>
  fc.oneof(
    fc.constant(nominal),
    fc.record({
      nominal: fc.constant(nominal),
      tol,
      dist: fc.constantFrom('uniform' as const, 'normal' as const, 'log-uniform' as const),
    }),
    tol.map((half) => ({ nominal, tol: half, dist: 'binned' as const, bin: half / 2 })),
    tol.map((half) => ({ nominal, tol: half, lot: { n: 8, mean: nominal * 1.02, s: nominal * 0.02 } })),
  );

/** Sets with aerial, coil and detector at the top, a spread on any of their values. */
const oneNode: fc.Arbitrary<DesignInput> = fc
  .record({
    aerial: fc.oneof(
      fc.record({
        kind: fc.constant('circuit' as const),
        r: spread(2),
        l: spread(2e-5),
        c: spread(2e-10),
        effectiveHeight: spread(6),
      }),
      fc.record({
        kind: fc.constant('wire' as const),
        vertical: fc.constant(6),
        horizontal: fc.constantFrom(0 as const, 12),
        radius: fc.constant(0.0005),
        siteFactor: spread(1.1),
      }),
    ),
    earth: fc.oneof(
      fc.constant({ kind: 'none' as const }),
      spread(40).map((r) => ({ kind: 'resistance' as const, r })),
    ),
    coupling: fc.oneof(
      fc.constant({ kind: 'direct' as const }),
      spread(1.2e-11).map((c) => ({ kind: 'series-c' as const, c })),
    ),
    coil: fc.oneof(
      fc.record({ kind: fc.constant('measured' as const), l: spread(2.05e-4), q: spread(140), cSelf: spread(6e-12) }),
      fc.record({ kind: fc.constant('measured' as const), l: spread(2.05e-4), r: spread(9), lFactor: spread(1) }),
      spread(1).map((lFactor) => ({ ...aSolenoid, lFactor })),
      spread(1).map((lFactor) => ({ ...aSolenoid, q: undefined, lFactor })),
    ),
    min: spread(1.2e-11),
    max: spread(5e-10),
    stray: spread(4e-12),
    cj: spread(8e-13),
  })
  .map(({ min, max, stray, cj, ...rest }) => {
    const tuning = { kind: 'capacitor', min, max, law: 'capacitance' };
    const detector = { is: 2e-7, n: 1.3, rs: 7, cj, measured: true };
    // A file has no undefined keys.
    return JSON.parse(JSON.stringify({ ...aSet(), ...rest, stray, tuning, detector }));
  });

describe('a share of boxes', () => {
  test('is the same box for box in closed form and by the solver', () => {
    fc.assert(
      fc.property(oneNode, fc.integer({ min: 0, max: 4294967295 }), (design, seed) => {
        const { plan } = prepared(parseDesign(design));
        const indices = plan.values.spread();
        const [one, other] = [
          samplerOf(plan.values.entries, indices, seed),
          samplerOf(plan.values.entries, indices, seed),
        ];
        const closed = oneNodeCounter(plan, one, indices);
        expect(closed).not.toBeNull();
        const general = generalCounter(plan, other);
        for (const count of [BLOCK, BLOCK, 77]) {
          one.draw(count);
          other.draw(count);
          const covered = closed?.(count);
          plan.fill(plan.nominal);
          expect(general(count)).toBe(covered);
        }
      }),
    );
  });

  test('takes the general way where the coil itself is drawn, or divided, or another element is in the way', () => {
    const wound = { ...aSolenoid, formerDiameter: { nominal: 0.05, tol: 0.01 } };
    const tapped = { ...aSolenoid, taps: { aerial: 20 }, lFactor: { nominal: 1, tol: 0.04 } };
    for (const design of [
      aSet({ coil: wound }),
      aSet({ coil: tapped, coupling: { kind: 'aerial-tap' } }),
      aSet({ stray: { nominal: 4e-12, tol: 0.5 }, padder: 1e-9 }),
    ]) {
      const { plan } = prepared(parseDesign(design));
      const indices = plan.values.spread();
      expect(oneNodeCounter(plan, samplerOf(plan.values.entries, indices, 1), indices)).toBeNull();
    }
  });

  test('stops drawing once too many have missed, and says no more than it drew', () => {
    const narrow = aSet({
      tuning: { kind: 'capacitor', min: 1.2e-11, max: { nominal: 4e-10, tol: 0.2 }, law: 'capacitance' },
    });
    const { plan } = prepared(parseDesign(narrow));
    const all = boxesOf(plan, { seed: 1, boxes: 20000, confidence: 0.95 });
    const early = boxesOf(plan, { seed: 1, boxes: 20000, confidence: 0.95, mostMissed: 200 });
    expect(all.covered).toBeLessThan(19800);
    expect(early.covered).toBeLessThan(all.covered);
  });
});
