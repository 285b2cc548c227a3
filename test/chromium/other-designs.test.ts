import { describe, expect, it } from 'vitest';
import { design, type SpecificationInput } from '../../src/index.js';
import { reportHtml } from '../../src/report/index.js';
import { expectSilent, NO_CHROMIUM, picture, useChromium } from './browser.js';
import { contrastOf } from './page/contrast.js';
import { layoutFaultsOf } from './page/faults.js';
import { firstPages, printed, textWidth } from './page/print.js';

const BAND = { lowerHz: '3822 MHz', upperHz: '3858 MHz' };
const rejection = (fromHz: string, toHz: string, rejectionDb: number) => ({ fromHz, toHz, rejectionDb });

/** Designs that the fixtures do not stand for: a miss, many requirements, no loss, no mask, every topology, high orders. */
const DESIGNS: Readonly<Record<string, SpecificationInput>> = {
  'one miss': {
    passband: BAND,
    order: 6,
    returnLossDb: 22,
    transmissionZeros: [-1.45, 1.45],
    unloadedQ: 9000,
    revision: 'B2',
    date: '2026-12-01',
    mask: [
      rejection('3700 MHz', '3816 MHz', 34),
      { fromHz: '3823 MHz', toHz: '3857 MHz', returnLossDb: 20 },
      { fromHz: '3823 MHz', toHz: '3857 MHz', insertionLossVariationDb: 0.3 },
      { fromHz: '3823 MHz', toHz: '3857 MHz', groupDelayVariationSeconds: 25e-9 },
    ],
  },
  'a long name': {
    name: 'A name of one hundred and twenty characters, as long as a name may be, so that it needs three lines of a telephone',
    notes:
      'First line.\nSecond line, with a word that does not break: ABCDEFGHIJKLMNOPQRSTUVWXYZABCDEFGHIJKLMNOPQRSTUVWXYZ',
    revision: 'Revision of 20 signs',
    date: '2026-12-01',
    passband: BAND,
    order: 7,
    returnLossDb: 20,
    transmissionZeros: [1.5],
    unloadedQ: 12_000,
    mask: [{ fromHz: '3823 MHz', toHz: '3857 MHz', returnLossDb: 18 }],
  },
  'fourteen requirements': {
    name: 'Harrow Fen, output multiplexer channel 7',
    passband: BAND,
    order: 8,
    returnLossDb: 20,
    transmissionZeros: [-1.3, 1.3, 1.7],
    unloadedQ: 12_000,
    mask: [
      ...Array.from({ length: 10 }, (_, n) => rejection(`${3870 + 10 * n} MHz`, `${3880 + 10 * n} MHz`, 30 + n)),
      { fromHz: '3823 MHz', toHz: '3857 MHz', returnLossDb: 18 },
      { fromHz: '3840 MHz', toHz: '3840 MHz', insertionLossDb: 0.8 },
      { fromHz: '3823 MHz', toHz: '3857 MHz', insertionLossVariationDb: 1, relativeTo: 'center' },
      { fromHz: '3823 MHz', toHz: '3857 MHz', groupDelayVariationSeconds: 120e-9 },
    ],
  },
  'no loss, no mask, no zeros': { passband: BAND, order: 3, returnLossDb: 20 },
  'order one': { passband: { centerHz: '1 GHz', bandwidthHz: '5 MHz' }, order: 1, returnLossDb: 20 },
  butterworth: { passband: BAND, order: 5, family: 'butterworth', topology: 'inline', unloadedQ: 5000 },
  'arrow of order 8': {
    passband: BAND,
    order: 8,
    returnLossDb: 22,
    transmissionZeros: [1.2, -1.3, 1.6],
    topology: 'arrow',
  },
  'transversal of order 6': {
    passband: BAND,
    order: 6,
    returnLossDb: 22,
    transmissionZeros: [1.4],
    topology: 'transversal',
  },
  'order 14 with pairs': {
    passband: { centerHz: '12.75 GHz', bandwidthHz: '250 MHz' },
    order: 14,
    returnLossDb: 22,
    transmissionZeros: [1.05, 1.12, -1.05, -1.12, { re: 0.6, im: 0.2 }, { re: -0.6, im: 0.2 }],
    unloadedQ: Array.from({ length: 14 }, (_, n) => 8000 + 100 * n),
  },
  'order 24 chain in kHz': { passband: { lowerHz: '450 kHz', upperHz: '460 kHz' }, order: 24, returnLossDb: 26 },
};

const NAMES = Object.keys(DESIGNS);

describe.skipIf(NO_CHROMIUM)('reports of other designs', () => {
  const chromium = useChromium();
  const pages = new Map<string, string>();
  const pageOf = (name: string): string => {
    const page = pages.get(name) ?? reportHtml(design(DESIGNS[name] as SpecificationInput));
    pages.set(name, page);
    return page;
  };

  it.each(NAMES.flatMap((name) => [360, 700, 1100].map((width) => [name, width] as const)))(
    '%s at %i px: whole, silent, inside its window',
    async (name, width) => {
      const opened = await chromium.openText('report.html', pageOf(name), { width });
      expect.soft(await layoutFaultsOf(opened.page, 'screen')).toEqual([]);
      await picture(opened.page, `other ${name} ${width}`);
      await expectSilent(opened);
      await opened.close();
    },
  );

  it.each(NAMES)('%s: every text has a contrast of 4.5 to its ground, dark too', async (name) => {
    for (const isDark of [false, true]) {
      const { page, close } = await chromium.openText('report.html', pageOf(name), { isDark });
      const { low, texts } = await contrastOf(page);
      await close();
      expect.soft(texts).toBeGreaterThan(150);
      expect.soft(low).toEqual([]);
    }
  });

  it.each(NAMES)('%s on paper: first page is one page, nothing too wide', async (name) => {
    for (const paper of ['A4', 'Letter'] as const) {
      const { page, close } = await chromium.openText('report.html', pageOf(name), { width: textWidth(paper) });
      await page.emulateMedia({ media: 'print' });
      expect.soft(await layoutFaultsOf(page, 'paper'), paper).toEqual([]);
      const { pages: whole } = await printed(page, paper);
      expect.soft(whole, paper).toBeGreaterThan(1);
      expect.soft(await firstPages(page, paper), paper).toBe(1);
      await close();
    }
  });
});
