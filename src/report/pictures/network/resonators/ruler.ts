import type { Band } from '../../../../forms/index.js';
import { textWidth } from '../../../svg/words.js';
import { type Arcs, arcsOf } from '../routing/arcs.js';
import type { Link, Network } from '../routing/couplings.js';
import { between, type Point } from '../routing/geometry.js';
import { bandwidthText, couplingText, externalQ, isAtPort, isDirect, qualityText } from '../routing/label-text.js';
import { type Disc, disc, type Layout, type Line, portRadius, type Route, type Spot } from '../routing/layout.js';
import { finish, spotsAlong, type Wanted } from '../routing/place.js';

/** Brackets below the ruler run so far apart, px, as long as there are few. */
const LEVEL = 22;

/** Deepest stack of brackets, px. */
const DEEPEST = 160;

/** Half diagonal of the lozenge on a bracket, px. */
const LOZENGE = 6;

/** Size of the letters, px. */
const LETTERS = 11;

/** A number at a bracket or a port keeps this distance from the ends of the drawing, px. */
const EDGE = 6;

function bracket(link: Link, from: Point, to: Point, depth: number): Route {
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

/** What stands at a bracket or a port: bandwidth between resonators, external Q at a port, M from source to load. */
function textOf(link: Link, order: number, band: Band): string {
  if (isDirect(link, order)) return `M ${couplingText(link.value)}`;
  if (isAtPort(link, order)) return `Qe ${qualityText(externalQ(link.value, band))}`;
  return bandwidthText(link.value * band.bandwidthHz, band, false);
}

/** Couplings that have no bracket: they lie on the ruler itself. */
export const isOnRuler = ({ from, to }: Link): boolean => to === from + 1;

/** A coupling of neighbors; its sign shows in the plot below, that of a port on the ruler. */
function straight(link: Link, order: number, toX: (node: number) => number): Route {
  const points: readonly [Point, Point] = [
    [toX(link.from), 0],
    [toX(link.to), 0],
  ];
  return { link, points, marks: isAtPort(link, order) ? [between(points[0], points[1], 0.5)] : [], spots: [] };
}

/** Over the disc of the port, inside the drawing. */
function portSpot({ from }: Link, text: string, discs: readonly Disc[], width: number): Spot {
  const port = (from === 0 ? discs[0] : discs.at(-1)) as Disc;
  const half = textWidth(text, LETTERS, true) / 2 + EDGE;
  const x = Math.min(Math.max(port.x, half), width - half);
  return { at: [x, -Math.max(...discs.map(({ radius }) => radius))], toward: [0, -1], off: 4 };
}

function bracketsOf(cross: readonly Link[], arcs: Arcs, radius: number, toX: (node: number) => number): Route[] {
  const level = Math.min(LEVEL, DEEPEST / Math.max(arcs.levels, 1));
  const landing = (link: Link, node: number): Point => {
    const all = arcs.landings.get(node) ?? [];
    const share = (all.indexOf(link) + 1) / (all.length + 1) - 0.5;
    return [toX(node) + share * 1.6 * radius, 0];
  };
  return cross.map((link) => {
    const depth = radius + 10 + ((arcs.level.get(link) ?? 1) - 1) * level;
    return bracket(link, landing(link, link.from), landing(link, link.to), depth);
  });
}

/**
 * The ruler of nodes, joined where neighbors are coupled, with a bracket below it for each cross coupling, which ties its two
 * ends together. Branches of a fan have their own plots: on its ruler ports stand only where they are coupled directly.
 */
export function rulerOf(network: Network, band: Band, toX: (node: number) => number, width: number): Layout {
  const { order, isFan } = network;
  const links = isFan ? network.links.filter((link) => isDirect(link, order)) : network.links;
  const cross = links.filter((link) => !isOnRuler(link));
  const radius = Math.min(12, (toX(1) - toX(0)) * 0.42);
  const all = Array.from({ length: order + 2 }, (_, node) =>
    disc(node, toX(node), 0, node === 0 || node === order + 1 ? portRadius(radius) : radius),
  );
  const discs = isFan && links.length === 0 ? all.slice(1, -1) : all;
  const main = links.filter(isOnRuler).map((link) => straight(link, order, toX));
  const brackets = bracketsOf(cross, arcsOf(order, cross), radius, toX);
  const wantedOf = (own: Route, spots: readonly Spot[]): Wanted => {
    const text = textOf(own.link, order, band);
    const line: Line = { text, classes: `small bold${own.link.value < 0 ? ' f-negative' : ''}`, size: LETTERS };
    return { versions: [[line]], spots, own };
  };
  const ports = main.filter(({ link }) => isAtPort(link, order));
  const wanted = [
    ...brackets.map((own) => wantedOf(own, own.spots)),
    ...ports.map((own) => wantedOf(own, [portSpot(own.link, textOf(own.link, order, band), discs, width)])),
  ];
  return finish({ discs, routes: [...main, ...brackets], offsets: new Map(), isDense: true }, wanted, width, LOZENGE);
}
