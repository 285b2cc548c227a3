import type { Band } from '../../../../forms/index.js';
import { arcsOf } from '../routing/arcs.js';
import type { Network } from '../routing/couplings.js';
import { between, type Point } from '../routing/geometry.js';
import { bandwidthText } from '../routing/label-text.js';
import { disc, type Layout, type Line, portRadius, type Route } from '../routing/layout.js';
import { finish, spotsAlong, type Wanted } from '../routing/place.js';

/** Brackets below the ruler run so far apart, px, as long as there are few. */
const LEVEL = 22;

/** Deepest stack of brackets, px. */
const DEEPEST = 160;

/** Half diagonal of the lozenge on a bracket, px. */
const LOZENGE = 6;

function bracket(link: Route['link'], from: Point, to: Point, depth: number): Route {
  const [b, c]: [Point, Point] = [
    [from[0], depth],
    [to[0], depth],
  ];
  const shares = [0.5, 0.3, 0.7, 0.4, 0.6, 0.2, 0.8];
  return {
    link,
    points: [from, b, c, to],
    marks: [0.5, 0.25, 0.75, 0.4, 0.6].map((share) => between(b, c, share)),
    // Numbers hang below the flat part.
    spots: spotsAlong(b, c, 3, shares).sort((p, q) => q.toward[1] - p.toward[1]),
  };
}

/** The ruler of nodes with a bracket below it for each cross coupling, which ties its two ends together. */
export function rulerOf(network: Network, band: Band, toX: (node: number) => number, width: number): Layout {
  const { order, links } = network;
  const cross = links.filter(({ from, to }) => to !== from + 1);
  const step = toX(1) - toX(0);
  const radius = Math.min(12, step * 0.42);
  const arcs = arcsOf(order, cross);
  const level = Math.min(LEVEL, DEEPEST / Math.max(arcs.levels, 1));
  const discs = Array.from({ length: order + 2 }, (_, node) =>
    disc(node, toX(node), 0, node === 0 || node === order + 1 ? portRadius(radius) : radius),
  );
  const landing = (link: Route['link'], node: number): Point => {
    const all = arcs.landings.get(node) ?? [];
    const share = (all.indexOf(link) + 1) / (all.length + 1) - 0.5;
    return [toX(node) + share * 1.6 * radius, 0];
  };
  const routes = cross.map((link) => {
    const depth = radius + 10 + ((arcs.level.get(link) ?? 1) - 1) * level;
    return bracket(link, landing(link, link.from), landing(link, link.to), depth);
  });
  const wanted = routes.map((own): Wanted => {
    const { link, spots } = own;
    const text = bandwidthText(link.value * band.bandwidthHz, band, false);
    const line: Line = { text, classes: `small bold${link.value < 0 ? ' f-negative' : ''}`, size: 11 };
    return { versions: [[line]], spots, own };
  });
  return finish({ discs, routes, offsets: new Map(), isDense: true }, wanted, width, LOZENGE);
}
