/**
 * Solves a small square system by elimination with row exchanges; undefined when it is singular to rounding. The systems here
 * have as many unknowns as a filter has free zeros, and are diagonally dominant.
 */
export function denseSolve(rows: readonly (readonly number[])[], right: readonly number[]): number[] | undefined {
  const n = right.length;
  const work = rows.map((row, i) => [...row, right[i] as number]);
  for (let k = 0; k < n; k++) {
    let pivot = k;
    for (let i = k + 1; i < n; i++) if (sizeAt(work, i, k) > sizeAt(work, pivot, k)) pivot = i;
    const top = work[pivot] as number[];
    work[pivot] = work[k] as number[];
    work[k] = top;
    const head = top[k] as number;
    if (!(Math.abs(head) > 0 && Number.isFinite(head))) return undefined;
    for (let i = k + 1; i < n; i++) {
      const row = work[i] as number[];
      const factor = (row[k] as number) / head;
      if (factor === 0) continue;
      for (let j = k; j <= n; j++) row[j] = (row[j] as number) - factor * (top[j] as number);
    }
  }
  const x = new Array<number>(n).fill(0);
  for (let k = n - 1; k >= 0; k--) {
    const row = work[k] as number[];
    let sum = row[n] as number;
    for (let j = k + 1; j < n; j++) sum -= (row[j] as number) * (x[j] as number);
    x[k] = sum / (row[k] as number);
  }
  return x.every(Number.isFinite) ? x : undefined;
}

const sizeAt = (work: readonly (readonly number[])[], i: number, k: number): number => Math.abs(work[i]?.[k] as number);
