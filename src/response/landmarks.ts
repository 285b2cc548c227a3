import type { CouplingMatrix } from '../forms/index.js';
import { type Complex, complexEigenvalues, symmetricEigen } from '../numerics/index.js';
import { rowsOf } from '../topology/index.js';
import { isMatrix, type Model } from './model.js';
import { type Residue, zerosOf } from './zero-landmarks.js';

/** A place on the frequency axis near which the response may change quickly, and how quickly: half width in omega. */
export interface Landmark {
  readonly omega: number;
  readonly halfWidth: number;
}

/**
 * Poles and zeros of a model as landmarks: between the samples that they ask for, no narrow feature can hide.
 *
 * A transfer function lists them; for a matrix the poles are the eigenvalues of the resonator block loaded by the ports, the
 * zeros of S21 those of another block (`zero-landmarks.ts`).
 * `loss` moves every root away from the axis by that much.
 */
export function landmarks(model: Model, loss: number | readonly number[]): readonly Landmark[] {
  if (isMatrix(model))
    return matrixLandmarks(model, typeof loss === 'number' ? new Array<number>(model.order).fill(loss) : loss);
  const shift = typeof loss === 'number' ? loss : 0;
  const roots = [...model.poles, ...model.reflectionZeros, ...model.transmissionZeros];
  return roots.map((root) => ({ omega: root.im, halfWidth: Math.abs(root.re) + shift }));
}

/** `det(omega*I + K) = 0` with the complex `K = M_rr - j*loss - m (M_pp - j)^-1 m^T`: omega = minus its eigenvalues. */
function matrixLandmarks(matrix: CouplingMatrix, loss: readonly number[]): readonly Landmark[] {
  const rows = rowsOf(matrix);
  const { order } = matrix;
  const port = portInverse(rows);
  const value = (i: number, j: number): number => rows[i]?.[j] as number;
  const loaded = (i: number, j: number, part: 're' | 'im'): number => {
    const [si, li, sj, lj] = [value(0, i), value(order + 1, i), value(0, j), value(order + 1, j)];
    return si * sj * port.ss[part] + (si * lj + li * sj) * port.sl[part] + li * lj * port.ll[part];
  };
  const block = (entry: (i: number, j: number) => number): Float64Array[] =>
    Array.from({ length: order }, (_, i) => Float64Array.from({ length: order }, (__, j) => entry(i + 1, j + 1)));
  const re = block((i, j) => value(i, j) - loaded(i, j, 're'));
  const im = block((i, j) => (i === j ? -(loss[i - 1] as number) : 0) - loaded(i, j, 'im'));
  const poles = complexEigenvalues({ re, im }).map((root) => ({ omega: -root.re, halfWidth: Math.abs(root.im) }));
  const zeros = zerosOf(residuesOf(rows, loss), value(0, order + 1));
  return [...poles, ...zeros.map((zero) => ({ omega: zero.re, halfWidth: Math.abs(zero.im) }))];
}

/** Resonances of the block with the loss each one has, to first order: that of its resonators by their share in it. */
function residuesOf(rows: readonly Float64Array[], loss: readonly number[]): readonly Residue[] {
  const last = rows.length - 1;
  const { values, vectors } = symmetricEigen(rows.slice(1, last).map((row) => row.slice(1, last)));
  return vectors.map((vector, k) => {
    let [source, load, damping] = [0, 0, 0];
    vector.forEach((weight, i) => {
      source += weight * (rows[0]?.[i + 1] as number);
      load += weight * (rows[last]?.[i + 1] as number);
      damping += weight * weight * (loss[i] as number);
    });
    return { lambda: { re: -(values[k] as number), im: damping }, share: source * load };
  });
}

/** `(M_pp - j)^-1`, M_pp the 2 x 2 of source and load. */
function portInverse(rows: readonly Float64Array[]): { ss: Complex; sl: Complex; ll: Complex } {
  const last = rows.length - 1;
  const [a, b, c] = [rows[0]?.[0] as number, rows[0]?.[last] as number, rows[last]?.[last] as number];
  const re = a * c - b * b - 1;
  const im = -(a + c);
  const square = re * re + im * im;
  const over = (x: number, y: number): Complex => ({ re: (x * re + y * im) / square, im: (y * re - x * im) / square });
  return { ss: over(c, -1), sl: over(-b, 0), ll: over(a, -1) };
}
