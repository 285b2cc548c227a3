import type { Certificate, FilterPolynomials, FineRoot } from '../forms/index.js';
import { atMost, exactly } from './verdict.js';

/** C4: ripple levels are stated to 1e-6 dB at most; a hundredth of that. */
const LEVEL_LIMIT_DB = 1e-8;

/** Golden-section steps: 0.618^44 = 6e-10 of the interval, and the level is flat there, so it is off by its square. */
const GOLDEN_STEPS = 44;
const GOLDEN = 0.6180339887498949;

/**
 * C4, equiripple families only: N reflection zeros inside the band, and one level of |S11| at the N-1 maxima between
 * them and at both edges.
 *
 * `F/j^N = prod(omega - omega_k)` is real when the zeros lie on the axis; it must change its sign N times over the
 * edges and the points half way between neighbors. The maxima are searched here, on `log|F/E|` between neighbors.
 */
export function equiripple(polynomials: FilterPolynomials): Certificate[] {
  const { family, order, returnLossDb } = polynomials;
  if (family !== 'generalizedChebyshev' && family !== 'elliptic') return [];
  // Without its level an equiripple response cannot be certified; leaving the check out would let it pass.
  if (returnLossDb === undefined)
    return [atMost('C4 ripple level against the return loss, dB', Number.NaN, LEVEL_LIMIT_DB)];
  const zeros = polynomials.reflectionZeros.map((f) => f.im).sort((a, b) => a - b);
  const tested = [-1, ...zeros.slice(1).map((zero, k) => (zero + (zeros[k] ?? zero)) / 2), 1];
  const onAxis = polynomials.reflectionZeros.every((f) => f.re === 0);
  let worst = Math.max(levelError(polynomials, returnLossDb, -1), levelError(polynomials, returnLossDb, 1));
  for (let k = 1; k < zeros.length; k++) {
    const top = highest(polynomials, zeros[k - 1] ?? Number.NaN, zeros[k] ?? Number.NaN);
    worst = Math.max(worst, levelError(polynomials, returnLossDb, top));
  }
  return [
    exactly('C4 reflection zeros in the band', onAxis ? signChanges(zeros, tested) : 0, order),
    atMost('C4 ripple level against the return loss, dB', worst, LEVEL_LIMIT_DB),
  ];
}

function signChanges(zeros: readonly number[], points: readonly number[]): number {
  const signs = points.map((w) => zeros.reduce((sign, zero) => sign * Math.sign(w - zero), 1));
  return signs.filter((sign, k) => k > 0 && sign * (signs[k - 1] ?? 0) < 0).length;
}

function levelError(polynomials: FilterPolynomials, returnLossDb: number, omega: number): number {
  const level = -20 * Math.log10(reflection(polynomials, omega));
  return Math.abs(level - returnLossDb);
}

/** Where |S11| is largest between two neighboring reflection zeros. */
function highest(polynomials: FilterPolynomials, from: number, to: number): number {
  let [left, right] = [from, to];
  let inner = right - GOLDEN * (right - left);
  let outer = left + GOLDEN * (right - left);
  let [atInner, atOuter] = [reflection(polynomials, inner), reflection(polynomials, outer)];
  for (let step = 0; step < GOLDEN_STEPS; step++) {
    if (atInner > atOuter) {
      [right, outer, atOuter] = [outer, inner, atInner];
      inner = right - GOLDEN * (right - left);
      atInner = reflection(polynomials, inner);
    } else {
      [left, inner, atInner] = [inner, outer, atOuter];
      outer = left + GOLDEN * (right - left);
      atOuter = reflection(polynomials, outer);
    }
  }
  return (left + right) / 2;
}

/** Squared distance of `j*omega` from a root, with the part of the root beyond a double. */
function squaredDistance({ re, im, imRest = 0 }: FineRoot, omega: number): number {
  const above = omega - im - imRest;
  return re * re + above * above;
}

/** |S11| at real omega, factor by factor. */
function reflection(polynomials: FilterPolynomials, omega: number): number {
  const { poles, reflectionZeros, epsilonR } = polynomials;
  let square = 1;
  for (let k = 0; k < Math.max(poles.length, reflectionZeros.length); k++) {
    const f = reflectionZeros[k];
    const p = poles[k];
    if (f !== undefined) square *= squaredDistance(f, omega);
    if (p !== undefined) square /= squaredDistance(p, omega);
  }
  return Math.sqrt(square) / Math.abs(epsilonR);
}
