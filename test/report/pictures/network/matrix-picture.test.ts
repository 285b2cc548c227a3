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
  it('has one mark an entry on and above the diagonal: squares positive, lozenges negative', () => {
    for (const seed of [1, 2, 3, 4]) {
      const matrix = randomMatrix(3 + seed, seeded(seed));
      const entries = matrix.values.flatMap((row, i) => row.filter((value, j) => j >= i && value !== 0));
      const { wide } = matrixPicture(matrix);
      expect(attributes(wide, 'polygon', 'points').length).toBe(entries.filter((value) => value < 0).length);
      // One more rectangle: the ground.
      expect(attributes(wide, 'rect', 'class').length).toBe(1 + entries.filter((value) => value > 0).length);
    }
  });

  it('area is size: closed form, lozenge and square alike', () => {
    const matrix = randomMatrix(5, seeded(9));
    const { knots, step } = matrixLayout(matrix, 'wide');
    const sizes = matrix.values.flatMap((row, i) => row.filter((_, j) => j >= i)).map(Math.abs);
    const largest = Math.max(...sizes);
    for (const { row, column, side } of knots) {
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
