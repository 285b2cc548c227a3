import type { Link, Network } from './couplings.js';
import { between, type Point } from './geometry.js';
import { type Disc, disc, type Route, type Sizing, type Skeleton, type Spot } from './layout.js';
import { offsetSpots } from './offset-spots.js';
import { spotsAlong } from './place.js';

/** Highest fan whose resonators keep their numbers, px. */
const HIGHEST = 720;

/** Lines run level for so long beside a resonator that carries no label, px. */
const BARE_STUB = 24;

/** Below all resonators, so that it crosses no line of the fan. */
function directRoute(link: Link, a: Point, b: Point, foot: number): Route {
  const [c, d]: [Point, Point] = [
    [a[0], foot],
    [b[0], foot],
  ];
  return {
    link,
    points: [a, c, d, b],
    marks: [between(c, d, 0.5), between(c, d, 0.4)],
    spots: spotsAlong(c, d),
  };
}

/** From a port to a resonator: aslant first, then level, where the label stands. */
function spokeRoute(link: Link, port: Point, resonator: Disc, stub: number): Route {
  const end: Point = [resonator.x, resonator.y];
  const side = Math.sign(port[0] - end[0]);
  const rim: Point = [end[0] + side * resonator.radius, end[1]];
  const bend: Point = [end[0] + side * stub, end[1]];
  const above: Spot = { at: between(rim, bend, 0.5), toward: [0, -1], off: 4 };
  return {
    link,
    points: [port, bend, end],
    marks: [0.6, 0.7, 0.8, 0.5].map((share) => between(port, bend, share)),
    spots: [above, ...spotsAlong(rim, bend, 4, [0.5, 0.55, 0.6]), ...spotsAlong(port, bend, 4)],
  };
}

/** Resonators one above the other between source and load; a direct coupling passes below them. */
export function fan(network: Network, sizing: Sizing): Skeleton {
  const { width, isNarrow, smallWidth, mainWidth, mainLines, offsetWidth } = sizing;
  const { order, links } = network;
  const isLabelled = smallWidth > 0;
  const least = offsetWidth > 0 ? 50 : 38;
  const pitch = isLabelled ? Math.max(24 + 14 * mainLines, least) : Math.min(26, Math.max(HIGHEST / order, 5));
  const radius = Math.min(isLabelled ? 13 : 11, pitch * 0.42);
  const [left, right] = isNarrow ? [20, width - 20] : [40, width - 40];
  const middle = ((order - 1) * pitch) / 2;
  const center = width / 2;
  // Labels of both lines leave room for the offset that stands over the resonator between them.
  const beside = Math.max(radius + 8, offsetWidth + 10 - radius);
  const stub = isLabelled ? (isNarrow ? smallWidth : mainWidth) + beside : BARE_STUB;
  const discs = Array.from({ length: order + 2 }, (_, node): Disc => {
    if (node === 0) return disc(node, left, middle, 13);
    if (node === order + 1) return disc(node, right, middle, 13);
    return disc(node, center, (node - 1) * pitch, radius);
  });
  const pointOf = (node: number): Point => [discs[node]?.x ?? 0, discs[node]?.y ?? 0];
  const foot = Math.max((order - 1) * pitch + radius + (offsetWidth > 0 ? 26 : 14), middle + 40);
  const routes = links.map((link): Route => {
    if (!link.isMain) return directRoute(link, pointOf(link.from), pointOf(link.to), foot);
    const isSource = link.from === 0;
    const port = pointOf(isSource ? link.from : link.to);
    return spokeRoute(link, port, discs[isSource ? link.to : link.from] as Disc, stub);
  });
  // Above every resonator stands its offset, between the labels of its two lines.
  return { discs, routes, offsets: offsetSpots(discs, order, [center, 1e6]), isDense: isNarrow };
}
