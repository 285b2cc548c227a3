import { expect, test } from 'vitest';
import { butterworth, chebyshev } from '../../src/approximation/index.js';
import { scatteringAt, sweep } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { arrow, folded } from '../../src/topology/index.js';

test.each([20, 24, 30, 50, 100])('sweep(folded Butterworth %d) has delay 1/sin(pi/2N) at the center', (order) => {
  const { matrix } = folded(transversal(butterworth({ order })));
  expect(sweep(matrix, [0]).groupDelay[0]! * Math.sin(Math.PI / (2 * order))).toBeCloseTo(1, 11);
});

const CASES = [
  [40, 40],
  [50, 30],
  [60, 25],
  [100, 20],
  [64, 40],
] as const;

test.each(CASES)('sweep(folded and arrow chebyshev %d at %d dB) equals scatteringAt', (order, returnLossDb) => {
  const start = transversal(chebyshev({ order, returnLossDb }));
  const grid = [-1.2, -1, -0.5, 0, 0.3, 0.99, 1.1];
  for (const { matrix } of [folded(start), arrow(start)]) {
    for (const loss of [0, 1e-9]) {
      const { s11, s21 } = sweep(matrix, grid, { loss });
      grid.forEach((omega, n) => {
        const reference = scatteringAt(matrix, omega);
        expect(Math.hypot(s11.re[n]! - reference.s11.re, s11.im[n]! - reference.s11.im)).toBeLessThan(1e-6);
        expect(Math.hypot(s21.re[n]! - reference.s21.re, s21.im[n]! - reference.s21.im)).toBeLessThan(1e-6);
      });
    }
  }
});
