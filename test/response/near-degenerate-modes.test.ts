import { expect, test } from 'vitest';
import { butterworth, chebyshev } from '../../src/approximation/index.js';
import { scatteringAt, sweep } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { arrow, folded } from '../../src/topology/index.js';

// A long chain between strong end couplings has resonances that live at one end each: even and odd ones coincide to rounding.

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

test.each(CASES)(
  'sweep(folded and arrow chebyshev %d at %d dB) equals that of the polynomials',
  (order, returnLossDb) => {
    const polynomials = chebyshev({ order, returnLossDb });
    const start = transversal(polynomials);
    const grid = [-1.2, -1, -0.5, 0, 0.3, 0.99, 1.1];
    for (const { matrix } of [folded(start), arrow(start)]) {
      for (const loss of [0, 1e-9, 1e-3]) {
        const ours = sweep(matrix, grid, { loss });
        const reference = sweep(polynomials, grid, { loss });
        grid.forEach((omega, n) => {
          for (const name of ['s11', 's21', 's22'] as const) {
            const [a, b] = [ours[name], reference[name]];
            expect(Math.hypot(a.re[n]! - b.re[n]!, a.im[n]! - b.im[n]!)).toBeLessThan(1e-11);
          }
          if (loss > 0) return;
          const { s21 } = scatteringAt(matrix, omega);
          expect(Math.hypot(ours.s21.re[n]! - s21.re, ours.s21.im[n]! - s21.im)).toBeLessThan(1e-11);
        });
      }
    }
  },
);
