import { element, fragment, type Markup } from '../../svg/markup.js';
import type { Block, Sheet, Stack } from '../content/content.js';
import { cellMarkup, tableMarkup } from './table-html.js';
import { formulaSigns, sentenceSigns } from './typography.js';

/** Gives a figure by the name of its picture; undefined where there is none. */
export type FigureOf = (name: string) => Markup | undefined;

function headed(head: string | undefined, ...parts: readonly Markup[]): Markup {
  return fragment(...(head === undefined ? [] : [element('h3', {}, head)]), ...parts);
}

function blockMarkup(block: Block, figureOf: FigureOf): readonly Markup[] {
  switch (block.kind) {
    case 'picture': {
      const figure = figureOf(block.name);
      return figure === undefined ? [] : [figure];
    }
    case 'table':
      return [tableMarkup(block.table)];
    case 'fold': {
      const { caption } = block.table;
      return [element('details', {}, element('summary', {}, caption), tableMarkup(block.table))];
    }
    case 'text': {
      const lines = block.sentences.map((sentence) => element('p', {}, cellMarkup(sentence, sentenceSigns)));
      return [element('div', { class: 'text' }, headed(block.head, ...lines))];
    }
    case 'list': {
      const signs = block.isFormula === true ? formulaSigns : sentenceSigns;
      const items = block.items.map((item) => element('li', {}, cellMarkup(item, signs)));
      return [element('div', { class: 'text' }, headed(block.head, element('ul', {}, ...items)))];
    }
  }
}

function stackMarkup({ shape, blocks }: Stack, figureOf: FigureOf): readonly Markup[] {
  const inner = blocks.flatMap((block) => blockMarkup(block, figureOf));
  return inner.length === 0 ? [] : [element('div', { class: shape }, ...inner)];
}

/** One sheet after the first; `running` says on paper whose sheet it is. */
export function sheetMarkup({ id, head, stacks }: Sheet, figureOf: FigureOf, running: Markup): Markup {
  const headId = `${id}-head`;
  return element(
    'section',
    { id, class: 'sheet', 'aria-labelledby': headId },
    running,
    element('h2', { id: headId }, head),
    element('div', { class: 'pair' }, ...stacks.flatMap((stack) => stackMarkup(stack, figureOf))),
  );
}
