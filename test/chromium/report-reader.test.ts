import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { type Design, sweepHz } from '../../src/index.js';
import { NO_CHROMIUM, useChromium } from './browser.js';
import { plainNumber, shows } from './page/tables.js';
import { FIXTURES, PICTURES, resultOf, useReports } from './reports.js';

/** What has the focus, in a word. */
function focused(page: Page): Promise<string> {
  return page.evaluate(() => {
    const element = document.activeElement;
    if (element === null || element === document.body) return '';
    if (element.matches('.chart')) return `chart ${element.closest('figure')?.id}`;
    if (element.matches('.scroll')) return `region ${element.getAttribute('aria-labelledby')}`;
    if (element.matches('a')) return `link ${element.getAttribute('href')}`;
    return `${element.tagName.toLowerCase()}${element.id === '' ? '' : ` ${element.id}`}`;
  });
}

/** Everything that Tab reaches, in order, until it leaves the page. */
async function tabOrder(page: Page): Promise<readonly string[]> {
  const order: string[] = [];
  for (let n = 0; n < 100; n++) {
    await page.keyboard.press('Tab');
    const name = await focused(page);
    if (name === '') return order;
    order.push(name);
  }
  throw new Error('Tab does not leave the page');
}

const CHARTS = ['response', 'band', 'group-delay'];

/** What a reserved line says: frequency, and for each set of curves loss, return loss and delay. */
interface Reading {
  readonly frequency: string;
  readonly sets: readonly (readonly [string, string, string])[];
}

async function readingOf(page: Page, name: string): Promise<Reading> {
  const parts = await page.locator(`#figure-${name}-readout b`).allTextContents();
  const text = parts.join(' ').replace(/\s+/g, ' ');
  const sets = [...text.matchAll(/(?<!return )loss (\S+) dB, return loss (\S+) dB, delay (\S+) ns/g)].map(
    ([, loss = '', match = '', delay = '']) => [loss, match, delay] as const,
  );
  return { frequency: /^([\d.]+) MHz/.exec(text)?.[1] ?? '', sets };
}

/** The same numbers from the library, at the point of the sweep that has this frequency to the digits shown. */
function computed({ matrix, specification }: Design, hertz: number, isLossless: boolean): readonly number[] {
  const { band, unloadedQ } = specification;
  const lossy = isLossless || unloadedQ === undefined ? band : { ...band, unloadedQ };
  const { s21, s11, groupDelaySeconds } = sweepHz(matrix, lossy, [hertz]);
  const decibels = (re: Float64Array, im: Float64Array): number =>
    -20 * Math.log10(Math.hypot(re[0] as number, im[0] as number));
  return [decibels(s21.re, s21.im), decibels(s11.re, s11.im), (groupDelaySeconds[0] as number) * 1e9];
}

/** Which point of the sweep has the frequency that the line shows. */
function indexOf(grid: readonly number[], { frequency }: Reading): number {
  const digits = (frequency.split('.')[1] ?? '').length;
  return grid.findIndex((hertz) => (hertz / 1e6).toFixed(digits) === frequency);
}

function expectReading(reading: Reading, design: Design, grid: readonly number[]): void {
  const hertz = grid[indexOf(grid, reading)];
  expect(hertz, `"${reading.frequency}" is a point of the sweep`).toBeDefined();
  expect(reading.sets.length).toBeGreaterThan(0);
  reading.sets.forEach((set, n) => {
    computed(design, hertz as number, n === 1).forEach((value, k) => {
      expect(shows(set[k] as string, value), `"${set[k]}" for ${value} at ${hertz}`).toBe(true);
      expect((plainNumber(set[k] as string).split('.')[1] ?? '').length).toBeGreaterThanOrEqual(2);
    });
  });
}

describe.skipIf(NO_CHROMIUM)('a reader with a keyboard', () => {
  const chromium = useChromium();
  const written = useReports();

  it.each([360, 1400])('reaches everything that can be used, at %i px', async (width) => {
    const { page, close } = await chromium.openText('report.html', written('larkmoor', 'report.html'), { width });
    const order = await tabOrder(page);
    const regions = await page.locator('.scroll:visible').count();
    const links = await page.locator('a:visible').count();
    await page.locator('summary').first().focus();
    await page.keyboard.press('Enter');
    const isOpen = await page.locator('#mask-points').isVisible();
    await close();
    expect(order[0]).toBe('link #verdict');
    for (const name of CHARTS) expect(order).toContain(`chart figure-${name}`);
    expect(order).toContain('input show-lossless');
    expect(order).toContain('summary');
    expect(order.filter((name) => name.startsWith('region'))).toHaveLength(regions);
    expect(order.filter((name) => name.startsWith('link'))).toHaveLength(links);
    expect(isOpen).toBe(true);
  });

  it('sees the skip link when it has the focus, and a mark round whatever has it', async () => {
    const { page, close } = await chromium.openText('report.html', written('larkmoor', 'report.html'));
    await page.keyboard.press('Tab');
    const box = await page.locator('a.skip').boundingBox();
    const outlines: string[] = [];
    for (let n = 0; n < 12; n++) {
      outlines.push(
        await page.evaluate(() => {
          const { outlineStyle, outlineWidth } = getComputedStyle(document.activeElement as Element);
          return `${outlineStyle} ${outlineWidth}`;
        }),
      );
      await page.keyboard.press('Tab');
    }
    await close();
    expect(box?.x).toBeGreaterThanOrEqual(0);
    expect(box?.y).toBeGreaterThanOrEqual(0);
    expect(new Set(outlines)).toEqual(new Set(['solid 3px']));
  });

  it.each(FIXTURES)(
    '%s: arrow keys step through the sweep, and the line reads what the library computes',
    async (name) => {
      const opened = await chromium.openText('report.html', written(name, 'report.html'));
      const { page, close } = opened;
      const design = resultOf(written, name);
      const grid = await page.evaluate(
        () => JSON.parse(document.getElementById('sweep-data')?.textContent ?? '{}').hz as number[],
      );
      for (const chart of CHARTS) {
        await page.locator(`#figure-${chart} .chart`).focus();
        await page.keyboard.press('ArrowRight');
        const readings = [await readingOf(page, chart)];
        for (const key of ['ArrowRight', 'ArrowRight', 'ArrowLeft', 'Shift+ArrowRight', 'Home', 'End']) {
          await page.keyboard.press(key);
          readings.push(await readingOf(page, chart));
        }
        for (const reading of readings) expectReading(reading, design, grid);
        const at = readings.map((reading) => indexOf(grid, reading));
        const steps = at.slice(1, 5).map((index, n) => index - (at[n] as number));
        expect(steps, chart).toEqual([1, 1, -1, 10]);
        expect(at[5], chart).toBeLessThan(at[0] as number);
        expect(at[6], chart).toBeGreaterThan(at[0] as number);
        expect(await page.locator(`#figure-${chart} svg:visible .cursor`).count()).toBe(1);
        await page.keyboard.press('Escape');
        expect(await page.locator(`#figure-${chart} .cursor`).count()).toBe(0);
      }
      expect(opened.messages).toEqual([]);
      expect(await opened.violations()).toEqual([]);
      await close();
    },
  );

  it('reads the values without loss too, while these are shown', async () => {
    const { page, close } = await chromium.openText('report.html', written('larkmoor', 'report.html'));
    const chart = page.locator('#figure-response .chart');
    const counts: number[] = [];
    for (const wanted of [true, false]) {
      await page.locator('#show-lossless').setChecked(wanted);
      await chart.focus();
      await page.keyboard.press('ArrowRight');
      counts.push((await readingOf(page, 'response')).sets.length);
    }
    await close();
    expect(counts).toEqual([2, 1]);
  });

  it('moves nothing when the line is filled: its room is reserved', async () => {
    for (const width of [360, 1400]) {
      const { page, close } = await chromium.openText('report.html', written('larkmoor', 'report.html'), { width });
      const heights: number[] = [await page.evaluate(() => document.documentElement.scrollHeight)];
      await page.locator('#figure-response .chart').focus();
      await page.keyboard.press('ArrowRight');
      heights.push(await page.evaluate(() => document.documentElement.scrollHeight));
      await close();
      expect(heights[1], `${width} px`).toBe(heights[0]);
    }
  });
});

describe.skipIf(NO_CHROMIUM)('a reader with scripts switched off', () => {
  const chromium = useChromium();
  const written = useReports();

  /** Shown curves without loss. */
  const losslessShown = (page: Page): Promise<number> => page.locator('svg .lossless:visible').count();

  it.each(FIXTURES)('%s: sees everything, and the switch for lossless curves works', async (name) => {
    const look = { hasScript: false };
    const { page, messages, requests, close } = await chromium.openText(
      'report.html',
      written(name, 'report.html'),
      look,
    );
    for (const each of PICTURES)
      expect(await page.locator(`#figure-${each} .drawing > svg:visible`).count(), each).toBe(1);
    for (const id of [
      'requirements',
      'couplings',
      'resonators',
      'ports',
      'matrix',
      'certificates',
      'roots',
      'coefficients',
    ])
      expect(await page.locator(`#${id}`).isVisible(), id).toBe(true);
    expect(await page.locator('.readout:visible').count()).toBe(0);
    await page.locator('summary').first().click();
    expect(await page.locator('#mask-points').isVisible()).toBe(true);
    const box = page.locator('#show-lossless');
    await box.setChecked(true);
    const shown = await losslessShown(page);
    await box.setChecked(false);
    const hidden = await losslessShown(page);
    await close();
    expect(shown).toBeGreaterThan(0);
    expect(hidden).toBe(0);
    expect(requests).toEqual([]);
    expect(messages.filter((message) => !/script/i.test(message))).toEqual([]);
  });
});
