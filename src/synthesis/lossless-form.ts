import type { FilterPolynomials, FineRoot } from '../forms/index.js';
import {
  type Complex,
  type Doubled,
  doubledAdd,
  doubledMultiply,
  doubledSquareRoot,
  powerOfJ,
} from '../numerics/index.js';

/** Roots as columns, both parts as pairs: a root r is the factor `(omega - im) + j*re` of a product in omega. */
export interface RootColumns {
  readonly re: Float64Array;
  readonly reRest: Float64Array;
  readonly im: Float64Array;
  readonly imRest: Float64Array;
}

/**
 * A lossless two-port in the form that its eigenphases are computed from, frequency scaled by a power of 4.
 *
 * With `e = prod((omega - im p) + j*re p)`, the same for F and P, and psi the half phase of det S, `e^(-j psi) = (-1)^N e/|e|`:
 * `e^(-j psi) S = [[a, j*b], [j*b, conj a]]`, `a = (-1)^N turn*reflection*phi/|e|`, `b = transmission*chi/|e|`, chi the product
 * of the transmission zeros (real for zeros on the axis or mirrored in it).
 */
export interface LosslessForm {
  readonly order: number;
  readonly poles: RootColumns;
  readonly reflectionZeros: RootColumns;
  readonly transmissionZeros: RootColumns;
  /** `1/epsilonR`, exactly what `1/epsilon` leaves of 1 at infinite frequency. */
  readonly reflection: Doubled;
  /** `j^(nf - N)`: 1 but for a response with fewer reflection zeros than its order. */
  readonly turn: Complex;
  /** `1/epsilon` with the sign of b. */
  readonly transmission: Doubled;
  /** `(-1)^N`. */
  readonly parity: 1 | -1;
  /** Frequencies of the form times this are those of the polynomials; an even power of two. */
  readonly unit: number;
}

/**
 * Columns and constants of polynomials that passed `checkLossless`. Frequencies are brought to size 1 by a power of 4, so
 * that couplings, which scale with its root, are scaled exactly too; roots are sorted, so that products stay in range.
 */
export function losslessForm(polynomials: FilterPolynomials): LosslessForm {
  const { order, poles, reflectionZeros, transmissionZeros } = polynomials;
  const unit = 4 ** Math.round(Math.log2(Math.max(...poles.map(({ re, im }) => Math.hypot(re, im)))) / 2);
  const { reflection, transmission } = constantsAtInfinity(polynomials, unit);
  const sign = signOfTransmission(polynomials);
  return {
    order,
    poles: columnsOf(poles, unit),
    reflectionZeros: columnsOf(reflectionZeros, unit),
    transmissionZeros: columnsOf(transmissionZeros, unit),
    reflection,
    turn: powerOfJ(reflectionZeros.length - order),
    transmission: { hi: sign * transmission.hi, lo: sign * transmission.lo },
    parity: order % 2 === 0 ? 1 : -1,
    unit,
  };
}

/** `j^(N+nz-1) * lead`: +-1 for every response whose numerators have the phase that a coupling matrix has. */
export function signOfTransmission({ order, transmissionZeros, transmissionLead }: FilterPolynomials): number {
  const turns = (order + transmissionZeros.length + 3) % 4;
  return [transmissionLead.re, -transmissionLead.im, -transmissionLead.re, transmissionLead.im][turns] as number;
}

function columnsOf(roots: readonly FineRoot[], unit: number): RootColumns {
  const sorted = [...roots].sort((a, b) => a.im - b.im);
  return {
    re: Float64Array.from(sorted, ({ re }) => re / unit),
    reRest: new Float64Array(sorted.length),
    im: Float64Array.from(sorted, ({ im }) => im / unit),
    imRest: Float64Array.from(sorted, ({ imRest = 0 }) => imRest / unit),
  };
}

/**
 * The two constants, lossless at infinite frequency to 30 digits: 1 where the other response vanishes there, and otherwise
 * the larger one from the smaller, `sqrt(1 - x^2)`.
 */
function constantsAtInfinity(
  { order, reflectionZeros, transmissionZeros, epsilon, epsilonR }: FilterPolynomials,
  unit: number,
): { reflection: Doubled; transmission: Doubled } {
  const one: Doubled = { hi: 1, lo: 0 };
  if (transmissionZeros.length < order) {
    return { reflection: one, transmission: inverse(epsilon, unit, transmissionZeros.length - order) };
  }
  if (reflectionZeros.length < order) {
    return { reflection: inverse(epsilonR, unit, reflectionZeros.length - order), transmission: one };
  }
  const [reflection, transmission] = [inverse(epsilonR, 1, 0), inverse(epsilon, 1, 0)];
  return reflection.hi > transmission.hi
    ? { reflection: complement(transmission), transmission }
    : { reflection, transmission: complement(reflection) };
}

/** `unit^exponent/constant` as a pair; in two halves, for the power alone may leave the range of doubles. */
function inverse(constant: number, unit: number, exponent: number): Doubled {
  const half = unit ** Math.floor(exponent / 2);
  const rest = unit ** (exponent - Math.floor(exponent / 2));
  const hi = 1 / constant;
  const product = doubledMultiply({ hi, lo: 0 }, { hi: constant, lo: 0 });
  const lo = hi * (1 - product.hi - product.lo);
  return { hi: hi * half * rest, lo: lo * half * rest };
}

function complement(x: Doubled): Doubled {
  const square = doubledMultiply(x, x);
  return doubledSquareRoot(doubledAdd({ hi: 1, lo: 0 }, { hi: -square.hi, lo: -square.lo }));
}
