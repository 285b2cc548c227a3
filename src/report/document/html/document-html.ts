import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import type { Drawing, Picture } from '../../svg/drawing.js';
import { constantMarkup, element, fragment, type Markup } from '../../svg/markup.js';
import { unitOf } from '../../words/numbers.js';
import type { Sheet } from '../content/content.js';
import { sheetsOf } from '../content/sheets.js';
import { windowTitle } from '../content/title.js';
import { READOUT_SCRIPT } from '../script/readout-script.js';
import { DOCUMENT_STYLE } from '../style/document-style.js';
import { figureMarkup } from './figure-html.js';
import { firstPage, runningHead, titleStrip } from './first-page.js';
import { jsonNumbers } from './json-numbers.js';
import { POLICY } from './policy.js';
import { type FigureOf, sheetMarkup } from './sheet-html.js';

/** What is drawn and swept for a document, made elsewhere. */
export interface DocumentParts {
  readonly pictures: readonly Picture[];
  readonly emblem?: Drawing;
  /** Numbers over one grid, for the cursor. */
  readonly sweep?: Readonly<Record<string, readonly number[] | undefined>>;
}

const LOSSLESS_LABEL = 'Lossless curves in every picture';

function headMarkup({ specification }: DesignReport): Markup {
  return element(
    'head',
    {},
    element('meta', { charset: 'utf-8' }),
    element('meta', { 'http-equiv': 'Content-Security-Policy', content: POLICY }),
    element('meta', { name: 'referrer', content: 'no-referrer' }),
    element('meta', { name: 'viewport', content: 'width=device-width, initial-scale=1' }),
    element('title', {}, windowTitle(specification)),
    element('style', {}, constantMarkup(DOCUMENT_STYLE)),
  );
}

/** A native switch for the curves without loss, where there are both. */
function losslessSwitch(pictures: readonly Picture[]): Markup | undefined {
  const hasBoth = pictures.some(({ wide }) => /class="[^"]*\blossless\b/.test(wide.body.markup));
  if (!hasBoth) return undefined;
  const box = element('input', { type: 'checkbox', id: 'show-lossless', checked: '' });
  return element('label', {}, box, LOSSLESS_LABEL);
}

function figuresOf({ pictures, sweep }: DocumentParts): FigureOf {
  return (name) => {
    const n = pictures.findIndex((picture) => picture.name === name);
    const picture = pictures[n];
    if (picture === undefined) return undefined;
    const below = name === 'response' ? losslessSwitch(pictures) : undefined;
    const place = { number: n + 1, hasReadout: sweep !== undefined, ...(below === undefined ? {} : { below }) };
    return figureMarkup(picture, place);
  };
}

function linksTo(sheets: readonly Sheet[]): Markup {
  const links = sheets.map(({ id, head }) => element('li', {}, element('a', { href: `#${id}` }, head)));
  return element('nav', { 'aria-label': 'Sheets' }, element('ul', {}, ...links));
}

function scriptParts({ specification }: DesignReport, { sweep }: DocumentParts): readonly Markup[] {
  if (sweep === undefined) return [];
  const data = jsonNumbers({ unit: unitOf(specification.band), ...sweep });
  return [
    element('script', { type: 'application/json', id: 'sweep-data' }, constantMarkup(data)),
    element('script', {}, constantMarkup(READOUT_SCRIPT)),
  ];
}

/** The whole document, from a design and what was drawn of it. */
export function documentHtml(design: DesignReport, source: DesignSource | undefined, parts: DocumentParts): string {
  const sheets = sheetsOf(design, source);
  const figureOf = figuresOf(parts);
  const body = element(
    'body',
    {},
    element('a', { class: 'skip', href: '#verdict' }, 'Skip to the verdict'),
    titleStrip(design, source, parts.emblem),
    element(
      'main',
      {},
      firstPage(design, figureOf('response')),
      linksTo(sheets),
      ...sheets.map((sheet) => sheetMarkup(sheet, figureOf, runningHead(design, source))),
    ),
    ...scriptParts(design, parts),
  );
  return `<!DOCTYPE html>\n${element('html', { lang: 'en' }, fragment(headMarkup(design), body)).markup}\n`;
}
