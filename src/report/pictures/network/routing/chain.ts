import { type Arcs, arcsOf } from './arcs.js';
import type { Link, Network } from './couplings.js';
import type { Point } from './geometry.js';
import { type Disc, portRadius, type Route, type Sizing, type Skeleton, type Spot } from './layout.js';
import { offsetSpots } from './offset-spots.js';
import { spotsAlong } from './place.js';

/** Landings of arcs on one node lie so far apart, px. */
const LANDING = 14;

/** All bars of a column together are at most so long, px. */
const LONGEST_BARS = 900;

/** A chain along an axis, before it is laid to the right or downward. */
interface Axis {
  readonly turned: boolean;
  readonly radius: number;
  readonly landing: number;
  readonly gap: number;
  /** Distance of the first level from the axis, and of each further one. */
  readonly first: number;
  readonly level: number;
  readonly origin: Point;
}

/** Half the length of the bar that holds the landings of a node. */
const halfBar = (node: number, { landings }: Arcs, { landing }: Axis): number =>
  (Math.max((landings.get(node)?.length ?? 0) - 1, 0) * landing) / 2;

function centersOf(order: number, arcs: Arcs, axis: Axis): number[] {
  const centers: number[] = [];
  let at = 0;
  for (let node = 0; node <= order + 1; node++) {
    const half = halfBar(node, arcs, axis);
    at += node === 0 ? half : axis.gap + half;
    centers.push(at);
    at += half;
  }
  return centers;
}

/** A point along the axis and off it, on the paper: arcs stand above a row and to the right of a column. */
function onPaper(along: number, off: number, { turned, origin }: Axis): Point {
  return turned ? [origin[0] + off, origin[1] + along] : [origin[0] + along, origin[1] - off];
}

function landingOf(link: Link, node: number, centers: readonly number[], arcs: Arcs, axis: Axis): number {
  const place = arcs.landings.get(node)?.indexOf(link) ?? 0;
  return (centers[node] as number) - halfBar(node, arcs, axis) + place * axis.landing;
}

/** Beside the legs and the flat part of an arc, the flat part first where the chain runs in a row. */
function arcSpots(points: readonly Point[], turned: boolean): Spot[] {
  const [a, b, c, d] = points as readonly [Point, Point, Point, Point];
  const flat = spotsAlong(b, c, 5);
  if (!turned) return flat;
  // Outermost part of a leg first: there the level below has ended.
  const legs = [0.72, 0.6, 0.5, 0.8].flatMap((share) => [
    ...spotsAlong(a, b, 3, [share]),
    ...spotsAlong(d, c, 3, [share]),
  ]);
  return [...legs, ...flat];
}

function crossRoute(link: Link, centers: readonly number[], arcs: Arcs, axis: Axis): Route {
  const off = axis.first + ((arcs.level.get(link) ?? 1) - 1) * axis.level;
  const [start, end] = [link.from, link.to].map((node) => landingOf(link, node, centers, arcs, axis)) as [
    number,
    number,
  ];
  const points = [onPaper(start, 0, axis), onPaper(start, off, axis), onPaper(end, off, axis), onPaper(end, 0, axis)];
  const marks = [0.5, 0.42, 0.58, 0.34, 0.66, 0.26, 0.74, 0.18, 0.82].map((share) =>
    onPaper(start + (end - start) * share, off, axis),
  );
  return { link, points, marks, spots: arcSpots(points, axis.turned) };
}

function mainRoute(link: Link, centers: readonly number[], arcs: Arcs, axis: Axis, labelOff: number): Route {
  const start = (centers[link.from] as number) + halfBar(link.from, arcs, axis);
  const end = (centers[link.to] as number) - halfBar(link.to, arcs, axis);
  const [a, b] = [onPaper(start, 0, axis), onPaper(end, 0, axis)];
  const middle: Point = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2];
  const toward: Point = axis.turned ? [-1, 0] : [0, 1];
  const spots: Spot[] = [{ at: middle, toward, off: labelOff }, ...spotsAlong(a, b, 5)];
  return { link, points: [a, b], marks: [middle], spots };
}

function figure(network: Network, arcs: Arcs, axis: Axis, isDense: boolean, labelOff: number): Skeleton {
  const { order, links } = network;
  const centers = centersOf(order, arcs, axis);
  const discs = centers.map((along, node): Disc => {
    const [x, y] = onPaper(along, 0, axis);
    const isPort = node === 0 || node === order + 1;
    const half = halfBar(node, arcs, axis);
    const radius = isPort ? portRadius(axis.radius) : axis.radius;
    return { node, x, y, radius, reach: axis.turned ? [0, half] : [half, 0] };
  });
  const routes = links.map((link) =>
    link.isMain ? mainRoute(link, centers, arcs, axis, labelOff) : crossRoute(link, centers, arcs, axis),
  );
  // Offsets stand on the side away from the arcs.
  const away = onPaper((centers.at(-1) ?? 0) / 2, 1e6, axis);
  return { discs, routes, offsets: offsetSpots(discs, order, away), isDense };
}

/** A row with flat-topped arcs over it; undefined where it does not fit the width or too many arcs lie over one another. */
export function chainRow(network: Network, sizing: Sizing, isForced = false): Skeleton | undefined {
  const { order, links } = network;
  const { width, mainWidth, smallWidth, mainLines } = sizing;
  const arcs = arcsOf(
    order,
    links.filter(({ isMain }) => !isMain),
  );
  const bars = [...arcs.landings.values()].reduce((sum, each) => sum + Math.max(each.length - 1, 0) * LANDING, 0);
  const room = width - 42;
  const squeeze = bars > room / 2 ? room / 2 / bars : 1;
  const gap = Math.min(110, (room - bars * squeeze) / (order + 1));
  const radius = Math.min(15, gap * 0.36);
  if (!isForced && (radius < 9 || smallWidth + 4 > gap || arcs.levels > 7 || squeeze < 1)) return undefined;
  const isDense = mainWidth + 4 > gap;
  const level = Math.min(smallWidth > 0 ? 30 + 14 * mainLines : 40, 420 / Math.max(arcs.levels, 1));
  const origin: Point = [21, 0];
  const axis = { turned: false, radius, landing: LANDING * squeeze, gap, first: level, level, origin };
  const labelOff = (isDense ? smallWidth : mainWidth) > gap - 2 * radius - 4 ? radius + 2 : 6;
  return figure(network, arcs, axis, isDense, labelOff);
}

/** A column with arcs to its right: fits any order. */
export function chainColumn(network: Network, sizing: Sizing): Skeleton {
  const { order, links } = network;
  const { width, smallWidth, mainLines, offsetWidth } = sizing;
  const arcs = arcsOf(
    order,
    links.filter(({ isMain }) => !isMain),
  );
  const isLabelled = smallWidth > 0;
  const left = Math.max(isLabelled ? smallWidth + 28 : 28, offsetWidth > 0 ? 98 : 0);
  const first = Math.min(92, Math.max(width - left - 20, 20) / 2);
  const level = Math.min(20, (width - left - 16 - first) / Math.max(arcs.levels - 1, 1));
  const gap = (isLabelled ? 24 + 14 * mainLines : 32) + (offsetWidth > 0 ? 4 : 0);
  const crowd = [...arcs.landings.values()].reduce((sum, each) => sum + each.length, 0);
  const axis = {
    turned: true,
    radius: isLabelled ? 13 : 11,
    landing: Math.min(LANDING, LONGEST_BARS / Math.max(crowd, 1)),
    gap,
    first,
    level,
    origin: [left, 0] as const,
  };
  return figure(network, arcs, axis, true, 6);
}
