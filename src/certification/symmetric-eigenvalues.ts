import { cell } from './elimination.js';
import { EPSILON } from './verdict.js';

/** Cyclic Jacobi converges quadratically; 10 sweeps have always sufficed, a cap stops an endless loop on bad numbers. */
const MOST_SWEEPS = 40;

/** Eigenvalues of a real symmetric matrix, ascending, by cyclic Jacobi; absolute error a few eps times the norm. Cost about 8 sweeps of 4*n^3. */
export function symmetricEigenvalues(rows: readonly (readonly number[])[]): number[] {
  const n = rows.length;
  const a = Float64Array.from(rows.flat());
  const norm = Math.sqrt(a.reduce((sum, x) => sum + x * x, 0));
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let off = 0;
    for (let p = 0; p < n; p++) for (let q = p + 1; q < n; q++) off = Math.max(off, Math.abs(cell(a, p * n + q)));
    // n entries of this size or less move no eigenvalue by more than a unit in the last place of the norm.
    if (off <= (EPSILON * norm) / Math.max(1, n)) break;
    for (let p = 0; p < n; p++) for (let q = p + 1; q < n; q++) annihilate(a, n, p, q);
  }
  return Array.from({ length: n }, (_, i) => cell(a, i * n + i)).sort((x, y) => x - y);
}

function annihilate(a: Float64Array, n: number, p: number, q: number): void {
  const apq = cell(a, p * n + q);
  if (apq === 0) return;
  const theta = (cell(a, q * n + q) - cell(a, p * n + p)) / (2 * apq);
  const t = (theta < 0 ? -1 : 1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1));
  const c = 1 / Math.sqrt(t * t + 1);
  const s = t * c;
  for (let k = 0; k < n; k++) {
    if (k === p || k === q) continue;
    const [kp, kq] = [cell(a, k * n + p), cell(a, k * n + q)];
    const [newP, newQ] = [c * kp - s * kq, s * kp + c * kq];
    a[k * n + p] = newP;
    a[p * n + k] = newP;
    a[k * n + q] = newQ;
    a[q * n + k] = newQ;
  }
  a[p * n + p] = cell(a, p * n + p) - t * apq;
  a[q * n + q] = cell(a, q * n + q) + t * apq;
  a[p * n + q] = 0;
  a[q * n + p] = 0;
}
