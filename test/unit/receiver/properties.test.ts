import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { evaluate, InvalidInput, type DesignInput, type Verdict } from '@/services/receiver';
import { anyDesign } from './any-design';
import { nearDesign } from './near-design';

const isLong = process.env['SCHEDULES'] !== undefined;
const runs = (few: number) => ({ numRuns: isLong ? 10 * few : few, seed: 20261204 });
const LONG = 1_800_000;

function verdictOf(design: unknown, boxes = 0): Verdict | null {
  try {
    return evaluate(design, { boxes });
  } catch (error) {
    if (error instanceof InvalidInput) return null;
    throw error;
  }
}

/** A design with every value exact, so that a factor may be put on any of them. */
function exactly(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(exactly);
  if (value === null || typeof value !== 'object') return value;
  if ('nominal' in value) return value.nominal;
  return Object.fromEntries(Object.entries(value).map(([key, item]) => [key, exactly(item)]));
}

// The shape stays that of a design: spreads become their nominals.
const exactDesign = anyDesign.map((design) => exactly(design) as DesignInput);

describe('in sets of every form the reach falls, or stays where it is held,', () => {
  /** The detector's load is worked out anew for the changed set, which moves a tapped or coupled circuit by a little. */
  const SLACK = 1 + 2e-3;
  const grown: [string, (design: DesignInput, factor: number) => unknown][] = [
    ['stray capacitance', (design, factor) => ({ ...design, stray: Number(design.stray ?? 0) + factor * 4e-12 })],
    ['inductance', (design, factor) => ({ ...design, coil: { ...design.coil, lFactor: factor } })],
  ];
  /**
   * Below this loaded Q a resistance across a tap decides what capacitance is needed, and more inductance may raise the
   * upper end: at a Q of 0.3 by 2 %, which ngspice gives to 1e-10 as well. Stray capacitance has no such exception.
   */
  const RESONATES = 2;
  const resonates = ({ points }: Verdict): boolean => points.every(({ q }) => q === null || q >= RESONATES);
  test.each(grown)('when %s grows', { timeout: LONG }, (what, grow) => {
    let moved = 0;
    fc.assert(
      fc.property(exactDesign, fc.double({ min: 1.02, max: 1.6, noNaN: true }), (design, factor) => {
        const before = verdictOf(design);
        const after = verdictOf(grow(design, factor));
        if (before === null || after === null) return;
        if (what === 'inductance' && !(resonates(before) && resonates(after))) return;
        expect(after.reach.nominal.lo).toBeLessThanOrEqual(before.reach.nominal.lo * SLACK);
        expect(after.reach.nominal.hi).toBeLessThanOrEqual(before.reach.nominal.hi * SLACK);
        if (after.reach.nominal.lo < before.reach.nominal.lo) moved += 1;
      }),
      runs(120),
    );
    expect(moved).toBeGreaterThan(40);
  });
});

describe('a set whose every inductance and capacitance is scaled', () => {
  test('does the same at frequencies scaled the other way', { timeout: LONG }, () => {
    let compared = 0;
    fc.assert(
      fc.property(exactDesign, fc.double({ min: 0.5, max: 2, noNaN: true }), (design, factor) => {
        const { coil, aerial, coupling, tuning, band } = design;
        if (coil.kind !== 'measured' || aerial.kind !== 'circuit' || tuning.kind === 'foil') return;
        if (design.earth?.kind === 'none') return;
        const up = (x: unknown): number => Number(x ?? 0) * factor;
        const scaled = {
          ...design,
          band: Object.fromEntries(Object.entries(band).map(([key, f]) => [key, f / factor])),
          aerial: { ...aerial, l: up(aerial.l), c: up(aerial.c) },
          coupling: scaledParts(coupling, ['c', 'l'], factor),
          coil: {
            ...scaledParts(coil, ['l', 'cSelf'], factor),
            ...('sections' in coil && coil.sections !== undefined
              ? { sections: coil.sections.map((row) => row.map(up)) }
              : {}),
          },
          tuning: scaledParts(tuning, ['min', 'max', 'c'], factor),
          ...(design.padder === undefined ? {} : { padder: up(design.padder) }),
          ...(design.trimmer === undefined ? {} : { trimmer: up(design.trimmer) }),
          stray: up(design.stray),
          detector: { is: 2e-7, n: 1.3, cj: 0.8e-12 * factor },
        };
        const before = verdictOf({ ...design, detector: { is: 2e-7, n: 1.3, cj: 0.8e-12 } });
        const after = verdictOf(scaled);
        if (before === null || after === null) return;
        for (const end of ['lo', 'hi'] as const)
          expect((after.reach.nominal[end] * factor) / before.reach.nominal[end]).toBeCloseTo(1, 6);
        after.points.forEach((point, i) => {
          const other = before.points[i];
          same(point.q, other?.q, 1e-5);
          same(point.gain, other?.gain, 1e-6);
          same(point.adjacent, other?.adjacent, 1e-5);
        });
        same(after.earphone.level, before.earphone.level, 1e-6);
        compared += 1;
      }),
      runs(2000),
    );
    expect(compared).toBeGreaterThan(40);
  });
});

/** Both absent, or equal within a relative difference. */
function same(got: number | null, wanted: number | null | undefined, relative: number): void {
  if (got === null || typeof wanted !== 'number') expect(got).toBe(wanted);
  else expect(Math.abs(got - wanted)).toBeLessThanOrEqual(relative * Math.abs(wanted) + 1e-9);
}

function scaledParts(part: object, keys: readonly string[], factor: number): object {
  return Object.fromEntries(
    Object.entries(part).map(([key, item]: [string, unknown]) => [
      key,
      keys.includes(key) && typeof item === 'number' ? item * factor : item,
    ]),
  );
}

describe('of a design whose nominal ends clear', () => {
  test('more tolerance never raises the share of boxes, draw for draw', { timeout: LONG }, () => {
    let compared = 0;
    fc.assert(
      fc.property(nearDesign, fc.double({ min: 1.05, max: 2.5, noNaN: true }), (design, factor) => {
        const before = verdictOf(design, 1000);
        if (before === null || before.findings.some(({ code }) => code === 'BAND-LOW' || code === 'BAND-HIGH')) return;
        const wider = verdictOf(widened(design, factor), 1000);
        if (wider === null) return;
        expect(wider.share?.covered ?? NaN).toBeLessThanOrEqual(before.share?.covered ?? NaN);
        compared += 1;
      }),
      runs(200),
    );
    expect(compared).toBeGreaterThan(30);
  });
});

/** Every tolerance of a design times a factor. */
function widened(value: unknown, factor: number): unknown {
  if (Array.isArray(value)) return value.map((item) => widened(item, factor));
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(
    Object.entries(value).map(([key, item]: [string, unknown]) => [
      key,
      key === 'tol' && typeof item === 'number' ? item * factor : widened(item, factor),
    ]),
  );
}
