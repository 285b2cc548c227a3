import type { CouplingMatrix } from '../../forms/index.js';
import { nodeNames } from '../words/nodes.js';
import { signed } from '../words/numbers.js';
import { table, WIDTH } from './layout.js';
import type { Paint } from './paint.js';

const DIGITS = 4;

/** A dot for an entry that is exactly zero, else its sign and four decimals. */
function entryText(value: number): string {
  return value === 0 ? '.' : signed(value, DIGITS);
}

/** Drops the zero before the decimal point, where room is short. */
function shortened(text: string): string {
  return text.replace(/^([+-])0\./, '$1.');
}

function widthOf(lines: readonly string[]): number {
  return Math.max(...lines.map((line) => line.length));
}

/** Columns from..to-1 of a matrix whose entries are texts. */
function part(
  cells: readonly (readonly string[])[],
  names: readonly string[],
  from: number,
  to: number,
): readonly string[] {
  const rows = cells.map((row, node) => [names[node] ?? '', ...row.slice(from, to)]);
  return table([['', ...names.slice(from, to)], ...rows], 'r'.repeat(to - from + 1));
}

/** The matrix in one piece where it fits the width, without leading zeros if need be; else in two pieces of columns. */
export function matrixTable(matrix: CouplingMatrix, paint: Paint): readonly string[] {
  const names = nodeNames(matrix.order);
  const size = names.length;
  const full = matrix.values.map((row) => row.map(entryText));
  const short = full.map((row) => row.map(shortened));
  const whole = [full, short].map((cells) => part(cells, names, 0, size)).find((lines) => widthOf(lines) <= WIDTH);
  const half = Math.ceil(size / 2);
  const pieces = whole === undefined ? [part(full, names, 0, half), part(full, names, half, size)] : [whole];
  return pieces.flatMap(([head = '', ...lines]) => [paint.dim(head), ...lines]);
}
