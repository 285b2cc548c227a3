import type { CouplingMatrix } from '../../../../forms/index.js';
import { FORMAT_WIDTH, type Format } from '../../../svg/drawing.js';
import { minus, textWidth } from '../../../svg/words.js';
import { signed } from '../../../words/numbers.js';

/** A mark at the crossing of two threads; `ring` for a value too weak to show its sign, `dot` for one that came out zero. */
export interface Knot {
  readonly row: number;
  readonly column: number;
  readonly x: number;
  readonly y: number;
  readonly kind: 'square' | 'lozenge' | 'ring' | 'dot';
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
  /** Right end of the names of rows. */
  readonly nameEnd: number;
  readonly step: number;
  readonly size: number;
  readonly knots: readonly Knot[];
  readonly entries: readonly Entry[];
  /** How many numbers the cells below the diagonal hold: all, as many as have room, those off the main line, or none. */
  readonly numbers: 'all' | 'some' | 'cross' | 'none';
  /** Decimals of the numbers, which count as one where some of them found no room. */
  readonly digits: number;
}

/** Numbers and names are this tall, px. */
export const NUMBER_SIZE = 11;

/** Up to this order every coupling may carry its number. */
const MOST_NUMBERED = 12;

/** Side of the largest mark as a share of the step; larger ones would hide the cross couplings in a black stair. */
const LARGEST = 0.6;

/** Side below which a lozenge is a filled speck that cannot be told from a square, px; a little less where threads are tight. */
const leastSigned = (step: number): number => Math.max(5.5, Math.min(6.5, 0.4 * step));

/** Diameter of a ring as a share of the step, and at most, px. */
const RING = { share: 0.5, most: 5 };

/** Sizes below print as 0.0000. */
const PRINTED = 5e-5;

/** Room between two numbers, or a number and a mark or a name, px. */
const CLEAR = 5;

const halfWidth = ({ text, isNegative }: Entry): number => textWidth(text, NUMBER_SIZE, isNegative) / 2;

/** Signed, leading zero dropped. */
export function entryText(value: number, digits: number): string {
  return minus(signed(value, digits).replace(/^([+-])0\./, '$1.'));
}

/** Distances of threads, best first: the usual one, and where it costs decimals a wider one if the drawing has room for it. */
function stepsOf(order: number, format: Format, room: number): readonly number[] {
  if (order > MOST_NUMBERED) return [Math.min(format === 'wide' ? 26 : 14, room / (order + 2))];
  const usual = Math.min(format === 'wide' ? 46 : 37, room / (order + 2));
  return [usual, ...WIDER.filter((step) => step > usual && step * (order + 2) <= room)];
}

const WIDER: readonly number[] = [42, 52];

function knotsOf({ values }: CouplingMatrix, at: (thread: number) => number, step: number, dy: number): Knot[] {
  const largest = Math.max(...values.map((row) => Math.max(...row.map(Math.abs))), Number.MIN_VALUE);
  return values.flatMap((row, n) =>
    row.flatMap((value, column): Knot[] => {
      if (column < n || value === 0) return [];
      const side = LARGEST * step * Math.sqrt(Math.abs(value) / largest);
      const place = { row: n, column, x: at(column), y: at(n) + dy };
      if (Math.abs(value) < PRINTED) return [{ ...place, kind: 'dot', side: 3 }];
      if (side < leastSigned(step)) return [{ ...place, kind: 'ring', side: Math.min(RING.share * step, RING.most) }];
      return [{ ...place, kind: value > 0 ? 'square' : 'lozenge', side }];
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

/** Does a number keep clear of its neighbors in the row, of the mark on the diagonal and of the name of the row? */
function isFree(entry: Entry, others: readonly Entry[], diagonal: Knot | undefined, nameEnd: number): boolean {
  const half = halfWidth(entry);
  if (entry.x - half - CLEAR < nameEnd) return false;
  if (diagonal !== undefined && entry.x + half + CLEAR > diagonal.x - diagonal.side * Math.SQRT1_2) return false;
  return others.every(
    (other) =>
      other.row !== entry.row || other === entry || Math.abs(other.x - entry.x) >= half + halfWidth(other) + CLEAR,
  );
}

/** Those numbers of a matrix that have room. */
function withRoom(entries: readonly Entry[], knots: readonly Knot[], step: number, nameEnd: number): Entry[] {
  if (step < NUMBER_SIZE + 2) return [];
  const diagonal = new Map(knots.filter(({ row, column }) => row === column).map((knot) => [knot.row, knot]));
  // Cross couplings first: they are what a matrix is looked at for.
  const isMain = ({ row, column }: Entry): number => (row === column + 1 ? 1 : 0);
  const kept: Entry[] = [];
  for (const entry of [...entries].sort((a, b) => isMain(a) - isMain(b)))
    if (isFree(entry, kept, diagonal.get(entry.row), nameEnd)) kept.push(entry);
  return entries.filter((entry) => kept.includes(entry));
}

/** The most numbers that have room: all with as many decimals as fit, those of cross couplings, or as many as there is room for. */
function numbersOf(matrix: CouplingMatrix, free: (writing: Writing) => readonly [Entry[], Entry[]]): Numbers {
  const { order } = matrix;
  for (const writing of writings(order)) {
    const [all, kept] = free(writing);
    if (kept.length === all.length) return { ...writing, entries: all };
    if (writing.digits === 2 && order <= MOST_NUMBERED && kept.length > 0)
      return { numbers: 'some', digits: 1, entries: kept };
  }
  return { numbers: 'none', digits: 0, entries: [] };
}

type Numbers = Pick<MatrixLayout, 'numbers' | 'digits' | 'entries'>;

/** Room for the names of rows, and above for those of columns, px. */
const NAMES = 30;
const TOP = 24;

function layoutWith(matrix: CouplingMatrix, width: number, step: number): MatrixLayout {
  const { order } = matrix;
  const left = NAMES + step / 2;
  const at = (thread: number): number => left + thread * step;
  const dy = TOP - NAMES;
  // Names of three digits need all of their margin.
  const nameEnd = NAMES - (order > 99 ? 7 : 13);
  const knots = knotsOf(matrix, at, step, dy);
  const found = numbersOf(matrix, (writing) => {
    const entries = entriesOf(matrix, at, dy, writing);
    return [entries, withRoom(entries, knots, step, nameEnd)];
  });
  const size = order + 2;
  return { width, height: TOP + size * step + 4, left, nameEnd, top: left + dy, step, size, knots, ...found };
}

/** Threads, marks and numbers of a matrix in one format. */
export function matrixLayout(matrix: CouplingMatrix, format: Format): MatrixLayout {
  const width = FORMAT_WIDTH[format];
  const layouts = stepsOf(matrix.order, format, width - NAMES - 4).map((step) => layoutWith(matrix, width, step));
  return layouts.reduce((best, each) => (each.digits > best.digits ? each : best));
}
