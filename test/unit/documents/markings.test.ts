import { describe, expect, it } from 'vitest';
import { capacitorCode, resistorBands } from '@/services/documents/markings';
import cases from '../../reference/kit-trade.checks.json';

describe('markings of parts (IEC 60062)', () => {
  it('give the bands of every reference resistor of two figures', () => {
    const known = cases.cases.filter((one) => one.topic === 'resistor-colours');
    expect(known.length).toBeGreaterThan(2);
    for (const { inputs, expected } of known) {
      if (!('bands' in inputs) || typeof expected !== 'object' || expected === null || !('ohm' in expected)) continue;
      const { ohm, tolerance_percent: percent } = expected;
      expect(resistorBands(Number(ohm), Number(percent) / 100)).toEqual(inputs.bands);
    }
  });

  it('give the three figures of every reference capacitor that carries them', () => {
    const known = cases.cases.filter((one) => one.topic === 'capacitor-code');
    let seen = 0;
    for (const { inputs, expected } of known) {
      if (!('code' in inputs) || typeof expected !== 'object' || expected === null || !('pF' in expected)) continue;
      if (!/^\d{3}$/.test(String(inputs.code))) continue;
      seen += 1;
      expect(capacitorCode(Number(expected.pF) * 1e-12)).toBe(inputs.code);
    }
    expect(seen).toBeGreaterThan(2);
  });

  it('warn by their digits that 10 pF is marked 100', () => {
    expect(capacitorCode(1e-11)).toBe('100');
  });

  it('say nothing where two figures do not say the value', () => {
    expect(capacitorCode(3.65e-10)).toBeNull();
    expect(resistorBands(47_500, 0.01)).toBeNull();
    expect(capacitorCode(3.3e-13)).toBeNull();
    expect(resistorBands(0, undefined)).toBeNull();
  });

  it('leave the last band out where no tolerance is known', () => {
    expect(resistorBands(1_000_000, undefined)).toEqual(['brown', 'black', 'green']);
  });
});
