import { textWidth } from '../../../svg/words.js';
import {
  type Box,
  boxAround,
  boxesMeet,
  grown,
  normalOf,
  type Point,
  routeCrosses,
  routeMeetsBox,
} from './geometry.js';
import {
  type Disc,
  discBox,
  type Layout,
  type Line,
  type Lozenge,
  lozengeBox,
  type Placed,
  type Route,
  type Skeleton,
  type Spot,
} from './layout.js';

/** Free room round a label, px. */
const CLEAR = 2;

/** Distance of a figure from the edge of its drawing, px. */
const MARGIN = 4;

/** How far a label may be pushed off its line to find room, px. */
const PUSHES: readonly number[] = [0, 4, 10];

/** Shares of a line's length at which a label may stand, besides its own first choices. */
const SHARES: readonly number[] = [0.5, 0.4, 0.6, 0.3, 0.7, 0.2, 0.8, 0.12, 0.88];

/** Labels that are still to be placed: what they say, shorter ways of saying it, and where they may stand. */
export interface Wanted {
  readonly versions: readonly (readonly Line[])[];
  readonly spots: readonly Spot[];
  /** The line the label belongs to, if it belongs to one. */
  readonly own?: Route;
}

/** What is in the way of a label. */
interface Obstacles {
  readonly discs: readonly Disc[];
  readonly routes: readonly Route[];
  readonly boxes: Box[];
  readonly width: number;
}

/** Height of a line of text, px. */
export const lineHeight = (size: number): number => Math.round(size * 1.12 * 10) / 10;

/** Width of the widest line. */
export const linesWidth = (lines: readonly Line[]): number =>
  Math.max(0, ...lines.map(({ text, size, classes }) => textWidth(text, size, classes.includes('bold'))));

/** Spots on both sides of a straight line, at several shares of its length. */
export function spotsAlong(a: Point, b: Point, off = 5, shares: readonly number[] = SHARES): Spot[] {
  const [nx, ny] = normalOf(a, b);
  return shares.flatMap((share) => {
    const at: Point = [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share];
    return [
      { at, toward: [nx, ny] as const, off },
      { at, toward: [-nx, -ny] as const, off },
    ];
  });
}

function boxAt({ at: [x, y], toward: [nx, ny], off }: Spot, push: number, width: number, height: number): Box {
  // The box touches a line through the spot, square to the direction, at the distance asked for.
  const away = (Math.abs(nx) * width + Math.abs(ny) * height) / 2 + off + push;
  const [cx, cy] = [x + nx * away, y + ny * away];
  return { left: cx - width / 2, right: cx + width / 2, top: cy - height / 2, bottom: cy + height / 2 };
}

/** Does a disc, or a bar with round ends, reach into a box? */
function discMeets({ x, y, radius, reach }: Disc, box: Box): boolean {
  const nearX = Math.max(Math.abs(x - Math.min(Math.max(x, box.left), box.right)) - reach[0], 0);
  const nearY = Math.max(Math.abs(y - Math.min(Math.max(y, box.top), box.bottom)) - reach[1], 0);
  return Math.hypot(nearX, nearY) < radius;
}

function isFree(box: Box, { discs, routes, boxes, width }: Obstacles): boolean {
  if (box.left < MARGIN || box.right > width - MARGIN) return false;
  const room = grown(box, CLEAR);
  if (boxes.some((other) => boxesMeet(other, room))) return false;
  if (discs.some((each) => discMeets(each, room))) return false;
  return !routes.some(({ points }) => routeMeetsBox(points, room));
}

/** Does another line pass between a label and the place it belongs to? The label would be read as that line's. */
function isCutOff({ at: [x, y] }: Spot, box: Box, own: Route | undefined, { routes }: Obstacles): boolean {
  const near: Point = [Math.min(Math.max(x, box.left), box.right), Math.min(Math.max(y, box.top), box.bottom)];
  return routes.some((route) => route !== own && routeCrosses(route.points, [x, y], near));
}

function anchorOf([nx]: Point): Placed['anchor'] {
  if (nx > 0.7) return 'start';
  return nx < -0.7 ? 'end' : 'mid';
}

function place({ versions, spots, own }: Wanted, obstacles: Obstacles): Placed | undefined {
  for (const lines of versions) {
    const [width, height] = [linesWidth(lines), lines.reduce((sum, { size }) => sum + lineHeight(size), 0)];
    for (const push of PUSHES) {
      for (const spot of spots) {
        const box = boxAt(spot, push, width, height);
        if (isFree(box, obstacles) && !isCutOff(spot, box, own, obstacles))
          return { lines, box, anchor: anchorOf(spot.toward) };
      }
    }
  }
  return undefined;
}

/** Lozenges of negative couplings, at the first place where they touch no other line, disc or lozenge. */
export function placeLozenges(routes: readonly Route[], discs: readonly Disc[], half: number): Lozenge[] {
  const placed: Lozenge[] = [];
  for (const route of routes) {
    if (route.link.value >= 0 || route.marks.length === 0) continue;
    const others = routes.filter((each) => each !== route);
    const free = route.marks.find((at) => {
      const box = grown(lozengeBox({ at, half }), 1);
      const hitsLine = others.some(({ points }) => routeMeetsBox(points, box));
      return (
        !hitsLine && !discs.some((each) => discMeets(each, box)) && !placed.some((p) => boxesMeet(lozengeBox(p), box))
      );
    });
    placed.push({ at: free ?? (route.marks[0] as Point), half: free === undefined ? Math.min(half, 5) : half });
  }
  return placed;
}

/** Puts labels where nothing is in the way, and sets the figure into a drawing of the given width. */
export function finish(skeleton: Skeleton, wanted: readonly Wanted[], width: number, half: number): Layout {
  const { discs, routes } = skeleton;
  const lozenges = placeLozenges(routes, discs, half);
  const obstacles = { discs, routes, boxes: lozenges.map(lozengeBox), width };
  const labels: Placed[] = [];
  let shortened = 0;
  for (const each of wanted) {
    const label = place(each, obstacles);
    if (label === undefined) continue;
    labels.push(label);
    if (label.lines !== each.versions[0]) shortened += 1;
    obstacles.boxes.push(label.box);
  }
  const dropped = wanted.length - labels.length;
  return trimmedToHeight({ width, height: 0, discs, routes, lozenges, labels, dropped, shortened });
}

/** Moves a figure up or down so that the drawing is just as high as it. */
function trimmedToHeight(layout: Layout): Layout {
  const { discs, routes, lozenges, labels } = layout;
  const lines = routes.flatMap(({ points }) =>
    points.map(([x, y]) => ({ left: x - 2, right: x + 2, top: y - 2, bottom: y + 2 })),
  );
  const all = boxAround([
    ...discs.map(discBox),
    ...lozenges.map(lozengeBox),
    ...labels.map(({ box }) => box),
    ...lines,
  ]);
  const dy = MARGIN - all.top;
  const moved = ([x, y]: Point): Point => [x, y + dy];
  return {
    ...layout,
    height: all.bottom - all.top + 2 * MARGIN,
    discs: discs.map((each) => ({ ...each, y: each.y + dy })),
    routes: routes.map((route) => ({ ...route, points: route.points.map(moved), marks: [], spots: [] })),
    lozenges: lozenges.map(({ at, half }) => ({ at: moved(at), half })),
    labels: labels.map((each) => ({
      ...each,
      box: { ...each.box, top: each.box.top + dy, bottom: each.box.bottom + dy },
    })),
  };
}
