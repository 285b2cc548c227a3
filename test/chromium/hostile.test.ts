import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, it } from 'vitest';
import { type Design, design, FilterFailure, parseSpecification } from '../../src/index.js';
import { reportHtml } from '../../src/report/index.js';
import { NO_CHROMIUM, useChromium } from './browser.js';
import { hostileTexts } from './hostile-text.js';

const COUNT = 500;
const SEED = 20261201;

interface Texts {
  readonly name: string;
  readonly notes: string;
  readonly revision: string;
}

/** Texts of one design; those of the second half hold characters that a design file may not hold. */
const HOSTILE: readonly Texts[] = [false, true].flatMap((isRude) => {
  const names = hostileTexts(SEED, COUNT / 2, 120, isRude);
  const notes = hostileTexts(SEED + 1, COUNT / 2, 1000, isRude);
  const revisions = hostileTexts(SEED + 2, COUNT / 2, 20, isRude);
  return names.map((name, n) => ({ name, notes: notes[n] as string, revision: revisions[n] as string }));
});

/** A harmless design whose name is as long: a long name may be set smaller. */
const harmless = (length: number): Texts => ({ name: 'N'.repeat(length), notes: 'Notes', revision: 'A' });

/** The texts as a reader must see them: what no file may hold is replaced by a sign for that. */
const seen = (text: string): string => {
  const wellFormed = [...text]
    .map((character) => (/^[\ud800-\udfff]$/.test(character) ? '\ufffd' : character))
    .join('');
  return wellFormed.replace(
    // biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters that must not come through
    /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069\ufeff\ufffe\uffff]/g,
    '\ufffd',
  );
};

/** What a document is made of, whatever its texts say. */
interface Make {
  readonly nodes: Readonly<Record<string, number>>;
  readonly attributes: number;
  readonly name: string;
  readonly title: string;
}

/** Takes a document apart without running it. */
function makeOf(page: Page, html: string): Promise<Make> {
  return page.evaluate((text) => {
    const parsed = new DOMParser().parseFromString(text, 'text/html');
    const nodes: Record<string, number> = {};
    let attributes = 0;
    const walker = parsed.createTreeWalker(parsed, NodeFilter.SHOW_ALL);
    for (let node: Node | null = parsed; node !== null; node = walker.nextNode()) {
      nodes[node.nodeName] = (nodes[node.nodeName] ?? 0) + 1;
      if (node instanceof Element) attributes += node.attributes.length;
    }
    return { nodes, attributes, name: parsed.querySelector('h1')?.textContent ?? '', title: parsed.title };
  }, html);
}

describe.skipIf(NO_CHROMIUM)('texts of a design in a report', () => {
  const chromium = useChromium();
  const input = { passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' }, order: 2, returnLossDb: 20 };
  let plain: Design;
  beforeAll(() => {
    plain = design(input);
  });
  const html = (texts: Texts): string => reportHtml({ ...plain, specification: { ...plain.specification, ...texts } });

  it('are let through by the check of a design file, or refused by it', () => {
    const refused = HOSTILE.map((texts) => {
      try {
        const { name, notes, revision } = parseSpecification(JSON.stringify({ ...input, ...texts }));
        expect({ name, notes, revision }).toEqual(texts);
        return 0;
      } catch (error) {
        expect(error).toBeInstanceOf(FilterFailure);
        return 1;
      }
    });
    // A clean text may still hold half a tag or a lone sign; only rude ones are refused.
    expect(refused.slice(0, COUNT / 2).filter((each) => each === 1)).toEqual([]);
    expect(refused.slice(COUNT / 2).filter((each) => each === 1).length).toBeGreaterThan(COUNT / 4);
  });

  it(`${COUNT} names, notes and revisions make the same elements, texts and attributes as harmless ones`, async () => {
    const opened = await chromium.openText('empty.html', '<!doctype html><title>Parser</title>');
    const { page } = opened;
    const rights = new Map<number, Make>();
    for (const length of new Set(HOSTILE.map(({ name }) => name.length)))
      rights.set(length, await makeOf(page, html(harmless(length))));
    const faults: string[] = [];
    for (const texts of HOSTILE) {
      const { nodes, attributes, name, title } = await makeOf(page, html(texts));
      const right = rights.get(texts.name.length) as Make;
      expect(right.nodes.H1).toBe(1);
      expect(right.nodes['#text']).toBeGreaterThan(100);
      expect(right.attributes).toBeGreaterThan(300);
      if (JSON.stringify(nodes) !== JSON.stringify(right.nodes)) faults.push(`nodes: ${JSON.stringify(texts)}`);
      if (attributes !== right.attributes) faults.push(`attributes: ${JSON.stringify(texts)}`);
      if (name !== seen(texts.name)) faults.push(`name: ${JSON.stringify(texts.name)} as ${JSON.stringify(name)}`);
      if (!title.startsWith(seen(texts.name).trim().replace(/\s+/g, ' ')))
        faults.push(`title: ${JSON.stringify(texts.name)} as ${JSON.stringify(title)}`);
    }
    // The first few are enough to see what is wrong.
    expect(faults.slice(0, 3)).toEqual([]);
    expect(opened.requests).toEqual([]);
    await opened.close();
  }, 240_000);

  it('20 of them opened as files run nothing, ask for nothing, and stay inside the window', async () => {
    for (const texts of HOSTILE.filter((_, n) => n % (COUNT / 20) === 0)) {
      const opened = await chromium.openText('report.html', html(texts), { width: 360 });
      const { page, requests, messages, dialogs } = opened;
      const width = await page.evaluate(() => document.documentElement.scrollWidth);
      const title = await page.title();
      const violations = await opened.violations();
      await opened.close();
      expect({ requests, messages, dialogs, violations }, JSON.stringify(texts)).toEqual({
        requests: [],
        messages: [],
        dialogs: [],
        violations: [],
      });
      expect(title).not.toBe('run');
      expect(width, JSON.stringify(texts)).toBeLessThanOrEqual(360);
    }
  }, 120_000);
});
