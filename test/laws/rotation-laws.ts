import fc from 'fast-check';
import type { CouplingMatrix, Rotation } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { denseRotation, distance, entry, isSymmetric, matrixGap, normOf, withEntry } from '../support/models.js';
import type { Engine } from './engine.js';
import { type Fault, inRotation, ofRotation } from './faults.js';
import { type Law, law, must, within } from './law.js';
import { chains, frequency, matrices, uniform } from './specs.js';

/** Traces of powers of the resonator block, squares of the port rows, and Markov numbers m_S B^k m_L. */
function invariants(matrix: CouplingMatrix): number[] {
  const n = matrix.order;
  const block = matrix.values.slice(1, n + 1).map((row) => row.slice(1, n + 1));
  const times = (v: readonly number[]): number[] =>
    block.map((row) => row.reduce((sum, value, k) => sum + value * v[k]!, 0));
  const dot = (a: readonly number[], b: readonly number[]): number =>
    a.reduce((sum, value, k) => sum + value * b[k]!, 0);
  const source = matrix.values[0]!.slice(1, n + 1);
  let image = matrix.values[n + 1]!.slice(1, n + 1);
  const list = [dot(source, source), dot(image, image)];
  for (let k = 0; k < 5; k++) {
    list.push(dot(source, image));
    image = times(image);
  }
  const square = block.map((row) => times(row));
  const trace = (rows: readonly (readonly number[])[]): number => rows.reduce((sum, row, k) => sum + row[k]!, 0);
  list.push(trace(block), trace(square), trace(square.map((row) => times(row))));
  return list;
}

const elementFor = (order: number, [i, j]: readonly [number, number], choice: number): readonly [number, number] => {
  const others = Array.from({ length: order + 2 }, (_, k) => k).filter((k) => k !== i && k !== j);
  const all = [[i, j] as const, ...others.flatMap((k) => [[i, k] as const, [k, j] as const])];
  return all[choice % all.length]!;
};

const inAnnihilation =
  (change: (result: ReturnType<Engine['annihilate']>) => ReturnType<Engine['annihilate']>): Fault =>
  (engine) => ({ ...engine, annihilate: (matrix, request) => change(engine.annihilate(matrix, request)) });

const sample = fc.tuple(matrices(2, 7), chains);
const single = fc.tuple(matrices(2, 7), chains, fc.nat(40));

export const rotationLaws: readonly Law[] = [
  law(
    'a rotation is R M R^T as documented',
    sample,
    (engine, [matrix, chain]) => {
      const { pivot, angle } = chain(matrix.order)[0]!;
      const turned = engine.rotate(matrix, { pivot, angle });
      within(
        matrixGap(turned, { ...matrix, values: denseRotation(matrix, pivot, angle) }),
        30 * EPS * normOf(matrix),
        'dense',
      );
    },
    [
      ['angle with the wrong sign', ofRotation((r) => ({ ...r, angle: -r.angle }))],
      ['pivot nodes exchanged', ofRotation((r) => ({ ...r, pivot: [r.pivot[1], r.pivot[0]] as const }))],
      ['angle in degrees', ofRotation((r) => ({ ...r, angle: (r.angle * Math.PI) / 180 }))],
    ],
  ),
  law(
    'rotations leave S-parameters unchanged',
    fc.tuple(matrices(2, 6), chains, frequency),
    (engine, [matrix, chain, omega]) => {
      const turned = engine.applyRotations(matrix, chain(matrix.order));
      const [a, b] = [engine.scatteringAt(matrix, omega), engine.scatteringAt(turned, omega)];
      within(
        Math.max(distance(a.s11, b.s11), distance(a.s21, b.s21), distance(a.s22, b.s22)),
        1e-8 * normOf(matrix),
        'S',
      );
    },
    [
      [
        'stale rotation: the port rows are not turned',
        inRotation((turned, before, { pivot: [i, j] }) =>
          [i, j].reduce(
            (m, k) => withEntry(withEntry(m, 0, k, entry(before, 0, k)), k, m.order + 1, entry(before, k, m.order + 1)),
            turned,
          ),
        ),
      ],
      [
        'stale rotation: the pivot entry is not turned',
        inRotation((turned, before, { pivot: [i, j] }) => withEntry(turned, i, j, entry(before, i, j))),
      ],
    ],
  ),
  law(
    'rotations keep eigenvalue sums, port rows and Markov numbers',
    sample,
    (engine, [matrix, chain]) => {
      const steps = chain(matrix.order);
      const before = invariants(matrix);
      const sizes = normOf(matrix) ** 3 * (1 + normOf(matrix)) ** 2;
      // A flip changes no sum of products; it turns both port entries of a resonator.
      invariants(engine.applyRotations(matrix, steps)).forEach((value, n) => {
        within(Math.abs(value - before[n]!), 30 * steps.length * EPS * sizes, `invariant ${n}`);
      });
    },
    [
      [
        'a cosine off by 1e-9',
        inRotation((turned, _, { pivot: [i] }) => withEntry(turned, 0, i, entry(turned, 0, i) * (1 + 1e-9))),
      ],
      [
        'diagonal not turned',
        inRotation((turned, before, { pivot: [i] }) => withEntry(turned, i, i, entry(before, i, i))),
      ],
    ],
  ),
  law(
    'rotating and rotating back gives the matrix again',
    sample,
    (engine, [matrix, chain]) => {
      const steps = chain(matrix.order).map(({ pivot, angle }): Rotation => ({ pivot, angle }));
      const back = [...steps].reverse().map(({ pivot, angle }): Rotation => ({ pivot, angle: -angle }));
      const again = engine.applyRotations(engine.applyRotations(matrix, steps), back);
      within(matrixGap(again, matrix), 60 * steps.length * EPS * normOf(matrix), 'back');
    },
    [
      [
        'diagonal not turned',
        inRotation((turned, before, { pivot: [i] }) => withEntry(turned, i, i, entry(before, i, i))),
      ],
      ['a sine without its sign', ofRotation((r) => ({ ...r, angle: Math.abs(r.angle) }))],
    ],
  ),
  law(
    'two rotations of one pivot add their angles',
    fc.tuple(matrices(2, 7), chains, uniform(-3, 3)),
    (engine, [matrix, chain, more]) => {
      const { pivot, angle } = chain(matrix.order)[0]!;
      const two = engine.rotate(engine.rotate(matrix, { pivot, angle }), { pivot, angle: more });
      within(matrixGap(two, engine.rotate(matrix, { pivot, angle: angle + more })), 60 * EPS * normOf(matrix), 'sum');
    },
    [
      [
        'angle taken twice',
        inRotation((_, before, { pivot, angle }) => ({
          ...before,
          values: symmetric(denseRotation(before, pivot, Math.sin(angle))),
        })),
      ],
    ],
  ),
  law(
    'rotations of pivots without a common node commute',
    fc.tuple(matrices(4, 7), uniform(-3, 3), uniform(-3, 3)),
    (engine, [matrix, a, b]) => {
      const one: Rotation = { pivot: [1, 3], angle: a };
      const two: Rotation = { pivot: [4, 2], angle: b };
      const gap = matrixGap(engine.applyRotations(matrix, [one, two]), engine.applyRotations(matrix, [two, one]));
      within(gap, 60 * EPS * normOf(matrix), 'order');
    },
    [
      [
        'stale rotation: the row of node 2 is not turned by others',
        inRotation((turned, before, { pivot }) =>
          pivot.includes(2) ? turned : withEntry(turned, 1, 2, entry(before, 1, 2)),
        ),
      ],
    ],
    40,
  ),
  law(
    'rotations keep both triangles the same to the last bit and ports among themselves untouched',
    sample,
    (engine, [matrix, chain]) => {
      const turned = engine.applyRotations(matrix, chain(matrix.order));
      must(isSymmetric(turned), 'symmetric');
      const last = matrix.order + 1;
      for (const [i, j] of [
        [0, 0],
        [0, last],
        [last, last],
      ] as const)
        must(entry(turned, i, j) === entry(matrix, i, j), `entry (${i},${j})`);
      must(!turned.values.flat().some((value) => Object.is(value, -0)), 'negative zero');
    },
    [
      [
        'last bit of one triangle',
        // Only after the last step: the next rotation would refuse such a matrix.
        (engine) => ({
          ...engine,
          applyRotations: (matrix, rotations) => {
            const turned = engine.applyRotations(matrix, rotations);
            const values = turned.values.map((row, i) => row.map((value, j) => (i > j ? value * (1 + EPS) : value)));
            return { ...turned, values };
          },
        }),
      ],
      [
        'direct coupling turned too',
        inRotation((turned, _, { angle }) =>
          withEntry(turned, 0, turned.order + 1, entry(turned, 0, turned.order + 1) * Math.cos(angle)),
        ),
      ],
    ],
  ),
  law(
    'annihilate makes its element exactly 0, by an angle in its range',
    single,
    (engine, [matrix, chain, choice]) => {
      const { pivot } = chain(matrix.order)[0]!;
      const element = elementFor(matrix.order, pivot, choice);
      const { matrix: after, rotation } = engine.annihilate(matrix, { pivot, element });
      must(Object.is(entry(after, element[0], element[1]), 0), 'exact zero');
      const limit = element[0] === pivot[0] && element[1] === pivot[1] ? Math.PI / 4 : Math.PI / 2;
      must(rotation.angle > -limit && rotation.angle <= limit, 'range');
    },
    [
      [
        'rounding left in the element',
        inAnnihilation(({ matrix, rotation }) => ({
          matrix: { ...matrix, values: matrix.values.map((row) => row.map((value) => (value === 0 ? 1e-18 : value))) },
          rotation,
        })),
      ],
      [
        'half a turn too many',
        inAnnihilation(({ matrix, rotation }) => ({
          matrix,
          rotation: { ...rotation, angle: rotation.angle + Math.PI },
        })),
      ],
    ],
  ),
  law(
    'annihilate is the rotation that it reports',
    single,
    (engine, [matrix, chain, choice]) => {
      const { pivot } = chain(matrix.order)[0]!;
      const { matrix: after, rotation } = engine.annihilate(matrix, {
        pivot,
        element: elementFor(matrix.order, pivot, choice),
      });
      within(matrixGap(engine.rotate(matrix, rotation), after), 30 * EPS * normOf(matrix), 'replay');
    },
    [
      [
        'the reported angle has the wrong sign',
        inAnnihilation(({ matrix, rotation }) => ({ matrix, rotation: { ...rotation, angle: -rotation.angle } })),
      ],
      [
        'element cleared without a rotation',
        (engine) => ({
          ...engine,
          annihilate: (matrix, { pivot, element }) => ({
            matrix: withEntry(matrix, element[0], element[1], 0),
            rotation: { pivot, angle: 0 },
          }),
        }),
      ],
    ],
  ),
];

/** The upper triangle on both sides. */
const symmetric = (values: number[][]): number[][] =>
  values.map((row, i) => row.map((value, j) => (i <= j ? value : values[j]![i]!)));
