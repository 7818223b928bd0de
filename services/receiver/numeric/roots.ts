/**
 * Bracketed roots and minima. Never a bare Newton step: each result lies inside its bracket whatever the function does.
 */
const EPSILON = 2.220446049250313e-16;

/**
 * Root of f between a and b by Brent's method. f(a) and f(b) have opposite signs or one of them is zero; if not, the
 * end with the smaller magnitude is returned.
 */
export function brent(f: (x: number) => number, a: number, b: number, relative = 1e-14): number {
  let [x0, x1] = [a, b];
  let [f0, f1] = [f(x0), f(x1)];
  if (f0 === 0) return x0;
  if (f1 === 0) return x1;
  if (f0 > 0 === f1 > 0) return Math.abs(f0) < Math.abs(f1) ? x0 : x1;
  let [x2, f2] = [x0, f0];
  let step = x1 - x0;
  let before = step;
  for (let i = 0; i < 120; i += 1) {
    if (f1 > 0 === f2 > 0) {
      x2 = x0;
      f2 = f0;
      step = x1 - x0;
      before = step;
    }
    if (Math.abs(f2) < Math.abs(f1)) {
      [x0, x1, x2] = [x1, x2, x1];
      [f0, f1, f2] = [f1, f2, f1];
    }
    const tolerance = 2 * EPSILON * Math.abs(x1) + 0.5 * relative * Math.abs(x1);
    const half = 0.5 * (x2 - x1);
    if (Math.abs(half) <= tolerance || f1 === 0) return x1;
    if (Math.abs(before) >= tolerance && Math.abs(f0) > Math.abs(f1)) {
      const s = f1 / f0;
      let p: number;
      let q: number;
      if (x0 === x2) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const r = f0 / f2;
        const t = f1 / f2;
        p = s * (2 * half * r * (r - t) - (x1 - x0) * (t - 1));
        q = (r - 1) * (t - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      if (2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(before * q))) {
        before = step;
        step = p / q;
      } else {
        step = half;
        before = half;
      }
    } else {
      step = half;
      before = half;
    }
    x0 = x1;
    f0 = f1;
    if (Math.abs(step) > tolerance) x1 += step;
    else x1 += half > 0 ? tolerance : -tolerance;
    f1 = f(x1);
  }
  return x1;
}

/** Root by halving; the sign at a is the one kept on a's side. */
export function bisect(f: (x: number) => number, a: number, b: number, halvings = 60): number {
  let low = a;
  let high = b;
  const below = f(a) > 0;
  for (let i = 0; i < halvings; i += 1) {
    const middle = 0.5 * (low + high);
    if (middle === low || middle === high) break;
    if (f(middle) > 0 === below) low = middle;
    else high = middle;
  }
  return 0.5 * (low + high);
}

const GOLDEN = 0.6180339887498949;

/** Place of the minimum of f between a and b by golden section, to a relative width. */
export function minimum(f: (x: number) => number, a: number, b: number, relative = 1e-9): number {
  let low = a;
  let high = b;
  let x1 = high - GOLDEN * (high - low);
  let x2 = low + GOLDEN * (high - low);
  let f1 = f(x1);
  let f2 = f(x2);
  for (let i = 0; i < 200 && high - low > relative * Math.abs(high); i += 1) {
    if (f1 <= f2) {
      high = x2;
      x2 = x1;
      f2 = f1;
      x1 = high - GOLDEN * (high - low);
      f1 = f(x1);
    } else {
      low = x1;
      x1 = x2;
      f1 = f2;
      x2 = low + GOLDEN * (high - low);
      f2 = f(x2);
    }
  }
  return 0.5 * (low + high);
}
