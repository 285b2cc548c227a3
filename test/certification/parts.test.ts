import { describe, expect, test } from 'vitest';
import { matrixResponse } from '../../src/certification/matrix-response.js';
import { transmissionAt } from '../../src/certification/matrix-transmission.js';
import { rootResponse } from '../../src/certification/root-response.js';
import { samplePoints } from '../../src/certification/sample-points.js';
import { symmetricEigenvalues } from '../../src/certification/symmetric-eigenvalues.js';
import { butterworthLine, chebyshevLine, equiripple, foldedOf, onAxis, seeded } from './networks.js';

describe('symmetricEigenvalues(rows)', () => {
  test('matches 2 cos(k pi/(n+1)) of the unit chain', () => {
    for (const n of [0, 1, 2, 3, 10, 40]) {
      const rows = Array.from({ length: n }, (_, i) =>
        Array.from({ length: n }, (_, j) => (Math.abs(i - j) === 1 ? 1 : 0)),
      );
      const expected = Array.from({ length: n }, (_, k) => 2 * Math.cos((Math.PI * (n - k)) / (n + 1)));
      symmetricEigenvalues(rows).forEach((value, k) => {
        expect(Math.abs(value - (expected[k] ?? 0))).toBeLessThan(1e-14);
      });
    }
  });

  test('keeps trace and sum of squares of a random full matrix', () => {
    const random = seeded(5);
    const n = 25;
    const rows = Array.from({ length: n }, () => new Array<number>(n).fill(0));
    for (let i = 0; i < n; i++) {
      for (let j = i; j < n; j++) {
        const x = random() - 0.5;
        rows[i]![j] = x;
        rows[j]![i] = x;
      }
    }
    const values = symmetricEigenvalues(rows);
    const trace = rows.reduce((sum, row, i) => sum + row[i]!, 0);
    const squares = rows.flat().reduce((sum, x) => sum + x * x, 0);
    expect(values.reduce((sum, x) => sum + x, 0)).toBeCloseTo(trace, 12);
    expect(values.reduce((sum, x) => sum + x * x, 0)).toBeCloseTo(squares, 12);
  });

  test('a diagonal matrix and the zero matrix need no rotation', () => {
    expect(
      symmetricEigenvalues([
        [2, 0],
        [0, -1],
      ]),
    ).toEqual([-1, 2]);
    expect(
      symmetricEigenvalues([
        [0, 0],
        [0, 0],
      ]),
    ).toEqual([0, 0]);
  });
});

describe('matrixResponse(matrix, omega)', () => {
  test('first-order Butterworth: S21 = -1/(s + 1), S11 = s/(s + 1)', () => {
    const omega = Float64Array.of(-2, -1, 0, 0.5, 1000);
    const { s11, s21, s12, s22 } = matrixResponse(butterworthLine(1).matrix, omega);
    omega.forEach((w, i) => {
      const norm = 1 + w * w;
      for (const series of [s21, s12]) {
        expect(series.re[i]).toBeCloseTo(-1 / norm, 15);
        expect(series.im[i]).toBeCloseTo(w / norm, 15);
      }
      for (const series of [s11, s22]) {
        expect(series.re[i]).toBeCloseTo((w * w) / norm, 15);
        expect(series.im[i]).toBeCloseTo(w / norm, 15);
      }
    });
  });

  test('an omega at an eigenvalue of the resonator block is an ordinary point', () => {
    const { polynomials, matrix } = equiripple(6, 20, onAxis(1.4));
    const omega = Float64Array.from({ length: 6 }, (_, k) => -matrix.values[k + 1]![k + 1]!);
    for (const form of [matrix, foldedOf(matrix)]) {
      const found = matrixResponse(form, omega);
      const expected = rootResponse(polynomials, omega);
      for (let i = 0; i < omega.length; i++) {
        expect(Math.abs(found.s11.re[i]! - expected.s11.re[i]!)).toBeLessThan(1e-13);
        expect(Math.abs(found.s21.im[i]! - expected.s21.im[i]!)).toBeLessThan(1e-13);
      }
    }
  });

  test('reach is |x|^2 of the port column: for one resonator 1/2 of its delay-like sum plus the port itself', () => {
    // N = 1, omega = 0: x_S = x_L = j/2 in size, x_1 = 1/sqrt(2) in size.
    expect(matrixResponse(butterworthLine(1).matrix, Float64Array.of(0)).reach[0]).toBeCloseTo(
      1 / 4 + 1 / 4 + 1 / 2,
      14,
    );
  });
});

describe('transmissionAt(matrix, s)', () => {
  test('equals |P/(epsilon*E)| on and off the axis', () => {
    const { matrix } = butterworthLine(1);
    expect(transmissionAt(matrix, { re: 0, im: 0.5 })).toBeCloseTo(1 / Math.hypot(1, 0.5), 15);
    expect(transmissionAt(matrix, { re: 1, im: 2 })).toBeCloseTo(1 / Math.hypot(2, 2), 15);
    expect(transmissionAt(chebyshevLine(3, 20).matrix, { re: 0.3, im: -0.2 })).toBeGreaterThan(0.1);
  });
});

describe('samplePoints(polynomials)', () => {
  test('hold 501 points in the band, both edges, 4N+1 at high order, every pole and zero, and points to 1000', () => {
    const { polynomials } = equiripple(4, 22, onAxis(1.3217, 1.8082));
    const points = [...samplePoints(polynomials)];
    expect(points.filter((w) => Math.abs(w) <= 1).length).toBeGreaterThanOrEqual(501);
    for (const w of [1, -1, 1000, -1000, 1.3217, 1.8082, ...polynomials.poles.map((p) => p.im)])
      expect(points).toContain(w);
    expect(points.every((w) => Math.abs(w) <= 1000)).toBe(true);
    expect(samplePoints(chebyshevLine(200, 20).polynomials).length).toBeGreaterThan(801 + 600);
  });
});
