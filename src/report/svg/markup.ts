import { cleanText } from '../words/clean-text.js';

/** Text that is markup already; only this file makes it, and it escapes what it is given. */
export interface Markup {
  readonly markup: string;
}

/** Every piece made here: an object of the same shape from elsewhere, such as a parsed file, is not taken for markup. */
const MADE = new WeakSet<Markup>();

function made(markup: string): Markup {
  const piece = { markup };
  MADE.add(piece);
  return piece;
}

/** A constant of this package as markup: a style sheet, a script, data that has been made safe. Never anything of a user. */
export function constantMarkup(markup: string): Markup {
  return made(markup);
}

/** What an element holds: markup as it is, plain text escaped. */
export type Child = Markup | string;

/** Values of attributes; an absent one is left out. */
export type Attributes = Readonly<Record<string, string | number | undefined>>;

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Plain text as it may stand between tags and in quoted attributes. */
export function escapeMarkup(text: string): string {
  return cleanText(text).replace(/[&<>"']/g, (character) => ENTITIES[character] ?? character);
}

/** A coordinate to a tenth of a pixel. */
function coordinate(value: number): string {
  return String(Math.round(value * 10) / 10 + 0);
}

function attributeText([name, value]: readonly [string, string | number | undefined]): string {
  if (value === undefined) return '';
  return ` ${name}="${typeof value === 'number' ? coordinate(value) : escapeMarkup(String(value))}"`;
}

function childText(child: Child): string {
  return typeof child === 'object' && MADE.has(child) ? child.markup : escapeMarkup(String(child));
}

/** One element with its attributes and children; numbers are rounded to a tenth of a pixel. */
export function element(name: string, attributes: Attributes, ...children: readonly Child[]): Markup {
  const open = `<${name}${Object.entries(attributes).map(attributeText).join('')}`;
  const isSvgLeaf = children.length === 0 && LEAVES.has(name);
  return made(isSvgLeaf ? `${open}/>` : `${open}>${children.map(childText).join('')}</${name}>`);
}

/** Elements that are written closed in themselves; HTML allows that of its own void elements and inside SVG only. */
const LEAVES: ReadonlySet<string> = new Set(
  'path line rect circle polygon polyline use meta input br hr link img'.split(' '),
);

/** Several pieces one after the other. */
export function fragment(...children: readonly Child[]): Markup {
  return made(children.map(childText).join(''));
}
