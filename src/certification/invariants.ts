import type { Certificate, CouplingMatrix } from '../forms/index.js';
import { symmetricEigenvalues } from './symmetric-eigenvalues.js';
import { atMost } from './verdict.js';

/** Relative drift after any number of rotations: each adds a few eps, and a chain of 5000 (order 100) adds 1e-12. */
const DRIFT_LIMIT = 1e-11;

/**
 * C7 for a rotated matrix: what a change of the resonators' basis cannot change, before and after.
 *
 * Eigenvalues of the resonator block, relative to its norm, or to the width that the ports give the broadest resonance where
 * that is larger (one resonator at the center has an eigenvalue of rounding size); `m_x^T M^k m_y` for x, y = source, load and k = 0 .. 2N-1,
 * relative to `|m_x| |m_y| |M|^k`; the three port entries. Together they fix the response.
 */
export function invariants(before: CouplingMatrix, after: CouplingMatrix): Certificate[] {
  const old = symmetricEigenvalues(resonatorBlock(before));
  const now = symmetricEigenvalues(resonatorBlock(after));
  const norm =
    Math.max(
      old.reduce((largest, x) => Math.max(largest, Math.abs(x)), 0),
      widest(before),
    ) || 1;
  const drift = old.reduce((worst, x, i) => Math.max(worst, Math.abs(x - (now[i] ?? Number.NaN))), 0);
  return [
    atMost('C7 drift of the eigenvalues', drift / norm, DRIFT_LIMIT),
    atMost('C7 drift of the Markov numbers', markovDrift(before, after, norm), DRIFT_LIMIT),
    atMost('C7 drift of the port entries', portDrift(before, after), DRIFT_LIMIT),
  ];
}

/** Square of the largest port coupling: half the width in omega of that resonator loaded by its port. */
function widest(matrix: CouplingMatrix): number {
  const couplings = [...portColumn(matrix, 0), ...portColumn(matrix, matrix.order + 1)];
  return couplings.reduce((largest, m) => Math.max(largest, m * m), 0);
}

function resonatorBlock(matrix: CouplingMatrix): number[][] {
  return matrix.values.slice(1, -1).map((row) => row.slice(1, -1));
}

function portColumn(matrix: CouplingMatrix, port: number): number[] {
  return (matrix.values[port] ?? []).slice(1, -1);
}

function markovDrift(before: CouplingMatrix, after: CouplingMatrix, norm: number): number {
  const n = before.order;
  const [old, now] = [before, after].map((matrix) => markovNumbers(matrix, norm));
  const source = length(portColumn(before, 0));
  const load = length(portColumn(before, n + 1));
  const scales = [source * source, source * load, load * load];
  let worst = 0;
  old?.forEach((number, i) => {
    const difference = Math.abs(number - (now?.[i] ?? Number.NaN));
    worst = Math.max(worst, difference === 0 ? 0 : difference / (scales[i % 3] ?? Number.NaN));
  });
  return worst;
}

/** `m_x^T (M/norm)^k m_y` for k = 0 .. 2N-1 and xy = SS, SL, LL in turn. */
function markovNumbers(matrix: CouplingMatrix, norm: number): number[] {
  const block = resonatorBlock(matrix);
  const [s, l] = [portColumn(matrix, 0), portColumn(matrix, matrix.order + 1)];
  let [throughS, throughL] = [s, l];
  const numbers: number[] = [];
  for (let k = 0; k < 2 * matrix.order; k++) {
    numbers.push(dot(s, throughS), dot(s, throughL), dot(l, throughL));
    [throughS, throughL] = [
      block.map((row) => dot(row, throughS) / norm),
      block.map((row) => dot(row, throughL) / norm),
    ];
  }
  return numbers;
}

function portDrift(before: CouplingMatrix, after: CouplingMatrix): number {
  const last = before.order + 1;
  const ends = [
    [0, 0],
    [0, last],
    [last, last],
  ] as const;
  return ends.reduce((worst, [i, j]) => {
    const difference = (before.values[i]?.[j] ?? Number.NaN) - (after.values[i]?.[j] ?? Number.NaN);
    return Math.max(worst, Math.abs(difference));
  }, 0);
}

function length(vector: readonly number[]): number {
  return Math.sqrt(dot(vector, vector));
}

function dot(a: readonly number[], b: readonly number[]): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += (a[i] ?? Number.NaN) * (b[i] ?? Number.NaN);
  return sum;
}
