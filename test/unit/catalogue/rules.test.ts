import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bandName, cheaperQuantity, matches, unitPrice } from '@/services/catalogue/rules';
import { SetPrice } from '@/services/catalogue/schemas';
import { newId } from '@/services/ids';
import { money } from '@/services/money';

const steps = [
  { fromQuantity: 1, unit: money(2490, 'GBP') },
  { fromQuantity: 10, unit: money(2240, 'GBP') },
  { fromQuantity: 30, unit: money(1990, 'GBP') },
];

describe('price steps', () => {
  it('the highest step that is reached sets the price of all kits', () => {
    expect(unitPrice(steps, 9)?.minor).toBe(2490);
    expect(unitPrice(steps, 10)?.minor).toBe(2240);
    expect(unitPrice(steps, 300)?.minor).toBe(1990);
    expect(unitPrice([], 1)).toBeNull();
  });

  it('a buyer is told where more kits cost less in all', () => {
    const told = [8, 9, 10, 26, 27, 28, 29, 30].filter((quantity) => cheaperQuantity(steps, quantity));
    expect(told).toEqual([9, 27, 28, 29]);
    expect(cheaperQuantity(steps, 29)).toEqual({ quantity: 30, total: money(59_700, 'GBP') });
  });

  it('a kit is never dearer each when more of it are bought', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 400 }), (quantity) => {
        const now = unitPrice(steps, quantity)?.minor ?? 0;
        const next = unitPrice(steps, quantity + 1)?.minor ?? 0;
        expect(next).toBeLessThanOrEqual(now);
      }),
    );
  });

  it('are refused when they do not begin at 1, do not rise, or grow dearer', () => {
    const set = (...pairs: [number, number][]) =>
      SetPrice.safeParse({
        kitId: newId(),
        steps: pairs.map(([fromQuantity, minor]) => ({ fromQuantity, unit: money(minor, 'GBP') })),
      });
    expect(set([1, 2490], [10, 2240]).success).toBe(true);
    expect(set([2, 2490]).success).toBe(false);
    expect(set([1, 2490], [1, 2000]).success).toBe(false);
    expect(set([1, 2490], [10, 2600]).success).toBe(false);
    expect(set([1, 0]).success).toBe(false);
  });
});

describe('looking for a kit', () => {
  const kit = { code: 'EL7', name: 'Ebb Lamp', number: 7, stations: [{ name: 'Osk Home', f: 549_000 }] };
  it('finds it by name, code, number, station or frequency', () => {
    for (const q of ['ebb', 'LAMP ebb', 'el7', 'no. 7', 'osk home', '549']) expect(matches(kit, q), q).toBe(true);
    expect(matches(kit, 'tollgate')).toBe(false);
  });

  it('names the wave of a band by where it lies', () => {
    expect(bandName({ lo: 148_500, hi: 283_500 })).toBe('long wave');
    expect(bandName({ lo: 525_000, hi: 1_705_000 })).toBe('medium wave');
    expect(bandName({ lo: 5_900_000, hi: 6_200_000 })).toBe('short wave');
  });
});
