import { describe, expect, test } from 'vitest';
import { contour, dialMarks, evaluate, nearestFix, responseCurves } from '@/services/receiver';
import { aSet, aSolenoid } from './builders';

describe('response curves', () => {
  const settings = [600e3, 1e6, 1.5e6];
  const f = Array.from({ length: 301 }, (_, i) => 500e3 * Math.exp((Math.log(3.4) * i) / 300));
  const curves = responseCurves(aSet(), settings, f);

  test('peak where the set is tuned, the strongest of them at 0 dB', () => {
    curves.forEach((curve, index) => {
      const peak = f[curve.indexOf(Math.max(...curve))] ?? NaN;
      expect(Math.abs(peak / (settings[index] ?? NaN) - 1)).toBeLessThan(0.01);
    });
    expect(Math.max(...curves.flatMap((curve) => [...curve]))).toBe(0);
  });

  test('fall one channel aside by what the verdict says', () => {
    const middle = Math.sqrt(526500 * 1606500);
    const [curve] = responseCurves(aSet(), [middle], [middle - 9000, middle, middle + 9000]);
    const [below = NaN, own = NaN, above = NaN] = curve ?? [];
    expect(Math.max(below, above) - own).toBeCloseTo(evaluate(aSet(), { boxes: 0 }).points[1]?.adjacent ?? NaN, 9);
  });
});

describe('the chance contour', () => {
  const spread = aSet({
    coil: { kind: 'measured', l: { nominal: 183e-6, tol: 0.05, dist: 'normal' }, q: 140, cSelf: 6e-12 },
  });
  const { f, share } = contour(spread, { seed: 1, boxes: 600 });

  test('is certain inside the corners, impossible far outside, and between in between', () => {
    const { corners } = evaluate(spread, { boxes: 0 }).reach;
    f.forEach((at, index) => {
      if (at > corners.lo && at < corners.hi) expect(share[index]).toBe(1);
    });
    expect(share[0]).toBeLessThan(1);
    expect(share.every((part) => part >= 0 && part <= 1)).toBe(true);
  });

  test('draws the same boxes as the verdict', () => {
    const { lo } = aSet().band;
    const one = contour(spread, { seed: 5, boxes: 800, points: 2 });
    expect(one.f[0]).toBeCloseTo(lo / 1.25, 6);
    expect(contour(spread, { seed: 5, boxes: 800, points: 2 })).toEqual(one);
  });
});

describe('the dial', () => {
  test('keeps both end carriers and puts its labels a label apart, in the order of angle', () => {
    const marks = dialMarks(aSet(), { radius: 0.06, width: 0.008, gap: 0.0015 });
    expect(marks.map((mark) => mark.f)).toEqual(expect.arrayContaining([531000, 1602000]));
    for (let i = 1; i < marks.length; i += 1) {
      const apart = 0.06 * ((marks[i]?.angle ?? NaN) - (marks[i - 1]?.angle ?? NaN));
      expect(apart).toBeGreaterThanOrEqual(0.0095);
      expect(marks[i]?.f ?? NaN).toBeLessThan(marks[i - 1]?.f ?? NaN);
    }
  });

  test('is not printed for a set without a turning capacitor', () => {
    expect(
      dialMarks(
        aSet({ coil: { kind: 'measured', q: 120 }, tuning: { kind: 'inductance', min: 1e-4, max: 8e-4, c: 1e-10 } }),
      ),
    ).toEqual([]);
  });
});

describe('nearest fixes', () => {
  const wide = aSet({ coil: aSolenoid, coupling: { kind: 'series-c', c: 4.7e-11 } });
  const fixes = nearestFix(wide, ['BAND-HIGH']);

  test('are whole turns and sold capacitors, and reach what they promise', () => {
    expect(fixes.map((fix) => fix.changes[0]?.path)).toEqual(expect.arrayContaining(['coil.turns', 'coupling.c']));
    for (const fix of fixes) {
      expect(fix.reach.hi).toBeGreaterThanOrEqual(1606500 * 1.01);
      if (fix.changes[0]?.path === 'coil.turns') expect(Number.isInteger(fix.changes[0].to)).toBe(true);
    }
  });

  test('that bring no new stop come first', () => {
    expect(fixes.map((fix) => fix.spoils)).toEqual(fixes.map((fix) => fix.spoils).sort());
    expect(fixes[0]?.spoils).toBe(false);
  });

  test('are none for a finding that does not stand', () => {
    expect(nearestFix(aSet(), ['BAND-LOW', 'PHONE-DC'])).toEqual([]);
  });
});
