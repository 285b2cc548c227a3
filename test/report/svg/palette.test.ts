import { describe, expect, it } from 'vitest';
import { DARK, LIGHT, type Palette, PRINT, type Role } from '../../../src/report/svg/palette.js';

/** Relative luminance and contrast ratio. Source: W3C, Web Content Accessibility Guidelines 2.2, 2023 (from memory). */
function luminance(color: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const share = Number.parseInt(color.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [x, y] = [luminance(a), luminance(b)];
  return (Math.max(x, y) + 0.05) / (Math.min(x, y) + 0.05);
}

const TEXT: readonly Role[] = ['ink', 'second', 'transmission', 'reflection', 'negative', 'short'];
const GROUNDS: readonly Role[] = ['paper', 'window', 'ground'];
const PALETTES: readonly (readonly [string, Palette])[] = [
  ['light', LIGHT],
  ['dark', DARK],
  ['print', PRINT],
];

describe('palette', () => {
  it('has the contrast formula right', () => {
    expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 10);
    // A grey that the guidelines' readers know as the lightest for text on white: 4.54 (from memory).
    expect(contrast('#767676', '#FFFFFF')).toBeCloseTo(4.54, 2);
  });

  it.each(PALETTES)('%s: text keeps 4.5 and the hatch 3 on every ground', (_, palette) => {
    for (const ground of GROUNDS) {
      for (const role of TEXT)
        expect(contrast(palette[role], palette[ground]), `${role} on ${ground}`).toBeGreaterThan(4.5);
      expect(contrast(palette.hatch, palette[ground]), `hatch on ${ground}`).toBeGreaterThan(3);
    }
  });

  it.each(PALETTES)('%s: transmission and reflection differ in grey as well', (_, palette) => {
    expect(contrast(palette.transmission, palette.reflection)).toBeGreaterThan(1.1);
  });
});
