import type { MaskRow } from '../../../forms/index.js';
import { dot, octagon } from '../../svg/marks.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { label, textWidth } from '../../svg/words.js';
import { trimmed } from '../../words/numbers.js';
import { type Requirement, requirementOf, roomText } from '../../words/requirement.js';
import { type LabelMap, takeBox, takeLine } from './label-map.js';
import { isShown, type Plot, xOf, yOf } from './plot.js';

/** Height of the strip below the floor that flags stand in, where no curve runs. */
export const FLAG_STRIP = 42;

/** The worst point of a requirement, with its place in the plot. */
export interface WorstPoint {
  readonly requirement: Requirement;
  readonly x: number;
  readonly y: number;
  readonly isInside: boolean;
}

/** Worst points of the rejection lines that lie in the picture, tightest first. */
export function worstPoints(plot: Plot, mask: readonly MaskRow[], centerLossDb: number): readonly WorstPoint[] {
  return mask
    .filter(({ line, worstHz }) => 'rejectionDb' in line && worstHz !== null && isShown(plot, worstHz))
    .map((row) => {
      const reference = row.line.relativeTo === 'center' ? centerLossDb : 0;
      const y = yOf(plot, -(row.predicted + reference));
      const x = xOf(plot, row.worstHz as number);
      return { requirement: requirementOf(row, plot.unit), x, y, isInside: y <= plot.bottom };
    })
    .sort((a, b) => a.requirement.share - b.requirement.share);
}

/** A span as pictures write it. */
export function spanWords(span: string): string {
  return span.replace('<= ', '≤ ').replace('>= ', '≥ ').replace('-', '–');
}

interface Flag {
  readonly point: WorstPoint;
  readonly lines: readonly [string, string];
  readonly width: number;
  readonly toRight: boolean;
}

function flagOf(point: WorstPoint, toRight: boolean): Flag {
  const { margin, isMet, unit, limit, span } = point.requirement;
  const lines = [roomText(margin, isMet, unit), `of ${trimmed(limit, 2)} at ${spanWords(span)}`] as const;
  return { point, lines, width: Math.max(textWidth(lines[0], 13, true), textWidth(lines[1], 12.5)) + 6, toRight };
}

function rangeOf({ point: { x }, width, toRight }: Flag): readonly [number, number] {
  return toRight ? [x, x + width] : [x - width, x];
}

/** Flags that touch neither each other, nor a leader of another, nor the frame; the tightest are placed first. */
function placed(plot: Plot, points: readonly WorstPoint[], most: number): readonly Flag[] {
  const flags: Flag[] = [];
  for (const point of points.slice(0, most)) {
    const sides = point.x > (plot.left + plot.right) / 2 ? [true, false] : [false, true];
    const found = sides
      .map((toRight) => flagOf(point, toRight))
      .find((flag) => {
        const [from, to] = rangeOf(flag);
        const inFrame = from >= 4 && to <= plot.right + 10;
        const clear = flags.every((other) => {
          const [a, b] = rangeOf(other);
          return to <= a || from >= b;
        });
        return inFrame && clear;
      });
    if (found !== undefined) flags.push(found);
  }
  return flags;
}

/** Takes the places of the leaders and marks, so that names keep off. */
export function takeFlags(map: LabelMap, plot: Plot, points: readonly WorstPoint[]): void {
  for (const { x, y } of points) {
    takeBox(map, { left: x - 7, right: x + 7, top: y - 7, bottom: y + 7 });
    takeLine(map, [
      [x, y],
      [x, plot.bottom],
    ]);
  }
}

function drawFlag(plot: Plot, { point, lines, toRight }: Flag): Markup {
  const { x, y, requirement } = point;
  const anchor = toRight ? 'start' : 'end';
  const at = x + (toRight ? 5 : -5);
  const tone = requirement.isMet ? '' : ' f-short';
  return fragment(
    element('line', {
      x1: x,
      x2: x,
      y1: Math.min(y, plot.bottom),
      y2: plot.bottom + FLAG_STRIP - 6,
      class: 's-ink hair',
    }),
    label(at, plot.bottom + 17, lines[0], `bold${tone}`, anchor),
    label(at, plot.bottom + 33, lines[1], 'tick', anchor),
  );
}

/** Leaders from the worst points to one row near the floor, with the room left there; at most so many. */
export function drawFlags(plot: Plot, points: readonly WorstPoint[], most: number): Markup {
  const flags = placed(plot, points, most);
  const marks = points
    .filter(({ isInside }) => isInside)
    .map(({ x, y, requirement }) => (requirement.isMet ? dot(x, y) : octagon(x, y)));
  return fragment(...flags.map((flag) => drawFlag(plot, flag)), ...marks);
}
