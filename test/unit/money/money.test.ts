import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatMoney, money, parseMoney, shareOut, sum, taxWithin, times } from '@/services/money';

const minor = fc.integer({ min: -1_000_000_000, max: 1_000_000_000 });

describe('money', () => {
  it('is written with its sign, commas and the decimals of its currency', () => {
    expect(formatMoney(money(123_450, 'GBP'))).toBe('£1,234.50');
    expect(formatMoney(money(-5, 'EUR'))).toBe('\u2212€0.05');
    expect(formatMoney(money(1200, 'JPY'))).toBe('¥1,200');
  });

  it('is refused, not rounded, where it has more decimals than its currency', () => {
    expect(parseMoney('24.90', 'GBP')).toEqual(money(2490, 'GBP'));
    for (const text of ['12.345', '1e3', '1,99', '', '£4', '12.5.0']) expect(parseMoney(text, 'GBP'), text).toBeNull();
    expect(parseMoney('12.5', 'JPY')).toBeNull();
  });

  it('reads back what it has written', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 99_999 }), (amount) => {
        const written = formatMoney(money(amount, 'GBP')).replace('£', '').replaceAll(',', '');
        expect(parseMoney(written, 'GBP')).toEqual(money(amount, 'GBP'));
      }),
    );
  });

  it('holds 1.67 of tax in 9.99 at 20 %, and mirrors it in a refund', () => {
    expect(taxWithin(money(999, 'GBP'), 2000).minor).toBe(167);
    fc.assert(
      fc.property(minor, fc.integer({ min: 0, max: 10_000 }), (amount, rate) => {
        const sale = taxWithin(money(amount, 'GBP'), rate).minor;
        expect(taxWithin(money(-amount, 'GBP'), rate).minor + sale).toBe(0);
      }),
    );
  });

  it('adds up to the last penny against whole-number arithmetic', () => {
    const line = fc.tuple(fc.integer({ min: 1, max: 100_000 }), fc.integer({ min: 1, max: 500 }));
    fc.assert(
      fc.property(fc.array(line, { maxLength: 20 }), (lines) => {
        const exact = lines.reduce((all, [unit, count]) => all + BigInt(unit) * BigInt(count), 0n);
        const got = sum(
          lines.map(([unit, count]) => times(money(unit, 'GBP'), count)),
          'GBP',
        );
        expect(BigInt(got.minor)).toBe(exact);
      }),
      { numRuns: 1000 },
    );
  });

  it('is shared out without losing or making a penny', () => {
    expect(shareOut(money(1000, 'GBP'), [1, 1, 1]).map((share) => share.minor)).toEqual([334, 333, 333]);
    const weights = fc.array(fc.integer({ min: 1, max: 1000 }), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1_000_000 }), weights, (amount, parts) => {
        const shares = shareOut(money(amount, 'GBP'), parts);
        expect(shares.reduce((all, share) => all + share.minor, 0)).toBe(amount);
      }),
    );
  });

  it('of two currencies is not added', () => {
    expect(() => sum([money(1, 'GBP'), money(1, 'EUR')], 'GBP')).toThrow(RangeError);
  });
});
