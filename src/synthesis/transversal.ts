import { type CouplingMatrix, checkPolynomials, type FilterPolynomials } from '../forms/index.js';
import { modeResonances } from './mode-phase.js';
import { modesOf } from './modes.js';

/** A resonator of the transversal matrix: its diagonal entry and its couplings to source and load. */
interface Branch {
  readonly diagonal: number;
  readonly source: number;
  readonly load: number;
}

/**
 * Transversal coupling matrix of a lossless response with S11 = S22 (every family of this package so far).
 *
 * N resonators in parallel, `M_kk` falling with k, `M_kL > 0`, `M_Sk = +M_kL` for resonances of S11 + S21 and `-M_kL` for
 * those of S11 - S21; `M_SL` is non-zero only for as many finite transmission zeros as the order. Complex S11 and S21 of
 * the matrix equal those of the polynomials, phase included. Cost O(order^2), under 1 ms at order 40.
 *
 * @throws FilterFailure E_NOT_SYMMETRIC_RESPONSE, E_TYPE, E_NOT_FINITE, E_POLYNOMIALS
 *
 * Method: S11 + S21 and S11 - S21 are all-pass with half of the poles each; their resonances are bracketed zeros of a
 * monotone phase and the couplings are `sqrt(1/(2*slope))`: nothing is subtracted, so no digit is lost. Residues of the
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
  const finiteZeros = polynomials.transmissionZeros.length;
  const angle = finiteZeros === order ? evenAngle(polynomials) : 0;
  const modes = modesOf(polynomials);
  const branches = [...branchesOf(modes.even, angle, 1), ...branchesOf(modes.odd, -angle, -1)];
  branches.sort((a, b) => b.diagonal - a.diagonal);
  const exact = isMirrored(polynomials) ? symmetrized(branches) : branches;
  return { order, values: matrixOf(exact, -Math.tan(angle / 2)), finiteZeros };
}

/** Argument of S11 + S21 at infinite frequency, `1/epsilonR + lead/epsilon` with lead = +-j. */
function evenAngle(polynomials: FilterPolynomials): number {
  return Math.atan2(polynomials.transmissionLead.im / polynomials.epsilon, 1 / polynomials.epsilonR);
}

function branchesOf(poles: FilterPolynomials['poles'], angle: number, parity: 1 | -1): readonly Branch[] {
  if (poles.length === 0) return [];
  return modeResonances(poles, angle).map(({ lambda, slope }) => {
    const load = Math.sqrt(0.5 / slope);
    return { diagonal: -lambda, source: parity * load, load };
  });
}

/** True when the response is exactly symmetric about omega = 0: with each pole its conjugate is in the list. */
function isMirrored({ poles }: FilterPolynomials): boolean {
  const listed = new Set(poles.map(({ re, im }) => `${re},${im + 0}`));
  return poles.every(({ re, im }) => listed.has(`${re},${-im + 0}`));
}

/** Averages mirror partners, so that a symmetric response gives exactly opposite diagonal entries and equal couplings. */
function symmetrized(branches: readonly Branch[]): readonly Branch[] {
  return branches.map((branch, n) => {
    const partner = branches[branches.length - 1 - n] ?? branch;
    const load = (branch.load + partner.load) / 2;
    return { diagonal: (branch.diagonal - partner.diagonal) / 2, source: Math.sign(branch.source) * load, load };
  });
}

function matrixOf(branches: readonly Branch[], direct: number): readonly (readonly number[])[] {
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
