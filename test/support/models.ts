import type { Complex, CouplingMatrix, FilterPolynomials } from '../../src/forms/index.js';
import { type Model, scatteringAt } from '../../src/response/index.js';

/** Entry (i, j) of a coupling matrix. */
export const entry = (matrix: CouplingMatrix, i: number, j: number): number => matrix.values[i]![j]!;

/** A symmetric matrix from its entries with i <= j; the others are 0. */
export function matrixOf(order: number, entries: readonly (readonly [number, number, number])[]): CouplingMatrix {
  const values = Array.from({ length: order + 2 }, () => new Array<number>(order + 2).fill(0));
  for (const [i, j, value] of entries) {
    values[i]![j] = value;
    values[j]![i] = value;
  }
  return { order, values };
}

/** The same matrix with one entry (and its mirror) replaced. */
export function withEntry(matrix: CouplingMatrix, i: number, j: number, value: number): CouplingMatrix {
  const values = matrix.values.map((row) => [...row]);
  values[i]![j] = value;
  values[j]![i] = value;
  return { ...matrix, values };
}

/** A random symmetric matrix, ports coupled to everything, entries in (-1, 1). */
export function randomMatrix(order: number, random: () => number): CouplingMatrix {
  const values = Array.from({ length: order + 2 }, () => new Array<number>(order + 2).fill(0));
  for (let i = 0; i < order + 2; i++) {
    for (let j = i; j < order + 2; j++) {
      const port = (i === 0 || i === order + 1) && i === j;
      values[i]![j] = values[j]![i] = port ? 0 : 2 * random() - 1;
    }
  }
  return { order, values };
}

/** An in-line synchronous chain of the given couplings, source to load. */
export function chain(couplings: readonly number[]): CouplingMatrix {
  const order = couplings.length - 1;
  return matrixOf(
    order,
    couplings.map((value, i) => [i, i + 1, value] as const),
  );
}

/** Largest difference between entries of two matrices. */
export function matrixGap(a: CouplingMatrix, b: CouplingMatrix): number {
  let gap = 0;
  a.values.forEach((row, i) => {
    row.forEach((value, j) => {
      gap = Math.max(gap, Math.abs(value - entry(b, i, j)));
    });
  });
  return gap;
}

/** Largest absolute row sum. */
export const normOf = (matrix: CouplingMatrix): number =>
  Math.max(...matrix.values.map((row) => row.reduce((sum, value) => sum + Math.abs(value), 0)));

export const isSymmetric = (matrix: CouplingMatrix): boolean =>
  matrix.values.every((row, i) => row.every((value, j) => Object.is(value, entry(matrix, j, i))));

export const distance = (a: Complex, b: Complex): number => Math.hypot(a.re - b.re, a.im - b.im);

export const size = (a: Complex): number => Math.hypot(a.re, a.im);

/** Frequencies in the band, at its edges, in the stop band and far out. */
export const GRID: readonly number[] = [-20, -3, -1.5, -1.05, -1, -0.8, -0.3, 0, 0.1, 0.5, 0.95, 1, 1.2, 2, 7];

/** Largest difference of complex S11, S21, S12, S22 between two models over a grid. */
export function responseGap(a: Model, b: Model, grid: readonly number[] = GRID): number {
  let gap = 0;
  for (const omega of grid) {
    const x = scatteringAt(a, omega);
    const y = scatteringAt(b, omega);
    gap = Math.max(gap, distance(x.s11, y.s11), distance(x.s21, y.s21), distance(x.s12, y.s12), distance(x.s22, y.s22));
  }
  return gap;
}

/** Largest `| 1 - |S11|^2 - |S21|^2 |` over a grid. */
export function energyDefect(model: Model, grid: readonly number[] = GRID): number {
  let worst = 0;
  for (const omega of grid) {
    const { s11, s21 } = scatteringAt(model, omega);
    worst = Math.max(worst, Math.abs(1 - s11.re ** 2 - s11.im ** 2 - s21.re ** 2 - s21.im ** 2));
  }
  return worst;
}

/**
 * How many times rounding of the numbers that describe a response is magnified in the response: 1 over the distance of the
 * nearest pole from the axis, at least 1.
 */
export const sharpness = ({ poles }: FilterPolynomials): number => Math.max(1, ...poles.map(({ re }) => 1 / -re));

/** Rotation matrix of a pivot as documented: R_ii = R_jj = cos, R_ij = -sin, R_ji = sin; and M' = R M R^T in plain sums. */
export function denseRotation(matrix: CouplingMatrix, [i, j]: readonly [number, number], angle: number): number[][] {
  const n = matrix.order + 2;
  const r = Array.from({ length: n }, (_, a) => Array.from({ length: n }, (__, b) => Number(a === b)));
  r[i]![i] = r[j]![j] = Math.cos(angle);
  r[i]![j] = -Math.sin(angle);
  r[j]![i] = Math.sin(angle);
  const product = (a: readonly (readonly number[])[], b: readonly (readonly number[])[]): number[][] =>
    a.map((row) => b[0]!.map((_, q) => row.reduce((sum, value, k) => sum + value * b[k]![q]!, 0)));
  const transpose = r.map((_, a) => r.map((row) => row[a]!));
  return product(product(r, matrix.values), transpose);
}
