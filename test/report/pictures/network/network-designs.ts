import {
  arrow,
  type Complex,
  type CouplingMatrix,
  folded,
  generalizedChebyshev,
  transversal,
} from '../../../../src/index.js';
import { matrixOf } from '../../../support/models.js';
import { seeded } from '../../../support/random.js';

/** A matrix to be drawn, with a name. */
export interface Named {
  readonly name: string;
  readonly matrix: CouplingMatrix;
}

type Entry = readonly [number, number, number];

/** Zeros in mirrored pairs; a single one left over goes above the band. */
function symmetricZeros(count: number): number[] {
  return Array.from({ length: count }, (_, n) => (n % 2 === 0 ? 1 : -1) * (1.35 + 0.3 * Math.floor(n / 2)));
}

/** All zeros above the band. */
function upperZeros(count: number): number[] {
  return Array.from({ length: count }, (_, n) => 1.3 + 0.25 * n);
}

function responseOf(order: number, transmissionZeros: readonly (number | Complex)[]): CouplingMatrix {
  return transversal(generalizedChebyshev({ order, returnLossDb: 20, transmissionZeros }));
}

/** Folded designs of an order with 0, 1, 2, N-2 and N zeros, on both sides of the band and on one. */
export function foldedDesigns(order: number): Named[] {
  const counts = [...new Set([0, 1, 2, order - 2, order])].filter((count) => count <= order);
  return counts.flatMap((count) => {
    const symmetric = { name: `folded ${order}, ${count} zeros on both sides`, zeros: symmetricZeros(count) };
    const upper = { name: `folded ${order}, ${count} zeros above`, zeros: upperZeros(count) };
    return (count === 0 ? [symmetric] : [symmetric, upper]).map(({ name, zeros }) => ({
      name,
      matrix: folded(responseOf(order, zeros)).matrix,
    }));
  });
}

/** One folded design with two zeros. */
export function foldedDesign(order: number, zeros = 2): Named {
  return { name: `folded ${order}`, matrix: folded(responseOf(order, symmetricZeros(zeros))).matrix };
}

/** Arrow form. */
export function arrowDesign(order: number, zeros: number): Named {
  return { name: `arrow ${order}, ${zeros} zeros`, matrix: arrow(responseOf(order, upperZeros(zeros))).matrix };
}

/** Transversal form. */
export function fanDesign(order: number, zeros: number): Named {
  return { name: `transversal ${order}, ${zeros} zeros`, matrix: responseOf(order, symmetricZeros(zeros)) };
}

/** A chain with couplings of chance, detuned where asked, and cross couplings between given nodes. */
export function wired(
  name: string,
  order: number,
  cross: readonly (readonly [number, number])[],
  seed = 1,
  isDetuned = false,
): Named {
  const random = seeded(seed);
  const value = (): number => (random() < 0.4 ? -1 : 1) * (0.05 + 0.6 * random());
  const main = Array.from({ length: order + 1 }, (_, i): Entry => [i, i + 1, 0.4 + 0.7 * random()]);
  const own = isDetuned ? Array.from({ length: order }, (_, i): Entry => [i + 1, i + 1, 0.8 * random() - 0.4]) : [];
  return { name, matrix: matrixOf(order, [...main, ...own, ...cross.map(([i, j]): Entry => [i, j, value()])]) };
}

/** Matrices of every class that is not folded. */
export function otherDesigns(): Named[] {
  return [
    wired('in-line 6', 6, []),
    wired('in-line 12', 12, []),
    wired('in-line 6 detuned', 6, [], 2, true),
    wired(
      'two triangles apart',
      6,
      [
        [1, 3],
        [4, 6],
      ],
      3,
    ),
    wired(
      'two triangles sharing a corner',
      7,
      [
        [1, 3],
        [3, 5],
      ],
      4,
    ),
    wired(
      'three triangles',
      9,
      [
        [1, 3],
        [4, 6],
        [7, 9],
      ],
      5,
      true,
    ),
    wired('triangle at the source', 7, [[0, 2]], 6),
    wired('square and chain', 6, [[1, 4]], 7),
    wired(
      'two squares',
      8,
      [
        [1, 4],
        [5, 8],
      ],
      8,
    ),
    wired(
      'two squares sharing a corner',
      8,
      [
        [1, 4],
        [4, 7],
      ],
      9,
    ),
    wired(
      'triangle and square',
      8,
      [
        [1, 3],
        [5, 8],
      ],
      10,
      true,
    ),
    wired(
      'square with a diagonal',
      8,
      [
        [1, 4],
        [1, 3],
      ],
      11,
    ),
    wired(
      'two squares and a triangle',
      12,
      [
        [1, 4],
        [5, 7],
        [9, 12],
      ],
      12,
    ),
    wired('long arc', 6, [[1, 5]], 13),
    wired(
      'nested arcs',
      8,
      [
        [1, 7],
        [2, 5],
      ],
      14,
      true,
    ),
    wired(
      'crossing arcs',
      9,
      [
        [1, 6],
        [3, 8],
        [2, 4],
      ],
      15,
    ),
    arrowDesign(4, 2),
    arrowDesign(6, 2),
    arrowDesign(8, 8),
    arrowDesign(12, 3),
    fanDesign(2, 1),
    fanDesign(4, 2),
    fanDesign(6, 6),
    fanDesign(10, 2),
  ];
}
