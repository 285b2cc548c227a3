import { describe, expect, it } from 'vitest';
import { certify } from '../../src/certification/index.js';
import type { Certificate, CouplingMatrix, FilterPolynomials } from '../../src/forms/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { LOSSLESS, polynomialsOf } from '../support/lossless-reference.js';
import { entry, withEntry } from '../support/models.js';

// Certificates of responses with S11 different from S22, shown planted faults that only such responses can have.

/** Cases of orders 3 to 12 with frequencies of size 1 whose roots carry twelve digits and whose ports differ by more than a thousandth. */
const CASES = LOSSLESS.cases.filter(
  ({ style, order, floor, reflectionZeros }) =>
    style !== 'scaled' &&
    order >= 3 &&
    order <= 12 &&
    floor < 1e-13 &&
    Math.max(...reflectionZeros.re.map(Math.abs)) > 1e-3,
);

const failed = (polynomials: FilterPolynomials, matrix: CouplingMatrix): string[] =>
  certify(polynomials, matrix)
    .filter(({ holds }: Certificate) => !holds)
    .map(({ check }) => check.slice(0, 2));

/** The matrix with source and load exchanged: S11 and S22 change places. */
function exchanged(matrix: CouplingMatrix): CouplingMatrix {
  const last = matrix.order + 1;
  const place = (i: number): number => (i === 0 ? last : i === last ? 0 : i);
  return { ...matrix, values: matrix.values.map((row, i) => row.map((_, j) => entry(matrix, place(i), place(j)))) };
}

describe('certificates with S11 different from S22', () => {
  it('are tried on forty cases', () => {
    expect(CASES.length).toBeGreaterThan(40);
  });

  it('hold for the matrix, and C6 and C7 fail for the one with its ports exchanged', () => {
    for (const each of CASES) {
      const polynomials = polynomialsOf(each);
      const matrix = transversal(polynomials);
      expect(failed(polynomials, matrix), `case ${each.id}`).toEqual([]);
      const faults = failed(polynomials, exchanged(matrix));
      expect(faults, `case ${each.id}`).toContain('C6');
      // |f| of both sides add to the sums of C7, which zeros that balance left and right may leave alone.
      const balance = Math.abs(each.reflectionZeros.re.reduce((sum, re) => sum + re, 0));
      if (balance > 1e-6) expect(faults, `case ${each.id}`).toContain('C7');
    }
  });

  it('C6 fails when the reflection zeros lie on the other side', () => {
    for (const each of CASES) {
      const polynomials = polynomialsOf(each);
      const mirrored = {
        ...polynomials,
        reflectionZeros: polynomials.reflectionZeros.map(({ re, im }) => ({ re: -re, im })),
      };
      expect(failed(mirrored, transversal(polynomials)), `case ${each.id}`).toContain('C6');
      expect(failed(mirrored, transversal(mirrored)), `case ${each.id}`).toEqual([]);
    }
  });

  it('C6 and C7 see one port coupling that is off by 1e-11 of the largest', () => {
    for (const each of CASES) {
      const polynomials = polynomialsOf(each);
      const matrix = transversal(polynomials);
      const largest = Math.max(...matrix.values.flat().map(Math.abs));
      const changed = withEntry(matrix, 0, 2, entry(matrix, 0, 2) + 1e-11 * largest);
      const faults = failed(polynomials, changed);
      expect(faults.length, `case ${each.id}`).toBeGreaterThan(0);
    }
  });

  it('C2 sees one reflection zero that is off by 1e-10', () => {
    for (const each of CASES) {
      const polynomials = polynomialsOf(each);
      const [first, ...others] = polynomials.reflectionZeros;
      const moved = { re: (first?.re as number) + 1e-10, im: first?.im as number };
      const changed = { ...polynomials, reflectionZeros: [moved, ...others] };
      expect(failed(changed, transversal(polynomials)), `case ${each.id}`).toContain('C2');
    }
  });
});
