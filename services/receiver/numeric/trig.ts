/**
 * Sine, cosine, tangent and arc tangent from + - * / alone (published kernels of fdlibm), for arguments up to 1e5.
 * Error below 1 unit in the last place of NumPy's. The engine's arguments are electrical lengths of a few radians.
 * @see test/reference/numerics.test.ts
 */
const TWO_OVER_PI = 6.36619772367581382433e-1;
const HALF_PI_1 = 1.57079632673412561417;
const HALF_PI_2 = 6.0771005063039659766e-11;
const HALF_PI_3 = 2.02226624879595063154e-21;

export const PI = 3.141592653589793;

function sineKernel(x: number): number {
  const z = x * x;
  const r =
    8.33333333332248946124e-3 +
    z *
      (-1.98412698298579493134e-4 +
        z * (2.75573137070700676789e-6 + z * (-2.50507602534068634195e-8 + z * 1.58969099521155010221e-10)));
  return x + z * x * (-1.66666666666666324348e-1 + z * r);
}

function cosineKernel(x: number): number {
  const z = x * x;
  const r =
    z *
    (4.16666666666666019037e-2 +
      z *
        (-1.38888888888741095749e-3 +
          z *
            (2.48015872894767294178e-5 +
              z * (-2.75573143513906633035e-7 + z * (2.0875723212981748279e-9 + z * -1.13596475577881948265e-11)))));
  return 1 - (0.5 * z - z * r);
}

/** Sine of (x + quarters * pi/2). */
function turned(x: number, quarters: number): number {
  const n = Math.floor(x * TWO_OVER_PI + 0.5);
  const r = x - n * HALF_PI_1 - n * HALF_PI_2 - n * HALF_PI_3;
  const quadrant = (((n + quarters) % 4) + 4) % 4;
  if (quadrant === 0) return sineKernel(r);
  if (quadrant === 1) return cosineKernel(r);
  return quadrant === 2 ? -sineKernel(r) : -cosineKernel(r);
}

export function sin(x: number): number {
  return turned(x, 0);
}

export function cos(x: number): number {
  return turned(x, 1);
}

export function tan(x: number): number {
  return sin(x) / cos(x);
}

const ATAN = [
  3.33333333333329318027e-1, -1.99999999998764832476e-1, 1.42857142725034663711e-1, -1.1111110405462355788e-1,
  9.09088713343650656196e-2, -7.69187620504482999495e-2, 6.66107313738753120669e-2, -5.83357013379057348645e-2,
  4.97687799461593236017e-2, -3.6531572744216915527e-2, 1.62858201153657823623e-2,
] as const;

/** Arc tangent in (-pi/2, pi/2). */
export function atan(x: number): number {
  if (x !== x) return NaN;
  const a = x < 0 ? -x : x;
  let high = 0;
  let r = a;
  if (a >= 2.4375) {
    high = PI / 2;
    r = -1 / a;
  } else if (a >= 1.1875) {
    high = 0.982793723247329054082;
    r = (a - 1.5) / (1 + 1.5 * a);
  } else if (a >= 0.6875) {
    high = PI / 4;
    r = (a - 1) / (a + 1);
  } else if (a >= 0.4375) {
    high = 0.463647609000806093515;
    r = (2 * a - 1) / (2 + a);
  }
  const z = r * r;
  let sum = 0;
  for (let i = ATAN.length - 1; i >= 0; i -= 1) sum = (ATAN[i] ?? NaN) + z * sum;
  const value = high - (r * z * sum - r);
  return x < 0 ? -value : value;
}
