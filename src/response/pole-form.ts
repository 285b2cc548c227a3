import { EPS, symmetricEigen } from '../numerics/index.js';

/**
 * A coupling matrix with its resonator block diagonalized: `A^-1` at the ports follows from
 * `X = ports - sum m_k m_k^T/(omega - lambda_k - j*loss)`, m_k = (source_k, load_k).
 */
export interface PoleForm {
  readonly lambda: Float64Array;
  readonly source: Float64Array;
  readonly load: Float64Array;
  readonly ports: { readonly ss: number; readonly sl: number; readonly ll: number };
}

/** Pole form of checked rows; a diagonal resonator block (transversal form) needs no eigenvalues. Cost O(N^3) once. */
export function poleForm(rows: readonly Float64Array[]): PoleForm {
  const last = rows.length - 1;
  const block = rows.slice(1, last).map((row) => row.slice(1, last));
  const source = (rows[0] as Float64Array).slice(1, last);
  const load = (rows[last] as Float64Array).slice(1, last);
  const ports = { ss: rows[0]?.[0] ?? 0, sl: rows[0]?.[last] ?? 0, ll: rows[last]?.[last] ?? 0 };
  if (block.every((row, i) => row.every((value, j) => i === j || value === 0))) {
    return withoutDark({ lambda: Float64Array.from(block, (row, i) => -(row[i] as number)), source, load, ports });
  }
  const { values, vectors } = symmetricEigen(block);
  const lambda = values.map((value) => -value);
  const project = (row: Float64Array): Float64Array => Float64Array.from(vectors, (vector) => dot(vector, row));
  return withoutDark({ lambda, source: project(source), load: project(load), ports });
}

/**
 * Leaves out resonances that no port couples to: what an eigenvector shows there is rounding, and a frequency exactly on one
 * would divide it by zero.
 */
function withoutDark({ lambda, source, load, ports }: PoleForm): PoleForm {
  const coupling = Math.max(...source.map(Math.abs), ...load.map(Math.abs));
  const room = 4 * lambda.length * EPS * coupling;
  const seen = Array.from(lambda.keys()).filter(
    (k) => Math.abs(source[k] as number) > room || Math.abs(load[k] as number) > room,
  );
  const kept = (values: Float64Array): Float64Array => Float64Array.from(seen, (k) => values[k] as number);
  return { lambda: kept(lambda), source: kept(source), load: kept(load), ports };
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += (a[i] as number) * (b[i] as number);
  return sum;
}

/** The two modes of a network with S11 = S22: resonances of S11 + S21 (`even`) and of S11 - S21 (`odd`), weights 2*m_k^2. */
export interface ModeForm {
  readonly even: ModeTerms;
  readonly odd: ModeTerms;
}

/** `x = constant - sum weight/(omega - lambda - j*loss)`; the mode's reflection is `-(x + j)/(x - j)`. */
export interface ModeTerms {
  readonly constant: number;
  readonly lambda: Float64Array;
  readonly weight: Float64Array;
}

/**
 * Splits a pole form into modes when every resonance couples equally to both ports; undefined otherwise.
 *
 * The two couplings may differ by the rounding of an eigenvector, N*eps of the largest coupling; their average replaces both. Where an
 * even and an odd resonance nearly coincide the computed eigenvectors mix, the couplings differ by more, and the network is
 * left to the general sums, to which any basis of the pair is as good.
 */
export function modeForm({ lambda, source, load, ports }: PoleForm): ModeForm | undefined {
  if (ports.ss !== ports.ll) return undefined;
  const coupling = Math.max(...source.map(Math.abs), ...load.map(Math.abs));
  const room = 64 * lambda.length * EPS * coupling;
  const even: number[] = [];
  const odd: number[] = [];
  for (let k = 0; k < lambda.length; k++) {
    const [s, l] = [source[k] as number, load[k] as number];
    if (!(Math.abs(Math.abs(s) - Math.abs(l)) <= room)) return undefined;
    (s * l >= 0 ? even : odd).push(k);
  }
  const terms = (indices: readonly number[], constant: number): ModeTerms => ({
    constant,
    lambda: Float64Array.from(indices, (k) => lambda[k] as number),
    weight: Float64Array.from(indices, (k) => (Math.abs(source[k] as number) + Math.abs(load[k] as number)) ** 2 / 2),
  });
  return { even: terms(even, ports.ss + ports.sl), odd: terms(odd, ports.ss - ports.sl) };
}
