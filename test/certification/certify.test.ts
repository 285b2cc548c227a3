import { describe, expect, test } from 'vitest';
import { certify } from '../../src/certification/index.js';
import type { Certificate, Complex, CouplingMatrix, FilterPolynomials } from '../../src/forms/index.js';
import { FilterFailure } from '../../src/numerics/index.js';
import {
  arrowOf,
  butterworthLine,
  chebyshevLine,
  equiripple,
  foldedOf,
  type Network,
  onAxis,
  withEntry,
} from './networks.js';

const red = (certificates: readonly Certificate[]): Certificate[] => certificates.filter((c) => !c.holds);
const PAIR: readonly Complex[] = [
  { re: 0.6, im: 0.2 },
  { re: -0.6, im: 0.2 },
];

describe('certify(polynomials, matrix) holds for networks known in closed form', () => {
  const lines: readonly [string, Network][] = [
    ...[1, 2, 3, 10, 40, 100].map((n): [string, Network] => [`Butterworth ${n}`, butterworthLine(n)]),
    ...[1, 2, 3, 4, 7, 10, 20, 40, 100].map((n): [string, Network] => [`Chebyshev ${n}`, chebyshevLine(n, 20)]),
    ['Chebyshev 8, 3 dB', chebyshevLine(8, 3)],
    ['Chebyshev 8, 90 dB', chebyshevLine(8, 90)],
  ];
  test.each(lines)('%s, in-line', (_, { polynomials, matrix }) => {
    const certificates = certify(polynomials, matrix, { structure: 'inline', before: matrix, leftover: 0 });
    expect(red(certificates)).toEqual([]);
    // A line is a folded form and an arrow form without finite zeros as well.
    if (matrix.order > 20) return;
    expect(red(certify(polynomials, matrix, { structure: 'folded' }))).toEqual([]);
    expect(red(certify(polynomials, matrix, { structure: 'arrow' }))).toEqual([]);
  });

  test('the Butterworth couplings of orders 1 and 2 are the numbers everybody knows', () => {
    expect(butterworthLine(1).matrix.values[0]?.[1]).toBeCloseTo(Math.SQRT1_2, 15);
    expect(butterworthLine(2).matrix.values[0]?.[1]).toBeCloseTo(0.8408964152537145, 15);
    expect(butterworthLine(2).matrix.values[1]?.[2]).toBeCloseTo(Math.SQRT1_2, 15);
  });
});

describe('certify(polynomials, matrix) holds for prescribed zeros in every structure', () => {
  const cases: readonly [number, number, readonly Complex[]][] = [
    [4, 22, onAxis(1.3217, 1.8082)],
    [4, 22, onAxis(-3.7431, -1.8051, 1.5699, 6.191)],
    [3, 22, onAxis(-3.7431, 1.5699, 6.191)],
    [2, 25.4, onAxis(-1.0041, 1.0139)],
    [8, 23, onAxis(-1.3553, 1.1093, 1.218)],
    [6, 20, onAxis(1.5, 1.5, 1.5)],
    [7, 23, [...onAxis(1.2576), { re: 0.9218, im: -0.1546 }, { re: -0.9218, im: -0.1546 }]],
    [12, 20, [...onAxis(1.1, -1.1), ...PAIR]],
    [12, 20, onAxis(1.002, -1.002)],
    [20, 26, onAxis(1.02, -1.02, 1.1)],
  ];
  test.each(cases)('order %i, %f dB, %o', (order, returnLossDb, zeros) => {
    const { polynomials, matrix } = equiripple(order, returnLossDb, zeros);
    const askedZeros = [...zeros].reverse();
    expect(red(certify(polynomials, matrix, { structure: 'transversal', askedZeros }))).toEqual([]);
    const folded = foldedOf(matrix);
    expect(red(certify(polynomials, folded, { structure: 'folded', before: matrix, askedZeros }))).toEqual([]);
    if (order > 12) return;
    const arrow = arrowOf(matrix);
    expect(red(certify(polynomials, arrow, { structure: 'arrow', before: matrix, askedZeros }))).toEqual([]);
  });

  test('the roots agree with the published example of order 4', () => {
    // R. J. Cameron, IEEE Trans. MTT 47(4), 1999: poles and ripple constant, four decimals, zeros given to four decimals.
    const { poles, epsilon } = equiripple(4, 22, onAxis(1.3217, 1.8082)).polynomials;
    const sorted = [...poles].sort((a, b) => a.im - b.im);
    const printed = [
      [-0.7437, -1.4178],
      [-1.1031, 0.1267],
      [-0.4571, 0.9526],
      [-0.0977, 1.0976],
    ];
    sorted.forEach((p, k) => {
      expect(Math.abs(p.re - (printed[k]?.[0] ?? 0))).toBeLessThan(1.1e-4);
      expect(Math.abs(p.im - (printed[k]?.[1] ?? 0))).toBeLessThan(1.1e-4);
    });
    expect(Math.abs(epsilon - 1.154746298247)).toBeLessThan(1e-11);
  });
});

describe('certify(polynomials, matrix) leaves out what does not apply', () => {
  const names = (network: Network, context = {}): string[] =>
    certify(network.polynomials, network.matrix, context).map((c) => c.check);

  test('without context: no drift and no structure', () => {
    expect(names(chebyshevLine(3, 20))).toEqual([
      'C1 energy balance of the matrix',
      'C1 orthogonality of the ports of the matrix',
      'C1 reciprocity of the matrix',
      'C2 energy balance of the polynomials',
      'C2 energy balance of the polynomials, units of rounding',
      'C3 half turns of E along the axis',
      'C3 disks of the poles against their gaps',
      'C4 reflection zeros in the band',
      'C4 ripple level against the return loss, dB',
      'C5 transmission zeros missing, foreign or unpaired',
      'C6 response of the matrix against the polynomials',
      'C6 response of the matrix against the polynomials, units of rounding',
      'C7 sum of the poles, units of rounding',
      'C7 sum of the squares of the poles, units of rounding',
      'C7 sum of the reflection zeros, units of rounding',
      'C7 sum of the squares of the reflection zeros, units of rounding',
      'C9 digits left in the response',
    ]);
  });

  test('Butterworth has edges instead of a ripple; a zero, a rotation, a structure and a leftover add their checks', () => {
    expect(names(butterworthLine(3)).filter((name) => name.startsWith('C4'))).toEqual([
      'C4 reflection zeros at the center',
      'C4 half power at the edges',
    ]);
    const lawless = butterworthLine(3);
    expect(
      names({ ...lawless, polynomials: { ...lawless.polynomials, family: 'lossless' } }).filter((name) =>
        name.startsWith('C4'),
      ),
    ).toEqual([]);
    const network = equiripple(4, 22, onAxis(1.5));
    const context = { before: network.matrix, structure: 'transversal', leftover: 1e-17 };
    expect(names(network, context)).toEqual(
      expect.arrayContaining([
        'C5 transmission of the matrix at its zeros',
        'C7 drift of the eigenvalues',
        'C7 drift of the Markov numbers',
        'C7 drift of the port entries',
        'C8 largest entry outside the transversal structure',
        'C8 largest entry set to 0, relative to the norm',
      ]),
    );
  });

  test('a response whose S11 vanishes at infinity has no power sums of reflection zeros', () => {
    // Band-stop of order 1: S21 = s/(s + 1), S11 = 1/(s + 1): the dual of the low-pass, with the source and load coupled by 1.
    const polynomials: FilterPolynomials = {
      family: 'lossless',
      order: 1,
      poles: [{ re: -1, im: 0 }],
      reflectionZeros: [],
      transmissionZeros: [{ re: 0, im: 0 }],
      transmissionLead: { re: 0, im: -1 },
      epsilon: 1,
      epsilonR: -1,
    };
    const matrix: CouplingMatrix = {
      order: 1,
      values: [
        [0, 1, 1],
        [1, 0, 1],
        [1, 1, 0],
      ],
      finiteZeros: 1,
    };
    const certificates = certify(polynomials, matrix);
    expect(certificates.some((c) => c.check.includes('reflection zeros'))).toBe(false);
  });
});

describe('certify(polynomials, matrix) refuses malformed arguments', () => {
  const { polynomials, matrix } = equiripple(4, 22, onAxis(1.5));
  const refused = (work: () => unknown): string => {
    try {
      work();
    } catch (error) {
      if (error instanceof FilterFailure) return `${error.code} ${error.argument}`;
      throw error;
    }
    return 'nothing';
  };
  const asymmetric = {
    ...matrix,
    values: matrix.values.map((row, i) => row.map((x, j) => (i === 2 && j === 5 ? x + 1e-16 : x))),
  };
  const cases: readonly [string, unknown, unknown, unknown, string][] = [
    ['no polynomials', null, matrix, {}, 'E_TYPE polynomials'],
    ['order as text', { ...polynomials, order: '4' }, matrix, {}, 'E_TYPE polynomials.order'],
    ['order 2.5', { ...polynomials, order: 2.5 }, matrix, {}, 'E_TYPE polynomials.order'],
    ['order 0', { ...polynomials, order: 0 }, matrix, {}, 'E_TYPE polynomials.order'],
    ['poles missing', { ...polynomials, poles: undefined }, matrix, {}, 'E_TYPE polynomials.poles'],
    ['a pole that is no number', { ...polynomials, poles: [1] }, matrix, {}, 'E_TYPE polynomials.poles[0]'],
    [
      'a pole that is NaN',
      { ...polynomials, poles: [{ re: Number.NaN, im: 0 }] },
      matrix,
      {},
      'E_NOT_FINITE polynomials.poles[0].re',
    ],
    [
      'an infinite zero',
      { ...polynomials, transmissionZeros: [{ re: 0, im: Infinity }] },
      matrix,
      {},
      'E_NOT_FINITE polynomials.transmissionZeros[0].im',
    ],
    ['epsilon NaN', { ...polynomials, epsilon: Number.NaN }, matrix, {}, 'E_NOT_FINITE polynomials.epsilon'],
    ['epsilonR missing', { ...polynomials, epsilonR: undefined }, matrix, {}, 'E_TYPE polynomials.epsilonR'],
    ['return loss as text', { ...polynomials, returnLossDb: '22' }, matrix, {}, 'E_TYPE polynomials.returnLossDb'],
    ['no lead', { ...polynomials, transmissionLead: 1 }, matrix, {}, 'E_TYPE polynomials.transmissionLead'],
    ['no matrix', polynomials, undefined, {}, 'E_TYPE matrix'],
    ['another order', polynomials, { ...matrix, order: 5 }, {}, 'E_MATRIX_SHAPE matrix.order'],
    [
      'a row missing',
      polynomials,
      { ...matrix, values: matrix.values.slice(1) },
      {},
      'E_MATRIX_SHAPE matrix.values.length',
    ],
    ['no rows', polynomials, { ...matrix, values: 7 }, {}, 'E_TYPE matrix.values'],
    [
      'a row that is none',
      polynomials,
      { ...matrix, values: matrix.values.map((row, i) => (i === 1 ? 'x' : row)) },
      {},
      'E_TYPE matrix.values[1]',
    ],
    [
      'a short row',
      polynomials,
      { ...matrix, values: matrix.values.map((row, i) => (i === 3 ? row.slice(1) : row)) },
      {},
      'E_MATRIX_SHAPE matrix.values[3].length',
    ],
    ['NaN in the matrix', polynomials, withEntry(matrix, 2, 3, Number.NaN), {}, 'E_NOT_FINITE matrix.values[2][3]'],
    [
      'text in the matrix',
      polynomials,
      withEntry(matrix, 2, 3, '1' as unknown as number),
      {},
      'E_TYPE matrix.values[2][3]',
    ],
    ['one unit in the last place off symmetry', polynomials, asymmetric, {}, 'E_NOT_SYMMETRIC matrix.values[5][2]'],
    ['no context', polynomials, matrix, null, 'E_TYPE context'],
    [
      'a malformed matrix before',
      polynomials,
      matrix,
      { before: asymmetric },
      'E_NOT_SYMMETRIC context.before.values[5][2]',
    ],
    ['a leftover as text', polynomials, matrix, { leftover: '0' }, 'E_TYPE context.leftover'],
    ['an unknown structure', polynomials, matrix, { structure: 'toString' }, 'E_TYPE context.structure'],
    ['asked zeros as numbers', polynomials, matrix, { askedZeros: [1.5] }, 'E_TYPE context.askedZeros[0]'],
  ];
  test.each(cases)('%s', (_, p, m, context, code) => {
    expect(refused(() => certify(p as FilterPolynomials, m as CouplingMatrix, context as object))).toBe(code);
  });

  test('sparse rows are no rows of numbers', () => {
    const row = new Array<number>(6);
    const values = matrix.values.map((x, i) => (i === 2 ? row : x));
    expect(refused(() => certify(polynomials, { ...matrix, values }))).toBe('E_TYPE matrix.values[2][0]');
  });
});

describe('certify(polynomials, matrix) never lets a number that is none hold', () => {
  test('a matrix that is singular at a sample point', () => {
    // Resonator 2 is coupled to nothing and resonates at omega = 1, a band edge: A is singular there.
    const values = [
      [0, 1, 0, 0],
      [1, 0, 0, 1],
      [0, 0, -1, 0],
      [0, 1, 0, 0],
    ];
    const certificates = certify(butterworthLine(2).polynomials, { order: 2, values });
    const about = (id: string): Certificate[] => certificates.filter((c) => c.check.startsWith(id));
    for (const c of [...about('C1'), ...about('C6'), ...about('C9')]) expect(c.holds).toBe(false);
    for (const c of certificates) expect(Number.isNaN(c.value)).toBe(false);
  });

  test('poles on the axis, epsilon 0, an overflowing product, a leftover that is NaN', () => {
    const { polynomials, matrix } = chebyshevLine(3, 20);
    const failing = (change: Partial<FilterPolynomials>): string[] =>
      red(certify({ ...polynomials, ...change }, matrix)).map((c) => c.check.slice(0, 2));
    expect(failing({ poles: polynomials.poles.map((p) => ({ re: 0, im: p.im })) })).toEqual(
      expect.arrayContaining(['C2', 'C3', 'C4', 'C6', 'C7']),
    );
    expect(failing({ epsilon: 0 })).toEqual(expect.arrayContaining(['C2', 'C3', 'C6']));
    expect(failing({ epsilonR: 0 })).toEqual(expect.arrayContaining(['C2', 'C3', 'C4', 'C6']));
    expect(failing({ reflectionZeros: polynomials.reflectionZeros.map(() => ({ re: 1e200, im: 0 })) })).toEqual(
      expect.arrayContaining(['C2', 'C3', 'C4', 'C6', 'C7']),
    );
    expect(red(certify(polynomials, matrix, { leftover: Number.NaN })).map((c) => c.value)).toEqual([Infinity]);
  });

  test('empty lists of roots are judged, not refused', () => {
    const { polynomials, matrix } = chebyshevLine(3, 20);
    const ids = new Set(
      red(certify({ ...polynomials, poles: [], reflectionZeros: [] }, matrix)).map((c) => c.check.slice(0, 2)),
    );
    for (const id of ['C2', 'C3', 'C4', 'C6', 'C7']) expect(ids).toContain(id);
  });
});

describe('certify(polynomials, matrix) is quick', () => {
  test('order 40 within 150 ms and order 100 within 2 s, the faster of three runs', () => {
    const time = (order: number): number => {
      const { polynomials, matrix } = equiripple(order, 20, onAxis(1.05, -1.05, 1.1, 1.2));
      const runs = [1, 2, 3].map(() => {
        const start = performance.now();
        certify(polynomials, matrix, { before: matrix, structure: 'transversal' });
        return performance.now() - start;
      });
      return Math.min(...runs);
    };
    expect(time(40)).toBeLessThan(150);
    expect(time(100)).toBeLessThan(2000);
  });
});
