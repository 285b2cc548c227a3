import { describe, expect, it } from 'vitest';
import { NO_CHROMIUM, picture, useChromium } from './browser.js';
import { FIXTURES, PICTURES, useReports } from './reports.js';

describe.skipIf(NO_CHROMIUM)('an SVG file', () => {
  const chromium = useChromium();
  const written = useReports();

  it.each(FIXTURES.flatMap((fixture) => PICTURES.map((name) => [fixture, name] as const)))(
    '%s, %s: opened by itself it is an image of the size it states, and asks for nothing',
    async (fixture, name) => {
      const text = written(fixture, `${name}.svg`);
      const stated = ['width', 'height'].map((key) => Number(new RegExp(`<svg[^>]* ${key}="(\\d+)"`).exec(text)?.[1]));
      for (const isDark of [false, true]) {
        const opened = await chromium.openText(`${name}.svg`, text, { isDark });
        const { page } = opened;
        const seen = await page.evaluate(() => {
          const root = document.documentElement;
          const { width, height } = root.getBoundingClientRect();
          const ids = [...document.querySelectorAll('[id]')].map(({ id }) => id);
          const used = [...document.querySelectorAll('*')].flatMap((element) =>
            [...element.attributes].flatMap(({ value }) =>
              [...value.matchAll(/url\(["']?#([^)"']+)/g)].map((match) => match[1] as string),
            ),
          );
          return {
            type: document.contentType,
            root: root.tagName,
            space: root.namespaceURI,
            size: [width, height],
            errors: document.querySelectorAll('parsererror').length,
            texts: document.querySelectorAll('text').length,
            title: document.querySelector('title')?.textContent ?? '',
            missing: used.filter((id) => !ids.includes(id)),
            twice: ids.filter((id, n) => ids.indexOf(id) !== n),
            scripts: document.querySelectorAll('script, foreignObject, a, image, use[href^="http"]').length,
          };
        });
        expect(await opened.violations()).toEqual([]);
        await opened.close();
        expect(opened.requests).toEqual([]);
        expect(opened.messages).toEqual([]);
        expect(seen).toMatchObject({
          type: 'image/svg+xml',
          root: 'svg',
          space: 'http://www.w3.org/2000/svg',
          errors: 0,
        });
        expect(seen.size).toEqual(stated);
        expect(seen.texts).toBeGreaterThan(3);
        expect(seen.title).not.toBe('');
        expect(seen.missing).toEqual([]);
        expect(seen.twice).toEqual([]);
        expect(seen.scripts).toBe(0);
      }
    },
  );

  it.each(FIXTURES)('%s: each is shown by a page as an image, light and dark', async (fixture) => {
    const address = (text: string): string => `data:image/svg+xml;base64,${Buffer.from(text).toString('base64')}`;
    const images = PICTURES.map((name) => `<img alt="${name}" src="${address(written(fixture, `${name}.svg`))}">`);
    const text = `<!doctype html><meta name="color-scheme" content="light dark"><title>Images</title>${images.join('')}`;
    for (const isDark of [false, true]) {
      const opened = await chromium.openText('page.html', text, { isDark });
      const sizes = await opened.page.evaluate(async () => {
        const all = [...document.images];
        await Promise.all(all.map((image) => image.decode()));
        return all.map(({ naturalWidth, naturalHeight }) => naturalWidth > 100 && naturalHeight > 50);
      });
      await picture(opened.page, `${fixture}-files-${isDark ? 'dark' : 'light'}`);
      await opened.close();
      expect(sizes).toEqual(PICTURES.map(() => true));
      expect(opened.messages).toEqual([]);
      expect(opened.requests.filter((request) => !request.startsWith('data:'))).toEqual([]);
    }
  });
});
