import type { Scattering } from '../forms/index.js';
import { type ComplexVector, complex, inverseColumns, refusal } from '../numerics/index.js';

/** A matrix prepared for solving: rows of doubles, and loss a resonator. */
export interface SolvableMatrix {
  readonly rows: readonly Float64Array[];
  readonly loss: number | Float64Array;
}

/** S-parameters and the group delay of S21 at one frequency. */
export interface SolvedPoint extends Scattering {
  readonly groupDelay: number;
}

/**
 * Response of a coupling matrix at one real omega by solving its equations; right to a few ulp for the given entries.
 *
 * @throws FilterFailure E_SINGULAR
 */
export function solvePoint(matrix: SolvableMatrix, omega: number): SolvedPoint {
  const last = matrix.rows.length - 1;
  const [source, load] = portColumns(matrix, omega);
  const s21 = complex(2 * (source.im[last] as number), -2 * (source.re[last] as number));
  const point = {
    s11: complex(-1 + 2 * (source.im[0] as number), -2 * (source.re[0] as number)),
    s21,
    s12: s21,
    s22: complex(-1 + 2 * (load.im[last] as number), -2 * (load.re[last] as number)),
    groupDelay: delayFromColumns(matrix, source, load, s21),
  };
  if (![point.s11.re, point.s22.re, s21.re, point.groupDelay].every(Number.isFinite)) {
    throw refusal(
      'E_SINGULAR',
      'omega',
      omega,
      'frequencies where the equations of the network can be solved',
      'shift the frequency or add loss',
    );
  }
  return point;
}

function portColumns({ rows, loss }: SolvableMatrix, omega: number): readonly [ComplexVector, ComplexVector] {
  const last = rows.length - 1;
  const isPort = (i: number): boolean => i === 0 || i === last;
  const shiftRe = Float64Array.from(rows, (_, i) => (isPort(i) ? 0 : omega));
  const shiftIm = Float64Array.from(rows, (_, i) =>
    isPort(i) ? -1 : -(typeof loss === 'number' ? loss : (loss[i - 1] as number)),
  );
  const [source, load] = inverseColumns({ rows, shiftRe, shiftIm }, [0, last]);
  return [source as ComplexVector, load as ComplexVector];
}

/**
 * Group delay from the port columns x, y of the inverse: `dS21/domega = 2j*sum x_i*y_i`. Without loss the same delay is
 * `|x|^2 + |y|^2` over the resonators (half the trace of j*S^H*dS/domega), which stays finite where S21 = 0.
 */
function delayFromColumns(
  { rows, loss }: SolvableMatrix,
  x: ComplexVector,
  y: ComplexVector,
  s21: { re: number; im: number },
): number {
  let energy = 0;
  let re = 0;
  let im = 0;
  for (let i = 1; i < rows.length - 1; i++) {
    const [a, b, c, d] = [x.re[i] as number, x.im[i] as number, y.re[i] as number, y.im[i] as number];
    energy += a * a + b * b + c * c + d * d;
    re += a * c - b * d;
    im += a * d + b * c;
  }
  const square = s21.re * s21.re + s21.im * s21.im;
  if (loss === 0 || square === 0) return energy;
  // -Im(2j*(re + j*im)/s21)
  return (-2 * (re * s21.re + im * s21.im)) / square;
}
