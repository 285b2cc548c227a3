import { describe, expect, it } from 'vitest';
import {
  bessel,
  butterworth,
  chebyshev,
  elliptic,
  generalizedChebyshev,
  inverseChebyshev,
  responseFromMagnitude,
} from '../../../src/approximation/index.js';
import type { FilterPolynomials } from '../../../src/forms/index.js';
import { transversal } from '../../../src/synthesis/index.js';
import { differenceOf, rootError, squareRootsOf } from './compare.js';

// Oracles: closed forms of the families.

const FAMILIES: readonly FilterPolynomials[] = [
  ...[1, 2, 5, 12, 20].map((order) => butterworth({ order })),
  ...[1, 2, 5, 8, 12].map((order) => chebyshev({ order, returnLossDb: 20 })),
  ...[1, 2, 5, 12].map((order) => bessel({ order, edge: 'halfPower' })),
  generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.3, -1.3] }),
  generalizedChebyshev({
    order: 6,
    returnLossDb: 22,
    transmissionZeros: [
      { re: 0.9, im: 0 },
      { re: -0.9, im: 0 },
    ],
  }),
  generalizedChebyshev({
    order: 8,
    returnLossDb: 20,
    transmissionZeros: [
      { re: 0.7, im: 0.4 },
      { re: -0.7, im: 0.4 },
      { re: 0.7, im: -0.4 },
      { re: -0.7, im: -0.4 },
    ],
  }),
  inverseChebyshev({ order: 6, returnLossDb: 20, rejectionDb: 50 }),
  elliptic({ order: 7, returnLossDb: 20, rejectionDb: 60 }),
];

/** Ascending coefficients of a product of two polynomials. */
const product = (a: readonly number[], b: readonly number[]): readonly number[] =>
  Array.from({ length: a.length + b.length - 1 }, (_, k) =>
    a.reduce((sum, value, i) => sum + value * (b[k - i] ?? 0), 0),
  );

/** Chebyshev polynomials by their recursion, whole numbers. */
function chebyshevPolynomial(order: number): readonly number[] {
  let [last, now]: [readonly number[], readonly number[]] = [[1], [0, 1]];
  for (let n = 1; n < order; n++) {
    const next = [0, ...now.map((each) => 2 * each)].map((each, k) => each - (last[k] ?? 0));
    [last, now] = [now, next];
  }
  return now;
}

describe('a response from |S21|^2', () => {
  it.each(FAMILIES.map((each) => [`${each.family} ${each.order}`, each] as const))('by roots: %s', (_, family) => {
    const found = responseFromMagnitude(squareRootsOf(family));
    const size = Math.max(...family.poles.map(({ re, im }) => Math.hypot(re, im)));
    expect(rootError(found.poles, family.poles)).toBeLessThan(1e-12 * size);
    expect(rootError(found.reflectionZeros, family.reflectionZeros)).toBeLessThan(1e-12 * size);
    expect(rootError(found.transmissionZeros, family.transmissionZeros)).toBeLessThan(1e-12);
    const turned = { ...found, transmissionLead: family.transmissionLead };
    expect(differenceOf(transversal(turned), transversal(family))).toBeLessThan(1e-12);
  });

  it.each([1, 2, 3, 8, 20])('by coefficients: maximally flat of order %i', (order) => {
    const coefficients = [1, ...new Array<number>(order - 1).fill(0), 1];
    const found = responseFromMagnitude({ numerator: { coefficients: [1] }, denominator: { coefficients } });
    const right = butterworth({ order });
    expect(rootError(found.poles, right.poles)).toBeLessThan(1e-12);
    expect(found.reflectionZeros.every(({ re, im }) => re === 0 && im === 0)).toBe(true);
    expect(differenceOf(transversal(found), transversal(right))).toBeLessThan(1e-12);
  });

  it.each([
    [2, 1e-12],
    [3, 1e-12],
    [5, 1e-12],
    [8, 1e-9],
  ])('by coefficients: equal ripple of order %i', (order, limit) => {
    // 1 + kappa^2 T_N^2; its terms cancel by 2^(2N) or so in the band, which is what the limit grows by.
    const level = 1 / (10 ** 2 - 1);
    const square = product(chebyshevPolynomial(order), chebyshevPolynomial(order)).filter((_, k) => k % 2 === 0);
    const coefficients = square.map((each, k) => level * each + (k === 0 ? 1 : 0));
    const found = responseFromMagnitude({ numerator: { coefficients: [1] }, denominator: { coefficients } });
    const right = chebyshev({ order, returnLossDb: 20 });
    expect(rootError(found.poles, right.poles)).toBeLessThan(limit);
    expect(rootError(found.reflectionZeros, right.reflectionZeros)).toBeLessThan(limit);
    expect(differenceOf(transversal(found), transversal(right))).toBeLessThan(limit);
  });

  it('by coefficients with attenuation zeros', () => {
    // |S21|^2 = (4 - x)^2 / ((4 - x)^2 + x^3): third order, zeros at +-2, three reflection zeros at 0.
    const found = responseFromMagnitude({
      numerator: { coefficients: [16, -8, 1] },
      denominator: { coefficients: [16, -8, 1, 1] },
    });
    expect(
      rootError(found.transmissionZeros, [
        { re: 0, im: 2 },
        { re: 0, im: -2 },
      ]),
    ).toBeLessThan(1e-14);
    expect(
      rootError(
        found.reflectionZeros,
        [0, 0, 0].map(() => ({ re: 0, im: 0 })),
      ),
    ).toBeLessThan(1e-14);
  });

  const flat = { coefficients: [1, 0, 1] };

  it.each([
    ['more than all power', { numerator: { coefficients: [2] }, denominator: flat }, 'E_NOT_LOSSLESS'],
    ['a negative power', { numerator: { coefficients: [-1] }, denominator: flat }, 'E_NOT_LOSSLESS'],
    [
      'a simple root',
      { numerator: { coefficients: [4, 1] }, denominator: { coefficients: [4, 1, 1] } },
      'E_NOT_RECIPROCAL',
    ],
    [
      'no square',
      { numerator: { coefficients: [4, 1, 1] }, denominator: { coefficients: [4, 1, 1, 1] } },
      'E_NOT_RECIPROCAL',
    ],
    [
      'simple roots',
      { numerator: { roots: [4, 5] }, denominator: { roots: [-1, -2, -3], lead: 100 } },
      'E_NOT_RECIPROCAL',
    ],
    ['a pole on the axis', { numerator: { roots: [] }, denominator: { roots: [1] } }, 'E_NOT_HURWITZ'],
    [
      'a root without conjugate',
      { numerator: { roots: [] }, denominator: { roots: [{ re: 1, im: 1 }] } },
      'E_POLYNOMIALS',
    ],
    ['nothing', {}, 'E_TYPE'],
  ])('refuses %s', (_, request, code) => {
    expect(() => responseFromMagnitude(request as never)).toThrow(expect.objectContaining({ code }));
  });
});
