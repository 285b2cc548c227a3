import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { expectSilent, NO_CHROMIUM, picture, useChromium } from './browser.js';
import { contrastOf } from './page/contrast.js';
import { layoutFaultsOf, shownDrawings } from './page/faults.js';
import { firstPages, PAPERS, type Paper, printed, textWidth } from './page/print.js';
import { FIXTURES, useReports } from './reports.js';

const SHEETS = ['Band in detail', 'Network', 'Hand-over', 'Evidence'];
const WIDTHS = [360, 800, 1400];
const SCHEMES = ['light', 'dark'] as const;
const LOOKS = FIXTURES.flatMap((name) =>
  WIDTHS.flatMap((width) => SCHEMES.map((scheme) => [name, width, scheme] as const)),
);
const PRINTS = FIXTURES.flatMap((name) => (Object.keys(PAPERS) as Paper[]).map((paper) => [name, paper] as const));

describe.skipIf(NO_CHROMIUM)('a report', () => {
  const chromium = useChromium();
  const written = useReports();

  it.each(LOOKS)('%s at %i px, %s: whole, silent, inside its window', async (name, width, scheme) => {
    const text = written(name, 'report.html');
    const opened = await chromium.openText('report.html', text, { width, isDark: scheme === 'dark' });
    const { page } = opened;
    expect.soft(await page.locator('h1:visible, h2:visible').count()).toBe(2 + SHEETS.length);
    expect.soft(await page.locator('section.sheet > h2').allTextContents()).toEqual(SHEETS);
    if (width < 500) for (const shown of await shownDrawings(page)) expect.soft(shown).toMatch(/: narrow$/);
    expect.soft(await layoutFaultsOf(page, 'screen')).toEqual([]);
    await picture(page, `${name}-${width}-${scheme}`);
    await expectSilent(opened);
    await opened.close();
  });

  it.each(FIXTURES)('%s: from 360 to 1400 px no width lets anything stick out or shrinks a letter', async (name) => {
    const { page, close } = await chromium.openText('report.html', written(name, 'report.html'), { width: 360 });
    const faults: string[] = [];
    for (let width = 360; width <= 1400; width += 40) {
      await page.setViewportSize({ width, height: 900 });
      faults.push(...(await layoutFaultsOf(page, 'screen')).map((fault) => `${width} px: ${fault}`));
    }
    await close();
    expect(faults).toEqual([]);
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

  it.each(PRINTS)(
    '%s on %s: first page is one page, all sheets and pictures, nothing too wide',
    async (name, paper) => {
      const look = { width: textWidth(paper) };
      const opened = await chromium.openText('report.html', written(name, 'report.html'), look);
      const { page } = opened;
      await page.emulateMedia({ media: 'print' });
      expect.soft(await layoutFaultsOf(page, 'paper')).toEqual([]);
      expect.soft(await page.locator('section.sheet > h2').allTextContents()).toEqual(SHEETS);
      expect.soft(await page.locator('#mask-points').isVisible()).toBe(true);
      const whole = await printed(page, paper);
      console.log(`${name} on ${paper}: ${whole.pages} pages`);
      expect.soft(whole.pages).toBeGreaterThan(1);
      expect.soft(whole.pages).toBeLessThanOrEqual(10);
      const folder = process.env.IRISLOOM_SCREENSHOTS;
      if (folder !== undefined) writeFileSync(join(folder, `${name}-${paper}.pdf`), whole.bytes);
      expect.soft(await firstPages(page, paper)).toBe(1);
      await expectSilent(opened);
      await opened.close();
    },
  );
});
