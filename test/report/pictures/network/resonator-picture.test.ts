import { describe, expect, it } from 'vitest';
import { type CouplingMatrix, denormalize } from '../../../../src/index.js';
import { resonatorLayout } from '../../../../src/report/pictures/network/resonators/resonator-layout.js';
import { resonatorPicture } from '../../../../src/report/pictures/network/resonators/resonator-picture.js';
import { checkedHandOver, networkOf } from '../../../../src/report/pictures/network/routing/couplings.js';
import type { Format } from '../../../../src/report/svg/drawing.js';
import { textWidth } from '../../../../src/report/svg/words.js';
import { chain } from '../../../support/models.js';
import { fixtureDesign } from '../../designs.js';
import { textsOf } from './checks.js';
import { arrowDesign, foldedDesign, foldedDesigns, otherDesigns, wired } from './network-designs.js';

const BAND = { centerHz: 3839.958e6, bandwidthHz: 36e6 };

const layoutOf = (matrix: CouplingMatrix, format: Format): ReturnType<typeof resonatorLayout> =>
  resonatorLayout(networkOf(matrix), checkedHandOver(matrix, BAND), BAND, format);

describe('resonator picture', () => {
  it('stick lengths are proportional to offsets and couplings', () => {
    for (const seed of [1, 2, 3, 4]) {
      const { matrix } = wired('', 4 + seed, [], seed, true);
      const { offsets, couplings } = layoutOf(matrix, 'wide');
      const rows = denormalize(matrix, BAND).resonators.map(({ frequencyHz }) => frequencyHz - BAND.centerHz);
      const perHertz = rows.map((hertz, n) => (offsets!.zero - offsets!.marks[n]!.y) / hertz);
      for (const scale of perHertz) expect(scale / perHertz[0]!).toBeCloseTo(1, 6);
      const main = Array.from({ length: matrix.order + 1 }, (_, i) => Math.abs(matrix.values[i]![i + 1]!));
      const perM = main.map((value, n) => (couplings.zero - couplings.marks[n]!.y) / value);
      for (const scale of perM) expect(scale / perM[0]!).toBeCloseTo(1, 6);
      // A resonator tuned up has its mark above the line.
      rows.forEach((hertz, n) => {
        expect(offsets!.marks[n]!.isNegative).toBe(hertz < 0);
      });
    }
  });

  it('couplings stand half way between their resonators on the ruler', () => {
    const { ruler, couplings } = layoutOf(foldedDesign(6).matrix, 'narrow');
    couplings.marks.forEach(({ x }, n) => {
      expect(x).toBeCloseTo((ruler.discs[n]!.x + ruler.discs[n + 1]!.x) / 2, 9);
    });
  });

  it('numbers are the hand-over numbers', () => {
    const { matrix, handOver, specification } = fixtureDesign('tern-quay');
    const texts = textsOf(resonatorPicture(matrix, specification.band).wide);
    const text = (hertz: number): string => `${hertz < 0 ? '−' : '+'}${Math.abs(hertz / 1e6).toFixed(2)}`;
    for (const { frequencyHz } of handOver.resonators)
      expect(texts).toContain(text(frequencyHz - specification.band.centerHz));
    for (const { bandwidthHz } of handOver.couplings) expect(texts).toContain(text(bandwidthHz));
  });

  it('says so where all resonators are tuned to the center', () => {
    const picture = resonatorPicture(chain([1, 0.8, 0.7, 0.8, 1]), BAND);
    expect(picture.finding).toBe(
      'All resonators tuned to the center; weakest coupling of the main path 2–3, +25.20 MHz',
    );
    expect(textsOf(picture.wide)).toContain('All resonators tuned to 3839.958 MHz');
    expect(layoutOf(chain([1, 0.8, 0.7, 0.8, 1]), 'wide').offsets).toBeUndefined();
  });

  it('names what stands out', () => {
    const { matrix } = wired('', 5, [], 1, false);
    const values = matrix.values.map((row) => [...row]);
    values[4]![4] = -0.5;
    values[2]![3] = values[3]![2] = 0.01;
    const { finding } = resonatorPicture({ order: 5, values }, BAND);
    expect(finding).toMatch(
      /^Resonator 4 lies farthest off the center, \+9\.\d+ MHz; weakest coupling of the main path 2–3, \+0\.36 MHz$/,
    );
  });

  it('labels touch neither each other nor marks, and nothing leaves the drawing', () => {
    const designs = [
      ...[2, 5, 8, 11].flatMap(foldedDesigns),
      ...otherDesigns(),
      foldedDesign(40),
      foldedDesign(100),
      arrowDesign(24, 24),
    ];
    for (const { name, matrix } of designs) {
      for (const format of ['wide', 'narrow'] as const) {
        const { offsets, couplings, ruler, rulerTop, width, height } = layoutOf(matrix, format);
        for (const panel of [offsets, couplings]) {
          if (panel === undefined) continue;
          const boxes = panel.labels.map(({ x, y, text, isExtreme }) => ({
            x,
            y,
            half: textWidth(text, 11, isExtreme) / 2,
          }));
          for (const [n, a] of boxes.entries()) {
            for (const b of boxes.slice(n + 1))
              expect(Math.abs(a.x - b.x) < a.half + b.half && Math.abs(a.y - b.y) < 12, name).toBe(false);
            const on = panel.marks.filter(
              ({ x, y }) => Math.abs(x - a.x) < a.half + panel.side / 2 && Math.abs(y - a.y) < 5 + panel.side / 2,
            );
            expect(on, name).toEqual([]);
            expect(a.x - a.half, name).toBeGreaterThanOrEqual(0);
            expect(a.x + a.half, name).toBeLessThanOrEqual(width);
            expect(a.y - 6, name).toBeGreaterThanOrEqual(panel.top - 2);
            expect(a.y + 6, name).toBeLessThanOrEqual(panel.bottom + 2);
          }
          for (const { y } of panel.marks) expect(y).toBeLessThanOrEqual(panel.bottom);
        }
        for (const { box } of ruler.labels) {
          expect(box.left).toBeGreaterThanOrEqual(0);
          expect(box.right).toBeLessThanOrEqual(width);
          expect(rulerTop + box.bottom).toBeLessThanOrEqual(couplings.top);
        }
        expect(couplings.bottom).toBeLessThan(height);
      }
    }
  });
});
