import { describe, expect, it } from 'vitest';
import { type CouplingMatrix, denormalize } from '../../../../src/index.js';
import { resonatorLayout } from '../../../../src/report/pictures/network/resonators/resonator-layout.js';
import { resonatorPicture } from '../../../../src/report/pictures/network/resonators/resonator-picture.js';
import { checkedHandOver, networkOf } from '../../../../src/report/pictures/network/routing/couplings.js';
import type { Format } from '../../../../src/report/svg/drawing.js';
import { textWidth } from '../../../../src/report/svg/words.js';
import { chain, matrixOf } from '../../../support/models.js';
import { fixtureDesign } from '../../designs.js';
import { textsOf } from './checks.js';
import { arrowDesign, fanDesign, foldedDesign, foldedDesigns, otherDesigns, wired } from './network-designs.js';

const BAND = { centerHz: 3839.958e6, bandwidthHz: 36e6 };

const layoutOf = (matrix: CouplingMatrix, format: Format): ReturnType<typeof resonatorLayout> =>
  resonatorLayout(networkOf(matrix), checkedHandOver(matrix, BAND), BAND, format);

describe('resonator picture', () => {
  it('stick lengths are proportional to offsets and couplings', () => {
    for (const seed of [1, 2, 3, 4]) {
      const { matrix } = wired('', 4 + seed, [], seed, true);
      const { offsets, lower } = layoutOf(matrix, 'wide');
      const couplings = lower[0]!.panel;
      const rows = denormalize(matrix, BAND).resonators.map(({ frequencyHz }) => frequencyHz - BAND.centerHz);
      const perHertz = rows.map((hertz, n) => (offsets!.zero - offsets!.marks[n]!.y) / hertz);
      for (const scale of perHertz) expect(scale / perHertz[0]!).toBeCloseTo(1, 6);
      const main = Array.from({ length: matrix.order - 1 }, (_, i) => Math.abs(matrix.values[i + 1]![i + 2]!));
      expect(couplings.marks.length).toBe(main.length);
      const perM = main.map((value, n) => (couplings.zero - couplings.marks[n]!.y) / value);
      for (const scale of perM) expect(scale / perM[0]!).toBeCloseTo(1, 6);
      // A resonator tuned up has its mark above the line.
      rows.forEach((hertz, n) => {
        expect(offsets!.marks[n]!.isNegative).toBe(hertz < 0);
      });
    }
  });

  it('couplings stand half way between their resonators on the ruler', () => {
    const { ruler, lower } = layoutOf(foldedDesign(6).matrix, 'narrow');
    lower[0]!.panel.marks.forEach(({ x }, n) => {
      expect(x).toBeCloseTo((ruler.discs[n + 1]!.x + ruler.discs[n + 2]!.x) / 2, 9);
    });
  });

  it('a fan has no line along the ruler, and the external Q of each branch to each port', () => {
    for (const [matrix, isDirect] of [
      [fanDesign(4, 2).matrix, false],
      [fanDesign(4, 4).matrix, true],
    ] as const) {
      for (const format of ['wide', 'narrow'] as const) {
        const { ruler, lower } = layoutOf(matrix, format);
        expect(ruler.routes.map(({ link: { from, to } }) => [from, to])).toEqual(isDirect ? [[0, 5]] : []);
        expect(lower.map(({ title }) => title)).toEqual([
          'External Q of each branch to the source',
          'External Q of each branch to the load',
        ]);
        lower.forEach(({ panel }, n) => {
          const row = matrix.values[n === 0 ? 0 : 5]!.slice(1, 5);
          const qualities = row.map((m) => BAND.centerHz / (BAND.bandwidthHz * m * m));
          const per = panel.marks.map(({ y }, k) => (panel.zero - y) / qualities[k]!);
          for (const scale of per) expect(scale / per[0]!).toBeCloseTo(1, 6);
          if (format === 'wide')
            panel.labels.forEach(({ text }, k) => {
              expect(Number(text) / qualities[k]!).toBeCloseTo(1, 3);
            });
        });
      }
      const { caption, finding } = resonatorPicture(matrix, BAND);
      expect(`${caption}${finding}`).not.toMatch(/main path|neighbors|between two/);
      expect(caption.includes('source to load')).toBe(isDirect);
    }
  });

  it('draws neither a line nor a stick where neighbors are not coupled', () => {
    const values = foldedDesign(6).matrix.values.map((row) => [...row]);
    values[2]![3] = values[3]![2] = 0;
    const { ruler, lower } = layoutOf({ order: 6, values }, 'wide');
    const onRuler = ruler.routes.filter(({ points }) => points.every(([, y]) => y === points[0]![1]));
    expect(onRuler.map(({ link }) => link.from)).toEqual([0, 1, 3, 4, 5, 6]);
    expect(lower[0]!.panel.marks.length).toBe(4);
    const picture = resonatorPicture({ order: 6, values }, BAND);
    expect(textsOf(picture.wide).filter((text) => /^[+−]0\.0+$/.test(text))).toEqual([]);
    expect(picture.finding).not.toContain('main path');
    expect(layoutOf(matrixOf(2, []), 'wide').lower).toEqual([]);
    expect(layoutOf(chain([1, 1]), 'wide').lower).toEqual([]);
  });

  it('ports have their external Q, f0/(B*M^2), and no bandwidth; source to load has M only', () => {
    const width = (m: number): string => ((m * BAND.bandwidthHz) / 1e6).toFixed(2);
    for (const { matrix } of [foldedDesign(6, 6), arrowDesign(6, 3), foldedDesign(4, 4)]) {
      const { order, values } = matrix;
      const texts = textsOf(resonatorPicture(matrix, BAND).wide);
      for (const row of [values[0]!, values[order + 1]!])
        for (const m of row.slice(1, -1).filter((each) => Math.abs(each) > 5e-5)) {
          expect(texts).not.toContain(`+${width(m)}`);
          const quality = BAND.centerHz / (BAND.bandwidthHz * m * m);
          expect(
            texts.some((text) => text.startsWith('Qe ') && Math.abs(Number(text.slice(3)) / quality - 1) < 1e-3),
          ).toBe(true);
        }
      const direct = values[0]![order + 1]!;
      if (Math.abs(direct) > 5e-5) expect(texts).toContain(`M ${direct < 0 ? '−' : '+'}${Math.abs(direct).toFixed(4)}`);
    }
  });

  it('captions name only marks that are drawn, say what the sign of M does, and promise tables only where they are needed', () => {
    const bare = resonatorPicture(chain([1, 0.8, 0.7, 0.8, 1]), BAND).caption;
    expect(bare).not.toMatch(/Upper|lozenge|bracket|tables|Below/);
    const { caption } = resonatorPicture(fixtureDesign('tern-quay').matrix, BAND);
    expect(caption).toContain('a positive M tunes below the center, so signs are opposite');
    expect(caption).toContain('squares tuned up, lozenges tuned down');
    const many = resonatorPicture(foldedDesign(20).matrix, BAND).caption;
    expect(many).toContain('all values stand in the tables');
  });

  it('a number stands over its own stick: no other stick passes beside it nearer than 8 px', () => {
    for (const { name, matrix } of [
      ...[5, 8, 11, 15, 20].flatMap(foldedDesigns),
      arrowDesign(16, 6),
      arrowDesign(24, 24),
    ]) {
      for (const format of ['wide', 'narrow'] as const) {
        const { offsets, lower } = layoutOf(matrix, format);
        for (const panel of [...(offsets === undefined ? [] : [offsets]), ...lower.map((each) => each.panel)])
          for (const { x, y, text, isExtreme } of panel.labels) {
            const half = textWidth(text, 11, isExtreme) / 2;
            const own = panel.marks.reduce((a, b) => (Math.abs(b.x - x) < Math.abs(a.x - x) ? b : a));
            expect(Math.abs(own.x - x), name).toBeLessThanOrEqual(half / 2);
            const beside = panel.marks.filter((mark) => {
              const [low, high] = [Math.min(mark.y, panel.zero), Math.max(mark.y, panel.zero)];
              return mark !== own && high - low > 1 && y > low && y < high && Math.abs(mark.x - x) < half + 8;
            });
            expect(beside, name).toEqual([]);
          }
      }
    }
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
      'All resonators tuned to the center; weakest coupling of the main path 2\u2060–\u20603, +25.20 MHz',
    );
    expect(textsOf(picture.wide)).toContain('All resonators tuned to 3839.958 MHz');
    expect(textsOf(resonatorPicture(foldedDesign(5, 1).matrix, BAND).wide)).toContain(
      'Offset in MHz from 3839.958 MHz',
    );
    expect(layoutOf(chain([1, 0.8, 0.7, 0.8, 1]), 'wide').offsets).toBeUndefined();
  });

  it('names what stands out', () => {
    const { matrix } = wired('', 5, [], 1, false);
    const values = matrix.values.map((row) => [...row]);
    values[4]![4] = -0.5;
    values[2]![3] = values[3]![2] = 0.01;
    const { finding } = resonatorPicture({ order: 5, values }, BAND);
    expect(finding).toMatch(
      /^Resonator 4 lies farthest off the center, \+9\.\d+ MHz; weakest coupling of the main path 2\u2060–\u20603, \+0\.36 MHz$/,
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
        const { offsets, lower, ruler, rulerTop, width, height } = layoutOf(matrix, format);
        const below = lower.map(({ panel }) => panel);
        for (const panel of [offsets, ...below]) {
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
          expect(rulerTop + box.bottom).toBeLessThanOrEqual(below[0]?.top ?? height);
        }
        for (const { bottom } of below) expect(bottom).toBeLessThan(height);
      }
    }
  });
});
