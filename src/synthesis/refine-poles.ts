import {
  type Doubled,
  type DoubledProduct,
  doubledAdd,
  doubledMultiply,
  doubledProduct,
  sumRest,
  timesConstant,
  timesPowerOfTwo,
} from '../numerics/index.js';
import type { LosslessForm, RootColumns } from './lossless-form.js';

/** Steps of the simultaneous iteration: it is quadratic and starts at 1e-16, so the second one reaches doubled precision. */
const STEPS = 2;

/** A step beyond this share of the distance to the nearest other root tells of a multiple pole, which is left as it is. */
const LARGEST_SHARE = 2 ** -10;

/**
 * The same form with poles that are the roots of `G = F F#/epsilonR^2 + P P#/epsilon^2` to about 30 digits, as pairs.
 *
 * Rounded poles break `|S11|^2 + |S21|^2 = 1` by some ulp, which a wide resonance on top of a narrow one magnifies; with
 * poles that fit F and P nothing is left to magnify. Each step divides G, a product in doubled precision, by the
 * distances of the pole from all others and from all mirrored ones, in doubles. Cost O(N^2).
 *
 * Source: simultaneous correction of all roots, E. Durand, Solutions numeriques des equations algebriques, 1960 (from memory).
 */
export function refinePoles(form: LosslessForm): LosslessForm {
  let refined = form;
  for (let step = 0; step < STEPS; step++) refined = { ...refined, poles: corrected(refined) };
  return refined;
}

function corrected(form: LosslessForm): RootColumns {
  const { order, poles } = form;
  const { re, reRest, im, imRest } = poles;
  const next = { re: re.slice(), reRest: reRest.slice(), im: im.slice(), imRest: imRest.slice() };
  const work = { phi: doubledProduct(1, 0), chi: doubledProduct(1, 0) };
  for (let k = 0; k < order; k++) {
    const step = stepOf(form, k, work);
    if (!(step.share < LARGEST_SHARE)) continue;
    // omega_k = im - j*re moves by minus the step.
    put(next.im, next.imRest, k, -step.re);
    put(next.re, next.reRest, k, step.im);
  }
  return next;
}

function put(hi: Float64Array, lo: Float64Array, k: number, change: number): void {
  const [old, rest] = [hi[k] as number, (lo[k] as number) + change];
  const value = old + rest;
  hi[k] = value;
  lo[k] = sumRest(old, rest, value);
}

/** `G/(prod of distances)` at pole k, a complex step in omega, and its share of the distance to the nearest other root. */
function stepOf(
  form: LosslessForm,
  k: number,
  { phi, chi }: { phi: DoubledProduct; chi: DoubledProduct },
): { re: number; im: number; share: number } {
  const { order, poles } = form;
  doubledProduct(1, 0, phi);
  doubledProduct(1, 0, chi);
  let [belowRe, belowIm, nearest] = [1, 0, Infinity];
  for (let n = 0; n < order; n++) {
    timesBoth(phi, form.reflectionZeros, n, poles, k);
    timesBoth(chi, form.transmissionZeros, n, poles, k);
    const x = difference(poles.im, poles.imRest, k, n);
    const toMirror = -((poles.re[k] as number) + (poles.re[n] as number));
    [belowRe, belowIm] = [belowRe * x - belowIm * toMirror, belowRe * toMirror + belowIm * x];
    nearest = Math.min(nearest, Math.hypot(x, toMirror));
    if (n !== k) {
      const y = -difference(poles.re, poles.reRest, k, n);
      [belowRe, belowIm] = [belowRe * x - belowIm * y, belowRe * y + belowIm * x];
      nearest = Math.min(nearest, Math.hypot(x, y));
    }
    const size = Math.abs(belowRe) + Math.abs(belowIm);
    if (size > LARGE || size < 1 / LARGE) {
      const power = size > LARGE ? 1 / LARGE : LARGE;
      [belowRe, belowIm] = [belowRe * power, belowIm * power];
      timesPowerOfTwo(phi, power);
      timesPowerOfTwo(chi, power);
    }
  }
  const g = energy(form, phi, chi);
  const square = belowRe * belowRe + belowIm * belowIm;
  const re = (g.re * belowRe + g.im * belowIm) / square;
  const im = (g.im * belowRe - g.re * belowIm) / square;
  return { re, im, share: Math.hypot(re, im) / nearest };
}

/** Running products are brought back here by an exact power of two. */
const LARGE: number = 2 ** 200;

function difference(hi: Float64Array, lo: Float64Array, k: number, n: number): number {
  return (hi[k] as number) - (hi[n] as number) + ((lo[k] as number) - (lo[n] as number));
}

/** Multiplies by `(omega_k - w)(omega_k - conj w)` for root n, `omega_k = im - j*re` of pole k. */
function timesBoth(product: DoubledProduct, roots: RootColumns, n: number, poles: RootColumns, k: number): void {
  if (n >= roots.re.length) return;
  const [a, b] = [poles.im[k] as number, roots.im[n] as number];
  const x = a - b;
  const xRest = sumRest(a, -b, x) + ((poles.imRest[k] as number) - (roots.imRest[n] as number));
  const [c, d] = [-(poles.re[k] as number), roots.re[n] as number];
  const cRest = -(poles.reRest[k] as number);
  timesConstant(product, x, xRest, c + d, sumRest(c, d, c + d) + cRest);
  timesConstant(product, x, xRest, c - d, sumRest(c, -d, c - d) + cRest);
}

/** `reflection^2 * phi + transmission^2 * chi`, what is left after the two cancel. */
function energy(form: LosslessForm, phi: DoubledProduct, chi: DoubledProduct): { re: number; im: number } {
  const reflected = doubledMultiply(form.reflection, form.reflection);
  const transmitted = doubledMultiply(form.transmission, form.transmission);
  const part = (at: number): number => {
    const sum = doubledAdd(doubledMultiply(reflected, pair(phi, at)), doubledMultiply(transmitted, pair(chi, at)));
    return sum.hi + sum.lo;
  };
  return { re: part(0), im: part(2) };
}

function pair(product: DoubledProduct, at: number): Doubled {
  return { hi: product[at] as number, lo: product[at + 1] as number };
}
