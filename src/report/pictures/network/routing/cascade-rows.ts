import type { Section } from './pattern.js';

/** A stretch of the axis: a plain step or a section, with its length and the side its corners stand on (-1 up, 1 down, 0 none). */
export interface Stretch {
  readonly first: number;
  readonly last: number;
  readonly length: number;
  readonly side: number;
}

/** Length of a plain step that carries labels, px. */
export const PLAIN = 92;
/** Base of a triangle, px. */
const TRIANGLE = 144;
/** Side of a square, px. */
export const SQUARE = 118;
/** Distance of the apex of a triangle from the axis, px. */
export const APEX = 90;

/** The axis from source to load as stretches; sections that share a corner stand on opposite sides. */
export function stretchesOf(order: number, sections: readonly Section[], plain: number): Stretch[] {
  const stretches: Stretch[] = [];
  let node = 0;
  while (node < order + 1) {
    const section = sections.find(({ first }) => first === node);
    if (section === undefined) stretches.push({ first: node, last: node + 1, length: plain, side: 0 });
    else {
      stretches.push({ ...section, length: section.last - section.first === 2 ? TRIANGLE : SQUARE, side: -1 });
    }
    node = (stretches.at(-1) as Stretch).last;
  }
  return stretches;
}

/** A row of the axis: its first node and what follows it. */
export interface Row {
  readonly first: number;
  readonly stretches: Stretch[];
}

/** Length of several stretches together. */
export const lengthOf = (stretches: readonly Stretch[]): number =>
  stretches.reduce((sum, { length }) => sum + length, 0);

/** Breaks the axis into rows at plain steps; the step that breaks becomes the way down. Undefined where a run is too long. */
function rowsOf(stretches: readonly Stretch[], most: number): Row[] | undefined {
  const rows: Row[] = [{ first: 0, stretches: [] }];
  for (const [n, stretch] of stretches.entries()) {
    const row = rows.at(-1) as Row;
    const rest = stretches.slice(n + 1);
    const next = rest.findIndex(({ side }) => side === 0);
    // Sections that follow one another share corners and cannot be parted: they come along whole.
    const run = stretch.side === 0 ? rest.slice(0, next < 0 ? rest.length : next) : [];
    const isFull = lengthOf(row.stretches) + stretch.length + lengthOf(run) > most;
    if (stretch.side === 0 && isFull && row.stretches.length > 0) rows.push({ first: stretch.last, stretches: [] });
    else row.stretches.push(stretch);
  }
  return rows.some((row) => lengthOf(row.stretches) > most + 1e-6) ? undefined : rows;
}

/**
 * Sections that share a corner stand on opposite sides; a square at the start of a row hangs down, where the way from the row
 * above does not run. Undefined where a square at the end of a row would stand in the way down.
 */
function standing(rows: readonly Row[]): Row[] | undefined {
  const isSquare = ({ first, last }: Stretch): boolean => last - first === 3;
  const turned = rows.map(({ first, stretches }, n): Row => {
    let before = 0;
    const sides = stretches.map((each, k) => {
      const start = k === 0 && n > 0 && isSquare(each) ? 1 : -1;
      before = each.side === 0 ? 0 : before === 0 ? start : -before;
      return { ...each, side: before };
    });
    return { first, stretches: sides };
  });
  const inTheWay = turned.slice(0, -1).some(({ stretches }) => {
    const end = stretches.at(-1);
    return end !== undefined && end.side === 1 && isSquare(end);
  });
  return inTheWay ? undefined : turned;
}

/** Every row but the last as long as the longest, so that the ways down stand upright. */
function justified(rows: readonly Row[]): Row[] {
  const longest = Math.max(...rows.map(({ stretches }) => lengthOf(stretches)));
  return rows.map((row, n): Row => {
    const missing = longest - lengthOf(row.stretches);
    const plain = row.stretches.filter(({ side }) => side === 0).length;
    const share = n === rows.length - 1 ? 0 : missing / (plain || row.stretches.length || 1);
    const takes = ({ side }: Stretch): boolean => side === 0 || plain === 0;
    const stretches = row.stretches.map((each) => (takes(each) ? { ...each, length: each.length + share } : each));
    return { first: row.first, stretches };
  });
}

/** The axis of a cascade in rows of at most a length. Undefined where sections do not let it be broken. */
export function axisRows(stretches: readonly Stretch[], most: number): Row[] | undefined {
  const broken = rowsOf(stretches, most);
  const upright = broken && standing(broken);
  return upright && justified(upright);
}
