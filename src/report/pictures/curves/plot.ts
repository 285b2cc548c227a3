import { scaleLinear } from 'd3-scale';
import { line } from 'd3-shape';
import { type Band, edgesOfBand } from '../../../forms/index.js';
import type { Format } from '../../svg/drawing.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { label, minus, textWidth } from '../../svg/words.js';
import type { FrequencyUnit } from '../../words/numbers.js';
import { type Point, thinned } from './thin.js';

/** A plot with frequency across: where it stands in its drawing, and how hertz and levels become pixels. */
export interface Plot {
  readonly format: Format;
  /** What the names of this drawing's parts begin with. */
  readonly prefix: string;
  readonly band: Band;
  readonly unit: FrequencyUnit;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly fromHz: number;
  readonly toHz: number;
  /** Level at the upper and at the lower side of the plot. */
  readonly upper: number;
  readonly lower: number;
}

/** Pixel of a frequency. */
export function xOf({ fromHz, toHz, left, right }: Plot, hz: number): number {
  return scaleLinear([fromHz, toHz], [left, right])(hz);
}

/** Pixel of a level. */
export function yOf({ upper, lower, top, bottom }: Plot, level: number): number {
  return scaleLinear([upper, lower], [top, bottom])(level);
}

/** Whether a frequency lies in the picture. */
export function isShown({ fromHz, toHz }: Plot, hz: number): boolean {
  return hz >= fromHz && hz <= toHz;
}

/** Whether a span touches the frequencies of a picture; an absent end is open. */
export function touches({ fromHz, toHz }: Plot, span: { readonly fromHz?: number; readonly toHz?: number }): boolean {
  return (span.fromHz ?? 0) < toHz && (span.toHz ?? Number.POSITIVE_INFINITY) > fromHz;
}

/** Whether a point lies in the plot itself. */
export function isInPlot(plot: Plot, x: number, y: number): boolean {
  return x >= plot.left && x <= plot.right && y >= plot.top - 1 && y <= plot.bottom + 1;
}

/** Curves run on beyond the frame, where they are cut; so far beyond, pixels. */
const BEYOND = 40;

/** The points of a curve within the plot, thinned. */
export function curvePoints(plot: Plot, hz: ArrayLike<number>, levels: ArrayLike<number>): readonly Point[] {
  const { left, right, top, bottom, fromHz, toHz, upper, lower } = plot;
  const perHz = (right - left) / (toHz - fromHz);
  const perLevel = (bottom - top) / (lower - upper);
  const xs = new Float64Array(hz.length);
  const ys = new Float64Array(hz.length);
  let count = 0;
  for (let n = 0; n < hz.length; n += 1) {
    const x = left + ((hz[n] as number) - fromHz) * perHz;
    if (x < left - BEYOND || x > right + BEYOND) continue;
    const y = top + ((levels[n] as number) - upper) * perLevel;
    xs[count] = x;
    ys[count] = Math.min(Math.max(y, top - BEYOND), bottom + BEYOND);
    count += 1;
  }
  return thinned(xs.subarray(0, count), ys.subarray(0, count));
}

/** A curve as a path. */
export function curvePath(points: readonly Point[], classes: string): Markup {
  const d = line<Point>()
    .x(([x]) => x)
    .y(([, y]) => y)
    .digits(1)([...points]);
  return element('path', { d: d ?? '', class: `line ${classes}` });
}

/** Frame that curves, walls and boxes are cut by; a little room keeps the full width of a line on the frame. */
export function clipFrame(plot: Plot, name: string): Markup {
  const { left, right, top, bottom } = plot;
  const frame = element('rect', { x: left, y: top - 1.4, width: right - left, height: bottom - top + 1.4 });
  return element('clipPath', { id: `${plot.prefix}-${name}` }, frame);
}

/** A group cut by a frame. */
export function clipped(plot: Plot, name: string, ...parts: readonly Markup[]): Markup {
  return element('g', { 'clip-path': `url(#${plot.prefix}-${name})` }, ...parts);
}

/** The plot's ground, and the passband as a lit window in it. */
export function litWindow(plot: Plot, bottom: number = plot.bottom): Markup {
  const { left, right, top, band } = plot;
  const { lowerHz, upperHz } = edgesOfBand(band);
  const [from, to] = [Math.max(left, xOf(plot, lowerHz)), Math.min(right, xOf(plot, upperHz))];
  const window = element('rect', { x: from, y: top, width: to - from, height: bottom - top, class: 'f-window' });
  return fragment(
    element('rect', { x: left, y: top, width: right - left, height: bottom - top, class: 'f-ground' }),
    ...(to > from ? [window] : []),
  );
}

/** Decimals that tell the steps of an axis apart. */
export function decimalsOf(step: number): number {
  return Math.max(0, Math.min(9, Math.ceil(-Math.log10(step) - 1e-9)));
}

/** Numbers of a level axis, with as many decimals as tell them apart. */
function levelTexts(ticks: readonly number[]): readonly string[] {
  const step = ticks.length > 1 ? Math.abs((ticks[1] as number) - (ticks[0] as number)) : 1;
  const digits = decimalsOf(step);
  return ticks.map((level) => minus((level + 0).toFixed(digits)).replace(/^−0(\.0*)?$/, (zero) => zero.slice(1)));
}

/** Room that the numbers of a level axis need at its left, pixels. */
export function axisRoom(ticks: readonly number[]): number {
  return Math.max(...levelTexts(ticks).map((text) => textWidth(text, 12.5))) + 9;
}

/** Horizontal hairlines with their numbers at the left, and the unit alone above the topmost. */
export function levelLines(plot: Plot, ticks: readonly number[], unit: string): Markup {
  const lines = levelTexts(ticks).map((text, n) => {
    const y = yOf(plot, ticks[n] as number);
    return fragment(
      element('line', { x1: plot.left, x2: plot.right, y1: y, y2: y, class: 's-hairline hair' }),
      label(plot.left - 6, y + 4.4, text, 'tick', 'end'),
    );
  });
  return fragment(...lines, label(plot.left - 6, plot.top - 12, unit, 'tick', 'end'));
}

/** What a script needs to place its cursor: the plot's frame in the drawing and the frequencies at its sides. */
export function plotFrame(plot: Plot, top: number, bottom: number, ...parts: readonly Markup[]): Markup {
  const attributes = {
    class: 'plot',
    'data-from-hz': String(plot.fromHz),
    'data-to-hz': String(plot.toHz),
    'data-left': plot.left,
    'data-right': plot.right,
    'data-top': top,
    'data-bottom': bottom,
  };
  return element('g', attributes, ...parts);
}
