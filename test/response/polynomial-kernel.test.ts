import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type FilterPolynomials, generalizedChebyshev, scatteringAt, sweep } from '../../src/index.js';
import { delayOfPolynomials, scatteringOfPolynomials } from '../../src/response/polynomial-response.js';

const EPS = 2 ** -52;

/** Roots anywhere: the kernel promises the products, whether or not they are lossless. */
function responseOf(roots: readonly number[], order: number, zeros: number): FilterPolynomials {
  const root = (n: number) => ({ re: roots[2 * n]! - 1, im: roots[2 * n + 1]! * 3 - 1.5 });
  return {
    family: 'lossless',
    order,
    poles: Array.from({ length: order }, (_, n) => ({ ...root(n), re: -0.001 - Math.abs(root(n).re) })),
    reflectionZeros: Array.from({ length: order }, (_, n) => root(n + order)),
    transmissionZeros: Array.from({ length: zeros }, (_, n) => root(n + 2 * order)),
    transmissionLead: { re: 0, im: 1 },
    epsilon: 1.5,
    epsilonR: 1.25,
  };
}

describe('sweep of a transfer function', () => {
  it('equals the product taken factor by factor to a few ulp a factor, any roots, loss and frequency', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 20 }),
        fc.integer({ min: 0, max: 20 }),
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 160, maxLength: 160 }),
        fc.constantFrom(0, 1e-6, 0.02, 1),
        fc.array(fc.double({ min: -6, max: 6, noNaN: true }), { minLength: 1, maxLength: 20 }),
        (order, asked, roots, loss, grid) => {
          const response = responseOf(roots, order, Math.min(asked, order));
          const curves = sweep(response, grid, { loss });
          grid.forEach((w, n) => {
            const point = scatteringOfPolynomials(response, { re: loss, im: w });
            for (const key of ['s11', 's21', 's22'] as const) {
              const size = Math.hypot(point[key].re, point[key].im);
              const apart = Math.hypot(curves[key].re[n]! - point[key].re, curves[key].im[n]! - point[key].im);
              expect(apart).toBeLessThanOrEqual(8 * order * EPS * size);
            }
            const delay = delayOfPolynomials(response, w, loss);
            const terms = response.poles.length + response.transmissionZeros.length;
            const scale = response.poles.reduce((sum, { re, im }) => sum + 1 / Math.hypot(loss - re, w - im), 1);
            if (loss === 0)
              expect(Math.abs(curves.groupDelay[n]! - delay)).toBeLessThanOrEqual(8 * terms * EPS * scale);
          });
        },
      ),
      { seed: 20261201, numRuns: 400 },
    );
  });

  it('holds at frequencies whose square leaves the range of doubles, and on a zero', () => {
    const response = generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [1.5, -2] });
    for (const w of [1e139, 1e141, -1e200, 1e308]) {
      const { s11, s21 } = sweep(response, [w]);
      expect(Math.hypot(s11.re[0]!, s11.im[0]!)).toBeCloseTo(1, 12);
      expect(Math.hypot(s21.re[0]!, s21.im[0]!)).toBeLessThan(1e-250);
    }
    const { s21, groupDelay } = sweep(response, [1.5]);
    expect([s21.re[0]!, s21.im[0]!].map(Math.abs)).toEqual([0, 0]);
    expect(groupDelay[0]).toBeGreaterThan(0);
    const same = scatteringAt(response, 0.3).s21;
    expect(Math.abs(sweep(response, [0.3]).s21.re[0]! - same.re)).toBeLessThan(1e-15);
  });
});
