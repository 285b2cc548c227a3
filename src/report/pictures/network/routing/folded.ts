import type { Link, Network } from './couplings.js';
import { normalOf, type Point } from './geometry.js';
import { type Disc, disc, portRadius, type Route, type Sizing, type Skeleton, type Spot } from './layout.js';
import { offsetSpots } from './offset-spots.js';
import { spotsAlong } from './place.js';

/** Distance of a label from its line where a lozenge stands between them, px. */
const PAST_LOZENGE = 12;

/** Steps and sizes of a folded figure: `along` the rows, `across` between them. */
interface Grid {
  readonly turned: boolean;
  readonly radius: number;
  readonly along: number;
  readonly across: number;
  readonly start: Point;
  readonly labelOff: number;
}

/** Column and row (0 near the source, 1 near the load, one half for the last resonator of an odd order) of a node. */
function cellOf(node: number, order: number): Point {
  const mirror = order + 1 - node;
  if (node === mirror) return [node, 0.5];
  return node < mirror ? [node, 0] : [mirror, 1];
}

function pointOf(node: number, order: number, { turned, along, across, start }: Grid): Point {
  const [column, row] = cellOf(node, order);
  const [a, b] = [column * along, row * across];
  return turned ? [start[0] + b, start[1] + a] : [start[0] + a, start[1] + b];
}

/** The direction out of the figure, seen from a point of its rim. */
function outward(from: Point, to: Point, center: Point): Point {
  const normal = normalOf(from, to);
  const middle: Point = [(from[0] + to[0]) / 2 - center[0], (from[1] + to[1]) / 2 - center[1]];
  const faces = normal[0] * middle[0] + normal[1] * middle[1] >= 0;
  return faces ? normal : [-normal[0], -normal[1]];
}

function routeOf(link: Link, order: number, grid: Grid, center: Point): Route {
  const a = pointOf(link.from, order, grid);
  const b = pointOf(link.to, order, grid);
  const at = (share: number): Point => [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share];
  const isRim = link.isMain;
  const past = link.value < 0 ? PAST_LOZENGE : 6;
  const first: Spot[] = isRim
    ? [{ at: at(0.5), toward: outward(a, b, center), off: grid.labelOff }]
    : spotsAlong(a, b, past, [0.5]);
  const shares = grid.turned && !isRim ? [0.25, 0.75, 0.3, 0.7, 0.2, 0.8, 0.35, 0.65, 0.15, 0.85, 0.5] : undefined;
  const marks = [0.5, 0.4, 0.6, 0.32, 0.68].map(at);
  // Level lines take the room below them, so that each slanted line keeps the other half of its cell.
  const crossSpots = spotsAlong(a, b, 6, shares).sort((p, q) => (a[1] === b[1] ? q.toward[1] - p.toward[1] : 0));
  // Right of an upright line first: normals point right for lines that run down.
  return {
    link,
    points: [a, b],
    marks,
    spots: grid.turned && !isRim ? crossSpots : [...first, ...spotsAlong(a, b, 6)],
  };
}

/** Where a node stands and how large it is. */
function discsOf({ order }: Network, grid: Grid): Disc[] {
  return Array.from({ length: order + 2 }, (_, node) => {
    const isPort = node === 0 || node === order + 1;
    const [x, y] = pointOf(node, order, grid);
    return disc(node, x, y, isPort ? portRadius(grid.radius) : grid.radius);
  });
}

function figure(network: Network, grid: Grid, isDense: boolean): Skeleton {
  const { order, links } = network;
  const columns = (order + 1) / 2;
  const middle: Point = [(columns * grid.along) / 2, grid.across / 2];
  const center: Point = grid.turned
    ? [grid.start[0] + middle[1], grid.start[1] + middle[0]]
    : [grid.start[0] + middle[0], grid.start[1] + middle[1]];
  const discs = discsOf(network, grid);
  return {
    discs,
    routes: links.map((link) => routeOf(link, order, grid, center)),
    offsets: offsetSpots(discs, order, center),
    isDense,
  };
}

/** Columns from the source to the joint, as steps. */
const stepsOf = (order: number): number => (order % 2 === 0 ? order / 2 : (order + 1) / 2);

/** Two rows that run to the right; undefined where columns get too tight. */
export function foldedRows(network: Network, sizing: Sizing): Skeleton | undefined {
  const { width, isNarrow, smallWidth } = sizing;
  const [left, steps] = [24, stepsOf(network.order)];
  const right = smallWidth > 0 ? sizing.mainWidth + 24 : 24;
  const along = Math.min(isNarrow ? 100 : 148, (width - left - right) / steps);
  const radius = Math.min(15, along * 0.36);
  if (radius < 9) return undefined;
  const isDense = sizing.mainWidth > along - 4;
  if (isDense && smallWidth > along - 4) return undefined;
  const labelWidth = isDense ? smallWidth : sizing.mainWidth;
  const labelOff = labelWidth > along - 2 * radius - 4 ? radius + 2 : 6;
  const grid = { turned: false, radius, along, across: isNarrow ? 118 : 136, start: [left, 0] as const, labelOff };
  return figure(network, grid, isDense);
}

/** Two columns that run downward, joined at the foot: fits any order. */
export function foldedColumns(network: Network, sizing: Sizing): Skeleton {
  const { width, smallWidth, mainLines, offsetWidth } = sizing;
  const crossCount = network.links.filter(({ isMain }) => !isMain).length;
  const isLabelled = smallWidth > 0;
  const radius = isLabelled ? 13 : 11;
  const side = Math.max(isLabelled ? smallWidth + radius + 14 : 40, offsetWidth > 0 ? 92 : 0);
  const across = Math.min(width - 2 * side, 300);
  const crowded = crossCount > stepsOf(network.order) ? 60 : 48;
  const along = isLabelled ? Math.max(crowded, 26 + 14 * mainLines) : crossCount > 1 ? 44 : 27;
  const start: Point = [(width - across) / 2, 0];
  return figure(network, { turned: true, radius, along, across, start, labelOff: 6 }, true);
}
