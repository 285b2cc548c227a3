import type { Picture } from '../../svg/drawing.js';
import type { Block, Cell, Column, Row, Sheet, Table } from '../content/content.js';
import { escapeOwn, escapeUser, lineStart } from './escape.js';

/** Gives a picture by its name; undefined where there is none. */
export type PictureOf = (name: string) => Picture | undefined;

/** A cell or a sentence. */
export function cellText(cell: Cell): string {
  return typeof cell === 'string' ? escapeOwn(cell) : escapeUser(cell.user);
}

function headText({ head, unit }: Column): string {
  return escapeOwn(unit === undefined ? head : `${head}, ${unit}`);
}

function rowText({ cells, tones = [] }: Row): string {
  const isStrong = tones.length > 0;
  const texts = cells.map((cell) => {
    const text = cellText(cell);
    return isStrong && text !== '' ? `**${text}**` : text;
  });
  return `| ${texts.join(' | ')} |`;
}

/** A table with its caption above and its note below. */
export function tableLines({ caption, columns, rows, note }: Table): readonly string[] {
  const head = `| ${columns.map(headText).join(' | ')} |`;
  const rule = `|${columns.map(({ kind }) => (kind === 'text' ? ' --- |' : ' ---: |')).join('')}`;
  const below = note === undefined ? [] : ['', escapeOwn(note)];
  return [`**${escapeOwn(caption)}**`, '', head, rule, ...rows.map(rowText), ...below, ''];
}

/** A picture as a link to its file beside this one, its finding above and how to read it below. */
export function pictureLines({ name, finding, caption, alternative }: Picture): readonly string[] {
  return [`### ${escapeOwn(finding)}`, '', `![${escapeOwn(alternative)}](${name}.svg)`, '', escapeOwn(caption), ''];
}

function blockLines(block: Block, pictureOf: PictureOf): readonly string[] {
  switch (block.kind) {
    case 'picture': {
      const picture = pictureOf(block.name);
      return picture === undefined ? [] : pictureLines(picture);
    }
    case 'table':
    case 'fold':
      return tableLines(block.table);
    case 'text': {
      const head = block.head === undefined ? [] : [`**${escapeOwn(block.head)}**`, ''];
      return [...head, ...block.sentences.flatMap((sentence) => [lineStart(cellText(sentence)), ''])];
    }
    case 'list':
      return [`**${escapeOwn(block.head)}**`, '', ...block.items.map((item) => `- ${lineStart(cellText(item))}`), ''];
  }
}

/** One sheet after the first. */
export function sheetLines({ head, stacks }: Sheet, pictureOf: PictureOf): readonly string[] {
  const blocks = stacks.flatMap((stack) => stack.blocks);
  return [`## ${escapeOwn(head)}`, '', ...blocks.flatMap((block) => blockLines(block, pictureOf))];
}
