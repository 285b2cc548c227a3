import type { FilterPolynomials } from '../forms/index.js';
import { type Doubled, refusal, sumRest } from '../numerics/index.js';
import { type FinePhase, fineEigenphase, NOISE_PER_FACTOR, type Workspace, workspace } from './doubled-eigenphase.js';
import { eigenphaseRoots, type PhaseRoot } from './eigenphase-roots.js';
import { type LosslessForm, losslessForm } from './lossless-form.js';
import { refinePoles } from './refine-poles.js';

/** A resonator of the transversal matrix: its diagonal entry and its couplings to source and load. */
export interface Resonator {
  readonly diagonal: number;
  readonly source: number;
  readonly load: number;
}

/**
 * The resonators of the transversal matrix of any lossless reciprocal response: at each frequency where an eigenphase of S
 * is pi, `M_kk = -omega` and `(M_Sk, M_kL) = sqrt(2/|slope|)` times the unit vector of that eigenphase. Cost O(N^2).
 *
 * With `S = V diag(exp(j*theta)) V^T`, V real, `(I - S)(I + S)^-1` has the eigenvalues `-j*tan(theta/2)`: poles with positive
 * residues, quotients by slopes and never differences of polynomials. Roots are bracketed and found in doubles, then once
 * refined in doubled precision, where poles that fit F and P to 30 digits are found first: next to another eigenvalue
 * the vector, and on top of a wide resonance the slope of a narrow one, would otherwise lose digits.
 *
 * @throws FilterFailure E_ILL_CONDITIONED
 */
export function resonatorsOf(polynomials: FilterPolynomials): readonly Resonator[] {
  const form = refinePoles(losslessForm(polynomials));
  const work = workspace();
  return eigenphaseRoots(form).map((root) => resonatorAt(form, root, work));
}

function resonatorAt(form: LosslessForm, root: PhaseRoot, work: Workspace): Resonator {
  const { omega, phase } = refinedRoot(form, root, work);
  const along = vectorOf(phase, root.branch);
  const size = Math.sqrt(-2 / phase.slope) * Math.sqrt(form.unit);
  const sign = along.load < 0 || (along.load === 0 && along.source < 0) ? -1 : 1;
  return { diagonal: -omega.hi * form.unit, source: sign * size * along.source, load: sign * size * along.load };
}

/** Steps of the refinement; one or two are usual, five where two eigenvalues nearly coincide. */
const MOST_STEPS = 40;

/** Newton steps in doubled precision from the root in doubles, inside what the signs so far allow. */
function refinedRoot(
  form: LosslessForm,
  { omega: start, branch }: PhaseRoot,
  work: Workspace,
): { omega: Doubled; phase: FinePhase } {
  const rounding = form.order * 8 * NOISE_PER_FACTOR;
  let omega: Doubled = { hi: start, lo: 0 };
  let low: Doubled | undefined;
  let high: Doubled | undefined;
  for (let step = 0; step < MOST_STEPS; step++) {
    const phase = fineEigenphase(form, omega, branch, work);
    // The tangent rounds by that of its factors, and a pair omega of size 1 cannot be told more exactly than that either.
    if (Math.abs(phase.tangent) <= rounding * (1 + Math.abs(phase.slope))) return { omega, phase };
    if (phase.tangent > 0) low = omega;
    else high = omega;
    const next = moved(omega, -phase.tangent / phase.slope);
    const inside = (low === undefined || above(next, low) > 0) && (high === undefined || above(high, next) > 0);
    if (!inside && low !== undefined && high !== undefined) omega = moved(low, above(high, low) / 2);
    else omega = next;
  }
  throw refusal(
    'E_ILL_CONDITIONED',
    'polynomials',
    'an eigenphase that is not monotone',
    `rounding in ${MOST_STEPS} steps`,
    `it is so next to omega = ${(start * form.unit).toPrecision(6)}, where the roots listed are too rough for their poles`,
  );
}

function moved(omega: Doubled, step: number): Doubled {
  const rest = omega.lo + step;
  const hi = omega.hi + rest;
  return { hi, lo: sumRest(omega.hi, rest, hi) };
}

const above = (a: Doubled, b: Doubled): number => a.hi - b.hi + (a.lo - b.lo);

/** A component of the vector below this share is rounding: the port does not see the resonator. */
const DARK: number = 2 ** -80;

/**
 * The unit vector at half the angle of (beta, b) for `psi + delta`, a quarter turn further for `psi - delta`; by square roots
 * of sums without cancellation, so that a weak coupling to one port keeps its digits.
 */
function vectorOf({ beta, b }: FinePhase, branch: 1 | -1): { source: number; load: number } {
  const radius = Math.hypot(beta, b);
  const large = Math.sqrt((1 + Math.abs(beta) / radius) / 2);
  const small = b / radius / (2 * large);
  const seen = Math.abs(small) < DARK ? 0 : small;
  const [cosine, sine] = beta >= 0 ? [large, seen] : [seen, large];
  return branch === 1 ? { source: cosine, load: sine } : { source: -sine, load: cosine };
}
