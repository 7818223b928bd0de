import { at } from './cells';
import { asinh, exp, log } from './exp-log';
import { betaInverse, betaRegularised, gammaRegularised, lnGamma } from './gamma';
import { brent } from './roots';

const SQRT_TWO_PI = 2.5066282746310002;

function density(z: number): number {
  return exp(-0.5 * z * z) / SQRT_TWO_PI;
}

/** Probability of a standard normal value above z, digits kept in the tail: power series inside, fraction outside. */
export function normalAbove(z: number): number {
  if (z < 0) return 1 - normalAbove(-z);
  return aboveFrom(z, density(z));
}

/** The same for z >= 0 where the density there is known. */
function aboveFrom(z: number, d: number): number {
  if (z < 2.5) {
    let term = z;
    let sum = z;
    for (let k = 1; k < 120; k += 1) {
      term *= (z * z) / (2 * k + 1);
      sum += term;
      if (term < 1e-17 * sum) break;
    }
    return 0.5 - d * sum;
  }
  let fraction = z;
  for (let k = 90; k >= 1; k -= 1) fraction = z + k / fraction;
  return d / fraction;
}

export function normalBelow(z: number): number {
  return normalAbove(-z);
}

/**
 * Quantile of the standard normal distribution: Acklam's rational form and one Newton step. 1e-14 against SciPy down
 * to 1e-300.
 */
export function normalQuantile(p: number): number {
  if (p > 0.5) return -normalQuantile(1 - p);
  return corrected(rational(p), p);
}

/** Turns a column of probabilities into the same quantiles, in two loops that put little on the heap. */
export function normalQuantiles(column: Float64Array, scratch: Float64Array, count: number): void {
  for (let i = 0; i < count; i += 1) {
    const p = at(column, i);
    scratch[i] = rational(p > 0.5 ? 1 - p : p);
  }
  for (let i = 0; i < count; i += 1) {
    const p = at(column, i);
    column[i] = p > 0.5 ? -corrected(at(scratch, i), 1 - p) : corrected(at(scratch, i), p);
  }
}

/** Acklam's form for p up to 1/2, within 1.15e-9 of the quantile, relative. */
function rational(p: number): number {
  if (p <= 0) return -Infinity;
  if (p < 0.02425) {
    const q = Math.sqrt(-2 * log(p));
    return (
      (((((-7.784894002430293e-3 * q - 3.223964580411365e-1) * q - 2.400758277161838) * q - 2.549732539343734) * q +
        4.374664141464968) *
        q +
        2.938163982698783) /
      ((((7.784695709041462e-3 * q + 3.224671290700398e-1) * q + 2.445134137142996) * q + 3.754408661907416) * q + 1)
    );
  }
  const q = p - 0.5;
  const r = q * q;
  return (
    ((((((-3.969683028665376e1 * r + 2.209460984245205e2) * r - 2.759285104469687e2) * r + 1.38357751867269e2) * r -
      3.066479806614716e1) *
      r +
      2.506628277459239) *
      q) /
    (((((-5.447609879822406e1 * r + 1.615858368580409e2) * r - 1.556989798598866e2) * r + 6.680131188771972e1) * r -
      1.328068155288572e1) *
      r +
      1)
  );
}

/** One Newton step from z <= 0 toward the quantile of p. */
function corrected(z: number, p: number): number {
  if (z === -Infinity) return z;
  const t = -z;
  const d = exp(-0.5 * t * t) / SQRT_TWO_PI;
  return z - (aboveFrom(t, d) - p) / d;
}

/**
 * Probability of Student's t above t >= 0 with `freedom` degrees; near zero from the other side, which keeps the
 * digits.
 */
export function studentAbove(t: number, freedom: number): number {
  const square = t * t;
  if (square < 0.5) return 0.5 - 0.5 * betaRegularised(square / (freedom + square), 0.5, freedom / 2);
  return 0.5 * betaRegularised(freedom / (freedom + square), freedom / 2, 0.5);
}

/** The t that a tail probability p <= 1/2 lies above; 1 to 1000 degrees, p from 1e-10: 1e-9 against mpmath. */
export function studentQuantileAbove(p: number, freedom: number): number {
  if (p >= 0.5) return 0;
  const stretched = brent((s) => studentAbove(0.5 * (exp(s) - exp(-s)), freedom) / p - 1, 0, asinh(1e12), 1e-13);
  return 0.5 * (exp(stretched) - exp(-stretched));
}

/** Quantile of chi-squared with 1 to 10000 degrees of freedom: 1e-10 against SciPy. */
export function chiSquaredQuantile(p: number, freedom: number): number {
  let high = freedom + 10;
  while (gammaRegularised(freedom / 2, high / 2) < p) high *= 2;
  return brent((x) => gammaRegularised(freedom / 2, x / 2) - p, 0, high, 1e-13);
}

/** Two-sided 95 % (or other) limits of Clopper and Pearson for k of n. */
export function clopperPearson(k: number, n: number, confidence = 0.95): { low: number; high: number } {
  const alpha = 1 - confidence;
  return {
    low: k === 0 ? 0 : betaInverse(alpha / 2, k, n - k + 1),
    high: k === n ? 1 : betaInverse(1 - alpha / 2, k + 1, n - k),
  };
}

/** Limits of Wilson for k of n. */
export function wilson(k: number, n: number, confidence = 0.95): { low: number; high: number } {
  const z = normalQuantile(1 - (1 - confidence) / 2);
  const p = k / n;
  const centre = (p + (z * z) / (2 * n)) / (1 + (z * z) / n);
  const half = (z * Math.sqrt((p * (1 - p)) / n + (z * z) / (4 * n * n))) / (1 + (z * z) / n);
  return { low: centre - half, high: centre + half };
}

/**
 * Howe's two-sided tolerance factor: mean -+ k s holds `coverage` of the parts with `confidence`. Within 1.5 % for n
 * >= 5.
 */
export function howeFactor(n: number, coverage: number, confidence: number): number {
  const z = normalQuantile((1 + coverage) / 2);
  return z * Math.sqrt(((n - 1) * (1 + 1 / n)) / chiSquaredQuantile(1 - confidence, n - 1));
}

/** Mean over the distribution of a sample's standard deviation (in units of sigma) of g, by Simpson's rule. */
function overDeviation(n: number, g: (s: number) => number): number {
  const freedom = n - 1;
  const steps = 2000;
  const spread = 1 / Math.sqrt(2 * freedom);
  const low = Math.max(1e-9, 1 - 9 * spread);
  const high = 1 + 12 * spread;
  const lead = (freedom / 2) * log(freedom / 2) - lnGamma(freedom / 2) + log(2);
  let sum = 0;
  for (let i = 0; i <= steps; i += 1) {
    const s = low + ((high - low) * i) / steps;
    const weight = exp(lead + (freedom - 1) * log(s) - (freedom * s * s) / 2);
    sum += (i === 0 || i === steps ? 1 : i % 2 === 1 ? 4 : 2) * weight * g(s);
  }
  return (sum * (high - low)) / (3 * steps);
}

/**
 * One-sided tolerance factor: the noncentral t quantile over the root of n, by integration over the sample's
 * deviation.
 */
export function oneSidedFactor(n: number, coverage: number, confidence: number): number {
  const root = Math.sqrt(n);
  const z = normalQuantile(coverage);
  return brent((k) => overDeviation(n, (s) => normalBelow(root * (k * s - z))) - confidence, 0.01, 100, 1e-10);
}

/** Exact two-sided tolerance factor of normal data, by integration over the sample's mean and deviation. */
export function twoSidedFactor(n: number, coverage: number, confidence: number): number {
  const root = Math.sqrt(n);
  const half = 200;
  const radii: number[] = [];
  const weights: number[] = [];
  for (let i = 0; i <= half; i += 1) {
    const m = (8 * i) / half / root;
    const within = (r: number): number => normalBelow(m + r) - normalBelow(m - r) - coverage;
    radii.push(brent(within, 0, m + 12, 1e-12));
    weights.push(((i === 0 || i === half ? 1 : i % 2 === 1 ? 4 : 2) * 2 * density(m * root) * 8) / (3 * half));
  }
  const covered = (k: number): number => {
    let sum = 0;
    for (let i = 0; i <= half; i += 1) {
      const least = (radii[i] ?? NaN) / k;
      sum += (weights[i] ?? NaN) * (1 - gammaRegularised((n - 1) / 2, ((n - 1) * least * least) / 2));
    }
    return sum;
  };
  return brent((k) => covered(k) - confidence, 0.5, 60, 1e-8);
}
