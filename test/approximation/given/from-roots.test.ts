import { describe, expect, it } from 'vitest';
import { fittedToData } from '../../../src/approximation/given/from-roots.js';
import {
  bandstop,
  bessel,
  butterworth,
  chebyshev,
  elliptic,
  generalizedChebyshev,
  inverseChebyshev,
  responseFromRoots,
} from '../../../src/approximation/index.js';
import type { Complex, FilterPolynomials } from '../../../src/forms/index.js';
import { FilterFailure } from '../../../src/numerics/index.js';
import { sweep } from '../../../src/response/index.js';
import { transversal } from '../../../src/synthesis/index.js';
import { errorOf, LOSSLESS, type LosslessCase, polynomialsOf } from '../../support/lossless-reference.js';
import { differenceOf, GRID, rootError } from './compare.js';

// Oracles: the closed forms of the families (their roots are computed on ways of their own), and the references of more than
// 100 digits in fixtures/reference, whose generator expands polynomials and shares nothing with this code.

const EPS = 2 ** -52;

const FAMILIES: readonly FilterPolynomials[] = [
  ...[1, 2, 3, 7, 12, 20, 40].map((order) => butterworth({ order })),
  ...[1, 2, 5, 12, 20].map((order) => chebyshev({ order, returnLossDb: 20 })),
  chebyshev({ order: 9, returnLossDb: 3 }),
  ...[1, 2, 5, 8, 12].map((order) => bessel({ order, edge: 'halfPower' })),
  bessel({ order: 7, edge: 'unitDelay' }),
  generalizedChebyshev({ order: 8, returnLossDb: 22, transmissionZeros: [1.2, -1.3, 1.8] }),
  generalizedChebyshev({ order: 4, returnLossDb: 22, transmissionZeros: [1.2, -1.3, 1.8, 3] }),
  generalizedChebyshev({
    order: 12,
    returnLossDb: 20,
    transmissionZeros: [{ re: 0.7, im: 0.1 }, { re: -0.7, im: 0.1 }, 1.4],
  }),
  inverseChebyshev({ order: 7, returnLossDb: 20, rejectionDb: 50 }),
  inverseChebyshev({ order: 6, returnLossDb: 20, rejectionDb: 50 }),
  elliptic({ order: 7, returnLossDb: 20, rejectionDb: 60 }),
];

const nameOf = ({ family, order }: FilterPolynomials): string => `${family} ${order}`;

/** What rounding of a pole can do to a double zero on the axis: power there is off by it, and grows with the curvature. */
const LIMIT = 1e-12;

describe('a response from its reflection and transmission zeros', () => {
  it.each(FAMILIES.map((each) => [nameOf(each), each] as const))('has the poles of %s', (_, family) => {
    const { reflectionZeros, transmissionZeros, epsilon, epsilonR, poles } = family;
    const found = responseFromRoots({ reflectionZeros, transmissionZeros, epsilon, epsilonR });
    const size = Math.max(...poles.map(({ re, im }) => Math.hypot(re, im)));
    expect(rootError(found.poles, poles)).toBeLessThan(LIMIT * size);
    expect(differenceOf(transversal(found), transversal(family))).toBeLessThan(LIMIT);
  });

  it('has those of a band stop', () => {
    const notch = bandstop(chebyshev({ order: 6, returnLossDb: 20 }));
    const { reflectionZeros, transmissionZeros, epsilonR, poles } = notch;
    const found = responseFromRoots({ reflectionZeros, transmissionZeros, epsilonR });
    expect(rootError(found.poles, poles)).toBeLessThan(LIMIT);
  });
});

describe('a response from its poles and transmission zeros', () => {
  it.each(FAMILIES.map((each) => [nameOf(each), each] as const))('has the reflection zeros of %s', (_, family) => {
    const { transmissionZeros, epsilon, poles, reflectionZeros } = family;
    const found = responseFromRoots({ poles, transmissionZeros, epsilon });
    const size = Math.max(...poles.map(({ re, im }) => Math.hypot(re, im)));
    expect(rootError(found.reflectionZeros, reflectionZeros)).toBeLessThan(LIMIT * size);
    expect(found.reflectionZeros.filter(({ re }) => re === 0)).toHaveLength(
      reflectionZeros.filter(({ re }) => re === 0).length,
    );
    expect(differenceOf(transversal(found), transversal(family))).toBeLessThan(LIMIT);
    expect(Math.max(...(found.moved.poles as number[]))).toBeLessThan(LIMIT * size);
  });

  it.each(['left', 'right', 'alternating'] as const)('puts zeros off the axis to the side asked for: %s', (side) => {
    const right = bessel({ order: 9, edge: 'halfPower', reflectionZeros: side });
    const { poles, epsilon } = right;
    const found = responseFromRoots({ poles, epsilon, reflectionZeros: side });
    expect(rootError(found.reflectionZeros, right.reflectionZeros)).toBeLessThan(LIMIT);
    const signs = right.reflectionZeros.map(({ re }) => (re > 0 ? 1 : -1));
    const signed = responseFromRoots({ poles, epsilon, reflectionZeros: signs });
    expect(rootError(signed.reflectionZeros, right.reflectionZeros)).toBeLessThan(LIMIT);
  });
});

/** Cases with simple reflection zeros of size 1, whose roots as doubles carry S to twelve digits. */
const SIMPLE = LOSSLESS.cases.filter(({ id, style, floor }) => id < 107 && style !== 'repeated' && floor < 1e-13);

describe('against references of more than 100 digits', () => {
  it('are eighty cases to order 40', () => {
    expect(SIMPLE.length).toBeGreaterThan(80);
    expect(Math.max(...SIMPLE.map(({ order }) => order))).toBe(40);
  });

  it.each(SIMPLE.map((each) => [each.id, each.order, each.style, each] as const))(
    'case %i, order %i, %s: poles from F and P',
    (_id, _order, _style, each) => {
      const { reflectionZeros, transmissionZeros, poles, epsilon, epsilonR, transmissionLead } = polynomialsOf(each);
      const found = responseFromRoots({ reflectionZeros, transmissionZeros, epsilon, epsilonR });
      const size = Math.max(...poles.map(({ re, im }) => Math.hypot(re, im)));
      expect(rootError(found.poles, poles)).toBeLessThan(LIMIT * size);
      expect(errorOf(transversal({ ...found, transmissionLead }), each)).toBeLessThan(limitOf(each));
    },
  );

  it.each(SIMPLE.map((each) => [each.id, each.order, each.style, each] as const))(
    'case %i, order %i, %s: reflection zeros from E and P',
    (_id, _order, _style, each) => {
      const { reflectionZeros, transmissionZeros, poles, epsilon } = polynomialsOf(each);
      const sorted = [...reflectionZeros].sort((a, b) => b.im - a.im);
      const signs = sorted.map(({ re }) => (re > 0 ? 1 : -1));
      const found = fittedToData({ poles, transmissionZeros, epsilon, reflectionZeros: signs });
      // Closer to the axis than rounding of the data moves it a zero is open: it may lie on it as well.
      const told = sorted.filter((zero) => roomFor(zero, each) < 0.25 * Math.abs(zero.re));
      const errors = told.map((zero) => nearest(found.reflectionZeros, zero) / roomFor(zero, each));
      expect(Math.max(0, ...errors)).toBeLessThan(1);
      counts.told += told.length;
      counts.all += sorted.length;
      const { omega, s21 } = each;
      const size = (re: ArrayLike<number>, im: ArrayLike<number>, n: number): number =>
        Math.hypot(re[n] as number, im[n] as number);
      const swept = sweep(found, omega);
      const worst = Math.max(
        ...omega.map((_, n) => Math.abs(size(swept.s21.re, swept.s21.im, n) - size(s21.re, s21.im, n))),
      );
      // Thirty-six zeros 1e-8 from the axis, which the data put on it, move |S21| by 1.2e-11; a hundred times less is usual.
      expect(worst).toBeLessThan(2e-11);
    },
  );

  it('from E and P are accepted only where S11 is right to 1e-6, and refused where the data leave it open', () => {
    let [accepted, refused] = [0, 0];
    for (const each of SIMPLE) {
      const { reflectionZeros, transmissionZeros, poles, epsilon, transmissionLead } = polynomialsOf(each);
      const signs = [...reflectionZeros].sort((a, b) => b.im - a.im).map(({ re }) => (re > 0 ? 1 : -1));
      try {
        const found = responseFromRoots({ poles, transmissionZeros, epsilon, reflectionZeros: signs });
        expect(errorOf(transversal({ ...found, transmissionLead }), each), `case ${each.id}`).toBeLessThan(1e-6);
        accepted += 1;
      } catch (error) {
        if (!(error instanceof FilterFailure)) throw error;
        expect(error.code).toBe('E_ILL_CONDITIONED');
        refused += 1;
      }
    }
    expect(accepted).toBeGreaterThan(40);
    expect(refused).toBeGreaterThan(5);
  });

  it('tell seven zeros of ten', () => {
    expect(counts.told / counts.all).toBeGreaterThan(0.7);
  });
});

/** What rounding of all poles moves the power by on the resonance where it does most, in units of eps. */
function largestRounding({ poles }: FilterPolynomials): number {
  const sums = poles.map(({ im }) =>
    poles.reduce((sum, pole) => sum + Math.hypot(pole.re, pole.im) / Math.hypot(pole.re, pole.im - im), 0),
  );
  return Math.max(...sums);
}

const counts = { told: 0, all: 0 };

const limitOf = (each: LosslessCase): number => Math.max(LIMIT, 4 * each.floor);

const nearest = (roots: readonly Complex[], { re, im }: Complex): number =>
  Math.min(...roots.map((root) => Math.hypot(root.re - re, root.im - im)));

/**
 * What rounding of the data moves a reflection zero by: the power |S11|^2 is known to eps times the sizes of the poles over their
 * distances, on the resonance where that is most; divided by its slope at the zero, the zero's own mirror image included. Its own rounding at least.
 */
function roomFor(zero: Complex, each: LosslessCase): number {
  const polynomials = polynomialsOf(each);
  const { poles, reflectionZeros, epsilonR } = polynomials;
  const to = (a: Complex, side: number): number => Math.hypot(zero.re - side * a.re, zero.im - a.im);
  let slope = 1 / epsilonR ** 2;
  poles.forEach((pole, n) => {
    const other = reflectionZeros[n] as Complex;
    const isSelf = other.re === zero.re && other.im === zero.im;
    slope *= ((isSelf ? 1 : to(other, 1)) * to(other, -1)) / (to(pole, 1) * to(pole, -1));
  });
  return (16 * EPS * largestRounding(polynomials)) / slope + 2 * EPS * Math.hypot(zero.re, zero.im);
}

describe('poles of so high a return loss that they leave reflection zeros open', () => {
  it.each([4, 8, 12])('give them to 1e-11 at 60 dB, and the right |S21| at 100 dB: order %i', (order) => {
    const level = chebyshev({ order, returnLossDb: 60 });
    const found = responseFromRoots({ poles: level.poles, epsilon: level.epsilon });
    expect(rootError(found.reflectionZeros, level.reflectionZeros)).toBeLessThan(1e-11);
    const high = chebyshev({ order, returnLossDb: 100 });
    expect(() => responseFromRoots({ poles: high.poles, epsilon: high.epsilon })).toThrow(
      /^E_ILL_CONDITIONED poles: found S11 off by/,
    );
    const open = sweep(fittedToData({ poles: high.poles, epsilon: high.epsilon }), GRID).s21;
    const right = sweep(high, GRID).s21;
    const off = GRID.map((_, n) =>
      Math.abs(
        Math.hypot(open.re[n] as number, open.im[n] as number) -
          Math.hypot(right.re[n] as number, right.im[n] as number),
      ),
    );
    expect(Math.max(...off)).toBeLessThan(2e-11);
  });
});
