import type { Band } from '../../forms/index.js';
import { fixed } from './numbers.js';

/** What every export of a matrix says about its signs. */
export const CONVENTIONS: readonly string[] = [
  'A = M + w*U - j*R with w = (f0/B)*(f/f0 - f0/f); S21 = -2j*[A^-1](L,S)',
  'M_ii > 0 tunes resonator i below the center; a sign counts only round a loop',
];

/** What every number rests on and leaves out. */
export const MODEL_ONLY =
  'Model only: ideal part values; no tolerances, temperature, spurious resonances or power handling; not a safety clearance.';

/** Who answers for what no number here does. */
export const POWER =
  'Multipaction, corona, heating and exposure belong to the applicable standards, local codes and qualified, licensed staff.';

/** Said where a limit reaches where no lumped model describes hardware. */
export const LUMPED = 'Open-ended limits are judged in the lumped model: it has no spurious passbands.';

/** Fractional bandwidth from which couplings that vary with frequency show. */
const NARROW = 0.1;

/** What a reader should keep in mind about a model that takes couplings and Q as constant: nothing for a narrow band. */
export function wideCautions(band: Band): readonly string[] {
  const share = band.bandwidthHz / band.centerHz;
  const percent = fixed(100 * share, 1);
  const edge = fixed(50 * share, 0);
  const wide = `Caution: the band is ${percent} % wide, and couplings and Q are taken as constant over it; a coupling that follows frequency is ${edge} % off at the edges.`;
  return share > NARROW ? [wide] : [];
}

/** The last words of every text about a band. */
export function cautionsOf(band: Band): readonly string[] {
  return [...wideCautions(band), MODEL_ONLY, POWER];
}
