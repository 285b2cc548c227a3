import type { Complex, FilterPolynomials, FineRoot } from '../forms/index.js';
import { EPS, refusal } from '../numerics/index.js';
import { signOfTransmission } from './lossless-form.js';

/**
 * Largest defect of `|S11|^2 + |S21|^2 = 1` that is taken for rounding of the data. The response of the matrix is off by
 * at most the defect, so this keeps what is let through a hundred times below the last digit of any ripple level.
 */
const LARGEST_DEFECT = 1e-8;

/** Mirrored transmission zeros may differ by this many units in the last place. */
const PAIR_ULPS = 4;

/** A defect up to this many units of rounding says that the roots cannot be told more exactly in doubles. */
const ROUNDING_UNITS = 8;

/**
 * Refuses a response that no real coupling matrix has: poles not on the left, transmission zeros off the axis without their
 * mirror image, a leading coefficient of P of another phase, power that does not balance at infinity, on a pole's resonance
 * or at its half-power points. Cost O(N^2).
 *
 * @throws FilterFailure E_NOT_HURWITZ, E_NOT_RECIPROCAL, E_NOT_LOSSLESS, E_ILL_CONDITIONED
 */
export function checkLossless(polynomials: FilterPolynomials): void {
  checkHurwitz(polynomials.poles);
  checkMirrored(polynomials.transmissionZeros);
  checkLead(polynomials);
  checkConstants(polynomials);
  checkPower(polynomials);
}

function checkHurwitz(poles: readonly FineRoot[]): void {
  const index = poles.findIndex(({ re }) => !(re < 0));
  if (index < 0) return;
  const hint = 'poles must lie in the left half plane';
  throw refusal('E_NOT_HURWITZ', `polynomials.poles[${index}].re`, poles[index]?.re, 'numbers below 0', hint);
}

function checkMirrored(zeros: readonly Complex[]): void {
  const open = zeros.filter(({ re }) => re < 0);
  zeros.forEach((zero, n) => {
    if (!(zero.re > 0)) return;
    const gaps = open.map(({ re, im }) => Math.hypot(zero.re + re, zero.im - im));
    const best = Math.min(...gaps);
    const limit = PAIR_ULPS * EPS * Math.hypot(zero.re, zero.im);
    if (!(best <= limit)) refuseUnpaired(n, best, limit);
    open.splice(gaps.indexOf(best), 1);
  });
  if (open.length > 0) refuseUnpaired(zeros.indexOf(open[0] as Complex), Infinity, 0);
}

function refuseUnpaired(index: number, gap: number, limit: number): never {
  throw refusal(
    'E_NOT_RECIPROCAL',
    `polynomials.transmissionZeros[${index}]`,
    Number.isFinite(gap) ? `a mirror image off by ${gap.toPrecision(3)}` : 'no mirror image -conj z',
    `a distance of ${limit.toPrecision(3)}`,
    'list zeros off the axis in pairs z, -conj z',
  );
}

function checkLead(polynomials: FilterPolynomials): void {
  const { re, im } = polynomials.transmissionLead;
  if (Math.abs(signOfTransmission(polynomials)) === 1 && Math.abs(re) + Math.abs(im) === 1) return;
  const isOdd = (polynomials.order + polynomials.transmissionZeros.length) % 2 === 1;
  throw refusal(
    'E_NOT_RECIPROCAL',
    'polynomials.transmissionLead',
    `${re} + ${im}j`,
    isOdd ? '1 or -1' : 'j or -j',
    'a lossless reciprocal P of this degree has no other phase',
  );
}

/** What S11 and S21 are at infinite frequency: a response with fewer zeros than poles vanishes there. */
function checkConstants({ order, reflectionZeros, transmissionZeros, epsilon, epsilonR }: FilterPolynomials): void {
  const reflected = reflectionZeros.length < order ? 0 : 1 / epsilonR;
  const transmitted = transmissionZeros.length < order ? 0 : 1 / epsilon;
  const defect = Math.abs(reflected * reflected + transmitted * transmitted - 1);
  if (defect <= LARGEST_DEFECT) return;
  refuseDefect('infinite frequency', defect);
}

function refuseDefect(place: string, defect: number): never {
  throw refusal(
    'E_NOT_LOSSLESS',
    'polynomials',
    `a power balance off by ${defect.toPrecision(3)}`,
    LARGEST_DEFECT,
    `it is so at ${place}; the roots of E must fit F, P, epsilon and epsilonR`,
  );
}

function checkPower(polynomials: FilterPolynomials): void {
  let [worst, place] = [0, 0];
  for (const { re, im } of polynomials.poles) {
    for (const omega of [im, im - re, im + re]) {
      const defect = Math.abs(power(polynomials, omega) - 1);
      if (!(defect <= worst)) [worst, place] = [defect, omega];
    }
  }
  if (worst <= LARGEST_DEFECT) return;
  const unit = ROUNDING_UNITS * EPS * spread(polynomials, place);
  if (!(worst <= unit)) refuseDefect(`omega = ${place.toPrecision(6)}`, worst);
  throw refusal(
    'E_ILL_CONDITIONED',
    'polynomials',
    `a power balance off by ${worst.toPrecision(3)}`,
    LARGEST_DEFECT,
    `it is rounding of the roots next to omega = ${place.toPrecision(6)}; move the poles there further from the axis`,
  );
}

/** Digits of S that must survive the rounding of one root or one diagonal entry: those that a certificate asks for. */
const LARGEST_ROUNDING = 1e-6;

/**
 * Refuses a response with a pole so close to the axis, against its distance from 0, that doubles cannot say where it is.
 *
 * @throws FilterFailure E_ILL_CONDITIONED
 */
export function checkConditioned({ poles }: FilterPolynomials): void {
  const effects = poles.map(({ re, im }) => (EPS * Math.hypot(re, im)) / -re);
  const worst = Math.max(...effects);
  if (worst <= LARGEST_ROUNDING) return;
  throw refusal(
    'E_ILL_CONDITIONED',
    `polynomials.poles[${effects.indexOf(worst)}]`,
    `rounding that moves S by ${worst.toPrecision(3)}`,
    LARGEST_ROUNDING,
    'move it further from the axis',
  );
}

/** |S11|^2 + |S21|^2 from magnitudes, squared last, so that nothing leaves the range of doubles. */
function power(
  { poles, reflectionZeros, transmissionZeros, epsilon, epsilonR }: FilterPolynomials,
  omega: number,
): number {
  let [reflected, transmitted] = [1 / epsilonR, 1 / epsilon];
  poles.forEach((pole, n) => {
    const below = distance(pole, omega);
    const [reflection, transmission] = [reflectionZeros[n], transmissionZeros[n]];
    reflected *= (reflection === undefined ? 1 : distance(reflection, omega)) / below;
    transmitted *= (transmission === undefined ? 1 : distance(transmission, omega)) / below;
  });
  return reflected * reflected + transmitted * transmitted;
}

/** How much the power at omega moves when every root moves by its own rounding, in units of eps: `sum |r|/|j*omega - r|`. */
function spread({ poles, reflectionZeros, transmissionZeros }: FilterPolynomials, omega: number): number {
  const roots: readonly FineRoot[] = [...poles, ...reflectionZeros, ...transmissionZeros];
  return roots.reduce((sum, root) => sum + Math.hypot(root.re, root.im) / (distance(root, omega) || Infinity), 0);
}

function distance({ re, im, imRest = 0 }: FineRoot, omega: number): number {
  const above = omega - im - imRest;
  return Math.sqrt(re * re + above * above);
}
