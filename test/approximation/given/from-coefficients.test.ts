import { describe, expect, it } from 'vitest';
import {
  bessel,
  butterworth,
  chebyshev,
  coefficients,
  generalizedChebyshev,
  responseFromCoefficients,
  responseFromRoots,
} from '../../../src/approximation/index.js';
import type { Complex, FilterPolynomials, FineRoot } from '../../../src/forms/index.js';
import { transversal } from '../../../src/synthesis/index.js';
import { differenceOf, rootError } from './compare.js';

// Oracles: closed forms of the families, through their expanded coefficients.

const FAMILIES: readonly FilterPolynomials[] = [
  ...[1, 2, 5, 8].map((order) => butterworth({ order })),
  ...[1, 2, 5, 8].map((order) => chebyshev({ order, returnLossDb: 20 })),
  ...[1, 2, 5, 8].map((order) => bessel({ order, edge: 'halfPower' })),
  generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.3, -1.7, 2.5] }),
  generalizedChebyshev({ order: 4, returnLossDb: 22, transmissionZeros: [1.2, -1.3, 1.8, 3] }),
  generalizedChebyshev({
    order: 5,
    returnLossDb: 22,
    transmissionZeros: [
      { re: 0.8, im: 0.2 },
      { re: -0.8, im: 0.2 },
    ],
  }),
];

const NAMED = FAMILIES.map((each) => [`${each.family} ${each.order}`, each] as const);

const times = (list: readonly Complex[], by: Complex): readonly Complex[] =>
  list.map(({ re, im }) => ({ re: re * by.re - im * by.im, im: re * by.im + im * by.re }));

describe('a response from coefficients', () => {
  it.each(NAMED)('is that of the roots: %s', (_, family) => {
    const found = responseFromCoefficients(coefficients(family));
    expect(rootError(found.poles, family.poles)).toBeLessThan(1e-11);
    expect(differenceOf(transversal(found), transversal(family))).toBeLessThan(1e-11);
  });

  it.each(NAMED)('may have any leading coefficients and a common phase: %s', (_, family) => {
    const { e, f, p, epsilon, epsilonR } = coefficients(family);
    const turn = { re: 0.6, im: 0.8 };
    const found = responseFromCoefficients({
      e: times(e, { re: 3, im: 0 }),
      f: times(f, { re: 2 * turn.re, im: 2 * turn.im }),
      p: times(p, { re: 5 * turn.re, im: 5 * turn.im }),
      epsilon: (epsilon * 5) / 3,
      epsilonR: (epsilonR * 2) / 3,
    });
    expect(differenceOf(transversal(found), transversal(family))).toBeLessThan(1e-11);
  });

  it.each(NAMED)('needs only two of the three: %s', (_, family) => {
    const { e, f, p, epsilon, epsilonR } = coefficients(family);
    const side = family.family === 'bessel' ? 'left' : undefined;
    const without = responseFromCoefficients({
      e,
      p,
      epsilon,
      ...(side === undefined ? {} : { reflectionZeros: side }),
    });
    expect(differenceOf(transversal(without), transversal(family))).toBeLessThan(1e-9);
    const found = responseFromCoefficients({ f, p, epsilon, epsilonR });
    expect(differenceOf(transversal(found), transversal(family))).toBeLessThan(1e-11);
  });

  const flat = { e: [1, Math.SQRT2, 1], f: [0, 0, 1], epsilon: 1, epsilonR: 1 };

  it.each([
    ['poles on the right', { ...flat, e: [1, -Math.SQRT2, 1] }, 'E_NOT_HURWITZ'],
    ['a P off para-conjugate', { ...flat, p: [1, 1] }, 'E_NOT_RECIPROCAL'],
    ['a P of another phase', { ...flat, p: [{ re: 0.8, im: 0.6 }] }, 'E_NOT_RECIPROCAL'],
    ['a power that does not balance', { ...flat, p: [{ re: 0, im: 1 }], epsilon: 1.1 }, 'E_NOT_LOSSLESS'],
    ['a last coefficient of 0', { ...flat, e: [1, 1, 0] }, 'E_POLYNOMIALS'],
    ['no list', { ...flat, e: 3 }, 'E_TYPE'],
    ['what is no number', { ...flat, f: [0, Number.NaN, 1] }, 'E_NOT_FINITE'],
  ])('refuses %s', (_, request, code) => {
    expect(() => responseFromCoefficients(request as never)).toThrow(expect.objectContaining({ code }));
  });
});

const rounded = (roots: readonly FineRoot[], digits: number): readonly Complex[] =>
  roots.map(({ re, im }) => ({ re: Number(re.toPrecision(digits)), im: Number(im.toPrecision(digits)) }));

describe('all three kinds of roots', () => {
  it.each(NAMED)('of six digits are refitted to a lossless response, and the moves are told: %s', (_, family) => {
    const poles = rounded(family.poles, 6);
    const found = responseFromRoots({
      poles,
      reflectionZeros: rounded(family.reflectionZeros, 6),
      transmissionZeros: rounded(family.transmissionZeros, 6),
      epsilon: Number(family.epsilon.toPrecision(6)),
      epsilonR: Number(family.epsilonR.toPrecision(6)),
    });
    expect(() => transversal(found)).not.toThrow();
    expect(differenceOf(transversal(found), transversal(family))).toBeLessThan(1e-4);
    const moved = found.moved.poles as readonly number[];
    // Told moves are those from the nearest given pole.
    found.poles.forEach((pole, n) => {
      const nearest = Math.min(...poles.map(({ re, im }) => Math.hypot(re - pole.re, im - pole.im)));
      expect(Math.abs((moved[n] as number) - nearest)).toBeLessThan(1e-15);
    });
    expect(Math.max(...moved)).toBeLessThan(1e-4);
  });

  it.each(NAMED)('are refused with the size when they contradict each other: %s', (_, family) => {
    const { poles, reflectionZeros, transmissionZeros, epsilon, epsilonR } = family;
    const off = poles.map(({ re, im }) => ({ re: re * 1.01, im }));
    const request = { poles: off, reflectionZeros, transmissionZeros, epsilon, epsilonR };
    expect(() => responseFromRoots(request)).toThrow(/E_NOT_LOSSLESS roots: found a power balance off by 0\.0/);
    expect(responseFromRoots({ ...request, tolerance: 0.2 }).order).toBe(family.order);
  });

  it.each(NAMED)('without reflection zeros, of nine digits, put them on the axis: %s', (_, family) => {
    const found = responseFromRoots({
      poles: rounded(family.poles, 9),
      transmissionZeros: rounded(family.transmissionZeros, 9),
      epsilon: Number(family.epsilon.toPrecision(9)),
      tolerance: 1e-6,
    });
    expect(() => transversal(found)).not.toThrow();
    // S11 goes with the root of what the power is off by.
    expect(differenceOf(transversal(found), transversal(family))).toBeLessThan(1e-3);
  });

  const flat = butterworth({ order: 2 });

  it.each([
    ['no constant', { poles: flat.poles }, 'E_TYPE'],
    ['too much power', { poles: flat.poles, epsilon: 0.9 }, 'E_NOT_LOSSLESS'],
    ['a pole on the right', { poles: [{ re: 0.1, im: 0 }], epsilon: 1 }, 'E_NOT_HURWITZ'],
    ['an unpaired zero', { poles: flat.poles, epsilon: 1, transmissionZeros: [{ re: 1, im: 0 }] }, 'E_NOT_RECIPROCAL'],
    [
      'a common zero',
      { reflectionZeros: [0, 1].map((im) => ({ re: 0, im })), transmissionZeros: [1], epsilon: 1 },
      'E_NOT_HURWITZ',
    ],
    ['a side of no name', { poles: flat.poles, epsilon: 1, reflectionZeros: 'up' }, 'E_CHOICE'],
    ['signs of another number', { poles: flat.poles, epsilon: 1, reflectionZeros: [1] }, 'E_CHOICE'],
    ['too many zeros', { poles: flat.poles, epsilon: 1, transmissionZeros: [1, 2, 3] }, 'E_POLYNOMIALS'],
    ['no roots', { reflectionZeros: [], epsilon: 1 }, 'E_POLYNOMIALS'],
    ['epsilon 1 with full zeros', { poles: flat.poles, epsilon: 1, transmissionZeros: [2, -2] }, 'E_NOT_LOSSLESS'],
    [
      'constants that contradict',
      { reflectionZeros: [{ re: 0, im: 0 }], transmissionZeros: [2], epsilon: 2, epsilonR: 2 },
      'E_NOT_LOSSLESS',
    ],
    ['what is no object', undefined, 'E_TYPE'],
  ])('refuse %s', (_, request, code) => {
    expect(() => responseFromRoots(request as never)).toThrow(expect.objectContaining({ code }));
  });
});
