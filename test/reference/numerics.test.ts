import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { besselI1Scaled, lnBesselI0 } from '@/services/receiver/numeric/bessel';
import { canonicalJson, sha256 } from '@/services/receiver/numeric/digest';
import { asinh, exp, expm1, log, log1p } from '@/services/receiver/numeric/exp-log';
import { betaRegularised, gammaRegularised, lnGamma } from '@/services/receiver/numeric/gamma';
import {
  chiSquaredQuantile,
  clopperPearson,
  howeFactor,
  normalAbove,
  normalQuantile,
  oneSidedFactor,
  studentQuantileAbove,
  twoSidedFactor,
  wilson,
} from '@/services/receiver/numeric/quantiles';
import { fnv1a } from '@/services/receiver/numeric/random';
import { atan, cos, sin, tan } from '@/services/receiver/numeric/trig';

/** Values of SciPy, NumPy and mpmath over the whole range of each function and at its ends; the file names the versions. */
const values: Record<string, number[][]> = JSON.parse(
  readFileSync(new URL('./numerics.json', import.meta.url), 'utf8'),
);

type Function = (...x: number[]) => number;

const FUNCTIONS: [name: string, f: Function, relative: number, absolute: number][] = [
  ['exp', (x = NaN) => exp(x), 3e-16, 0],
  ['log', (x = NaN) => log(x), 3e-16, 1e-17],
  ['expm1', (x = NaN) => expm1(x), 1e-15, 0],
  ['log1p', (x = NaN) => log1p(x), 1e-15, 0],
  ['asinh', (x = NaN) => asinh(x), 1e-15, 0],
  ['sin', (x = NaN) => sin(x), 3e-16, 3e-17],
  ['cos', (x = NaN) => cos(x), 3e-16, 3e-17],
  ['tan', (x = NaN) => tan(x), 1e-15, 0],
  ['atan', (x = NaN) => atan(x), 3e-16, 0],
  ['lnBesselI0', (x = NaN) => lnBesselI0(x), 1e-12, 0],
  ['besselI1Scaled', (x = NaN) => besselI1Scaled(x), 1e-12, 0],
  ['lnGamma', (x = NaN) => lnGamma(x), 1e-13, 1e-14],
  ['betaRegularised', (x = NaN, a = NaN, b = NaN) => betaRegularised(x, a, b), 1e-10, 1e-14],
  ['gammaRegularised', (a = NaN, x = NaN) => gammaRegularised(a, x), 1e-12, 0],
  ['normalQuantile', (p = NaN) => normalQuantile(p), 1e-9, 1e-15],
  ['normalAbove', (z = NaN) => normalAbove(z), 1e-12, 0],
  ['studentQuantileAbove', (p = NaN, n = NaN) => studentQuantileAbove(p, n), 1e-9, 0],
  ['chiSquaredQuantile', (p = NaN, n = NaN) => chiSquaredQuantile(p, n), 1e-10, 0],
  ['oneSidedFactor', (n = NaN, p = NaN, c = NaN) => oneSidedFactor(n, p, c), 1e-6, 0],
  ['howeFactor', (n = NaN, p = NaN, c = NaN) => howeFactor(n, p, c), 1e-9, 0],
  ['twoSidedFactor', (n = NaN, p = NaN, c = NaN) => twoSidedFactor(n, p, c), 1e-5, 0],
];

describe.each(FUNCTIONS)("the engine's own %s", (name, f, relative, absolute) => {
  test.each(values[name] ?? [])('agrees with the library at %j', (...row) => {
    const wanted = row.at(-1) ?? NaN;
    const got = f(...row.slice(0, -1));
    expect(Math.abs(got - wanted)).toBeLessThanOrEqual(relative * Math.abs(wanted) + absolute);
  });
});

describe.each([
  ['Clopper and Pearson', 'clopperPearson', clopperPearson],
  ['Wilson', 'wilson', wilson],
] as const)('the limits of %s', (_, name, limitsOf) => {
  test.each(values[name] ?? [])('of %i boxes of %i agree with the library', (k, n, low, high) => {
    const limits = limitsOf(k ?? NaN, n ?? NaN);
    expect(limits.low).toBeCloseTo(low ?? NaN, 9);
    expect(limits.high).toBeCloseTo(high ?? NaN, 9);
  });
});

test('numbers at the ends are what the standard says', () => {
  expect([exp(-Infinity), exp(800), log(0), log(-1), log(Infinity)]).toEqual([0, Infinity, -Infinity, NaN, Infinity]);
  expect([exp(NaN), atan(NaN)]).toEqual([NaN, NaN]);
});

/** FIPS 180-4 examples, and the published FNV-1a value of the letter a. */
test('digests are those of the published examples', () => {
  expect(sha256('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  expect(sha256('')).toBe('e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855');
  expect(sha256('abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq')).toBe(
    '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
  );
  expect(fnv1a('a')).toBe(0xe40c292c);
});

/** RFC 8785, 3.2.3 and 3.2.2: keys by UTF-16 units, numbers as ECMAScript writes them. */
test('a design has one text whatever the order of its keys', () => {
  expect(canonicalJson({ b: 1, a: [1e21, 0.000001, 1e-7], '\u20ac': true, '\r': null })).toBe(
    '{"\\r":null,"a":[1e+21,0.000001,1e-7],"b":1,"\u20ac":true}',
  );
});
