import type { Complex, FilterPolynomials } from '../../../../forms/index.js';
import { type Labelled, labelledRoots } from './roots.js';

/** Zeros this many times farther out than the rest are told in words. */
const FAR = 3;

const sizeOf = ({ re, im }: Complex): number => Math.hypot(re, im);

/** A value with the word for it. */
function wordedText({ text, count }: Labelled, word: string): string {
  const words = count === 1 ? word : `${word}s`;
  if (text === '0') return `${words} at 0`;
  return text.endsWith(' at 0') ? text.replace(' at 0', ` ${words} at 0`) : `${text} ${words}`;
}

/** Words stand at the first value of each kind in the wide drawing. */
function named(groups: readonly Labelled[], word: string, isWide: boolean): Labelled[] {
  return groups.map((group, n) => (isWide && n === 0 ? { ...group, text: wordedText(group, word) } : group));
}

/** All roots with what labels say of them, sorted by where they are told. */
export interface Told {
  readonly poles: readonly Labelled[];
  readonly zeros: readonly Labelled[];
  readonly rings: readonly Labelled[];
  /** Transmission zeros that are shown; the others are far. */
  readonly shown: readonly Complex[];
  readonly far: readonly Labelled[];
  /** Off the axis: told below the plane where it is narrow, since their labels would squeeze it. */
  readonly aside: readonly Labelled[];
}

/** Sorts the roots of a response by where they are told. */
export function told({ poles, reflectionZeros, transmissionZeros }: FilterPolynomials, isWide: boolean): Told {
  const limit = FAR * Math.max(1, ...poles.map(sizeOf), ...reflectionZeros.map(sizeOf));
  const shown = transmissionZeros.filter((zero) => sizeOf(zero) <= limit);
  const far = transmissionZeros.filter((zero) => sizeOf(zero) > limit);
  const zeros = labelledRoots('transmission', shown);
  const isAside = ({ at }: Labelled): boolean => !isWide && Math.abs(at.re) > 1e-9;
  return {
    poles: labelledRoots('pole', poles),
    zeros: named(
      zeros.filter((group) => !isAside(group)),
      'transmission zero',
      isWide,
    ),
    rings: named(labelledRoots('reflection', reflectionZeros), 'reflection zero', isWide),
    shown,
    far: labelledRoots('transmission', far),
    aside: zeros.filter(isAside),
  };
}
