import type { CouplingMatrix } from '../../../../forms/index.js';
import { FORMAT_WIDTH, type Format } from '../../../svg/drawing.js';
import { minus, textWidth } from '../../../svg/words.js';
import { signed } from '../../../words/numbers.js';

/** A mark at the crossing of two threads; `dot` for a value that came out zero. */
export interface Knot {
  readonly row: number;
  readonly column: number;
  readonly x: number;
  readonly y: number;
  readonly kind: 'square' | 'lozenge' | 'dot';
  /** Side of the square, and of the square of equal area. */
  readonly side: number;
}

/** A number at its crossing below the diagonal. */
export interface Entry {
  readonly row: number;
  readonly column: number;
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly isNegative: boolean;
}

/** Threads, marks and numbers as plain data. */
export interface MatrixLayout {
  readonly width: number;
  readonly height: number;
  /** Position of the first thread; the same along both edges up to `left` and `top`. */
  readonly left: number;
  readonly top: number;
  readonly step: number;
  readonly size: number;
  readonly knots: readonly Knot[];
  readonly entries: readonly Entry[];
  /** How many numbers the cells below the diagonal hold: all, those off the main line, or none. */
  readonly numbers: 'all' | 'cross' | 'none';
}

/** Numbers and names are this tall, px. */
export const NUMBER_SIZE = 11;

/** Up to this order every coupling may carry its number. */
const MOST_NUMBERED = 12;

/** Side of the largest mark as a share of the step; larger ones would hide the cross couplings in a black stair. */
const LARGEST = 0.6;

/** A mark is not smaller than this, px: it would vanish. */
const LEAST_SIDE = 1.2;

/** Sizes below print as 0.0000. */
const PRINTED = 5e-5;

/** Room between two numbers, or a number and a mark, px. */
const CLEAR = 3;

/** Signed, leading zero dropped. */
export function entryText(value: number, digits: number): string {
  return minus(signed(value, digits).replace(/^([+-])0\./, '$1.'));
}

function stepOf(order: number, format: Format, room: number): number {
  const usual = order <= MOST_NUMBERED ? { wide: 46, narrow: 37 } : { wide: 26, narrow: 14 };
  return Math.min(usual[format], room / (order + 2));
}

function knotsOf({ values }: CouplingMatrix, at: (thread: number) => number, step: number, dy: number): Knot[] {
  const largest = Math.max(...values.map((row) => Math.max(...row.map(Math.abs))), Number.MIN_VALUE);
  return values.flatMap((row, n) =>
    row.flatMap((value, column): Knot[] => {
      if (column < n || value === 0) return [];
      const side = Math.max(LARGEST * step * Math.sqrt(Math.abs(value) / largest), LEAST_SIDE);
      const isZero = Math.abs(value) < PRINTED;
      const kind = isZero ? 'dot' : value > 0 ? 'square' : 'lozenge';
      return [{ row: n, column, x: at(column), y: at(n) + dy, kind, side: isZero ? 3 : side }];
    }),
  );
}

/** Which numbers are written, and with how many decimals. */
interface Writing {
  readonly numbers: 'all' | 'cross' | 'none';
  readonly digits: number;
}

function writings(order: number): readonly Writing[] {
  const cross: Writing[] = [
    { numbers: 'cross', digits: 2 },
    { numbers: 'none', digits: 0 },
  ];
  if (order > MOST_NUMBERED) return cross;
  return [...[4, 3, 2].map((digits): Writing => ({ numbers: 'all', digits })), ...cross];
}

function entriesOf({ values }: CouplingMatrix, at: (thread: number) => number, dy: number, writing: Writing): Entry[] {
  if (writing.numbers === 'none') return [];
  return values.flatMap((row, n) =>
    row.flatMap((value, column): Entry[] => {
      const isMain = column === n - 1;
      if (column >= n || Math.abs(value) < 0.5 * 10 ** -writing.digits || (isMain && writing.numbers === 'cross'))
        return [];
      const text = entryText(value, writing.digits);
      return [{ row: n, column, x: at(column), y: at(n) + dy, text, isNegative: value < 0 }];
    }),
  );
}

/** Does every number keep clear of its neighbors in the row, of the mark on the diagonal and of the left edge? */
function fits(entries: readonly Entry[], knots: readonly Knot[], step: number): boolean {
  if (step < NUMBER_SIZE + 2) return entries.length === 0;
  const own = new Map(knots.filter(({ row, column }) => row === column).map((knot) => [knot.row, knot]));
  return entries.every(({ row, x, text, isNegative }, n) => {
    const half = textWidth(text, NUMBER_SIZE, isNegative) / 2;
    const next = entries[n + 1];
    const mark = own.get(row);
    const end = mark === undefined ? Number.POSITIVE_INFINITY : mark.x - mark.side * Math.SQRT1_2;
    if (x + half + CLEAR > end) return false;
    if (next === undefined || next.row !== row) return true;
    return x + half + CLEAR <= next.x - textWidth(next.text, NUMBER_SIZE, next.isNegative) / 2;
  });
}

/** Threads, marks and numbers of a matrix in one format. */
export function matrixLayout(matrix: CouplingMatrix, format: Format): MatrixLayout {
  const { order } = matrix;
  const [width, top] = [FORMAT_WIDTH[format], 24];
  const names = 30;
  const step = stepOf(order, format, width - names - 4);
  const left = names + step / 2;
  const at = (thread: number): number => left + thread * step;
  const dy = top - names;
  const knots = knotsOf(matrix, at, step, dy);
  const tried = writings(order).map((writing) => ({ writing, entries: entriesOf(matrix, at, dy, writing) }));
  const found = tried.find(({ entries }) => fits(entries, knots, step)) ?? {
    writing: { numbers: 'none' },
    entries: [],
  };
  return {
    width,
    height: top + (order + 2) * step + 4,
    left,
    top: left + dy,
    step,
    size: order + 2,
    knots,
    entries: found.entries,
    numbers: found.writing.numbers as MatrixLayout['numbers'],
  };
}
