import type { CouplingMatrix } from '../../forms/index.js';
import { CONVENTIONS } from '../words/conventions.js';
import { nodeName } from '../words/nodes.js';
import { signed, sizeText } from '../words/numbers.js';
import { blocks, table, wrapped } from './layout.js';
import { matrixTable } from './matrix-text.js';
import { type Paint, PLAIN } from './paint.js';

const ANGLE_DIGITS = 6;
const VALUE_DIGITS = 6;
/** Beyond this order only the file of the JSON output holds the matrix. */
const LARGEST_MATRIX = 14;

/** What one step of a sequence of rotations did. */
export interface TracedStep {
  readonly pivot: readonly [number, number];
  readonly angleDegrees: number;
  readonly annihilated?: { readonly element: readonly [number, number]; readonly before: number };
  readonly offPattern?: number;
  readonly drift: number;
}

/** A sequence of rotations, replayed. */
export interface TraceReport {
  readonly name?: string;
  readonly steps: readonly TracedStep[];
  readonly matrix: CouplingMatrix;
}

function pairText([i, j]: readonly [number, number], order: number): string {
  return `${nodeName(i, order)},${nodeName(j, order)}`;
}

function stepRows({ steps, matrix }: TraceReport): readonly (readonly string[])[] {
  return steps.map(({ pivot, angleDegrees, annihilated, offPattern, drift }, n) => [
    String(n + 1),
    pairText(pivot, matrix.order),
    signed(angleDegrees, ANGLE_DIGITS),
    annihilated === undefined ? '' : pairText(annihilated.element, matrix.order),
    annihilated === undefined ? '' : signed(annihilated.before, VALUE_DIGITS),
    offPattern === undefined ? '' : sizeText(offPattern),
    sizeText(drift),
  ]);
}

/**
 * A replayed sequence of rotations: for each step the pivot, the angle in degrees, the entry that was annihilated and its
 * value before, the largest entry left outside the target pattern, and the drift of what rotations must keep; then the
 * matrix at the end.
 */
export function rotationText(report: TraceReport, paint: Paint = PLAIN): string {
  const { name, steps, matrix } = report;
  const head = ['step', 'pivot', 'angle, degrees', 'made 0', 'was', 'off pattern', 'drift'];
  const [headLine = '', ...lines] = table([head, ...stepRows(report)], 'rrrrrrr');
  const count = steps.length === 1 ? '1 rotation' : `${steps.length} rotations`;
  const meaning =
    'Drift: largest relative change of the eigenvalues of the resonator block and of the port products since the start.';
  const isLarge = matrix.order > LARGEST_MATRIX;
  return blocks(
    wrapped(`${name ?? `Matrix of order ${matrix.order}`}: ${count}`).map(paint.strong),
    [paint.dim(headLine), ...lines],
    isLarge ? ['The matrix is too large to show here; --json prints it.'] : matrixTable(matrix, paint),
    [...wrapped(meaning, 2), ...CONVENTIONS].map(paint.dim),
  );
}
