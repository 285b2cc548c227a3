import type { FineRoot } from '../../forms/index.js';
import { EPS, localMinimum } from '../../numerics/index.js';
import { distance, type Power, powerRatio } from './power-sum.js';

/** Where a pole is looked at, in units of its distance from the axis; between its neighbors curves have no finer detail. */
const STEPS: readonly number[] = [-16, -8, -4, -2, -1, -0.5, -0.25, 0, 0.25, 0.5, 1, 2, 4, 8, 16];

/** Frequencies at which a response with these poles is looked at, rising: every resonance in steps of its own width. */
export function lookingPoints(poles: readonly FineRoot[]): readonly number[] {
  const points = poles.flatMap(({ re, im }) => STEPS.map((step) => im + step * re));
  return [...new Set([...points, 0])].sort((a, b) => a - b);
}

/** A frequency and what was found there. */
export interface Peak {
  readonly omega: number;
  readonly value: number;
}

/** Largest quotient of two powers over the frequency axis: the best of the points, each peak among them refined. */
export function largestRatio(above: Power, below: Power): Peak {
  const points = lookingPoints(below.roots);
  const values = points.map((omega) => powerRatio(above, below, omega));
  let best: Peak = { omega: 0, value: 0 };
  points.forEach((omega, n) => {
    const value = values[n] as number;
    if (value > best.value) best = { omega, value };
    const [low, high] = [points[n - 1], points[n + 1]];
    if (low === undefined || high === undefined) return;
    if (!(value >= (values[n - 1] as number) && value >= (values[n + 1] as number))) return;
    const found = localMinimum((x) => -powerRatio(above, below, x), low, high);
    if (-found.value > best.value) best = { omega: found.x, value: -found.value };
  });
  return best;
}

/** How much a power at omega changes when every root changes by its own rounding: `2 eps sum |r|/|j*omega - r|`. */
export function roundingOf(roots: readonly FineRoot[], omega: number): number {
  const moved = roots.reduce(
    (sum, root) => sum + Math.hypot(root.re, root.im) / (distance(root, omega) || Infinity),
    1,
  );
  return 2 * EPS * moved;
}
