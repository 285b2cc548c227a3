import { describe, expect, it } from 'vitest';
import type { Design } from '../../src/index.js';
import { NO_CHROMIUM, useChromium } from './browser.js';
import { EXPECTED_TABLES, type Expected } from './expected-tables.js';
import { plainNumber, type ReadTable, shows, tablesOf } from './page/tables.js';
import { FIXTURES, resultOf, useReports } from './reports.js';

/** The cell without its sign of order and without the words that narrow rows carry. */
const bare = (cell: string): string => cell.replace(/^(?:[≥≤]|predicted|clear by|short by|over by)\s*/, '');

const decimalsOf = (cell: string): number => (plainNumber(cell).split('.')[1] ?? '').length;

function faultOf(cell: string, expected: Expected): string | undefined {
  if (expected === undefined) return undefined;
  if (typeof expected === 'string') return cell === expected ? undefined : `"${cell}" for "${expected}"`;
  const { value, decimals } = expected;
  if (!shows(bare(cell), value)) return `"${cell}" for ${value}`;
  const isRounding = plainNumber(cell).includes('e') || Number.isInteger(value);
  return isRounding || decimalsOf(bare(cell)) >= decimals ? undefined : `"${cell}" has too few decimals`;
}

function faultsOf(name: string, table: ReadTable | undefined, design: Design): readonly string[] {
  const expected = EXPECTED_TABLES[name]?.(design) ?? [];
  if (table === undefined) return [`no table ${name}`];
  if (table.rows.length !== expected.length) return [`${name}: ${table.rows.length} rows for ${expected.length}`];
  return table.rows.flatMap((row, n) => {
    const cells = expected[n] ?? [];
    if (row.length !== cells.length) return [`${name}, row ${n}: ${row.length} cells for ${cells.length}`];
    return row.flatMap((cell, column) => {
      const fault = faultOf(cell, cells[column]);
      return fault === undefined ? [] : [`${name}, row ${n}, column ${column}: ${fault}`];
    });
  });
}

describe('shows(cell, value)', () => {
  it.each([
    ['−0.1561', -0.15607, true],
    ['+0.8659', 0.86585, true],
    ['0.15', 0.1561, false],
    ['−0.1561', 0.1561, false],
    ['2.2 × 10⁻¹⁴', 2.24e-14, true],
    ['2.2 × 10⁻¹⁴', 2.26e-14, false],
    ['99.46', 99.464, true],
    ['99.46', 99.466, false],
    ['none', 0, false],
  ])('%s for %f: %s', (cell, value, right) => {
    expect(shows(cell, value)).toBe(right);
  });
});

describe.skipIf(NO_CHROMIUM)('numbers of a report', () => {
  const chromium = useChromium();
  const written = useReports();

  it.each(FIXTURES)('%s: every number of every table is that of result.json, to the digits shown', async (name) => {
    const opened = await chromium.openText('report.html', written(name, 'report.html'));
    const tables = await tablesOf(opened.page);
    await opened.close();
    const design = resultOf(written, name);
    const faults = Object.keys(EXPECTED_TABLES).flatMap((id) => faultsOf(id, tables[id], design));
    expect(faults).toEqual([]);
    // Only the inputs, which are words, are left.
    expect(Object.keys(tables).filter((id) => !(id in EXPECTED_TABLES))).toEqual(['inputs']);
    // Roots and coefficients carry twelve figures.
    for (const id of ['roots', 'coefficients'])
      for (const row of tables[id]?.rows ?? [])
        for (const cell of row.slice(1).map(plainNumber))
          if (!['', '0'].includes(cell) && !cell.includes('e'))
            expect(cell.replace(/^[+-]?0?\.?0*|\./g, '').length, cell).toBeGreaterThanOrEqual(12);
  });

  it.each(FIXTURES)('%s: spans of the requirements are those of the mask', async (name) => {
    const opened = await chromium.openText('report.html', written(name, 'report.html'));
    const { requirements } = await tablesOf(opened.page);
    await opened.close();
    const { mask } = resultOf(written, name);
    mask.forEach(({ line: { fromHz, toHz } }, n) => {
      const numbers = (requirements?.rows[n]?.[1]?.match(/\d+(\.\d+)?/g) ?? []).map(Number);
      const ends = [fromHz, toHz].filter((hertz) => hertz !== undefined).map((hertz) => hertz / 1e6);
      expect(numbers).toEqual([...new Set(ends)]);
    });
  });
});
