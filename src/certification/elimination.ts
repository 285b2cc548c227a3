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
    let size = Math.abs(cell(table, rowAt(offsets, k) + k));
    for (let r = k + 1; r < rows; r++) {
      const candidate = Math.abs(cell(table, rowAt(offsets, r) + k));
      if (candidate > size) {
        size = candidate;
        best = r;
      }
    }
    const top = rowAt(offsets, best);
    offsets[best] = rowAt(offsets, k);
    offsets[k] = top;
    const pivot = cell(table, top + k);
    for (let r = k + 1; r < rows; r++) {
      const row = rowAt(offsets, r);
      const factor = cell(table, row + k) / pivot;
      if (factor === 0) continue;
      for (let c = k + 1; c < columns; c++) {
        table[row + c] = cell(table, row + c) - factor * cell(table, top + c);
      }
    }
  }
}

/** Entry i of an array whose length the caller has fixed. One type of array only: mixed types make every access slow. */
export function cell(values: Float64Array, i: number): number {
  return values[i] as number;
}

/** Where row r of the table starts. */
export function rowAt(offsets: Int32Array, r: number): number {
  return offsets[r] as number;
}
