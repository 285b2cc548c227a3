import type { Page } from 'playwright-core';

/** Faults of the texts of all drawings that are shown. */
export interface LabelFaults {
  /** How many texts were looked at. */
  readonly texts: number;
  readonly small: readonly string[];
  readonly outside: readonly string[];
  readonly overlaps: readonly string[];
}

/**
 * Texts of the shown drawings: smaller than `least` pixels as they appear, outside their drawing, or over each other by more than
 * 1 px. The box of a line of letters is 1.16 em tall; letters fill it from 0.76 em above the base line to 0.24 below.
 */
export function labelFaultsOf(page: Page, least = 10.5): Promise<LabelFaults> {
  return page.evaluate((smallest) => {
    const TOLERANCE = 1;
    const small: string[] = [];
    const outside: string[] = [];
    const overlaps: string[] = [];
    let texts = 0;
    for (const svg of document.querySelectorAll('svg')) {
      const frame = svg.getBoundingClientRect();
      if (frame.width === 0 || !svg.checkVisibility({ visibilityProperty: true })) continue;
      const name = `${svg.parentElement?.closest('[id]')?.id ?? ''} ${svg.getAttribute('class') ?? ''} (${Math.round(frame.width)} px)`;
      const boxes = [...svg.querySelectorAll('text')]
        .filter((text) => text.checkVisibility({ visibilityProperty: true }) && text.textContent?.trim() !== '')
        .map((text) => {
          const box = text.getBoundingClientRect();
          const scale = text.getScreenCTM();
          const size = Number.parseFloat(getComputedStyle(text).fontSize) * Math.hypot(scale?.a ?? 0, scale?.b ?? 0);
          const lead = Math.max(0, box.height - size);
          return { text: text.textContent ?? '', size, ...box.toJSON(), top: box.top + lead } as DOMRect & {
            text: string;
            size: number;
          };
        });
      texts += boxes.length;
      const tiny = boxes.filter(({ size }) => size < smallest - 0.01);
      const least = Math.min(...tiny.map(({ size }) => size));
      if (tiny.length > 0)
        small.push(`${name}: ${tiny.length} texts, "${tiny[0]?.text}" first, ${least.toFixed(2)} px`);
      boxes.forEach((box, n) => {
        const isOut =
          box.left < frame.left - TOLERANCE ||
          box.right > frame.right + TOLERANCE ||
          box.top < frame.top - TOLERANCE ||
          box.bottom > frame.bottom + TOLERANCE;
        if (isOut) outside.push(`${name}: "${box.text}"`);
        for (const other of boxes.slice(n + 1)) {
          const across = Math.min(box.right, other.right) - Math.max(box.left, other.left);
          const down = Math.min(box.bottom, other.bottom) - Math.max(box.top, other.top);
          if (across > TOLERANCE && down > TOLERANCE)
            overlaps.push(`${name}: "${box.text}" and "${other.text}" by ${across.toFixed(1)} x ${down.toFixed(1)} px`);
        }
      });
    }
    return { texts, small, outside, overlaps };
  }, least);
}
