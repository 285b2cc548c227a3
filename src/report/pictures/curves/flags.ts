import type { Format } from '../../svg/drawing.js';
import { dot, octagon } from '../../svg/marks.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { label, textWidth } from '../../svg/words.js';
import { type LabelMap, takeBox, takeLine } from './label-map.js';
import { type Plot, xOf } from './plot.js';
import type { WorstPoint } from './worst-points.js';

/** Height of one row of flags, pixels. The rows stand below the floor, where no curve runs. */
const ROW = 38;
/** Rows at most, and flags of met limits at most: the narrow drawing shows the tightest only. */
const ROWS: Readonly<Record<Format, number>> = { wide: 2, narrow: 3 };
const MET: Readonly<Record<Format, number>> = { wide: 8, narrow: 1 };

/** A flag with its place: the row, and on which side of its leader the text stands. */
export interface Flag {
  readonly point: WorstPoint;
  readonly row: number;
  readonly from: number;
  readonly to: number;
  readonly toRight: boolean;
}

function candidates(plot: Plot, point: WorstPoint): readonly Flag[] {
  const [first, second] = point.lines;
  const width = Math.max(textWidth(first, 13, true), textWidth(second, 12.5)) + 6;
  // Away from the band: that is where the limit lies whose worst point this is.
  const outward = point.x > xOf(plot, plot.band.centerHz);
  const rows = Array.from({ length: ROWS[plot.format] }, (_, row) => row);
  return rows.flatMap((row) =>
    [outward, !outward].map((toRight) => {
      const [from, to] = toRight ? [point.x, point.x + width] : [point.x - width, point.x];
      return { point, row, from, to, toRight };
    }),
  );
}

/** Whether a flag lies in the drawing, touches no other flag of its row, and no leader runs through a text. */
function fits(plot: Plot, flag: Flag, others: readonly Flag[]): boolean {
  if (flag.from < 4 || flag.to > plot.right + 10) return false;
  return others.every((other) => {
    const touches = flag.to > other.from && flag.from < other.to;
    // The leader of a lower row runs down through the rows above it.
    const crosses =
      (other.row > flag.row && other.point.x > flag.from + 1 && other.point.x < flag.to - 1) ||
      (flag.row > other.row && flag.point.x > other.from + 1 && flag.point.x < other.to - 1);
    return !(other.row === flag.row && touches) && !crosses;
  });
}

/** Flags for all misses and the tightest met limits, as far as they find room. */
export function placedFlags(plot: Plot, points: readonly WorstPoint[]): readonly Flag[] {
  const flags: Flag[] = [];
  const misses = points.filter(({ isMet }) => !isMet);
  const met = points.filter(({ isMet }) => isMet).slice(0, misses.length === 0 ? MET[plot.format] : MET.wide);
  const asked = plot.format === 'narrow' && misses.length > 0 ? misses : [...misses, ...met];
  for (const point of asked) {
    const found = candidates(plot, point).find((flag) => fits(plot, flag, flags));
    if (found !== undefined) flags.push(found);
  }
  return flags;
}

/** Height of the strip that the flags need. */
export function flagStrip(flags: readonly Flag[]): number {
  return flags.length === 0 ? 0 : ROW * (1 + Math.max(...flags.map(({ row }) => row))) + 4;
}

/** Takes the places of the leaders and marks, so that names keep off. */
export function takeFlags(map: LabelMap, plot: Plot, points: readonly WorstPoint[]): void {
  for (const { x, y, isInside } of points) {
    if (!isInside) continue;
    takeBox(map, { left: x - 7, right: x + 7, top: y - 7, bottom: y + 7 });
    takeLine(map, [
      [x, y],
      [x, plot.bottom],
    ]);
  }
}

function drawFlag(plot: Plot, { point, row, toRight }: Flag): Markup {
  const { x, y, isMet, lines } = point;
  const anchor = toRight ? 'start' : 'end';
  const at = x + (toRight ? 5 : -5);
  const top = plot.bottom + ROW * row;
  const y1 = Math.min(y, plot.bottom);
  return fragment(
    element('line', { x1: x, x2: x, y1, y2: top + ROW - 2, class: `${isMet ? 's-ink' : 's-short'} hair` }),
    label(at, top + 17, lines[0], `bold${isMet ? '' : ' f-short'}`, anchor),
    label(at, top + 33, lines[1], 'tick', anchor),
  );
}

/** Leaders from the worst points down to their flags, and the marks on the points. */
export function drawFlags(plot: Plot, points: readonly WorstPoint[], flags: readonly Flag[]): Markup {
  const marks = points.filter(({ isInside }) => isInside).map(({ x, y, isMet }) => (isMet ? dot(x, y) : octagon(x, y)));
  return fragment(...flags.map((flag) => drawFlag(plot, flag)), ...marks);
}
