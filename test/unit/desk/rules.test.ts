import { describe, expect, it } from 'vitest';
import { byDay, dayOf, labelOf, median } from '@/services/desk/rules';

describe('the yard’s day', () => {
  it('is that of the yard’s own clock: an hour before midnight in summer is the next day', () => {
    expect(dayOf(Date.UTC(2026, 11, 1, 23, 30))).toBe('2026-12-01');
    expect(dayOf(Date.UTC(2026, 6, 1, 23, 30))).toBe('2026-07-02');
    expect(labelOf(Date.UTC(2026, 11, 1, 12))).toBe('Tue 1');
  });

  it('gathers what was taken on it', () => {
    const noon = Date.UTC(2026, 11, 1, 12);
    const days = byDay([
      { at: noon, minor: 500 },
      { at: noon + 3_600_000, minor: 250 },
      { at: noon + 86_400_000, minor: 100 },
    ]);
    expect([...days]).toEqual([
      ['2026-12-01', 750],
      ['2026-12-02', 100],
    ]);
  });
});

it('the middle of some hours is the lower one of two, and none of none', () => {
  expect(median([19, 3, 40])).toBe(19);
  expect(median([19, 3])).toBe(3);
  expect(median([])).toBeNull();
});
