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

/** Integrals of the modulus k = D / root of (D squared + l squared), for a coil of that diameter and length. */
function ofCoil(diameter: Metre, length: Metre): Elliptic {
  const sum = diameter * diameter + length * length;
  const e: Elliptic = { first: 0, second: 0 };
  elliptic((diameter * diameter) / sum, length / Math.sqrt(sum), e);
  return e;
}

/**
 * Nagaoka's coefficient, exact for any shape (1e-9 against the loop integral and SciPy; 1e-10 at l/D 0.001, where digits
 * cancel). @see coils-and-capacitors.md A1
 */
export function nagaoka(diameter: Metre, length: Metre): number {
  positive('diameter', diameter);
  positive('length', length);
  return coefficient(diameter, length, ofCoil(diameter, length));
}

function coefficient(diameter: Metre, length: Metre, e: Elliptic): number {
  const sum = diameter * diameter + length * length;
  const complement = length / Math.sqrt(sum);
  const square = (diameter * diameter) / sum;
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

/**
 * A current sheet and what its ends do to each other: Nagaoka's coefficient, and the mutual inductance of two circles as
 * far apart as the coil is long, over mu0 times their radius. Both come from the same two integrals.
 */
export function sheetWithEnds(diameter: Metre, length: Metre): { sheet: number; ends: number } {
  positive('diameter', diameter);
  positive('length', length);
  const e = ofCoil(diameter, length);
  const k = diameter / Math.sqrt(diameter * diameter + length * length);
  return { sheet: coefficient(diameter, length, e), ends: (2 / k - k) * e.first - (2 / k) * e.second };
}

/** Wheeler's microhenry for inches, in SI: 1e-6 over 0.0254. */
export const WHEELER = 1e-6 / 0.0254;

/** Wheeler's form of 1928, +-0.6 % for length over diameter above 0.4: a quick check. */
export function wheelerInductance(turns: number, diameter: Metre, length: Metre): Henry {
  const a = positive('diameter', diameter) / 2;
  return (WHEELER * a * a * turns * turns) / (9 * a + 10 * positive('length', length));
}
