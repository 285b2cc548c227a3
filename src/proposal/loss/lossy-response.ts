import { generalizedChebyshev } from '../../approximation/index.js';
import type { FilterPolynomials, FineRoot } from '../../forms/index.js';
import { type Complex, complex, divide, multiply, scale } from '../../numerics/index.js';
import { omegaFromLine } from '../placement/line.js';

/** A response with loss, as a function of the places of its transmission zeros on the line. */
export interface LossyResponse {
  readonly polynomials: FilterPolynomials;
  /** Normalized loss `f0/(B*Qu)`. */
  readonly sigma: number;
  readonly places: readonly number[];
}

/** dB for each neper of amplitude. */
const DB_PER_NEPER = 20 / Math.LN10;

/** A zero farther out than this is left at infinity: the engine takes no farther ones. */
export const FARTHEST = 1e4;

/** @throws FilterFailure what `generalizedChebyshev` refuses */
export function lossyResponse(
  order: number,
  returnLossDb: number,
  places: readonly number[],
  sigma: number,
): LossyResponse {
  const transmissionZeros = places.map(omegaFromLine).filter((omega) => Math.abs(omega) <= FARTHEST);
  return { polynomials: generalizedChebyshev({ order, returnLossDb, transmissionZeros }), sigma, places };
}

/** Attenuation of S21 at `s = sigma + j*omega`, dB: a logarithm of products kept in the range of doubles. */
export function attenuationDb({ polynomials, sigma }: LossyResponse, omega: number): number {
  let product = polynomials.epsilon * polynomials.epsilon;
  let sum = 0;
  const fold = (factor: number): void => {
    product *= factor;
    if (product > 1e100 || product < 1e-100) {
      sum += Math.log(product);
      product = 1;
    }
  };
  for (const pole of polynomials.poles) fold(square(pole, sigma, omega));
  for (const zero of polynomials.transmissionZeros) fold(1 / square(zero, sigma, omega));
  return (DB_PER_NEPER / 2) * (sum + Math.log(product));
}

function square({ re, im, imRest = 0 }: FineRoot, sigma: number, omega: number): number {
  const above = omega - im - imRest;
  return (sigma - re) * (sigma - re) + above * above;
}

/**
 * Derivatives of the attenuation with respect to the places of the zeros, at any frequency: prepared once a response.
 *
 * A pole (and a reflection zero) keeps `sum g(tau - s_n) = constant` at its complex place tau, so a move of zero j moves it by
 * `dtau = ds_j*h_j/H`, `h_n = 1/(cosh 2s_n - w sinh 2s_n)` (1 at infinity), H their sum, w its complex frequency; in the
 * frequency plane `dw = -2*(w^2 - 1)*dtau`. Epsilon follows from the reflection zeros. Cost O(order*zeros) a frequency.
 */
export function gradientOf({ polynomials, sigma, places }: LossyResponse): (omega: number) => readonly number[] {
  const atInfinity = polynomials.order - places.length;
  const moves = polynomials.poles.map((pole) => {
    const w = complex(pole.im, -pole.re);
    const shares = sharesOf(w, places, atInfinity);
    const factor = scale(complex(w.re * w.re - w.im * w.im - 1, 2 * w.re * w.im), -2);
    return { w, moves: shares.map((share) => multiply(share, factor)) };
  });
  const ripple = places.map(() => 0);
  for (const { im } of polynomials.reflectionZeros)
    sharesOf(complex(im, 0), places, atInfinity).forEach((share, j) => {
      ripple[j] = (ripple[j] as number) + 2 * (1 + im) * share.re;
    });
  return (omega) => {
    const inverses = moves.map(({ w }) => divide(complex(1, 0), complex(omega - w.re, -sigma - w.im)));
    return places.map((place, j) => {
      let sum = (ripple[j] as number) + ownShare(omegaFromLine(place), omega, sigma);
      moves.forEach((pole, k) => {
        const move = pole.moves[j] as Complex;
        const inverse = inverses[k] as Complex;
        sum -= move.re * inverse.re - move.im * inverse.im;
      });
      return DB_PER_NEPER * sum;
    });
  };
}

/** `h_j/H` of every zero at a complex frequency. */
function sharesOf(w: Complex, places: readonly number[], atInfinity: number): readonly Complex[] {
  const terms = places.map((s) =>
    divide(complex(1, 0), complex(Math.cosh(2 * s) - w.re * Math.sinh(2 * s), -w.im * Math.sinh(2 * s))),
  );
  const total = terms.reduce((sum, { re, im }) => complex(sum.re + re, sum.im + im), complex(atInfinity, 0));
  return terms.map((term) => divide(term, total));
}

/** What a zero at w adds by itself and through epsilon: `Re 2(w + 1)(omega - 1 - j sigma)/(w - omega + j sigma)`. */
function ownShare(w: number, omega: number, sigma: number): number {
  if (Math.abs(w) > FARTHEST) return 2 * (omega - 1);
  const away = w - omega;
  return (2 * (w + 1) * ((omega - 1) * away - sigma * sigma)) / (away * away + sigma * sigma);
}
