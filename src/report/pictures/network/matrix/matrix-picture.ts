import type { CouplingMatrix } from '../../../../forms/index.js';
import { checkMatrix } from '../../../check-design.js';
import { type Drawing, FORMAT_WIDTH, type Picture } from '../../../svg/drawing.js';
import { lozenge, square } from '../../../svg/marks.js';
import { element, fragment, type Markup } from '../../../svg/markup.js';
import { label } from '../../../svg/words.js';
import { nodeName } from '../../../words/nodes.js';
import { couplingText } from '../routing/label-text.js';
import { pairName } from '../routing/routing-words.js';
import { type Entry, type Knot, type MatrixLayout, matrixLayout } from './matrix-layout.js';

/** Above this order only every fifth thread carries a name, and stands out. */
const MOST_NAMED = 12;

/** Threads closer than this would run into one gray area, px. */
const CLOSEST = 8;

/** Names keep this distance from each other, px. */
const NAME_STEP = 24;

function mark({ x, y, kind, side }: Knot): Markup {
  if (kind === 'square') return square(x, y, side);
  if (kind === 'lozenge') return lozenge(x, y, side);
  const rim = kind === 'ring' ? 's-ink edge' : 's-second thin';
  return element('circle', { cx: x, cy: y, r: side / 2, class: `f-window ${rim}` });
}

function number({ x, y, text, isNegative }: Entry): Markup {
  return label(x, y + 4, text, `small halo${isNegative ? ' bold f-negative' : ''}`, 'mid');
}

/** Is a thread one of those that stand out in a large matrix? */
const isFifth = (thread: number): boolean => thread > 0 && thread % 5 === 0;

function threads({ left, top, step, size }: MatrixLayout): Markup {
  const [x1, y1] = [left - step / 2, top - step / 2];
  const [x2, y2] = [x1 + size * step, y1 + size * step];
  const ground = element('rect', { x: x1, y: y1, width: size * step, height: size * step, class: 'f-window' });
  const lines = Array.from({ length: size }, (_, thread) => {
    const stands = size - 2 > MOST_NAMED && isFifth(thread);
    if (step < CLOSEST && !stands) return fragment();
    const classes = stands ? 's-second thin half' : 's-hairline hair';
    const [x, y] = [left + thread * step, top + thread * step];
    return fragment(
      element('line', { x1: x, y1, x2: x, y2, class: classes }),
      element('line', { x1, y1: y, x2, y2: y, class: classes }),
    );
  });
  return fragment(ground, ...lines);
}

/** Which threads have room for their name: both ports, and every one, every fifth or every tenth resonator. */
export function namedThreads({ size, step }: Pick<MatrixLayout, 'size' | 'step'>): readonly number[] {
  const every = [1, 5, 10, 20].find((count) => count * step >= NAME_STEP) ?? 50;
  const apart = Math.ceil((0.8 * NAME_STEP) / step);
  return Array.from({ length: size }, (_, thread) => thread).filter((thread) => {
    if (thread === 0 || thread === size - 1) return true;
    return thread % every === 0 && thread >= apart && thread <= size - 1 - apart;
  });
}

function names(layout: MatrixLayout): Markup {
  const { left, top, step, size, nameEnd } = layout;
  const order = size - 2;
  return fragment(
    ...namedThreads(layout).map((thread) =>
      fragment(
        label(left + thread * step, top - step / 2 - 7, nodeName(thread, order), 'small bold f-second', 'mid'),
        label(nameEnd, top + thread * step + 4, nodeName(thread, order), 'small bold f-second', 'end'),
      ),
    ),
  );
}

function drawing(layout: MatrixLayout, format: 'wide' | 'narrow'): Drawing {
  const { height, knots, entries } = layout;
  const body = fragment(threads(layout), ...knots.map(mark), ...entries.map(number), names(layout));
  return { width: FORMAT_WIDTH[format], height, body };
}

interface Sized {
  readonly from: number;
  readonly to: number;
  readonly value: number;
}

/** Couplings off the diagonal that print as more than zero, strongest first. */
function couplingsBySize({ values }: CouplingMatrix): Sized[] {
  return values
    .flatMap((row, from) => row.map((value, to) => ({ from, to, value })))
    .filter(({ from, to, value }) => to > from && Math.abs(value) >= 5e-5)
    .sort((a, b) => Math.abs(b.value) - Math.abs(a.value) || a.from - b.from || a.to - b.to);
}

function findingOf(matrix: CouplingMatrix): string {
  const couplings = couplingsBySize(matrix);
  const [strongest, weakest] = [couplings[0], couplings.at(-1)];
  if (strongest === undefined || weakest === undefined) return 'No coupling prints as more than zero';
  const named = ({ from, to, value }: Sized): string =>
    `${pairName({ from, to }, matrix.order)}, ${couplingText(value)}`;
  if (couplings.length === 1) return `One coupling: ${named(strongest)}`;
  return `${couplings.length} couplings: strongest ${named(strongest)}, weakest ${named(weakest)}`;
}

/** Which numbers stand below the diagonal, in words that are true of all layouts. */
function numberWords(layouts: readonly MatrixLayout[]): string {
  const kinds = layouts.map(({ numbers, entries }) => (entries.length > 0 ? numbers : 'none'));
  if (kinds.every((kind) => kind === 'none')) return 'the numbers stand in the table';
  if (kinds.every((kind) => kind === 'all')) return 'numbers below the diagonal';
  const which = kinds.some((kind) => kind === 'all' || kind === 'some') ? '' : ' for cross couplings only';
  return `numbers below the diagonal${which}${kinds.every((kind) => kind === 'cross') ? '' : ' where there is room'}`;
}

function captionOf(layouts: readonly MatrixLayout[]): string {
  const counted = (kind: Knot['kind']): number =>
    layouts.filter(({ knots }) => knots.some((knot) => knot.kind === kind)).length;
  const ring = counted('ring') < layouts.length ? 'ring, where marks get small' : 'ring';
  const marks = [
    ...(counted('square') > 0 ? ['square: positive'] : []),
    ...(counted('lozenge') > 0 ? ['lozenge: negative'] : []),
    ...(counted('ring') > 0 ? [`${ring}: too weak to draw size and sign, which the table holds`] : []),
    ...(counted('dot') > 0 ? ['hollow dot: came out zero'] : []),
  ];
  const fifth = (layouts[0]?.size ?? 0) - 2 > MOST_NAMED ? ['every fifth thread is darker'] : [];
  const second = ['Marks on and above the diagonal', numberWords(layouts), ...fifth].join(', ');
  return `Area is size, ${[...marks, 'bare crossing: no coupling'].join(', ')}. ${second}.`;
}

/**
 * The coupling matrix as threads and knots: one thread a row and column, a mark where two of them are coupled.
 *
 * The area of a mark is proportional to the size of the entry, squares are positive, lozenges negative; entries too weak for
 * either are rings. Numbers stand below the diagonal as far as they find room. Cost: below a millisecond at order 10, some 10 ms at order 100.
 *
 * @throws FilterFailure E_TYPE, E_MATRIX_SHAPE, E_NOT_FINITE, E_ENTRY_RANGE, E_NOT_SYMMETRIC
 *
 * @example
 * const { matrix } = folded(transversal(generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45] })));
 * matrixPicture(matrix).finding.startsWith('8 couplings: strongest S'); // true
 */
export function matrixPicture(given: CouplingMatrix): Picture {
  const matrix = checkMatrix(given);
  const wide = matrixLayout(matrix, 'wide');
  const narrow = matrixLayout(matrix, 'narrow');
  const finding = findingOf(matrix);
  return {
    name: 'matrix',
    finding,
    caption: captionOf([wide, narrow]),
    alternative: `Coupling matrix of order ${matrix.order}. ${finding}.`,
    wide: drawing(wide, 'wide'),
    narrow: drawing(narrow, 'narrow'),
  };
}
