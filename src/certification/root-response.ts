import type { Complex, FilterPolynomials, FineRoot } from '../forms/index.js';
import { cell } from './elimination.js';
import { emptySeries, type Response } from './series.js';

/**
 * The response of the product form, and how far rounding of its roots can move it.
 *
 * A root r rounded by eps*|r| changes the factor s - r, relatively, by eps*|r|/|s - r|; a factor's own arithmetic costs
 * eps. The spreads are the sums `1 + |r|/|s - r|` over the roots of E, F and P: relative errors in units of eps.
 */
export interface RootResponse extends Response {
  readonly poleSpread: Float64Array;
  readonly reflectionSpread: Float64Array;
  readonly transmissionSpread: Float64Array;
}

/**
 * S of the product form at real omega, one quotient of differences after the other, never expanded; cost O(N) a point.
 *
 * `S11 = F/(epsilonR*E)`, `S21 = S12 = P/(epsilon*E)`, and S22 from losslessness: its zeros are the mirror images
 * `-conj f` of those of S11 and its leading constant is the same `1/epsilonR`; with nf zeros, fewer than N, times (-1)^(N - nf):
 * `S22 = -(S21/conj S21) conj S11`, and P has N zeros then, so that `lead^2 = -1`.
 */
export function rootResponse(polynomials: FilterPolynomials, omega: Float64Array): RootResponse {
  const poles = split(polynomials.poles);
  const reflection = split(polynomials.reflectionZeros);
  const mirrored = split(polynomials.reflectionZeros.map((f) => ({ ...f, re: -f.re })));
  const transmission = split(polynomials.transmissionZeros);
  const lead = polynomials.transmissionLead;
  const gain = { re: lead.re / polynomials.epsilon, im: lead.im / polynomials.epsilon };
  const level = { re: 1 / polynomials.epsilonR, im: 0 };
  const missing = polynomials.order - polynomials.reflectionZeros.length;
  const mirroredLevel = { re: missing % 2 === 0 ? level.re : -level.re, im: 0 };
  const s21 = quotients(transmission, poles, gain, omega);
  return {
    omega,
    s11: quotients(reflection, poles, level, omega),
    s21,
    s12: s21,
    s22: quotients(mirrored, poles, mirroredLevel, omega),
    poleSpread: spread(poles, omega),
    reflectionSpread: spread(reflection, omega),
    transmissionSpread: spread(transmission, omega),
  };
}

interface SplitRoots {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly imRest: Float64Array;
}

function split(roots: readonly FineRoot[]): SplitRoots {
  return {
    re: Float64Array.from(roots, (r) => r.re),
    im: Float64Array.from(roots, (r) => r.im),
    imRest: Float64Array.from(roots, (r) => r.imRest ?? 0),
  };
}

/** `lead * prod(s - zeros)/prod(s - poles)`: a zero is paired with a pole, so that no partial product overflows at the orders in use. */
function quotients(zeros: SplitRoots, poles: SplitRoots, lead: Complex, omega: Float64Array): Response['s11'] {
  const series = emptySeries(omega.length);
  const [zeroCount, poleCount] = [zeros.re.length, poles.re.length];
  const count = Math.max(zeroCount, poleCount);
  for (let i = 0; i < omega.length; i++) {
    const w = cell(omega, i);
    let { re, im } = lead;
    for (let k = 0; k < count; k++) {
      if (k < zeroCount) {
        const [x, y] = [-cell(zeros.re, k), w - cell(zeros.im, k) - cell(zeros.imRest, k)];
        [re, im] = [re * x - im * y, re * y + im * x];
      }
      if (k < poleCount) {
        const [x, y] = [-cell(poles.re, k), w - cell(poles.im, k) - cell(poles.imRest, k)];
        const norm = x * x + y * y;
        [re, im] = [(re * x + im * y) / norm, (im * x - re * y) / norm];
      }
    }
    series.re[i] = re;
    series.im[i] = im;
  }
  return series;
}

function spread(roots: SplitRoots, omega: Float64Array): Float64Array {
  const sums = new Float64Array(omega.length);
  for (let i = 0; i < omega.length; i++) {
    let sum = 1;
    for (let k = 0; k < roots.re.length; k++) {
      const [re, im] = [cell(roots.re, k), cell(roots.im, k)];
      const [x, y] = [re, cell(omega, i) - im];
      const gap = Math.sqrt(x * x + y * y);
      // On a root the factor is exactly 0 and its product with the spread is 0: nothing to add.
      sum += 1 + (gap === 0 ? 0 : Math.sqrt(re * re + im * im) / gap);
    }
    sums[i] = sum;
  }
  return sums;
}
