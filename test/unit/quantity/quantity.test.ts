import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figuresIn, readQuantity, showQuantity, type ShownUnit } from '@/services/quantity';

const value = (text: string, unit: ShownUnit) => {
  const reading = readQuantity(text, unit);
  return reading.ok ? reading.value : reading.sentence;
};

describe('quantities are read as people write them', () => {
  it.each<[string, ShownUnit, number]>([
    ['235', 'μH', 235e-6],
    ['235u', 'μH', 235e-6],
    ['235 µH', 'μH', 235e-6],
    ['235 μH', 'μH', 235e-6],
    ['0.235m', 'μH', 235e-6],
    ['0,235 mH', 'μH', 235e-6],
    ['365p', 'pF', 365e-12],
    ['365 pF', 'pF', 365e-12],
    ['.365n', 'pF', 365e-12],
    ['4n7', 'pF', 4.7e-9],
    ['p68', 'pF', 0.68e-12],
    ['4k7', 'kΩ', 4700],
    ['4K7', 'Ω', 4700],
    ['4R7', 'Ω', 4.7],
    ['47 kohm', 'kΩ', 47_000],
    ['1M', 'kΩ', 1e6],
    ['2.2 MΩ', 'kΩ', 2.2e6],
    ['0.3 mm', 'mm', 0.3e-3],
    ['0,3 mm', 'mm', 0.3e-3],
    ['0.3', 'mm', 0.3e-3],
    ['30 cm', 'mm', 0.3],
    ['2 in', 'mm', 0.0508],
    ['12.5', 'm', 12.5],
    ['26 AWG', 'mm', 0.404e-3],
    ['24 SWG', 'mm', 0.5588e-3],
    ['1602', 'kHz', 1.602e6],
    ['1.602 MHz', 'kHz', 1.602e6],
    ['5', '%', 0.05],
    ['5 %', '%', 0.05],
    ['180', '°', 180],
    ['20 000', 'kΩ', 2e7],
    ['−3', '', -3],
    ['10', 'mV/m', 0.01],
  ])('%s in a field of %s', (text, unit, expected) => {
    const read = value(text, unit);
    expect(read).toBeTypeOf('number');
    expect(Number(read) / expected).toBeCloseTo(1, 2);
  });

  it.each<[string, ShownUnit]>([
    ['', 'pF'],
    ['many', 'pF'],
    ['365 mm', 'pF'],
    ['12 AWG mm', 'mm'],
    ['3 kg', 'mm'],
    ['0x10', 'pF'],
    ['1e999', 'pF'],
    ['4R7', 'pF'],
  ])('%s in a field of %s is no value, and says so', (text, unit) => {
    expect(value(text, unit)).toBeTypeOf('string');
  });

  it('a gauge number alone stays millimetres, since it cannot be told from them', () => {
    expect(value('26', 'mm')).toBeCloseTo(0.026, 12);
  });

  it('what a field shows reads back as the same value', () => {
    const units: ShownUnit[] = ['pF', 'nF', 'μH', 'kΩ', 'mm', 'm', 'kHz', '%', 'V', ''];
    fc.assert(
      fc.property(fc.double({ min: 1e-3, max: 1e5, noNaN: true }), fc.constantFrom(...units), (figure, unit) => {
        const typed = readQuantity(String(Number(figure.toPrecision(6))), unit);
        if (!typed.ok) throw new Error(typed.sentence);
        expect(readQuantity(figuresIn(typed.value, unit), unit)).toEqual(typed);
      }),
    );
  });
});

describe('quantities are printed for people', () => {
  it('groups digits from five on with a thin blank', () => {
    expect(showQuantity(20_000, '')).toBe('20\u202f000');
    expect(showQuantity(1602e3, 'kHz')).toBe('1602\u202fkHz');
  });
  it('uses a true minus', () => {
    expect(showQuantity(-0.05, '%')).toBe('\u22125\u202f%');
  });
  it('hides the last bits of binary fractions', () => {
    expect(showQuantity(365e-12, 'pF')).toBe('365\u202fpF');
    expect(figuresIn(0.1 + 0.2, '')).toBe('0.3');
  });
});
