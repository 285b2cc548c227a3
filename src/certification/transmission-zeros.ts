import type { Certificate, Complex, CouplingMatrix, FilterPolynomials } from '../forms/index.js';
import { transmissionAt } from './matrix-transmission.js';
import { atMost, EPSILON, exactly } from './verdict.js';

/** C5: -180 dB, below any measurable rejection. */
const REJECTION_LIMIT = 1e-9;

/** A zero asked for may have been snapped to the axis or to its mirror image by this many units in the last place. */
const SNAPPED_ULPS = 4;

/**
 * C5: |S21| of the matrix vanishes at every finite transmission zero, and the zeros are those asked for, multiplicity included.
 *
 * Off the axis only the zero of a pair in the right half plane is tried: the numerator of S21 is a real polynomial of
 * omega for any real matrix, so its mirror image is a zero as well, but may lie next to a pole. Count: zeros without
 * an exact mirror image, zeros beyond the order, zeros that differ from those asked for and from the matrix's own note.
 */
export function transmissionZeros(
  polynomials: FilterPolynomials,
  matrix: CouplingMatrix,
  asked: readonly Complex[] | undefined,
): Certificate[] {
  const zeros = polynomials.transmissionZeros;
  let faults = Math.max(0, zeros.length - polynomials.order) + unpaired(zeros);
  if (asked !== undefined) faults += unmatched(zeros, asked);
  if (matrix.finiteZeros !== undefined) faults += Math.abs(matrix.finiteZeros - zeros.length);
  const count = exactly('C5 transmission zeros missing, foreign or unpaired', faults, 0);
  if (zeros.length === 0) return [count];
  const worst = zeros
    .filter((zero) => !(zero.re < 0))
    .reduce((largest, zero) => Math.max(largest, transmissionAt(matrix, zero)), 0);
  return [count, atMost('C5 transmission of the matrix at its zeros', worst, REJECTION_LIMIT)];
}

/** Zeros off the axis whose mirror image -conj z is not listed as often as they are. */
function unpaired(zeros: readonly Complex[]): number {
  const times = (re: number, im: number): number => zeros.filter((z) => z.re === re && z.im === im).length;
  return zeros.filter((z) => z.re !== 0 && times(-z.re, z.im) !== times(z.re, z.im)).length;
}

/** Zeros left over on either side when each zero found is paired with the nearest one asked for, within the snapping distance. */
function unmatched(found: readonly Complex[], asked: readonly Complex[]): number {
  const open = [...asked];
  let missing = 0;
  for (const zero of found) {
    const gaps = open.map((other) => Math.hypot(zero.re - other.re, zero.im - other.im));
    const best = gaps.indexOf(Math.min(...gaps));
    if (best >= 0 && (gaps[best] ?? Infinity) <= SNAPPED_ULPS * EPSILON * Math.hypot(zero.re, zero.im))
      open.splice(best, 1);
    else missing++;
  }
  return missing + open.length;
}
