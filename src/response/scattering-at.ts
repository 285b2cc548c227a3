import type { Scattering } from '../forms/index.js';
import { type Complex, complex, FilterFailure } from '../numerics/index.js';
import { rowsOf } from '../topology/index.js';
import type { ComplexSamples } from './curves.js';
import { solvePoint } from './direct-solve.js';
import { checkFrequency, isMatrix, type Model } from './model.js';
import { scatteringOfPolynomials } from './polynomial-response.js';
import { sweeper } from './sweep.js';

/**
 * Scattering parameters of a model at one real normalized frequency `omega` (dimensionless), without loss.
 *
 * A transfer function is evaluated as products, a coupling matrix by solving its equations with a residual in doubled
 * precision: right to a few ulp for the given numbers. Cost O(order) and O(order^3). For many frequencies use `sweep`.
 *
 * @throws FilterFailure E_NOT_FINITE, E_TYPE, E_MATRIX_SHAPE, E_NOT_SYMMETRIC, E_SINGULAR
 *
 * @example
 * const { s11, s21 } = scatteringAt(butterworth({ order: 1 }), 0);
 * s21.re; // -1
 * s11.re; // 0
 */
export function scatteringAt(model: Model, omega: number): Scattering {
  checkFrequency(omega, 'omega');
  if (!isMatrix(model)) return scatteringOfPolynomials(model, complex(0, omega));
  try {
    const { s11, s21, s12, s22 } = solvePoint({ rows: rowsOf(model), loss: 0 }, omega);
    return { s11, s21, s12, s22 };
  } catch (error) {
    if (!(error instanceof FilterFailure) || error.code !== 'E_SINGULAR') throw error;
    return sweptPoint(model, omega);
  }
}

/** Where a resonance that no port sees makes the equations singular, the sums over the others still give S. */
function sweptPoint(model: Model, omega: number): Scattering {
  const { s11, s21, s22 } = sweeper(model)(Float64Array.of(omega));
  const at = ({ re, im }: ComplexSamples): Complex => complex(re[0] as number, im[0] as number);
  return { s11: at(s11), s21: at(s21), s12: at(s21), s22: at(s22) };
}
