import type { FineRoot } from '../../forms/index.js';
import { type Complex, complex, EPS, refusal, squareRoot } from '../../numerics/index.js';
import { checkRequest } from '../request.js';
import { fittedResponse, type GivenResponse } from './from-roots.js';
import { symmetrized } from './half-roots.js';
import { checkHurwitz } from './read-roots.js';
import type { ReflectionSides } from './sides.js';
import { type Factors, readSquare, type SquarePolynomial } from './square-polynomial.js';
import { halved } from './square-root.js';

/** |S21|^2 as a quotient of polynomials in omega^2. */
export interface MagnitudeRequest {
  readonly numerator: SquarePolynomial;
  readonly denominator: SquarePolynomial;
  /** On which side of the axis reflection zeros lie; default left. */
  readonly reflectionZeros?: ReflectionSides;
  /** As in `responseFromRoots`. */
  readonly tolerance?: number;
}

/**
 * A lossless reciprocal response from |S21|^2, an even function of frequency: poles are the left square roots of the
 * denominator, P that of the numerator, reflection zeros follow from what is left of 1.
 *
 * Numerator and denominator are polynomials in omega^2, as ascending coefficients or as roots and a leading coefficient. The
 * numerator must be a square but for powers of omega^2 itself, since a reciprocal network's P is para-conjugate: with a simple
 * root elsewhere multiply both by it (E_NOT_RECIPROCAL). Coefficients of order 12 already leave a response only eight digits or
 * so; roots leave all. Cost as `responseFromRoots`.
 *
 * @throws FilterFailure E_NOT_HURWITZ, E_NOT_RECIPROCAL, E_NOT_LOSSLESS, E_ILL_CONDITIONED, E_NO_CONVERGENCE, E_CHOICE,
 *   E_ORDER_RANGE, E_POLYNOMIALS, E_TYPE, E_NOT_FINITE
 *
 * @example
 * const flat = responseFromMagnitude({ numerator: { coefficients: [1] }, denominator: { coefficients: [1, 0, 1] } });
 * flat.poles[0].re.toFixed(6); // '-0.707107'
 */
export function responseFromMagnitude(request: MagnitudeRequest): GivenResponse {
  checkRequest(request);
  const numerator = readSquare('numerator', request.numerator);
  const denominator = readSquare('denominator', request.denominator);
  const ratio = denominator.lead / numerator.lead;
  if (!(ratio > 0 && Number.isFinite(ratio))) refuseNegative(ratio);
  const poles = symmetrized(denominator.roots.map((x) => leftRoot(x)));
  checkHurwitz(poles, 'denominator: poles');
  const transmissionZeros = symmetrized(halved(numerator).flatMap((x) => bothRoots(x)));
  const { reflectionZeros, tolerance } = request;
  return fittedResponse(
    {
      poles,
      transmissionZeros: [...transmissionZeros, ...Array.from({ length: atZero(numerator) }, () => complex(0, 0))],
      epsilon: Math.sqrt(ratio),
      ...(reflectionZeros === undefined ? {} : { reflectionZeros }),
      ...(tolerance === undefined ? {} : { tolerance }),
    },
    { open: openShare(numerator, denominator) },
  );
}

const atZero = ({ roots }: Factors): number => roots.filter(({ re, im }) => re === 0 && im === 0).length;

/** `s = -sqrt(-x)`, x = omega^2 = -s^2. */
function leftRoot({ re, im }: Complex): FineRoot {
  const root = squareRoot(complex(-re, im === 0 ? 0 : -im));
  return { re: -root.re, im: im === 0 && re <= 0 ? 0 : -root.im };
}

function bothRoots(x: Complex): readonly FineRoot[] {
  if (x.im === 0 && x.re > 0) return [complex(0, Math.sqrt(x.re)), complex(0, -Math.sqrt(x.re))];
  const { re, im } = leftRoot(x);
  return [complex(re, im), complex(-re, -im)];
}

/** Share of power that rounding of the coefficients leaves open, at the frequencies of the poles: `4 eps sum |c| / sum c`. */
function openShare(numerator: Factors, denominator: Factors): number {
  return denominator.roots.reduce((worst, { re }) => {
    const x = Math.max(0, re);
    const [above, below] = [sizes(numerator, x), sizes(denominator, x)];
    return Math.max(worst, below.value > 0 ? (4 * EPS * (above.size + below.size)) / below.value : 0);
  }, 0);
}

function sizes({ coefficients }: Factors, x: number): { readonly value: number; readonly size: number } {
  return coefficients.reduceRight(
    ({ value, size }, each) => ({ value: value * x + each, size: size * x + Math.abs(each) }),
    { value: 0, size: 0 },
  );
}

function refuseNegative(ratio: number): never {
  throw refusal(
    'E_NOT_LOSSLESS',
    'denominator',
    `leading coefficients with the quotient ${ratio}`,
    'a positive quotient',
    'a power is negative at high frequencies',
  );
}
