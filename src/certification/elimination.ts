/**
 * Gaussian elimination with partial pivoting, in place: columns 0 .. `pivots`-1 of a `rows` x `columns` real table become upper triangular.
 *
 * Row r of the result starts at `table[offsets[r]]`; rows are exchanged in `offsets`, never moved. The kernel skips
 * multipliers that are 0, so a sparse table costs less. A singular column divides 0 by 0: the not-a-number that
 * follows is wanted, it turns every certificate built on it red.
 */
export function eliminate(
  table: Float64Array,
  offsets: Int32Array,
  shape: { readonly rows: number; readonly columns: number; readonly pivots: number },
): void {
  const { rows, columns, pivots } = shape;
  for (let r = 0; r < rows; r++) offsets[r] = r * columns;
  for (let k = 0; k < pivots; k++) {
    let best = k;
    let size = Math.abs(cell(table, cell(offsets, k) + k));
    for (let r = k + 1; r < rows; r++) {
      const candidate = Math.abs(cell(table, cell(offsets, r) + k));
      if (candidate > size) {
        size = candidate;
        best = r;
      }
    }
    const top = cell(offsets, best);
    offsets[best] = cell(offsets, k);
    offsets[k] = top;
    const pivot = cell(table, top + k);
    for (let r = k + 1; r < rows; r++) {
      const row = cell(offsets, r);
      const factor = cell(table, row + k) / pivot;
      if (factor === 0) continue;
      for (let c = k + 1; c < columns; c++) {
        table[row + c] = cell(table, row + c) - factor * cell(table, top + c);
      }
    }
  }
}

/** Entry i of a typed array whose length the caller has fixed. */
export function cell(values: Float64Array | Int32Array, i: number): number {
  return values[i] as number;
}
