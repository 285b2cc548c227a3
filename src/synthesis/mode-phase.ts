import type { FineRoot } from '../forms/index.js';
import { monotoneRoot } from '../numerics/index.js';

/** One resonance of a one-port mode: the frequency where its all-pass response is -1, and the slope of its half phase there. */
export interface ModeResonance {
  readonly lambda: number;
  readonly slope: number;
}

/**
 * All resonances of the all-pass mode `S(j*omega) = exp(j*angle) * (-1)^n * exp(-2j*psi)`, `psi = sum arg(j*omega - p)`.
 *
 * psi rises monotonically from -n*pi/2 to n*pi/2, so each of the n solutions of `psi = (angle + (n-1)*pi)/2 mod pi` has
 * its own bracket. Close to a root the residual is the argument of a product of n unit numbers, which keeps sqrt(n) ulp;
 * the sum of arctangents is used only to find the neighborhood. Cost O(n^2).
 */
export function modeResonances(poles: readonly FineRoot[], angle: number): readonly ModeResonance[] {
  const sorted = [...poles].sort((a, b) => a.im - b.im);
  const columns: PoleColumns = {
    away: Float64Array.from(sorted, (p) => -p.re),
    im: Float64Array.from(sorted, (p) => p.im),
    imRest: Float64Array.from(sorted, (p) => p.imRest ?? 0),
  };
  const reach = reachOf(sorted);
  let low = -reach;
  return sorted.map((pole, k) => {
    const target = (angle - (sorted.length - 1) * Math.PI) / 2 + k * Math.PI;
    const phase = (omega: number): { value: number; slope: number } => halfPhase(columns, omega, 0, target);
    const lambda = monotoneRoot(phase, low, reach, pole.im);
    low = lambda;
    // The root lies a fraction of an ulp beside lambda; next to a narrow pole the slope already differs there.
    const { value, slope } = phase(lambda);
    return { lambda, slope: halfPhase(columns, lambda, -value / slope, target).slope };
  });
}

/**
 * A frequency beyond every root. |angle| <= pi/2, so psi at a root is at least pi/4 from its end values, while beyond the
 * outermost pole by x it is within `sum |Re p| / x` of them; x = 2*sum |Re p| is therefore enough.
 */
function reachOf(poles: readonly FineRoot[]): number {
  return poles.reduce((sum, p) => sum + 2 * Math.abs(p.re), 0) + Math.max(...poles.map((p) => Math.abs(p.im)));
}

/** Poles as columns of doubles: distance from the axis, and the imaginary part in two pieces. */
interface PoleColumns {
  readonly away: Float64Array;
  readonly im: Float64Array;
  readonly imRest: Float64Array;
}

/** psi - target and its slope at `omega + rest`; exact to sqrt(n) ulp once the difference is below one radian. */
function halfPhase(
  { away, im, imRest }: PoleColumns,
  omega: number,
  rest: number,
  target: number,
): { value: number; slope: number } {
  let sum = -target;
  let slope = 0;
  let x = Math.cos(target);
  let y = -Math.sin(target);
  for (let i = 0; i < away.length; i++) {
    const a = away[i] as number;
    const d = omega - (im[i] as number) + (rest - (imRest[i] as number));
    const square = a * a + d * d;
    const size = Math.sqrt(square);
    slope += a / square;
    sum += Math.atan2(d, a);
    const turned = (x * a - y * d) / size;
    y = (x * d + y * a) / size;
    x = turned;
  }
  return { value: Math.abs(sum) < 1 ? Math.atan2(y, x) : sum, slope };
}
