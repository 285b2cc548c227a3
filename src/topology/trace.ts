import type { CouplingMatrix, Rotation } from '../forms/index.js';
import { refusal, symmetricEigen } from '../numerics/index.js';
import { annihilate } from './annihilate.js';
import { normOf, rowsOf } from './matrix-shape.js';
import { rotate } from './rotate.js';

/** A step of an experiment: a rotation by a given angle, or the rotation that annihilates an entry. */
export type RotationRequest =
  | Rotation
  | { readonly pivot: readonly [number, number]; readonly annihilate: readonly [number, number] };

/** What one step did. */
export interface TraceStep {
  readonly rotation: Rotation;
  /** The entry that was annihilated, and its value before; absent for a plain rotation. */
  readonly annihilated?: { readonly element: readonly [number, number]; readonly before: number };
  /** Largest entry outside the target pattern after the step; absent without a pattern. */
  readonly offPattern?: number;
  /** Largest relative change since the start of what rotations must keep: eigenvalues of the resonator block, M_S.M_S, M_L.M_L, M_S.M_L. */
  readonly drift: number;
}

/** An experiment replayed: the final matrix and what each step did. */
export interface RotationTrace {
  readonly matrix: CouplingMatrix;
  readonly steps: readonly TraceStep[];
}

/**
 * Replays a sequence of rotations and watches each step: its angle, the entry it annihilated, what is left outside a target
 * pattern, and how far the invariants have drifted.
 *
 * `steps` mixes `{ pivot, angle }` and `{ pivot, annihilate: [k, l] }`; `pattern` lists the node pairs that the target may
 * couple (nodes 0..N+1; the diagonal is always allowed). Cost O(order^3) a step, for the eigenvalues.
 *
 * @throws FilterFailure as `rotate` and `annihilate`
 *
 * @example
 * const start = transversal(chebyshev({ order: 3, returnLossDb: 20 }));
 * const { steps } = traceRotations(start, [{ pivot: [2, 3], annihilate: [0, 3] }, { pivot: [1, 2], annihilate: [0, 2] }]);
 * steps.length; // 2
 */
export function traceRotations(
  start: CouplingMatrix,
  steps: readonly RotationRequest[],
  pattern?: readonly (readonly [number, number])[],
): RotationTrace {
  checkSteps(steps);
  checkPattern(pattern);
  const reference = invariantsOf(start);
  // A matrix of zeros has nothing to drift by; its changes count as they are.
  const norm = normOf(rowsOf(start)) || 1;
  let matrix = start;
  const log = steps.map((request) => {
    const before = matrix;
    const done = perform(matrix, request);
    matrix = done.matrix;
    const drift =
      Math.max(...invariantsOf(matrix).map((value, n) => Math.abs(value - (reference[n] as number)))) / norm;
    return {
      rotation: done.rotation,
      ...('annihilate' in request
        ? { annihilated: { element: request.annihilate, before: entry(before, request.annihilate) } }
        : {}),
      ...(pattern === undefined ? {} : { offPattern: largestOutside(matrix, pattern) }),
      drift,
    };
  });
  return { matrix, steps: log };
}

function checkSteps(steps: readonly RotationRequest[]): void {
  if (!Array.isArray(steps))
    throw refusal('E_TYPE', 'steps', steps, 'an array of steps', 'give [{ pivot: [i, j], angle }]');
  steps.forEach((step: unknown, n) => {
    if (typeof step !== 'object' || step === null) {
      throw refusal(
        'E_TYPE',
        `steps[${n}]`,
        step,
        'an object',
        'give { pivot: [i, j], angle } or { pivot: [i, j], annihilate: [k, l] }',
      );
    }
  });
}

function checkPattern(pattern: unknown): void {
  if (pattern === undefined) return;
  const pairs = Array.isArray(pattern) && pattern.every((pair) => Array.isArray(pair) && pair.length === 2);
  if (!pairs) throw refusal('E_TYPE', 'pattern', pattern, 'a list of node pairs', 'give [[0, 1], [1, 2], ...]');
}

function perform(matrix: CouplingMatrix, request: RotationRequest): { matrix: CouplingMatrix; rotation: Rotation } {
  if ('annihilate' in request) return annihilate(matrix, { pivot: request.pivot, element: request.annihilate });
  return { matrix: rotate(matrix, request), rotation: request };
}

const entry = (matrix: CouplingMatrix, [i, j]: readonly [number, number]): number => matrix.values[i]?.[j] as number;

function invariantsOf(matrix: CouplingMatrix): readonly number[] {
  const rows = rowsOf(matrix);
  const last = rows.length - 1;
  const block = rows.slice(1, last).map((row) => row.slice(1, last));
  const dot = (a: number, b: number): number =>
    block.reduce((sum, _, n) => sum + (rows[a]?.[n + 1] as number) * (rows[b]?.[n + 1] as number), 0);
  return [...symmetricEigen(block).values, dot(0, 0), dot(0, last), dot(last, last)];
}

/** Largest entry of the upper triangle that the pattern does not allow. */
function largestOutside(matrix: CouplingMatrix, pattern: readonly (readonly [number, number])[]): number {
  const allowed = new Set(pattern.map(([i, j]) => `${Math.min(i, j)},${Math.max(i, j)}`));
  let largest = 0;
  matrix.values.forEach((row, i) => {
    for (let j = i + 1; j < row.length; j++) {
      if (!allowed.has(`${i},${j}`)) largest = Math.max(largest, Math.abs(row[j] as number));
    }
  });
  return largest;
}
