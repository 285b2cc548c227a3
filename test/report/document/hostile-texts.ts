import * as fc from 'fast-check';
import { seeded } from '../../support/random.js';

/** Pieces that have broken out of pages before: tags, attributes, entities, comments, style and script, directions, controls. */
const PIECES: readonly string[] = [
  '<script>alert(1)</script>',
  '</script><script>alert(1)//',
  '<img src=x onerror=alert(1)>',
  '<svg onload=alert(1)>',
  '"><b>',
  "' onmouseover='alert(1)",
  '" autofocus onfocus="alert(1)',
  '</title><script>',
  '</style><style>*{display:none}',
  '</bdi></h1><h1>',
  '</td></tr></table>',
  '<!--',
  '-->',
  '--!>',
  '<![CDATA[',
  ']]>',
  '<?xml version="1.0"?>',
  '<!DOCTYPE html>',
  '&lt;script&gt;',
  '&#60;script&#62;',
  '&amp;',
  '&colon;&Tab;',
  '&#0;',
  'javascript:alert(1)',
  'data:text/html,<p>',
  'https://example.org/',
  'www.example.org',
  'somebody@example.org',
  '<https://example.org>',
  '[a](https://example.org)',
  '![a](x.png)',
  '[a]: https://example.org "b"',
  '[^1]',
  '# head',
  'head\t===',
  '---',
  '* item',
  '1. item',
  '> quote',
  '```js',
  '~~~',
  '    code',
  '`code`',
  '**strong** _soft_ ~~gone~~',
  'a | b | c',
  '| --- | --- |',
  '\\',
  '\\\\[a](b)',
  '$' + '{alert(1)}',
  '{{7*7}}',
  '\u202eabc\u202c',
  '\u2066x\u2069',
  '\u200f',
  '\ufeff',
  '\u0000',
  '\u001b[31m',
  '\u007f\u0085',
  '\u2028',
  '\ud800',
  'x\udfff',
  '\u{1f600}',
  'Füllhorn',
  '滤波器',
  'קבצ',
  '\u0301\u0301',
  'x'.repeat(400),
  '=1+1',
  '; DROP TABLE',
  '%00%3Cscript%3E',
  '\u00a0',
];

/** Texts made from such pieces, and texts of any characters at all: the same ones every time. */
export function hostileTexts(count: number): readonly string[] {
  const random = seeded(20_261_201);
  const pick = (): string => PIECES[Math.floor(random() * PIECES.length)] as string;
  const made = Array.from({ length: count }, (_, n) => {
    const length = 1 + Math.floor(random() * 4);
    const text = Array.from({ length }, pick).join(random() < 0.5 ? '' : ' ');
    return n < PIECES.length ? (PIECES[n] as string) : text;
  });
  const any = fc.sample(fc.string({ unit: 'binary', minLength: 1, maxLength: 60 }), { numRuns: 100, seed: 20_261_201 });
  const halves = fc.sample(fc.array(fc.integer({ min: 1, max: 0xffff }), { minLength: 1, maxLength: 40 }), {
    numRuns: 100,
    seed: 20_261_202,
  });
  return [...made, ...any, ...halves.map((units) => String.fromCharCode(...units))];
}
