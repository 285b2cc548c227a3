import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { element, escapeMarkup, fragment } from '../../../src/report/svg/markup.js';

describe('element(name, attributes, ...children)', () => {
  it('escapes text and attributes and leaves markup as it is', () => {
    const inner = element('b', {}, 'a < b & "c"');
    expect(inner.markup).toBe('<b>a &lt; b &amp; &quot;c&quot;</b>');
    expect(element('a', { title: `'"><x>` }, inner).markup).toBe(
      '<a title="&#39;&quot;&gt;&lt;x&gt;"><b>a &lt; b &amp; &quot;c&quot;</b></a>',
    );
    expect(fragment('<', inner).markup).toBe(`&lt;${inner.markup}`);
  });

  it('takes nothing for markup that it has not made', () => {
    const forged = { markup: '<img src=x>' } as never;
    expect(element('p', { title: forged }, forged).markup).not.toContain('<img');
    expect(fragment(forged).markup).toBe('[object Object]');
  });

  it('rounds numbers to a tenth, leaves out what is absent, and writes no minus zero', () => {
    expect(element('rect', { x: 1.26, y: -0.04, class: undefined }).markup).toBe('<rect x="1.3" y="0"/>');
  });

  it('lets no character through that XML forbids or that turns the writing direction', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 60 }), (text) => {
        const out = escapeMarkup(text);
        expect(out).not.toMatch(/[<>"']/);
        expect(out).not.toMatch(/&(?!amp;|lt;|gt;|quot;|#39;)/);
        // biome-ignore lint/suspicious/noControlCharactersInRegex: what must not be there
        expect(out).not.toMatch(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\u202a-\u202e\u2066-\u2069]/);
        // Throws on a surrogate that stands alone.
        expect(() => encodeURIComponent(out)).not.toThrow();
      }),
      { seed: 20261201, numRuns: 2000 },
    );
    expect(escapeMarkup('a\ud800b\udc00c\u{1f600}')).toBe('a\ufffdb\ufffdc\u{1f600}');
  });
});
