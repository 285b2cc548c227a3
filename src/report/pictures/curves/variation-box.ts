import type { MaskRow } from '../../../forms/index.js';
import { element, type Markup } from '../../svg/markup.js';
import { requirementOf } from '../../words/requirement.js';
import { textSize } from './curve-name.js';
import { type Box, claim, isFree, type LabelMap, takeBox } from './label-map.js';
import { drawLid, type Lid, lidBox } from './lids.js';
import { limitWords, roomText } from './limit-words.js';
import { clipped, isShown, type Plot, xOf, yOf } from './plot.js';
import type { PlacedText } from './walls.js';

/** A limit on variation: a box as wide as its band and as tall as what is allowed, standing on the best value. */
export interface VariationBox {
  readonly row: MaskRow;
  readonly fromHz: number;
  readonly toHz: number;
  readonly best: number;
  /** Level of the side that the curve may not reach: that of the best value, worse by what is allowed. */
  readonly end: number;
}

/** Value of a curve at a frequency between its points, straight from one to the next. */
export function valueAt(hz: Float64Array, values: Float64Array, at: number): number {
  const next = Math.max(
    1,
    Math.min(
      hz.length - 1,
      hz.findIndex((each) => each >= at),
    ),
  );
  const [a, b] = [hz[next - 1] as number, hz[next] as number];
  const t = Math.max(0, Math.min(1, (at - a) / (b - a)));
  return (values[next - 1] as number) * (1 - t) + (values[next] as number) * t;
}

/** The box of a row about variation; `worst` is the curve's value at its worst frequency, `scale` turns the row's unit into the plot's. */
export function variationBox(row: MaskRow, worst: number, scale: number): VariationBox {
  const { fromHz = 0, toHz = Number.POSITIVE_INFINITY } = row.line;
  const best = worst - row.predicted * scale;
  return { row, fromHz, toHz, best, end: best + row.limit * scale };
}

function lidOfBox(plot: Plot, { fromHz, toHz, end }: VariationBox): Lid {
  const [from, to] = [Math.max(fromHz, plot.fromHz), Math.min(toHz, plot.toHz)];
  return {
    fromHz: from,
    toHz: to,
    levels: [end, end],
    side: plot.upper > plot.lower ? 'above' : 'below',
    forbids: 'transmission',
  };
}

/** Dotted sides and the hatched lid on the worse one, cut by a frame; a side that lies beyond the picture is not drawn. */
export function drawVariationBox(plot: Plot, box: VariationBox, clip: string): Markup {
  const lid = lidOfBox(plot, box);
  const [x0, x1] = [xOf(plot, lid.fromHz), xOf(plot, lid.toHz)];
  const [y0, y1] = [yOf(plot, box.best), yOf(plot, box.end)];
  const sides = [box.fromHz, box.toHz].filter((hz) => isShown(plot, hz)).map((hz) => xOf(plot, hz));
  const side = (x: number): Markup => element('line', { x1: x, x2: x, y1: y0, y2: y1, class: 'line dots s-ink' });
  const base = element('line', { x1: x0, x2: x1, y1: y0, y2: y0, class: 'line dots s-ink' });
  return clipped(plot, clip, base, ...sides.map(side), drawLid(plot, lid));
}

/** Takes the place of a box's sides and lid, so that no text is written on them. */
export function takeVariationBox(map: LabelMap, plot: Plot, box: VariationBox): void {
  const lid = lidOfBox(plot, box);
  takeBox(map, lidBox(plot, lid));
  const [from, to] = [
    Math.min(yOf(plot, box.best), yOf(plot, box.end)),
    Math.max(yOf(plot, box.best), yOf(plot, box.end)),
  ];
  for (const x of [xOf(plot, lid.fromHz), xOf(plot, lid.toHz)])
    takeBox(map, { left: x, right: x, top: from, bottom: to });
}

interface Wording {
  readonly lines: readonly string[];
  readonly isMet: boolean;
}

function wordingOf(plot: Plot, { row }: VariationBox): Wording {
  const requirement = requirementOf(row, plot.unit);
  const { predicted, limit, unit, isMet } = requirement;
  const used = `${predicted.toFixed(unit === 'dB' ? 2 : 1)} of ${limitWords(limit)} ${unit} used`;
  return { lines: [isMet ? used : `${used}, ${roomText(requirement)}`], isMet };
}

/** Tops of a label on the free side of its lid, and on the side inside the box. */
function placesOf(
  plot: Plot,
  box: VariationBox,
  [width, height]: readonly [number, number],
): Record<'outside' | 'inside', readonly Box[]> {
  const { left, right, top, bottom } = lidBox(plot, lidOfBox(plot, box));
  const [away, into] =
    plot.upper > plot.lower
      ? [[top - height - 2, top - height - 14], [bottom + 2]]
      : [[bottom + 2, bottom + 14, bottom + 30], [top - height - 2]];
  const middles = [(left + right) / 2, left + width / 2 + 4, right - width / 2 - 4];
  const at = (tops: readonly number[]): readonly Box[] =>
    middles.flatMap((x) =>
      tops.map((y) => ({ left: x - width / 2, right: x + width / 2, top: y, bottom: y + height })),
    );
  return { outside: at(away), inside: at(into) };
}

/**
 * How much of the allowed variation is used, beside the lid where nothing is in the way: all outside their boxes or all
 * inside where that can be, so that no two face each other; a miss that finds no place stands above the plot.
 */
export function variationLabels(map: LabelMap, plot: Plot, boxes: readonly VariationBox[]): readonly PlacedText[] {
  const wordings = boxes.map((box) => ({ box, ...wordingOf(plot, box) }));
  const tried = (sides: readonly ('outside' | 'inside')[]) =>
    wordings.map(({ box, lines, isMet }) => {
      const places = placesOf(plot, box, textSize(lines, 13, true));
      const found = sides.flatMap((side) => places[side]).find((place) => isFree(map, place));
      return { found, lines, isMet };
    });
  const whole = ([['outside'], ['inside']] as const)
    .map(tried)
    .find((all) => all.every(({ found }) => found !== undefined));
  return (whole ?? tried(['outside', 'inside'])).flatMap(({ found, lines, isMet }) => {
    if (found !== undefined && claim(map, found)) return [{ box: found, lines, isMet }];
    if (isMet) return [];
    const [width, height] = textSize(lines, 13, true);
    const box = { left: plot.right - width, right: plot.right, top: plot.top - 22, bottom: plot.top - 22 + height };
    return [{ box, lines, isMet }];
  });
}
