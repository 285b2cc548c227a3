import { type CouplingMatrix, checkPolynomials, type FilterPolynomials } from '../forms/index.js';
import { checkConditioned, checkLossless } from './check-lossless.js';
import { modeResonances } from './mode-phase.js';
import { modesOf } from './modes.js';
import { type Resonator, resonatorsOf } from './resonators.js';

/**
 * Transversal coupling matrix of any lossless reciprocal response, S11 different from S22 included.
 *
 * N resonators in parallel, `M_kk` falling with k, `M_kL >= 0`; `M_SL` is non-zero only for as many finite transmission zeros
 * as the order. With S11 = S22 (every reflection zero on the axis) `|M_Sk| = M_kL`, positive for resonances of S11 + S21 and
 * negative for those of S11 - S21. Complex S11, S21 and S22 of the matrix equal those of the polynomials, phase included,
 * to what rounding of the roots and of the matrix leaves. Cost O(order^2): at order 40 under 1 ms with S11 = S22, 2 ms
 * without.
 *
 * Refused: poles that are not in the left half plane (E_NOT_HURWITZ); a P that is not para-conjugate: zeros off the axis
 * without mirror image, or a leading coefficient of another phase (E_NOT_RECIPROCAL); power that does not balance to 1e-8
 * (E_NOT_LOSSLESS), or cannot for rounding of the roots (E_ILL_CONDITIONED).
 *
 * @throws FilterFailure E_NOT_HURWITZ, E_NOT_RECIPROCAL, E_NOT_LOSSLESS, E_ILL_CONDITIONED, E_TYPE, E_NOT_FINITE, E_POLYNOMIALS
 *
 * Method: the eigenphases of a lossless S fall monotonically with frequency, so resonances are bracketed zeros and couplings
 * quotients by slopes: nothing is subtracted, so no digit is lost. With S11 = S22 the eigenvectors stand still and the
 * eigenphases are those of two all-pass modes, each with half of the poles, which is faster. Residues of the
 * classical route (Cameron 2003, below) are the check, not the method.
 * Source of the (N+2) transversal form: R. J. Cameron, Advanced coupling matrix synthesis techniques for microwave
 * filters, IEEE Trans. MTT 51(1), 2003 (from memory).
 *
 * @example
 * const matrix = transversal(butterworth({ order: 1 }));
 * matrix.values[0][1].toFixed(4); // '0.7071'
 */
export function transversal(polynomials: FilterPolynomials): CouplingMatrix {
  const { order } = checkPolynomials(polynomials);
  checkLossless(polynomials);
  const finiteZeros = polynomials.transmissionZeros.length;
  const angle = finiteZeros === order ? evenAngle(polynomials) : 0;
  const found = symmetricResonators(polynomials, angle) ?? anyResonators(polynomials);
  const resonators = [...found].sort((a, b) => b.diagonal - a.diagonal);
  const exact = isMirrored(polynomials) ? symmetrized(resonators) : resonators;
  return { order, values: matrixOf(exact, directCoupling(polynomials, angle)), finiteZeros };
}

/** `M_SL` from S at infinite frequency: `S11 = (1 - M_SL^2)/(1 + M_SL^2)`, `S21 = -2j*M_SL/(1 + M_SL^2)`. */
function directCoupling({ order, reflectionZeros, transmissionLead }: FilterPolynomials, angle: number): number {
  return reflectionZeros.length < order ? -transmissionLead.im : -Math.tan(angle / 2);
}

/** The resonators by the modes of a response with S11 = S22; undefined for any other. */
function symmetricResonators(polynomials: FilterPolynomials, angle: number): readonly Resonator[] | undefined {
  if (polynomials.reflectionZeros.some(({ re }) => re !== 0)) return undefined;
  const modes = modesOf(polynomials);
  if (modes === undefined) return undefined;
  return [...branchesOf(modes.even, angle, 1), ...branchesOf(modes.odd, -angle, -1)];
}

function anyResonators(polynomials: FilterPolynomials): readonly Resonator[] {
  checkConditioned(polynomials);
  return resonatorsOf(polynomials);
}

/** Argument of S11 + S21 at infinite frequency, `1/epsilonR + lead/epsilon` with lead = +-j. */
function evenAngle(polynomials: FilterPolynomials): number {
  const { order, reflectionZeros, transmissionLead, epsilon, epsilonR } = polynomials;
  return Math.atan2(transmissionLead.im / epsilon, reflectionZeros.length < order ? 0 : 1 / epsilonR);
}

function branchesOf(poles: FilterPolynomials['poles'], angle: number, parity: 1 | -1): readonly Resonator[] {
  if (poles.length === 0) return [];
  return modeResonances(poles, angle).map(({ lambda, slope }) => {
    const load = Math.sqrt(0.5 / slope);
    return { diagonal: -lambda, source: parity * load, load };
  });
}

/**
 * True when the response is exactly symmetric about omega = 0: with each root its conjugate is in the list. Poles alone say
 * so where S11 = S22; otherwise a zero of reflection and one of the mirrored half plane would make the same poles.
 */
function isMirrored({ poles, reflectionZeros }: FilterPolynomials): boolean {
  return [poles, reflectionZeros.filter(({ re }) => re !== 0)].every((roots) => {
    const listed = new Set(roots.map(({ re, im }) => `${re},${im + 0}`));
    return roots.every(({ re, im }) => listed.has(`${re},${-im + 0}`));
  });
}

/**
 * Averages mirror partners, so that a symmetric response gives exactly opposite diagonal entries and equal couplings; two
 * resonances at 0 are partners whose couplings need not be equal, and keep theirs.
 */
function symmetrized(resonators: readonly Resonator[]): readonly Resonator[] {
  return resonators.map((resonator, n) => {
    const partner = resonators[resonators.length - 1 - n] ?? resonator;
    const diagonal = (resonator.diagonal - partner.diagonal) / 2;
    const average = (own: number, other: number): number =>
      Math.abs(Math.abs(own) - Math.abs(other)) <= ROUNDING * Math.abs(own)
        ? (Math.sign(own) * (Math.abs(own) + Math.abs(other))) / 2
        : own;
    const load = average(resonator.load, partner.load);
    return { diagonal, source: average(resonator.source, partner.source), load };
  });
}

/** Couplings of mirror partners differ by the rounding of a slope, a few eps for each pole; anything more is no rounding. */
const ROUNDING = 1e-12;

function matrixOf(branches: readonly Resonator[], direct: number): readonly (readonly number[])[] {
  const size = branches.length + 2;
  const values = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const set = (i: number, j: number, value: number): void => {
    const clean = value === 0 ? 0 : value;
    (values[i] as number[])[j] = clean;
    (values[j] as number[])[i] = clean;
  };
  branches.forEach((branch, n) => {
    set(n + 1, n + 1, branch.diagonal);
    set(0, n + 1, branch.source);
    set(n + 1, size - 1, branch.load);
  });
  set(0, size - 1, direct);
  return values;
}
