import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { jacobi } from '../../src/approximation/elliptic/jacobi.js';
import { modulusOf, modulusOfDecay, partOfQuarterPeriod } from '../../src/approximation/elliptic/modulus.js';
import { EPS } from '../../src/numerics/index.js';

const decays = fc.double({ min: 0.2, max: 60, noNaN: true });
const parts = fc.double({ min: 0.001, max: 0.999, noNaN: true });

/** Relative distance in units of eps. */
const units = (value: number, right: number): number => Math.abs(value / right - 1) / EPS;

describe('moduli', () => {
  test('k^2 + kPrime^2 = 1, the other nome exchanges them, and the way back gives the nome', () => {
    fc.assert(
      fc.property(decays, (decay) => {
        const { k, kPrime } = modulusOfDecay(decay);
        expect(Math.abs(k * k + kPrime * kPrime - 1)).toBeLessThan(40 * EPS);
        const other = modulusOfDecay(Math.PI ** 2 / decay);
        expect(units(other.k, kPrime)).toBeLessThan(400);
        // The nome is a logarithm of k or of kPrime: an error of one is a smaller one of the other.
        expect(units(modulusOf(k, kPrime).decay, decay)).toBeLessThan(400);
      }),
      { seed: 1, numRuns: 300 },
    );
  });

  test('equal moduli have the nome exp(-pi)', () => {
    const { k, kPrime } = modulusOfDecay(Math.PI);
    expect(units(k, Math.SQRT1_2)).toBeLessThan(8);
    expect(units(kPrime, Math.SQRT1_2)).toBeLessThan(8);
  });
});

describe('sn, cn, dn', () => {
  test('sn^2 + cn^2 = 1 and dn^2 = kPrime^2 + k^2 cn^2', () => {
    fc.assert(
      fc.property(decays, parts, (decay, part) => {
        const modulus = modulusOfDecay(decay);
        const { sn, cn, dn } = jacobi(part, 1 - part, modulus);
        expect(Math.abs(sn * sn + cn * cn - 1)).toBeLessThan(100 * EPS);
        expect(units(dn * dn, modulus.kPrime ** 2 + (modulus.k * cn) ** 2)).toBeLessThan(400);
      }),
      { seed: 2, numRuns: 300 },
    );
  });

  // Closed forms at half of the quarter period, and at its ends; common practice, no source.
  test('at K/2: 1/sqrt(1 + kPrime), sqrt(kPrime/(1 + kPrime)), sqrt(kPrime)', () => {
    fc.assert(
      fc.property(decays, (decay) => {
        const modulus = modulusOfDecay(decay);
        const { kPrime } = modulus;
        const { sn, cn, dn } = jacobi(0.5, 0.5, modulus);
        expect(units(sn, 1 / Math.sqrt(1 + kPrime))).toBeLessThan(100);
        expect(units(cn, Math.sqrt(kPrime / (1 + kPrime)))).toBeLessThan(200);
        expect(units(dn, Math.sqrt(kPrime))).toBeLessThan(200);
      }),
      { seed: 3, numRuns: 300 },
    );
  });

  test.each([0.3, 2, 3.2, 20])('at both ends, nome exp(-%d)', (decay) => {
    const modulus = modulusOfDecay(decay);
    const [start, end] = [jacobi(0, 1, modulus), jacobi(1, 0, modulus)];
    expect(start.sn).toBe(0);
    expect(units(start.cn, 1)).toBeLessThan(40);
    expect(units(start.dn, 1)).toBeLessThan(40);
    expect(units(end.sn, 1)).toBeLessThan(40);
    expect(Math.abs(end.cn)).toBe(0);
    expect(units(end.dn, modulus.kPrime)).toBeLessThan(80);
  });
});

test('the part of the quarter period is where sn/cn of the complementary modulus reaches the tangent', () => {
  fc.assert(
    fc.property(decays, fc.double({ min: -3, max: 3, noNaN: true }), (decay, exponent) => {
      const tangent = 10 ** exponent;
      const part = partOfQuarterPeriod(tangent, modulusOfDecay(decay));
      fc.pre(part < 0.999);
      const { sn, cn } = jacobi(part, 1 - part, modulusOfDecay(Math.PI ** 2 / decay));
      // The quotient multiplies an error of the part by its logarithmic slope, which pi^2/decay and 1/(1 - part) bound.
      const steepness = 1 + Math.PI ** 2 / decay + decay + 1 / (1 - part);
      expect(units(sn / cn, tangent)).toBeLessThan(20 * steepness);
    }),
    { seed: 4, numRuns: 300 },
  );
});
