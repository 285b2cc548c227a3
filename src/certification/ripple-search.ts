import type { FilterPolynomials, FineRoot } from '../forms/index.js';

/** Golden-section steps: 0.618^44 = 6e-10 of the interval, and the level is flat there, so it is off by its square. */
const GOLDEN_STEPS = 44;
const GOLDEN = 0.6180339887498949;

/** Where a function with one maximum in the open interval has it. */
export function turningPoint(level: (x: number) => number, from: number, to: number): number {
  let [left, right] = [from, to];
  let inner = right - GOLDEN * (right - left);
  let outer = left + GOLDEN * (right - left);
  let [atInner, atOuter] = [level(inner), level(outer)];
  for (let step = 0; step < GOLDEN_STEPS; step++) {
    if (atInner > atOuter) {
      [right, outer, atOuter] = [outer, inner, atInner];
      inner = right - GOLDEN * (right - left);
      atInner = level(inner);
    } else {
      [left, inner, atInner] = [inner, outer, atOuter];
      outer = left + GOLDEN * (right - left);
      atOuter = level(outer);
    }
  }
  return (left + right) / 2;
}

/**
 * `ln |S11/S21|` at omega = 1/x from the zeros alone, factor by factor in 1/omega: `s - r = (j - x*r)/x`. At x = 0, infinite
 * frequency, it is finite only where there are as many finite transmission zeros as reflection zeros.
 */
export function logRatio(polynomials: FilterPolynomials, x: number): number {
  const { reflectionZeros, transmissionZeros, epsilon, epsilonR } = polynomials;
  let sum = Math.log(epsilon / epsilonR);
  for (const root of reflectionZeros) sum += logDistance(root, x);
  for (const root of transmissionZeros) sum -= logDistance(root, x);
  const surplus = reflectionZeros.length - transmissionZeros.length;
  return surplus === 0 ? sum : sum - surplus * Math.log(Math.abs(x));
}

/** `ln |j - x*r|`. */
function logDistance({ re, im, imRest = 0 }: FineRoot, x: number): number {
  return Math.log(Math.hypot(x * re, 1 - x * im - x * imRest));
}
