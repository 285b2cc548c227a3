import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { NO_CHROMIUM, type Opened, picture, useChromium } from './browser.js';
import { contrastOf } from './page/contrast.js';
import { labelFaultsOf } from './page/labels.js';
import { badRegionsOf, overflowOf } from './page/overflow.js';
import { PAPERS, type Paper, printed } from './page/print.js';
import { FIXTURES, PICTURES, useReports } from './reports.js';

const SHEETS = ['Band in detail', 'Network', 'Hand-over', 'Evidence'];
const WIDTHS = [360, 800, 1400];
const SCHEMES = ['light', 'dark'] as const;
const LOOKS = FIXTURES.flatMap((name) =>
  WIDTHS.flatMap((width) => SCHEMES.map((scheme) => [name, width, scheme] as const)),
);

/** Nothing was asked for, said or refused. */
async function expectSilent({ requests, messages, dialogs, violations }: Opened): Promise<void> {
  expect(requests).toEqual([]);
  expect(messages).toEqual([]);
  expect(dialogs).toEqual([]);
  expect(await violations()).toEqual([]);
}

/** For each picture, which of its two drawings are shown: "wide", "narrow", both, or none. */
function shownDrawings(page: Page): Promise<readonly string[]> {
  return page.evaluate(
    (names) =>
      names.map((name) => {
        const drawings = [...document.querySelectorAll(`#figure-${name} .drawing > svg`)];
        const shown = drawings.filter((svg) => svg.checkVisibility() && svg.getBoundingClientRect().width > 100);
        return `${name}: ${shown.map((svg) => (svg.classList.contains('wide') ? 'wide' : 'narrow')).join(' ')}`;
      }),
    [...PICTURES],
  );
}

/** Ids that are there twice, and references to ids that are not there. */
function idFaults(page: Page): Promise<readonly string[]> {
  return page.evaluate(() => {
    const ids = [...document.querySelectorAll('[id]')].map(({ id }) => id);
    const twice = ids.filter((id, n) => ids.indexOf(id) !== n).map((id) => `twice: ${id}`);
    const wanted = [...document.querySelectorAll('*')].flatMap((element) =>
      [...element.attributes].flatMap(({ name, value }) => {
        if (/^aria-(labelledby|describedby|controls)$/.test(name) || name === 'for') return value.split(' ');
        if (/href$/.test(name)) return value.startsWith('#') ? [value.slice(1)] : [];
        return [...value.matchAll(/url\(["']?#([^)"']+)/g)].map((match) => match[1] as string);
      }),
    );
    const known = new Set(ids);
    return [...twice, ...wanted.filter((id) => !known.has(id)).map((id) => `not there: ${id}`)];
  });
}

describe.skipIf(NO_CHROMIUM)('a report on a screen', () => {
  const chromium = useChromium();
  const written = useReports();

  it.each(LOOKS)('%s at %i px, %s: whole, silent, inside its window', async (name, width, scheme) => {
    const text = written(name, 'report.html');
    const opened = await chromium.openText('report.html', text, { width, isDark: scheme === 'dark' });
    const { page } = opened;
    expect.soft(await page.locator('h1:visible, h2:visible').count()).toBe(2 + SHEETS.length);
    expect.soft(await page.locator('section.sheet > h2').allTextContents()).toEqual(SHEETS);
    const format = width < 500 ? 'narrow' : '(wide|narrow)';
    for (const shown of await shownDrawings(page)) expect.soft(shown).toMatch(new RegExp(`: ${format}$`));
    expect.soft(await idFaults(page)).toEqual([]);
    expect.soft(await overflowOf(page)).toEqual([]);
    expect.soft(await badRegionsOf(page)).toEqual([]);
    const labels = await labelFaultsOf(page);
    expect.soft(labels.texts).toBeGreaterThan(60);
    expect.soft(labels.small).toEqual([]);
    expect.soft(labels.outside).toEqual([]);
    expect.soft(labels.overlaps).toEqual([]);
    await picture(page, `${name}-${width}-${scheme}`);
    await expectSilent(opened);
    await opened.close();
  });

  it.each(FIXTURES.flatMap((name) => SCHEMES.map((scheme) => [name, scheme] as const)))(
    '%s, %s: every text has a contrast of 4.5 to its ground',
    async (name, scheme) => {
      for (const width of [360, 1400]) {
        const look = { width, isDark: scheme === 'dark' };
        const { page, close } = await chromium.openText('report.html', written(name, 'report.html'), look);
        await page.evaluate(() => {
          for (const fold of document.querySelectorAll('details')) fold.open = true;
        });
        const { texts, least, low } = await contrastOf(page);
        await close();
        console.log(`${name}, ${scheme}, ${width} px: least contrast ${least.toFixed(2)} of ${texts} texts`);
        expect.soft(texts).toBeGreaterThan(300);
        expect.soft(low).toEqual([]);
      }
    },
  );
});

describe.skipIf(NO_CHROMIUM)('a report on paper', () => {
  const chromium = useChromium();
  const written = useReports();
  const papers = FIXTURES.flatMap((name) => (Object.keys(PAPERS) as Paper[]).map((paper) => [name, paper] as const));

  it.each(papers)(
    '%s on %s: first page is one page, all sheets and pictures, nothing too wide',
    async (name, paper) => {
      const width = Math.floor(PAPERS[paper].width - (2 * 12 * 96) / 25.4);
      const opened = await chromium.openText('report.html', written(name, 'report.html'), { width });
      const { page } = opened;
      await page.emulateMedia({ media: 'print' });
      expect.soft(await overflowOf(page)).toEqual([]);
      for (const shown of await shownDrawings(page)) expect.soft(shown).toMatch(/: (wide|narrow)$/);
      expect.soft(await page.locator('section.sheet > h2').allTextContents()).toEqual(SHEETS);
      expect.soft(await page.locator('#mask-points').isVisible()).toBe(true);
      const labels = await labelFaultsOf(page, 9.3);
      expect.soft(labels.small).toEqual([]);
      expect.soft(labels.outside).toEqual([]);
      expect.soft(labels.overlaps).toEqual([]);
      const whole = await printed(page, paper);
      console.log(`${name} on ${paper}: ${whole.pages} pages`);
      expect.soft(whole.pages).toBeGreaterThan(1);
      expect.soft(whole.pages).toBeLessThanOrEqual(8);
      const folder = process.env.IRISLOOM_SCREENSHOTS;
      if (folder !== undefined) writeFileSync(join(folder, `${name}-${paper}.pdf`), whole.bytes);
      await page.evaluate(() => {
        for (const sheet of document.querySelectorAll('section.sheet')) sheet.remove();
      });
      expect.soft((await printed(page, paper)).pages).toBe(1);
      await expectSilent(opened);
      await opened.close();
    },
  );
});
