import { inlineSvg, type Picture } from '../../svg/drawing.js';
import { element, fragment, type Markup } from '../../svg/markup.js';
import { sentenceSigns } from './typography.js';

/** How a figure stands in the document. */
export interface FigurePlace {
  readonly number: number;
  /** Whether the document holds the numbers that a cursor reads. */
  readonly hasReadout: boolean;
  /** What stands under the caption. */
  readonly below?: Markup;
}

/** A picture with its number and finding above, both drawings, of which the style shows one, and its caption. */
export function figureMarkup(picture: Picture, { number, hasReadout, below }: FigurePlace): Markup {
  const { name, finding, caption, alternative, wide, narrow } = picture;
  const id = `figure-${name}`;
  const drawings = fragment(inlineSvg(wide, alternative, 'wide'), inlineSvg(narrow, alternative, 'narrow'));
  const isChart = hasReadout && wide.body.markup.includes('data-from-hz');
  // Empty and hidden until the script gives it something to say.
  const readout = element('p', { class: 'readout', id: `${id}-readout`, 'aria-live': 'polite', hidden: '' });
  return element(
    'figure',
    { id, 'aria-labelledby': `${id}-head` },
    element(
      'h3',
      { id: `${id}-head` },
      element('span', { class: 'number' }, String(number)),
      ' ',
      sentenceSigns(finding),
    ),
    element(
      'div',
      { class: 'body' },
      element('div', { class: isChart ? 'drawing chart' : 'drawing' }, drawings, ...(isChart ? [readout] : [])),
      element('figcaption', {}, sentenceSigns(caption), ...(below === undefined ? [] : [below])),
    ),
  );
}
