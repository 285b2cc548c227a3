import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { type Browser, type BrowserContext, type BrowserContextOptions, chromium, type Page } from 'playwright-core';
import { afterAll, beforeAll, expect } from 'vitest';
import { CHROMIUM, CHROMIUM_ARGUMENTS } from './executable.js';

/** Whether tests that need Chromium are skipped. */
export const NO_CHROMIUM: boolean = CHROMIUM === undefined;

/** What a page did that its reader did not ask for. */
export interface Noticed {
  /** Addresses of every request but the one for the document itself. */
  readonly requests: string[];
  /** Errors and warnings on the console, and errors nobody caught. */
  readonly messages: string[];
  /** Texts of alert, confirm, prompt and leave-page boxes. */
  readonly dialogs: string[];
}

/** A page that was opened, and what was noticed so far. */
export interface Opened extends Noticed {
  readonly page: Page;
  /** What the content policy of the document refused, as "directive: blocked". */
  readonly violations: () => Promise<readonly string[]>;
  readonly close: () => Promise<void>;
}

/** How to look at a page. */
export interface Look {
  readonly width?: number;
  readonly height?: number;
  readonly isDark?: boolean;
  /** False: as for a reader who switched scripts off. */
  readonly hasScript?: boolean;
  /** Prepares the page before it loads. */
  readonly before?: (page: Page) => Promise<void>;
}

/** A Chromium for one test file. */
export interface Chromium {
  /** Writes a text to a file of its own and opens that, as a reader would. */
  readonly openText: (name: string, text: string, look?: Look) => Promise<Opened>;
  /** Opens an address. */
  readonly openAddress: (address: string, look?: Look) => Promise<Opened>;
}

declare global {
  // Where the page's own listener keeps what the policy refused.
  var refusedByPolicy: string[] | undefined;
}

async function contextOf(browser: Browser, { width = 1400, height = 900, isDark, hasScript }: Look) {
  const options: BrowserContextOptions = {
    viewport: { width, height },
    colorScheme: isDark === true ? 'dark' : 'light',
    javaScriptEnabled: hasScript !== false,
    reducedMotion: 'no-preference',
  };
  const context = await browser.newContext(options);
  await context.addInitScript(() => {
    const refused: string[] = [];
    globalThis.refusedByPolicy = refused;
    document.addEventListener('securitypolicyviolation', ({ violatedDirective, blockedURI, sample }) => {
      refused.push(`${violatedDirective}: ${blockedURI} ${sample}`.trim());
    });
  });
  return context;
}

function watch(page: Page, address: string): Noticed {
  const noticed: Noticed = { requests: [], messages: [], dialogs: [] };
  page.on('request', (request) => {
    const isDocument = request.isNavigationRequest() && request.frame() === page.mainFrame();
    if (!isDocument || request.url() !== address) noticed.requests.push(request.url());
  });
  page.on('console', (message) => {
    if (['error', 'warning', 'assert'].includes(message.type()))
      noticed.messages.push(`${message.type()}: ${message.text()}`);
  });
  page.on('pageerror', (error) => noticed.messages.push(`not caught: ${error.message}`));
  page.on('dialog', (dialog) => {
    noticed.dialogs.push(dialog.message());
    void dialog.dismiss();
  });
  return noticed;
}

async function open(context: BrowserContext, address: string, { before }: Look): Promise<Opened> {
  const page = await context.newPage();
  const noticed = watch(page, address);
  await before?.(page);
  await page.goto(address, { waitUntil: 'load' });
  return {
    ...noticed,
    page,
    violations: () => page.evaluate(() => globalThis.refusedByPolicy ?? []),
    close: () => context.close(),
  };
}

/** Starts Chromium before the tests of a file and ends it after them. */
export function useChromium(): Chromium {
  let browser: Browser | undefined;
  let folder = '';
  let opened = 0;
  beforeAll(async () => {
    if (CHROMIUM === undefined) return;
    folder = mkdtempSync(join(tmpdir(), 'irisloom-pages-'));
    browser = await chromium.launch({ executablePath: CHROMIUM, args: [...CHROMIUM_ARGUMENTS] });
  }, 60_000);
  afterAll(async () => {
    await browser?.close();
    if (folder !== '') rmSync(folder, { recursive: true, force: true });
  });
  const openAddress = async (address: string, look: Look = {}): Promise<Opened> => {
    if (browser === undefined) throw new Error('Chromium was not started');
    return open(await contextOf(browser, look), address, look);
  };
  const openText = (name: string, text: string, look: Look = {}): Promise<Opened> => {
    opened += 1;
    const own = join(folder, String(opened));
    mkdirSync(own);
    writeFileSync(join(own, name), text);
    return openAddress(pathToFileURL(join(own, name)).href, look);
  };
  return { openText, openAddress };
}

/** Nothing was asked for, said, shown in a box, or refused by the policy. */
export async function expectSilent({ requests, messages, dialogs, violations }: Opened): Promise<void> {
  const noticed = { requests, messages, dialogs, violations: await violations() };
  expect.soft(noticed).toEqual({ requests: [], messages: [], dialogs: [], violations: [] });
}

/** Saves what a page shows, for people to look at: only where IRISLOOM_SCREENSHOTS names a folder. */
export async function picture(page: Page, name: string): Promise<void> {
  const folder = process.env.IRISLOOM_SCREENSHOTS;
  if (folder === undefined) return;
  mkdirSync(folder, { recursive: true });
  await page.screenshot({ path: join(folder, `${name}.png`), fullPage: true });
}
