import { describe, expect, it } from 'vitest';
import {
  annihilate,
  arrow,
  type Complex,
  type CouplingMatrix,
  design,
  FilterFailure,
  folded,
  generalizedChebyshev,
  scatteringAt,
  sweep,
  transversal,
} from '../../src/index.js';

// The limits that README.md and the doc comments state, measured.

const certified = (order: number, returnLossDb: number, zero: number): boolean => {
  try {
    design({ passband: { lowerHz: 1e9, upperHz: 1.02e9 }, order, returnLossDb, transmissionZeros: [zero] });
    return true;
  } catch (error) {
    if (error instanceof FilterFailure && error.code === 'E_CERT') return false;
    throw error;
  }
};

describe('how close to the band edge a zero may lie', () => {
  it.each([6, 10, 20, 40])(
    'order %i: 1 + 5e-7 at 20 dB and 1 + 1e-4 at 60 dB are certified, 1 + 1e-8 is not',
    (order) => {
      expect([certified(order, 20, 1 + 5e-7), certified(order, 60, 1 + 1e-4)]).toEqual([true, true]);
      expect(certified(order, 20, 1 + 1e-8)).toBe(false);
    },
  );
});

describe('the deep stop band', () => {
  const response = generalizedChebyshev({ order: 20, returnLossDb: 20, transmissionZeros: [1.1, -1.15, 1.3, -1.4] });
  const start = transversal(response);
  const { matrix } = folded(start);

  /** Where the response has fallen to a level beyond its last zero. */
  const frequencyAt = (levelDb: number): number => {
    let omega = 1.5;
    for (;;) {
      const { s21 } = scatteringAt(response, omega);
      if (20 * Math.log10(Math.hypot(s21.re, s21.im)) <= levelDb) return omega;
      omega *= 1.01;
    }
  };

  const errorOf = (omega: number, s21: Complex): number => {
    const right = scatteringAt(response, omega).s21;
    return Math.hypot(s21.re - right.re, s21.im - right.im) / Math.hypot(right.re, right.im);
  };

  it('loses the digits of S21 in a sweep of a matrix and in a transversal matrix, not in a folded one that is solved', () => {
    const levels = [-150, -200, -250, -320];
    const rows = levels.map((levelDb) => {
      const omega = frequencyAt(levelDb);
      const swept = sweep(matrix, [omega]).s21;
      return {
        swept: errorOf(omega, { re: swept.re[0] as number, im: swept.im[0] as number }),
        transversal: errorOf(omega, scatteringAt(start, omega).s21),
        folded: errorOf(omega, scatteringAt(matrix, omega).s21),
      };
    });
    rows.forEach((row, n) => {
      const shown = Object.entries(row).map(([name, error]) => `${name} ${error.toExponential(0)}`);
      console.log(`relative error of S21 at ${levels[n]} dB, order 20: ${shown.join(', ')}`);
      expect(row.folded).toBeLessThan(1e-12);
    });
    expect(rows[1]?.swept).toBeLessThan(1e-5);
    expect(rows[2]?.swept).toBeLessThan(1e-3);
    expect(rows[3]?.swept).toBeGreaterThan(0.1);
    expect(rows[3]?.transversal).toBeGreaterThan(0.1);
  });
});

describe('arrow form from the transversal matrix by a one-sided elimination', () => {
  it('puts more than 0.01 into load couplings that must vanish at order 64, where arrow() leaves rounding', () => {
    const order = 64;
    const start = transversal(
      generalizedChebyshev({ order, returnLossDb: 40, transmissionZeros: [1.2, 1.3, -1.5, -1.05] }),
    );
    let matrix: CouplingMatrix = start;
    for (let row = 0; row < order - 1; row++) {
      for (let k = order; k > row + 1; k--)
        matrix = annihilate(matrix, { pivot: [row + 1, k], element: [row, k] }).matrix;
    }
    const stray = Math.max(...matrix.values.slice(1, order - 4).map((values) => Math.abs(values[order + 1] as number)));
    console.log(`one-sided elimination, order 64 at 40 dB: load couplings that must vanish reach ${stray.toFixed(2)}`);
    expect(stray).toBeGreaterThan(0.01);
    expect(arrow(start).leftover).toBeLessThan(1e-14);
  });
});
