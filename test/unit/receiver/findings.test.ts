import { describe, expect, test } from 'vitest';
import { defaultRules, evaluate, type DesignInput, type Finding, type Rules } from '@/services/receiver';
import { aSet, aSolenoid } from './builders';

function find(design: DesignInput, code: string, rules: Rules = defaultRules): Finding | undefined {
  return evaluate(design, { boxes: 0, rules }).findings.find((finding) => finding.code === code);
}

const ceramic = { kind: 'ceramic', c: 1.5e-8 } as const;

describe('the ends of the band', () => {
  const { lo, hi } = evaluate(aSet(), { boxes: 0 }).margins;

  test('clear just above the margin that is asked and stop just below it', () => {
    const asked = (guardNominal: number): Rules => ({ ...defaultRules, guardNominal });
    expect(find(aSet(), 'BAND-LOW', asked(lo - 1e-6))).toBeUndefined();
    expect(find(aSet(), 'BAND-LOW', asked(lo + 1e-6))).toMatchObject({ severity: 'stop', value: lo, path: 'band.lo' });
    expect(find(aSet(), 'BAND-HIGH', asked(hi - 1e-6))).toBeUndefined();
    expect(find(aSet(), 'BAND-HIGH', asked(hi + 1e-6))).toMatchObject({ severity: 'stop', value: hi, path: 'band.hi' });
  });

  test('of a wound coil are mended by whole turns', () => {
    const short = find(aSet({ coil: { ...aSolenoid, turns: 50 } }), 'BAND-LOW');
    const [change] = short?.remedy?.changes ?? [];
    expect(change).toMatchObject({ path: 'coil.turns', from: 50 });
    expect(Number.isInteger(change?.to)).toBe(true);
    expect(short?.remedy?.text).toBe(`Wind ${String(change?.to)} turns instead of 50.`);
  });
});

describe('the earphone', () => {
  test('of a ceramic kind needs a return resistor from 10 k to 1 M', () => {
    const phone = (returnResistor?: number) =>
      find(aSet({ earphone: ceramic, ...(returnResistor === undefined ? {} : { returnResistor }) }), 'PHONE-DC');
    expect(phone()?.severity).toBe('stop');
    expect(phone(9.9e3)?.severity).toBe('stop');
    expect(phone(10e3)).toBeUndefined();
    expect(phone(1e6)).toBeUndefined();
    expect(phone(1.01e6)?.severity).toBe('stop');
  });

  test('takes too little power, a little, or enough, by the thresholds of the rules', () => {
    const share = evaluate(aSet(), { boxes: 0 }).earphone.powerShare ?? NaN;
    const asked = (powerStop: number, powerNote: number) =>
      find(aSet(), 'PHONE-Z', { ...defaultRules, powerStop, powerNote });
    expect(asked(share * 0.5, share * 0.99)).toBeUndefined();
    expect(asked(share * 0.5, share * 1.01)?.severity).toBe('note');
    expect(asked(share * 1.01, 1)?.severity).toBe('stop');
  });

  test('sounds dull as a note, and stops below the lower corner', () => {
    const with100k = aSet({ earphone: ceramic, returnResistor: 100e3 });
    const corner = evaluate(with100k, { boxes: 0 }).earphone.corner ?? NaN;
    expect(find(with100k, 'PHONE-LOWPASS', { ...defaultRules, lowpassNote: corner + 1 })?.severity).toBe('note');
    expect(find(with100k, 'PHONE-LOWPASS', { ...defaultRules, lowpassStop: corner + 1 })?.severity).toBe('stop');
    expect(find(with100k, 'PHONE-LOWPASS', { ...defaultRules, lowpassNote: corner - 1 })).toBeUndefined();
  });

  test('without any path for direct current has no level to state', () => {
    const verdict = evaluate(aSet({ earphone: ceramic }), { boxes: 0 });
    expect(verdict.earphone).toEqual({
      outputR: null,
      powerShare: null,
      voltageShare: null,
      corner: null,
      level: null,
    });
    expect(verdict.detector.relative).toBeNull();
  });
});

describe('the detector', () => {
  test('is screened by a forward reading only while it is an unmeasured junction', () => {
    const read = (detector: DesignInput['detector']) =>
      find(aSet({ detector }), 'DET-WEAK') ?? find(aSet({ detector }), 'DET-UNSUIT');
    expect(read({ is: 2e-7, n: 1.3, vf1mA: 0.45 })).toMatchObject({
      code: 'DET-WEAK',
      path: 'detector.vf1mA',
      value: 0.45,
    });
    expect(read({ is: 2e-7, n: 1.3, vf1mA: 0.45, measured: true })?.path).not.toBe('detector.vf1mA');
    expect(find(aSet({ detector: { class: 'mineral', vf1mA: 0.6 } }), 'DET-UNSUIT')?.path).not.toBe('detector.vf1mA');
  });

  test('without a measured curve is a note, and a stop where it is a contact', () => {
    expect(find(aSet({ detector: { class: 'germanium' } }), 'DET-DATA')?.severity).toBe('note');
    expect(find(aSet({ detector: { class: 'mineral' } }), 'DET-DATA')?.severity).toBe('stop');
    expect(find(aSet({ detector: { class: 'mineral', measured: true } }), 'DET-DATA')).toBeUndefined();
  });

  test('takes its saturation current from a reading at 1 mA, also over its class', () => {
    const verdict = evaluate(aSet({ detector: { class: 'germanium', vf1mA: 0.36 } }), { boxes: 0 });
    expect(verdict.detector.vf1mA).toBeCloseTo(0.36, 12);
  });
});

describe('the winding', () => {
  test('has to leave 5 mm of former free at each end', () => {
    const on = (formerLength: number) => find(aSet({ coil: { ...aSolenoid, formerLength } }), 'FORMER-SHORT');
    expect(on(0.0497)).toBeUndefined();
    expect(on(0.0495)).toMatchObject({ severity: 'stop', path: 'coil.formerLength', unit: 'm' });
  });

  test('resonates by itself as a stop in the band and as a note up to twice its upper edge', () => {
    const own = (cSelf: number) =>
      find(aSet({ coil: { kind: 'measured', l: 205e-6, q: 140, cSelf } }), 'COIL-SRF')?.severity;
    expect(own(6e-12)).toBeUndefined();
    expect(own(20e-12)).toBe('note');
    expect(own(60e-12)).toBe('stop');
  });
});

describe('measured lots', () => {
  const lot = (n: number): DesignInput =>
    aSet({ coil: { kind: 'measured', l: { nominal: 205e-6, tol: 0.05, lot: { n, mean: 205e-6, s: 1e-6 } }, q: 140 } });

  test('of fewer than ten parts are told of, of ten are not', () => {
    expect(find(lot(9), 'LOT-SMALL')).toMatchObject({ severity: 'info', path: 'coil.l', value: 9 });
    expect(find(lot(10), 'LOT-SMALL')).toBeUndefined();
  });

  test('take the place of an assumption, so nobody asks for data', () => {
    const assumed = aSet({ coil: { kind: 'measured', l: { nominal: 205e-6, tol: 0.05 }, q: 140 } });
    expect(find(assumed, 'DATA-NONE')).toMatchObject({ severity: 'note', path: 'coil.l' });
    expect(find(lot(12), 'DATA-NONE')).toBeUndefined();
  });
});

test('findings stand in the order of the catalogue, each code with its highest severity once', () => {
  const { findings } = evaluate(
    aSet({
      coil: { kind: 'measured', l: 80e-6, q: 20, cSelf: 90e-12 },
      detector: { class: 'mineral' },
      earphone: ceramic,
      earth: { kind: 'none' },
    }),
    { boxes: 0 },
  );
  const order = ['BAND-LOW', 'SEL-ADJ', 'COIL-SRF', 'DET-DATA', 'PHONE-DC', 'EARTH-NONE', 'UNIT-ODD'];
  const codes = findings.map((finding) => finding.code);
  expect(order.map((code) => codes.indexOf(code))).toEqual(
    order.map((code) => codes.indexOf(code)).sort((a, b) => a - b),
  );
  expect(codes.filter((code) => code !== 'UNIT-ODD')).toEqual([
    ...new Set(codes.filter((code) => code !== 'UNIT-ODD')),
  ]);
});
