import { byId, type Element, elementsOf, textOf } from './tree.js';

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function plainExponent(text: string): string {
  return text.replace('⁻', '-').replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(SUPERSCRIPTS.indexOf(digit)));
}

/** Text of a cell with ASCII signs: what a person would type. */
export function typed(text: string): string {
  return text
    .replace(/\s*×\s*10([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)/g, (_, power: string) => `e${plainExponent(power)}`)
    .replaceAll('−', '-')
    .replaceAll('≥', '>=')
    .replaceAll('≤', '<=')
    .replaceAll('–', '-')
    .replace(/\s+/g, ' ')
    .trim();
}

/** Rows of a table by its id, head row first, each cell as typed. */
export function rowsOf(tree: Parameters<typeof byId>[0], id: string): readonly (readonly string[])[] {
  const cellsOf = (row: Element): readonly string[] =>
    elementsOf(row)
      .filter(({ tagName }) => tagName === 'td' || tagName === 'th')
      .map((cell) => typed(textOf(cell)));
  return elementsOf(byId(tree, id))
    .filter(({ tagName }) => tagName === 'tr')
    .map(cellsOf);
}

/** Whether a cell shows a value: equal to half a step of the last digit printed; figures say how many there must be. */
export function shows(cell: string, value: number): boolean {
  const match = /^[+-]?\d+(?:\.(\d+))?(?:e([+-]?\d+))?$/.exec(cell.replace(/^[<>]= /, ''));
  if (match === null) return false;
  const [number, fraction = '', power = '0'] = match;
  const step = 10 ** (Number(power) - fraction.length);
  return Math.abs(Number(number) - value) <= 0.5 * step * (1 + 1e-9) + Math.abs(value) * 1e-15;
}
