import type { Layout } from '../../../../src/report/pictures/network/routing/layout.js';
import { textWidth } from '../../../../src/report/svg/words.js';

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

/** Labels that touch a label, a line or a mark, leave the drawing, are too small or cut. */
export function collisions(layout: Layout): string[] {
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

/** Does a mark or a line leave the drawing? */
export function outside({ discs, routes, lozenges, width, height }: Layout): boolean {
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
export function touching({ discs }: Layout): string[] {
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

/** Lines that run through a node they do not belong to. */
export function runThrough({ discs, routes }: Layout): string[] {
  return routes.flatMap(({ link, points }) =>
    discs
      .filter(({ node }) => node !== link.from && node !== link.to)
      .filter(({ x, y, radius, reach }) =>
        pointsOf(points).some(
          ([u, v]) =>
            Math.hypot(Math.max(Math.abs(u - x) - reach[0], 0), Math.max(Math.abs(v - y) - reach[1], 0)) < radius,
        ),
      )
      .map(({ node }) => `${link.from}-${link.to} through ${node}`),
  );
}

/** Labels that stand beyond a line that is not theirs, or far from their own; those whose number occurs once are tried. */
export function strays({ labels, routes }: Layout): string[] {
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
