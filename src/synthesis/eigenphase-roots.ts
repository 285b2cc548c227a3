import { EPS } from '../numerics/index.js';
import { type Branch, eigenphase } from './eigenphase.js';
import type { LosslessForm } from './lossless-form.js';

/** A frequency where an eigenphase of S is pi (mod 2 pi): minus a diagonal entry of the transversal matrix. */
export interface PhaseRoot {
  readonly branch: Branch;
  readonly omega: number;
}

/**
 * All N of them, bracketed in advance: each eigenphase of a lossless S falls monotonically, from `+-acos(1/epsilonR)` by N*pi
 * in all for the two, and passes the targets -pi, -3*pi, ... in order; `psi + delta` has floor(N/2) of them. Cost O(N^2).
 *
 * Source: eigenphases of a lossless S, F. T. Smith, Lifetime matrix in collision theory, Phys. Rev. 118, 1960 (from memory).
 */
export function eigenphaseRoots(form: LosslessForm): readonly PhaseRoot[] {
  const { order } = form;
  return ([1, -1] as const).flatMap((branch) => {
    const count = branch === 1 ? Math.floor(order / 2) : Math.ceil(order / 2);
    const reach = reachOf(form);
    let low = -reach;
    return Array.from({ length: count }, (_, k) => {
      const start = form.poles.im[Math.min(order - 1, 2 * k)] as number;
      low = fallingRoot(form, branch, -(2 * k + 1) * Math.PI, [low, reach], start);
      return { branch, omega: low };
    });
  });
}

/**
 * A frequency beyond every root. Both eigenphases are monotone and their sum is 2*psi, so beyond x each is within
 * `2*sum |Re p|/x` of its end value (x counted from the outermost pole); targets are at least pi/2 from those.
 */
function reachOf({ poles }: LosslessForm): number {
  const sum = poles.re.reduce((total, re) => total + Math.abs(re), 0);
  return 2 * sum + Math.max(...poles.im.map(Math.abs));
}

/** Newton steps, bisection where a step leaves the bracket or does not halve the last one; ends at the rounding of a product of unit numbers. */
function fallingRoot(
  form: LosslessForm,
  branch: Branch,
  target: number,
  bracket: readonly [number, number],
  start: number,
): number {
  const enough = EPS * Math.sqrt(form.order);
  let [low, high] = bracket;
  let omega = start > low && start < high ? start : low + (high - low) / 2;
  let lastStep = high - low;
  for (;;) {
    const { value, slope } = eigenphase(form, omega, branch, target);
    // Tested before the bracket: at the rounding floor a good step may point just outside.
    if (Math.abs(value) <= enough) return omega;
    if (value > 0) low = omega;
    else high = omega;
    const newton = omega - value / slope;
    const useful = newton > low && newton < high && Math.abs(newton - omega) <= Math.abs(lastStep) / 2;
    const next = useful ? newton : low + (high - low) / 2;
    if (!(next > low && next < high)) return omega;
    lastStep = next - omega;
    omega = next;
  }
}
