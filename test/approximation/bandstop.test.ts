import { describe, expect, test } from 'vitest';
import {
  bandstop,
  bessel,
  butterworth,
  chebyshev,
  elliptic,
  generalizedChebyshev,
  inverseChebyshev,
} from '../../src/approximation/index.js';
import { certify } from '../../src/certification/index.js';
import type { FilterPolynomials } from '../../src/forms/index.js';
import { scatteringAt } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { folded } from '../../src/topology/index.js';
import { energyDefect, entry, responseGap, size } from '../support/models.js';

const GIVEN: readonly (readonly [string, FilterPolynomials])[] = [
  ['chebyshev 2', chebyshev({ order: 2, returnLossDb: 20 })],
  ['chebyshev 4', chebyshev({ order: 4, returnLossDb: 20 })],
  ['chebyshev 12', chebyshev({ order: 12, returnLossDb: 26 })],
  ['butterworth 6', butterworth({ order: 6 })],
  ['two zeros', generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.8] })],
  ['one zero', generalizedChebyshev({ order: 5, returnLossDb: 22, transmissionZeros: [1.45] })],
  ['fully canonical', generalizedChebyshev({ order: 3, returnLossDb: 20, transmissionZeros: [1.5, 3, -2] })],
  ['elliptic 6', elliptic({ order: 6, returnLossDb: 20, rejectionDb: 40 })],
  ['inverse Chebyshev 4', inverseChebyshev({ order: 4, returnLossDb: 20, rejectionDb: 40 })],
];

describe.each(GIVEN)('bandstop of %s', (_, given) => {
  const stop = bandstop(given);

  test('has the magnitudes of the given response, exchanged, and its power balances', () => {
    for (const omega of [-3, -1, -0.4, 0, 0.123, 0.9, 1, 1.4, 7]) {
      const [before, after] = [scatteringAt(given, omega), scatteringAt(stop, omega)];
      expect(Math.abs(size(after.s11) - size(before.s21))).toBeLessThan(1e-13);
      expect(Math.abs(size(after.s21) - size(before.s11))).toBeLessThan(1e-13);
    }
    expect(energyDefect(stop)).toBeLessThan(1e-12);
  });

  test('is unitary: S11 conj(S21) + S21 conj(S22) = 0', () => {
    for (const omega of [-2, -0.3, 0.77, 1.2]) {
      const { s11, s21, s22 } = scatteringAt(stop, omega);
      const re = s11.re * s21.re + s11.im * s21.im + s21.re * s22.re + s21.im * s22.im;
      const im = s11.im * s21.re - s11.re * s21.im + s21.im * s22.re - s21.re * s22.im;
      expect(Math.hypot(re, im)).toBeLessThan(1e-13);
    }
  });

  test('has a fully canonical matrix with the same complex response, certified', () => {
    const { matrix } = folded(transversal(stop));
    expect(responseGap(matrix, stop)).toBeLessThan(1e-11);
    const direct = entry(matrix, 0, stop.order + 1);
    // All power passes at infinite frequency, or as much as the given response reflects there.
    const through = given.transmissionZeros.length < given.order ? 1 : 1 / given.epsilonR;
    expect((2 * direct) / (1 + direct * direct)).toBeCloseTo(through, 12);
    const failed = certify(stop, matrix).filter(({ holds }) => !holds);
    expect(failed.map(({ check }) => check)).toEqual([]);
  });
});

test.each(GIVEN.filter(([, { order, transmissionZeros }]) => transmissionZeros.length === order))(
  'bandstop of the band-stop response of %s is the response itself, up to the sign of S21',
  (_, given) => {
    const back = bandstop(bandstop(given));
    for (const omega of [-2, -0.3, 0.77, 1.2]) {
      const [before, after] = [scatteringAt(given, omega), scatteringAt(back, omega)];
      expect(Math.hypot(after.s11.re - before.s11.re, after.s11.im - before.s11.im)).toBeLessThan(1e-13);
      expect(Math.abs(size(after.s21) - size(before.s21))).toBeLessThan(1e-13);
    }
  },
);

test.each([
  ['flat delay', bessel({ order: 4, edge: 'halfPower' }), 'E_NOT_RECIPROCAL'],
  ['alternating zeros', bessel({ order: 5, edge: 'halfPower', reflectionZeros: 'alternating' }), 'E_NOT_RECIPROCAL'],
  ['an odd number of zeros at infinity', chebyshev({ order: 3, returnLossDb: 20 }), 'E_ZERO_COUNT'],
  [
    'a pair off the axis',
    generalizedChebyshev({
      order: 4,
      returnLossDb: 20,
      transmissionZeros: [
        { re: 0.8, im: 0.4 },
        { re: -0.8, im: 0.4 },
      ],
    }),
    'E_ZERO_COUNT',
  ],
  ['nothing', undefined as never, 'E_TYPE'],
])('bandstop refuses %s', (_, given, code) => {
  expect(() => bandstop(given)).toThrowError(expect.objectContaining({ code }));
});
