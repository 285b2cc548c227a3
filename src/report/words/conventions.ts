import type { Band } from '../../forms/index.js';
import { fixed } from './numbers.js';

/** What every export of a matrix says about its signs. */
export const CONVENTIONS: readonly string[] = [
  'A = M + w*U - j*R with w = (f0/B)*(f/f0 - f0/f); S21 = -2j*[A^-1](L,S)',
  'M_ii > 0 tunes resonator i below the center; a sign counts only round a loop',
];

/** What the narrow-band model leaves out; true of every number here. */
const NOT_MODELED =
  'Not in the model: spurious modes, port lengths, power handling. No number here is a safety clearance.';

/** Fractional bandwidth from which couplings that vary with frequency show. */
const NARROW = 0.1;

/** What a reader should keep in mind about a model that takes couplings and Q as constant. */
export function cautionsOf(band: Band): readonly string[] {
  const share = band.bandwidthHz / band.centerHz;
  const percent = fixed(100 * share, 1);
  const edge = fixed(50 * share, 0);
  const wide = `Caution: the band is ${percent} % wide, and couplings and Q are taken as constant over it; a coupling that follows frequency is ${edge} % off at the edges.`;
  return share > NARROW ? [wide, NOT_MODELED] : [NOT_MODELED];
}
