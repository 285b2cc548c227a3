import { describe, expect, it } from 'vitest';
import { NO_CHROMIUM, useChromium } from './browser.js';
import { contrastOf } from './page/contrast.js';
import { idFaultsOf } from './page/faults.js';
import { labelFaultsOf } from './page/labels.js';
import { badRegionsOf, overflowOf } from './page/overflow.js';
import { printed } from './page/print.js';

const page = (body: string, head = ''): string =>
  `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Planted</title>${head}
<style>body{margin:0;font:16px "DejaVu Sans"}</style></head><body>${body}</body></html>`;

const drawing = (inner: string, width = 200): string =>
  `<svg width="${width}" height="100" viewBox="0 0 200 100" style="overflow:visible">${inner}</svg>`;

// Every check of the harness is shown a page with one fault of its kind, and one without.
describe.skipIf(NO_CHROMIUM)('the harness', () => {
  const chromium = useChromium();

  it('notices requests, messages, errors, dialogs and what a policy refuses', async () => {
    const policy = `<meta http-equiv="Content-Security-Policy" content="default-src 'none'; script-src 'unsafe-inline'; img-src file:">`;
    const script = `console.error('planted'); setTimeout(() => { throw new Error('thrown'); }); alert('box'); fetch('other.json').catch(() => 0);`;
    const opened = await chromium.openText(
      'a.html',
      page(`<img alt="" src="x.png"><script>${script}</script>`, policy),
    );
    await opened.page.waitForTimeout(200);
    const violations = await opened.violations();
    await opened.close();
    expect(opened.requests.filter((request) => request.endsWith('x.png'))).toHaveLength(1);
    expect(opened.messages.join('\n')).toContain('planted');
    expect(opened.messages.join('\n')).toContain('thrown');
    expect(opened.dialogs).toEqual(['box']);
    expect(violations.some((violation) => violation.startsWith('connect-src'))).toBe(true);
    expect(violations.some((violation) => violation.startsWith('style-src'))).toBe(true);
  });

  it('notices nothing about a page that is silent', async () => {
    const opened = await chromium.openText('a.html', page('<p>Text</p>'));
    const noticed = [opened.requests, opened.messages, opened.dialogs, await opened.violations()];
    await opened.close();
    expect(noticed).toEqual([[], [], [], []]);
  });

  it.each([
    ['<div id="wide" style="width:500px">x</div>', 'wide'],
    ['<div style="overflow:hidden"><div id="cut" style="width:500px">x</div></div>', 'cut'],
    ['<div id="left" style="margin-left:-20px">x</div>', 'left'],
  ])('notices what sticks out: %s', async (body, id) => {
    const opened = await chromium.openText('a.html', page(body), { width: 360 });
    const found = await overflowOf(opened.page);
    await opened.close();
    expect(found.some((fault) => fault.includes(`#${id}`))).toBe(true);
  });

  it('lets a region scroll that a keyboard reaches and that has a name, and no other', async () => {
    const region = (more: string): string =>
      `<div style="overflow-x:auto" ${more}><div style="width:500px">x</div></div>`;
    const good = 'tabindex="0" role="region" aria-label="Values"';
    const faults: number[] = [];
    for (const more of [good, 'tabindex="0"', 'aria-label="Values"']) {
      const opened = await chromium.openText('a.html', page(region(more)), { width: 360 });
      faults.push((await overflowOf(opened.page)).length + (await badRegionsOf(opened.page)).length);
      await opened.close();
    }
    expect(faults[0]).toBe(0);
    expect(Math.min(...faults.slice(1))).toBeGreaterThan(0);
  });

  it('notices labels that are small, outside, or over each other, and no others', async () => {
    const text = (x: number, y: number, words: string): string =>
      `<text x="${x}" y="${y}" font-size="12">${words}</text>`;
    const faults = async (svg: string) => {
      const opened = await chromium.openText('a.html', page(svg));
      const { small, outside, overlaps } = await labelFaultsOf(opened.page);
      await opened.close();
      return [small.length, outside.length, overlaps.length];
    };
    expect(await faults(drawing(text(10, 20, 'one') + text(10, 34, 'two')))).toEqual([0, 0, 0]);
    expect(await faults(drawing(text(10, 20, 'one'), 150))).toEqual([1, 0, 0]);
    expect(await faults(drawing(text(180, 20, 'long word')))).toEqual([0, 1, 0]);
    expect(await faults(drawing(text(10, 20, 'one') + text(14, 26, 'two')))).toEqual([0, 0, 1]);
  });

  it('measures contrast as WCAG does, in text and in drawings', async () => {
    // #767676 on white is 4.54, #777777 is 4.48 (the two greys that stand on either side of the limit; from memory).
    const body = (ink: string): string =>
      `<p style="color:${ink}">text</p>${drawing(`<rect width="200" height="100" fill="#fff"/><text x="50" y="50" fill="${ink}">text</text>`)}`;
    const least: number[] = [];
    const low: number[] = [];
    for (const ink of ['#767676', '#777777']) {
      const opened = await chromium.openText('a.html', page(body(ink)));
      const found = await contrastOf(opened.page);
      await opened.close();
      least.push(found.least);
      low.push(found.low.length);
    }
    expect(least[0]).toBeCloseTo(4.54, 2);
    expect(least[1]).toBeCloseTo(4.48, 2);
    expect(low).toEqual([0, 2]);
  });

  it('notices ids that are there twice and references that lead nowhere', async () => {
    const opened = await chromium.openText('a.html', page('<p id="a"></p><p id="a"></p><a href="#b">x</a>'));
    const found = await idFaultsOf(opened.page);
    await opened.close();
    expect(found).toEqual(['id twice: a', 'id not there: b']);
  });

  it('counts printed pages', async () => {
    const opened = await chromium.openText('a.html', page('<p style="break-after:page">one</p><p>two</p>'));
    const { pages } = await printed(opened.page, 'A4');
    await opened.close();
    expect(pages).toBe(2);
  });
});
