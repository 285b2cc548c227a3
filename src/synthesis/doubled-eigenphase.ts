import {
  type Doubled,
  type DoubledProduct,
  doubledAdd,
  doubledDivide,
  doubledMultiply,
  doubledProduct,
  doubledSquareRoot,
  sumRest,
  timesConstant,
  timesLinear,
  timesPowerOfTwo,
} from '../numerics/index.js';
import type { Branch } from './eigenphase.js';
import type { LosslessForm, RootColumns } from './lossless-form.js';

/** An eigenphase in doubled precision: tangent of its distance from pi, its slope, and twice the angle of its vector as a point. */
export interface FinePhase {
  readonly tangent: number;
  readonly slope: number;
  readonly beta: number;
  readonly b: number;
}

/** Running products, kept between calls for their memory. */
export interface Workspace {
  readonly e: DoubledProduct;
  readonly phi: DoubledProduct;
  readonly chi: DoubledProduct;
}

export const workspace = (): Workspace => ({
  e: doubledProduct(1, 0),
  phi: doubledProduct(1, 0),
  chi: doubledProduct(1, 0),
});

/**
 * The eigenphase `theta = psi +- delta` near an odd multiple of pi, at `omega` a pair. Cost O(N), about 30 operations for
 * each of the double-precision form.
 *
 * `exp(j*theta)` has the argument of `conj(e)*(phi_r +- j*s)`, `s = sqrt(phi_i^2 + chi^2)`; its slope is
 * `-Im(e'/e) +- (phi_r s' - s phi_r')/(phi_r^2 + s^2)`: no root is taken of |e|, and common real factors drop out.
 */
export function fineEigenphase(form: LosslessForm, omega: Doubled, branch: Branch, work: Workspace): FinePhase {
  const { e, phi, chi } = work;
  multiplyOut(form, omega, work);
  const turn = branch * form.parity;
  const phiRe = pair(phi, 0);
  const { s, slope: sSlope, beta, b } = radius(form, phi, chi);
  const size = doubledAdd(doubledMultiply(phiRe, phiRe), doubledMultiply(s, s));
  const bent = minus(doubledMultiply(phiRe, sSlope), doubledMultiply(s, pair(phi, 4)));
  const [eRe, eIm] = [pair(e, 0), pair(e, 2)];
  const eSize = doubledAdd(doubledMultiply(eRe, eRe), doubledMultiply(eIm, eIm));
  const eTurn = minus(doubledMultiply(eIm, pair(e, 4)), doubledMultiply(eRe, pair(e, 6)));
  const slope = doubledAdd(doubledDivide(eTurn, eSize), times(doubledDivide(bent, size), turn));
  const re = doubledAdd(doubledMultiply(eRe, phiRe), times(doubledMultiply(eIm, s), turn));
  const im = minus(times(doubledMultiply(eRe, s), turn), doubledMultiply(eIm, phiRe));
  return { tangent: im.hi / re.hi, slope: slope.hi, beta: form.parity * beta.hi, b: b.hi };
}

/** `s`, its slope, and the pair (imaginary part of phi, chi) that fixes the vector. */
function radius(
  { order }: LosslessForm,
  phi: DoubledProduct,
  chi: DoubledProduct,
): { s: Doubled; slope: Doubled; beta: Doubled; b: Doubled } {
  const [beta, betaSlope, b, bSlope] = [pair(phi, 2), pair(phi, 6), pair(chi, 0), pair(chi, 4)];
  const square = doubledAdd(doubledMultiply(beta, beta), doubledMultiply(b, b));
  const noise = order * NOISE_PER_FACTOR * (Math.abs(phi[0] as number) + Math.abs(beta.hi));
  if (Math.abs(beta.hi) + Math.abs(b.hi) <= noise) {
    // An exactly double eigenvalue: s has a corner there, and the limit from above serves both branches.
    const slopeSquare = doubledAdd(doubledMultiply(betaSlope, betaSlope), doubledMultiply(bSlope, bSlope));
    return { s: ZERO, slope: doubledSquareRoot(slopeSquare), beta: betaSlope, b: bSlope };
  }
  const s = doubledSquareRoot(square);
  const slope = doubledAdd(doubledMultiply(beta, betaSlope), doubledMultiply(b, bSlope));
  return { s, slope: doubledDivide(slope, s), beta, b };
}

const ZERO: Doubled = { hi: 0, lo: 0 };

/** Rounding that one factor leaves in a product of pairs, relative to its size. */
export const NOISE_PER_FACTOR: number = 2 ** -101;

/** Products are brought back here by an exact power of two. */
const LARGE: number = 2 ** 200;

function multiplyOut(form: LosslessForm, omega: Doubled, { e, phi, chi }: Workspace): void {
  doubledProduct(1, 0, e);
  doubledProduct(form.reflection.hi, form.reflection.lo, phi);
  timesConstant(phi, form.turn.re, 0, form.turn.im, 0);
  doubledProduct(form.transmission.hi, form.transmission.lo, chi);
  for (let k = 0; k < form.order; k++) {
    timesRoot(e, form.poles, k, omega);
    timesRoot(phi, form.reflectionZeros, k, omega);
    timesRoot(chi, form.transmissionZeros, k, omega);
    const size = Math.abs(e[0] as number) + Math.abs(e[2] as number);
    if (size > LARGE || size < 1 / LARGE) {
      const power = size > LARGE ? 1 / LARGE : LARGE;
      timesPowerOfTwo(e, power);
      timesPowerOfTwo(phi, power);
      timesPowerOfTwo(chi, power);
    }
  }
}

function timesRoot(product: DoubledProduct, roots: RootColumns, k: number, omega: Doubled): void {
  if (k >= roots.re.length) return;
  const im = roots.im[k] as number;
  const x = omega.hi - im;
  const xRest = sumRest(omega.hi, -im, x) + (omega.lo - (roots.imRest[k] as number));
  timesLinear(product, x, xRest, roots.re[k] as number, roots.reRest[k] as number);
}

const pair = (product: DoubledProduct, at: number): Doubled => ({
  hi: product[at] as number,
  lo: product[at + 1] as number,
});

const times = (a: Doubled, sign: number): Doubled => ({ hi: sign * a.hi, lo: sign * a.lo });

const minus = (a: Doubled, b: Doubled): Doubled => doubledAdd(a, { hi: -b.hi, lo: -b.lo });
