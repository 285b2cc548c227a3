import type { Complex } from '../numerics/index.js';

/** The four scattering parameters of a two-port at one frequency. */
export interface Scattering {
  readonly s11: Complex;
  readonly s21: Complex;
  readonly s12: Complex;
  readonly s22: Complex;
}
