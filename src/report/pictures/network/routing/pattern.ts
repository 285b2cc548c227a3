import type { Link, Network } from './couplings.js';

/** Nodes `first`..`last` of a cascade that close a triangle (last = first + 2) or a square (last = first + 3). */
export interface Section {
  readonly first: number;
  readonly last: number;
}

/** How the couplings lie in the matrix, and so how they are drawn. */
export type Pattern =
  | { readonly kind: 'fan' }
  | { readonly kind: 'inline' }
  | { readonly kind: 'folded' }
  | { readonly kind: 'cascade'; readonly sections: readonly Section[] }
  | { readonly kind: 'chain' };

const isCross = ({ isMain }: Link): boolean => !isMain;

/** Only neighbors are coupled. */
export function isInline({ links }: Network): boolean {
  return !links.some(isCross);
}

/** Cross couplings lie on the anti-diagonal of the matrix or right beside it. */
export function isFolded({ order, links }: Network): boolean {
  return links.filter(isCross).every(({ from, to }) => Math.abs(from + to - order - 1) <= 1);
}

/**
 * Cross couplings close triangles (i, i+2) and squares (i, i+3, with or without diagonals) that share at most a corner;
 * undefined where they reach farther or interlock.
 */
export function sectionsOf({ links }: Network): readonly Section[] | undefined {
  const sections: Section[] = [];
  const spans = links.filter(isCross).sort((a, b) => a.from - b.from || b.to - a.to);
  for (const { from, to } of spans) {
    const before = sections.at(-1);
    if (before !== undefined && from < before.last) {
      sections[sections.length - 1] = { first: before.first, last: Math.max(before.last, to) };
    } else sections.push({ first: from, last: to });
  }
  return sections.every(({ first, last }) => last - first <= 3) ? sections : undefined;
}

/** Two cross couplings or more, all of them at one port. */
export function isArrow({ order, links }: Network): boolean {
  const cross = links.filter(isCross);
  return cross.length > 1 && (cross.every(({ from }) => from === 0) || cross.every(({ to }) => to === order + 1));
}

/** The pattern of a network; the first that fits. */
export function patternOf(network: Network): Pattern {
  if (network.isFan) return { kind: 'fan' };
  if (isInline(network)) return { kind: 'inline' };
  if (isFolded(network)) return { kind: 'folded' };
  const sections = isArrow(network) ? undefined : sectionsOf(network);
  return sections === undefined ? { kind: 'chain' } : { kind: 'cascade', sections };
}
