import type { Link } from './couplings.js';

/** Arcs of cross couplings over an axis: at which place of its node each end lands, and at which level its flat part runs. */
export interface Arcs {
  /** Landings of a node from start to end of the axis: arcs that come from before it, then arcs that go on. */
  readonly landings: ReadonlyMap<number, readonly Link[]>;
  readonly level: ReadonlyMap<Link, number>;
  readonly levels: number;
}

/** Landings in an order in which arcs of one node do not cross. */
function landingsOf(node: number, cross: readonly Link[]): Link[] {
  const back = cross.filter(({ to }) => to === node).sort((a, b) => b.from - a.from);
  const ahead = cross.filter(({ from }) => from === node).sort((a, b) => b.to - a.to);
  return [...back, ...ahead];
}

/** Do two arcs share a part of the axis? Arcs that meet in a node only may run at one level. */
function overlap(a: Link, b: Link): boolean {
  return a.from < b.to && b.from < a.to;
}

/** Short arcs run low; each arc runs above all that it covers or crosses. */
export function arcsOf(order: number, cross: readonly Link[]): Arcs {
  const level = new Map<Link, number>();
  for (const link of [...cross].sort((a, b) => a.to - a.from - (b.to - b.from) || a.from - b.from)) {
    const below = [...level].filter(([other]) => overlap(link, other)).map(([, each]) => each);
    level.set(link, 1 + Math.max(0, ...below));
  }
  const nodes = Array.from({ length: order + 2 }, (_, node) => node);
  const landings = new Map(nodes.map((node) => [node, landingsOf(node, cross)] as const));
  return { landings, level, levels: Math.max(0, ...level.values()) };
}
