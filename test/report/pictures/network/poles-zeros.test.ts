import { describe, expect, it } from 'vitest';
import { butterworth, type Complex, type FilterPolynomials, generalizedChebyshev } from '../../../../src/index.js';
import { leaderEnds, planeOf } from '../../../../src/report/pictures/network/poles-zeros/plane.js';
import {
  farText,
  polesAndZerosPicture,
} from '../../../../src/report/pictures/network/poles-zeros/poles-zeros-picture.js';
import { spread } from '../../../../src/report/pictures/network/poles-zeros/spread.js';
import { textWidth } from '../../../../src/report/svg/words.js';
import { seeded } from '../../../support/random.js';
import { randomSpec } from '../../../support/random-designs.js';
import { attributes, drawingsOf, textsOf } from './checks.js';

const response = (
  order: number,
  transmissionZeros: readonly (number | Complex)[],
  returnLossDb = 22,
): FilterPolynomials => generalizedChebyshev({ order, returnLossDb, transmissionZeros });

const PAIR: readonly Complex[] = [
  { re: 0.8, im: 0.3 },
  { re: -0.8, im: 0.3 },
];

const samples = (): FilterPolynomials[] => [
  response(6, [1.45, -1.45]),
  response(5, [1.28, 1.75]),
  response(4, []),
  response(1, [], 40),
  response(6, [...PAIR, 1.5]),
  response(8, [...PAIR, { re: 0.8, im: -0.3 }, { re: -0.8, im: -0.3 }, 1.5, -1.5]),
  response(6, [1.45, -1.45, 20, -35]),
  response(8, [1.5, 1.5, -1.5, -1.5, 200, 1000, 5000]),
  response(20, [1.2, 1.3, 1.5, 1.7, 1.9, 2.2, 2.5, 2.8]),
  response(100, [1.2, -1.2]),
  response(6, [1.3], 0.5),
  butterworth({ order: 7 }),
];

const FORMATS = ['wide', 'narrow'] as const;

describe('pole-zero picture', () => {
  it('has equal axes: distances on paper are distances in the plane times one number', () => {
    const random = seeded(11);
    const specs = Array.from({ length: 40 }, () => randomSpec(random)).filter(({ order }) => order <= 16);
    for (const polynomials of [...samples(), ...specs.map((spec) => generalizedChebyshev(spec))]) {
      for (const format of FORMATS) {
        const { marks, pixelsPerUnit, axis } = planeOf(polynomials, format);
        const poles = marks.filter(({ kind }) => kind === 'pole');
        polynomials.poles.forEach((pole, n) => {
          const other = polynomials.poles[0]!;
          const [mark, first] = [poles[n]!, poles[0]!];
          expect(mark.x - axis).toBeCloseTo(pole.re * pixelsPerUnit, 6);
          expect(first.y - mark.y).toBeCloseTo((pole.im - other.im) * pixelsPerUnit, 6);
        });
      }
    }
  });

  it('ticks of the drawing give the same pixels per unit along both axes, to the rounding of coordinates', () => {
    const picture = polesAndZerosPicture(response(6, [1.45, -1.45]));
    for (const drawing of drawingsOf(picture)) {
      const texts = [
        ...drawing.body.markup.matchAll(/<text x="([-\d.]+)" y="([-\d.]+)" class="small f-second (end|mid)">([^<]*)</g),
      ];
      const vertical = texts.filter((match) => match[3] === 'end').map((match) => Number(match[2]));
      const horizontal = texts.filter((match) => match[3] === 'mid');
      const values = horizontal.map((match) => Number(match[4]!.replace('−', '-')));
      const places = horizontal.map((match) => Number(match[1]));
      const across = (places.at(-1)! - places[0]!) / (values.at(-1)! - values[0]!);
      const upright = (Math.max(...vertical) - Math.min(...vertical)) / 2;
      expect(Math.abs(across - upright)).toBeLessThan(0.2);
    }
  });

  it('draws every pole, reflection zero and near transmission zero', () => {
    for (const polynomials of samples()) {
      const largest = Math.max(
        1,
        ...[...polynomials.poles, ...polynomials.reflectionZeros].map(({ re, im }) => Math.hypot(re, im)),
      );
      const shown = polynomials.transmissionZeros.filter(({ re, im }) => Math.hypot(re, im) <= 3 * largest).length;
      for (const drawing of drawingsOf(polesAndZerosPicture(polynomials))) {
        expect(attributes(drawing, 'circle', 'r').length).toBe(polynomials.order);
        expect(attributes(drawing, 'polygon', 'points').length).toBe(shown);
        const crosses = attributes(drawing, 'path', 'd').filter((d) => d.includes('l9 9m-9 0l9-9'));
        expect(crosses.length).toBe(polynomials.order);
      }
    }
  });

  it('writes values to three decimals, mirror images once', () => {
    const polynomials = response(6, [1.45, -1.45]);
    const texts = textsOf(polesAndZerosPicture(polynomials).wide);
    for (const { re, im } of polynomials.poles.filter((pole) => pole.im > 0))
      expect(texts).toContain(`−${Math.abs(re).toFixed(3)} ± j${im.toFixed(3)}`);
    expect(texts).toContain('±j1.450 transmission zeros');
    expect(texts.filter((text) => text.includes('1.450')).length).toBe(1);
    const repeated = textsOf(polesAndZerosPicture(response(8, [1.5, 1.5, -1.5, -1.5])).wide);
    expect(repeated).toContain('2 × ±j1.500 transmission zeros');
    expect(textsOf(polesAndZerosPicture(response(6, [...PAIR, 1.5])).wide)).toContain('±0.800 + j0.300');
    expect(textsOf(polesAndZerosPicture(response(6, [...PAIR, 1.5])).narrow)).toContain(
      'far or off the axis: zeros at ±0.800 + j0.300',
    );
  });

  it('writes zeros on the axis as imaginary, counts those at 0 in words, and breaks no value', () => {
    const findingOf = (...zeros: (number | Complex)[]): string => polesAndZerosPicture(response(8, zeros)).finding;
    expect(findingOf(1.2, -1.25)).toMatch(/^2 transmission zeros, \+j1\.200, −j1\.250; pole nearest the axis −/);
    expect(findingOf(1.3)).toMatch(/^1 transmission zero, \+j1\.300; /);
    expect(findingOf(...PAIR, 1.3)).toContain('±0.800\u00a0+\u00a0j0.300');
    expect(findingOf(1.3)).not.toMatch(/[±+−] |× /);
    const texts = textsOf(polesAndZerosPicture(butterworth({ order: 12 })).wide);
    expect(texts).toContain('12 reflection zeros at 0');
    expect(textsOf(polesAndZerosPicture(butterworth({ order: 1 })).wide)).toContain('reflection zero at 0');
    expect(textsOf(polesAndZerosPicture(butterworth({ order: 12 })).narrow)).toContain('12 at 0');
  });

  it('tells far zeros in words and keeps the scale', () => {
    const [near, far] = [response(6, [1.45, -1.45]), response(6, [1.45, -1.45, 20, -35])];
    const picture = polesAndZerosPicture(far);
    expect(textsOf(picture.wide)).toEqual(
      expect.arrayContaining(['far above: zero at +j20.000', 'far off the plane: zero at −j35.000']),
    );
    expect(planeOf(far, 'wide').pixelsPerUnit / planeOf(near, 'wide').pixelsPerUnit).toBeCloseTo(1, 2);
    const many = Array.from({ length: 30 }, (_, n) => ({
      kind: 'transmission' as const,
      at: { re: 0, im: n },
      text: '+j1000',
      count: 1,
    }));
    expect(textWidth(farText(many, 'far above', 300, 11), 11)).toBeLessThanOrEqual(300);
    expect(farText(many, 'far above', 300, 11)).toMatch(/ and \d+ more$/);
  });

  it('labels keep 17 px apart and stay inside; what found no room is counted', () => {
    for (const polynomials of samples()) {
      for (const format of FORMATS) {
        const plane = planeOf(polynomials, format);
        for (const anchor of ['start', 'end'] as const) {
          const heights = plane.labels.filter((label) => label.anchor === anchor).map(({ y }) => y);
          heights.slice(1).forEach((y, n) => {
            expect(y - heights[n]!).toBeGreaterThanOrEqual(17 - 1e-9);
          });
        }
        for (const { x, y, text, anchor } of plane.labels) {
          const size = textWidth(text, plane.letters);
          expect(anchor === 'start' ? x + size : x - size).toBeGreaterThan(0);
          expect(anchor === 'start' ? x + size : x).toBeLessThanOrEqual(plane.width);
          expect(y).toBeGreaterThan(0);
          expect(y + 6).toBeLessThan(plane.height);
        }
        for (const { x, y } of plane.marks) {
          expect(x).toBeGreaterThan(plane.left);
          expect(x + 5).toBeLessThan(plane.right);
          expect(y - 5).toBeGreaterThan(plane.top);
          expect(y + 5).toBeLessThan(plane.bottom);
        }
      }
    }
    const large = planeOf(response(100, [1.2, -1.2]), 'wide');
    expect(large.labels.length + large.unlabelled).toBe(50 + 50 + 1);
    const small = planeOf(response(100, [1.2, -1.2]), 'narrow');
    expect(polesAndZerosPicture(response(100, [1.2, -1.2])).caption).toContain(
      small.unlabelled === large.unlabelled
        ? `${large.unlabelled} more values stand in the table`
        : 'values without room stand in the table',
    );
  });

  it('leaders keep clear of the marks they do not belong to, up to order 30', () => {
    /** Distance of a point from a straight line between two points. */
    const distance = (x: number, y: number, [a, b]: ReturnType<typeof leaderEnds>): number => {
      const [dx, dy] = [b[0] - a[0], b[1] - a[1]];
      const share = ((x - a[0]) * dx + (y - a[1]) * dy) / (dx * dx + dy * dy);
      const t = Math.min(Math.max(share, 0), 1);
      return Math.hypot(x - a[0] - t * dx, y - a[1] - t * dy);
    };
    for (const [order, zeros] of [
      [8, [1.2, -1.3]],
      [16, [1.2, -1.2]],
      [20, [1.2, 1.3, 1.5]],
      [24, [1.2, -1.3]],
      [30, [1.2]],
    ] as const)
      for (const format of FORMATS) {
        const { labels, marks } = planeOf(response(order, zeros, 20), format);
        for (const label of labels)
          for (const { x, y } of marks)
            if (Math.hypot(x - label.markX, y - label.markY) > 0.5)
              // A cross or a ring reaches 4.5 px along a line and a little over 5 with its stroke.
              expect(distance(x, y, leaderEnds(label)), `${order} ${format} ${label.text}`).toBeGreaterThan(5.2);
      }
  });

  it('spreads labels evenly about their places, without changing those that have room', () => {
    expect(spread([10, 40, 80], 17, 0, 100)).toEqual([10, 40, 80]);
    expect(spread([30, 32, 80], 17, 0, 100)).toEqual([22.5, 39.5, 80]);
    expect(spread([95, 97, 99], 17, 0, 100)).toEqual([66, 83, 100]);
    expect(spread([1, 2, 3], 17, 0, 100)).toEqual([0, 17, 34]);
    expect(spread([], 17, 0, 100)).toEqual([]);
  });
});
