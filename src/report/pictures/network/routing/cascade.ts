import { APEX, axisRows, lengthOf, PLAIN, type Row, SQUARE, stretchesOf } from './cascade-rows.js';
import type { Network } from './couplings.js';
import type { Point } from './geometry.js';
import { type Disc, disc, portRadius, type Route, type Sizing, type Skeleton, type Spot } from './layout.js';
import { offsetSpots } from './offset-spots.js';
import type { Section } from './pattern.js';
import { spotsAlong } from './place.js';

interface Frame {
  readonly scale: number;
  readonly radius: number;
  readonly left: number;
  readonly right: number;
  readonly pitch: number;
}

function nodesOfRow(
  { first: head, stretches }: Row,
  direction: number,
  y: number,
  { scale, left, right }: Frame,
): ReadonlyMap<number, Point> {
  const points = new Map<number, Point>();
  let x = direction > 0 ? left : right;
  points.set(head, [x, y]);
  for (const { first: start, last, length, side } of stretches) {
    const span = length * scale * direction;
    const inner = last - start - 1;
    for (let n = 1; n <= inner; n++) {
      const share = inner === 1 ? 0.5 : n - 1;
      points.set(start + n, [x + span * share, y + side * (inner === 1 ? APEX : SQUARE) * scale]);
    }
    x += span;
    points.set(last, [x, y]);
  }
  return points;
}

/** How far the corners of a row stand off its axis, on one side. */
function heightOf({ stretches }: Row, side: number, scale: number): number {
  const heights = stretches.map((each) => (each.last - each.first === 2 ? APEX : SQUARE) * scale);
  return Math.max(0, ...heights.filter((_, n) => stretches[n]?.side === side));
}

/** All nodes by number, row after row, each second row running back. */
function positions(rows: readonly Row[], frame: Frame): ReadonlyMap<number, Point> {
  const all = new Map<number, Point>();
  let y = 0;
  rows.forEach((row, n) => {
    const before = rows[n - 1];
    if (before !== undefined) y += heightOf(before, 1, frame.scale) + frame.pitch + heightOf(row, -1, frame.scale);
    for (const [node, point] of nodesOfRow(row, n % 2 === 0 ? 1 : -1, y, frame)) all.set(node, point);
  });
  return all;
}

function routesOf(
  network: Network,
  at: ReadonlyMap<number, Point>,
  sections: readonly Section[],
  labelOff: number,
): Route[] {
  return network.links.map((link): Route => {
    const [a, b] = [at.get(link.from) as Point, at.get(link.to) as Point];
    const middle: Point = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2];
    const section = sections.find(({ first, last }) => link.from >= first && link.to <= last);
    const corner = section === undefined ? undefined : at.get(section.first + 1);
    const axis = section === undefined ? undefined : at.get(section.first);
    const up = corner === undefined || axis === undefined ? -1 : Math.sign(corner[1] - axis[1]);
    const isBase = section !== undefined && link.from === section.first && link.to === section.last;
    const prefer = a[1] === b[1] ? [{ at: middle, toward: [0, isBase ? -up : up] as const, off: labelOff }] : [];
    const spots: Spot[] = [...prefer, ...outwardFirst(spotsAlong(a, b, 6), at, section)];
    const marks = [0.5, 0.36, 0.64].map((t): Point => [a[0] + (b[0] - a[0]) * t, a[1] + (b[1] - a[1]) * t]);
    return { link, points: [a, b], marks, spots };
  });
}

/** Spots that lie away from the middle of their section come first at each share of the line. */
function outwardFirst(spots: Spot[], at: ReadonlyMap<number, Point>, section: Section | undefined): Spot[] {
  if (section === undefined) return spots;
  const [a, b] = [at.get(section.first) as Point, at.get(section.last) as Point];
  const corner = at.get(section.first + 1) as Point;
  const center: Point = [(a[0] + b[0]) / 2, (a[1] + corner[1]) / 2];
  const outness = ({ at: [x, y], toward: [nx, ny] }: Spot): number => (x - center[0]) * nx + (y - center[1]) * ny;
  return [...spots.filter((spot) => outness(spot) > 0), ...spots.filter((spot) => outness(spot) <= 0)];
}

/**
 * A row of nodes with triangles and squares standing on it, broken into several rows where it is long; `smallest` keeps the
 * figure from shrinking further, `inset` leaves room for labels on both sides.
 */
export function cascade(
  network: Network,
  sizing: Sizing,
  sections: readonly Section[],
  smallest = 0,
  inset = 0,
): Skeleton | undefined {
  const { order } = network;
  const { width, mainWidth, smallWidth, mainLines } = sizing;
  const isLabelled = smallWidth > 0;
  const plain = isLabelled ? PLAIN : 34;
  const stretches = stretchesOf(order, sections, plain);
  const room = width - 48 - 2 * inset;
  const least = isLabelled ? (smallWidth + 6) / plain : 1;
  const scale = Math.min(1, Math.max(room / lengthOf(stretches), Math.min(least, 0.9), smallest));
  const rows = axisRows(stretches, room / scale);
  if (rows === undefined) return undefined;
  const used = Math.max(...rows.map((row) => lengthOf(row.stretches))) * scale;
  const isDense = mainWidth + 4 > plain * scale;
  const radius = Math.min(15, isLabelled ? 15 : 12, plain * scale * 0.36);
  const labelOff = (isDense ? smallWidth : mainWidth) > plain * scale - 2 * radius - 4 ? radius + 2 : 6;
  const left = 22 + inset;
  const pitch = (isLabelled ? 60 + 26 * mainLines : 40) + (sizing.offsetWidth > 0 ? 16 : 0);
  const at = positions(rows, { scale, radius, left, right: left + used, pitch });
  const discs = Array.from({ length: order + 2 }, (_, node): Disc => {
    const [x, y] = at.get(node) as Point;
    return disc(node, x, y, node === 0 || node === order + 1 ? portRadius(radius) : radius);
  });
  const offsets = offsetSpots(discs, order, [width / 2, 1e6]);
  return { discs, routes: routesOf(network, at, sections, labelOff), offsets, isDense };
}
