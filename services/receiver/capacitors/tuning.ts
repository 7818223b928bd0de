import { InvalidInput } from '../invalid-input';
import { TWO_PI, type Farad, type Henry, type Hertz } from '../units';

/** Ratio of highest to lowest frequency of a bare circuit. */
export function frequencyRatio(min: Farad, max: Farad, stray: Farad): number {
  return Math.sqrt((max + stray) / (min + stray));
}

/** Largest stray that still spans lo to hi. */
export function largestStray(lo: Hertz, hi: Hertz, min: Farad, max: Farad): Farad {
  const square = (hi / lo) * (hi / lo);
  return (max - square * min) / (square - 1);
}

/** Inductance that puts the low end at `lo`. */
export function inductanceForLowEnd(lo: Hertz, max: Farad, stray: Farad): Henry {
  return 1 / (TWO_PI * lo * (TWO_PI * lo) * (max + stray));
}

/** Padder in series and trimmer across the variable that bring its range to totalMin .. totalMax. */
export function padderTrimmer(range: { min: Farad; max: Farad; totalMin: Farad; totalMax: Farad }): {
  padder: Farad;
  trimmer: Farad;
} {
  const { min, max, totalMin, totalMax } = range;
  const b = min + max;
  const k = 1 / totalMin - 1 / totalMax;
  const trimmer = (-b + Math.sqrt(b * b - 4 * (min * max - (max - min) / k))) / 2;
  const padder = 1 / (1 / totalMax - 1 / (max + trimmer));
  if (!(trimmer >= 0 && padder > 0)) {
    throw new InvalidInput([
      {
        path: 'totalMin',
        message: 'This variable cannot be brought to that range: take a wider range or another variable.',
      },
    ]);
  }
  return { padder, trimmer };
}

/** Fixed capacitance beside a small variable that makes it span lo to hi. */
export function bandspread({ lo, hi, min, max }: { lo: Hertz; hi: Hertz; min: Farad; max: Farad }): Farad {
  const square = (hi / lo) * (hi / lo);
  return (max - min) / (square - 1) - min;
}
