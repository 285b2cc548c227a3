import { dot, octagon } from '../../svg/marks.js';
import { element, type Markup } from '../../svg/markup.js';
import { label } from '../../svg/words.js';
import type { Requirement } from '../../words/requirement.js';

const WIDTH = 124;
const HEIGHT = 18;
const MIDDLE = HEIGHT / 2;
/** Where the wall stands: forbidden to its left. */
const WALL = 22;
/** Pixels for each hundredth of the limit. */
const SCALE = 2.4;
const TICKS: readonly number[] = [10, 20, 30, 40];
const END = WALL + SCALE * 40;
const HATCH = 'M0 15L12 3M-4 11L4 3M4 15L16 3M10 15L22 3M18 15L22 11';

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

/**
 * The clearance of one requirement as a share of its limit: from the wall to a dot, to the end of the scale at most; a miss
 * runs into the hatch and ends in an octagon.
 */
export function clearanceStrip({ share, isMet }: Requirement): Markup {
  const wanted = WALL + 100 * SCALE * share;
  const x = isMet ? Math.min(Math.max(wanted, WALL), END + 3) : Math.max(Math.min(wanted, WALL - 6), 7);
  const ticks = TICKS.map((tick) => `M${WALL + SCALE * tick} 12v3`).join('');
  return svg(
    HEIGHT,
    element('path', { d: HATCH, class: 'line hair half s-hatch' }),
    element('path', { d: ticks, class: 'line hair s-second' }),
    element('path', { d: `M${WALL} 2v14`, class: 'line edge s-ink' }),
    element('line', { x1: WALL, x2: x, y1: MIDDLE, y2: MIDDLE, class: `line thick ${isMet ? 's-ink' : 's-short'}` }),
    isMet ? dot(x, MIDDLE) : octagon(x, MIDDLE),
  );
}
