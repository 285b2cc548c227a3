import { scaleLinear } from 'd3-scale';
import { edgesOfBand, hzFromOmega } from '../../../forms/index.js';
import { triangle } from '../../svg/marks.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { label, textWidth } from '../../svg/words.js';
import { frequencyText } from '../../words/numbers.js';
import { decimalsOf, isShown, type Plot, xOf } from './plot.js';

const MAJOR = 8;
const MINOR = 4;
/** Heights below the plot, pixels: numbers, the passband bar, first and second row of its labels, end. */
const NUMBERS = 22;
const BAR = 36;
const ROWS = [58, 73, 88] as const;
/** Room below the last row. */
const BELOW = 7;

/** A ruler and its height, which depends on how many rows its labels need. */
export interface Ruler {
  readonly markup: Markup;
  readonly height: number;
}

function tickStep(ticks: readonly number[]): number {
  return ticks.length > 1 ? (ticks[1] as number) - (ticks[0] as number) : 1;
}

function lane(plot: Plot, bottom: number): Markup {
  const { unit, left, right } = plot;
  const scale = scaleLinear([plot.fromHz / unit.hertz, plot.toHz / unit.hertz], [left, right]);
  const wanted = Math.floor((right - left) / (plot.fromHz / unit.hertz >= 10_000 ? 85 : 62));
  const ticks = scale.ticks(Math.max(2, wanted));
  const digits = decimalsOf(tickStep(ticks));
  const minor = scale.ticks(5 * Math.max(2, wanted)).filter((value) => !ticks.includes(value));
  const short = minor.map((value) => tick(scale(value), bottom, MINOR));
  const room = right - textWidth(unit.name, 12.5) - 6;
  const long = ticks.map((value) => {
    const text = value.toFixed(digits);
    const fits = scale(value) + textWidth(text, 12.5) / 2 < room;
    const number = fits ? [label(scale(value), bottom + NUMBERS, text, 'tick', 'mid')] : [];
    return fragment(tick(scale(value), bottom, MAJOR), ...number);
  });
  const base = element('line', { x1: left, x2: right, y1: bottom, y2: bottom, class: 's-ink hair' });
  return fragment(base, ...short, ...long, label(right, bottom + NUMBERS, unit.name, 'tick', 'end'));
}

function tick(x: number, y: number, length: number): Markup {
  return element('line', { x1: x, x2: x, y1: y, y2: y + length, class: 's-ink hair' });
}

interface BelowLabel {
  readonly text: string;
  readonly classes: string;
  /** Middles at which the label may stand, best first. */
  readonly middles: readonly number[];
}

interface PlacedLabel {
  readonly text: string;
  readonly classes: string;
  readonly middle: number;
  readonly row: number;
}

/** Puts each label into the first row where it touches no other; one that fits in none is left to the table. */
function stacked(plot: Plot, labels: readonly BelowLabel[]): readonly PlacedLabel[] {
  const placed: (PlacedLabel & { readonly from: number; readonly to: number })[] = [];
  for (const { text, middles, classes } of labels) {
    const half = textWidth(text, 12.5) / 2;
    const places = middles.flatMap((wish) =>
      ROWS.map((row) => {
        const middle = Math.min(Math.max(wish, half), plot.right + 6 - half);
        return { text, classes, middle, row, from: middle - half - 4, to: middle + half + 4 };
      }),
    );
    const isFree = ({ row, from, to }: (typeof places)[number]): boolean =>
      placed.every((other) => other.row !== row || other.to <= from || other.from >= to);
    const place = places.find(isFree);
    if (place !== undefined) placed.push(place);
  }
  return placed;
}

/** Under the bar; a little to a side only where it would leave the drawing. */
function passbandLabel([from, to]: readonly [number, number], text: string): BelowLabel {
  return { text, classes: '', middles: [(from + to) / 2] };
}

/**
 * The ruler at the foot of a plot, which may lie below its floor. First lane: round frequencies. Second lane: the passband as a bar, and the transmission zeros on
 * the axis.
 */
export function ruler(
  plot: Plot,
  bottom: number,
  transmissionZeros: readonly { readonly re: number; readonly im: number }[],
): Ruler {
  const { unit, left, right } = plot;
  const { lowerHz, upperHz } = edgesOfBand(plot.band);
  const [from, to] = [Math.max(left, xOf(plot, lowerHz)), Math.min(right, xOf(plot, upperHz))];
  const name = `${frequencyText(lowerHz, unit)}–${frequencyText(upperHz, unit)}`;
  const zeros = transmissionZeros
    .filter(({ re }) => re === 0)
    .map(({ im }) => hzFromOmega(plot.band, im))
    .filter((hz) => isShown(plot, hz))
    .sort((a, b) => a - b);
  const distinct = zeros.filter((hz, n) => n === 0 || hz - (zeros[n - 1] as number) > 1e-9 * hz);
  const isSeen = to > from;
  // A picture beside the band says on which side the band lies.
  const text = isSeen ? `passband ${name}` : from > right ? `passband ${name} →` : `← passband ${name}`;
  const band = passbandLabel(isSeen ? [from, to] : from > right ? [right, right] : [left, left], text);
  const marks = distinct.map((hz) => ({
    text: frequencyText(hz, { ...unit, digits: 2 }),
    classes: 'tick',
    middles: [xOf(plot, hz)],
  }));
  const labels = stacked(plot, [band, ...marks]);
  const markup = fragment(
    lane(plot, bottom),
    ...(isSeen
      ? [element('rect', { x: from, y: bottom + BAR - 4, width: Math.max(2, to - from), height: 8, class: 'f-ink' })]
      : []),
    ...distinct.map((hz) => triangle(xOf(plot, hz), bottom + BAR)),
    ...labels.map(({ middle, row, text, classes }) => label(middle, bottom + row, text, classes, 'mid')),
  );
  return { markup, height: Math.max(BAR, ...labels.map(({ row }) => row)) + BELOW };
}
