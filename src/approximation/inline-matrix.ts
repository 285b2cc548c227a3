import type { CouplingMatrix } from '../forms/index.js';
import { refusal } from '../numerics/index.js';

/**
 * The in-line coupling matrix of a ladder: `M_i,i+1 = 1/sqrt(g_i*g_(i+1))` from the source to the load, nothing else.
 *
 * `elements.values` holds g0 to g(N+1), above 0; a load that differs from the source only changes `M_NL`, for the matrix is
 * normalized to both. The frequency scale is that of the ladder. Cost O(order^2).
 *
 * @throws FilterFailure E_TYPE, E_ELEMENT
 *
 * Source: S. B. Cohn, Direct-coupled-resonator filters, Proc. IRE 45, 1957 (from memory).
 *
 * @example
 * const { values } = inlineMatrix(prototypeElements({ family: 'butterworth', order: 2 }));
 * values[0][1].toFixed(4); // '0.8409'
 * values[1][2].toFixed(4); // '0.7071'
 */
export function inlineMatrix(elements: { readonly values: readonly number[] }): CouplingMatrix {
  const g: unknown = elements?.values;
  if (!Array.isArray(g) || g.length < 3) {
    throw refusal('E_TYPE', 'elements.values', g, 'a list of g0 to g(N+1)', 'pass what prototypeElements returned');
  }
  const size = g.length;
  const values = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  for (let i = 0; i < size; i++) checkElement(g[i], i);
  for (let i = 0; i + 1 < size; i++) {
    const coupling = 1 / Math.sqrt(g[i] * g[i + 1]);
    (values[i] as number[])[i + 1] = coupling;
    (values[i + 1] as number[])[i] = coupling;
  }
  return { order: size - 2, values, finiteZeros: 0 };
}

/** Elements of ladders lie within a few powers of ten of 1; beyond these a product could leave the range of doubles. */
const LARGEST_ELEMENT = 1e100;

function checkElement(value: unknown, i: number): void {
  if (typeof value === 'number' && value >= 1 / LARGEST_ELEMENT && value <= LARGEST_ELEMENT) return;
  const allowed = `a number above 0, to ${LARGEST_ELEMENT}`;
  throw refusal('E_ELEMENT', `elements.values[${i}]`, value, allowed, 'correct the element');
}
