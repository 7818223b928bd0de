/**
 * Exponential and logarithm from + - * / alone, so that browser and server agree to the last digit.
 * The ECMAScript functions of the same names are left to each implementation and differ in their last digits.
 * Method: argument reduction by ln 2 and the published rational forms of fdlibm. Range: all numbers, subnormal ones too;
 * error below 1 unit in the last place of NumPy's. @see test/reference/numerics.test.ts
 */
const LN2_HIGH = 6.9314718036912381649e-1;
const LN2_LOW = 1.90821492927058770002e-10;
const INVERSE_LN2 = 1.442695040888963387;
const SQRT2 = 1.4142135623730951;
const TWO_32 = 4294967296;

/** x times two to the power k, exact but for results below the normal range. */
function scaled(x: number, k: number): number {
  let power = 1;
  let base = k < 0 ? 0.5 : 2;
  let n = k < 0 ? -k : k;
  const half = n > 1000 ? n - 1000 : 0;
  n -= half;
  while (n > 0) {
    if (n % 2 === 1) power *= base;
    base *= base;
    n = (n - (n % 2)) / 2;
  }
  // Below the normal range the rest goes on in one step: several would round several times.
  let rest = 1;
  for (let i = 0; i < half; i += 1) rest *= k < 0 ? 0.5 : 2;
  return x * power * rest;
}

/** e to the power x. Above 709.78 infinity, below -745.2 zero. */
export function exp(x: number): number {
  if (x !== x) return NaN;
  if (x > 709.782712893384) return Infinity;
  if (x < -745.1332191019412) return 0;
  const k = Math.floor(x * INVERSE_LN2 + 0.5);
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const t = r * r;
  const c =
    r -
    t *
      (1.66666666666666019037e-1 +
        t *
          (-2.77777777770155933842e-3 +
            t * (6.61375632143793436117e-5 + t * (-1.6533902205465251539e-6 + t * 4.13813679705723846039e-8))));
  const y = 1 - (low - (r * c) / (2 - c) - high);
  return k === 0 ? y : scaled(y, k);
}

/** Natural logarithm. Zero gives minus infinity, a negative number NaN. */
export function log(value: number): number {
  if (value !== value || value < 0) return NaN;
  if (value === 0) return -Infinity;
  if (value === Infinity) return Infinity;
  let x = value;
  let k = 0;
  while (x >= TWO_32) {
    x /= TWO_32;
    k += 32;
  }
  while (x < 1 / TWO_32) {
    x *= TWO_32;
    k -= 32;
  }
  if (x >= 65536) {
    x /= 65536;
    k += 16;
  } else if (x < 1 / 65536) {
    x *= 65536;
    k -= 16;
  }
  if (x >= 256) {
    x /= 256;
    k += 8;
  } else if (x < 1 / 256) {
    x *= 256;
    k -= 8;
  }
  while (x > SQRT2) {
    x /= 2;
    k += 1;
  }
  while (x < SQRT2 / 2) {
    x *= 2;
    k -= 1;
  }
  const f = x - 1;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const even = w * (3.999999999940941908e-1 + w * (2.222219843214978396e-1 + w * 1.531383769920937332e-1));
  const odd =
    z *
    (6.66666666666673513e-1 +
      w * (2.857142874366239149e-1 + w * (1.818357216161805012e-1 + w * 1.479819860511658591e-1)));
  const halfSquare = 0.5 * f * f;
  return k * LN2_HIGH - (halfSquare - (s * (halfSquare + even + odd) + k * LN2_LOW) - f);
}

/** exp(x) - 1 without loss of digits near zero. */
export function expm1(x: number): number {
  if (x > 0.5 || x < -0.5) return exp(x) - 1;
  const u = exp(x);
  if (u === 1) return x;
  const less = u - 1;
  return less === -1 ? -1 : (less * x) / log(u);
}

/** log(1 + x) without loss of digits near zero. */
export function log1p(x: number): number {
  const u = 1 + x;
  return u === 1 || u === Infinity ? x : (log(u) * x) / (u - 1);
}

/** Inverse hyperbolic sine. */
export function asinh(x: number): number {
  const a = x < 0 ? -x : x;
  const value = a > 1e8 ? log(a) + 0.6931471805599453 : log1p(a + (a * a) / (1 + Math.sqrt(1 + a * a)));
  return x < 0 ? -value : value;
}

const INVERSE_LN10 = 0.4342944819032518;

/** Logarithm to the base ten. */
export function log10(x: number): number {
  return log(x) * INVERSE_LN10;
}

/** Ratio of two voltages in decibel. */
export function decibel(ratio: number): number {
  return 20 * INVERSE_LN10 * log(ratio);
}

/** Ratio of two powers that stands for a number of decibel. */
export function powerRatio(levelDb: number): number {
  return exp(levelDb / (10 * INVERSE_LN10));
}
