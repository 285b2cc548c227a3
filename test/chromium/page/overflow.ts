import type { Page } from 'playwright-core';

/**
 * What sticks out of the window to the side: the page itself, or a shown element outside a focusable region that scrolls.
 * Children of a drawing are left to `labels.ts`: a drawing cuts off what leaves it.
 */
export function overflowOf(page: Page): Promise<readonly string[]> {
  return page.evaluate(() => {
    const found: string[] = [];
    const { scrollWidth, clientWidth } = document.scrollingElement ?? document.documentElement;
    if (scrollWidth > clientWidth) found.push(`page: ${scrollWidth} px in a window of ${clientWidth}`);
    const nameOf = (element: Element): string =>
      `${element.tagName.toLowerCase()}${element.id === '' ? '' : `#${element.id}`}.${element.getAttribute('class') ?? ''}`;
    const isRegion = (element: HTMLElement): boolean =>
      ['auto', 'scroll'].includes(getComputedStyle(element).overflowX) && element.tabIndex >= 0;
    /** Inside a region that scrolls, or inside something that is kept for readers who hear the page and cut to a pixel. */
    const isInRegion = (element: Element): boolean => {
      for (let outer = element.parentElement; outer !== null; outer = outer.parentElement)
        if (isRegion(outer) || outer.clientWidth === 1) return true;
      return false;
    };
    const out = new Set<Element>();
    for (const element of document.body.querySelectorAll('*')) {
      if (element.closest('svg') !== null && element.tagName !== 'svg') continue;
      if (!element.checkVisibility({ visibilityProperty: true }) || isInRegion(element)) continue;
      const { left, right, width, height } = element.getBoundingClientRect();
      if (width === 0 || height === 0) continue;
      // A skip link waits outside until it has the focus.
      if (element.matches('a[href^="#"]') && getComputedStyle(element).position !== 'static') continue;
      if (left >= -0.5 && right <= clientWidth + 0.5) continue;
      out.add(element);
      // What stands in something that sticks out goes without saying.
      if (element.parentElement === null || !out.has(element.parentElement))
        found.push(`${nameOf(element)}: ${left.toFixed(1)} to ${right.toFixed(1)} px in ${clientWidth}`);
    }
    return found;
  });
}

/** Regions that scroll but that a keyboard cannot reach or that have no name, and elements that cut off their text. */
export function badRegionsOf(page: Page): Promise<readonly string[]> {
  return page.evaluate(() => {
    const found: string[] = [];
    for (const element of document.body.querySelectorAll<HTMLElement>('*')) {
      if (element.closest('svg') !== null || !element.checkVisibility()) continue;
      const { overflowX, display } = getComputedStyle(element);
      if (display === 'inline' || element.scrollWidth <= element.clientWidth + 1 || element.clientWidth <= 1) continue;
      const name = `${element.tagName.toLowerCase()}#${element.id}.${element.className}`;
      if (['hidden', 'clip'].includes(overflowX)) found.push(`${name} cuts off ${element.scrollWidth} px`);
      if (!['auto', 'scroll'].includes(overflowX)) continue;
      const label = element.getAttribute('aria-label') ?? element.getAttribute('aria-labelledby') ?? '';
      if (element.tabIndex < 0) found.push(`${name} scrolls and takes no focus`);
      if (label === '') found.push(`${name} scrolls and has no name`);
    }
    return found;
  });
}
