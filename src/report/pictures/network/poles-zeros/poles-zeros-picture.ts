import { checkPolynomials, type FilterPolynomials } from '../../../../forms/index.js';
import { type Drawing, FORMAT_WIDTH, type Format, type Picture } from '../../../svg/drawing.js';
import { cross, ring, triangle } from '../../../svg/marks.js';
import { element, fragment, type Markup } from '../../../svg/markup.js';
import { label, minus, textWidth } from '../../../svg/words.js';
import { trimmed } from '../../../words/numbers.js';
import { leaderEnds, type Plane, planeOf, type RootLabel, type RootMark } from './plane.js';
import { type Labelled, labelledRoots } from './roots.js';

function ground({ left, right, top, bottom, axis, omegaTicks, realTicks }: Plane): Markup {
  const area = { y: top, height: bottom - top };
  return fragment(
    element('rect', { x: left, width: axis - left, ...area, class: 'f-window' }),
    element('rect', { x: axis, width: right - axis, ...area, class: 'f-ground' }),
    ...omegaTicks.map(({ y }) => element('line', { x1: left, x2: right, y1: y, y2: y, class: 's-hairline hair' })),
    ...realTicks.map(({ x }) => element('line', { x1: x, x2: x, y1: bottom, y2: bottom + 6, class: 's-second hair' })),
    element('line', { x1: left, x2: right, y1: bottom, y2: bottom, class: 's-second hair' }),
  );
}

function ticks({ left, bottom, omegaTicks, realTicks }: Plane): Markup {
  const signedText = (value: number): string => (value > 0 ? `+${trimmed(value, 3)}` : minus(trimmed(value, 3)));
  return fragment(
    ...omegaTicks
      .filter(({ isNamed }) => isNamed)
      .map(({ value, y }) => label(left - 6, y + 4, signedText(value), 'small f-second', 'end')),
    ...realTicks.map(({ value, x }) => label(x, bottom + 18, minus(trimmed(value, 6)), 'small f-second', 'mid')),
  );
}

/** The axis with the passband as a bar on it. */
function axisMarks({ axis, top, bottom, omegaTicks }: Plane): Markup {
  const [high, low] = [omegaTicks[0]?.y ?? top, omegaTicks[2]?.y ?? bottom];
  return fragment(
    element('line', { x1: axis, x2: axis, y1: top, y2: bottom, class: 's-second hair' }),
    element('rect', { x: axis - 4, y: high, width: 8, height: low - high, class: 'f-ink' }),
  );
}

/** Straight from the rim of a mark to its label: where labels fan out, lines leave the crowd at once. */
function leader(each: RootLabel): Markup {
  const [[x1, y1], [x2, y2]] = leaderEnds(each);
  return element('line', { x1, y1, x2, y2, class: 'thin s-second half' });
}

function markOf({ kind, x, y }: RootMark): Markup {
  if (kind === 'pole') return cross(x, y);
  return kind === 'reflection' ? ring(x, y) : triangle(x, y);
}

/** Zeros in one line of words that fits the width; the rest are counted. */
export function farText(groups: readonly Labelled[], place: string, width: number, letters: number): string {
  for (let shown = groups.length; shown > 0; shown--) {
    const values = groups.slice(0, shown).map(({ text }) => text);
    const rest = groups.length - shown;
    const more = rest > 0 ? ` and ${rest} more` : '';
    const text = `${place}: ${groups.length === 1 && groups[0]?.count === 1 ? 'zero' : 'zeros'} at ${values.join(', ')}${more}`;
    if (textWidth(text, letters) <= width) return text;
  }
  return `${place}: ${groups.length} zeros`;
}

function drawing(plane: Plane, format: Format): Drawing {
  const { left, top, width, height, letters, farAbove, below, belowWords, labels, marks } = plane;
  const small = letters < 12 ? 'small f-second' : 'tick';
  const far = (groups: readonly Labelled[], place: string, y: number): Markup =>
    groups.length === 0 ? fragment() : label(left, y, farText(groups, place, width - left - 4, letters), small);
  const body = fragment(
    ground(plane),
    ticks(plane),
    ...labels.map(leader),
    axisMarks(plane),
    ...marks.map(markOf),
    ...labels.map(({ x, y, text, anchor }) =>
      label(x, y + 4, text, `${small}${anchor === 'end' ? ' halo' : ''}`, anchor),
    ),
    far(farAbove, 'far above', top - 10),
    far(below, belowWords, height - 6),
  );
  return { width: FORMAT_WIDTH[format], height, body };
}

/** A value that a line of words does not break: its spaces are no-break spaces. */
const unbroken = ({ text }: Labelled): string => text.replaceAll(' ', '\u00a0');

function zeroWords(transmissionZeros: FilterPolynomials['transmissionZeros']): string {
  const count = transmissionZeros.length;
  const zeros = labelledRoots('transmission', transmissionZeros).map(unbroken);
  if (count === 0) return 'No finite transmission zeros';
  const shown = zeros.length > 4 ? `${zeros.slice(0, 4).join(', ')} and more` : zeros.join(', ');
  return `${count} transmission ${count === 1 ? 'zero' : 'zeros'}, ${shown}`;
}

function findingOf({ poles, transmissionZeros }: FilterPolynomials): string {
  const nearest = Math.max(...poles.map(({ re }) => re));
  const pole = labelledRoots('pole', poles).reduce((a, b) =>
    Math.abs(b.at.re - nearest) < Math.abs(a.at.re - nearest) ? b : a,
  );
  return `${zeroWords(transmissionZeros)}; pole nearest the axis ${unbroken(pole)}`;
}

function captionOf(planes: readonly Plane[]): string {
  const isShown = planes.some(({ marks }) => marks.some(({ kind }) => kind === 'transmission'));
  const counts = planes.map(({ unlabelled }) => unlabelled);
  const most = Math.max(...counts);
  const isSame = counts.every((count) => count === most);
  const more = isSame ? `${most} more ${most === 1 ? 'value stands' : 'values stand'}` : 'values without room stand';
  const rest = most > 0 ? `; ${more} in the table` : '';
  return `Low-pass plane, equal axes, dark right half; bar on the axis: passband. Cross: pole, circle: reflection zero${isShown ? ', triangle: transmission zero' : ''}${rest}.`;
}

/**
 * Poles and zeros of a response in the low-pass plane, s = sigma + j*omega, both axes to one scale.
 *
 * Values on the axis are written as imaginary part, others as real and imaginary part; mirror images share one label with ±. Zeros more
 * than three times farther out than poles and band edges are told in words. Cost: a few milliseconds up to order 100.
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_POLYNOMIALS
 *
 * @example
 * const response = generalizedChebyshev({ order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45] });
 * polesAndZerosPicture(response).finding.startsWith('2 transmission zeros, ±j1.450; pole nearest the axis'); // true
 */
export function polesAndZerosPicture(polynomials: FilterPolynomials): Picture {
  const checked = checkPolynomials(polynomials);
  const [wide, narrow] = [planeOf(checked, 'wide'), planeOf(checked, 'narrow')];
  const finding = findingOf(checked);
  return {
    name: 'poles-zeros',
    finding,
    caption: captionOf([wide, narrow]),
    alternative: `Poles and zeros of order ${checked.order}. ${finding}.`,
    wide: drawing(wide, 'wide'),
    narrow: drawing(narrow, 'narrow'),
  };
}
