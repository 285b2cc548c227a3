import { lozenge } from '../../../svg/marks.js';
import { element, fragment, type Markup } from '../../../svg/markup.js';
import { label } from '../../../svg/words.js';
import { nodeName } from '../../../words/nodes.js';
import type { Point } from './geometry.js';
import { type Disc, discBox, type Layout, type Placed, type Route } from './layout.js';
import { lineHeight } from './place.js';

const tenth = (value: number): number => Math.round(value * 10) / 10 + 0;

/** Corners of a bent line are rounded by so much, px. */
const ROUNDING = 9;

/** The way of a line, its corners rounded where the legs allow it. */
function pathOf(points: readonly Point[]): string {
  const start = points[0] as Point;
  let d = `M${tenth(start[0])} ${tenth(start[1])}`;
  points.slice(1).forEach((corner, n) => {
    const before = points[n] as Point;
    const after = points[n + 2];
    if (after === undefined) {
      d += `L${tenth(corner[0])} ${tenth(corner[1])}`;
      return;
    }
    const leg = (to: Point): number => Math.hypot(to[0] - corner[0], to[1] - corner[1]);
    const radius = Math.min(ROUNDING, leg(before) / 2, leg(after) / 2);
    const toward = (to: Point): Point => {
      const share = radius / (leg(to) || 1);
      return [corner[0] + (to[0] - corner[0]) * share, corner[1] + (to[1] - corner[1]) * share];
    };
    const [enter, leave] = [toward(before), toward(after)];
    d += `L${tenth(enter[0])} ${tenth(enter[1])}Q${tenth(corner[0])} ${tenth(corner[1])} ${tenth(leave[0])} ${tenth(leave[1])}`;
  });
  return d;
}

function line({ link, points }: Route): Markup {
  const color = link.value < 0 ? 's-negative' : 's-ink';
  const weight = link.isMain ? 'thick' : 'medium dash';
  return element('path', { d: pathOf(points), class: `line ${weight} ${color}` });
}

function nodeMark(each: Disc, order: number, withNumber: boolean): Markup {
  const isPort = each.node === 0 || each.node === order + 1;
  const { left, top, right, bottom } = discBox(each);
  const classes = isPort ? 'f-paper s-ink medium' : 'f-ink';
  const shape = element('rect', {
    x: left,
    y: top,
    width: right - left,
    height: bottom - top,
    rx: each.radius,
    class: classes,
  });
  if (!withNumber || each.radius < SMALLEST_NUMBERED) return shape;
  const size = each.radius < 12 || each.node > 99 ? 'small' : '';
  const classesOfName = `bold ${size} ${isPort ? '' : 'f-paper'}`.replace(/ +/g, ' ').trim();
  return fragment(
    shape,
    label(each.x, each.y + (size === '' ? 4.7 : 4), nodeName(each.node, order), classesOfName, 'mid'),
  );
}

/** Discs smaller than this cannot hold their number. */
export const SMALLEST_NUMBERED = 9;

function text({ lines, box, anchor }: Placed): Markup {
  const x = { start: box.left, mid: (box.left + box.right) / 2, end: box.right }[anchor];
  let y = box.top;
  return fragment(
    ...lines.map(({ text: words, classes, size }) => {
      const baseline = y + size * 0.88;
      y += lineHeight(size);
      return label(x, baseline, words, classes, anchor);
    }),
  );
}

/** A finished figure as markup: lines below, marks over them, names and numbers on top. */
export function drawn({ discs, routes, lozenges, labels }: Layout, order: number, withNumbers = true): Markup {
  const byWeight = [...routes].sort((a, b) => Number(a.link.isMain) - Number(b.link.isMain));
  return fragment(
    ...byWeight.map(line),
    // The mark's side is that of the square of equal area: its half diagonal is 0.71 of the side.
    ...lozenges.map(({ at, half }) => lozenge(at[0], at[1], half / Math.SQRT1_2)),
    ...discs.map((each) => nodeMark(each, order, withNumbers)),
    ...labels.map(text),
  );
}
