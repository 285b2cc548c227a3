import { readFileSync } from 'node:fs';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import {
  type Certificate,
  type Design,
  design,
  folded,
  generalizedChebyshev,
  type SpecificationInput,
  transversal,
} from '../../src/index.js';
import { NO_CHROMIUM, useChromium } from '../chromium/browser.js';
import { matrixGap } from '../support/models.js';
import { bundle } from './bundle.js';

const ADDRESS = 'http://bundle.test/';

/** The page of a customer whose policy allows scripts of his own site and no code made from text. */
const PAGE = `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Bundle</title>
<meta http-equiv="Content-Security-Policy" content="default-src 'none'; script-src 'self'">
<script type="module" src="run.js"></script></head><body></body></html>`;

/** Serves the page, the bundle and a script that runs it; any other address is refused and noticed as a request. */
async function serve(page: Page, code: string, run: string): Promise<void> {
  const files: Readonly<Record<string, readonly [string, string]>> = {
    [ADDRESS]: ['text/html', PAGE],
    [`${ADDRESS}bundle.js`]: ['text/javascript', code],
    [`${ADDRESS}run.js`]: ['text/javascript', run],
  };
  await page.route('**/*', async (route) => {
    const [contentType, body] = files[route.request().url()] ?? [];
    await (body === undefined ? route.abort() : route.fulfill({ contentType: `${contentType}; charset=utf-8`, body }));
  });
}

const runOf = (names: string, expression: string): string => `import { ${names} } from './bundle.js';
document.documentElement.dataset.answer = JSON.stringify(${expression});`;

const REQUESTS = [
  { order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45] },
  { order: 12, returnLossDb: 20, transmissionZeros: [1.1, -1.2, { re: 0.7, im: 0.1 }, { re: -0.7, im: 0.1 }] },
  { order: 4, returnLossDb: 20, transmissionZeros: [-2.2, -1.55, 1.55, 2.2] },
] as const;

const FIXTURES = ['brackwater', 'larkmoor', 'tern-quay'].map(
  (name) =>
    JSON.parse(
      readFileSync(new URL(`../../fixtures/designs/${name}.json`, import.meta.url), 'utf8'),
    ) as SpecificationInput,
);

const MATRICES = `${JSON.stringify(REQUESTS)}.map((each) => folded(transversal(generalizedChebyshev(each))).matrix)`;
const DESIGNS = `${JSON.stringify(FIXTURES)}.map((each) => design(each))`;

/** What two engines must agree on; a value is rounding of theirs. */
const shapeOf = ({ check, limit, holds }: Certificate): object => ({ check, limit, holds });

describe.skipIf(NO_CHROMIUM)('a bundle in a page that forbids code made from text', () => {
  const chromium = useChromium();

  interface Answer {
    readonly value: unknown;
    readonly violations: readonly string[];
  }

  /** What an expression over a bundle gives in the page; nothing but the two scripts may have been asked for. */
  async function answerOf(name: string, names: string, expression: string): Promise<Answer> {
    const { code } = await bundle(name);
    const opened = await chromium.openAddress(ADDRESS, {
      before: (page) => serve(page, code, runOf(names, expression)),
    });
    await opened.page.waitForFunction(() => document.documentElement.dataset.answer !== undefined);
    const answer = await opened.page.evaluate(() => document.documentElement.dataset.answer ?? '');
    expect(opened.requests).toEqual([`${ADDRESS}run.js`, `${ADDRESS}bundle.js`]);
    const violations = await opened.violations();
    await opened.close();
    expect(opened.messages).toEqual([]);
    return { value: JSON.parse(answer), violations };
  }

  it('meets a policy that works: code made from text is refused and noticed', async () => {
    const code = 'export const attempt = () => { try { return new Function("return 1")(); } catch { return 0; } };';
    const opened = await chromium.openAddress(ADDRESS, {
      before: (page) => serve(page, code, runOf('attempt', 'attempt()')),
    });
    await opened.page.waitForFunction(() => document.documentElement.dataset.answer !== undefined);
    expect(await opened.page.evaluate(() => document.documentElement.dataset.answer)).toBe('0');
    expect(await opened.violations()).toEqual(['script-src: eval']);
    await opened.close();
  });

  it('makes the folded matrices that Node makes, to 1e-12', async () => {
    const { value } = await answerOf('folded', 'folded, generalizedChebyshev, transversal', MATRICES);
    const matrices = value as Design['matrix'][];
    const gaps = REQUESTS.map((each, n) =>
      matrixGap(folded(transversal(generalizedChebyshev(each))).matrix, matrices[n] as Design['matrix']),
    );
    for (const gap of gaps) expect(gap).toBeLessThan(1e-12);
    expect(matrices.map(({ order }) => order)).toEqual([6, 12, 4]);
  });

  it('designs the fixtures as Node does: matrix to 1e-12, certificates, mask, hand-over numbers', async () => {
    const { value } = await answerOf('design', 'design', DESIGNS);
    const designs = value as Design[];
    expect(designs).toHaveLength(FIXTURES.length);
    designs.forEach((theirs, n) => {
      const ours = design(FIXTURES[n] as SpecificationInput);
      expect(matrixGap(ours.matrix, theirs.matrix)).toBeLessThan(1e-12);
      expect(theirs.certificates.map(shapeOf)).toEqual(ours.certificates.map(shapeOf));
      expect(theirs.certificates.every(({ holds }) => holds)).toBe(true);
      theirs.mask.forEach(({ margin }, row) => {
        expect(margin).toBeCloseTo(ours.mask[row]?.margin as number, 8);
      });
      theirs.handOver.resonators.forEach(({ frequencyHz }, k) => {
        expect(frequencyHz / (ours.handOver.resonators[k]?.frequencyHz as number)).toBeCloseTo(1, 12);
      });
    });
  });

  // A script that tries whether it may make code from text is reported to the owner of the page, caught or not.
  it.each([
    ['folded', 'folded, generalizedChebyshev, transversal', MATRICES],
    ['design', 'design', DESIGNS],
  ])('tries nothing that the policy forbids: %s', async (name, names, expression) => {
    expect((await answerOf(name, names, expression)).violations).toEqual([]);
  });
});
