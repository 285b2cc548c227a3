import { seeded } from '../support/random.js';

/** What could break out of text, an attribute, a comment, a style, a script, a title, or a drawing. */
const PIECES: readonly string[] = [
  '<script>document.title="run";alert(1)</script>',
  '"><img src=x onerror=alert(1)>',
  "' onfocus=alert(1) autofocus tabindex=0 x='",
  '</title><script>alert(1)</script>',
  '</style><style>*{display:none}</style>',
  '</script><script>alert(1)</script>',
  '<svg/onload=alert(1)>',
  '</svg><iframe srcdoc="<script>alert(1)</script>">',
  '<math><mtext></form><form><mglyph><style></math>',
  '<base href=//example.invalid>',
  '<meta http-equiv=refresh content="0;url=//example.invalid">',
  '<link rel=stylesheet href=//example.invalid>',
  '<a href="javascript:alert(1)">',
  '</bdi></h1>',
  '</main></body></html>',
  '<!--',
  '-->',
  ']]>',
  '<![CDATA[',
  '<?xml version="1.0"?>',
  '&lt;b&gt;',
  '&#x3c;b&#x3e;',
  '&amp;amp;',
  '&',
  '<',
  '>',
  '"',
  "'",
  '`',
  '=',
  '\\',
  '$' + '{7*7}',
  '{{7*7}}',
  '%3Cb%3E',
  '=1+1',
  '|cell|',
  '[link](javascript:alert(1))',
  '\u05d0\u05d1\u05d2',
  '\u0627\u0644\u0639',
  'e\u0301\u0323\u0323\u0323\u0323',
  '\u{1f4e1}',
  '\u200d',
  '\u00ad',
  'W'.repeat(30),
  '<b',
  '</',
  '<p style="position:fixed;inset:0">',
  'xlink:href="//example.invalid"',
];

/** What the check of a design file refuses, but a caller of the library could still put into a plain object. */
const REFUSED: readonly string[] = [
  '\u0000',
  '\u001b[31m',
  '\u202e',
  '\u2028',
  '\u2066',
  '\ud800',
  '\udc00<b>',
  '\uffff',
  '\u0085',
  '\ufeff',
];

/** Texts of at most `limit` UTF-16 units, never blank; `isRude` puts characters in that a design file may not hold. */
export function hostileTexts(seed: number, count: number, limit: number, isRude = false): readonly string[] {
  const random = seeded(seed);
  const pieces = isRude ? [...PIECES, ...REFUSED, ...REFUSED] : PIECES;
  const one = (): string => {
    let text = '';
    const wanted = 1 + Math.floor(limit * random());
    for (let n = 0; n < 60 && text.length < wanted; n++) text += pieces[Math.floor(pieces.length * random())];
    // A pair of surrogates is not cut in two, unless rude.
    const cut = text.slice(0, limit);
    return isRude ? cut : cut.replace(/[\ud800-\udbff]$/, '');
  };
  return Array.from({ length: count }, one);
}
