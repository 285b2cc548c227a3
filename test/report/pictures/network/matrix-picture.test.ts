import { describe, expect, it } from 'vitest';
import { matrixLayout } from '../../../../src/report/pictures/network/matrix/matrix-layout.js';
import { matrixPicture, namedThreads } from '../../../../src/report/pictures/network/matrix/matrix-picture.js';
import { textWidth } from '../../../../src/report/svg/words.js';
import { entry, randomMatrix } from '../../../support/models.js';
import { seeded } from '../../../support/random.js';
import { attributes, numberOf, textsOf } from './checks.js';
import { foldedDesign, foldedDesigns, otherDesigns } from './network-designs.js';

/** Area of a polygon from the text of its corners. */
function areaOf(points: string): number {
  const corners = points.split(' ').map((pair) => pair.split(',').map(Number) as [number, number]);
  const twice = corners.reduce((sum, [x, y], n) => {
    const [u, v] = corners[(n + 1) % corners.length]!;
    return sum + x * v - u * y;
  }, 0);
  return Math.abs(twice) / 2;
}

describe('matrix picture', () => {
  it('has one mark an entry on and above the diagonal: squares positive, lozenges negative, rings too weak for either', () => {
    for (const seed of [1, 2, 3, 4]) {
      const matrix = randomMatrix(3 + seed, seeded(seed));
      const entries = matrix.values.flatMap((row, i) => row.filter((value, j) => j >= i && value !== 0));
      const { wide } = matrixPicture(matrix);
      const { step } = matrixLayout(matrix, 'wide');
      const strong = (value: number): boolean =>
        0.6 * step * Math.sqrt(Math.abs(value) / Math.max(...entries.map(Math.abs))) >= 6.5;
      expect(attributes(wide, 'polygon', 'points').length).toBe(entries.filter((m) => m < 0 && strong(m)).length);
      // One more rectangle: the ground.
      expect(attributes(wide, 'rect', 'class').length).toBe(1 + entries.filter((m) => m > 0 && strong(m)).length);
      expect(attributes(wide, 'circle', 'r').length).toBe(entries.filter((m) => !strong(m)).length);
    }
  });

  it('a lozenge is never smaller than can be told from a square; weaker entries of both signs are hollow rings', () => {
    for (const { name, matrix } of [...[4, 8, 10, 14, 20].flatMap(foldedDesigns), ...otherDesigns()]) {
      for (const format of ['wide', 'narrow'] as const) {
        for (const { kind, side, row, column } of matrixLayout(matrix, format).knots) {
          if (kind === 'square' || kind === 'lozenge') {
            expect(side, name).toBeGreaterThanOrEqual(5.5);
            expect(kind, name).toBe(entry(matrix, row, column) > 0 ? 'square' : 'lozenge');
          }
        }
      }
    }
    const values = foldedDesign(6).matrix.values.map((row) => [...row]);
    values[2]![5] = values[5]![2] = -0.004;
    const weak = { order: 6, values };
    expect(matrixLayout(weak, 'wide').knots.find(({ row, column }) => row === 2 && column === 5)?.kind).toBe('ring');
    expect(textsOf(matrixPicture(weak).wide)).toContain('−.0040');
    expect(matrixPicture(weak).caption).toContain('too weak to draw size and sign, which the table holds');
  });

  it('numbers and row names keep apart by at least the width of a space', () => {
    for (const { name, matrix } of [...[2, 5, 8, 10, 12].flatMap(foldedDesigns), ...otherDesigns()]) {
      for (const format of ['wide', 'narrow'] as const) {
        const { entries, nameEnd } = matrixLayout(matrix, format);
        const half = ({ text, isNegative }: (typeof entries)[number]): number => textWidth(text, 11, isNegative) / 2;
        for (const each of entries) {
          expect(each.x - half(each) - nameEnd, name).toBeGreaterThanOrEqual(4);
          for (const other of entries)
            if (other.row === each.row && other.x > each.x)
              expect(other.x - half(other) - each.x - half(each), name).toBeGreaterThanOrEqual(4);
        }
      }
    }
  });

  it('captions name only marks and numbers that are drawn', () => {
    for (const { name, matrix } of [...[1, 3, 8, 11, 14].flatMap(foldedDesigns), ...otherDesigns(), foldedDesign(40)]) {
      const layouts = (['wide', 'narrow'] as const).map((format) => matrixLayout(matrix, format));
      const { caption } = matrixPicture(matrix);
      const has = (kind: string): boolean => layouts.some(({ knots }) => knots.some((knot) => knot.kind === kind));
      expect(caption.includes('lozenge'), name).toBe(has('lozenge'));
      expect(caption.includes('ring'), name).toBe(has('ring'));
      const numbered = layouts.map(({ entries }) => entries.length);
      expect(caption.includes('numbers below the diagonal'), name).toBe(Math.max(...numbered) > 0);
      if (numbered[0] !== numbered[1] && Math.min(...numbered) === 0)
        expect(caption, name).toContain('where there is room');
    }
  });

  it('area is size: closed form, lozenge and square alike', () => {
    const matrix = randomMatrix(5, seeded(9));
    const { knots, step } = matrixLayout(matrix, 'wide');
    const sizes = matrix.values.flatMap((row, i) => row.filter((_, j) => j >= i)).map(Math.abs);
    const largest = Math.max(...sizes);
    for (const { row, column, side, kind } of knots) {
      if (kind === 'ring') continue;
      const share = Math.abs(entry(matrix, row, column)) / largest;
      expect(side ** 2).toBeCloseTo((0.6 * step) ** 2 * share, 9);
    }
    // A lozenge of half diagonal side/sqrt(2) has the area side^2; corners are rounded to a tenth of a pixel.
    const negative = knots.filter(({ kind }) => kind === 'lozenge');
    const areas = attributes(matrixPicture(matrix).wide, 'polygon', 'points').map(areaOf);
    areas.forEach((area, n) => {
      const { side } = negative[n]!;
      expect(Math.abs(area - side ** 2)).toBeLessThan(0.3 * side + 0.02);
    });
    expect(areas.length).toBeGreaterThan(3);
  });

  it('numbers below the diagonal are the entries, to the printed digits, each at its own crossing', () => {
    for (const seed of [5, 6, 7]) {
      const matrix = randomMatrix(4, seeded(seed));
      const { entries, numbers } = matrixLayout(matrix, 'wide');
      expect(numbers).toBe('all');
      expect(entries.length).toBe(15 - 0);
      const texts = textsOf(matrixPicture(matrix).wide);
      for (const { row, column, text } of entries) {
        expect(row).toBeGreaterThan(column);
        expect(numberOf(text).toFixed(4)).toBe(entry(matrix, row, column).toFixed(4));
        expect(texts).toContain(text);
      }
    }
  });

  it('larger orders keep numbers of cross couplings only, two decimals, as far as they fit', () => {
    const { matrix } = foldedDesign(14, 2);
    const { entries, numbers } = matrixLayout(matrix, 'wide');
    expect(numbers).toBe('cross');
    expect(entries.map(({ row, column }) => [row, column])).toEqual([[9, 6]]);
    expect(numberOf(entries[0]!.text)).toBe(Number(entry(matrix, 9, 6).toFixed(2)));
  });

  it('a value that came out zero is a hollow dot, a structural zero nothing', () => {
    const { matrix } = foldedDesign(4, 2);
    const values = matrix.values.map((row) => [...row]);
    values[1]![1] = 1e-17;
    const { knots } = matrixLayout({ order: 4, values }, 'narrow');
    expect(knots.filter(({ kind }) => kind === 'dot').map(({ row, column }) => [row, column])).toContainEqual([1, 1]);
    expect(knots.some(({ row, column }) => row === 0 && column === 5)).toBe(false);
  });

  it('numbers never touch each other or a mark, names keep apart, nothing leaves the drawing', () => {
    const designs = [
      ...[2, 6, 9, 12, 13, 20].flatMap(foldedDesigns),
      ...otherDesigns(),
      foldedDesign(40),
      foldedDesign(100),
    ];
    for (const { name, matrix } of designs) {
      for (const format of ['wide', 'narrow'] as const) {
        const layout = matrixLayout(matrix, format);
        const boxes = layout.entries.map(({ x, y, text, isNegative }) => ({
          x,
          y,
          half: textWidth(text, 11, isNegative) / 2,
        }));
        for (const [n, a] of boxes.entries()) {
          for (const b of boxes.slice(n + 1))
            expect(Math.abs(a.x - b.x) < a.half + b.half && Math.abs(a.y - b.y) < 11, name).toBe(false);
          for (const { x, y, side } of layout.knots)
            expect(Math.abs(a.x - x) < a.half + side / 2 && Math.abs(a.y - y) < 5 + side / 2, name).toBe(false);
        }
        const right = layout.left + (layout.size - 0.5) * layout.step;
        expect(right).toBeLessThanOrEqual(layout.width);
        expect(layout.top + (layout.size - 0.5) * layout.step).toBeLessThanOrEqual(layout.height);
        const threads = namedThreads(layout).map((thread) => layout.left + thread * layout.step);
        threads.slice(1).forEach((at, n) => {
          expect(at - threads[n]!, name).toBeGreaterThan(14);
        });
      }
    }
  });
});
