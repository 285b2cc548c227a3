import { describe, expect, test } from 'vitest';
import { bessel, elliptic, inverseChebyshev } from '../../src/approximation/index.js';
import { certify } from '../../src/certification/index.js';
import type { Complex, FilterPolynomials } from '../../src/forms/index.js';
import { transversal } from '../../src/synthesis/index.js';

/** The certificates of the law of a family that fail, with the matrix of the response as it was before the fault. */
function redLaws(sound: FilterPolynomials, fault: Partial<FilterPolynomials>): string[] {
  return certify({ ...sound, ...fault }, transversal(sound))
    .filter(({ check, holds }) => check.startsWith('C4') && !holds)
    .map(({ check }) => check);
}

/** Every root of a list times a factor next to 1, or one of them only. */
const scaledBy = (roots: readonly Complex[], factor: number, only?: number): Complex[] =>
  roots.map((root, n) => (only === undefined || only === n ? { re: root.re * factor, im: root.im * factor } : root));

const PASS = 'C4 ripple level against the return loss, dB';
const STOP = 'C4 ripple level of the stop band against the rejection, dB';
const ZEROS = 'C4 transmission zeros in the stop band';

describe('each certificate of a family goes red for a fault planted for it', () => {
  const steep = elliptic({ order: 6, returnLossDb: 20, rejectionDb: 50 });
  const moved = elliptic({ order: 6, returnLossDb: 20, rejectionDb: 50, largestPairAtInfinity: true });
  const inverse = inverseChebyshev({ order: 5, returnLossDb: 20, rejectionDb: 50 });

  test('elliptic', () => {
    for (const sound of [steep, moved]) {
      expect(redLaws(sound, {})).toEqual([]);
      expect(redLaws(sound, { rejectionDb: 50 + 1e-7 })).toEqual([STOP]);
      expect(redLaws(sound, { returnLossDb: 20 + 1e-7 })).toEqual([PASS]);
      expect(redLaws(sound, { stopBandEdge: sound.stopBandEdge! * (1 + 1e-7) })).toEqual([STOP]);
      expect(redLaws(sound, { epsilon: sound.epsilon * (1 + 1e-7) })).toEqual([STOP]);
      // Every zero matters by itself.
      for (let n = 0; n < sound.transmissionZeros.length; n++) {
        expect(redLaws(sound, { transmissionZeros: scaledBy(sound.transmissionZeros, 1 + 1e-6, n) })).toEqual([STOP]);
      }
      for (let n = 0; n < 6; n++) {
        const reflectionZeros = scaledBy(sound.reflectionZeros, 1 + 1e-6, n);
        expect(redLaws(sound, { reflectionZeros })).toEqual(expect.arrayContaining([PASS]));
      }
      expect(redLaws(sound, { transmissionZeros: sound.transmissionZeros.slice(1) })).toContain(ZEROS);
    }
    // A zero inside the stop band's edge, or off the axis, is none of the stop band.
    const inside = [{ re: 0, im: 1.1 }, ...steep.transmissionZeros.slice(1)];
    expect(redLaws(steep, { transmissionZeros: inside })).toContain(ZEROS);
    const off = [{ re: 1e-9, im: steep.transmissionZeros[0]!.im }, ...steep.transmissionZeros.slice(1)];
    expect(redLaws(steep, { transmissionZeros: off })).toContain(ZEROS);
    const { rejectionDb: _, ...silent } = steep;
    expect(certify(silent, transversal(steep)).filter(({ holds }) => !holds)).toHaveLength(1);
  });

  test('inverse Chebyshev', () => {
    const edges = 'C4 return loss at the edges, dB';
    expect(redLaws(inverse, {})).toEqual([]);
    expect(redLaws(inverse, { returnLossDb: 20 - 1e-7 })).toEqual([edges]);
    expect(redLaws(inverse, { rejectionDb: 50 - 1e-7 })).toEqual([STOP]);
    expect(redLaws(inverse, { transmissionZeros: scaledBy(inverse.transmissionZeros, 1 + 1e-6, 2) })).toContain(STOP);
    const displaced = [{ re: 0, im: 1e-9 }, ...inverse.reflectionZeros.slice(1)];
    expect(redLaws(inverse, { reflectionZeros: displaced })).toContain('C4 reflection zeros at the center');
  });

  test('Bessel', () => {
    const flat = 'C4 derivatives of the delay at the center, units of rounding';
    for (const order of [2, 3, 8, 20]) {
      const half = bessel({ order, edge: 'halfPower' });
      const unit = bessel({ order, edge: 'unitDelay' });
      expect(redLaws(half, {})).toEqual([]);
      expect(redLaws(unit, {})).toEqual([]);
      // The scale is what `edge` says, and nothing else.
      expect(redLaws(half, { edge: 'unitDelay' })).toEqual(['C4 delay at the center']);
      expect(redLaws(unit, { edge: 'halfPower' })).toEqual(['C4 half power at the edges']);
      expect(redLaws(unit, { poles: scaledBy(unit.poles, 1 + 1e-8) })).toEqual(['C4 delay at the center']);
      // A pair of poles moved by 1e-11 is seen in the derivatives.
      const pair = unit.poles.map((pole, n) =>
        n === 0 || n === order - 1 ? { re: pole.re * (1 + 1e-11), im: pole.im } : pole,
      );
      expect(redLaws(unit, { poles: pair })).toEqual([flat]);
      expect(redLaws(unit, { poles: scaledBy(unit.poles, 1 + 1e-6, 0) }).length).toBeGreaterThan(0);
    }
    const { edge: _, ...silent } = bessel({ order: 3, edge: 'halfPower' });
    const red = certify(silent, transversal(silent)).filter(({ holds }) => !holds);
    expect(red.map(({ check }) => check)).toEqual(['C4 half power at the edges']);
  });
});
