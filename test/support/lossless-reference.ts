import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import type { Complex, CouplingMatrix, FilterPolynomials } from '../../src/forms/index.js';
import { type Model, scatteringAt } from '../../src/response/index.js';

// Reference: test/reference/make_lossless.py, Python with mpmath at more than 100 digits, expanded polynomials; it shares
// nothing with the engine. fixtures/reference/README.md.

interface Columns {
  readonly re: readonly number[];
  readonly im: readonly number[];
}

/** One response of the fixture; `floor` is what rounding its roots and constants to doubles does to S at its frequencies. */
export interface LosslessCase {
  readonly id: number;
  readonly style: string;
  readonly order: number;
  readonly floor: number;
  readonly poles: Columns;
  readonly reflectionZeros: Columns;
  readonly transmissionZeros: Columns;
  readonly lead: Complex;
  readonly epsilon: number;
  readonly epsilonR: number;
  readonly omega: readonly number[];
  readonly s11: Columns;
  readonly s21: Columns;
  readonly s22: Columns;
}

const text = readFileSync(resolve(import.meta.dirname, '../../fixtures/reference/lossless.json'), 'utf8');

/** The lines of the fixture as they stand. */
export const LOSSLESS_LINES: readonly string[] = text.split('\n').map((line) => line.replace(/,$/, ''));

/** The fixture. */
export const LOSSLESS: { readonly cases: readonly LosslessCase[]; readonly remakeIds: readonly number[] } =
  JSON.parse(text);

/** The roots of a case as doubles. */
export function polynomialsOf(each: LosslessCase): FilterPolynomials {
  const roots = ({ re, im }: Columns): Complex[] => re.map((value, n) => ({ re: value, im: im[n] as number }));
  return {
    family: 'lossless',
    order: each.order,
    poles: roots(each.poles),
    reflectionZeros: roots(each.reflectionZeros),
    transmissionZeros: roots(each.transmissionZeros),
    transmissionLead: each.lead,
    epsilon: each.epsilon,
    epsilonR: each.epsilonR,
  };
}

/** Largest error of complex S11, S21, S12 and S22 of a model over the frequencies of a case. */
export function errorOf(model: Model | CouplingMatrix, each: LosslessCase): number {
  return each.omega.reduce((worst, omega, n) => {
    const { s11, s21, s12, s22 } = scatteringAt(model, omega);
    const off = (s: Complex, right: Columns): number =>
      Math.hypot(s.re - (right.re[n] as number), s.im - (right.im[n] as number));
    return Math.max(worst, off(s11, each.s11), off(s21, each.s21), off(s12, each.s21), off(s22, each.s22));
  }, 0);
}
