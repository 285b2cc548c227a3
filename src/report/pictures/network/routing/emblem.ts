import type { CouplingMatrix } from '../../../../forms/index.js';
import { checkMatrix } from '../../../check-design.js';
import type { Drawing } from '../../../svg/drawing.js';
import { cascade } from './cascade.js';
import { chainRow } from './chain.js';
import { type Network, networkOf } from './couplings.js';
import { drawn } from './draw.js';
import { fan } from './fan.js';
import { foldedRows } from './folded.js';
import { boxAround, type Point } from './geometry.js';
import { type Layout, portRadius, type Sizing, type Skeleton } from './layout.js';
import { patternOf } from './pattern.js';
import { placeLozenges } from './place.js';

/** Largest size of an emblem, px. */
const WIDTH = 150;
const HEIGHT = 60;

/** Room round the figure for half the width of its lines, px. */
const MARGIN = 2;

/** Layouts without labels in a width that is made fit afterward. */
function figureOf(network: Network): Skeleton {
  const width = 120 * (network.order + 2);
  const sizing: Sizing = { width, isNarrow: false, mainWidth: 1, smallWidth: 1, mainLines: 0, offsetWidth: 0 };
  const pattern = patternOf(network);
  const found =
    pattern.kind === 'fan'
      ? fan(network, { ...sizing, width: 300 })
      : pattern.kind === 'folded'
        ? foldedRows(network, sizing)
        : pattern.kind === 'cascade'
          ? cascade(network, sizing, pattern.sections)
          : undefined;
  return found ?? (chainRow(network, sizing, true) as Skeleton);
}

/**
 * The small routing figure that stands for a design beside its title: no text, at most 150 by 60 px.
 *
 * Cost: a few milliseconds up to order 20.
 *
 * @throws FilterFailure E_TYPE, E_MATRIX_SHAPE, E_NOT_FINITE, E_ENTRY_RANGE, E_NOT_SYMMETRIC
 */
export function emblem(given: CouplingMatrix): Drawing {
  const matrix = checkMatrix(given);
  const { order } = matrix;
  const layout = emblemLayout(networkOf(matrix));
  return { width: layout.width, height: layout.height, body: drawn(layout, order, false) };
}

/** The emblem as plain data: the large figure, brought down to size in each direction by itself. */
export function emblemLayout(network: Network): Layout {
  const { discs, routes } = figureOf(network);
  const centers = discs.map(({ x, y, reach }) => ({
    left: x - reach[0],
    right: x + reach[0],
    top: y - reach[1],
    bottom: y + reach[1],
  }));
  const lines = routes.flatMap(({ points }) => points.map(([x, y]) => ({ left: x, right: x, top: y, bottom: y })));
  const all = boxAround([...centers, ...lines]);
  const closest = closestPair(discs.map(({ x, y, reach }) => [x, y, Math.max(reach[0], reach[1])]));
  const [spanX, spanY] = [all.right - all.left, all.bottom - all.top];
  // Steps of 32 px at most, so that a small design does not become a wide emblem.
  const scaleX = Math.min(32 / closest, (WIDTH - 16 - 2 * MARGIN) / Math.max(spanX, 1));
  const scaleY = Math.min(32 / closest, (HEIGHT - 16 - 2 * MARGIN) / Math.max(spanY, 1));
  const radius = Math.min(8, closest * Math.min(scaleX, network.isFan ? scaleY : scaleX) * 0.36);
  const moved = ([x, y]: Point): Point => [
    (x - all.left) * scaleX + radius + MARGIN,
    (y - all.top) * scaleY + radius + MARGIN,
  ];
  const small = discs.map((disc) => {
    const [x, y] = moved([disc.x, disc.y]);
    const own = disc.node === 0 || disc.node === network.order + 1 ? portRadius(radius) : radius;
    return { ...disc, x, y, radius: own, reach: [disc.reach[0] * scaleX, disc.reach[1] * scaleY] as const };
  });
  const ways = routes.map((route) => ({ ...route, points: route.points.map(moved), marks: route.marks.map(moved) }));
  const edge = 2 * (radius + MARGIN);
  return {
    width: spanX * scaleX + edge,
    height: spanY * scaleY + edge,
    discs: small,
    routes: ways,
    lozenges: placeLozenges(ways, small, Math.min(5, radius)),
    labels: [],
    dropped: 0,
    shortened: 0,
  };
}

/** Smallest distance of two nodes, their bars left out. */
function closestPair(nodes: readonly (readonly [number, number, number])[]): number {
  let least = Number.POSITIVE_INFINITY;
  nodes.forEach(([x, y, half], n) => {
    for (const [u, v, other] of nodes.slice(n + 1))
      least = Math.min(least, Math.max(Math.hypot(u - x, v - y) - half - other, 1));
  });
  return least;
}
