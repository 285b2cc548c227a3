import { element, type Markup } from './markup.js';

/** Where a text stands against its point. */
export type Anchor = 'start' | 'mid' | 'end';

const NARROW_LETTERS = new Set("ijltfrI.,:;'|!()[] -");
const WIDE_LETTERS = new Set('mwMW@%≥≤→←');

/** Width of a text at a font size, pixels, on the safe side: widths differ between systems by up to 12 %. */
export function textWidth(text: string, size: number, isBold = false): number {
  let ems = 0;
  for (const letter of text) ems += NARROW_LETTERS.has(letter) ? 0.4 : WIDE_LETTERS.has(letter) ? 0.92 : 0.66;
  return ems * size * (isBold ? 1.08 : 1);
}

/** A horizontal text; `classes` from the picture style, such as `tick`, `bold`, `halo`, `f-reflection`. */
export function label(x: number, y: number, text: string, classes = '', anchor: Anchor = 'start'): Markup {
  const all = [classes, anchor === 'start' ? '' : anchor].filter((name) => name !== '').join(' ');
  return element('text', { x, y, class: all === '' ? undefined : all }, text);
}

/** Text with the true minus sign. */
export function minus(text: string): string {
  return text.replaceAll('-', '−');
}
