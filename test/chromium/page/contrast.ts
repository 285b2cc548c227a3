import type { Page } from 'playwright-core';

/** Texts measured, the least contrast, and those below 4.5. */
export interface Contrast {
  readonly texts: number;
  readonly least: number;
  readonly low: readonly string[];
}

/**
 * Contrast of every shown text against what lies under its middle, by the relative luminance of WCAG 2.2 (from memory):
 * `(L1 + 0.05)/(L2 + 0.05)`, `L = 0.2126 R + 0.7152 G + 0.0722 B` of linear sRGB. Hatches and curves are left out of the
 * ground, where labels have a rim; areas of a drawing count.
 */
export function contrastOf(page: Page): Promise<Contrast> {
  return page.evaluate(() => {
    type Color = readonly [number, number, number, number];
    const LEAST = 4.5;
    const parse = (text: string): Color | undefined => {
      const parts = /^rgba?\(([^)]+)\)$/
        .exec(text)?.[1]
        ?.split(/[\s,/]+/)
        .map(Number);
      return parts === undefined ? undefined : [parts[0] ?? 0, parts[1] ?? 0, parts[2] ?? 0, parts[3] ?? 1];
    };
    const over = (top: Color, under: Color): Color => {
      const mix = (n: 0 | 1 | 2): number => top[3] * top[n] + (1 - top[3]) * under[n];
      return [mix(0), mix(1), mix(2), 1];
    };
    const luminance = (color: Color): number => {
      const linear = color.slice(0, 3).map((value) => {
        const share = value / 255;
        return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
      });
      return 0.2126 * (linear[0] ?? 0) + 0.7152 * (linear[1] ?? 0) + 0.0722 * (linear[2] ?? 0);
    };
    /** Color of an element as ground: its background or, in a drawing, the fill of an area. */
    const groundOf = (element: Element): Color | undefined => {
      const style = getComputedStyle(element);
      if (!(element instanceof SVGElement) || element instanceof SVGSVGElement) return parse(style.backgroundColor);
      if (
        !(element instanceof SVGRectElement || element instanceof SVGPathElement || element instanceof SVGCircleElement)
      )
        return undefined;
      const fill = parse(style.fill);
      return fill === undefined ? undefined : [fill[0], fill[1], fill[2], fill[3] * Number(style.fillOpacity)];
    };
    const shown = (element: Element): boolean =>
      element.checkVisibility({ visibilityProperty: true, opacityProperty: true });
    let texts = 0;
    let least = 21;
    const low: string[] = [];
    const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT);
    for (let node = walker.nextNode(); node !== null; node = walker.nextNode()) {
      const element = node.parentElement;
      if (element === null || node.textContent?.trim() === '' || !shown(element)) continue;
      if (element.matches('script,style,title,desc')) continue;
      const range = document.createRange();
      range.selectNodeContents(node);
      element.scrollIntoView({ block: 'center', inline: 'center' });
      const box = range.getBoundingClientRect();
      if (box.width <= 1 || box.height <= 1) continue;
      const [x, y] = [box.left + box.width / 2, box.top + box.height / 2];
      if (x < 0 || y < 0 || x >= innerWidth || y >= innerHeight) continue;
      let ground: Color = [255, 255, 255, 1];
      const stack = document.elementsFromPoint(x, y).reverse();
      for (const under of stack) {
        if (under === element) {
          // The background of the element itself lies under its text; the fill of a text does not.
          const own = under instanceof SVGElement ? undefined : groundOf(under);
          if (own !== undefined) ground = over(own, ground);
          break;
        }
        const color = groundOf(under);
        if (color !== undefined) ground = over(color, ground);
      }
      const style = getComputedStyle(element);
      const ink = parse(element instanceof SVGElement ? style.fill : style.color);
      if (ink === undefined) continue;
      const [a, b] = [luminance(over(ink, ground)), luminance(ground)];
      const ratio = (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
      texts += 1;
      least = Math.min(least, ratio);
      if (ratio < LEAST)
        low.push(
          `${ratio.toFixed(2)}: "${node.textContent?.trim().slice(0, 40)}" ${element.tagName}.${element.getAttribute('class')}`,
        );
    }
    return { texts, least, low };
  });
}
