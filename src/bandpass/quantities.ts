import type { SweepHz } from './sweep-hz.js';

/**
 * Largest attenuation stated, dB. S-parameters are numbers near 1 in doubles; below -400 dB an S21 of exactly 0 (a
 * transmission zero hit to the last bit) is not told from a very small one.
 */
export const DEEPEST_DB = 400;

/** A positive decibel value of |re + j*im|: attenuation of S21, return loss of S11. */
export function decibels(re: number, im: number): number {
  return Math.min(DEEPEST_DB, -20 * Math.log10(Math.hypot(re, im)));
}

/** What a mask line looks at: attenuation of S21, the smaller return loss of the two ports, or group delay. */
export type Quantity = 'attenuation' | 'returnLoss' | 'groupDelay';

/** A quantity at every frequency of a sweep. */
export function quantityOf(sweep: SweepHz, quantity: Quantity): Float64Array {
  if (quantity === 'groupDelay') return sweep.groupDelaySeconds;
  const { s11, s21, s22 } = sweep;
  return sweep.frequenciesHz.map((_, n) => {
    if (quantity === 'attenuation') return decibels(s21.re[n] as number, s21.im[n] as number);
    return Math.min(
      decibels(s11.re[n] as number, s11.im[n] as number),
      decibels(s22.re[n] as number, s22.im[n] as number),
    );
  });
}
