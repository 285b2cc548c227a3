import { constantMarkup, element, fragment, type Markup } from './markup.js';
import { FILE_STYLE } from './picture-style.js';

/** One drawing at its natural size, in pixels. */
export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly body: Markup;
}

/** Natural sizes: `wide` for half a desktop page and for files, `narrow` for phones and for half a printed page. */
export type Format = 'wide' | 'narrow';

/** Natural width of each format. */
export const FORMAT_WIDTH: Readonly<Record<Format, number>> = { wide: 560, narrow: 340 };

/**
 * A picture: drawn once for each format, never scaled from one to the other. `finding` says what is seen and stands above,
 * `caption` how to read the marks and stands below, `alternative` is for readers who do not see it.
 */
export interface Picture {
  /** Name of its file and of its place in a document, such as `group-delay`. */
  readonly name: string;
  readonly finding: string;
  readonly caption: string;
  readonly alternative: string;
  readonly wide: Drawing;
  readonly narrow: Drawing;
}

/** A drawing inside a document. */
export function inlineSvg(drawing: Drawing, alternative: string, cssClass: string): Markup {
  const { width, height, body } = drawing;
  const attributes = {
    class: `pic ${cssClass}`,
    role: 'img',
    'aria-label': alternative,
    viewBox: `0 0 ${Math.ceil(width)} ${Math.ceil(height)}`,
    width: Math.ceil(width),
    height: Math.ceil(height),
  };
  return element('svg', attributes, body);
}

/**
 * A picture as an SVG file of its own: the wide drawing with its own colors for light and dark.
 *
 * @example
 * const { matrix } = folded(transversal(chebyshev({ order: 4, returnLossDb: 20 })));
 * pictureSvg(routingPicture(matrix)).startsWith('<svg xmlns="http://www.w3.org/2000/svg"'); // true
 */
export function pictureSvg({ wide, finding, alternative }: Picture): string {
  const { width, height, body } = wide;
  const attributes = {
    xmlns: 'http://www.w3.org/2000/svg',
    class: 'pic',
    role: 'img',
    viewBox: `0 0 ${Math.ceil(width)} ${Math.ceil(height)}`,
    width: Math.ceil(width),
    height: Math.ceil(height),
  };
  const ground = element('rect', { class: 'f-paper', width, height });
  const heads = fragment(
    element('title', {}, finding),
    element('desc', {}, alternative),
    element('style', {}, constantMarkup(FILE_STYLE)),
  );
  return `${element('svg', attributes, heads, ground, body).markup}\n`;
}
