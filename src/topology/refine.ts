import { doubledDot } from '../numerics/index.js';
import type { EliminationStep } from './elimination-step.js';
import type { Rows } from './matrix-shape.js';

/** A rotation angle of the correction sweep above this is no rounding error: the plain result is kept then. */
const LARGEST_CORRECTION = 1e-8;

/**
 * Removes the rounding error of an elimination.
 *
 * `basis` Q holds the accumulated rotations, orthogonal only to rounding. `Q A Q^T` and `Q Q^T - I` are formed with sums
 * of doubled precision; to first order the nearest orthogonal basis gives `A' - (R A' + A' R)/2`, `R = Q Q^T - I`. What is
 * left in the entries that must vanish (rounding size) is then annihilated by a second sweep of rotations so small that
 * they act linearly; they divide by the surviving coupling of the same row. The result carries the rounding of one
 * conversion to double in each entry. Cost: about 30*N^3 operations for a transversal start.
 *
 * Returns undefined when a correction is not small (a vanishing main line): there is nothing to gain there.
 *
 * Source: doubled-precision sums as in Ogita, Rump, Oishi 2005; the linearized sweep is this package's own.
 */
export function refine(original: Rows, basis: Rows, steps: readonly EliminationStep[]): Rows | undefined {
  const { high, low } = transformed(original, basis);
  const defect = orthogonalityDefect(basis);
  const target = high.map((row) => Float64Array.from(row));
  const small = low;
  for (const { element } of steps) {
    for (const [i, j] of [element, [element[1], element[0]] as const]) {
      (small[i] as Float64Array)[j] =
        ((small[i] as Float64Array)[j] as number) + ((target[i] as Float64Array)[j] as number);
      (target[i] as Float64Array)[j] = 0;
    }
  }
  orthogonalize(target, small, defect);
  for (const step of steps) {
    if (!correct(target, small, step)) return undefined;
  }
  for (const { element } of steps) {
    (small[element[0]] as Float64Array)[element[1]] = (small[element[1]] as Float64Array)[element[0]] = 0;
  }
  return target.map((row, i) => row.map((value, j) => value + ((small[i] as Float64Array)[j] as number)));
}

/** `Q A Q^T` for the resonators and `Q m` for the ports, each entry as a pair high + low. */
function transformed(original: Rows, basis: Rows): { high: Rows; low: Rows } {
  const size = original.length;
  const high = original.map((row) => Float64Array.from(row));
  const low = original.map(() => new Float64Array(size));
  const put = (i: number, j: number, pair: { hi: number; lo: number }): void => {
    (high[i] as Float64Array)[j] = (high[j] as Float64Array)[i] = pair.hi;
    (low[i] as Float64Array)[j] = (low[j] as Float64Array)[i] = pair.lo;
  };
  for (let j = 1; j < size - 1; j++) {
    const vector = basis[j] as Float64Array;
    put(0, j, doubledDot(vector, original[0] as Float64Array));
    put(j, size - 1, doubledDot(vector, original[size - 1] as Float64Array));
    const image = imageOf(original, vector);
    for (let i = 1; i <= j; i++) put(i, j, doubledDot(basis[i] as Float64Array, image.high, image.low));
  }
  return { high, low };
}

/** `A v` with the ports left out (their entries of v are 0). */
function imageOf(original: Rows, vector: Float64Array): { high: Float64Array; low: Float64Array } {
  const high = new Float64Array(vector.length);
  const low = new Float64Array(vector.length);
  for (let k = 1; k < vector.length - 1; k++) {
    const { hi, lo } = doubledDot(original[k] as Float64Array, vector);
    high[k] = hi;
    low[k] = lo;
  }
  return { high, low };
}

function orthogonalityDefect(basis: Rows): Rows {
  const defect = basis.map((row) => new Float64Array(row.length));
  for (let i = 1; i < basis.length - 1; i++) {
    for (let j = 1; j <= i; j++) {
      const { hi, lo } = doubledDot(basis[i] as Float64Array, basis[j] as Float64Array);
      const value = i === j ? hi - 1 + lo : hi + lo;
      (defect[i] as Float64Array)[j] = (defect[j] as Float64Array)[i] = value;
    }
  }
  return defect;
}

/** Adds `-(R T + T R)/2` to the small part; T has few non-zero entries, so this is O(N^2). */
function orthogonalize(target: Rows, small: Rows, defect: Rows): void {
  target.forEach((row, k) => {
    row.forEach((value, j) => {
      if (value === 0) return;
      const half = value / 2;
      const column = defect[k] as Float64Array;
      for (let i = 1; i < target.length - 1; i++) {
        const change = half * (column[i] as number);
        (small[i] as Float64Array)[j] = ((small[i] as Float64Array)[j] as number) - change;
        (small[j] as Float64Array)[i] = ((small[j] as Float64Array)[i] as number) - change;
      }
    });
  });
}

/** One linear rotation of the correction sweep; false when its angle is not small. */
function correct(target: Rows, small: Rows, { element, against }: EliminationStep): boolean {
  const [kept, turned] = element;
  const wanted = (small[kept] as Float64Array)[turned] as number;
  if (wanted === 0) return true;
  const angle = -wanted / ((target[kept] as Float64Array)[against] as number);
  if (!(Math.abs(angle) < LARGEST_CORRECTION)) return false;
  const fixed = target[against] as Float64Array;
  const moving = target[turned] as Float64Array;
  for (let m = 0; m < target.length; m++) {
    const toFixed = -angle * (moving[m] as number);
    const toMoving = angle * (fixed[m] as number);
    const row = small[m] as Float64Array;
    (small[against] as Float64Array)[m] = ((small[against] as Float64Array)[m] as number) + toFixed;
    row[against] = (row[against] as number) + toFixed;
    (small[turned] as Float64Array)[m] = ((small[turned] as Float64Array)[m] as number) + toMoving;
    row[turned] = (row[turned] as number) + toMoving;
  }
  return true;
}
