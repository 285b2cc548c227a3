import { describe, expect, it } from 'vitest';
import { networkOf } from '../../../../src/report/pictures/network/routing/couplings.js';
import { emblemLayout } from '../../../../src/report/pictures/network/routing/emblem.js';
import { routingLayout } from '../../../../src/report/pictures/network/routing/routing-picture.js';
import { collisions, outside, runThrough, strays, touching } from './layout-checks.js';
import {
  arrowDesign,
  fanDesign,
  foldedDesign,
  foldedDesigns,
  type Named,
  otherDesigns,
  wired,
} from './network-designs.js';

const BAND = { centerHz: 3839.958e6, bandwidthHz: 36e6 };

/** Everything that may be wrong with both drawings of a design. */
function faults({ name, matrix }: Named, mayDrop = false): string[] {
  return [BAND, undefined].flatMap((band) =>
    (['wide', 'narrow'] as const).flatMap((format) => {
      const layout = routingLayout(matrix, band, format);
      const found = [...collisions(layout), ...strays(layout), ...touching(layout), ...runThrough(layout)];
      if (outside(layout)) found.push('leaves the drawing');
      if (!mayDrop && layout.dropped > 0) found.push(`${layout.dropped} labels left out`);
      return found.map((fault) => `${name}, ${format}: ${fault}`);
    }),
  );
}

const ORDERS = Array.from({ length: 13 }, (_, n) => n + 2);

describe('routing layout', () => {
  it.each(ORDERS)('labels of folded designs of order %i touch nothing, and none is left out', (order) => {
    expect(foldedDesigns(order).flatMap((each) => faults(each))).toEqual([]);
  });

  it('labels of arrow, in-line, transversal, triangles, squares and mixtures touch nothing', () => {
    expect(otherDesigns().flatMap((each) => faults(each))).toEqual([]);
  });

  it('arrow and transversal forms of orders 3 to 14 touch nothing', () => {
    const designs = ORDERS.slice(1).flatMap((order) => [
      arrowDesign(order, 1),
      arrowDesign(order, 2),
      arrowDesign(order, order),
      fanDesign(order, 0),
      fanDesign(order, order),
    ]);
    expect(designs.flatMap((each) => faults(each))).toEqual([]);
  });

  it('random wirings may leave labels out, but none touches anything', () => {
    const designs = Array.from({ length: 40 }, (_, seed) => {
      const order = 4 + (seed % 9);
      const cross = Array.from({ length: 1 + (seed % 6) }, (_, k): [number, number] => {
        const from = (seed * 7 + k * 5) % (order - 1);
        return [from, Math.min(from + 2 + ((seed + k * 3) % (order - 1)), order + 1)];
      });
      return wired(`random ${seed}`, order, cross, seed, seed % 2 === 0);
    });
    expect(designs.flatMap((each) => faults(each, true))).toEqual([]);
  });

  it('large orders stay inside the drawing', () => {
    const dense = Array.from({ length: 40 }, (_, i) =>
      Array.from({ length: 39 - i }, (_, k) => [i, i + 2 + k] as const),
    );
    const designs = [
      ...foldedDesigns(15),
      ...foldedDesigns(24),
      foldedDesign(40),
      foldedDesign(60),
      foldedDesign(100),
      arrowDesign(24, 6),
      arrowDesign(40, 40),
      fanDesign(20, 4),
      fanDesign(100, 2),
      wired('in-line 100', 100, []),
      wired('cascade 40', 40, [
        [1, 3],
        [4, 6],
        [7, 10],
        [12, 14],
        [20, 23],
        [23, 25],
      ]),
      wired('everything to everything', 40, dense.flat()),
    ];
    expect(designs.flatMap((each) => faults(each, true))).toEqual([]);
  });

  it('the check finds a label on a line', () => {
    const layout = routingLayout(foldedDesign(6).matrix, BAND, 'wide');
    const { left, top, right, bottom } = layout.labels[0]!.box;
    const [x, y] = layout.routes[0]!.points[0]!;
    const box = { left: x, right: x + right - left, top: y - 5, bottom: y - 5 + bottom - top };
    expect(collisions({ ...layout, labels: [{ ...layout.labels[0]!, box }] })).not.toEqual([]);
  });

  it('emblems are at most 150 by 60 px, with nothing outside and no discs that touch', () => {
    const designs = [
      ...ORDERS.flatMap(foldedDesigns),
      ...otherDesigns(),
      foldedDesign(40),
      wired('in-line 100', 100, []),
    ];
    const found = designs.flatMap(({ name, matrix }) => {
      const layout = emblemLayout(networkOf(matrix));
      const tooLarge = layout.width > 150.001 || layout.height > 60.001;
      return [...touching(layout), ...(outside(layout) ? ['outside'] : []), ...(tooLarge ? ['too large'] : [])].map(
        (fault) => `${name}: ${fault}`,
      );
    });
    expect(found).toEqual([]);
  });
});
