import { describe, expect, it } from 'vitest';
import { bessel, butterworth, chebyshev, generalizedChebyshev, predistort } from '../../../src/approximation/index.js';
import type { FilterPolynomials } from '../../../src/forms/index.js';
import { FilterFailure } from '../../../src/numerics/index.js';
import { sweep } from '../../../src/response/index.js';
import { transversal } from '../../../src/synthesis/index.js';
import { GRID } from '../given/compare.js';

// Oracle: the definition. A common loss is s -> s + loss (Dishal 1949, from memory), so the lossy response of what is built, swept
// from its coupling matrix, is the lossless shape, which the families know in closed form, lower by one number.

const ORDERS = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12];

const FAMILIES: readonly (readonly [string, FilterPolynomials])[] = ORDERS.flatMap((order) => [
  [`butterworth ${order}`, butterworth({ order })] as const,
  [`chebyshev ${order}, 20 dB`, chebyshev({ order, returnLossDb: 20 })] as const,
  [`chebyshev ${order}, 6 dB`, chebyshev({ order, returnLossDb: 6 })] as const,
  [`bessel ${order}`, bessel({ order, edge: 'halfPower' })] as const,
]);

const decibels = (re: number, im: number): number => 10 * Math.log10(re * re + im * im);

/** |S21| in dB over the grid. */
function transmission(...arguments_: Parameters<typeof sweep>): readonly number[] {
  const { s21 } = sweep(...arguments_);
  return Array.from(s21.re, (re, n) => decibels(re, s21.im[n] as number));
}

const reach = ({ poles }: FilterPolynomials): number => Math.min(...poles.map(({ re }) => -re));

describe('a predistorted response', () => {
  it.each(FAMILIES)('with its loss has the lossless shape to 1e-9 dB: %s', (_, family) => {
    for (const part of [0.05, 0.5, 0.9]) {
      const loss = part * reach(family);
      const { polynomials, flatLossDb, shift } = predistort(family, { loss });
      expect(shift).toBe(loss);
      const shape = transmission(family, GRID);
      const lossy = transmission(transversal(polynomials), GRID, { loss });
      const worst = Math.max(...lossy.map((each, n) => Math.abs(each + flatLossDb - (shape[n] as number))));
      expect(worst).toBeLessThan(1e-9);
    }
  });

  it.each(FAMILIES)('passes all power at one frequency and never more: %s', (_, family) => {
    const { polynomials } = predistort(family, { loss: 0.5 * reach(family) });
    const fine = Array.from({ length: 4001 }, (_each, n) => -2 + n / 1000);
    const highest = Math.max(...transmission(polynomials, fine));
    expect(highest).toBeLessThan(1e-13);
    const peaks = polynomials.reflectionZeros.filter(({ re }) => re === 0).map(({ im }) => im);
    expect(peaks.length).toBeGreaterThan(0);
    for (const db of transmission(polynomials, peaks)) expect(Math.abs(db)).toBeLessThan(1e-13);
  });

  it('of order 1 loses what a closed form says', () => {
    // S21 = (1 - a)/(s + 1 - a), at center with loss a: 1 - a.
    for (const loss of [0.1, 0.5, 0.9]) {
      const { flatLossDb } = predistort(butterworth({ order: 1 }), { loss });
      expect(Math.abs(flatLossDb + 20 * Math.log10(1 - loss))).toBeLessThan(1e-13 / (1 - loss));
    }
  });

  it('takes out the share of the loss that is asked for', () => {
    const family = chebyshev({ order: 5, returnLossDb: 20 });
    const loss = 0.8 * reach(family);
    const { polynomials, flatLossDb, shift } = predistort(family, { loss, share: 0.5 });
    expect(shift).toBe(loss / 2);
    const rest = transmission(family, GRID, { loss: loss / 2 });
    const lossy = transmission(transversal(polynomials), GRID, { loss });
    expect(Math.max(...lossy.map((each, n) => Math.abs(each + flatLossDb - (rest[n] as number))))).toBeLessThan(1e-9);
  });

  it('holds on any frequency scale', () => {
    const family = chebyshev({ order: 6, returnLossDb: 20 });
    const plain = predistort(family, { loss: 0.05 });
    for (const unit of [1e-9, 1e9]) {
      const scaled: FilterPolynomials = {
        ...family,
        poles: family.poles.map(({ re, im }) => ({ re: re * unit, im: im * unit })),
        reflectionZeros: family.reflectionZeros.map(({ re, im }) => ({ re: re * unit, im: im * unit })),
        epsilon: family.epsilon * unit ** -6,
      };
      const { flatLossDb } = predistort(scaled, { loss: 0.05 * unit });
      expect(Math.abs(flatLossDb - plain.flatLossDb)).toBeLessThan(1e-12);
    }
  });

  const family = chebyshev({ order: 5, returnLossDb: 20 });

  it.each([
    ['a shift that reaches a pole', family, { loss: reach(family) }, 'E_LOSS'],
    ['a negative loss', family, { loss: -0.1 }, 'E_LOSS'],
    ['a share above 1', family, { loss: 0.01, share: 1.5 }, 'E_LOSS'],
    ['no loss', family, {} as { loss: number }, 'E_TYPE'],
    ['a loss that is no number', family, { loss: Number.NaN }, 'E_NOT_FINITE'],
    [
      'finite zeros',
      generalizedChebyshev({ order: 4, returnLossDb: 20, transmissionZeros: [1.5] }),
      { loss: 0.01 },
      'E_ZERO_COUNT',
    ],
  ])('refuses %s', (_, given, request, code) => {
    expect(() => predistort(given, request)).toThrow(expect.objectContaining({ code }));
  });

  it('says both numbers when a shift reaches a pole', () => {
    try {
      predistort(family, { loss: 0.5 });
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(FilterFailure);
      expect((error as FilterFailure).message).toContain('0.5');
      expect((error as FilterFailure).message).toContain(String(reach(family)));
    }
  });
});
