import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { predistort, responseFromRoots } from '../../../src/approximation/index.js';
import type { Complex } from '../../../src/forms/index.js';
import { hasMpmath } from '../../support/tools.js';
import { rootError } from './compare.js';

// Reference: test/reference/make_given.py, Python with mpmath at 120 digits, expanded polynomials; fixtures/reference/given.md.

interface Row {
  readonly order: number;
  readonly poles: readonly (readonly [number, number])[];
  readonly transmissionZeros: readonly number[];
  readonly epsilon: string;
  readonly reflectionZeros: readonly (readonly [string, string])[];
}

const FILE = resolve(import.meta.dirname, '../../../fixtures/reference/given.json');
const TEXT = readFileSync(FILE, 'utf8');
const ROWS: readonly Row[] = JSON.parse(TEXT);
const NAMED = ROWS.map((row) => [row.order, row.transmissionZeros.length, row] as const);

const polesOf = ({ poles }: Row): readonly Complex[] => poles.map(([re, im]) => ({ re, im }));
const zerosOf = ({ reflectionZeros }: Row): readonly Complex[] =>
  reflectionZeros.map(([re, im]) => ({ re: Number(re), im: Number(im) }));

describe('random responses whose |S21| just reaches 1, against references of 60 digits', () => {
  it.each(NAMED)('order %i, %i transmission zeros: reflection zeros to 1e-12', (_order, _zeros, row) => {
    const { transmissionZeros } = row;
    const found = responseFromRoots({ poles: polesOf(row), transmissionZeros, epsilon: Number(row.epsilon) });
    expect(rootError(found.reflectionZeros, zerosOf(row))).toBeLessThan(1e-12);
    expect(found.reflectionZeros.filter(({ re }) => re === 0)).toHaveLength(1);
  });

  const allPole = NAMED.filter(([, zeros]) => zeros === 0);

  it.each(allPole)(
    'order %i, all poles moved back by predistortion: epsilon and reflection zeros',
    (_order, _, row) => {
      const loss = 0.25;
      const poles = polesOf(row).map(({ re, im }) => ({ re: re - loss, im }));
      // Any epsilon that passes no more than all power will do for the response with the poles moved left.
      const given = responseFromRoots({ poles, epsilon: 2 * Number(row.epsilon) });
      const { polynomials, flatLossDb } = predistort(given, { loss });
      expect(Math.abs(polynomials.epsilon / Number(row.epsilon) - 1)).toBeLessThan(1e-13);
      expect(Math.abs(flatLossDb + 20 * Math.log10(2))).toBeLessThan(1e-11);
      expect(rootError(polynomials.reflectionZeros, zerosOf(row))).toBeLessThan(1e-12);
    },
  );

  it.skipIf(!hasMpmath())('are made again by their generator, the same bytes', () => {
    const script = resolve(import.meta.dirname, '../../reference/make_given.py');
    expect(execFileSync('/usr/bin/python3', [script], { encoding: 'utf8' })).toBe(TEXT);
  });
});
