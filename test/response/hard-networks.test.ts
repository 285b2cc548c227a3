import { expect, test } from 'vitest';
import { chebyshev, folded, scatteringAt, sweep, transversal } from '../../src/index.js';
import { solvePoint } from '../../src/response/direct-solve.js';
import { rowsOf } from '../../src/topology/index.js';

// Networks on which a sweep was silently wrong, or had no number, once.

const order6 = folded(transversal(chebyshev({ order: 6, returnLossDb: 20 }))).matrix;

test('sweep at a resonance that no port sees has the delay of its neighborhood', () => {
  const values = [
    [0, 1, 0, 0, 0],
    [1, 0.1, 0.7, 0.3, 1],
    [0, 0.7, 0.3, 0, 0],
    [0, 0.3, 0, 0.3, 0],
    [0, 1, 0, 0, 0],
  ];
  const { groupDelay } = sweep({ order: 3, values }, [-0.3, -0.3 + 1e-9]);
  expect(groupDelay[0]).toBeCloseTo(groupDelay[1] as number, 6);
  expect(groupDelay[0]).toBeCloseTo(3.448, 3);
});

test.each([1e-3, 1e-6, 1e-8, 1e-10, 1e-12])(
  'sweep(matrix, 0) with losses near %d, one a resonator, equals a solve with pivoting',
  (small) => {
    const loss = Float64Array.from({ length: 6 }, (_, n) => small * (1 + n / 10));
    const swept = sweep(order6, [0, 1e-9, 0.5], { loss });
    [0, 1e-9, 0.5].forEach((omega, n) => {
      const { s11, s21, groupDelay } = solvePoint({ rows: rowsOf(order6), loss }, omega);
      expect(Math.hypot((swept.s11.re[n] as number) - s11.re, (swept.s11.im[n] as number) - s11.im)).toBeLessThan(
        1e-12,
      );
      expect(Math.hypot((swept.s21.re[n] as number) - s21.re, (swept.s21.im[n] as number) - s21.im)).toBeLessThan(
        1e-12,
      );
      expect(Math.abs((swept.groupDelay[n] as number) / groupDelay - 1)).toBeLessThan(1e-9);
    });
  },
);

test.each([1e3, 1e5, 1e8])('sweep is right beside a resonator detuned by %d', (far) => {
  const values = [
    [0, 1, 0, 0, 0],
    [1, 0, 0.8, 0, 0],
    [0, 0.8, 0, 0, 0.5],
    [0, 0, 0, far, 0],
    [0, 0, 0.5, 0, 0],
  ];
  const matrix = { order: 3, values };
  const swept = sweep(matrix, [0.3, -1]);
  [0.3, -1].forEach((omega, n) => {
    const { s11, s22 } = scatteringAt(matrix, omega);
    expect(Math.abs((swept.s11.re[n] as number) - s11.re)).toBeLessThan(1e-13);
    expect(Math.abs((swept.s22.re[n] as number) - s22.re)).toBeLessThan(1e-13);
  });
});

test('a network without couplings reflects everything, at its resonances too', () => {
  const matrix = {
    order: 1,
    values: [
      [0, 0, 0],
      [0, 0, 0],
      [0, 0, 0],
    ],
  };
  for (const omega of [0, 1e-200, 1]) expect(scatteringAt(matrix, omega).s11.re).toBe(1);
  expect(sweep(matrix, [0, 1]).s21.re).toEqual(Float64Array.of(0, 0));
});

test.each([1e9, 1e150, 1e-170, Number.MIN_VALUE])('an entry of %d is refused', (value) => {
  const values = [
    [0, value, 0],
    [value, 0, 1],
    [0, 1, 0],
  ];
  expect(() => sweep({ order: 1, values }, [0])).toThrowError(expect.objectContaining({ code: 'E_ENTRY_RANGE' }));
});
