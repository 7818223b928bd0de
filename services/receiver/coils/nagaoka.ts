import { positive } from '../invalid-input';
import { log } from '../numeric/exp-log';
import { PI } from '../numeric/trig';
import { MU_0, type Henry, type Metre } from '../units';

/** Complete elliptic integrals of the first and second kind, as a pair that a caller keeps between calls. */
export interface Elliptic {
  first: number;
  second: number;
}

/**
 * Complete elliptic integrals by the arithmetic-geometric mean.
 * @param square     k squared, 0 to below 1
 * @param complement k', the root of 1 - k squared, handed in because it is known without cancellation
 * The loop ends with the step whose difference is at most 1e-8 of the mean: the next would be below rounding, and a
 * limit near 1e-16 can loop for ever.
 */
export function elliptic(square: number, complement: number, into: Elliptic): void {
  let a = 1;
  let b = complement;
  let sum = square / 2;
  let factor = 1;
  for (let i = 0; i < 12; i += 1) {
    const c = (a - b) / 2;
    const mean = (a + b) / 2;
    b = Math.sqrt(a * b);
    a = mean;
    sum += factor * c * c;
    factor *= 2;
    if (c <= 1e-8 * a) break;
  }
  into.first = PI / (2 * a);
  into.second = into.first * (1 - sum);
}

/** Nagaoka's coefficient, exact (1e-9 against the loop integral). @see coils-and-capacitors.md A1 */
export function nagaoka(diameter: Metre, length: Metre): number {
  positive('diameter', diameter);
  positive('length', length);
  const sum = diameter * diameter + length * length;
  const complement = length / Math.sqrt(sum);
  const square = (diameter * diameter) / sum;
  const e: Elliptic = { first: 0, second: 0 };
  elliptic(square, complement, e);
  const bracket = ((length * length) / (diameter * diameter)) * (e.first - e.second) + e.second - Math.sqrt(square);
  return (4 * bracket) / (3 * PI * complement);
}

/** Lundin's closed form, within 2.5e-6: kept as a cross-check. */
export function nagaokaLundin(diameter: Metre, length: Metre): number {
  positive('diameter', diameter);
  positive('length', length);
  if (length >= diameter) {
    const x = (diameter / length) * (diameter / length);
    return (1 + 0.383901 * x + 0.017108 * x * x) / (1 + 0.258952 * x) - (4 * diameter) / (3 * PI * length);
  }
  const y = (length / diameter) * (length / diameter);
  const first = ((log((4 * diameter) / length) - 0.5) * (1 + 0.383901 * y + 0.017108 * y * y)) / (1 + 0.258952 * y);
  return ((2 * length) / (PI * diameter)) * (first + 0.093842 * y + 0.002029 * y * y - 0.000801 * y * y * y);
}

/** Inductance of a current sheet of `turns` turns. */
export function sheetInductance(turns: number, diameter: Metre, length: Metre): Henry {
  positive('turns', turns);
  return (MU_0 * PI * turns * turns * diameter * diameter * nagaoka(diameter, length)) / (4 * length);
}

/** Wheeler's microhenry for inches, in SI: 1e-6 over 0.0254. */
export const WHEELER = 1e-6 / 0.0254;

/** Wheeler's form of 1928, +-0.6 % for length over diameter above 0.4: a quick check. */
export function wheelerInductance(turns: number, diameter: Metre, length: Metre): Henry {
  const a = positive('diameter', diameter) / 2;
  return (WHEELER * a * a * turns * turns) / (9 * a + 10 * positive('length', length));
}
