import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  applyChanges,
  evaluate,
  InvalidInput,
  Verdict,
  type DesignInput,
  type EvaluateOptions,
} from '@/services/receiver';
import { anyDesign } from './any-design';
import { nearDesign } from './near-design';

/** The long run judges 500 designs of each kind. */
const isLong = process.env['SCHEDULES'] !== undefined;
const RUNS = { numRuns: isLong ? 500 : 120, seed: 20261201 };
const PATIENCE = isLong ? 1_800_000 : 120_000;

/** The verdict of a design, or null where the file is refused. */
function verdictOf(design: DesignInput, options?: EvaluateOptions): Verdict | null {
  try {
    return evaluate(design, options);
  } catch (error) {
    if (error instanceof InvalidInput) return null;
    throw error;
  }
}

describe('whatever the form lets through', () => {
  test('gets a verdict of the fixed form, every number finite', () => {
    let judged = 0;
    fc.assert(
      fc.property(anyDesign, (design) => {
        const verdict = verdictOf(design, { boxes: 400 });
        if (verdict === null) return;
        judged += 1;
        Verdict.parse(verdict);
        expect(JSON.parse(JSON.stringify(verdict))).toEqual(verdict);
      }),
      RUNS,
    );
    expect(judged).toBeGreaterThan(80);
  });

  test('gets the same bytes for the same seed, and keeps its reach when only the seed changes', () => {
    fc.assert(
      fc.property(anyDesign, fc.nat(), (design, seed) => {
        const first = verdictOf(design, { seed, boxes: 400 });
        expect(JSON.stringify(verdictOf(design, { seed, boxes: 400 }))).toBe(JSON.stringify(first));
        const other = verdictOf(design, { seed: seed + 1, boxes: 400 });
        expect(other?.reach).toEqual(first?.reach);
      }),
      { ...RUNS, numRuns: isLong ? 500 : 30 },
    );
  });

  test('has corners that are no wider than its nominal reach', () => {
    fc.assert(
      fc.property(anyDesign, (design) => {
        const verdict = verdictOf(design, { boxes: 0 });
        if (verdict === null) return;
        const { nominal, corners } = verdict.reach;
        expect(corners.lo).toBeGreaterThanOrEqual(nominal.lo);
        expect(corners.hi).toBeLessThanOrEqual(nominal.hi);
      }),
      RUNS,
    );
  });

  test('names the path of every rejected key', () => {
    fc.assert(
      fc.property(
        anyDesign,
        fc.constantFrom('band', 'aerial', 'coupling', 'coil', 'tuning', 'detector', 'earphone'),
        (design, key) => {
          for (const broken of [NaN, 'much', null, { kind: 'none of these' }, []]) {
            try {
              evaluate({ ...design, [key]: broken }, { boxes: 0 });
              expect.unreachable('a broken file was judged');
            } catch (error) {
              expect(error).toBeInstanceOf(InvalidInput);
              const paths = error instanceof InvalidInput ? error.issues.map((issue) => issue.path.split('.')[0]) : [];
              expect(paths).toContain(key);
            }
          }
        },
      ),
      { ...RUNS, numRuns: isLong ? 500 : 40 },
    );
  });
});

/** Makes each remedy's changes and looks whether its finding is gone; counts the codes that were cleared. */
function clearAll(designs: fc.Arbitrary<DesignInput>, numRuns: number): Map<string, number> {
  const cleared = new Map<string, number>();
  fc.assert(
    fc.property(designs, (design) => {
      const verdict = verdictOf(design, { boxes: 400 });
      for (const { code, path, remedy } of verdict?.findings ?? []) {
        if (remedy === null) continue;
        expect(remedy.changes.length).toBeGreaterThan(0);
        const boxes = code === 'BAND-YIELD' ? 400 : 0;
        const after = evaluate(applyChanges(design, remedy.changes), { boxes });
        const stays = after.findings.some((one) => one.code === code && (code !== 'SEL-STRONG' || one.path === path));
        expect({ code, text: remedy.text, stays }).toEqual({ code, text: remedy.text, stays: false });
        cleared.set(code, (cleared.get(code) ?? 0) + 1);
      }
    }),
    { numRuns, seed: 20261201 },
  );
  return cleared;
}

describe('a remedy', () => {
  test('clears its finding in sets of every form', { timeout: PATIENCE }, () => {
    const codes = [...clearAll(anyDesign, isLong ? 500 : 80).keys()];
    expect(codes).toEqual(
      expect.arrayContaining(['BAND-LOW', 'BAND-HIGH', 'PHONE-Z', 'PHONE-DC', 'DET-UNSUIT', 'Q-LOW']),
    );
  });

  test('clears its finding in sets that just about work', { timeout: PATIENCE }, () => {
    const codes = [...clearAll(nearDesign, isLong ? 500 : 80).keys()];
    expect(codes).toEqual(
      expect.arrayContaining(['BAND-CORNER', 'BAND-YIELD', 'BAND-GAP', 'FORMER-SHORT', 'SEL-STRONG']),
    );
  });

  test('says from what it changes each key, as it stands in the file', () => {
    fc.assert(
      fc.property(nearDesign, (design) => {
        for (const { remedy } of verdictOf(design, { boxes: 0 })?.findings ?? []) {
          for (const { path, from } of remedy?.changes ?? []) {
            const present = path
              .split('.')
              .reduce<unknown>(
                (at, key) =>
                  at === null || typeof at !== 'object'
                    ? undefined
                    : Object.entries(at).find(([name]) => name === key)?.[1],
                design,
              );
            expect(from).toEqual(present ?? null);
          }
        }
      }),
      { numRuns: isLong ? 500 : 30, seed: 7 },
    );
  });
});
