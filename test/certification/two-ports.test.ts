import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { certify } from '../../src/certification/index.js';
import type { Complex, CouplingMatrix, FilterPolynomials } from '../../src/forms/index.js';

/** Random matrices with roots computed from them in 80 digits: S11 differs from S22, zeros anywhere (see the script beside the file). */
interface TwoPort {
  readonly order: number;
  readonly values: readonly (readonly number[])[];
  readonly poles: readonly Complex[];
  readonly reflectionZeros: readonly Complex[];
  readonly transmissionZeros: readonly Complex[];
  readonly transmissionLead: Complex;
  readonly epsilon: number;
  readonly epsilonR: number;
}

const file = new URL('../../fixtures/certification/two-ports.json', import.meta.url);
const twoPorts = JSON.parse(readFileSync(file, 'utf8')) as readonly TwoPort[];

describe('certify(polynomials, matrix) for lossless two-ports that are not symmetric', () => {
  test.each(twoPorts.map((twoPort): [number, TwoPort] => [twoPort.order, twoPort]))('order %i', (order, twoPort) => {
    const { values, ...rest } = twoPort;
    const polynomials: FilterPolynomials = { ...rest, family: 'lossless' };
    const matrix: CouplingMatrix = { order, values, finiteZeros: twoPort.transmissionZeros.length };
    expect(certify(polynomials, matrix).filter((c) => !c.holds)).toEqual([]);
    const mirrored = polynomials.reflectionZeros.map((f) => ({ re: -f.re, im: f.im }));
    const swapped = certify({ ...polynomials, reflectionZeros: mirrored }, matrix).filter((c) => !c.holds);
    expect(swapped.map((c) => c.check.slice(0, 2))).toContain('C6');
    expect(swapped.map((c) => c.check.slice(0, 2))).toContain('C7');
  });
});
