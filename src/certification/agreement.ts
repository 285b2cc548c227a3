import type { Certificate, CouplingMatrix } from '../forms/index.js';
import { cell } from './elimination.js';
import type { MatrixResponse } from './matrix-response.js';
import type { RootResponse } from './root-response.js';
import { distance, squared } from './series.js';
import { atLeast, atMost, EPSILON } from './verdict.js';

/** C6: an error of 1e-9 in S11 is 1e-6 dB of ripple at 40 dB return loss. */
const RESPONSE_LIMIT = 1e-9;

/** C6 in units of rounding: a matrix whose entries are off by a few units in the last place of the largest one stays below; measured 0.3 to 2. */
const ROUNDING_LIMIT = 30;

/** C9: digits that must be left for a response to be worth printing. */
const LEAST_DIGITS = 6;

/** The digits that a double carries. */
const DIGITS_OF_A_DOUBLE: number = -Math.log10(EPSILON);

/**
 * C6: complex S11, S21, S12, S22 of the matrix equal those of the polynomials, as a size and in units of rounding.
 *
 * Unit at a point: the roots rounded to doubles (half the spread of those of E, and of F or P where S is that large),
 * plus the entries of the matrix rounded to doubles: `dS = 2 x^T dM x` with x the port columns of A^-1.
 * The second form sees faults of a single small coupling that stay below any fixed size.
 */
export function agreement(matrix: CouplingMatrix, fromMatrix: MatrixResponse, fromRoots: RootResponse): Certificate[] {
  const { poleSpread, reflectionSpread, transmissionSpread } = fromRoots;
  const largest = largestEntry(matrix);
  let [difference, ratio] = [0, 0];
  for (let i = 0; i < fromMatrix.omega.length; i++) {
    const here = Math.max(
      distance(fromMatrix.s11, fromRoots.s11, i),
      distance(fromMatrix.s21, fromRoots.s21, i),
      distance(fromMatrix.s12, fromRoots.s12, i),
      distance(fromMatrix.s22, fromRoots.s22, i),
    );
    const reflection = Math.sqrt(squared(fromMatrix.s11, i)) * cell(reflectionSpread, i);
    const transmission = Math.sqrt(squared(fromMatrix.s21, i)) * cell(transmissionSpread, i);
    const ofRoots = (cell(poleSpread, i) + reflection + transmission) / 2;
    difference = Math.max(difference, here);
    ratio = Math.max(ratio, here / (EPSILON * (ofRoots + 2 * cell(fromMatrix.reach, i) * largest)));
  }
  return [
    atMost('C6 response of the matrix against the polynomials', difference, RESPONSE_LIMIT),
    atMost('C6 response of the matrix against the polynomials, units of rounding', ratio, ROUNDING_LIMIT),
  ];
}

/** C9: digits of the response that survive the rounding of the entries of the matrix, at the worst point: `eps * 2*|x|^2 * max|M|`. */
export function digitsLeft(matrix: CouplingMatrix, fromMatrix: MatrixResponse): Certificate {
  let worst = 0;
  for (let i = 0; i < fromMatrix.reach.length; i++) worst = Math.max(worst, cell(fromMatrix.reach, i));
  const lost = Math.log10(Math.max(1, 2 * worst * largestEntry(matrix)));
  return atLeast('C9 digits left in the response', DIGITS_OF_A_DOUBLE - lost, LEAST_DIGITS);
}

function largestEntry(matrix: CouplingMatrix): number {
  let largest = 0;
  for (const row of matrix.values) for (const entry of row) largest = Math.max(largest, Math.abs(entry));
  return largest;
}
