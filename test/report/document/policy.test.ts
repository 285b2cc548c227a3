import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { reportHtml } from '../../../src/report/index.js';
import { sampleDesign } from '../designs.js';
import { attributeOf, elementsOf, parsed, textOf } from './tree.js';

/** The source expression of a text, as W3C, Content Security Policy Level 3, 2.3.1 has it (from memory). */
function digestOf(text: string): string {
  return `'sha256-${createHash('sha256').update(text, 'utf8').digest('base64')}'`;
}

describe('the policy of the document', () => {
  const tree = parsed(reportHtml(sampleDesign({ unloadedQ: 5000, mask: [{ fromHz: '1.03 GHz', rejectionDb: 20 }] })));
  const all = elementsOf(tree);
  const metas = all.filter(({ tagName }) => tagName === 'meta');
  const policy = metas.find((meta) => attributeOf(meta, 'http-equiv') === 'Content-Security-Policy');
  const content = attributeOf(policy!, 'content') ?? '';
  const only = (tagName: string) => all.filter((each) => each.tagName === tagName);

  it('allows nothing but the one style and the one script, which it names by their digests', () => {
    const style = digestOf(textOf(only('style')[0]!));
    const script = digestOf(textOf(only('script').find((each) => attributeOf(each, 'type') === undefined)!));
    // What to write in src/report/document/html/policy.ts stands in the message of this failure.
    expect(content.split('; ')).toEqual([
      "default-src 'none'",
      `style-src ${style}`,
      `script-src ${script}`,
      "base-uri 'none'",
      "form-action 'none'",
    ]);
  });

  it('stands before everything that it rules, and no referrer is told', () => {
    const place = (wanted: (typeof all)[number]) => all.indexOf(wanted);
    expect(place(policy!)).toBeLessThan(place(only('style')[0]!));
    expect(all.indexOf(policy!)).toBe(all.indexOf(only('head')[0]!) + 2);
    const referrer = metas.find((meta) => attributeOf(meta, 'name') === 'referrer');
    expect(attributeOf(referrer!, 'content')).toBe('no-referrer');
  });

  it('finds nothing to forbid: one style, one script, data beside it, no attribute that runs or styles', () => {
    expect(only('style')).toHaveLength(1);
    expect(only('script').map((each) => attributeOf(each, 'type'))).toEqual(['application/json', undefined]);
    const names = all.flatMap(({ attrs }) => attrs.map(({ name }) => name));
    expect(names.filter((name) => name === 'style' || name.startsWith('on'))).toEqual([]);
  });

  it('needs to stop no request: every link stays within the document', () => {
    const links = all.flatMap(({ attrs }) =>
      attrs.filter(({ name }) => /^(href|src|srcset|xlink:href|action|poster|data)$/.test(name)),
    );
    expect(links.length).toBeGreaterThan(4);
    expect(links.filter(({ value }) => !value.startsWith('#'))).toEqual([]);
    const style = textOf(only('style')[0]!);
    expect(style).not.toMatch(/url\(|@import|@font-face|<|>\s*<|\\/);
  });

  it('keeps the script below 6 kB', () => {
    const script = textOf(only('script')[1]!);
    expect(Buffer.byteLength(script)).toBeLessThan(6144);
    expect(script).not.toMatch(/fetch|XMLHttp|import\(|eval|Function\(|innerHTML|localStorage|cookie/);
  });
});
