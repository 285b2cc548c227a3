import type { Page } from 'playwright-core';

/** Paper and its size in CSS pixels, 96 to the inch. */
export const PAPERS = {
  A4: { width: 793.7, height: 1122.5 },
  Letter: { width: 816, height: 1056 },
} as const;

/** Names of papers. */
export type Paper = keyof typeof PAPERS;

/** What is left between the side margins that the document asks for, 12 mm each. */
export function textWidth(paper: Paper): number {
  return Math.floor(PAPERS[paper].width - (2 * 12 * 96) / 25.4);
}

/** A printed document: its bytes, and how many pages it has. */
export interface Printed {
  readonly bytes: Buffer;
  readonly pages: number;
}

/** Prints as a reader would, with the margins the document asks for and without backgrounds. */
export async function printed(page: Page, format: Paper): Promise<Printed> {
  const bytes = await page.pdf({ format, printBackground: false, preferCSSPageSize: false });
  // Chromium writes the page objects of a document uncompressed.
  const pages = (bytes.toString('latin1').match(/\/Type\s*\/Page\b(?!s)/g) ?? []).length;
  return { bytes, pages };
}

/** How many pages the title and the first sheet take; the sheets after it are taken out of the page. */
export async function firstPages(page: Page, format: Paper): Promise<number> {
  await page.evaluate(() => {
    for (const sheet of document.querySelectorAll('section.sheet')) sheet.remove();
  });
  return (await printed(page, format)).pages;
}
