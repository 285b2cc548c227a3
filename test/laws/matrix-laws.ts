import fc from 'fast-check';
import type { CouplingMatrix, Scattering } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import type { Model } from '../../src/response/index.js';
import { distance, entry, isSymmetric, matrixGap, normOf, sharpness, size, withEntry } from '../support/models.js';
import type { Engine } from './engine.js';
import { changed, inArrow, inFolded, inRequest, inScattering, inTransversal, scaled, wrongSide } from './faults.js';
import { type Law, law, must, within } from './law.js';
import {
  frequency,
  matrices,
  mirroredRequest,
  plainRequests,
  type Request,
  requests,
  roomOf,
  symmetricRequests,
  zeroRequests,
} from './specs.js';

const gap = (a: Scattering, b: Scattering): number =>
  Math.max(distance(a.s11, b.s11), distance(a.s21, b.s21), distance(a.s12, b.s12), distance(a.s22, b.s22));

const sameResponse = (engine: Engine, a: Model, b: Model, omega: number, room: number): void =>
  within(gap(engine.scatteringAt(a, omega), engine.scatteringAt(b, omega)), room, 'S');

/** The network seen from the other side. */
export const turnedAround = (matrix: CouplingMatrix): CouplingMatrix => ({
  ...matrix,
  values: [...matrix.values].reverse().map((row) => [...row].reverse()),
});

const startOf = (engine: Engine, request: Request): CouplingMatrix =>
  engine.transversal(engine.generalizedChebyshev(request));

export const matrixLaws: readonly Law[] = [
  law(
    'the transversal matrix has the complex response of the polynomials',
    fc.tuple(requests(), frequency),
    (engine, [request, omega]) => {
      const p = engine.generalizedChebyshev(request);
      sameResponse(engine, p, engine.transversal(p), omega, roomOf(p));
    },
    [
      ['one source coupling with the wrong sign', inTransversal(changed(0, 1, -1))],
      ['one load coupling off by 1e-6', inTransversal(changed(1, -1, 1 + 1e-6))],
      ['one resonance off by 1e-6', inTransversal(changed(1, 1, 1, 1e-6))],
      [
        'diagonal with the wrong sign',
        inTransversal((m) =>
          m.values.reduce((each, _, k) => (k > 0 && k <= m.order ? withEntry(each, k, k, -entry(m, k, k)) : each), m),
        ),
      ],
    ],
    80,
  ),
  law(
    'the transversal matrix couples ports to resonators only, |M_Sk| = M_kL > 0, falling diagonal',
    requests(),
    (engine, request) => {
      const matrix = startOf(engine, request);
      const last = request.order + 1;
      must(isSymmetric(matrix), 'symmetric');
      for (let k = 1; k < last; k++) {
        must(
          entry(matrix, k, last) > 0 && Math.abs(entry(matrix, 0, k)) === entry(matrix, k, last),
          `couplings of ${k}`,
        );
        must(k === 1 || entry(matrix, k, k) <= entry(matrix, k - 1, k - 1), `diagonal ${k}`);
        for (let j = 1; j < k; j++) must(entry(matrix, k, j) === 0, `entry (${k},${j})`);
      }
      must(
        request.transmissionZeros.length === request.order
          ? entry(matrix, 0, last) !== 0
          : entry(matrix, 0, last) === 0,
        'M_SL',
      );
    },
    [
      ['a coupling of two resonators left', inTransversal(changed(1, 2, 1, 1e-18))],
      ['ports swapped in sign', inTransversal(changed(1, -1, -1))],
      ['direct coupling left', inTransversal(changed(0, -1, 1, 1e-18))],
    ],
  ),
  law(
    'the folded matrix has the response of the transversal one',
    fc.tuple(requests(), frequency),
    (engine, [request, omega]) => {
      const p = engine.generalizedChebyshev(request);
      const start = engine.transversal(p);
      sameResponse(engine, start, engine.folded(start).matrix, omega, roomOf(p));
    },
    [
      ['one main-line coupling off by 1e-6', inFolded(changed(1, 2, 1 + 1e-6))],
      ['one cross-coupling with the wrong sign', inFolded((m) => crossFlipped(m))],
      ['source coupling with the wrong sign', inFolded(changed(0, 1, -1))],
    ],
    80,
  ),
  law(
    'the arrow matrix has the response of the transversal one',
    fc.tuple(requests(), frequency),
    (engine, [request, omega]) => {
      const p = engine.generalizedChebyshev(request);
      const start = engine.transversal(p);
      sameResponse(engine, start, engine.arrow(start).matrix, omega, roomOf(p));
    },
    [
      ['one chain coupling off by 1e-6', inArrow(changed(1, 2, 1 + 1e-6))],
      ['load column with the wrong sign', inArrow((m) => changed(-2, -1, -1)(m))],
      ['ports swapped and one diagonal lost', inArrow((m) => withEntry(turnedAround(m), 1, 1, 0))],
    ],
    80,
  ),
  law(
    'the folded matrix has exact zeros where nz finite zeros demand them, and a positive main line to the load',
    requests(),
    (engine, request) => {
      const { matrix } = engine.folded(startOf(engine, request));
      const [n, zeros] = [request.order, request.transmissionZeros.length];
      must(isSymmetric(matrix), 'symmetric');
      for (let i = 0; i <= n + 1; i++) {
        for (let j = i + 2; j <= n + 1; j++) {
          const crossing = (i + j === n + 1 || i + j === n + 2) && i + (n + 1 - j) >= n - zeros;
          must(crossing || Object.is(entry(matrix, i, j), 0), `entry (${i},${j})`);
        }
      }
      for (let i = 1; i <= n; i++) must(entry(matrix, i, i + 1) >= 0, `main line ${i}`);
    },
    [
      ['a trace left in a corner', inFolded((m) => (m.order > 2 ? withEntry(m, 0, m.order, 1e-300) : m))],
      ['a negative main line', inFolded(changed(-2, -1, -1))],
    ],
  ),
  law(
    'the arrow matrix is a chain with nz+1 load couplings and exact zeros elsewhere',
    requests(),
    (engine, request) => {
      const { matrix } = engine.arrow(startOf(engine, request));
      const [n, zeros] = [request.order, request.transmissionZeros.length];
      for (let i = 0; i <= n; i++) {
        for (let j = i + 2; j <= n; j++) must(Object.is(entry(matrix, i, j), 0), `entry (${i},${j})`);
        if (i < n - zeros) must(Object.is(entry(matrix, i, n + 1), 0), `load coupling ${i}`);
        if (i < n) must(entry(matrix, i, i + 1) >= 0, `chain ${i}`);
      }
      must(entry(matrix, n - zeros, n + 1) !== 0, 'outermost load coupling');
    },
    [
      ['a trace left next to the chain', inArrow((m) => (m.order > 2 ? withEntry(m, 1, 3, 1e-300) : m))],
      [
        'one zero too few in the load column',
        inArrow((m) => (m.finiteZeros === m.order ? m : withEntry(m, m.order - (m.finiteZeros ?? 0), m.order + 1, 0))),
      ],
    ],
  ),
  law(
    'folded and arrow matrices replay from their rotations',
    requests(),
    (engine, request) => {
      const p = engine.generalizedChebyshev(request);
      const start = engine.transversal(p);
      for (const { matrix, rotations } of [engine.folded(start), engine.arrow(start)]) {
        within(matrixGap(engine.applyRotations(start, rotations), matrix), roomOf(p), 'replay');
      }
    },
    [
      [
        'stale rotation: the first one is lost',
        (engine) => ({
          ...engine,
          folded: (m) => {
            const r = engine.folded(m);
            return { ...r, rotations: r.rotations.slice(1) };
          },
        }),
      ],
      [
        'one angle with the wrong sign',
        (engine) => ({
          ...engine,
          arrow: (m) => {
            const r = engine.arrow(m);
            return {
              ...r,
              rotations: r.rotations.map((each, n) => (n === 0 ? { ...each, angle: -each.angle } : each)),
            };
          },
        }),
      ],
    ],
  ),
  law(
    'folding a folded matrix changes nothing',
    requests(),
    (engine, request) => {
      const p = engine.generalizedChebyshev(request);
      const { matrix } = engine.folded(engine.transversal(p));
      within(matrixGap(engine.folded(matrix).matrix, matrix), roomOf(p), 'twice');
    },
    [['a drift at each fold', inFolded(changed(1, 1, 1, 1e-6))]],
  ),
  law(
    'the arrow form does not depend on the form it starts from',
    requests(),
    (engine, request) => {
      const p = engine.generalizedChebyshev(request);
      const start = engine.transversal(p);
      within(
        matrixGap(engine.arrow(engine.folded(start).matrix).matrix, engine.arrow(start).matrix),
        roomOf(p) * sharpness(p),
        'arrow',
      );
    },
    [
      [
        'signs left as they come from a transversal start',
        inArrow((m, start) => (start.order > 1 && entry(start, 1, 2) === 0 ? changed(0, 1, -1)(m) : m)),
      ],
    ],
  ),
  law(
    'the folded form does not depend on the form it starts from',
    requests(),
    (engine, request) => {
      const p = engine.generalizedChebyshev(request);
      const start = engine.transversal(p);
      within(
        matrixGap(engine.folded(engine.arrow(start).matrix).matrix, engine.folded(start).matrix),
        roomOf(p) * sharpness(p),
        'folded',
      );
    },
    [
      [
        'signs left as they come from a transversal start',
        inFolded((m, start) => (start.order > 1 && entry(start, 1, 2) === 0 ? changed(0, 1, -1)(m) : m)),
      ],
    ],
  ),
  law(
    'mirroring zeros about the center negates the diagonal and keeps the size of every coupling',
    requests(),
    (engine, request) => {
      const p = engine.generalizedChebyshev(request);
      const one = engine.folded(engine.transversal(p)).matrix;
      const two = engine.folded(startOf(engine, mirroredRequest(request))).matrix;
      one.values.forEach((row, i) => {
        row.forEach((value, j) => {
          const other = entry(two, i, j);
          within(
            i === j ? Math.abs(value + other) : Math.abs(Math.abs(value) - Math.abs(other)),
            roomOf(p),
            `entry (${i},${j})`,
          );
        });
      });
    },
    [
      [
        'diagonal without its sign',
        inFolded((m) => m.values.reduce((each, _, k) => withEntry(each, k, k, Math.abs(entry(m, k, k))), m)),
      ],
      [
        'lower zeros moved by 1e-6',
        inRequest((r) => ({
          ...r,
          transmissionZeros: (r.transmissionZeros ?? []).map((z) =>
            typeof z === 'number' && z < 0 ? z * (1 + 1e-6) : z,
          ),
        })),
      ],
    ],
  ),
  law(
    'zeros mirrored about the center give an exactly synchronous matrix',
    symmetricRequests,
    (engine, request) => {
      const start = startOf(engine, request);
      for (const { matrix } of [engine.folded(start), engine.arrow(start)]) {
        for (let k = 1; k <= request.order; k++) must(Object.is(entry(matrix, k, k), 0), `diagonal ${k}`);
      }
      for (let k = 1; k <= request.order; k++) {
        const mirror = request.order + 1 - k;
        must(entry(start, k, k) + entry(start, mirror, mirror) === 0, `resonance ${k}`);
      }
    },
    [
      ['rounding left on the diagonal', inFolded(changed(1, 1, 1, 1e-18))],
      [
        'zeros on one side moved by 1e-9',
        inRequest((r) => ({
          ...r,
          transmissionZeros: (r.transmissionZeros ?? [2]).map((z) =>
            typeof z === 'number' && z > 0 ? z * (1 + 1e-9) : z,
          ),
        })),
      ],
    ],
  ),
  law(
    'an all-pole network reads the same from either port',
    plainRequests,
    (engine, request) => {
      const { matrix } = engine.folded(startOf(engine, request));
      within(matrixGap(matrix, turnedAround(matrix)), 30 * EPS * request.order, 'turned around');
    },
    [['first coupling off by 1e-9', inFolded(changed(0, 1, 1 + 1e-9))]],
    40,
  ),
  law(
    'every form has S21 = 0 at the zeros on the axis, above as below',
    zeroRequests,
    (engine, request) => {
      const p = engine.generalizedChebyshev(request);
      const start = engine.transversal(p);
      for (const zero of request.transmissionZeros) {
        if (typeof zero !== 'number') continue;
        for (const matrix of [start, engine.folded(start).matrix, engine.arrow(start).matrix]) {
          within(size(engine.scatteringAt(matrix, zero).s21), roomOf(p), 'S21');
        }
      }
    },
    [
      ['zeros on the wrong side', wrongSide],
      [
        'zeros off by 1e-4',
        inRequest((r) => ({
          ...r,
          transmissionZeros: (r.transmissionZeros ?? []).map((z) => (typeof z === 'number' ? z * (1 + 1e-4) : z)),
        })),
      ],
    ],
  ),
  law(
    'any coupling matrix is reciprocal: S12 = S21',
    fc.tuple(matrices(1, 6), frequency),
    (engine, [matrix, omega]) => {
      const { s21, s12 } = engine.scatteringAt(matrix, omega);
      within(distance(s21, s12), 0, 'S12');
    },
    [
      ['S12 with the wrong sign', inScattering((s) => ({ ...s, s12: scaled(s.s12, -1) }))],
      ['S12 conjugated', inScattering((s) => ({ ...s, s12: { re: s.s12.re, im: -s.s12.im } }))],
    ],
    30,
  ),
  law(
    'any coupling matrix is unitary: rows of S are orthonormal',
    fc.tuple(matrices(1, 6), frequency),
    (engine, [matrix, omega]) => {
      const { s11, s21, s12, s22 } = engine.scatteringAt(matrix, omega);
      within(Math.abs(size(s11) ** 2 + size(s21) ** 2 - 1), 1e-9, 'first column');
      within(Math.abs(size(s12) ** 2 + size(s22) ** 2 - 1), 1e-9, 'second column');
      const re = s11.re * s21.re + s11.im * s21.im + s12.re * s22.re + s12.im * s22.im;
      const im = s11.im * s21.re - s11.re * s21.im + s12.im * s22.re - s12.re * s22.im;
      within(Math.hypot(re, im), 1e-9, 'product');
    },
    [
      ['S22 taken to be S11', inScattering((s) => ({ ...s, s22: s.s11 }))],
      ['S21 off by 1e-6', inScattering((s) => ({ ...s, s21: scaled(s.s21, 1 + 1e-6) }))],
    ],
  ),
  law(
    'a network turned around swaps S11 and S22',
    fc.tuple(matrices(1, 6), frequency),
    (engine, [matrix, omega]) => {
      const one = engine.scatteringAt(matrix, omega);
      const two = engine.scatteringAt(turnedAround(matrix), omega);
      within(
        Math.max(distance(one.s11, two.s22), distance(one.s22, two.s11), distance(one.s21, two.s21)),
        1e-9,
        'swap',
      );
    },
    [
      ['S22 taken to be S11', inScattering((s) => ({ ...s, s22: s.s11 }))],
      [
        'S11 and S22 transposed above the band',
        inScattering((s, omega) => (omega > 0 ? { ...s, s11: { re: s.s11.re, im: -s.s11.im } } : s)),
      ],
    ],
  ),
  law(
    'any matrix folds and chases without a change of response',
    fc.tuple(matrices(1, 8), frequency),
    (engine, [matrix, omega]) => {
      for (const { matrix: after } of [engine.folded(matrix), engine.arrow(matrix)]) {
        must(isSymmetric(after), 'symmetric');
        // Eigenvalues are kept to rounding; a resonance of width 1e-4 magnifies that.
        within(gap(engine.scatteringAt(after, omega), engine.scatteringAt(matrix, omega)), 1e-8 * normOf(matrix), 'S');
      }
    },
    [['one coupling off by 1e-6', inFolded(changed(1, 2, 1 + 1e-4, 1e-5))]],
  ),
];

/** The innermost cross-coupling with the opposite sign. */
function crossFlipped(matrix: CouplingMatrix): CouplingMatrix {
  const n = matrix.order;
  for (let i = 0; i <= n + 1; i++) {
    for (let j = i + 2; j <= n + 1; j++) if (entry(matrix, i, j) !== 0) return changed(i, j, -1)(matrix);
  }
  return matrix;
}
