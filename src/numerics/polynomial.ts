import type { Complex } from './complex-type.js';
import { DOUBLED_ONE, DOUBLED_ZERO, type DoubledComplex, doubledMinusProduct } from './doubled.js';

/**
 * Ascending coefficients of the monic polynomial with the given roots, carried in doubled precision and rounded once at the
 * end: each is right to about an ulp unless the roots cancel it by more than 1e15. Cost O(n^2).
 */
export function coefficientsFromRoots(roots: readonly Complex[]): readonly Complex[] {
  let ascending: DoubledComplex[] = [DOUBLED_ONE];
  for (const root of roots) {
    const old = ascending;
    ascending = Array.from({ length: old.length + 1 }, (_, k) =>
      doubledMinusProduct(old[k - 1] ?? DOUBLED_ZERO, old[k] ?? DOUBLED_ZERO, root),
    );
  }
  return ascending.map(({ re, im }) => ({ re: re.hi + re.lo + 0, im: im.hi + im.lo + 0 }));
}
