import { potentialValue } from './line.js';
import type { LineProblem } from './lobes.js';
import { potentialFor } from './rejection-level.js';
import { levelAt, type Segment } from './segments.js';

/** Cells of one stretch of mask. */
const CELLS = 48;

/** Narrowest stretch that a start can fall into: isolated points are given this width, here only. */
const POINT_WIDTH = 1e-3;

interface Cell {
  readonly at: number;
  readonly width: number;
  readonly need: number;
}

/**
 * First positions of the free zeros: quantiles of the density that would meet the mask if zeros were spread like a liquid.
 *
 * A density rho raises the potential by `(pi^2/4)*rho` (the integral of g over the line), so
 * `rho = (4/pi^2)*max(0, T + c - field)` on the mask, T the potential that the level needs, and c such that rho adds up to
 * the number of zeros.
 */
export function equilibriumStart(problem: LineProblem): number[] {
  const cells = cellsOf(problem);
  const massAt = (c: number): number =>
    cells.reduce((sum, { width, need }) => sum + width * Math.max(0, need + c), 0) * (4 / (Math.PI * Math.PI));
  let low = -Math.max(...cells.map(({ need }) => need));
  let high = low + 1;
  while (massAt(high) < problem.count) high = low + 2 * (high - low);
  for (let turn = 0; turn < 60; turn++) {
    const middle = (low + high) / 2;
    if (massAt(middle) < problem.count) low = middle;
    else high = middle;
  }
  return quantiles(
    cells.map(({ at, width, need }) => ({ at, width, mass: width * Math.max(0, need + high) })),
    problem.count,
  );
}

function cellsOf({ segments, field, kappa }: LineProblem): readonly Cell[] {
  return segments
    .flatMap((segment, own) => {
      const width = Math.max(segment.high - segment.low, POINT_WIDTH) / CELLS;
      const middle = (segment.low + segment.high) / 2;
      return Array.from({ length: CELLS }, (_, n) => {
        const at = middle + (n - (CELLS - 1) / 2) * width;
        const inside = Math.min(Math.max(at, segment.low), segment.high);
        // Where stretches overlap the highest counts, once.
        if (segments.some((other, k) => covers(other, at) && higher(other, segment, at, k < own))) return undefined;
        const need = potentialFor(Math.max(levelAt(segment, inside), 0), kappa) - potentialValue(at, [], field);
        return Number.isFinite(need) ? { at, width, need } : undefined;
      }).filter((cell) => cell !== undefined);
    })
    .sort((a, b) => a.at - b.at);
}

const covers = ({ low, high }: Segment, t: number): boolean => low <= t && t <= high;

function higher(other: Segment, segment: Segment, t: number, first: boolean): boolean {
  if (other === segment) return false;
  const [a, b] = [levelAt(other, t), levelAt(segment, t)];
  return a > b || (a === b && first);
}

/** Positions that leave (j - 1/2)/count of the mass below them. */
function quantiles(
  cells: readonly { readonly at: number; readonly width: number; readonly mass: number }[],
  count: number,
): number[] {
  const total = cells.reduce((sum, { mass }) => sum + mass, 0);
  const found: number[] = [];
  let below = 0;
  for (const { at, width, mass } of cells) {
    while (found.length < count) {
      const wanted = ((found.length + 0.5) / count) * total - below;
      if (!(wanted <= mass) || mass === 0) break;
      found.push(at + (wanted / mass - 0.5) * width);
    }
    below += mass;
  }
  while (found.length < count) found.push((cells.at(-1)?.at ?? 0) + 1e-3 * (found.length + 1));
  return found;
}
