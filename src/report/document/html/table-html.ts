import { type Child, element, fragment, type Markup } from '../../svg/markup.js';
import type { Cell, Column, Row, Table } from '../content/content.js';
import { numberSigns, sentenceSigns, spanSigns } from './typography.js';

/** More columns than these can be wider than a telephone: the table gets a region that scrolls. */
const NARROW_COLUMNS = 3;
const NO_BREAK = '\u00a0';

/** Text of a cell or sentence; the user's keeps to itself which way it runs. */
export function cellMarkup(cell: Cell, signs: (text: string) => string): Child {
  return typeof cell === 'string' ? signs(cell) : element('bdi', {}, cell.user);
}

function fractionLength(text: string): number {
  return (text.split('.')[1] ?? '').length;
}

/** Blanks of the fixed pitch behind a number, so that points stand under each other. */
function padded(text: string, places: number): string {
  const point = text === '' || text.includes('.') || places === 0 ? 0 : 1;
  return text === '' ? '' : text.replaceAll('-', '−') + NO_BREAK.repeat(places - fractionLength(text) + point);
}

function signsOf(table: Table, column: number): (text: string) => string {
  const { kind } = table.columns[column] ?? { kind: 'text' };
  if (kind === 'number') return numberSigns;
  if (kind === 'span') return spanSigns;
  if (kind === 'text') return sentenceSigns;
  const texts = table.rows.map(({ cells }) => cells[column] ?? '');
  const places = Math.max(0, ...texts.map((text) => (typeof text === 'string' ? fractionLength(text) : 0)));
  return (text) => padded(text, places);
}

function headCell({ head, unit, kind }: Column): Markup {
  const units = unit === undefined ? '' : fragment(' ', element('span', { class: 'unit' }, unit));
  return element('th', { scope: 'col', class: kind === 'text' ? undefined : 'n' }, sentenceSigns(head), units);
}

function bodyRow({ columns }: Table, { cells, tones = [] }: Row, signs: readonly ((text: string) => string)[]): Markup {
  const inner = cells.map((cell, n) => {
    const isText = columns[n]?.kind === 'text';
    const text = cellMarkup(cell, signs[n] ?? sentenceSigns);
    if (n === 0) return element('th', { scope: 'row', class: isText ? undefined : 'n' }, text);
    return element('td', { class: isText ? 'l' : undefined }, text);
  });
  return element('tr', { class: tones.length === 0 ? undefined : tones.join(' ') }, ...inner);
}

function classOf({ columns, rows }: Table): string | undefined {
  if (columns.some(({ kind }) => kind === 'figures')) return 'figures';
  const isWords = rows.every(({ cells }) => cells.every((_, n) => columns[n]?.kind === 'text'));
  return isWords ? 'words' : undefined;
}

/** A table with its caption; a wide one in a region of its own that scrolls, named by the caption and reached by keyboard. */
export function tableMarkup(table: Table): Markup {
  const { id, caption, columns, rows, note } = table;
  const signs = columns.map((_, n) => signsOf(table, n));
  const isFigures = classOf(table) === 'figures';
  const inner = element(
    'table',
    { id, class: classOf(table) },
    element('caption', { id: `${id}-caption` }, sentenceSigns(caption)),
    element('thead', {}, element('tr', {}, ...columns.map(headCell))),
    element('tbody', {}, ...rows.map((row) => bodyRow(table, row, signs))),
  );
  const region = { class: 'scroll', role: 'region', tabindex: '0', 'aria-labelledby': `${id}-caption` };
  const body = columns.length > NARROW_COLUMNS || isFigures ? element('div', region, inner) : inner;
  return note === undefined ? body : element('div', {}, body, element('p', { class: 'note' }, sentenceSigns(note)));
}
