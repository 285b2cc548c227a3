import { describe, expect, it } from 'vitest';
import { networkOf } from '../../../../src/report/pictures/network/routing/couplings.js';
import { emblemLayout } from '../../../../src/report/pictures/network/routing/emblem.js';
import type { Layout } from '../../../../src/report/pictures/network/routing/layout.js';
import { routingLayout } from '../../../../src/report/pictures/network/routing/routing-picture.js';
import { textWidth } from '../../../../src/report/svg/words.js';
import {
  arrowDesign,
  fanDesign,
  foldedDesign,
  foldedDesigns,
  type Named,
  otherDesigns,
  wired,
} from './network-designs.js';

const BAND = { centerHz: 3839.958e6, bandwidthHz: 36e6 };

type Box = Layout['labels'][number]['box'];

const overlap = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

const contains = ({ left, right, top, bottom }: Box, x: number, y: number): boolean =>
  x > left && x < right && y > top && y < bottom;

/** Points at least every pixel along the lines, corners not rounded: the drawn way never leaves the corner's inner side by more. */
function pointsOf(points: readonly (readonly [number, number])[]): [number, number][] {
  return points.slice(1).flatMap(([x1, y1], n) => {
    const [x0, y0] = points[n]!;
    const count = Math.ceil(Math.hypot(x1 - x0, y1 - y0)) + 1;
    return Array.from({ length: count + 1 }, (_, k): [number, number] => [
      x0 + ((x1 - x0) * k) / count,
      y0 + ((y1 - y0) * k) / count,
    ]);
  });
}

/** Points of the rims and of the inside of discs, bars and lozenges. */
function markPoints({ discs, lozenges }: Layout): [number, number][] {
  const points: [number, number][] = [];
  const around = (x: number, y: number, radius: number): void => {
    for (let share = 0.25; share <= 1; share += 0.25)
      for (let k = 0; k < 24; k++) {
        const angle = (2 * Math.PI * k) / 24;
        points.push([x + share * radius * Math.cos(angle), y + share * radius * Math.sin(angle)]);
      }
  };
  for (const { x, y, radius, reach } of discs) {
    const stops = Math.ceil((reach[0] + reach[1]) / 4);
    for (let k = -stops; k <= stops; k++)
      around(x + (reach[0] * k) / (stops || 1), y + (reach[1] * k) / (stops || 1), radius);
  }
  for (const { at, half } of lozenges)
    for (let k = -8; k <= 8; k++)
      for (const sign of [-1, 1]) points.push([at[0] + (half * k) / 8, at[1] + sign * half * (1 - Math.abs(k) / 8)]);
  return points;
}

function collisions(layout: Layout): string[] {
  const { labels, routes, width, height } = layout;
  const lines = routes.flatMap(({ points }) => pointsOf(points));
  const marks = markPoints(layout);
  return labels.flatMap(({ box, lines: words }, n) => {
    const name = words.map(({ text }) => text).join('/');
    const found: string[] = [];
    for (const { box: other, lines: others } of labels.slice(n + 1))
      if (overlap(box, other)) found.push(`${name} on ${others[0]?.text}`);
    if (lines.some(([x, y]) => contains(box, x, y))) found.push(`${name} on a line`);
    if (marks.some(([x, y]) => contains(box, x, y))) found.push(`${name} on a mark`);
    if (box.left < 0 || box.top < 0 || box.right > width || box.bottom > height)
      found.push(`${name} leaves the drawing`);
    for (const { text, size, classes } of words) {
      if (size < 10.5) found.push(`${name} is too small`);
      if (textWidth(text, size, classes.includes('bold')) > box.right - box.left + 1e-9) found.push(`${name} is cut`);
    }
    return found;
  });
}

function outside({ discs, routes, lozenges, width, height }: Layout): boolean {
  const out = (x: number, y: number, r: number): boolean => x - r < 0 || y - r < 0 || x + r > width || y + r > height;
  return (
    discs.some(
      ({ x, y, radius, reach }) => out(x - reach[0], y - reach[1], radius) || out(x + reach[0], y + reach[1], radius),
    ) ||
    lozenges.some(({ at, half }) => out(at[0], at[1], half)) ||
    routes.some(({ points }) => points.some(([x, y]) => out(x, y, 0.5)))
  );
}

/** Discs and bars that touch each other. */
function touching({ discs }: Layout): string[] {
  return discs.flatMap((a, n) =>
    discs
      .slice(n + 1)
      .filter((b) => {
        const dx = Math.max(Math.abs(a.x - b.x) - a.reach[0] - b.reach[0], 0);
        const dy = Math.max(Math.abs(a.y - b.y) - a.reach[1] - b.reach[1], 0);
        return Math.hypot(dx, dy) < a.radius + b.radius;
      })
      .map((b) => `${a.node} and ${b.node}`),
  );
}

/** Do two straight lines properly cross, not counting shared ends? */
function cross(a: readonly number[], b: readonly number[], c: readonly number[], d: readonly number[]): boolean {
  const side = (p: readonly number[], q: readonly number[], r: readonly number[]): number =>
    (q[0]! - p[0]!) * (r[1]! - p[1]!) - (q[1]! - p[1]!) * (r[0]! - p[0]!);
  return side(a, b, c) * side(a, b, d) < -1e-6 && side(c, d, a) * side(c, d, b) < -1e-6;
}

/** Labels that stand beyond a line that is not theirs, or far from their own; those whose number occurs once are tried. */
function strays({ labels, routes }: Layout): string[] {
  return labels.flatMap(({ box, lines }) => {
    const text = lines[0]!.text;
    const own = routes.filter(({ link }) => `${link.value < 0 ? '−' : '+'}${Math.abs(link.value).toFixed(4)}` === text);
    if (own.length !== 1 || lines[0]!.classes.indexOf('bold') < 0) return [];
    const gap = ([x, y]: readonly [number, number]): number =>
      Math.hypot(Math.max(box.left - x, 0, x - box.right), Math.max(box.top - y, 0, y - box.bottom));
    const from = pointsOf(own[0]!.points).reduce((a, b) => (gap(b) < gap(a) ? b : a));
    const to = [Math.min(Math.max(from[0], box.left), box.right), Math.min(Math.max(from[1], box.top), box.bottom)];
    const isBeyond = routes.some(
      (route) => route !== own[0] && route.points.slice(1).some((end, n) => cross(from, to, route.points[n]!, end)),
    );
    return [
      ...(isBeyond ? [`${text} beyond another line`] : []),
      ...(gap(from) > 30 ? [`${text} far from its line`] : []),
    ];
  });
}

/** Everything that may be wrong with both drawings of a design. */
function faults({ name, matrix }: Named, mayDrop = false): string[] {
  return [BAND, undefined].flatMap((band) =>
    (['wide', 'narrow'] as const).flatMap((format) => {
      const layout = routingLayout(matrix, band, format);
      const found = [...collisions(layout), ...strays(layout), ...touching(layout)];
      if (outside(layout)) found.push('leaves the drawing');
      if (!mayDrop && layout.dropped > 0) found.push(`${layout.dropped} labels left out`);
      return found.map((fault) => `${name}, ${format}: ${fault}`);
    }),
  );
}

const ORDERS = Array.from({ length: 13 }, (_, n) => n + 2);

describe('routing layout', () => {
  it.each(ORDERS)('labels of folded designs of order %i touch nothing, and none is left out', (order) => {
    expect(foldedDesigns(order).flatMap((each) => faults(each))).toEqual([]);
  });

  it('labels of arrow, in-line, transversal, triangles, squares and mixtures touch nothing', () => {
    expect(otherDesigns().flatMap((each) => faults(each))).toEqual([]);
  });

  it('arrow and transversal forms of orders 3 to 14 touch nothing', () => {
    const designs = ORDERS.slice(1).flatMap((order) => [
      arrowDesign(order, 1),
      arrowDesign(order, 2),
      arrowDesign(order, order),
      fanDesign(order, 0),
      fanDesign(order, order),
    ]);
    expect(designs.flatMap((each) => faults(each))).toEqual([]);
  });

  it('random wirings may leave labels out, but none touches anything', () => {
    const designs = Array.from({ length: 40 }, (_, seed) => {
      const order = 4 + (seed % 9);
      const cross = Array.from({ length: 1 + (seed % 6) }, (_, k): [number, number] => {
        const from = (seed * 7 + k * 5) % (order - 1);
        return [from, Math.min(from + 2 + ((seed + k * 3) % (order - 1)), order + 1)];
      });
      return wired(`random ${seed}`, order, cross, seed, seed % 2 === 0);
    });
    expect(designs.flatMap((each) => faults(each, true))).toEqual([]);
  });

  it('large orders stay inside the drawing', () => {
    const dense = Array.from({ length: 40 }, (_, i) =>
      Array.from({ length: 39 - i }, (_, k) => [i, i + 2 + k] as const),
    );
    const designs = [
      ...foldedDesigns(15),
      ...foldedDesigns(24),
      foldedDesign(40),
      foldedDesign(60),
      foldedDesign(100),
      arrowDesign(24, 6),
      arrowDesign(40, 40),
      fanDesign(20, 4),
      fanDesign(100, 2),
      wired('in-line 100', 100, []),
      wired('cascade 40', 40, [
        [1, 3],
        [4, 6],
        [7, 10],
        [12, 14],
        [20, 23],
        [23, 25],
      ]),
      wired('everything to everything', 40, dense.flat()),
    ];
    expect(designs.flatMap((each) => faults(each, true))).toEqual([]);
  });

  it('the check finds a label on a line', () => {
    const layout = routingLayout(foldedDesign(6).matrix, BAND, 'wide');
    const { left, top, right, bottom } = layout.labels[0]!.box;
    const [x, y] = layout.routes[0]!.points[0]!;
    const box = { left: x, right: x + right - left, top: y - 5, bottom: y - 5 + bottom - top };
    expect(collisions({ ...layout, labels: [{ ...layout.labels[0]!, box }] })).not.toEqual([]);
  });

  it('emblems are at most 150 by 60 px, with nothing outside and no discs that touch', () => {
    const designs = [
      ...ORDERS.flatMap(foldedDesigns),
      ...otherDesigns(),
      foldedDesign(40),
      wired('in-line 100', 100, []),
    ];
    const found = designs.flatMap(({ name, matrix }) => {
      const layout = emblemLayout(networkOf(matrix));
      const tooLarge = layout.width > 150.001 || layout.height > 60.001;
      return [...touching(layout), ...(outside(layout) ? ['outside'] : []), ...(tooLarge ? ['too large'] : [])].map(
        (fault) => `${name}: ${fault}`,
      );
    });
    expect(found).toEqual([]);
  });
});
