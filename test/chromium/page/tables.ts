import type { Page } from 'playwright-core';

/** Text of the cells of a table, blanks made single. */
export interface ReadTable {
  readonly heads: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** Every table that has an id, as a reader would read it. */
export function tablesOf(page: Page): Promise<Readonly<Record<string, ReadTable>>> {
  return page.evaluate(() => {
    const textOf = (cell: Element): string => (cell.textContent ?? '').replace(/\s+/g, ' ').trim();
    const tables: Record<string, { heads: string[]; rows: string[][] }> = {};
    for (const table of document.querySelectorAll('table')) {
      const id = table.id === '' ? (table.closest('[id]')?.id ?? '') : table.id;
      const heads = [...table.querySelectorAll('thead th')].map(textOf);
      const rows = [...table.querySelectorAll('tbody tr')].map((row) => [...row.children].map(textOf));
      tables[id] = { heads, rows };
    }
    return tables;
  });
}

/** The number that a cell shows, in plain signs: "−1.5" and "2.2 × 10⁻¹⁴" become "-1.5" and "2.2e-14". */
export function plainNumber(shown: string): string {
  const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹';
  return shown
    .replaceAll('−', '-')
    .replace(/\s*[×·]\s*10/, 'e')
    .replace(/⁻/g, '-')
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(superscripts.indexOf(digit)));
}

/** Whether a cell shows a value rounded to the digits that it shows: nothing else has that text. */
export function shows(shown: string, value: number): boolean {
  const text = plainNumber(shown);
  const [, mantissa = '', exponent = '0'] = /^[+-]?(\d+(?:\.\d+)?)(?:e([+-]?\d+))?$/.exec(text) ?? [];
  if (mantissa === '') return false;
  const decimals = (mantissa.split('.')[1] ?? '').length - Number(exponent);
  const half = 0.5 * 10 ** -decimals;
  return Math.abs(Number(text) - value) <= half * (1 + 1e-6) + 1e-12 * Math.abs(value);
}
