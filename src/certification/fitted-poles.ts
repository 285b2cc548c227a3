import type { FilterPolynomials, FineRoot } from '../forms/index.js';
import { overGaps } from './stability.js';

/**
 * How far each pole moves, in units of eps, when the roots of F and P that fix it are rounded to doubles: to first order
 * `dp = -dG/G'` with `G = F F#/epsilonR^2 + P P#/epsilon^2 = E E#`.
 *
 * Next to a wide resonance a narrow one may move by many of its own units: poles, F and P listed as doubles agree no better
 * than that, and neither do identities that mix them. Cost O(N^2).
 */
export function polesByRounding(polynomials: FilterPolynomials): readonly number[] {
  const { poles, reflectionZeros, transmissionZeros, transmissionLead, epsilon, epsilonR } = polynomials;
  const lead = transmissionLead.re * transmissionLead.re + transmissionLead.im * transmissionLead.im;
  return poles.map((pole, k) => {
    const reflected = overGaps(poles, k, reflectionZeros);
    const transmitted = overGaps(poles, k, transmissionZeros);
    return (
      (Math.hypot(reflected.re, reflected.im) / (epsilonR * epsilonR)) * spread(pole, reflectionZeros) +
      ((lead * Math.hypot(transmitted.re, transmitted.im)) / (epsilon * epsilon)) * spread(pole, transmissionZeros)
    );
  });
}

/** Relative change of `prod (s - r)(s + conj r)` when each root moves by half a unit of its size. */
function spread({ re, im }: FineRoot, roots: readonly FineRoot[]): number {
  return roots.reduce((sum, root) => {
    const [own, mirrored] = [Math.hypot(re - root.re, im - root.im), Math.hypot(re + root.re, im - root.im)];
    return sum + (Math.hypot(root.re, root.im) / 2) * (1 / own + 1 / mirrored);
  }, 0);
}
