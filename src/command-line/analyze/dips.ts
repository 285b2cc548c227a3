import type { CouplingMatrix } from '../../forms/index.js';
import { localMinimum } from '../../numerics/index.js';
import type { Dip } from '../../report/index.js';
import { scatteringAt, sweep } from '../../response/index.js';

const POINTS = 8001;
/** Ends of the search in omega; the grid is densest at 0 and in proportion to omega far out. */
const REACH = 1e3;
/** Shallower minima are ripple. */
const LEAST_DB = 10;
/** Below this power (-220 dB) S21 of a matrix is rounding, with minima everywhere. */
const FLOOR = 1e-22;
/** A sample above this power (1 dB down) is ripple within the band: not worth following. */
const RIPPLE = 0.794;
/** Deeper than doubles tell. */
const DEEPEST_DB = 300;

function gridOf(): Float64Array {
  const end = Math.asinh(REACH);
  return Float64Array.from({ length: POINTS }, (_, n) => Math.sinh(end * ((2 * n) / (POINTS - 1) - 1)));
}

/** Minima of |S21|, 10 to 220 dB down at the samples beside them, in rising order; lossless. */
export function dipsOf(matrix: CouplingMatrix): readonly Dip[] {
  const omega = gridOf();
  const { s21 } = sweep(matrix, omega);
  const power = omega.map((_, n) => (s21.re[n] ?? 0) ** 2 + (s21.im[n] ?? 0) ** 2);
  const powerAt = (w: number): number => {
    const { re, im } = scatteringAt(matrix, w).s21;
    return re * re + im * im;
  };
  const dips: Dip[] = [];
  for (let n = 1; n < POINTS - 1; n += 1) {
    const [before = 0, here = 0, after = 0] = [power[n - 1], power[n], power[n + 1]];
    const isMinimum = here < before && here <= after && Math.min(before, after) > FLOOR;
    if (!isMinimum || here > RIPPLE) continue;
    const { x, value } = localMinimum(powerAt, omega[n - 1] ?? 0, omega[n + 1] ?? 0);
    const attenuationDb = Math.min(DEEPEST_DB, -10 * Math.log10(Math.min(value, here)));
    if (attenuationDb >= LEAST_DB) dips.push({ omega: value <= here ? x : (omega[n] ?? 0), attenuationDb });
  }
  return dips;
}
