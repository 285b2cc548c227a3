import { add, type Complex, complex, divide, EPS, logarithm, magnitude, monotoneRoot, multiply, scale, subtract } from '../numerics/index.js';
import { type BandPhase, phaseAt, phasorAt } from './band-phase.js';

/** One reflection zero and its pole: `cosine` = omega of the zero, `oneMinus` = 1 - omega without cancellation. */
export interface HalfBandRoot {
  readonly cosine: number;
  readonly oneMinus: number;
  readonly onePlus: number;
  readonly pole: Complex;
}

/**
 * The reflection zeros and poles of the upper half of the band (omega >= 0), in falling order of omega.
 *
 * Reflection zero k: `Phi(phi) = (k - 1/2)*pi`, one bracket each. Its pole: the same equation with the imaginary part
 * `asinh(kappa)` added, reached by continuation. The lower half is the same problem with every zero mirrored, so that
 * angles near pi never lose their digits and a symmetric response comes out exactly symmetric.
 */
export function halfBandRoots(phase: BandPhase, count: number, kappa: number): readonly HalfBandRoot[] {
  const roots: HalfBandRoot[] = [];
  let low = 0;
  for (let k = 1; k <= count; k++) {
    const target = (k - 0.5) * Math.PI;
    const phi = monotoneRoot((x) => shifted(phase, x, target), low, UPPER, startAngle(phase, low, target));
    roots.push({
      cosine: Math.cos(phi),
      oneMinus: 2 * Math.sin(phi / 2) ** 2,
      onePlus: 2 * Math.cos(phi / 2) ** 2,
      pole: poleFrom(phase, phi, k, Math.asinh(kappa)),
    });
    low = phi;
  }
  return roots;
}

/** Right end of every bracket: a root that belongs at pi/2 may come out a rounding step beyond it. */
const UPPER = (Math.PI / 2) * (1 + 64 * EPS);

/** How many of the N reflection zeros have phi <= pi/2, that is omega >= 0. */
export function countInUpperHalf(phase: BandPhase): number {
  return Math.floor(phaseAt(phase, Math.PI / 2).value / Math.PI + 0.5);
}

function shifted(phase: BandPhase, phi: number, target: number): { value: number; slope: number } {
  const { value, slope } = phaseAt(phase, phi);
  return { value: value - target, slope };
}

function startAngle(phase: BandPhase, low: number, target: number): number {
  const { value, slope } = phaseAt(phase, low);
  return low + (target - value) / slope;
}

/**
 * Continues `Phi(phi) = (k - 1/2)*pi + j*height` from the real axis up to the full height in equal steps, each finished by
 * Newton on the logarithm of the phasor quotient. Halves the step when Newton does not settle.
 */
function poleFrom(phase: BandPhase, phi: number, k: number, height: number): Complex {
  let z = complex(phi, 0);
  let slope = complex(phaseAt(phase, phi).slope, 0);
  let reached = 0;
  let step = height / Math.max(1, Math.ceil(height / STEP_HEIGHT));
  while (reached < height) {
    const goal = Math.min(height, reached + step);
    const predicted = add(z, divide(complex(0, goal - reached), slope));
    const settled = newton(phase, predicted, k, goal);
    if (settled === undefined) {
      step /= 2;
      continue;
    }
    z = settled.z;
    slope = settled.slope;
    reached = goal;
  }
  // s = j*cos(z), reflected into the left half plane.
  return complex(-Math.sin(z.re) * Math.sinh(z.im), Math.cos(z.re) * Math.cosh(z.im));
}

/** Height of one continuation step in Phi; below about pi the predicted point stays in Newton's basin (measured, see tests). */
const STEP_HEIGHT = 1;

function newton(phase: BandPhase, start: Complex, k: number, height: number): { z: Complex; slope: Complex } | undefined {
  let z = start;
  let previous = Number.POSITIVE_INFINITY;
  const growth = Math.exp(height);
  // exp(-j*(k - 1/2)*pi) is +-j, exactly.
  const turn = complex(0, k % 2 === 1 ? -growth : growth);
  for (let turnCount = 0; turnCount < 30; turnCount++) {
    const { phasor, slope } = phasorAt(phase, z);
    const residual = logarithm(multiply(phasor, turn));
    const step = divide(complex(residual.im, -residual.re), slope);
    const size = magnitude(step);
    z = subtract(z, step);
    if (size <= 4 * EPS * magnitude(z) || (size >= previous && size < 1e-12)) return { z, slope };
    if (size > previous * 2 && turnCount > 2) return undefined;
    previous = size;
  }
  return undefined;
}

/** Mirrors a root of the mirrored problem back: omega -> -omega. */
export function mirrored(root: HalfBandRoot): HalfBandRoot {
  return {
    cosine: -root.cosine,
    oneMinus: root.onePlus,
    onePlus: root.oneMinus,
    pole: complex(root.pole.re, -root.pole.im),
  };
}

/** The root in the middle of an exactly symmetric response of odd order: omega = 0, real pole. */
export function centered(root: HalfBandRoot): HalfBandRoot {
  return { cosine: 0, oneMinus: 1, onePlus: 1, pole: scale(complex(root.pole.re, 0), 1) };
}
