import type { CouplingMatrix, Rotation } from '../forms/index.js';
import { refusal } from '../numerics/index.js';
import { annihilationAngle, clear } from './annihilate.js';
import { eliminateDoubled } from './doubled-elimination.js';
import type { EliminationStep } from './elimination-step.js';
import { matrixFrom, normOf, type Rows, rowsOf } from './matrix-shape.js';
import { refine } from './refine.js';
import { flip } from './rotate.js';

/** What distinguishes one fixed form from another. */
export interface ReductionPlan {
  readonly steps: readonly EliminationStep[];
  /**
   * How rounding is kept out: `corrected` = eliminate in doubles and remove the error afterwards (many rotations);
   * `doubled` = eliminate in doubled precision (few rotations, and zeros that a correction would fill).
   */
  readonly precision: 'corrected' | 'doubled';
  /** Entries that vanish because the response has few finite zeros, outermost first. */
  readonly structuralZeros: (finiteZeros: number) => readonly (readonly [number, number])[];
  /** Couplings that the choice of resonator signs makes non-negative, each with the resonator whose sign decides it, in order. */
  readonly positive: readonly { readonly entry: readonly [number, number]; readonly by: number }[];
}

/** A matrix in a new form, the rotations that led there, and the largest structural zero before it was cleared, relative to the norm. */
export interface Reduced {
  readonly matrix: CouplingMatrix;
  readonly rotations: readonly Rotation[];
  readonly leftover: number;
}

/**
 * Runs an elimination without letting its rounding into the result, clears the structural zeros and chooses the resonator
 * signs.
 */
export function reduce(matrix: CouplingMatrix, planOf: (order: number) => ReductionPlan): Reduced {
  const original = rowsOf(matrix);
  const plan = planOf(matrix.order);
  const { rows: exact, rotations } =
    plan.precision === 'doubled' ? eliminateDoubled(original, plan.steps) : eliminateCorrected(original, plan.steps);
  const leftover = clearStructure(exact, plan, matrix.finiteZeros);
  clearSynchronous(exact);
  const flips = normalSigns(exact, plan);
  if (flips.length > 0) rotations.push({ pivot: [1, matrix.order], angle: 0, flip: flips });
  return { matrix: matrixFrom(exact, matrix.finiteZeros), rotations, leftover };
}

function eliminateCorrected(original: Rows, steps: readonly EliminationStep[]): { rows: Rows; rotations: Rotation[] } {
  const rows = original.map((row) => Float64Array.from(row));
  const basis = original.map((_, i) => Float64Array.from({ length: original.length }, (__, j) => (i === j ? 1 : 0)));
  const rotations = steps.map(({ element, pivot }) => {
    const rotation = { pivot, angle: annihilationAngle(rows, pivot, element) };
    clear(rows, rotation, element);
    turnBasis(basis, pivot, rotation.angle);
    return rotation;
  });
  const refined = refine(original, basis, steps);
  // Couplings over many decades: the correction does not settle, or settles where the rotations do not lead. Then the
  // elimination itself runs in doubled precision.
  const isFar = refined === undefined || distanceOf(refined, rows) > FARTHEST_CORRECTION * normOf(original);
  return isFar ? eliminateDoubled(original, steps) : { rows: refined, rotations };
}

/** Rounding of an elimination moves an entry by far less than this share of the norm; its certificate allows ten times as much. */
const FARTHEST_CORRECTION = 1e-11;

/** Largest difference of two matrices' entries. */
function distanceOf(a: Rows, b: Rows): number {
  return Math.max(...a.map((row, i) => Math.max(...row.map((value, j) => Math.abs(value - (b[i]?.[j] as number))))));
}

/** `Q <- R Q`: row i of the basis holds the new resonator i in terms of the old ones. */
function turnBasis(basis: Rows, [i, j]: readonly [number, number], angle: number): void {
  if (angle === 0) return;
  const c = Math.cos(angle);
  const s = Math.sin(angle);
  const rowI = basis[i] as Float64Array;
  const rowJ = basis[j] as Float64Array;
  for (let k = 1; k < rowI.length - 1; k++) {
    const a = rowI[k] as number;
    const b = rowJ[k] as number;
    rowI[k] = c * a - s * b;
    rowJ[k] = s * a + c * b;
  }
}

/** Room for rounding in an entry that theory makes zero: the matrix is known to N*eps of its norm, and a reduction may spread that once more. */
const roundingRoom = (rows: Rows): number => 8 * rows.length * 2 ** -52 * normOf(rows);

/**
 * Writes exact zeros where the number of finite zeros demands them. Where that number is unknown, entries are cleared from
 * the outermost inward as long as they are within rounding of zero.
 */
function clearStructure(rows: Rows, plan: ReductionPlan, finiteZeros: number | undefined): number {
  const room = roundingRoom(rows);
  const candidates = plan.structuralZeros(finiteZeros ?? 0);
  let largest = 0;
  for (const [i, j] of candidates) {
    const value = Math.abs(rows[i]?.[j] ?? 0);
    if (finiteZeros === undefined && value > room) break;
    largest = Math.max(largest, value);
    (rows[i] as Float64Array)[j] = (rows[j] as Float64Array)[i] = 0;
  }
  const norm = normOf(rows);
  const leftover = norm === 0 ? 0 : largest / norm;
  if (finiteZeros !== undefined && leftover > LARGEST_LEFTOVER) {
    throw refusal(
      'E_FINITE_ZEROS',
      'matrix.finiteZeros',
      finiteZeros,
      'the number of finite transmission zeros that the matrix really has',
      'correct it, or leave it out',
    );
  }
  return leftover;
}

/** A structural zero that is not rounding shows that the stated number of finite zeros is wrong: the limit of its certificate. */
const LARGEST_LEFTOVER = 1e-10;

/**
 * A response symmetric about the center needs no coupling between nodes of equal parity, diagonal included. When all such
 * entries are within rounding of zero they are zero.
 */
function clearSynchronous(rows: Rows): void {
  const room = roundingRoom(rows);
  const equalParity = (i: number, j: number): boolean => (i + j) % 2 === 0;
  const synchronous = rows.every((row, i) => row.every((value, j) => !equalParity(i, j) || Math.abs(value) <= room));
  if (!synchronous) return;
  rows.forEach((row, i) => {
    for (let j = 0; j < row.length; j++) if (equalParity(i, j)) row[j] = 0;
  });
}

/** Chooses resonator signs so that the plan's couplings are >= 0; gives the resonators that were flipped. */
function normalSigns(rows: Rows, plan: ReductionPlan): readonly number[] {
  const flipped: number[] = [];
  for (const { entry, by } of plan.positive) {
    if (((rows[entry[0]] as Float64Array)[entry[1]] as number) < 0) {
      flip(rows, by);
      flipped.push(by);
    }
  }
  return flipped.sort((a, b) => a - b);
}
