import type { CouplingMatrix, FilterPolynomials } from '../forms/index.js';
import { complex, refusal } from '../numerics/index.js';
import { rowsOf } from '../topology/index.js';
import { type Curves, emptyCurves } from './curves.js';
import { type SolvedPoint, solvePoint } from './direct-solve.js';
import { sweepGeneral } from './general-kernel.js';
import { sweepLosslessSymmetric } from './lossless-kernel.js';
import { checkFrequencies, checkLoss, isMatrix, type Model } from './model.js';
import { modeForm, poleForm } from './pole-form.js';
import { polynomialKernel } from './polynomial-kernel.js';
import { delayOfPolynomials, scatteringOfPolynomials } from './polynomial-response.js';
import { eliminationPlan } from './sparse-factor.js';
import { sweepSparse } from './sparse-kernel.js';
import { sweepSymmetric } from './symmetric-kernel.js';

/** What a sweep may be told: `loss` = f0/(B*Qu), one number or one a resonator; 0 when absent. */
export interface SweepOptions {
  readonly loss?: number | ArrayLike<number>;
}

/** A sweep: its grid and the curves over it. */
export interface Sweep extends Curves {
  readonly omega: Float64Array;
}

/**
 * S-parameters and group delay of S21 over a grid of normalized frequencies.
 *
 * `omega` any array of finite numbers; the result holds Float64Arrays of the same length. `groupDelay` is `-d phase(S21) /
 * d omega`, from the model's own derivative, never from differences; where S21 of a lossless model is 0 it is the limit.
 * With one common loss a point costs O(order); with a loss for each resonator it costs what the matrix's pattern costs (a
 * loss list needs a matrix; a transfer function has no resonators). In the deep stop band a sweep forms S21 of a
 * matrix as a difference of numbers near 1: three digits are left at -250 dB, none at -320 dB.
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_LOSS, E_MATRIX_SHAPE, E_NOT_SYMMETRIC, E_SINGULAR
 *
 * @example
 * const { s21, groupDelay } = sweep(butterworth({ order: 3 }), [0, 1]);
 * groupDelay[0].toFixed(6); // '2.000000'
 */
export function sweep(model: Model, omega: ArrayLike<number>, options: SweepOptions = {}): Sweep {
  const grid = checkFrequencies(omega, 'omega');
  return { omega: grid, ...sweeper(model, options)(grid) };
}

/** A model prepared for many sweeps: what does not depend on frequency is done once. Grids must be finite numbers. */
export function sweeper(model: Model, options: SweepOptions = {}): (omega: Float64Array) => Curves {
  if (typeof options !== 'object' || options === null)
    throw refusal(
      'E_TYPE',
      'options',
      options,
      'an object such as { loss: 0.01 }',
      'leave it out for a lossless sweep',
    );
  const isOfMatrix = isMatrix(model);
  const loss = checkLoss(options.loss, model.order);
  return isOfMatrix ? matrixSweeper(model, loss) : polynomialSweeper(model, loss);
}

function polynomialSweeper(
  polynomials: FilterPolynomials,
  loss: number | Float64Array,
): (omega: Float64Array) => Curves {
  if (typeof loss !== 'number') {
    throw refusal(
      'E_LOSS',
      'loss',
      'a different loss for each resonator',
      'one number for a transfer function',
      'sweep the coupling matrix instead',
    );
  }
  const kernel = polynomialKernel(polynomials, loss);
  return (omega) => {
    const out = emptyCurves(omega.length, false);
    omega.forEach((w, n) => {
      if (kernel(w, out, n)) return;
      storePoint(out, n, {
        ...scatteringOfPolynomials(polynomials, complex(loss, w)),
        groupDelay: delayOfPolynomials(polynomials, w, loss),
      });
    });
    return out;
  };
}

function matrixSweeper(matrix: CouplingMatrix, loss: number | Float64Array): (omega: Float64Array) => Curves {
  const rows = rowsOf(matrix);
  const solved = (omega: Float64Array, out: Curves): Curves => solveMarked(rows, loss, omega, out);
  if (rows.some((row) => row.some((value) => Math.abs(value) > LARGEST_ENTRY))) {
    return (omega) => solved(omega, unsolved(omega.length));
  }
  if (typeof loss !== 'number') {
    const plan = loss.every((value) => value > 0) ? eliminationPlan(rows) : undefined;
    return (omega) => {
      const out = unsolved(omega.length);
      if (plan !== undefined) sweepSparse(plan, loss, omega, out);
      return solved(omega, out);
    };
  }
  const form = poleForm(rows);
  const modes = modeForm(form);
  return (omega) => {
    const out = emptyCurves(omega.length, modes !== undefined);
    if (modes === undefined) sweepGeneral(form, loss, omega, out);
    else if (loss === 0) sweepLosslessSymmetric(modes, omega, out);
    else sweepSymmetric(modes, loss, omega, out);
    return solved(omega, out);
  };
}

/** Above this entry the eigenvalues, right to eps times the largest, no longer place the other resonances: solve instead. */
const LARGEST_ENTRY = 1000;

/** Curves with every point marked for `solveMarked`. */
function unsolved(points: number): Curves {
  const out = emptyCurves(points, false);
  out.groupDelay.fill(Number.NaN);
  return out;
}

/** Solves the points that a kernel left without a number: resonances hit exactly, or too closely for its sums. */
function solveMarked(
  rows: readonly Float64Array[],
  loss: number | Float64Array,
  omega: Float64Array,
  out: Curves,
): Curves {
  for (let n = 0; n < omega.length; n++) {
    if (!Number.isFinite(out.groupDelay[n])) storePoint(out, n, solvePoint({ rows, loss }, omega[n] as number));
  }
  return out;
}

function storePoint(out: Curves, n: number, point: SolvedPoint): void {
  out.s11.re[n] = point.s11.re;
  out.s11.im[n] = point.s11.im;
  out.s21.re[n] = point.s21.re;
  out.s21.im[n] = point.s21.im;
  out.s22.re[n] = point.s22.re;
  out.s22.im[n] = point.s22.im;
  out.groupDelay[n] = point.groupDelay;
}
