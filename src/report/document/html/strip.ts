import { dot, octagon } from '../../svg/marks.js';
import { element, type Markup } from '../../svg/markup.js';
import { label } from '../../svg/words.js';
import type { Requirement } from '../../words/requirement.js';

const WIDTH = 124;
const HEIGHT = 18;
const MIDDLE = HEIGHT / 2;
/** Where the wall stands: forbidden to its left. */
const WALL = 26;
/** Pixels for each hundredth of the limit. */
const SCALE = 2.3;
const TICKS: readonly number[] = [10, 20, 30, 40];
const END = WALL + SCALE * 40;
/** Between two rules of a table an octagon must be larger than in a chart to be told from a dot. */
const OCTAGON = { scale: 1.3, half: 9 } as const;
const HATCH = 'M0 15L12 3M-4 11L4 3M4 15L16 3M10 15L22 3M16 15L26 5M22 15L26 11';

function svg(height: number, ...parts: readonly Markup[]): Markup {
  const attributes = {
    class: 'pic strip',
    'aria-hidden': 'true',
    viewBox: `0 0 ${WIDTH} ${height}`,
    width: WIDTH,
    height,
  };
  return element('svg', attributes, ...parts);
}

/** The scale over the strips: clearance as a share of the limit. */
export function stripHead(): Markup {
  const labels = [0, ...TICKS].map((share) => label(WALL + SCALE * share, 12, String(share), 'tick small', 'mid'));
  return svg(15, ...labels);
}

/** A miss lies where the strip has no scale: the octagon in the hatch says that, and the number beside it how far. */
function missMarks({ share, lack }: Requirement): readonly Markup[] {
  const x = Math.max(Math.min(WALL + 100 * SCALE * share, WALL - OCTAGON.half - 2), OCTAGON.half);
  const percent = Math.round(-100 * share);
  const text = percent > 1000 ? `over 1000 % ${lack}` : `${percent} % ${lack}`;
  return [
    element('line', { x1: WALL, x2: x, y1: MIDDLE, y2: MIDDLE, class: 'line thick s-short' }),
    element('g', { transform: `translate(${x.toFixed(1)} ${MIDDLE}) scale(${OCTAGON.scale})` }, octagon(0, 0)),
    label(WALL + 7, MIDDLE + 4, text, 'small f-short'),
  ];
}

function roomMarks({ share }: Requirement): readonly Markup[] {
  const x = Math.min(Math.max(WALL + 100 * SCALE * share, WALL), END + 3);
  const ticks = TICKS.map((tick) => `M${(WALL + SCALE * tick).toFixed(1)} 12v3`).join('');
  return [
    element('path', { d: ticks, class: 'line hair s-second' }),
    element('line', { x1: WALL, x2: x, y1: MIDDLE, y2: MIDDLE, class: 'line thick s-ink' }),
    dot(x, MIDDLE),
  ];
}

/**
 * The clearance of one requirement as a share of its limit: from the wall to a dot, to the end of the scale at most; a miss
 * runs into the hatch and ends in an octagon, and says its share.
 */
export function clearanceStrip(requirement: Requirement): Markup {
  return svg(
    HEIGHT,
    element('path', { d: HATCH, class: 'line hair half s-hatch' }),
    element('path', { d: `M${WALL} 2v14`, class: 'line edge s-ink' }),
    ...(requirement.isMet ? roomMarks(requirement) : missMarks(requirement)),
  );
}
