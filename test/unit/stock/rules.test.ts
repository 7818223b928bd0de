import { describe, expect, it } from 'vitest';
import { buildableFrom, isFound, sayQuantity, walkingOrder } from '@/services/stock/rules';

describe('how many boxes can be built', () => {
  const available = new Map([
    ['C-365', 20],
    ['DET', 36],
    ['EAR', 14],
  ]);
  const of = (code: string) => available.get(code) ?? 0;

  it('is limited by the part that runs out first', () => {
    const needs = new Map([
      ['C-365', 1],
      ['DET', 1],
      ['EAR', 1],
    ]);
    expect(buildableFrom(needs, of)).toEqual({ count: 14, limitedBy: 'EAR' });
  });

  it('counts a part that each box needs three times', () => {
    const needs = new Map([
      ['C-365', 1],
      ['DET', 3],
    ]);
    expect(buildableFrom(needs, of)).toEqual({ count: 12, limitedBy: 'DET' });
  });

  it('is none when a part has no stock record', () => {
    expect(buildableFrom(new Map([['XX-1', 1]]), of)).toEqual({ count: 0, limitedBy: 'XX-1' });
  });
});

describe('bins', () => {
  it('are walked aisle by aisle and place by place', () => {
    const bins = ['C-14', 'A-2', 'C-3', 'AA-1', 'B-120'];
    expect(bins.sort((a, b) => walkingOrder(a) - walkingOrder(b))).toEqual(['A-2', 'B-120', 'C-3', 'C-14', 'AA-1']);
  });
});

describe('a quantity in the store', () => {
  it('is said in pieces, metres or grams', () => {
    expect(sayQuantity(1, 'each')).toBe('1 piece');
    expect(sayQuantity(840, 'each')).toBe('840 pieces');
    expect(sayQuantity(13_800, 'metre')).toBe('13.8 m');
    expect(sayQuantity(2_600_000, 'metre')).toBe('2600 m');
    expect(sayQuantity(42_050, 'gram')).toBe('42.05 g');
  });
});

it('a part is found by its code, its name, a lot or a bin', () => {
  const part = { code: 'C-365', name: 'Air capacitor', lots: [{ code: 'L-0041', bins: [{ code: 'C-14' }] }] };
  for (const q of ['', 'c-365', 'AIR cap', 'l-0041', 'c-14', 'air c-14']) expect(isFound(part, q), q).toBe(true);
  for (const q of ['0041', 'foil', 'air foil']) expect(isFound(part, q), q).toBe(false);
});
