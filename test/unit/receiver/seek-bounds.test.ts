import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { audioVoltage } from '@/services/receiver/detector/audio';
import { diode, inputResistance, outputResistance, rectifyBehind } from '@/services/receiver/detector/diode';
import { capacitanceNeeded } from '@/services/receiver/network/solve';
import { planOf } from '@/services/receiver/network/plan';
import { parseDesign } from '@/services/receiver/parse';
import { neededBetween } from '@/services/receiver/seek/needed-between';
import { soundBoundOf } from '@/services/receiver/seek/sound-bound';
import { defaultRules } from '@/services/receiver';
import { aSet, aSolenoid } from './builders';

const log = (min: number, max: number) =>
  fc.double({ min: Math.log(min), max: Math.log(max), noNaN: true }).map((x) => Math.exp(x));

const aDiode = fc.record({ is: log(1e-10, 1e-4), n: fc.double({ min: 1, max: 4, noNaN: true }) });

describe('what seek takes for granted', () => {
  test('audio voltage falls and output resistance rises with the resistance of the source', () => {
    const inputs = fc.tuple(
      aDiode,
      log(100, 1e7),
      log(100, 1e7),
      log(100, 1e7),
      fc.double({ min: 1.01, max: 30, noNaN: true }),
    );
    fc.assert(
      fc.property(inputs, ([{ is, n }, source, dcLoad, audioLoad, factor]) => {
        const d = diode(is, n, 293.15);
        const out = (r: number) => outputResistance(d, rectifyBehind(d, 0.1, r, dcLoad).idc);
        const audio = (r: number) => audioVoltage(d, 0.1, r, dcLoad, audioLoad);
        expect(out(source * factor)).toBeGreaterThanOrEqual(out(source) * (1 - 1e-9));
        expect(audio(source * factor)).toBeLessThanOrEqual(audio(source) * (1 + 1e-6) + 1e-12);
      }),
      { numRuns: 2000 },
    );
  });

  test('the detector shows the circuit a conductance between its two bounds', () => {
    fc.assert(
      fc.property(aDiode, log(100, 1e7), log(10, 1e7), ({ is, n }, source, rDc) => {
        const set = aSet({ detector: { is, n }, earphone: { kind: 'magnetic', rDc, r: 18000 } });
        const { least, most } = soundBoundOf(parseDesign(set), defaultRules).conductance;
        const d = diode(is, n, 293.15);
        const shown = 1 / inputResistance(d, rectifyBehind(d, 0.1, source, rDc));
        expect(shown).toBeGreaterThanOrEqual(least);
        expect(shown).toBeLessThanOrEqual(most);
      }),
      { numRuns: 2000 },
    );
  });

  test('the capacitance needed lies between its bounds for every conductance between two', () => {
    const inputs = fc.record({
      aerial: fc.integer({ min: 1, max: 71 }),
      detector: fc.integer({ min: 1, max: 71 }),
      form: fc.constantFrom('direct' as const, 'aerial-tap' as const, 'primary' as const, 'series-c' as const),
      f: log(3e5, 4e6),
      least: log(1e-9, 1e-3),
      span: log(1, 1e6),
      part: fc.double({ min: 0, max: 1, noNaN: true }),
    });
    fc.assert(
      fc.property(inputs, ({ aerial, detector, form, f, least, span, part }) => {
        const coupling =
          form === 'series-c'
            ? { kind: form, c: 1e-10 }
            : form === 'primary'
              ? { kind: form, l: 2e-5, r: 1, k: 0.4 }
              : { kind: form };
        const taps = { detector, ...(form === 'aerial-tap' && { aerial }) };
        const plan = planOf(parseDesign(aSet({ coupling, detectorAt: 'tap', coil: { ...aSolenoid, taps } })));
        plan.fill(plan.nominal);
        const between = { least: 0, most: 0 };
        const most = least * span;
        neededBetween(plan.circuit, f, least, most, between);
        plan.circuit.loadG = least * span ** part;
        const needed = capacitanceNeeded(plan.circuit, f);
        expect(needed).toBeGreaterThanOrEqual(between.least);
        expect(needed).toBeLessThanOrEqual(between.most);
      }),
      { numRuns: 3000 },
    );
  });

  test('a detector and a phone that are dismissed would have stopped', () => {
    const bound = (set: Parameters<typeof aSet>[0]) => soundBoundOf(parseDesign(aSet(set)), defaultRules);
    expect(bound({ detector: { class: 'mineral' } }).mayClear(1e5)).toBe(false);
    expect(bound({ detector: { class: 'germanium', vf1mA: 0.6 } }).mayClear(1e5)).toBe(false);
    expect(bound({ earphone: { kind: 'dynamic', rDc: 30, r: 30 } }).mayClear(1e5)).toBe(false);
    expect(bound({ earphone: { kind: 'ceramic', c: 1.5e-8 }, returnResistor: 2e6 }).mayClear(1e5)).toBe(false);
    expect(bound({ earphone: { kind: 'ceramic', c: 1.5e-8 }, returnResistor: 1e5 }).mayClear(1e5)).toBe(true);
    expect(bound({}).mayClear(1e5)).toBe(true);
  });
});
