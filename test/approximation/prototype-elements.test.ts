import { describe, expect, test } from 'vitest';
import { delayLadder } from '../../src/approximation/bessel/bessel-ladder.js';
import {
  bessel,
  butterworth,
  chebyshev,
  inlineMatrix,
  type PrototypeRequest,
  prototypeElements,
} from '../../src/approximation/index.js';
import type { FilterPolynomials } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { scatteringAt } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { arrow, folded } from '../../src/topology/index.js';
import { entry, matrixGap, responseGap, size } from '../support/models.js';

const ORDERS = [1, 2, 3, 4, 5, 8, 13, 20, 25, 30];

const FAMILIES: readonly (readonly [
  string,
  (order: number) => PrototypeRequest,
  (order: number) => FilterPolynomials,
])[] = [
  ['butterworth', (order) => ({ family: 'butterworth', order }), (order) => butterworth({ order })],
  [
    'chebyshev 20 dB',
    (order) => ({ family: 'chebyshev', order, returnLossDb: 20 }),
    (order) => chebyshev({ order, returnLossDb: 20 }),
  ],
  [
    'chebyshev 0.5 dB',
    (order) => ({ family: 'chebyshev', order, rippleDb: 0.5 }),
    (order) => chebyshev({ order, returnLossDb: -10 * Math.log10(-Math.expm1((-0.5 * Math.LN10) / 10)) }),
  ],
  ['bessel', (order) => ({ family: 'bessel', order }), (order) => bessel({ order, edge: 'halfPower' })],
];

describe.each(FAMILIES)('%s: the matrix of the ladder', (_, requestOf, polynomialsOf) => {
  test.each(ORDERS)('order %d is that of the polynomials, entry by entry', (order) => {
    const ladder = inlineMatrix(prototypeElements(requestOf(order)));
    const start = transversal(polynomialsOf(order));
    expect(matrixGap(folded(start).matrix, ladder)).toBeLessThan(1e-12);
    expect(matrixGap(arrow(start).matrix, ladder)).toBeLessThan(1e-12);
  });

  test.each(ORDERS)('order %d has complex S11 and S21 of the polynomials', (order) => {
    const ladder = inlineMatrix(prototypeElements(requestOf(order)));
    expect(responseGap(ladder, polynomialsOf(order))).toBeLessThan(1e-11);
  });
});

test('second-order Butterworth: 0.8409, 0.7071, 0.8409 (common practice, no source)', () => {
  const matrix = inlineMatrix(prototypeElements({ family: 'butterworth', order: 2 }));
  ['0.8409', '0.7071', '0.8409'].forEach((printed, i) => {
    expect(Math.abs(entry(matrix, i, i + 1) - Number(printed))).toBeLessThan(5e-5);
  });
});

test('first-order Bessel: couplings 1/sqrt(2), |S21| = 1/|s + 1|', () => {
  const matrix = inlineMatrix(prototypeElements({ family: 'bessel', order: 1 }));
  expect(entry(matrix, 0, 1)).toBeCloseTo(Math.SQRT1_2, 15);
  expect(entry(matrix, 1, 2)).toBeCloseTo(Math.SQRT1_2, 15);
  for (const omega of [0, 0.5, 1, 3])
    expect(size(scatteringAt(matrix, omega).s21)).toBeCloseTo(1 / Math.hypot(1, omega), 14);
});

test('even-order Chebyshev ladders end in the load that their ripple needs', () => {
  // At omega = 0 the ladder is its two terminations: 4r/(1 + r)^2 is the power at a ripple trough.
  for (const rippleDb of [0.01, 0.5, 3]) {
    const load = prototypeElements({ family: 'chebyshev', order: 6, rippleDb }).values.at(-1)!;
    expect(-10 * Math.log10((4 * load) / (1 + load) ** 2)).toBeCloseTo(rippleDb, 12);
  }
});

test('flat-delay ladders do not depend on the number of bits', () => {
  for (const order of [10, 20, 30]) {
    const [usual, long] = [delayLadder(order), delayLadder(order, 2000)];
    usual.forEach((value, i) => {
      expect(Math.abs(value / long[i]! - 1)).toBeLessThan(2 * EPS);
    });
    // Perfect match at omega = 0, where each ladder of delay 1 has (sum of its elements)/2.
    expect(usual.reduce((sum, value) => sum + value, 0)).toBeCloseTo(2, 13);
  }
});

test.each([
  [{ family: 'butterworth', order: 31 }, 'E_ORDER_RANGE'],
  [{ family: 'other', order: 3 }, 'E_CHOICE'],
  [{ family: 'chebyshev', order: 3 }, 'E_MISSING'],
  [{ family: 'chebyshev', order: 3, rippleDb: 0.1, returnLossDb: 20 }, 'E_CHOICE'],
  [{ family: 'chebyshev', order: 3, rippleDb: 0 }, 'E_RIPPLE_RANGE'],
  [{ family: 'bessel', order: 3, edge: 'x' }, 'E_CHOICE'],
  [undefined, 'E_TYPE'],
])('prototypeElements refuses %j with %s', (request, code) => {
  expect(() => prototypeElements(request as PrototypeRequest)).toThrowError(expect.objectContaining({ code }));
});

test.each([
  [undefined, 'E_TYPE'],
  [{ values: [1, 1] }, 'E_TYPE'],
  [{ values: [1, 0, 1] }, 'E_ELEMENT'],
  [{ values: [1, Number.NaN, 1] }, 'E_ELEMENT'],
])('inlineMatrix refuses %j with %s', (elements, code) => {
  expect(() => inlineMatrix(elements as { values: number[] })).toThrowError(expect.objectContaining({ code }));
});
