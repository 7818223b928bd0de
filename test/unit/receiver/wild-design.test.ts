import fc from 'fast-check';
import { expect, test } from 'vitest';
import { evaluate, InvalidInput, Verdict } from '@/services/receiver';
import { wildDesign } from './wild-design';

const RUNS = { numRuns: process.env['SCHEDULES'] === undefined ? 300 : 5000, seed: 20261203 };
/** Longest that one design may take, millisecond: a hang would be far beyond. */
const PATIENCE = 20_000;

test('what the form lets through is judged with finite numbers and without delay, and a refusal names its paths', () => {
  let judged = 0;
  let refused = 0;
  fc.assert(
    fc.property(wildDesign, (design) => {
      const begun = performance.now();
      try {
        const verdict = evaluate(design, { boxes: 400 });
        Verdict.parse(verdict);
        expect(JSON.parse(JSON.stringify(verdict))).toEqual(verdict);
        expect(verdict.findings.filter(({ message }) => /NaN|undefined|Infinity|null/.test(message))).toEqual([]);
        judged += 1;
      } catch (error) {
        if (!(error instanceof InvalidInput)) throw error;
        expect(error.issues.length).toBeGreaterThan(0);
        expect(error.issues.filter(({ path, message }) => path === '' || !/^[A-Z].*\.$/.test(message))).toEqual([]);
        refused += 1;
      }
      expect(performance.now() - begun).toBeLessThan(PATIENCE);
    }),
    RUNS,
  );
  expect(judged).toBeGreaterThan(RUNS.numRuns / 4);
  expect(refused).toBeGreaterThan(RUNS.numRuns / 10);
}, 1_800_000);
