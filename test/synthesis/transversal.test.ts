import { describe, expect, test } from 'vitest';
import { butterworth, chebyshev, generalizedChebyshev } from '../../src/approximation/index.js';
import type { FilterPolynomials } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { folded } from '../../src/topology/index.js';
import { distance, entry, isSymmetric, responseGap, sharpness } from '../support/models.js';
import { LONG_SPECS, SPECS } from '../support/specs.js';

const FAMILIES: readonly (readonly [string, FilterPolynomials])[] = [
  ...[...SPECS, ...LONG_SPECS].map(([name, request]) => [name, generalizedChebyshev(request)] as const),
  ...[1, 2, 3, 8, 33].map((order) => [`Butterworth ${order}`, butterworth({ order })] as const),
];

describe.each(FAMILIES)('transversal(%s)', (_, polynomials) => {
  const matrix = transversal(polynomials);
  const { order } = polynomials;
  const nodes = Array.from({ length: order }, (__, k) => k + 1);

  test('has the complex S-parameters of the polynomials', () => {
    expect(responseGap(matrix, polynomials)).toBeLessThan(40 * order * EPS * sharpness(polynomials));
  });

  test('couples resonators to the ports only, with exact zeros elsewhere', () => {
    for (const i of nodes) for (const j of nodes) if (i !== j) expect(entry(matrix, i, j)).toBe(0);
    expect(entry(matrix, 0, 0)).toBe(0);
    expect(entry(matrix, order + 1, order + 1)).toBe(0);
    expect(isSymmetric(matrix)).toBe(true);
    expect(matrix.values.flat().some((value) => Object.is(value, -0))).toBe(false);
  });

  test('lists resonators by falling M_kk, with M_kL > 0 and |M_Sk| = M_kL', () => {
    for (const k of nodes) {
      if (k > 1) expect(entry(matrix, k, k)).toBeLessThanOrEqual(entry(matrix, k - 1, k - 1));
      expect(entry(matrix, k, order + 1)).toBeGreaterThan(0);
      expect(Math.abs(entry(matrix, 0, k))).toBe(entry(matrix, k, order + 1));
    }
  });

  test('has a direct coupling of (1/epsilon)/(1 + 1/epsilonR) for N finite zeros, and none for fewer', () => {
    const direct = Math.abs(entry(matrix, 0, order + 1));
    const { epsilon, epsilonR, transmissionZeros } = polynomials;
    if (transmissionZeros.length < order) expect(direct).toBe(0);
    else expect(direct).toBeCloseTo(1 / epsilon / (1 + 1 / epsilonR), 13);
    expect(matrix.finiteZeros).toBe(transmissionZeros.length);
  });

  test('has the sum of the poles as its trace', () => {
    // Poles are eigenvalues of -j*(M - C P^-1 C^T), P = the port block; its trace, real and imaginary.
    const sum = polynomials.poles.reduce((total, pole) => total - pole.re, 0);
    const total = nodes.reduce((acc, k) => acc + entry(matrix, 0, k) ** 2 + entry(matrix, k, order + 1) ** 2, 0);
    const direct = entry(matrix, 0, order + 1) ** 2;
    expect(total / (1 + direct) / sum).toBeCloseTo(1, 12);
    const trace = nodes.reduce((acc, k) => acc - entry(matrix, k, k), 0);
    const poles = polynomials.poles.reduce((acc, pole) => acc + pole.im, 0);
    const cross = nodes.reduce((acc, k) => acc + entry(matrix, 0, k) * entry(matrix, k, order + 1), 0);
    expect(Math.abs(trace + (2 * entry(matrix, 0, order + 1) * cross) / (1 + direct) - poles)).toBeLessThan(
      1e-12 * order,
    );
  });
});

test('transversal(Butterworth 1) is M_S1 = M_1L = 1/sqrt(2)', () => {
  const matrix = transversal(butterworth({ order: 1 }));
  expect(entry(matrix, 1, 1)).toBe(0);
  expect(entry(matrix, 1, 2)).toBeCloseTo(Math.SQRT1_2, 15);
  expect(Math.abs(entry(matrix, 0, 1))).toBe(entry(matrix, 1, 2));
});

test('transversal(all-pole) is the closed form at orders 2 and 3', () => {
  // In-line order 2: M_12 = m, M_S1 = r: eigenvalues +-m, each coupled r/sqrt(2).
  const second = transversal(butterworth({ order: 2 }));
  expect(entry(second, 1, 1)).toBeCloseTo(Math.SQRT1_2, 14);
  expect(entry(second, 2, 2)).toBeCloseTo(-Math.SQRT1_2, 14);
  expect(entry(second, 1, 3)).toBeCloseTo(2 ** -0.25 / Math.SQRT2, 14);
  // Order 3: M_12 = M_23 = sqrt(1/2), M_S1 = 1: eigenvalues 0, +-1; shares 1/2, 1/4, 1/4.
  const third = transversal(butterworth({ order: 3 }));
  [1, 0, -1].forEach((value, n) => {
    expect(entry(third, n + 1, n + 1)).toBeCloseTo(value, 14);
  });
  expect(entry(third, 2, 4)).toBeCloseTo(Math.SQRT1_2, 14);
  expect(entry(third, 1, 4)).toBeCloseTo(0.5, 14);
});

test('transversal(symmetric response) has exactly opposite diagonal entries and equal couplings', () => {
  for (const [name, request] of SPECS) {
    if (!/symmetric|-0|real pair|equalized|close|narrow/.test(name)) continue;
    const matrix = transversal(generalizedChebyshev(request));
    const { order } = request;
    for (let k = 1; k <= order; k++) {
      expect(entry(matrix, k, k) + entry(matrix, order + 1 - k, order + 1 - k)).toBe(0);
      expect(entry(matrix, k, order + 1)).toBe(entry(matrix, order + 1 - k, order + 1));
    }
  }
});

test('transversal(mirrored zeros) has the diagonal negated and the same couplings', () => {
  const zeros = [1.2, 1.9, -2.5];
  const one = transversal(generalizedChebyshev({ order: 7, returnLossDb: 21, transmissionZeros: zeros }));
  const two = transversal(
    generalizedChebyshev({ order: 7, returnLossDb: 21, transmissionZeros: zeros.map((w) => -w) }),
  );
  for (let k = 1; k <= 7; k++) {
    expect(Math.abs(entry(one, k, k) + entry(two, 8 - k, 8 - k))).toBeLessThan(20 * EPS);
    expect(Math.abs(entry(one, k, 8) - entry(two, 8 - k, 8))).toBeLessThan(20 * EPS);
  }
});

test('transversal does not write its argument, and poles may come in any order', () => {
  const response = generalizedChebyshev({ order: 5, returnLossDb: 20, transmissionZeros: [1.3] });
  const copy = structuredClone(response);
  const matrix = transversal(response);
  expect(response).toEqual(copy);
  const shuffled = transversal({ ...response, poles: [...response.poles].reverse() });
  expect(responseGap(matrix, shuffled)).toBeLessThan(1e-14);
  expect(distance({ re: entry(matrix, 1, 1), im: 0 }, { re: entry(shuffled, 1, 1), im: 0 })).toBeLessThan(1e-15);
});

test.each([
  [30, 34],
  [32, 31],
  [33, 30],
  [40, 24.879111523739994],
  [41, 37],
  [48, 35],
  [52, 34],
  [84, 29],
] as const)(
  'transversal(chebyshev %d at %d dB), whose outermost resonances coincide to rounding, has the response of the polynomials',
  (order, returnLossDb) => {
    const polynomials = chebyshev({ order, returnLossDb });
    const start = transversal(polynomials);
    expect(responseGap(start, polynomials)).toBeLessThan(1e-11);
    expect(responseGap(folded(start).matrix, polynomials)).toBeLessThan(1e-11);
  },
);
