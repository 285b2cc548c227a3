import { element, fragment, type Markup } from '../../svg/markup.js';
import { label } from '../../svg/words.js';
import { namePlace, textSize } from './curve-name.js';
import { type LabelMap, takeBox } from './label-map.js';
import type { Plot } from './plot.js';
import type { Point } from './thin.js';
import { placedText } from './walls.js';

/** A curve to be named: the wordings to try, longest first, and where the name would best stand. */
export interface CurveName {
  readonly choices: readonly (readonly string[])[];
  readonly curve: readonly Point[];
  readonly role: 'transmission' | 'reflection';
  readonly wish: Point;
}

/** Width that a name takes in the row above the plot. */
const ABOVE = 150;

function drawn({ leader, box, lines, role }: NonNullable<ReturnType<typeof placeOf>>): Markup {
  const [from, to] = leader ?? [];
  const line =
    from === undefined || to === undefined
      ? []
      : [element('line', { x1: from[0], y1: from[1], x2: to[0], y2: to[1], class: `hair s-${role}` })];
  return fragment(...line, placedText({ box, lines, isMet: true }, `bold f-${role}`));
}

function placeOf(map: LabelMap, { choices, curve, role, wish }: CurveName) {
  for (const lines of choices) {
    const place = namePlace(map, curve, textSize(lines, 13, true), wish);
    if (place !== undefined) return { ...place, lines, role };
  }
  return undefined;
}

/** Names of curves, each where it touches nothing; above the plot where there is no room. */
export function drawNames(map: LabelMap, plot: Plot, names: readonly CurveName[]): readonly Markup[] {
  return names.map((name, n) => {
    const place = placeOf(map, name);
    const [first = []] = name.choices;
    if (place === undefined) return label(plot.left + ABOVE * n, plot.top - 10, first.join(' '), `bold f-${name.role}`);
    takeBox(map, place.box);
    return drawn(place);
  });
}
