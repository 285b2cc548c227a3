import { describe, expect, it } from 'vitest';
import { type Complex, complexEigenvalues } from '../../src/numerics/index.js';

const rows = (values: readonly (readonly number[])[]): Float64Array[] => values.map((row) => Float64Array.from(row));
const zeros = (n: number): Float64Array[] => Array.from({ length: n }, () => new Float64Array(n));

/** Largest distance from an expected value to its nearest computed one. */
function miss(found: readonly Complex[], expected: readonly Complex[]): number {
  return Math.max(...expected.map((e) => Math.min(...found.map((f) => Math.hypot(f.re - e.re, f.im - e.im)))));
}

describe('complexEigenvalues(matrix)', () => {
  it('gives the diagonal of a triangular matrix', () => {
    const found = complexEigenvalues({
      re: rows([
        [1, 5, 2],
        [0, -2, 7],
        [0, 0, 3],
      ]),
      im: rows([
        [1, 0, 4],
        [0, 0.5, 1],
        [0, 0, -2],
      ]),
    });
    const expected = [
      { re: 1, im: 1 },
      { re: -2, im: 0.5 },
      { re: 3, im: -2 },
    ];
    expect(miss(found, expected)).toBeLessThan(1e-14);
  });

  it('gives the roots of unity for a cyclic shift, where plain QR steps stand still', () => {
    const n = 6;
    const re = zeros(n);
    for (let i = 0; i < n; i += 1) re[(i + 1) % n]![i] = 1;
    const found = complexEigenvalues({ re, im: zeros(n) });
    const expected = Array.from({ length: n }, (_, k) => {
      const angle = (2 * Math.PI * k) / n;
      return { re: Math.cos(angle), im: Math.sin(angle) };
    });
    expect(miss(found, expected)).toBeLessThan(1e-14);
  });

  it('ends for a loaded synchronous three-resonator block rounded to four decimals', () => {
    const load = 1.0824 ** 2;
    const found = complexEigenvalues({
      re: rows([
        [0, 1.0303, 0],
        [1.0303, 0, 1.0303],
        [0, 1.0303, 0],
      ]),
      im: rows([
        [-load, 0, 0],
        [0, 0, 0],
        [0, 0, -load],
      ]),
    });
    const sum = found.reduce((total, { re, im }) => ({ re: total.re + re, im: total.im + im }), { re: 0, im: 0 });
    expect(Math.hypot(sum.re, sum.im + 2 * load)).toBeLessThan(1e-14);
    expect(miss(found, [{ re: 0, im: -load }])).toBeLessThan(1e-14);
  });

  it('takes a zero matrix and a matrix of one entry', () => {
    expect(complexEigenvalues({ re: zeros(4), im: zeros(4) })).toHaveLength(4);
    expect(complexEigenvalues({ re: rows([[2]]), im: rows([[-1]]) })).toEqual([{ re: 2, im: -1 }]);
  });
});
