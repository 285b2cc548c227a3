import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  bessel,
  butterworth,
  chebyshev,
  type EllipticRequest,
  elliptic,
  inverseChebyshev,
} from '../../src/approximation/index.js';
import { certify } from '../../src/certification/index.js';
import type { FilterPolynomials } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { scatteringAt, sweep } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { folded } from '../../src/topology/index.js';
import { energyDefect, size } from '../support/models.js';

const decibels = (response: FilterPolynomials, omega: number): number =>
  -20 * Math.log10(size(scatteringAt(response, omega).s21));

const returnLoss = (response: FilterPolynomials, omega: number): number =>
  -20 * Math.log10(size(scatteringAt(response, omega).s11));

/** Every certificate of the matrix in folded form. */
const failures = (response: FilterPolynomials): string[] =>
  certify(response, folded(transversal(response)).matrix)
    .filter(({ holds }) => !holds)
    .map(({ check, value }) => `${check}: ${value}`);

const stopBands = fc.record({
  order: fc.integer({ min: 1, max: 24 }),
  returnLossDb: fc.double({ min: 3, max: 40, noNaN: true }),
  // Rejection that leaves the zeros of an elliptic response of this order clear of the pass band.
  depthDb: fc.double({ min: 5, max: 40, noNaN: true }),
});

describe('inverseChebyshev', () => {
  test('has the law of its family at random, and a matrix whose certificates hold', () => {
    fc.assert(
      fc.property(stopBands, ({ order, returnLossDb, depthDb }) => {
        const rejectionDb = depthDb + 4 * order;
        const response = inverseChebyshev({ order, returnLossDb, rejectionDb });
        const edge = response.stopBandEdge!;
        const kappa = Math.sqrt(10 ** (returnLossDb / 10) - 1);
        const ratio = Math.sqrt(10 ** (rejectionDb / 10) - 1);
        // |S21/S11| = T_N(edge/omega)/ratio, T_N = cos(N acos x) inside and cosh(N acosh x) outside [-1, 1].
        for (const omega of [0.2, 0.7, 1, edge * 1.01, edge * 1.7, edge * 9]) {
          const x = edge / omega;
          const t = x >= 1 ? Math.cosh(order * Math.acosh(x)) : Math.cos(order * Math.acos(x));
          const { s11, s21 } = scatteringAt(response, omega);
          const found = size(s21) / size(s11);
          expect(Math.abs(found - Math.abs(t) / ratio)).toBeLessThan(1e-12 * order * Math.max(1 / ratio, found));
        }
        expect(Math.cosh(order * Math.acosh(edge)) / (kappa * ratio)).toBeCloseTo(1, 10);
        expect(energyDefect(response)).toBeLessThan(1e-12);
        expect(failures(response)).toEqual([]);
      }),
      { seed: 20261201, numRuns: 20 },
    );
  });

  test('of order 2 is the closed form', () => {
    // |S21|^2 = 1/(1 + D^2/T_2(e/w)^2), T_2(x) = 2x^2 - 1: by hand at D = 3, kappa = 1: T_2(e) = 3, e = sqrt 2.
    const level = 10 * Math.log10(2);
    const response = inverseChebyshev({ order: 2, returnLossDb: level, rejectionDb: 10 });
    expect(response.stopBandEdge).toBeCloseTo(Math.SQRT2, 14);
    expect(response.transmissionZeros[0]!.im).toBeCloseTo(2, 14);
    expect(response.epsilon).toBeCloseTo(Math.sqrt(10), 14);
    expect(response.epsilonR).toBeCloseTo(Math.sqrt(10) / 3, 14);
  });

  test('comes to Butterworth as the rejection grows', () => {
    const flat = butterworth({ order: 4 });
    const response = inverseChebyshev({ order: 4, returnLossDb: 10 * Math.log10(2), rejectionDb: 290 });
    response.poles.forEach(({ re, im }, n) => {
      // T_4(e/w) differs from 8(e/w)^4 by (w/e)^2, relatively, and e is 10^(14.5/4)/8^(1/4).
      expect(Math.hypot(re - flat.poles[n]!.re, im - flat.poles[n]!.im)).toBeLessThan(1 / response.stopBandEdge! ** 2);
    });
  });
});

describe('elliptic', () => {
  const ways = (order: number, returnLossDb: number, rejectionDb: number): EllipticRequest[] => {
    const first = { order, returnLossDb, rejectionDb };
    const moved = order % 2 === 0 ? [{ ...first, largestPairAtInfinity: true }] : [];
    return [first, ...moved];
  };

  test('has equal ripple in both bands at random, asked for by level or by edge, and a certified matrix', () => {
    fc.assert(
      fc.property(stopBands, ({ order, returnLossDb, depthDb }) => {
        for (const request of ways(order, returnLossDb, depthDb + 4.5 * order)) {
          const response = elliptic(request);
          expect(energyDefect(response)).toBeLessThan(1e-10);
          expect(failures(response)).toEqual([]);
          const { rejectionDb: _, ...rest } = request;
          const again = elliptic({ ...rest, stopBandEdge: response.stopBandEdge! });
          // An edge rounded by EPS moves the level by its slope, which grows as the inverse of the gap.
          const room = 1e-13 + (64 * EPS) / (response.stopBandEdge! - 1);
          expect(Math.abs(again.rejectionDb! / response.rejectionDb! - 1)).toBeLessThan(room);
        }
      }),
      { seed: 20261202, numRuns: 20 },
    );
  });

  test.each([
    [5, 20, 50],
    [6, 20, 50],
    [9, 26, 80],
    [40, 20, 120],
    [60, 20, 250],
  ])('order %d, %d dB and %d dB: both levels to rounding', (order, returnLossDb, rejectionDb) => {
    for (const request of ways(order, returnLossDb, rejectionDb)) {
      const response = elliptic(request);
      expect(returnLoss(response, 1)).toBeCloseTo(returnLossDb, 9);
      expect(decibels(response, response.stopBandEdge!)).toBeCloseTo(rejectionDb, 7);
      expect(response.transmissionZeros.length).toBe(request.largestPairAtInfinity ? order - 2 : order - (order % 2));
    }
  });

  test('with its only pair at infinity is the Chebyshev response of order 2', () => {
    const moved = elliptic({ order: 2, returnLossDb: 20, rejectionDb: 40, largestPairAtInfinity: true });
    const expected = chebyshev({ order: 2, returnLossDb: 20 });
    expect(moved.poles[0]!.re).toBeCloseTo(expected.poles[0]!.re, 14);
    expect(moved.poles[0]!.im).toBeCloseTo(expected.poles[0]!.im, 14);
    expect(moved.epsilon).toBeCloseTo(expected.epsilon, 13);
  });

  test.each([
    [{ order: 5, returnLossDb: 20 }, 'E_STOP_BAND'],
    [{ order: 5, returnLossDb: 20, rejectionDb: 50, stopBandEdge: 1.2 }, 'E_STOP_BAND'],
    [{ order: 5, returnLossDb: 20, stopBandEdge: 1 }, 'E_STOP_BAND'],
    [{ order: 5, returnLossDb: 20, stopBandEdge: 1.000001 }, 'E_STOP_BAND'],
    [{ order: 60, returnLossDb: 20, rejectionDb: 60 }, 'E_STOP_BAND'],
    [{ order: 5, returnLossDb: 0.1, rejectionDb: 1 }, 'E_REJECTION_RANGE'],
    [{ order: 5, returnLossDb: 20, rejectionDb: 301 }, 'E_REJECTION_RANGE'],
    [{ order: 40, returnLossDb: 20, stopBandEdge: 2 }, 'E_STOP_BAND'],
    [{ order: 5, returnLossDb: 20, rejectionDb: 50, largestPairAtInfinity: true }, 'E_ORDER_RANGE'],
    [{ order: 4, returnLossDb: 20, rejectionDb: 50, largestPairAtInfinity: 1 }, 'E_TYPE'],
    [{ order: 4, returnLossDb: 20, rejectionDb: '50' }, 'E_TYPE'],
    [{ order: 4, returnLossDb: 20, rejectionDb: Number.NaN }, 'E_NOT_FINITE'],
    [{ order: 0, returnLossDb: 20, rejectionDb: 50 }, 'E_ORDER_RANGE'],
    [undefined, 'E_TYPE'],
  ])('refuses %j with %s', (request, code) => {
    expect(() => elliptic(request as EllipticRequest)).toThrowError(expect.objectContaining({ code }));
  });
});

describe('bessel', () => {
  const ORDERS = [1, 2, 3, 4, 7, 12, 25, 40, 60];

  test.each(ORDERS)('order %d is lossless, with half the power at 1, on every side', (order) => {
    for (const reflectionZeros of ['left', 'right', 'alternating'] as const) {
      const response = bessel({ order, edge: 'halfPower', reflectionZeros });
      expect(energyDefect(response)).toBeLessThan(1e-12);
      expect(decibels(response, 1)).toBeCloseTo(3.010299956639812, 11);
      expect(decibels(response, 0)).toBeCloseTo(0, 12);
    }
  });

  test.each(ORDERS)('order %d has unit delay, flat to its last derivative', (order) => {
    const response = bessel({ order, edge: 'unitDelay' });
    // The delay of the reverse Bessel polynomial: 1 - omega^(2N)/|theta|^2, as its continued fraction gives it.
    for (const omega of [0, 0.1, 0.5, 1]) {
      const power = response.poles.reduce((product, { re, im }) => product * (re * re + (omega - im) ** 2), 1);
      const delay = sweep(response, [omega]).groupDelay[0]!;
      expect(Math.abs(delay - (1 - omega ** (2 * order) / power))).toBeLessThan(1e-13);
    }
  });

  test('order 1 has its pole at -1 for both edges', () => {
    for (const edge of ['halfPower', 'unitDelay'] as const) {
      expect(bessel({ order: 1, edge }).poles).toEqual([{ re: -1, im: 0 }]);
    }
  });

  test('zeros of S11 lie on the side asked for', () => {
    const signs = (reflectionZeros: 'left' | 'right' | 'alternating'): number[] =>
      bessel({ order: 6, edge: 'halfPower', reflectionZeros }).reflectionZeros.map(({ re }) => Math.sign(re));
    // By falling frequency: two conjugate pairs outside, the real zero and the one at the center between.
    expect(signs('left')).toEqual([-1, -1, -1, 0, -1, -1]);
    expect(signs('right')).toEqual([1, 1, 0, 1, 1, 1]);
    expect(signs('alternating')).toEqual([-1, 1, -1, 0, 1, -1]);
  });

  test.each([
    [{ order: 61, edge: 'halfPower' }, 'E_ORDER_RANGE'],
    [{ order: 3 }, 'E_CHOICE'],
    [{ order: 3, edge: 'half' }, 'E_CHOICE'],
    [{ order: 3, edge: 'halfPower', reflectionZeros: 'both' }, 'E_CHOICE'],
  ])('refuses %j with %s', (request, code) => {
    expect(() => bessel(request as never)).toThrowError(expect.objectContaining({ code }));
  });
});
