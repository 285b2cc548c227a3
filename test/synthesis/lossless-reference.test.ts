import { execFileSync } from 'node:child_process';
import { resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { certify } from '../../src/certification/index.js';
import type { CouplingMatrix } from '../../src/forms/index.js';
import { sweep } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { arrow, folded } from '../../src/topology/index.js';
import { errorOf, LOSSLESS, LOSSLESS_LINES, type LosslessCase, polynomialsOf } from '../support/lossless-reference.js';
import { hasMpmath } from '../support/tools.js';

/** Asked of every case whose roots, as doubles, carry S that far. */
const LIMIT = 1e-12;

const EPS = 2 ** -52;

/**
 * What an ulp of the largest part of a pole does to S on its own resonance, at worst over the poles: the resolution of the
 * doubles that go in, and of the diagonal entries that come out. `floor` is what the actual rounding of the roots does at
 * the frequencies looked at, by luck less.
 */
const resolution = ({ poles }: LosslessCase): number =>
  poles.re.reduce((worst, re, k) => Math.max(worst, (EPS * Math.hypot(re, poles.im[k] as number)) / -re), 0);

/**
 * The limit, or where rounding the roots alone moves S by as much, what it moves S by; twice that where entries of a rotated
 * matrix are rounded, several of which act on one resonance.
 */
const roomOf = (each: LosslessCase, roundings = 1): number =>
  Math.max(LIMIT, 2 * roundings * each.floor, roundings * resolution(each));

const isHard = ({ id }: LosslessCase): boolean => id >= 107;

interface Form {
  readonly name: string;
  readonly make: (start: CouplingMatrix) => CouplingMatrix;
  readonly roundings: number;
}

const FORMS: readonly Form[] = [
  { name: 'transversal', make: (start) => start, roundings: 1 },
  { name: 'folded', make: (start) => folded(start).matrix, roundings: 2 },
  { name: 'arrow', make: (start) => arrow(start).matrix, roundings: 2 },
];

describe('complex S11, S21, S12, S22 with S11 different from S22, against references of more than 100 digits', () => {
  it('are 124 cases to order 40, every kind of zeros, the hard ones among them', () => {
    expect(LOSSLESS.cases).toHaveLength(124);
    expect(Math.max(...LOSSLESS.cases.map(({ order }) => order))).toBe(40);
    const styles = new Set(LOSSLESS.cases.map(({ style }) => style));
    for (const style of ['left', 'right', 'mixed', 'pairs', 'canonical', 'repeated', 'gap 1e-12', 'gap 0'])
      expect(styles).toContain(style);
    const ordinary = LOSSLESS.cases.filter((each) => !isHard(each));
    // In nearly all of them the fixed limit is what holds, not the floor.
    expect(ordinary.filter((each) => roomOf(each) === LIMIT).length).toBeGreaterThanOrEqual(100);
    const differ = LOSSLESS.cases.filter((each) =>
      each.s11.re.some((re, n) => Math.abs(re - (each.s22.re[n] as number)) > 1e-9),
    );
    expect(differ.length).toBeGreaterThan(110);
  });

  it.each(FORMS)('$name', ({ name, make, roundings }) => {
    const beyond: string[] = [];
    const worst = { within: 0, share: 0, hard: '' };
    for (const each of LOSSLESS.cases) {
      const error = errorOf(make(transversal(polynomialsOf(each))), each);
      if (roomOf(each, roundings) === LIMIT) worst.within = Math.max(worst.within, error);
      else worst.share = Math.max(worst.share, error / roomOf(each, roundings));
      if (isHard(each))
        worst.hard += `\n  ${each.style}: ${error.toExponential(1)} (floor ${each.floor.toExponential(1)})`;
      if (!(error <= roomOf(each, roundings)))
        beyond.push(`case ${each.id} ${each.style}: ${error}, floor ${each.floor}`);
    }
    console.log(
      `${name}: worst ${worst.within.toExponential(1)} where ${LIMIT} is asked, ${worst.share.toFixed(2)} of what rounding does elsewhere; hard cases:${worst.hard}`,
    );
    expect(beyond).toEqual([]);
  });

  it('a sweep of the transversal matrix is as exact', () => {
    for (const each of LOSSLESS.cases) {
      const { s11, s22, s21 } = sweep(transversal(polynomialsOf(each)), each.omega);
      each.omega.forEach((_, n) => {
        for (const [curve, right] of [
          [s11, each.s11],
          [s22, each.s22],
          [s21, each.s21],
        ] as const) {
          const error = Math.hypot(curve.re[n]! - right.re[n]!, curve.im[n]! - right.im[n]!);
          expect(error, `case ${each.id}`).toBeLessThan(roomOf(each, 2));
        }
      });
    }
  });

  it('every certificate holds for all three forms, where the polynomials carry nine digits', () => {
    let certified = 0;
    for (const each of LOSSLESS.cases) {
      if (each.floor > 1e-11) continue;
      const polynomials = polynomialsOf(each);
      const start = transversal(polynomials);
      const { matrix, rotations, leftover } = folded(start);
      const direct = certify(polynomials, start, { structure: 'transversal' });
      const rotated = certify(polynomials, matrix, { structure: 'folded', before: start, rotations, leftover });
      const bent = certify(polynomials, arrow(start).matrix, { structure: 'arrow', before: start });
      const failed = [...direct, ...rotated, ...bent].filter(({ holds }) => !holds);
      expect(failed, `case ${each.id} ${each.style}`).toEqual([]);
      certified++;
    }
    expect(certified).toBeGreaterThan(115);
  });
});

describe('the reference itself', () => {
  it.skipIf(!hasMpmath())('is made again for nine cases with the same bytes', () => {
    const remade = execFileSync(
      '/usr/bin/python3',
      ['test/reference/make_lossless.py', 'remake', ...LOSSLESS.remakeIds.map(String)],
      { cwd: resolve(import.meta.dirname, '../..'), encoding: 'utf8' },
    );
    const lines = remade.trim().split('\n');
    expect(lines).toHaveLength(9);
    expect(lines.filter((line) => !LOSSLESS_LINES.includes(line))).toEqual([]);
  });
});
