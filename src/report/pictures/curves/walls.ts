import type { Level, MaskLine, MaskRow } from '../../../forms/index.js';
import { hatchFill } from '../../svg/hatch.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { label } from '../../svg/words.js';
import { textSize } from './curve-name.js';
import { type Box, claim, type LabelMap, takeBox } from './label-map.js';
import { limitWords } from './limit-words.js';
import { type Plot, xOf, yOf } from './plot.js';
import type { Point } from './thin.js';

/** Posts at true width would vanish. */
const POST = 10;

/** A region that transmission may not enter: from 0 dB down to its limit. */
export interface Wall {
  readonly row: MaskRow;
  readonly isPost: boolean;
  readonly left: number;
  readonly right: number;
  /** Depth at its left and right side, dB below 0. */
  readonly depths: readonly [number, number];
}

/** Level of a mask line at a frequency, straight in hertz between the ends of a pair. */
export function levelAt({ fromHz, toHz }: MaskLine, level: Level, hz: number): number {
  if (typeof level === 'number') return level;
  if (fromHz === undefined || toHz === undefined || fromHz === toHz) return Math.max(...level);
  return level[0] + ((level[1] - level[0]) * (hz - fromHz)) / (toHz - fromHz);
}

/** The walls of a mask that stand in a picture. */
export function wallsOf(plot: Plot, mask: readonly MaskRow[], centerLossDb: number): readonly Wall[] {
  const { fromHz: first, toHz: last, band } = plot;
  return mask.flatMap((row): readonly Wall[] => {
    const { line } = row;
    if (!('rejectionDb' in line)) return [];
    const [from, to] = [line.fromHz ?? 0, line.toHz ?? Number.POSITIVE_INFINITY];
    if (to < first || from > last) return [];
    const reference = line.relativeTo === 'center' ? centerLossDb : 0;
    const depth = (hz: number): number => levelAt(line, line.rejectionDb, hz) + reference;
    const [a, b] = [Math.max(from, first), Math.min(to, last)];
    const isPost = from === to;
    const away = isPost ? (from < band.centerHz ? -POST : POST) : 0;
    // A wall that runs on beyond the picture shows no edge there.
    const left = from < first ? plot.left - 4 : xOf(plot, a) + Math.min(0, away);
    const right = to > last ? plot.right + 4 : xOf(plot, b) + Math.max(0, away);
    return [{ row, isPost, left, right, depths: [depth(a), depth(b)] }];
  });
}

function outline(plot: Plot, { left, right, depths }: Wall): string {
  const corners: readonly Point[] = [
    [left, plot.top - 6],
    [right, plot.top - 6],
    [right, yOf(plot, -depths[1])],
    [left, yOf(plot, -depths[0])],
  ];
  return `M${corners.map((corner) => corner.map((value) => Math.round(value * 10) / 10).join(' ')).join('L')}Z`;
}

/** Hatched walls, drawn as one region: where walls overlap, the deeper one counts and the hatch stays even. */
export function drawWalls(plot: Plot, walls: readonly Wall[]): Markup {
  if (walls.length === 0) return fragment();
  const d = walls.map((wall) => outline(plot, wall)).join('');
  return fragment(
    element('path', { d, class: 'line s-transmission', 'stroke-width': 3 }),
    element('path', { d, class: 'f-ground' }),
    element('path', { d, fill: hatchFill(plot.prefix, 'transmission') }),
  );
}

/** Takes the place of the walls, so that no name is written on them. */
export function takeWalls(map: LabelMap, plot: Plot, walls: readonly Wall[]): void {
  for (const { left, right, depths } of walls)
    takeBox(map, { left, right, top: plot.top - 6, bottom: yOf(plot, -Math.max(...depths)) + 2 });
}

/** Where a wall's label would be inside it and inside no deeper wall, the best place first. */
function labelBoxes(plot: Plot, wall: Wall, walls: readonly Wall[], text: string): readonly Box[] {
  if (wall.isPost) return [];
  const deeper = walls.filter((other) => other !== wall && Math.min(...other.depths) >= Math.min(...wall.depths));
  const from = Math.max(wall.left, ...deeper.filter(({ left }) => left <= wall.left).map(({ right }) => right));
  const to = Math.min(wall.right, ...deeper.filter(({ right }) => right >= wall.right).map(({ left }) => left));
  const [width, height] = textSize([text]);
  if (to - from < width + 12) return [];
  const lowest = yOf(plot, -Math.min(...wall.depths)) - 6;
  const middles = [(from + to) / 2, from + width / 2 + 6, to - width / 2 - 6];
  return [0, 18, 40, 70].flatMap((lift) =>
    middles.map((middle) => {
      const bottom = lowest - lift;
      return { left: middle - width / 2, right: middle + width / 2, top: bottom - height, bottom };
    }),
  );
}

/** What a limit asks, in words. */
function wallText({ row: { line }, depths }: Wall): string {
  if (!('rejectionDb' in line)) return '';
  const below = line.relativeTo === 'center' ? ' below the center' : '';
  const level = typeof line.rejectionDb === 'number' ? [line.rejectionDb] : line.rejectionDb;
  const text =
    depths[0] === depths[1]
      ? `≥ ${limitWords(level[0] as number)}`
      : `${level.map((each) => limitWords(each)).join(' to ')}`;
  return `reject ${text} dB${below}`;
}

/** A text and where it stands. */
export interface PlacedText {
  readonly box: Box;
  readonly lines: readonly string[];
  /** A text about a missed limit has the color of a miss. */
  readonly isMet: boolean;
}

/** From the top of a line of text to its base, and from line to line. */
const ASCENT = 12.5;
const LINE_HEIGHT = 16;

/** A text of one or more lines in its box, centered. */
export function placedText({ box, lines, isMet }: PlacedText, classes: string): Markup {
  const all = isMet ? classes : `${classes.replace(/ ?f-\w+/, '')} bold f-short`;
  const middle = (box.left + box.right) / 2;
  return fragment(...lines.map((text, n) => label(middle, box.top + ASCENT + LINE_HEIGHT * n, text, all, 'mid')));
}

/** Labels inside the walls that have the room, clear of what the map holds: a curve runs through the wall that it misses. */
export function wallLabels(map: LabelMap, plot: Plot, walls: readonly Wall[]): readonly PlacedText[] {
  return walls.flatMap((wall) => {
    const text = wallText(wall);
    const box = labelBoxes(plot, wall, walls, text).find((each) => each.top >= plot.top + 4 && claim(map, each));
    return box === undefined ? [] : [{ box, lines: [text], isMet: true }];
  });
}
