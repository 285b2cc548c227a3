import { localMinimum, monotoneRoot } from '../../numerics/index.js';
import { type Charge, potentialSlope, potentialValue } from './line.js';
import { rejectionDb } from './rejection-level.js';
import { levelAt, type Segment } from './segments.js';

/** What is placed: how many free zeros, in which field, over which mask, at which ripple. */
export interface LineProblem {
  readonly count: number;
  readonly field: readonly Charge[];
  readonly segments: readonly Segment[];
  readonly kappa: number;
  /** dB added to the margins of lobe 0, 1, ...: what is known of them beside the lossless response. */
  readonly offsets?: readonly number[];
}

/** The smallest margin of one lobe, where it is, and from which line of the mask; Infinity where there is no mask. */
export interface Lobe {
  readonly marginDb: number;
  readonly at: number;
  readonly potential: number;
  readonly source: number;
}

const EMPTY: Lobe = {
  marginDb: Number.POSITIVE_INFINITY,
  at: Number.NaN,
  potential: Number.POSITIVE_INFINITY,
  source: -1,
};

/** All lobes of a set of free zeros (ascending): below the first, between neighbors, above the last. */
export function lobesOf(problem: LineProblem, nodes: readonly number[]): readonly Lobe[] {
  return Array.from({ length: nodes.length + 1 }, (_, i) => lobeOf(problem, nodes, i));
}

/** Lobe i: all of the mask between free zero i-1 and free zero i. */
export function lobeOf(problem: LineProblem, nodes: readonly number[], i: number): Lobe {
  const left = nodes[i - 1] ?? Number.NEGATIVE_INFINITY;
  const right = nodes[i] ?? Number.POSITIVE_INFINITY;
  let best = EMPTY;
  for (const segment of problem.segments) {
    if (segment.low >= right || segment.high <= left) {
      // A point on a zero has all the rejection there is; it belongs to neither lobe.
      continue;
    }
    for (const [low, high] of pieces(problem.field, Math.max(left, segment.low), Math.min(right, segment.high))) {
      const found = lowest(problem, nodes, segment, low, high);
      if (found.marginDb < best.marginDb) best = found;
    }
  }
  const offset = problem.offsets?.[i] ?? 0;
  return offset === 0 ? best : { ...best, marginDb: best.marginDb + offset };
}

/** An interval cut at the fixed zeros inside it: between two zeros the potential is convex. */
function pieces(field: readonly Charge[], low: number, high: number): readonly (readonly [number, number])[] {
  const cuts = field.filter(({ at, weight }) => weight > 0 && at > low && at < high).map(({ at }) => at);
  if (cuts.length === 0) return [[low, high]];
  const ends = [low, ...cuts.sort((a, b) => a - b), high];
  return ends.slice(1).map((end, n) => [ends[n] as number, end] as const);
}

function lowest(problem: LineProblem, nodes: readonly number[], segment: Segment, low: number, high: number): Lobe {
  const { field, kappa } = problem;
  const marginAt = (t: number): number => rejectionDb(potentialValue(t, nodes, field), kappa) - levelAt(segment, t);
  const at =
    typeof segment.level === 'number' ? flattest(nodes, field, low, high) : sampledMinimum(marginAt, low, high);
  const potential = potentialValue(at, nodes, field);
  return { marginDb: marginAt(at), at, potential, source: segment.source };
}

/** Where the potential is smallest in an interval without zeros inside: Newton on its rising slope, or an end. */
function flattest(nodes: readonly number[], field: readonly Charge[], low: number, high: number): number {
  if (low === high) return low;
  const slope = (t: number): { value: number; slope: number } => potentialSlope(t, nodes, field);
  // On a zero at an end the slope is -+Infinity, or NaN for 0/0: neither says that the minimum is there.
  if (slope(low).value >= 0 && !isZero(nodes, field, low)) return low;
  if (slope(high).value <= 0 && !isZero(nodes, field, high)) return high;
  return monotoneRoot(slope, low, high, (low + high) / 2);
}

function isZero(nodes: readonly number[], field: readonly Charge[], t: number): boolean {
  return nodes.includes(t) || field.some(({ at, weight }) => at === t && weight > 0);
}

/** Samples of a stretch with a sloped level, where a lobe may have more than one minimum. */
const SAMPLES = 16;

function sampledMinimum(marginAt: (t: number) => number, low: number, high: number): number {
  if (low === high) return low;
  const points = Array.from({ length: SAMPLES + 1 }, (_, n) => low + ((high - low) * n) / SAMPLES);
  const margins = points.map(marginAt);
  let best = { x: low, value: margins[0] as number };
  points.forEach((x, n) => {
    const value = margins[n] as number;
    if (value < best.value) best = { x, value };
    const [before = Number.POSITIVE_INFINITY, after = Number.POSITIVE_INFINITY] = [margins[n - 1], margins[n + 1]];
    if (value > before || value > after) return;
    const found = localMinimum(marginAt, points[n - 1] ?? low, points[n + 1] ?? high);
    if (found.value < best.value) best = found;
  });
  return best.x;
}
