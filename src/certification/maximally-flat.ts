import type { Certificate, FilterPolynomials } from '../forms/index.js';
import { cell } from './elimination.js';
import { rootResponse } from './root-response.js';
import { squared } from './series.js';
import { atMost, exactly } from './verdict.js';

/** C4: the half-power edges, as |S21|^2, to the limit that C6 sets for S. */
const EDGE_LIMIT = 1e-9;

/** C4, Butterworth only: all N reflection zeros at the center, none of transmission, and half the power at both edges. */
export function maximallyFlat(polynomials: FilterPolynomials): Certificate[] {
  if (polynomials.family !== 'butterworth') return [];
  const { order, reflectionZeros, transmissionZeros } = polynomials;
  const edges = Float64Array.of(-1, 1);
  const { s21 } = rootResponse(polynomials, edges);
  const off = edges.map((_, i) => Math.abs(squared(s21, i) - 0.5));
  const centered = reflectionZeros.filter(({ re, im }) => re === 0 && im === 0).length;
  return [
    exactly('C4 reflection zeros at the center', transmissionZeros.length === 0 ? centered : 0, order),
    atMost('C4 half power at the edges', Math.max(cell(off, 0), cell(off, 1)), EDGE_LIMIT),
  ];
}
