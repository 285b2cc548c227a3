import type { MaskRow } from '../../../forms/index.js';
import { hatchFill } from '../../svg/hatch.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import type { Box } from './label-map.js';
import { type Plot, xOf, yOf } from './plot.js';
import { levelAt } from './walls.js';

/** Depth of the hatched lid on a level that may not be crossed. */
const LID = 9;
/** Half width of the lid of a limit at one frequency. */
const HALF_POST = 10;

/** A level that a curve may not cross between two frequencies; the hatch lies on the forbidden side. */
export interface Lid {
  readonly fromHz: number;
  readonly toHz: number;
  readonly levels: readonly [number, number];
  /** Side of the line that may not be entered. */
  readonly side: 'above' | 'below';
  readonly forbids: 'transmission' | 'reflection';
}

/** A hatched lid. */
export function drawLid(plot: Plot, { fromHz, toHz, levels, side, forbids }: Lid): Markup {
  const middle = (xOf(plot, fromHz) + xOf(plot, toHz)) / 2;
  // A limit at one frequency is drawn 20 px wide.
  const [x0, x1] = fromHz === toHz ? [middle - HALF_POST, middle + HALF_POST] : [xOf(plot, fromHz), xOf(plot, toHz)];
  const [y0, y1] = [yOf(plot, levels[0]), yOf(plot, levels[1])];
  const depth = side === 'above' ? -LID : LID;
  const [a0, b0, a1, b1] = [x0, y0, x1, y1].map((value) => Math.round(value * 10) / 10) as [
    number,
    number,
    number,
    number,
  ];
  const area = `M${a0} ${b0}L${a1} ${b1}v${depth}L${a0} ${b0 + depth}Z`;
  return fragment(
    element('path', { d: area, fill: hatchFill(plot.prefix, forbids) }),
    element('path', { d: `M${a0} ${b0}L${a1} ${b1}`, class: `line edge s-${forbids}` }),
  );
}

/** Where a lid stands, for the map of taken places. */
export function lidBox(plot: Plot, { fromHz, toHz, levels, side }: Lid): Box {
  const ys = levels.map((level) => yOf(plot, level));
  const half = fromHz === toHz ? HALF_POST : 0;
  const [above, below] = side === 'above' ? [LID, 0] : [0, LID];
  return {
    left: xOf(plot, fromHz) - half,
    right: xOf(plot, toHz) + half,
    top: Math.min(...ys) - above - 1,
    bottom: Math.max(...ys) + below + 1,
  };
}

/** A lid and the row of the mask that asks for it. */
export interface AskedLid {
  readonly lid: Lid;
  readonly row: MaskRow;
}

/** A row of the mask as a lid on its level, cut to the picture; `place` turns the level asked for into one of the plot. */
export function lidOf(
  plot: Plot,
  row: MaskRow,
  { side, forbids }: Pick<Lid, 'side' | 'forbids'>,
  place: (level: number) => number,
): readonly AskedLid[] {
  const { line } = row;
  const level =
    'returnLossDb' in line ? line.returnLossDb : 'insertionLossDb' in line ? line.insertionLossDb : undefined;
  const from = Math.max(line.fromHz ?? 0, plot.fromHz);
  const to = Math.min(line.toHz ?? Number.POSITIVE_INFINITY, plot.toHz);
  if (level === undefined || from > to) return [];
  const at = (hz: number): number => place(levelAt(line, level, hz));
  return [{ lid: { fromHz: from, toHz: to, levels: [at(from), at(to)], side, forbids }, row }];
}
