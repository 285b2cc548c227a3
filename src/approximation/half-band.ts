import type { FineRoot } from '../forms/index.js';
import { type Complex, EPS, monotoneRoot } from '../numerics/index.js';
import { type BandPhase, phaseAt } from './band-phase.js';
import { continuedAngle } from './pole-path.js';

/** One reflection zero with the pole that continues it; 1 - omega and 1 + omega of the zero without cancellation. */
export interface HalfBandRoot {
  readonly zero: FineRoot;
  readonly oneMinus: number;
  readonly onePlus: number;
  readonly pole: FineRoot;
}

/**
 * The reflection zeros of the upper half of the band (omega >= 0), in falling order, each with a pole.
 *
 * Reflection zero k: `Phi(phi) = (k - 1/2)*pi`, one bracket each. Its pole: the same equation with the imaginary part
 * `asinh(kappa)` added. The lower half is the same problem with every zero mirrored (and `detour` negated), so that angles
 * near pi never lose their digits. Undefined when a path to a pole stalls.
 */
export function halfBandRoots(
  phase: BandPhase,
  count: number,
  kappa: number,
  detour: number,
): readonly HalfBandRoot[] | undefined {
  const roots: HalfBandRoot[] = [];
  let low = 0;
  for (let k = 1; k <= count; k++) {
    const target = (k - 0.5) * Math.PI;
    const phi = monotoneRoot((x) => shifted(phase, x, target), low, UPPER, startAngle(phase, low, target));
    const angle = continuedAngle(phase, phi, k, Math.asinh(kappa), detour);
    if (angle === undefined) return undefined;
    const oneMinus = 2 * Math.sin(phi / 2) ** 2;
    roots.push({
      zero: rootBelowEdge(0, oneMinus),
      oneMinus,
      onePlus: 2 * Math.cos(phi / 2) ** 2,
      pole: poleAt(angle),
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

/** `s = j*cos(z)`, reflected into the left half plane; `1 - Re cos(z)` is formed without cancellation. */
function poleAt(z: Complex): FineRoot {
  const offset = 2 * Math.sin(z.re / 2) ** 2 * Math.cosh(z.im) - 2 * Math.sinh(z.im / 2) ** 2;
  return rootBelowEdge(-Math.sin(z.re) * Math.sinh(z.im), offset);
}

/** A root at `re + j*(1 - offset)` with what rounding of the imaginary part leaves over (Knuth's two-sum). */
export function rootBelowEdge(re: number, offset: number): FineRoot {
  const im = 1 - offset;
  const part = im - 1;
  return { re, im, imRest: 1 - (im - part) + (-offset - part) };
}

/** The mirror image of a root in the real axis, omega -> -omega. */
export function conjugate({ re, im, imRest = 0 }: FineRoot): FineRoot {
  return { re, im: 0 - im, imRest: 0 - imRest };
}

/** Mirrors a root of the mirrored problem back: omega -> -omega. */
export function mirrored(root: HalfBandRoot): HalfBandRoot {
  return { zero: conjugate(root.zero), oneMinus: root.onePlus, onePlus: root.oneMinus, pole: conjugate(root.pole) };
}
