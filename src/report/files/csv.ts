/** Characters that make a table program run a cell; the wide forms become the plain ones in some of them. */
const RUNS = /^["'\u201c\u201d\uff02\uff07]*[=+\-@\t\r\n\uff1d\uff0b\uff0d\uff20]/;

/** Significant digits of every number. */
const DIGITS = 12;

/**
 * One cell. A number is written with 12 significant digits and never guarded; a text that a table program could take for a
 * formula gets a leading quote mark; null is an empty cell.
 */
export function csvCell(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return value === 0 ? '0' : String(Number(value.toPrecision(DIGITS)));
  const safe = RUNS.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** A table in RFC 4180 form: CR LF after every row, the last one too. */
export function csvText(rows: readonly (readonly (string | number | null)[])[]): string {
  return rows.map((row) => `${row.map(csvCell).join(',')}\r\n`).join('');
}
