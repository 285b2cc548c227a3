import type { CouplingMatrix } from '../../../forms/index.js';
import { nodeNames } from '../../words/nodes.js';
import { signed } from '../../words/numbers.js';
import { numberColumn, type Row, type Table, textColumn } from './content.js';

const M_DECIMALS = 4;
/** Columns that fit a printed page. */
const COLUMNS = 14;

/** An entry; a dot where there is no coupling at all. */
function entryText(value: number): string {
  return value === 0 ? '·' : signed(value, M_DECIMALS);
}

/** The whole matrix: one table where its columns fit a page, else several of nearly equal width. */
export function matrixTables({ order, values }: CouplingMatrix): readonly Table[] {
  const names = nodeNames(order);
  const pieces = Math.ceil(names.length / COLUMNS);
  const width = Math.ceil(names.length / pieces);
  return Array.from({ length: pieces }, (_, piece): Table => {
    const [from, to] = [piece * width, Math.min((piece + 1) * width, names.length)];
    const rows = values.map(
      (row, node): Row => ({
        cells: [names[node] ?? '', ...row.slice(from, to).map(entryText)],
      }),
    );
    const note = 'A dot stands for an entry that is exactly 0.';
    const part = pieces === 1 ? '' : `, columns ${names[from]} to ${names[to - 1]}`;
    return {
      id: piece === 0 ? 'matrix' : `matrix-${piece + 1}`,
      caption: `Coupling matrix M, all entries${part}`,
      columns: [textColumn('Node'), ...names.slice(from, to).map((name) => numberColumn(name))],
      rows,
      ...(piece === pieces - 1 ? { note } : {}),
    };
  });
}
