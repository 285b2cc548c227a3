import { describe, expect, test } from 'vitest';
import { butterworth, generalizedChebyshev } from '../../src/approximation/index.js';
import type { CouplingMatrix } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { type Model, scatteringAt } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { folded } from '../../src/topology/index.js';
import { distance, energyDefect, GRID, matrixOf, sharpness, size } from '../support/models.js';
import { SPECS } from '../support/specs.js';

test('scatteringAt(single resonator) is the closed form', () => {
  // A = [[-j, a, d], [a, w + m, b], [d, b, -j]] without d: S21 = 2j a b/(j(w+m) ... ) worked out by hand.
  const [a, b, m] = [0.9, 0.6, 0.3];
  const matrix = matrixOf(1, [
    [0, 1, a],
    [1, 2, b],
    [1, 1, m],
  ]);
  for (const omega of [-2, -0.3, 0, 1]) {
    // Eliminating the ports: D = w + m - j(a^2 + b^2); [A^-1]_LS = -a b/D, [A^-1]_SS = j - a^2/D.
    const [re, im] = [omega + m, -(a * a + b * b)];
    const square = re * re + im * im;
    const inverse = { re: re / square, im: -im / square };
    const { s11, s21, s12, s22 } = scatteringAt(matrix, omega);
    expect(distance(s21, { re: -2 * a * b * inverse.im, im: 2 * a * b * inverse.re })).toBeLessThan(4 * EPS);
    // S11 = -1 - 2j(j - a^2/D) = 1 + 2j a^2/D
    expect(distance(s11, { re: 1 - 2 * a * a * inverse.im, im: 2 * a * a * inverse.re })).toBeLessThan(4 * EPS);
    expect(distance(s22, { re: 1 - 2 * b * b * inverse.im, im: 2 * b * b * inverse.re })).toBeLessThan(4 * EPS);
    expect(s12).toEqual(s21);
  }
});

test('scatteringAt(direct coupling alone) is a shunt of two ports', () => {
  // A = [[-j, d], [d, -j]]: S21 = -2j*d/(1 + d^2)... inverse = -[[-j, -d], [-d, -j]]/(1 + d^2).
  const matrix: CouplingMatrix = matrixOf(1, [
    [0, 2, 0.5],
    [1, 1, 1],
  ]);
  const { s11, s21 } = scatteringAt(matrix, 0);
  expect(distance(s21, { re: 0, im: (-2 * 0.5) / 1.25 })).toBeLessThan(2 * EPS);
  expect(distance(s11, { re: -1 + 2 / 1.25, im: 0 })).toBeLessThan(2 * EPS);
});

describe.each(SPECS)('scatteringAt(%s)', (_, request) => {
  const polynomials = generalizedChebyshev(request);
  const { matrix } = folded(transversal(polynomials));

  test('of the matrix equals that of the polynomials in amplitude and phase', () => {
    for (const omega of GRID) {
      const [one, two] = [scatteringAt(polynomials, omega), scatteringAt(matrix, omega)];
      const room = 40 * request.order * EPS * sharpness(polynomials);
      expect(distance(one.s11, two.s11)).toBeLessThan(room);
      expect(distance(one.s21, two.s21)).toBeLessThan(room);
      expect(distance(one.s22, two.s22)).toBeLessThan(room);
    }
  });

  test('is lossless and reciprocal', () => {
    expect(energyDefect(matrix)).toBeLessThan(60 * request.order * EPS * sharpness(polynomials));
    for (const omega of GRID) {
      const { s11, s21, s12, s22 } = scatteringAt(matrix, omega);
      expect(s12).toEqual(s21);
      // S11 S21* + S12 S22* = 0
      const re = s11.re * s21.re + s11.im * s21.im + s12.re * s22.re + s12.im * s22.im;
      const im = s11.im * s21.re - s11.re * s21.im + s12.im * s22.re - s12.re * s22.im;
      expect(Math.hypot(re, im)).toBeLessThan(60 * request.order * EPS * sharpness(polynomials));
    }
  });

  test('of polynomials has |S22| = |S11|', () => {
    for (const omega of GRID) {
      const { s11, s22 } = scatteringAt(polynomials, omega);
      expect(Math.abs(size(s11) - size(s22))).toBeLessThan(30 * request.order * EPS);
    }
  });
});

test('scatteringAt of high orders neither overflows nor loses its digits', () => {
  for (const order of [50, 100]) {
    const response = butterworth({ order });
    for (const omega of [1e-9, 0.5, 1, 2, 1e3, 1e6]) {
      const { s11, s21 } = scatteringAt(response, omega);
      const power = omega ** (2 * order);
      expect(size(s11)).toBeCloseTo(Math.sqrt(power === Number.POSITIVE_INFINITY ? 1 : power / (1 + power)), 12);
      const expected = -10 * Math.log10(1 + power);
      if (Number.isFinite(expected)) expect(20 * Math.log10(size(s21)) - expected).toBeCloseTo(0, 9);
    }
  }
});

const refusals: readonly (readonly [string, unknown, unknown, string])[] = [
  ['NaN', butterworth({ order: 2 }), Number.NaN, 'E_NOT_FINITE'],
  ['infinity', butterworth({ order: 2 }), Number.POSITIVE_INFINITY, 'E_NOT_FINITE'],
  ['text', butterworth({ order: 2 }), '1', 'E_TYPE'],
  ['no frequency', butterworth({ order: 2 }), undefined, 'E_TYPE'],
  ['a matrix of the wrong shape', { order: 2, values: [] }, 0, 'E_MATRIX_SHAPE'],
];

test.each(refusals)('scatteringAt refuses %s', (_, model, omega, code) => {
  expect(() => scatteringAt(model as Model, omega as number)).toThrowError(
    expect.objectContaining({ name: 'FilterFailure', code }),
  );
});

test('scatteringAt leaves out a resonator that no port sees, also at its own frequency', () => {
  const matrix = matrixOf(2, [
    [0, 1, 1],
    [1, 3, 1],
    [2, 2, 0.5],
  ]);
  const alone = scatteringAt(
    {
      order: 1,
      values: [
        [0, 1, 0],
        [1, 0, 1],
        [0, 1, 0],
      ],
    },
    -0.5,
  );
  expect(size(scatteringAt(matrix, -0.5).s21)).toBeCloseTo(size(alone.s21), 14);
  expect(size(scatteringAt(matrix, 0.25).s21)).toBeGreaterThan(0);
});
