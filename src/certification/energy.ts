import type { Certificate } from '../forms/index.js';
import { cell } from './elimination.js';
import type { MatrixResponse } from './matrix-response.js';
import type { RootResponse } from './root-response.js';
import { distance, squared } from './series.js';
import { atMost, EPSILON } from './verdict.js';

/** C1: a millionth of the smallest ripple anybody specifies (|S11|^2 at 30 dB), and what the comparison of C6 needs. */
const MATRIX_LIMIT = 1e-9;

/** C2: the defect is at most twice the error of |S|; a tenth of the limit that C6 sets for S leaves that its room. */
const POLYNOMIAL_LIMIT = 1e-10;

/** C2 in units of rounding: exact roots, rounded, stay below 1; 30 leaves a few units in the last place for finding each root. */
const ROUNDING_LIMIT = 30;

/**
 * C1: S of the matrix is unitary and reciprocal at every point, each port solved on its own.
 *
 * A real symmetric matrix is lossless and reciprocal by construction, and elimination keeps that to the last digit even
 * where the matrix is ill-conditioned: this check fails where the arithmetic breaks down, it does not judge the design.
 */
export function matrixEnergy(response: MatrixResponse): Certificate[] {
  const { omega, s11, s21, s12, s22 } = response;
  let [power, mixed, reciprocity] = [0, 0, 0];
  for (let i = 0; i < omega.length; i++) {
    power = Math.max(
      power,
      Math.abs(squared(s11, i) + squared(s21, i) - 1),
      Math.abs(squared(s22, i) + squared(s12, i) - 1),
    );
    const [a, b, c, d] = [cell(s11.re, i), cell(s11.im, i), cell(s21.re, i), cell(s21.im, i)];
    const [e, f, g, h] = [cell(s12.re, i), cell(s12.im, i), cell(s22.re, i), cell(s22.im, i)];
    const re = a * c + b * d + (e * g + f * h);
    const im = b * c - a * d + (f * g - e * h);
    mixed = Math.max(mixed, Math.sqrt(re * re + im * im));
    reciprocity = Math.max(reciprocity, distance(s21, s12, i));
  }
  return [
    atMost('C1 energy balance of the matrix', power, MATRIX_LIMIT),
    atMost('C1 orthogonality of the ports of the matrix', mixed, MATRIX_LIMIT),
    atMost('C1 reciprocity of the matrix', reciprocity, MATRIX_LIMIT),
  ];
}

/**
 * C2: `E E# - F F#/epsilonR^2 - P P#/epsilon^2 = 0`, on the axis and relative to |E|^2, as a size and in units of rounding.
 *
 * The left side is a polynomial of degree 2N in omega; the points hold more than the 2N+1 Chebyshev points that fix it.
 * Unit: each root rounded to a double moves its |s - r|^2 by eps*|r|/|s - r| (half a unit in the last place, squared).
 */
export function polynomialEnergy(response: RootResponse): Certificate[] {
  const { omega, s11, s21, poleSpread, reflectionSpread, transmissionSpread } = response;
  let [defect, ratio] = [0, 0];
  for (let i = 0; i < omega.length; i++) {
    const [reflected, transmitted] = [squared(s11, i), squared(s21, i)];
    const here = Math.abs(reflected + transmitted - 1);
    const unit =
      cell(poleSpread, i) + reflected * cell(reflectionSpread, i) + transmitted * cell(transmissionSpread, i);
    defect = Math.max(defect, here);
    ratio = Math.max(ratio, here / (EPSILON * unit));
  }
  return [
    atMost('C2 energy balance of the polynomials', defect, POLYNOMIAL_LIMIT),
    atMost('C2 energy balance of the polynomials, units of rounding', ratio, ROUNDING_LIMIT),
  ];
}
