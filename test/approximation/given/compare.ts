import type { Complex, FilterPolynomials } from '../../../src/forms/index.js';
import type { Model } from '../../../src/response/index.js';
import { sweep } from '../../../src/response/index.js';

/** Frequencies over the band and what is next to it. */
export const GRID: readonly number[] = Array.from({ length: 301 }, (_, n) => -1.5 + n / 100);

/** Largest difference of complex S11, S21 and S22 between two models. */
export function differenceOf(a: Model, b: Model, omega: readonly number[] = GRID): number {
  const [x, y] = [sweep(a, omega), sweep(b, omega)];
  return omega.reduce((worst, _, n) => {
    const gaps = (['s11', 's21', 's22'] as const).map((key) =>
      Math.hypot(
        (x[key].re[n] as number) - (y[key].re[n] as number),
        (x[key].im[n] as number) - (y[key].im[n] as number),
      ),
    );
    return Math.max(worst, ...gaps);
  }, 0);
}

/** Largest distance of a root from the nearest of another list, each taken once. */
export function rootError(roots: readonly Complex[], right: readonly Complex[]): number {
  const open = [...right];
  if (roots.length !== right.length) return Number.POSITIVE_INFINITY;
  return roots.reduce((worst, { re, im }) => {
    const gaps = open.map((other) => Math.hypot(other.re - re, other.im - im));
    const gap = Math.min(...gaps);
    open.splice(gaps.indexOf(gap), 1);
    return Math.max(worst, gap);
  }, 0);
}

/** |S21|^2 of a response symmetric about 0 by roots in omega^2: `x = -s^2` for each pole, twice for one of each zero +-z. */
export function squareRootsOf(response: FilterPolynomials): {
  readonly numerator: { readonly roots: readonly Complex[]; readonly lead: number };
  readonly denominator: { readonly roots: readonly Complex[]; readonly lead: number };
} {
  const square = ({ re, im }: Complex): Complex => ({ re: im * im - re * re, im: -2 * re * im });
  return {
    numerator: { roots: response.transmissionZeros.map(square), lead: 1 },
    denominator: { roots: response.poles.map(square), lead: response.epsilon ** 2 },
  };
}
