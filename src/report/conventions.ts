/** What every export of a matrix says about its signs. */
export const CONVENTIONS: readonly string[] = [
  'A = M + w*U - j*R with w = (f0/B)*(f/f0 - f0/f); S21 = -2j*[A^-1](L,S)',
  'M_ii > 0 tunes resonator i below the center; a sign counts only round a loop',
];

/** What the narrow-band model leaves out; true of every number here. */
export const NOT_MODELED =
  'Not in the model: spurious modes, port lengths, power handling. No number here is a safety clearance.';
