import { type Node, Parser } from 'commonmark';
import { describe, expect, it } from 'vitest';
import { documentHtml } from '../../../src/report/document/html/document-html.js';
import { documentMarkdown } from '../../../src/report/document/markdown/document-markdown.js';
import type { DesignReport, DesignSource } from '../../../src/report/index.js';
import { sampleDesign } from '../designs.js';
import { hostileTexts } from './hostile-texts.js';
import { elementsOf, parsed, shapeOf, textOf } from './tree.js';

const TEXTS = hostileTexts(500);
/** A small design: where only texts differ, few tables and no picture show it as well. */
const base = sampleDesign({ order: 2, unloadedQ: 5000, mask: [{ fromHz: '1.05 GHz', rejectionDb: 10 }] });
const few = { pictures: [] };

type Zone = 'name' | 'notes' | 'revision' | 'file';

function withText(zone: Zone, text: string): readonly [DesignReport, DesignSource] {
  const source = { file: zone === 'file' ? text : 'one.json', sha256: 'ab'.repeat(32) };
  const texts = { name: 'Plain', notes: 'Plain', revision: 'A', ...(zone === 'file' ? {} : { [zone]: text }) };
  return [{ ...base, specification: { ...base.specification, ...texts } }, source];
}

/** Whether no document should hold a character: controls, marks of direction, half characters, and what is none. */
function isForbidden(point: number): boolean {
  const isControl = (point < 0x20 && ![9, 10, 13].includes(point)) || (point >= 0x7f && point <= 0x9f);
  const isMark = [0x61c, 0x200e, 0x200f, 0xfeff].includes(point) || (point >= 0x2028 && point <= 0x202e);
  const isIsolate = point >= 0x2066 && point <= 0x2069;
  const isNone = (point & 0xfffe) === 0xfffe || (point >= 0xfdd0 && point <= 0xfdef);
  return isControl || isMark || isIsolate || isNone || (point >= 0xd800 && point <= 0xdfff);
}

/** What stands in the page for a text; HTML reads every end of line as one character (WHATWG HTML, 13.2.3.5, from memory). */
function shown(text: string): string {
  const clean = Array.from(text, (each) => (isForbidden(each.codePointAt(0)!) ? '\ufffd' : each)).join('');
  return clean.replace(/\r\n?/g, '\n');
}

/** Texts of the same kind: notes fall into lines, of which empty ones vanish. */
function harmlessLike(zone: Zone, text: string): string {
  if (zone !== 'notes') return 'x';
  return shown(text)
    .split('\n')
    .map((line) => (line.trim() === '' ? '' : 'x'))
    .join('\n');
}

const ZONES: readonly Zone[] = ['name', 'notes', 'revision', 'file'];

describe.each(ZONES)('hostile text in the %s', (zone) => {
  it('adds no node and no attribute to the page, and stands there as it is', () => {
    const shapes = new Map<string, string>();
    let seen = 0;
    for (const text of TEXTS) {
      const like = harmlessLike(zone, text);
      const plain = shapes.get(like) ?? shapeOf(parsed(documentHtml(...withText(zone, like), few)));
      shapes.set(like, plain);
      const tree = parsed(documentHtml(...withText(zone, text), few));
      expect(shapeOf(tree) === plain, JSON.stringify(text)).toBe(true);
      const told = elementsOf(tree)
        .filter(({ tagName }) => tagName === 'bdi')
        .map(textOf);
      const lines =
        zone === 'notes'
          ? shown(text)
              .split('\n')
              .filter((line) => line.trim() !== '')
          : [shown(text)];
      for (const line of lines) expect(told, JSON.stringify(text)).toContain(line);
      seen += lines.length;
    }
    expect(seen).toBeGreaterThan(650);
  }, 120_000);

  it('makes no markup, link, picture or head in Markdown, and stands there as it is', () => {
    const shapes = new Map<string, string>();
    for (const text of TEXTS) {
      const like = harmlessLike(zone, text);
      const plain = shapes.get(like) ?? kindsOf(documentMarkdown(...withText(zone, like), few.pictures)).shape;
      shapes.set(like, plain);
      const markdown = documentMarkdown(...withText(zone, text), few.pictures);
      const { shape, words } = kindsOf(markdown);
      expect(shape, JSON.stringify(text)).toBe(plain);
      const line =
        shown(text)
          .split('\n')
          .map((each) => each.replace(/\s+/g, ' ').trim())
          .find((each) => each !== '') ?? '';
      if (zone !== 'notes') expect(words, JSON.stringify(text)).toContain(shown(text).replace(/\s+/g, ' ').trim());
      else expect(words, JSON.stringify(text)).toContain(line);
      // Addresses alone become links in some readers: none of the user's may be left whole.
      expect(markdown).not.toMatch(/https?:\/\/|www\.|\w@\w/);
    }
  }, 120_000);
});

/** Kinds of nodes in the order of the text, and its words. */
function kindsOf(markdown: string): { readonly shape: string; readonly words: string } {
  const walker = new Parser().parse(markdown).walker();
  const kinds: string[] = [];
  let words = '';
  for (let step = walker.next(); step !== null; step = walker.next()) {
    const { entering, node }: { entering: boolean; node: Node } = step;
    if (node.type === 'text') words += node.literal ?? '';
    else if (node.type === 'softbreak') words += '\n';
    else if (entering) kinds.push(`${node.type}${node.type === 'heading' ? node.level : ''}${node.destination ?? ''}`);
  }
  return { shape: kinds.join(' '), words };
}

describe('harmless text in Markdown', () => {
  it.each([
    'Larkmoor, C-band (rev. 2) - draft; 50 % done!',
    'A & B, AT&T: "combined" mask / part #7, 1 > 0, a=b+c^2',
    'snake_case_name, www, 12:30, x.y',
  ])('stands in the file as it was written: %s', (text) => {
    for (const zone of ['name', 'revision', 'notes'] as const)
      expect(documentMarkdown(...withText(zone, text), few.pictures)).toContain(text);
  });

  it('numbers of tables are not escaped', () => {
    const markdown = documentMarkdown(...withText('name', 'x'), few.pictures);
    expect(markdown).toMatch(/\| [+-]\d\.\d+ \|/);
    expect(markdown).not.toMatch(/\\[-+.,>=]/);
  });
});

describe('the checks of this file', () => {
  it('see markup that a text makes', () => {
    const [one, other] = ['<p><bdi>x</bdi></p>', '<p><bdi><b>x</b></bdi></p>'].map((inner) =>
      shapeOf(parsed(`<!DOCTYPE html><html lang="en"><head><title>x</title></head><body>${inner}</body></html>`)),
    );
    expect(one).not.toBe(other);
    expect(() => parsed('<p id="a" id="a">')).toThrow('not valid');
    expect(kindsOf('# a [b](c)').shape).toBe('document heading1 linkc');
    expect(kindsOf('a <b>').shape).toContain('html_inline');
  });
});
