import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, test } from 'vitest';
import { bessel, elliptic, inlineMatrix, inverseChebyshev, prototypeElements } from '../../src/approximation/index.js';
import { design } from '../../src/design.js';
import type { FilterPolynomials } from '../../src/forms/index.js';
import type { SpecificationInput } from '../../src/specification/index.js';
import { matrixGap } from '../support/models.js';

const folder = resolve(import.meta.dirname, '../../fixtures/designs-families');
const read = (name: string): SpecificationInput => JSON.parse(readFileSync(resolve(folder, name), 'utf8'));

/** What each design file asks for, made by the family's own function. */
const EXPECTED: Readonly<Record<string, () => FilterPolynomials>> = {
  'heron-gate.json': () => elliptic({ order: 7, returnLossDb: 20, rejectionDb: 70 }),
  'mallow-bank.json': () => elliptic({ order: 6, returnLossDb: 20, stopBandEdge: 1.35, largestPairAtInfinity: true }),
  'sorrel-hill.json': () => inverseChebyshev({ order: 4, returnLossDb: 20, rejectionDb: 50 }),
  'plover-sound.json': () => bessel({ order: 5, edge: 'halfPower' }),
};

describe('design files of the classical families', () => {
  test.each(Object.keys(EXPECTED))('%s is designed, certified, and meets its mask', (name) => {
    const result = design(read(name));
    expect(result.polynomials).toEqual(EXPECTED[name]?.());
    // Documents tell the zeros from the specification.
    expect(result.specification.transmissionZeros).toEqual(result.polynomials.transmissionZeros);
    expect(result.certificates.filter(({ holds }) => !holds)).toEqual([]);
    expect(result.mask.filter(({ margin }) => !(margin >= 0))).toEqual([]);
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
