import { at } from './cells';

/**
 * Inverts a small complex matrix in place (n x n, row by row, real and imaginary parts apart) by Gauss-Jordan steps with
 * pivoting on |re| + |im|. Nothing is allocated; `order` keeps n row numbers.
 * @returns false where a pivot is zero
 */
export function invertComplex(n: number, re: Float64Array, im: Float64Array, order: Int32Array): boolean {
  for (let column = 0; column < n; column += 1) {
    let pivot = column;
    let largest = -1;
    for (let row = column; row < n; row += 1) {
      const size = Math.abs(at(re, row * n + column)) + Math.abs(at(im, row * n + column));
      if (size > largest) {
        largest = size;
        pivot = row;
      }
    }
    if (!(largest > 0)) return false;
    order[column] = pivot;
    if (pivot !== column) swapRows(n, re, im, pivot, column);
    const pr = at(re, column * n + column);
    const pi = at(im, column * n + column);
    const size = pr * pr + pi * pi;
    const ir = pr / size;
    const ii = -pi / size;
    re[column * n + column] = 1;
    im[column * n + column] = 0;
    for (let k = 0; k < n; k += 1) {
      const ar = at(re, column * n + k);
      const ai = at(im, column * n + k);
      re[column * n + k] = ar * ir - ai * ii;
      im[column * n + k] = ar * ii + ai * ir;
    }
    for (let row = 0; row < n; row += 1) {
      if (row === column) continue;
      const fr = at(re, row * n + column);
      const fi = at(im, row * n + column);
      re[row * n + column] = 0;
      im[row * n + column] = 0;
      for (let k = 0; k < n; k += 1) {
        const ar = at(re, column * n + k);
        const ai = at(im, column * n + k);
        re[row * n + k] = at(re, row * n + k) - (fr * ar - fi * ai);
        im[row * n + k] = at(im, row * n + k) - (fr * ai + fi * ar);
      }
    }
  }
  for (let column = n - 1; column >= 0; column -= 1) {
    const pivot = order[column] ?? column;
    if (pivot === column) continue;
    for (let row = 0; row < n; row += 1) {
      const a = row * n + column;
      const b = row * n + pivot;
      const r = at(re, a);
      const i = at(im, a);
      re[a] = at(re, b);
      im[a] = at(im, b);
      re[b] = r;
      im[b] = i;
    }
  }
  return true;
}

function swapRows(n: number, re: Float64Array, im: Float64Array, first: number, second: number): void {
  for (let k = 0; k < n; k += 1) {
    const r = at(re, first * n + k);
    const i = at(im, first * n + k);
    re[first * n + k] = at(re, second * n + k);
    im[first * n + k] = at(im, second * n + k);
    re[second * n + k] = r;
    im[second * n + k] = i;
  }
}
