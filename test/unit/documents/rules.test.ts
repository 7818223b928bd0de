import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { printable } from '@/services/documents/rules';

describe('what can be printed', () => {
  it('keeps Latin letters with their marks, and the signs of units', () => {
    expect(printable('Łódź, Győr: 47\u202fkΩ, 235 µH, −3 °')).toBe('Łódź, Győr: 47\u202fkΩ, 235 μH, −3 °');
  });

  it('takes a mark off where only the bare letter is held, and shows what is missing', () => {
    expect(printable('x̌')).toBe('x');
    expect(printable('ﬁne')).toBe('fine');
    expect(printable('Иван')).toBe('????');
  });

  it('never lets a letter through that no face holds', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (text) => {
        expect(printable(printable(text))).toBe(printable(text));
      }),
    );
  });
});
