import type { FineRoot } from '../../forms/index.js';
import { refusal } from '../../numerics/index.js';
import { isConjugate } from './half-roots.js';

/**
 * In which half plane each reflection zero off the axis lies: all on one side, alternating by falling frequency from the left
 * on (a zero and its conjugate on the same side when the response is symmetric), or a sign for each zero by falling frequency.
 */
export type ReflectionSides = 'left' | 'right' | 'alternating' | readonly number[];

/**
 * Zeros of the closed left half plane on their sides, by falling frequency.
 *
 * @throws FilterFailure E_CHOICE
 */
export function onSides(zeros: readonly FineRoot[], sides: ReflectionSides = 'left'): readonly FineRoot[] {
  const sorted = [...zeros].sort((a, b) => b.im - a.im || a.re - b.re);
  if (sides === 'left') return sorted;
  if (sides === 'right') return sorted.map(mirrored);
  if (sides === 'alternating') return alternated(sorted);
  if (Array.isArray(sides) && sides.length === zeros.length && sides.every((sign) => sign === 1 || sign === -1))
    return sorted.map((zero, n) => (sides[n] === 1 ? mirrored(zero) : zero));
  throw refusal(
    'E_CHOICE',
    'reflectionZeros',
    sides,
    `"left", "right", "alternating" or a list of ${zeros.length} signs, -1 (left) or 1 (right)`,
    'write one of these',
  );
}

function alternated(sorted: readonly FineRoot[]): readonly FineRoot[] {
  const isSymmetric = isConjugate(sorted);
  let turn = 0;
  const upper = sorted.map((zero) => {
    if (zero.re === 0 || (isSymmetric && zero.im < 0)) return zero;
    return turn++ % 2 === 1 ? mirrored(zero) : zero;
  });
  if (!isSymmetric) return upper;
  const above = upper.filter(({ im }) => im > 0);
  return [...upper.filter(({ im }) => im >= 0), ...above.map(conjugated).reverse()];
}

const conjugated = (zero: FineRoot): FineRoot =>
  zero.imRest === undefined ? { re: zero.re, im: -zero.im } : { re: zero.re, im: -zero.im, imRest: -zero.imRest };

const mirrored = (zero: FineRoot): FineRoot => (zero.re === 0 ? zero : { ...zero, re: -zero.re });
