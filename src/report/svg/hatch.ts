import { element, fragment, type Markup } from './markup.js';

/** What a hatched area forbids: a leaning of its own for each. */
export type Forbidden = 'transmission' | 'reflection' | 'number';

const LEAN: Readonly<Record<Forbidden, readonly [string, string]>> = {
  transmission: ['M0 8L8 0M-2 2L2 -2M6 10L10 6', 's-transmission'],
  reflection: ['M0 0L8 8M-2 6L2 10M6 -2L10 2', 's-reflection'],
  number: ['M0 8L8 0M-2 2L2 -2M6 10L10 6', 's-hatch'],
};

/** Hatch patterns of one drawing; `prefix` keeps names apart where several drawings stand in one document. */
export function hatchPatterns(prefix: string, kinds: readonly Forbidden[]): Markup {
  const patterns = kinds.map((kind) => {
    const [d, color] = LEAN[kind];
    const attributes = { id: `${prefix}-hatch-${kind}`, width: 8, height: 8, patternUnits: 'userSpaceOnUse' };
    return element('pattern', attributes, element('path', { d, class: `line hair half ${color}` }));
  });
  return element('defs', {}, fragment(...patterns));
}

/** The fill of a hatched area. */
export function hatchFill(prefix: string, kind: Forbidden): string {
  return `url(#${prefix}-hatch-${kind})`;
}
