import type { Complex } from '../../../../forms/index.js';
import { minus } from '../../../svg/words.js';
import { figures, fixed, sizeText, trimmed } from '../../../words/numbers.js';

/** What a root is to the filter. */
export type RootKind = 'pole' | 'reflection' | 'transmission';

/** Roots that carry one label: a root with its mirror images and repetitions. */
export interface Labelled {
  readonly kind: RootKind;
  /** Where the label belongs: the image with the largest imaginary part, and of two at one height the right one. */
  readonly at: Complex;
  readonly text: string;
  /** How many roots it stands for. */
  readonly count: number;
}

/** Roots closer than half a digit of their labels are one. */
const SAME = 5e-4;

const near = (a: number, b: number): boolean => Math.abs(a - b) < SAME;

/** Three decimals, more where they would print a size as zero, fewer where they would say nothing. */
function sizeOf(value: number): string {
  const size = Math.abs(value);
  if (size > 0 && size < SAME) return size < 1e-9 ? sizeText(size) : figures(size, 2);
  return size < 100 ? fixed(size, 3) : trimmed(size, 1);
}

const signOf = (value: number, isBoth: boolean): string => (isBoth ? '±' : value < 0 ? '−' : '+');

/** Real and imaginary part; a part that is zero is left out. */
function rootText({ re, im }: Complex, bothRe: boolean, bothIm: boolean): string {
  const size = Math.hypot(re, im);
  if (Math.abs(re) <= 1e-9 * size || size === 0) return im === 0 ? '0' : `${signOf(im, bothIm)}j${sizeOf(im)}`;
  const real = `${bothRe ? '±' : re < 0 ? '−' : '+'}${sizeOf(re)}`;
  return near(im, 0) ? real : `${real} ${signOf(im, bothIm)} j${sizeOf(im)}`;
}

/** Groups roots with their mirror images in both axes, so that each group is labelled once. */
export function labelledRoots(kind: RootKind, roots: readonly Complex[]): Labelled[] {
  const count = (re: number, im: number): number =>
    roots.filter((root) => near(root.re, re) && near(root.im, im)).length;
  const groups: Labelled[] = [];
  const seen: Complex[] = [];
  const byHeight = [...roots].sort((a, b) => (near(a.im, b.im) ? b.re - a.re : b.im - a.im));
  for (const root of byHeight) {
    const { re, im } = root;
    if (seen.some((other) => near(other.re, re) && near(other.im, im))) continue;
    const own = count(re, im);
    const bothIm = !near(im, 0) && count(re, -im) === own;
    const bothRe = !near(re, 0) && count(-re, im) === own;
    for (const a of bothRe ? [re, -re] : [re]) for (const b of bothIm ? [im, -im] : [im]) seen.push({ re: a, im: b });
    const value = minus(rootText(root, bothRe, bothIm));
    const text = own === 1 ? value : value === '0' ? `${own} at 0` : `${own} × ${value}`;
    groups.push({ kind, at: root, text, count: own * (bothRe ? 2 : 1) * (bothIm ? 2 : 1) });
  }
  return groups;
}
