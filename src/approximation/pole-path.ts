import { type Complex, complex, divide, EPS, logarithm, magnitude, multiply, subtract } from '../numerics/index.js';
import { type BandPhase, phaseAt, phasorAt } from './band-phase.js';

/** A point of a path and the derivative of Phi there. */
interface PathPoint {
  readonly z: Complex;
  readonly slope: Complex;
}

/** The target of a path at its parameter: `Phi = (k - 1/2)*pi + shift + j*height`. */
interface Target {
  readonly k: number;
  readonly height: number;
  readonly shift: number;
}

/** Longest step of the height of Phi: next to a multiple zero the poles close in on it by a constant factor a unit. */
const LONGEST_STEP = 1;

/** A step is accepted when Newton's first correction is at most this part of it: the path cannot have jumped then. */
const TRUSTED_CORRECTION = 0.25;

/** A path needs about 20 steps; one that needs more than this runs into a branch point. */
const MOST_STEPS = 2000;

/**
 * Continues the solution phi of `Phi = (k - 1/2)*pi` to `Phi = (k - 1/2)*pi + j*height`; gives the complex angle.
 *
 * `exp(j*Phi)` maps the upper half plane N times onto the unit disk, so the N paths of all k end in N different poles unless
 * two of them meet in a branch point. With zeros on the real axis they do (two conjugate poles meet and become real), on
 * the straight path, for symmetry; therefore the path bends by `detour` radians on its way. All paths of one response must
 * bend alike. No path leaves the strip 0 < Re z < pi, Im z > 0: on its sides exp(j*Phi) is real, on its floor of size 1, and
 * the target is neither. Predictor along the tangent, Newton on the logarithm of a phasor quotient.
 * Undefined when the path stalls.
 */
export function continuedAngle(
  phase: BandPhase,
  phi: number,
  k: number,
  height: number,
  detour: number,
): Complex | undefined {
  let point: PathPoint = { z: complex(phi, 0), slope: complex(phaseAt(phase, phi).slope, 0) };
  let reached = 0;
  const longest = Math.min(1, LONGEST_STEP / height);
  let step = longest;
  for (let turn = 0; turn < MOST_STEPS; turn++) {
    const next = Math.min(1, reached + step);
    const tangent = divide(complex(detour * Math.PI * Math.cos(Math.PI * reached), height), point.slope);
    const move = complex(tangent.re * (next - reached), tangent.im * (next - reached));
    const target = { k, height: height * next, shift: next === 1 ? 0 : detour * Math.sin(Math.PI * next) };
    const settled = newton(phase, { re: point.z.re + move.re, im: point.z.im + move.im }, target, magnitude(move));
    if (settled === undefined) {
      step /= 2;
      continue;
    }
    point = settled;
    reached = next;
    if (reached === 1) return point.z;
    step = Math.min(longest, 1.5 * step);
  }
  return undefined;
}

/** Newton from a predicted point; undefined when the step that led there is not to be trusted. */
function newton(phase: BandPhase, start: Complex, target: Target, stepSize: number): PathPoint | undefined {
  let z = start;
  let previous = Number.POSITIVE_INFINITY;
  const growth = Math.exp(target.height);
  // exp(-j*((k - 1/2)*pi + shift)); the first factor is +-j, exactly.
  const sign = target.k % 2 === 1 ? growth : -growth;
  const turn = complex(-Math.sin(target.shift) * sign, -Math.cos(target.shift) * sign);
  for (let count = 0; count < 40; count++) {
    const { phasor, slope } = phasorAt(phase, z);
    const residual = logarithm(multiply(phasor, turn));
    const correction = divide(complex(residual.im, -residual.re), slope);
    const size = magnitude(correction);
    if (count === 0 && !(size <= TRUSTED_CORRECTION * stepSize)) return undefined;
    z = subtract(z, correction);
    if (!(z.re > 0 && z.re < Math.PI && z.im > 0)) return undefined;
    if (size <= 4 * EPS * magnitude(z) || (size >= previous / 2 && size < 1e-12 * magnitude(z))) return { z, slope };
    if (size > previous) return undefined;
    previous = size;
  }
  return undefined;
}
