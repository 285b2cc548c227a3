import { describe, expect, test } from 'vitest';
import { certify } from '../../src/certification/index.js';
import type { Complex, CouplingMatrix, FilterPolynomials } from '../../src/forms/index.js';
import {
  butterworthLine,
  chebyshevLine,
  equiripple,
  equirippleRoots,
  foldedOf,
  type Network,
  onAxis,
  seeded,
  withEntry,
} from './networks.js';

type Context = NonNullable<Parameters<typeof certify>[2]>;

/** The ids (C1, C2, ...) of the certificates that fail. */
function redIds({ polynomials, matrix }: Network, context: Context = {}): string[] {
  const ids = certify(polynomials, matrix, context).flatMap((c) => (c.holds ? [] : [c.check.slice(0, 2)]));
  return [...new Set(ids)];
}

const base = equiripple(6, 22, onAxis(1.3, -1.4));
const network = { polynomials: base.polynomials, matrix: foldedOf(base.matrix) };
const { polynomials, matrix } = network;
const changed = (change: Partial<FilterPolynomials>): Network => ({
  matrix,
  polynomials: { ...polynomials, ...change },
});
const moved = (roots: readonly Complex[], k: number, by: Complex): Complex[] =>
  roots.map((r, i) => (i === k ? { re: r.re + by.re, im: r.im + by.im } : r));

describe('each certificate goes red for a fault planted for it', () => {
  test('the network without a fault holds', () => {
    expect(
      redIds(network, { structure: 'folded', before: base.matrix, leftover: 0, askedZeros: onAxis(-1.4, 1.3) }),
    ).toEqual([]);
  });

  test('C1: a matrix without a response, singular at the band edge', () => {
    // Any real symmetric matrix is lossless, and elimination keeps that to the last digit; only its breakdown shows here.
    const lone = withEntry(withEntry(withEntry(butterworthLine(2).matrix, 1, 2, 0), 2, 3, 0), 2, 2, -1);
    expect(redIds({ ...butterworthLine(2), matrix: lone })).toEqual(expect.arrayContaining(['C1', 'C6', 'C9']));
  });

  test('C2: epsilon off by 1e-9', () => {
    expect(redIds(changed({ epsilon: polynomials.epsilon * (1 + 1e-9) }))).toEqual(
      expect.arrayContaining(['C2', 'C6']),
    );
    expect(redIds(changed({ epsilonR: 1 + 2e-9 }))).toEqual(expect.arrayContaining(['C2', 'C4', 'C6']));
  });

  test('C2, C6, C7: any root moved by 1e-7, in any direction', () => {
    for (const list of ['poles', 'reflectionZeros', 'transmissionZeros'] as const) {
      for (let k = 0; k < polynomials[list].length; k++) {
        for (const by of [
          { re: 1e-7, im: 0 },
          { re: 0, im: -1e-7 },
        ]) {
          const ids = redIds(changed({ [list]: moved(polynomials[list], k, by) }));
          expect(ids, `${list} ${k}`).toContain('C6');
          if (list !== 'transmissionZeros') expect(ids, `${list} ${k}`).toContain('C7');
          // A zero leaves the axis in second order only, as far as the energy balance sees.
          if (by.re === 0 || list === 'poles') expect(ids, `${list} ${k}`).toContain('C2');
        }
      }
    }
  });

  test('C3: a pole in the right half plane, although its energy balance is perfect', () => {
    const { poles } = polynomials;
    const mirrored = poles.map((p, k) => (k === 2 ? { re: -p.re, im: p.im } : p));
    expect(redIds(changed({ poles: mirrored }))).toEqual(['C3', 'C6', 'C7']);
  });

  test('C3: a pole listed twice in the place of another, a pole missing, a pole too many', () => {
    const { poles } = polynomials;
    expect(redIds(changed({ poles: poles.map((p, k) => (k === 3 ? (poles[2] ?? p) : p)) }))).toContain('C3');
    expect(redIds(changed({ poles: poles.slice(1) }))).toContain('C3');
    expect(redIds(changed({ poles: [...poles, { re: -1, im: 0 }] }))).toContain('C3');
  });

  test('C3: poles that lie far from the roots of the true E', () => {
    expect(redIds(changed({ poles: moved(polynomials.poles, 5, { re: -0.3, im: 0.5 }) }))).toContain('C3');
  });

  test('C4: a wrong return-loss level', () => {
    expect(redIds(changed({ returnLossDb: 22 + 1e-7 }))).toEqual(['C4']);
    expect(redIds(changed({ returnLossDb: 22 - 1e-7 }))).toEqual(['C4']);
  });

  test('C4: a response that is lossless, stable and consistent, but not equiripple', () => {
    const { polynomials: flat, matrix: line } = butterworthLine(4);
    expect(
      redIds({ polynomials: { ...flat, family: 'generalizedChebyshev', returnLossDb: 20 }, matrix: line }),
    ).toEqual(['C4']);
  });

  test('C4: reflection zeros off the axis, outside the band, or double', () => {
    const { reflectionZeros } = polynomials;
    const count = (zeros: readonly Complex[]): number | undefined =>
      certify({ ...polynomials, reflectionZeros: zeros }, matrix).find(
        (c) => c.check === 'C4 reflection zeros in the band',
      )?.value;
    expect(count(reflectionZeros)).toBe(6);
    expect(count(moved(reflectionZeros, 1, { re: 1e-12, im: 0 }))).toBe(0);
    expect(count(moved(reflectionZeros, 0, { re: 0, im: 0.2 }))).toBe(5);
    expect(count(reflectionZeros.map((f, k) => (k === 1 ? (reflectionZeros[0] ?? f) : f)))).toBe(4);
  });

  test('C5: zeros dropped, foreign, unpaired, of the wrong multiplicity, or not those asked for', () => {
    const faults = (zeros: readonly Complex[], asked?: readonly Complex[], order = 6): number | undefined =>
      certify(
        { ...equirippleRoots(order, 22, []), transmissionZeros: zeros },
        chebyshevLine(order, 22).matrix,
        asked === undefined ? {} : { askedZeros: asked },
      ).find((c) => c.check.startsWith('C5 transmission zeros missing'))?.value;
    const pair = [
      { re: 0.5, im: 1 },
      { re: -0.5, im: 1 },
    ];
    // The matrix notes 0 finite zeros: as many faults more as there are zeros.
    expect(faults([])).toBe(0);
    expect(faults(pair)).toBe(2);
    expect(faults(pair.slice(1))).toBe(2);
    expect(faults([...pair, ...pair.slice(1)])).toBe(3 + 3);
    expect(faults(onAxis(2, 3, 4), undefined, 2)).toBe(3 + 1);
    expect(faults([], onAxis(1.5))).toBe(1);
    expect(faults(onAxis(1.5), [])).toBe(1 + 1);
    expect(faults(onAxis(1.5, 1.5), onAxis(1.5))).toBe(2 + 1);
    expect(faults(onAxis(1.5, 2), onAxis(2, 1.5))).toBe(2);
    expect(faults(onAxis(1.5), onAxis(1.5 * (1 + 2 * Number.EPSILON)))).toBe(1);
    expect(faults(onAxis(1.5), onAxis(1.5 * (1 + 8 * Number.EPSILON)))).toBe(1 + 2);
  });

  test('C5: a dropped zero, and a matrix that does not transmit 0 where it should', () => {
    expect(redIds(changed({ transmissionZeros: onAxis(1.3) }), { askedZeros: onAxis(1.3, -1.4) })).toEqual(
      expect.arrayContaining(['C2', 'C5', 'C6']),
    );
    const [from, to] = [2, 5];
    const worse = withEntry(matrix, from, to, (matrix.values[from]?.[to] ?? 0) * (1 + 1e-5));
    expect(redIds({ polynomials, matrix: worse })).toEqual(['C5', 'C6', 'C7']);
  });

  test('C5: a pair off the axis is tried on the matrix at a complex frequency', () => {
    const pair = [
      { re: 0.9, im: 0.1 },
      { re: -0.9, im: 0.1 },
    ];
    const good = equiripple(6, 22, pair);
    const value = (found: FilterPolynomials): number =>
      certify(found, good.matrix).find((c) => c.check === 'C5 transmission of the matrix at its zeros')?.value ??
      Number.NaN;
    expect(value(good.polynomials)).toBeLessThan(1e-13);
    const off = pair.map((z) => ({ re: z.re * (1 + 1e-6), im: z.im }));
    expect(value({ ...good.polynomials, transmissionZeros: off })).toBeGreaterThan(1e-9);
  });

  test('C6: the sign of epsilon, of one port, of the whole phase', () => {
    expect(redIds(changed({ epsilon: -polynomials.epsilon }))).toEqual(['C6']);
    const flipped = withEntry(matrix, 0, 1, -(matrix.values[0]?.[1] ?? 0));
    expect(redIds({ polynomials, matrix: flipped })).toEqual(['C6']);
    const lead = polynomials.transmissionLead;
    expect(redIds(changed({ transmissionLead: { re: -lead.im, im: lead.re } }))).toContain('C6');
  });

  test('C6: ports exchanged where S11 and S22 differ', () => {
    // N = 1 with couplings a and b: pole -(a^2 + b^2), reflection zero a^2 - b^2.
    const [a, b] = [0.9, 0.6];
    const uneven = (source: number, load: number): CouplingMatrix => ({
      order: 1,
      values: [
        [0, source, 0],
        [source, 0.25, load],
        [0, load, 0],
      ],
    });
    const single: FilterPolynomials = {
      family: 'lossless',
      order: 1,
      poles: [{ re: -(a * a + b * b), im: -0.25 }],
      reflectionZeros: [{ re: a * a - b * b, im: -0.25 }],
      transmissionZeros: [],
      transmissionLead: { re: -1, im: 0 },
      epsilon: 1 / (2 * a * b),
      epsilonR: 1,
    };
    expect(redIds({ polynomials: single, matrix: uneven(a, b) })).toEqual([]);
    expect(redIds({ polynomials: single, matrix: uneven(b, a) })).toEqual(['C6', 'C7']);
  });

  test('C7: a rotation that changed the response, the port entries or the order of nothing', () => {
    const drift = (before: CouplingMatrix, after: CouplingMatrix): string[] =>
      certify(polynomials, after, { before })
        .filter((c) => c.check.startsWith('C7 drift') && !c.holds)
        .map((c) => c.check);
    expect(drift(base.matrix, matrix)).toEqual([]);
    expect(drift(base.matrix, withEntry(matrix, 2, 2, (matrix.values[2]?.[2] ?? 0) + 1e-9))).toEqual([
      'C7 drift of the eigenvalues',
      'C7 drift of the Markov numbers',
    ]);
    expect(drift(base.matrix, withEntry(matrix, 0, 1, (matrix.values[0]?.[1] ?? 0) * (1 + 1e-9)))).toEqual([
      'C7 drift of the Markov numbers',
    ]);
    expect(drift(base.matrix, withEntry(matrix, 0, 7, 1e-9))).toEqual(['C7 drift of the port entries']);
    expect(drift(base.matrix, withEntry(matrix, 7, 7, 1e-9))).toEqual(['C7 drift of the port entries']);
  });

  test('C8: an entry outside the structure that is not exactly 0, however small', () => {
    const context: Context = { structure: 'folded' };
    for (const [i, j] of [
      [0, 2],
      [2, 7],
      [1, 3],
      [0, 7],
      [1, 7],
      [0, 0],
      [7, 7],
    ] as const) {
      expect(redIds({ polynomials, matrix: withEntry(matrix, i, j, 1e-300) }, context), `${i},${j}`).toEqual(['C8']);
    }
    // i + j = 7 or 8 within two finite zeros of the line: a coupling there is no fault of structure.
    expect(matrix.values[2]?.[5]).not.toBe(0);
    expect(matrix.values[3]?.[5]).not.toBe(0);
    expect(redIds(network, { structure: 'arrow' })).toEqual(['C8']);
    expect(redIds(network, { structure: 'inline' })).toEqual(['C8']);
    expect(redIds(network, { structure: 'transversal' })).toEqual(['C8']);
    expect(redIds(network, { leftover: 2e-10 })).toEqual(['C8']);
    expect(redIds(network, { leftover: -2e-10 })).toEqual(['C8']);
    expect(redIds(network, { leftover: 1e-10 })).toEqual([]);
  });

  test('C4: a Butterworth response whose half-power edge is not at 1, and an equiripple one called so', () => {
    const right = butterworthLine(4);
    const wide = {
      ...right.polynomials,
      poles: right.polynomials.poles.map(({ re, im }) => ({ re: 1.3 * re, im: 1.3 * im })),
      epsilon: 1.3 ** -4,
    };
    const red = certify(wide, right.matrix).filter(({ holds }) => !holds);
    expect(red.map(({ check }) => check)).toContain('C4 half power at the edges');
    const ripple = chebyshevLine(4, 20);
    expect(redIds({ ...ripple, polynomials: { ...ripple.polynomials, family: 'butterworth' } })).toEqual(['C4']);
    const { returnLossDb: _, ...silent } = ripple.polynomials;
    expect(redIds({ ...ripple, polynomials: silent })).toEqual(['C4']);
  });

  test('C9: a resonance so narrow that fewer than six digits are left', () => {
    const narrow = 1e-6;
    const line = (order: number): CouplingMatrix => {
      const scaled = butterworthLine(order).matrix;
      const port = Math.sqrt(narrow);
      return {
        ...scaled,
        values: scaled.values.map((row, i) =>
          row.map((x, j) => x * (i % (order + 1) === 0 || j % (order + 1) === 0 ? port : narrow)),
        ),
      };
    };
    const roots = (list: readonly Complex[]): Complex[] => list.map((r) => ({ re: r.re * narrow, im: r.im * narrow }));
    const shift = (m: CouplingMatrix): CouplingMatrix => ({
      ...m,
      values: m.values.map((row, i) => row.map((x, j) => (i === j && i > 0 && i < m.order + 1 ? x - 1e4 : x))),
    });
    const wide = butterworthLine(2);
    const atHome: FilterPolynomials = {
      ...wide.polynomials,
      family: 'lossless',
      poles: roots(wide.polynomials.poles),
      epsilon: narrow ** -2,
    };
    // At omega = 0 the narrow band is harmless; shifted to omega = 1e4 its couplings drown in the rounding of M_kk.
    expect(redIds({ polynomials: atHome, matrix: line(2) })).toEqual([]);
    const away = {
      ...atHome,
      poles: atHome.poles.map((p) => ({ re: p.re, im: p.im + 1e4 })),
      reflectionZeros: onAxis(1e4, 1e4),
    };
    expect(redIds({ polynomials: away, matrix: shift(line(2)) })).toContain('C9');
  });
});

describe('a fault planted in one entry of a matrix is seen', () => {
  const networks: readonly Network[] = [
    chebyshevLine(5, 20),
    chebyshevLine(40, 20),
    butterworthLine(12),
    network,
    ...[3, 4, 6, 8, 10, 12, 16, 24].map((order, k): Network => {
      const zeros = [onAxis(1.2), onAxis(1.3, -1.8), onAxis(1.05, 1.4, -3), onAxis(-1.01, 5)][k % 4] ?? [];
      const made = equiripple(order, 15 + 2 * k, zeros);
      return k % 2 === 0 ? made : { ...made, matrix: foldedOf(made.matrix) };
    }),
    equiripple(4, 22, onAxis(-3.7431, -1.8051, 1.5699, 6.191)),
  ];

  /** Entries that are more than rounding: 1e-10 of the largest. Diagonals of symmetric filters hold values of 1e-16 that mean 0. */
  function entriesOf({ matrix: m }: Network): [number, number][] {
    const found: [number, number][] = [];
    const largest = Math.max(...m.values.flat().map(Math.abs));
    m.values.forEach((row, i) => {
      row.forEach((x, j) => {
        if (j >= i && Math.abs(x) > 1e-10 * largest) found.push([i, j]);
      });
    });
    return found;
  }

  function caught(relative: number, trials: number, seed: number): number {
    const random = seeded(seed);
    let count = 0;
    for (let trial = 0; trial < trials; trial++) {
      const chosen = networks[Math.floor(random() * networks.length)] ?? network;
      const entries = entriesOf(chosen);
      const [i, j] = entries[Math.floor(random() * entries.length)] ?? [0, 1];
      const sign = random() < 0.5 ? -1 : 1;
      const value = (chosen.matrix.values[i]?.[j] ?? 0) * (1 + sign * relative);
      if (redIds({ ...chosen, matrix: withEntry(chosen.matrix, i, j, value) }).length > 0) count++;
    }
    return count;
  }

  test('relative 1e-6: 300 of 300; relative 1e-8: at least 297 of 300', () => {
    expect(caught(1e-6, 300, 1)).toBe(300);
    expect(caught(1e-8, 300, 2)).toBeGreaterThanOrEqual(297);
  }, 60_000);
});
