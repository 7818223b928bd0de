import { positive } from '../invalid-input';

const E24 = [
  1, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2, 2.2, 2.4, 2.7, 3, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1, 5.6, 6.2, 6.8, 7.5, 8.2, 9.1,
];
const E96 = [
  1, 1.02, 1.05, 1.07, 1.1, 1.13, 1.15, 1.18, 1.21, 1.24, 1.27, 1.3, 1.33, 1.37, 1.4, 1.43, 1.47, 1.5, 1.54, 1.58, 1.62,
  1.65, 1.69, 1.74, 1.78, 1.82, 1.87, 1.91, 1.96, 2, 2.05, 2.1, 2.15, 2.21, 2.26, 2.32, 2.37, 2.43, 2.49, 2.55, 2.61,
  2.67, 2.74, 2.8, 2.87, 2.94, 3.01, 3.09, 3.16, 3.24, 3.32, 3.4, 3.48, 3.57, 3.65, 3.74, 3.83, 3.92, 4.02, 4.12, 4.22,
  4.32, 4.42, 4.53, 4.64, 4.75, 4.87, 4.99, 5.11, 5.23, 5.36, 5.49, 5.62, 5.76, 5.9, 6.04, 6.19, 6.34, 6.49, 6.65, 6.81,
  6.98, 7.15, 7.32, 7.5, 7.68, 7.87, 8.06, 8.25, 8.45, 8.66, 8.87, 9.09, 9.31, 9.53, 9.76,
];

/** IEC 60063. E24 and below do not follow the rounding rule, so the lists are kept. */
export const SERIES = {
  E6: [1, 1.5, 2.2, 3.3, 4.7, 6.8],
  E12: [1, 1.2, 1.5, 1.8, 2.2, 2.7, 3.3, 3.9, 4.7, 5.6, 6.8, 8.2],
  E24,
  E48: E96.filter((_, index) => index % 2 === 0),
  E96,
} as const satisfies Record<string, readonly number[]>;

export type SeriesName = keyof typeof SERIES;

/** Powers of ten, whole ones exact and fractions correctly rounded, for values put together from digits. */
export function tenTo(power: number): number {
  return Number(`1e${power}`);
}

/** Preferred value nearest by ratio, ten times the first included; ties go upward. */
export function nearest(series: SeriesName, value: number): number {
  positive('value', value);
  const power = Number(value.toExponential().split('e')[1]);
  let best = NaN;
  let distance = Infinity;
  for (const step of [...SERIES[series], 10]) {
    const candidate = composed(step, power);
    const ratio = candidate > value ? candidate / value : value / candidate;
    if (ratio <= distance) {
      best = candidate;
      distance = ratio;
    }
  }
  return best;
}

/** The next preferred value below or above. */
export function neighbour(series: SeriesName, value: number, direction: 'up' | 'down'): number {
  positive('value', value);
  const power = Number(value.toExponential().split('e')[1]);
  const list = [power - 1, power, power + 1].flatMap((at) => SERIES[series].map((step) => composed(step, at)));
  if (direction === 'up') return list.find((candidate) => candidate > value * (1 + 1e-9)) ?? value;
  return list.reduce((best, candidate) => (candidate < value * (1 - 1e-9) ? candidate : best), value);
}

/** A step of a series times a power of ten, put together from whole digits. */
function composed(step: number, power: number): number {
  const digits = Math.round(step * 100);
  return power >= 2 ? digits * tenTo(power - 2) : digits / tenTo(2 - power);
}
