import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { evaluate, type DesignInput } from '@/services/receiver';

const BAND = { lo: 526500, hi: 1606500, firstCarrier: 531000, lastCarrier: 1602000, step: 9000 };

interface Parts {
  l: number;
  max: number;
  min: number;
  coupling: number;
  stray: number;
}

/** A measured coil and a capacitor, aerial through a small capacitor: the plainest set there is. */
function plainSet({ l, max, min, coupling, stray }: Parts): DesignInput {
  return {
    format: 'coilyard-design/1',
    band: BAND,
    aerial: { kind: 'circuit', r: 1, l: 2e-5, c: 2e-10, effectiveHeight: 6 },
    earth: { kind: 'resistance', r: 40 },
    coupling: { kind: 'series-c', c: coupling },
    coil: { kind: 'measured', l, q: 140, cSelf: 6e-12 },
    tuning: { kind: 'capacitor', min, max, law: 'capacitance' },
    stray,
    detector: { class: 'germanium', measured: true },
    earphone: { kind: 'magnetic', rDc: 4000, r: 18000, x: 16000 },
  };
}

const parts: fc.Arbitrary<Parts> = fc.record({
  l: fc.double({ min: 120e-6, max: 280e-6, noNaN: true }),
  max: fc.double({ min: 250e-12, max: 550e-12, noNaN: true }),
  min: fc.double({ min: 8e-12, max: 25e-12, noNaN: true }),
  coupling: fc.double({ min: 5e-12, max: 40e-12, noNaN: true }),
  stray: fc.double({ min: 1e-12, max: 15e-12, noNaN: true }),
});

const reach = (set: DesignInput) => evaluate(set, { boxes: 0 }).reach.nominal;
const RUNS = { numRuns: 60, seed: 20261201 };

describe('reach falls', () => {
  test.each(['l', 'stray', 'coupling'] as const)('at both ends when %s grows', (key) => {
    fc.assert(
      fc.property(parts, fc.double({ min: 1.01, max: 1.5, noNaN: true }), (made, factor) => {
        const before = reach(plainSet(made));
        const after = reach(plainSet({ ...made, [key]: made[key] * factor }));
        expect(after.lo).toBeLessThan(before.lo);
        expect(after.hi).toBeLessThan(before.hi);
      }),
      RUNS,
    );
  });

  test('at the low end alone when the largest tuning capacitance grows, at the high end alone with the smallest', () => {
    fc.assert(
      fc.property(parts, (made) => {
        const before = reach(plainSet(made));
        const larger = reach(plainSet({ ...made, max: made.max * 1.1 }));
        expect(larger.lo).toBeLessThan(before.lo);
        expect(larger.hi).toBe(before.hi);
        const open = reach(plainSet({ ...made, min: made.min * 1.1 }));
        expect(open.lo).toBe(before.lo);
        expect(open.hi).toBeLessThan(before.hi);
      }),
      RUNS,
    );
  });

  test('as one over the root when inductance and nothing else is scaled with the capacitances', () => {
    const set = { l: 200e-6, max: 500e-12, min: 12e-12, coupling: 12e-12, stray: 4e-12 };
    const whole = plainSet(set);
    const double = plainSet({ ...set, l: 400e-6, max: 1000e-12, min: 24e-12, coupling: 24e-12, stray: 8e-12 });
    const scaled = {
      ...double,
      coil: { kind: 'measured', l: 400e-6, q: 140, cSelf: 12e-12 },
      detector: { is: 2e-7, n: 1.3, cj: 1.6e-12 },
    };
    const aerial = { kind: 'circuit', r: 1, l: 4e-5, c: 4e-10, effectiveHeight: 6 };
    const a = evaluate({ ...whole, detector: { is: 2e-7, n: 1.3, cj: 0.8e-12 } }, { boxes: 0 }).reach.nominal;
    const b = evaluate({ ...scaled, aerial }, { boxes: 0 }).reach.nominal;
    expect(b.lo / a.lo).toBeCloseTo(0.5, 3);
    expect(b.hi / a.hi).toBeCloseTo(0.5, 3);
  });
});

describe('simulated boxes', () => {
  const spread = (tol: number, dist: 'uniform' | 'normal'): DesignInput => ({
    ...plainSet({ l: 205e-6, max: 500e-12, min: 12e-12, coupling: 12e-12, stray: 4e-12 }),
    coil: { kind: 'measured', l: { nominal: 195e-6, tol, dist }, q: 140, cSelf: 6e-12 },
    tuning: {
      kind: 'capacitor',
      min: { nominal: 1.2e-11, tol, dist },
      max: { nominal: 4.6e-10, tol, dist },
      law: 'capacitance',
    },
  });

  test.each(['uniform', 'normal'] as const)(
    'cover the band no oftener with more %s tolerance and the same draws',
    (dist) => {
      let before = Infinity;
      for (const tol of [0, 0.01, 0.02, 0.04, 0.06, 0.09, 0.13, 0.2, 0.3]) {
        const { share } = evaluate(spread(tol, dist), { boxes: 1000 });
        expect(share?.covered ?? NaN).toBeLessThanOrEqual(before);
        before = share?.covered ?? NaN;
      }
      expect(before).toBeLessThan(1000);
    },
  );

  test('all cover, or none, where nothing has a spread, and the corners are the nominal reach', () => {
    const exact = evaluate(spread(0, 'uniform'), { boxes: 400 });
    expect(exact.share?.covered).toBe(400);
    expect(exact.reach.corners).toEqual(exact.reach.nominal);
    expect(exact.limits).toEqual([]);
  });

  test('keep their draws when another value gets a spread', () => {
    const one = evaluate(spread(0.06, 'uniform'), { boxes: 1000 });
    const more = { ...spread(0.06, 'uniform'), place: { field: { nominal: 0.01, tol: 0.1 } } };
    expect(evaluate(more, { boxes: 1000 }).share).toEqual(one.share);
  });

  test('report their progress to the end', () => {
    const seen: number[] = [];
    evaluate(spread(0.05, 'normal'), { boxes: 1200, onProgress: (done) => seen.push(done) });
    expect(seen.at(-1)).toBe(1200);
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
  });

  test('are left out of a first verdict', () => {
    const first = evaluate(spread(0.3, 'uniform'), { boxes: 0 });
    expect(first.share).toBeNull();
    expect(first.findings.map((finding) => finding.code)).not.toContain('BAND-YIELD');
  });
});

describe('variance shares', () => {
  test('add up to one at each end, largest first', () => {
    const { limits } = evaluate(
      {
        ...plainSet({ l: 205e-6, max: 500e-12, min: 12e-12, coupling: 12e-12, stray: 4e-12 }),
        stray: { nominal: 4e-12, tol: 0.5, dist: 'log-uniform' },
        coil: { kind: 'measured', l: { nominal: 195e-6, tol: 0.04, dist: 'normal' }, q: 140 },
        tuning: {
          kind: 'capacitor',
          min: 1.2e-11,
          max: { nominal: 5e-10, tol: 0.1, dist: 'binned', bin: 0.05 },
          law: 'frequency',
        },
      },
      { boxes: 0 },
    );
    for (const end of ['lo', 'hi']) {
      const shares = limits.filter((limit) => limit.end === end).map((limit) => limit.share);
      expect(shares.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 12);
    }
    expect(limits.map((limit) => limit.share)).toEqual(limits.map((limit) => limit.share).sort((a, b) => b - a));
    expect(limits.some((limit) => limit.path === 'tuning.max' && limit.end === 'hi')).toBe(false);
  });
});
