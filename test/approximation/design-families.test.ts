import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { bessel, elliptic, inlineMatrix, inverseChebyshev, prototypeElements } from '../../src/approximation/index.js';
import { design } from '../../src/design.js';
import type { FilterPolynomials } from '../../src/forms/index.js';
import type { SpecificationInput } from '../../src/specification/index.js';
import { fill, folderWith, running } from '../command-line/room.js';
import { matrixGap } from '../support/models.js';

const folder = new URL('../../fixtures/designs-families/', import.meta.url);
const names = readdirSync(folder).filter((name) => name.endsWith('.json'));
const read = (name: string): SpecificationInput => JSON.parse(readFileSync(new URL(name, folder), 'utf8'));

/** What each design file asks for, made by the family's own function. */
const EXPECTED: Readonly<Record<string, () => FilterPolynomials>> = {
  'heron-gate.json': () => elliptic({ order: 7, returnLossDb: 20, rejectionDb: 70 }),
  'mallow-bank.json': () => elliptic({ order: 6, returnLossDb: 20, stopBandEdge: 1.35, largestPairAtInfinity: true }),
  'sorrel-hill.json': () => inverseChebyshev({ order: 4, returnLossDb: 20, rejectionDb: 50 }),
  'plover-sound.json': () => bessel({ order: 5, edge: 'halfPower' }),
};

describe('design files of the classical families', () => {
  test.each(names)('%s is designed, certified, and meets its mask', (name) => {
    const result = design(read(name));
    expect(result.polynomials).toEqual(EXPECTED[name]?.());
    expect(result.certificates.filter(({ holds }) => !holds)).toEqual([]);
    expect(result.mask.filter(({ margin }) => !(margin >= 0))).toEqual([]);
  });

  test.each(names)('%s runs through the program, and its result through analyze', async (name) => {
    const here = folderWith(read(name));
    const made = await running(here, ['design', 'one.json', '--out', 'made']);
    expect([made.status, made.stderr]).toEqual([0, '']);
    const looked = await running(here, ['analyze', 'made/result.json', '--json']);
    expect([looked.status, looked.stderr]).toEqual([0, '']);
    const { certificates } = JSON.parse(looked.stdout) as { certificates: readonly { check: string }[] };
    // The law of the family is looked at again.
    expect(certificates.filter(({ check }) => check.startsWith('C4')).length).toBeGreaterThan(1);
  });

  test('a matrix file that states one of them is certified against it', async () => {
    const { matrix } = design(read('sorrel-hill.json'));
    const stated = { family: 'inverseChebyshev', returnLossDb: 20, rejectionDb: 50 };
    const here = folderWith({ matrix: matrix.values, ...stated });
    expect((await running(here, ['analyze', 'one.json'])).status).toBe(0);
    fill(here, { 'two.json': JSON.stringify({ matrix: matrix.values, ...stated, rejectionDb: 49 }) });
    expect((await running(here, ['analyze', 'two.json'])).status).toBe(3);
  });

  test('a rotation file starts from one of them', async () => {
    const response = { family: 'elliptic', order: 4, returnLossDb: 20, rejectionDb: 40 };
    const here = folderWith({ response, steps: [{ pivot: [1, 2], angleDegrees: 10 }] });
    expect((await running(here, ['rotate', 'one.json'])).status).toBe(0);
  });

  test('the in-line flat-delay design is the ladder', () => {
    const { matrix } = design(read('plover-sound.json'));
    expect(matrixGap(matrix, inlineMatrix(prototypeElements({ family: 'bessel', order: 5 })))).toBeLessThan(1e-13);
  });

  test.each([
    ['bessel', 25, 'left'],
    ['bessel', 25, 'right'],
    ['bessel', 60, 'alternating'],
  ] as const)('%s of the largest order that is let in, %d, %s, is certified', (family, order, reflectionSide) => {
    const passband = { lowerHz: 1e9, upperHz: 1.1e9 };
    for (const topology of ['folded', 'arrow', 'inline', 'transversal'] as const) {
      const { certificates } = design({ passband, family, order, reflectionSide, topology });
      expect(certificates.every(({ holds }) => holds)).toBe(true);
    }
  });
});
