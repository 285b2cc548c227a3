import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { butterworth, chebyshev, generalizedChebyshev } from '../../src/approximation/index.js';
import { denormalize } from '../../src/bandpass/index.js';
import { certify } from '../../src/certification/index.js';
import type { Complex, CouplingMatrix, FilterPolynomials, FineRoot } from '../../src/forms/index.js';
import { EPS, type FilterFailure } from '../../src/numerics/index.js';
import { scatteringAt } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { type Resonator, resonatorsOf } from '../../src/synthesis/resonators.js';
import { losslessResponse, randomLossless } from '../support/lossless-response.js';
import { entry, matrixOf, responseGap, sharpness } from '../support/models.js';

const RUNS = { seed: 61, numRuns: 150 };

/** A random response with S11 different from S22; the few whose factorization does not settle are passed over. */
function forRandom(most: number, law: (polynomials: FilterPolynomials) => void): void {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 2 ** 31 }), (seed) => {
      const polynomials = losslessResponse(randomLossless(seed, most));
      fc.pre(polynomials !== undefined);
      law(polynomials as FilterPolynomials);
    }),
    RUNS,
  );
}

const mapRoots = (polynomials: FilterPolynomials, change: (root: Complex) => Complex): FilterPolynomials => ({
  ...polynomials,
  poles: polynomials.poles.map(change),
  reflectionZeros: polynomials.reflectionZeros.map(change),
  transmissionZeros: polynomials.transmissionZeros.map(change),
});

const couplings = (polynomials: FilterPolynomials): { diagonal: number; source: number; load: number }[] => {
  const matrix = transversal(polynomials);
  return Array.from({ length: matrix.order }, (_, k) => ({
    diagonal: entry(matrix, k + 1, k + 1),
    source: entry(matrix, 0, k + 1),
    load: entry(matrix, k + 1, matrix.order + 1),
  }));
};

describe('transversal of any lossless reciprocal response', () => {
  it('has the complex S of the polynomials, exact zeros among resonators, falling M_kk and M_kL >= 0', () => {
    forRandom(14, (polynomials) => {
      const matrix = transversal(polynomials);
      const { order } = polynomials;
      expect(responseGap(matrix, polynomials)).toBeLessThan(60 * order * EPS * sharpness(polynomials));
      for (let i = 1; i <= order; i++) {
        for (let j = 1; j < i; j++) expect(entry(matrix, i, j)).toBe(0);
        if (i > 1) expect(entry(matrix, i, i)).toBeLessThanOrEqual(entry(matrix, i - 1, i - 1));
        expect(entry(matrix, i, order + 1)).toBeGreaterThanOrEqual(0);
      }
      expect(certify(polynomials, matrix, { structure: 'transversal' }).filter(({ holds }) => !holds)).toEqual([]);
    });
  });

  it('obeys the three trace identities', () => {
    forRandom(14, (polynomials) => {
      const matrix = transversal(polynomials);
      const b = entry(matrix, 0, matrix.order + 1);
      const sum = (value: (each: { diagonal: number; source: number; load: number }) => number): number =>
        couplings(polynomials).reduce((total, each) => total + value(each), 0);
      const total = (roots: readonly FineRoot[], part: 're' | 'im'): number =>
        roots.reduce((all, root) => all + root[part], 0);
      const scale = -total(polynomials.poles, 're');
      const room = 200 * matrix.order * EPS * Math.max(1, scale);
      expect(Math.abs(sum(({ source, load }) => source ** 2 + load ** 2) - (1 + b * b) * scale)).toBeLessThan(room);
      const difference = (1 - b * b) * total(polynomials.reflectionZeros, 're');
      expect(Math.abs(sum(({ source, load }) => source ** 2 - load ** 2) - difference)).toBeLessThan(room);
      const crossed = (2 * b * sum(({ source, load }) => source * load)) / (1 + b * b);
      const trace = crossed - total(polynomials.poles, 'im');
      expect(Math.abs(sum(({ diagonal }) => diagonal) - trace)).toBeLessThan(room);
    });
  });

  it('with the reflection zeros mirrored in the axis has source and load exchanged', () => {
    forRandom(10, (polynomials) => {
      const mirrored = {
        ...polynomials,
        reflectionZeros: polynomials.reflectionZeros.map(({ re, im }) => ({ re: -re, im })),
      };
      const room = 200 * polynomials.order * EPS * sharpness(polynomials);
      const [one, two] = [couplings(polynomials), couplings(mirrored)];
      one.forEach((each, k) => {
        expect(Math.abs(each.diagonal - (two[k]?.diagonal as number))).toBeLessThan(room);
        expect(Math.abs(Math.abs(each.source) - Math.abs(two[k]?.load as number))).toBeLessThan(room);
        expect(Math.abs(Math.abs(each.load) - Math.abs(two[k]?.source as number))).toBeLessThan(room);
      });
    });
  });

  it('with every root conjugated has the diagonal negated and the same couplings', () => {
    forRandom(10, (polynomials) => {
      const room = 200 * polynomials.order * EPS * sharpness(polynomials);
      const two = couplings(mapRoots(polynomials, ({ re, im }) => ({ re, im: -im }))).reverse();
      couplings(polynomials).forEach((each, k) => {
        expect(Math.abs(each.diagonal + (two[k]?.diagonal as number))).toBeLessThan(room);
        expect(Math.abs(Math.abs(each.source) - Math.abs(two[k]?.source as number))).toBeLessThan(room);
        expect(Math.abs(each.load - (two[k]?.load as number))).toBeLessThan(room);
      });
    });
  });

  it('scales to the bit with frequency by a power of 4', () => {
    forRandom(10, (polynomials) => {
      const degree = polynomials.transmissionZeros.length - polynomials.order;
      const scaled = {
        ...mapRoots(polynomials, ({ re, im }) => ({ re: 4 ** 9 * re, im: 4 ** 9 * im })),
        epsilon: polynomials.epsilon * 4 ** (9 * degree),
      };
      expect(couplings(scaled)).toEqual(
        couplings(polynomials).map(({ diagonal, source, load }) => ({
          diagonal: 4 ** 9 * diagonal,
          source: 2 ** 9 * source,
          load: 2 ** 9 * load,
        })),
      );
    });
  });

  it('does not depend on the order of the roots, and changes the sign of the source row with that of P', () => {
    forRandom(10, (polynomials) => {
      const { poles, reflectionZeros, transmissionZeros, transmissionLead } = polynomials;
      const shuffled = {
        ...polynomials,
        poles: [...poles].reverse(),
        reflectionZeros: [...reflectionZeros].reverse(),
        transmissionZeros: [...transmissionZeros].reverse(),
      };
      const [one, two] = [transversal(polynomials), transversal(shuffled)];
      expect(responseGap(one, two)).toBeLessThan(20 * polynomials.order * EPS * sharpness(polynomials));
      const { re, im } = transmissionLead;
      const negated = transversal({ ...polynomials, transmissionLead: { re: -re, im: -im } });
      negated.values[0]?.forEach((value, k) => {
        expect(value + (one.values[0]?.[k] as number)).toBe(0);
      });
    });
  });

  it('agrees with the modes of a response with S11 = S22 when its reflection zeros are moved off the axis by nothing that shows', () => {
    for (const transmissionZeros of [[], [1.3], [1.4, -1.2], [1.3, 2, -1.7, -3, 1.1, 5, -1.4]]) {
      const polynomials = generalizedChebyshev({ order: 7, returnLossDb: 20, transmissionZeros });
      const moved = {
        ...polynomials,
        reflectionZeros: polynomials.reflectionZeros.map((zero) => ({ ...zero, re: 1e-40 })),
      };
      const [one, two] = [couplings(polynomials), couplings(moved)];
      one.forEach((each, k) => {
        for (const key of ['diagonal', 'source', 'load'] as const)
          expect(Math.abs(each[key] - (two[k]?.[key] as number))).toBeLessThan(4 * EPS);
      });
    }
  });

  it.each([
    [64, 40, [1.1, 1.3, -1.1, -1.3]],
    [100, 20, []],
    [100, 26, [1.05, -1.2]],
  ] as const)('reaches order %i at %i dB by eigenphases too', (order, returnLossDb, transmissionZeros) => {
    const polynomials = generalizedChebyshev({ order, returnLossDb, transmissionZeros });
    const reflectionZeros = polynomials.reflectionZeros.map((zero) => ({ ...zero, re: 1e-40 }));
    const matrix = transversal({ ...polynomials, reflectionZeros });
    expect(responseGap(matrix, polynomials)).toBeLessThan(4 * order * EPS * sharpness(polynomials));
  });

  it('goes on to hardware: external Q differs at the two ports', () => {
    const polynomials = losslessResponse({
      reflectionZeros: [-0.9, 0, 0.9].map((im) => ({ re: -0.4, im })),
      transmissionZeros: [],
      level: 0.1,
    }) as FilterPolynomials;
    const { externalQ, portCouplings } = denormalize(transversal(polynomials), { centerHz: 2e9, bandwidthHz: 2e7 });
    expect([externalQ.source, externalQ.load]).toEqual([null, null]);
    expect(portCouplings).toHaveLength(6);
    expect(portCouplings.every(({ bandwidthHz }) => Number.isFinite(bandwidthHz))).toBe(true);
  });
});

describe('transversal of closed forms', () => {
  it('order 1: |S11| = x at the center has M_S1^2 + M_1L^2 = -Re p and M_S1^2 - M_1L^2 = Re f', () => {
    // S11 = (s - f)/(s - p), S21 = lead/(epsilon (s - p)): |s-p|^2 = |s-f|^2 + 1/epsilon^2, so p = -sqrt(f^2 + 1/epsilon^2).
    for (const f of [-0.6, 0.6]) {
      const [each] = couplings({
        family: 'lossless',
        order: 1,
        poles: [{ re: -1, im: 0 }],
        reflectionZeros: [{ re: f, im: 0 }],
        transmissionZeros: [],
        transmissionLead: { re: -1, im: 0 },
        epsilon: 1 / 0.8,
        epsilonR: 1,
      });
      expect(each?.diagonal).toBeCloseTo(0, 15);
      expect(Math.abs(each?.source as number)).toBeCloseTo(Math.sqrt((1 + f) / 2), 15);
      expect(each?.load).toBeCloseTo(Math.sqrt((1 - f) / 2), 15);
    }
  });
});

describe('resonators of a response with fewer reflection zeros than its order: S11 vanishes far out and M_SL is +-1', () => {
  const matrixFor = (polynomials: FilterPolynomials): CouplingMatrix => {
    const { order, transmissionLead } = polynomials;
    const entries = resonatorsOf(polynomials).flatMap(({ diagonal, source, load }, n) => [
      [n + 1, n + 1, diagonal] as const,
      [0, n + 1, source] as const,
      [n + 1, order + 1, load] as const,
    ]);
    return { ...matrixOf(order, [...entries, [0, order + 1, -transmissionLead.im]]), finiteZeros: order };
  };

  it('band-stop of a Butterworth response: S11 = 1/E, S21 = j*s^N/E, certified by code of its own', () => {
    for (const order of [1, 2, 3, 6, 9]) {
      const { poles } = butterworth({ order });
      const zeros = poles.map(() => ({ re: 0, im: 0 }));
      const polynomials: FilterPolynomials = {
        family: 'lossless',
        order,
        poles,
        reflectionZeros: [],
        transmissionZeros: zeros,
        transmissionLead: { re: 0, im: 1 },
        epsilon: 1,
        epsilonR: 1,
      };
      const matrix = matrixFor(polynomials);
      const { s11, s21 } = scatteringAt(matrix, 1);
      expect(Math.abs(Math.hypot(s11.re, s11.im) - Math.SQRT1_2)).toBeLessThan(4 * EPS);
      expect(Math.abs(Math.hypot(s21.re, s21.im) - Math.SQRT1_2)).toBeLessThan(4 * EPS);
      expect(
        certify(polynomials, matrix).filter(({ holds }) => !holds),
        `order ${order}`,
      ).toEqual([]);
    }
  });

  it('random ones with reflection zeros off the axis', () => {
    let tried = 0;
    for (let seed = 0; seed < 60; seed++) {
      const { reflectionZeros, transmissionZeros } = randomLossless(seed, 9);
      const order = transmissionZeros.length;
      if (order < 2) continue;
      const polynomials = losslessResponse({
        reflectionZeros: reflectionZeros.slice(0, order - 1 - (seed % 2)),
        transmissionZeros,
        level: 0.3,
      });
      if (polynomials === undefined) continue;
      const failed = certify(polynomials, matrixFor(polynomials)).filter(({ holds }) => !holds);
      expect(failed, `seed ${seed}`).toEqual([]);
      tried++;
    }
    expect(tried).toBeGreaterThan(25);
  });
});

describe('1500 random responses of orders to 40', () => {
  it('are right to the resolution of doubles on their resonances, or refused because doubles cannot tell their poles', () => {
    const worst = { error: 0, ratio: 0 };
    const refusals: string[] = [];
    const wrong: string[] = [];
    for (let seed = 0; seed < 1500; seed++) {
      const polynomials = losslessResponse(randomLossless(seed, 40));
      if (polynomials === undefined) continue;
      const { poles, order } = polynomials;
      const resolution = Math.max(...poles.map(({ re, im }) => (EPS * Math.hypot(re, im)) / -re));
      const grid = poles.filter((_, n) => n % Math.ceil(order / 4) === 0).flatMap(({ re, im }) => [im, im + 0.7 * re]);
      try {
        const error = responseGap(transversal(polynomials), polynomials, grid);
        const ratio = error / Math.max(resolution, order * 4 * EPS);
        if (!(ratio < 3)) wrong.push(`seed ${seed}, order ${order}: ${error}`);
        worst.error = Math.max(worst.error, error);
        worst.ratio = Math.max(worst.ratio, ratio);
      } catch (error) {
        refusals.push((error as FilterFailure).code);
        // An ulp of a pole moves S by 1e-9 or more in every one that is refused.
        if (!(resolution > 1e-9)) wrong.push(`seed ${seed}, order ${order}: ${String(error)}`);
      }
    }
    console.log(
      `1500 random responses: worst error ${worst.error.toExponential(1)}, ${worst.ratio.toFixed(2)} times what an ulp of a pole does; ${refusals.length} refused`,
    );
    expect(wrong).toEqual([]);
    expect(new Set(refusals)).toEqual(new Set(['E_ILL_CONDITIONED']));
    expect(refusals.length).toBeLessThan(15);
  });
});

describe('transversal of an exactly double eigenvalue', () => {
  it.each([0, 0.5, -0.75, 3])('S = V diag((s-1)/(s+1), (s-3)/(s+3)) V^T about omega = %d', (center) => {
    // V turns by g with cos 2g = -1/4: F = s^2 + 2*cos(2g)*s - 3 = (s + 3/2)(s - 2), P = 2*sin(2g)*s, E = (s + 1)(s + 3).
    const twiceSine = 2 * Math.sqrt(1 - 1 / 16);
    const polynomials: FilterPolynomials = {
      family: 'lossless',
      order: 2,
      poles: [-1, -3].map((re) => ({ re, im: center })),
      reflectionZeros: [-1.5, 2].map((re) => ({ re, im: center })),
      transmissionZeros: [{ re: 0, im: center }],
      transmissionLead: { re: 1, im: 0 },
      epsilon: 1 / twiceSine,
      epsilonR: 1,
    };
    const [one, two] = couplings(polynomials) as [Resonator, Resonator];
    expect([one.diagonal + center, two.diagonal + center].map(Math.abs)).toEqual([0, 0]);
    // (S - I)/(S + I) has the residue Q = V diag(1, 3) V^T there: m_1 m_1^T + m_2 m_2^T.
    expect(one.source ** 2 + two.source ** 2).toBeCloseTo((1 + 3) / 2 + 0.25, 14);
    expect(one.load ** 2 + two.load ** 2).toBeCloseTo((1 + 3) / 2 - 0.25, 14);
    expect(Math.abs(one.source * one.load + two.source * two.load)).toBeCloseTo(twiceSine / 2, 14);
    expect(one.source * two.source + one.load * two.load).toBeCloseTo(0, 14);
    expect(responseGap(transversal(polynomials), polynomials)).toBeLessThan(16 * EPS);
  });
});

describe('transversal of a double pole', () => {
  it('E = (s + 1)^2, P = 0.6, F = (s + sqrt(1.6))(s +- sqrt(0.4)): |F|^2 = (omega^2 + 1)^2 - 0.36', () => {
    for (const sign of [1, -1]) {
      const polynomials: FilterPolynomials = {
        family: 'lossless',
        order: 2,
        poles: [
          { re: -1, im: 0 },
          { re: -1, im: 0 },
        ],
        reflectionZeros: [
          { re: -Math.sqrt(1.6), im: 0 },
          { re: sign * Math.sqrt(0.4), im: 0 },
        ],
        transmissionZeros: [],
        transmissionLead: { re: 0, im: 1 },
        epsilon: 1 / 0.6,
        epsilonR: 1,
      };
      expect(responseGap(transversal(polynomials), polynomials)).toBeLessThan(8 * EPS);
    }
  });
});

describe('transversal refuses', () => {
  const good = losslessResponse(randomLossless(5, 6)) as FilterPolynomials;
  const code = (name: string): unknown => expect.objectContaining({ name: 'FilterFailure', code: name });
  const refused = (changed: Partial<FilterPolynomials>, name: string): void =>
    expect(() => transversal({ ...good, ...changed })).toThrowError(code(name));

  it('nothing of a lossless response', () => {
    expect(good.order).toBeGreaterThan(2);
    expect(() => transversal(good)).not.toThrow();
  });

  it('poles that are not left of the axis', () => {
    const [first, ...others] = good.poles as readonly [Complex, ...Complex[]];
    refused({ poles: [{ re: -first.re, im: first.im }, ...others] }, 'E_NOT_HURWITZ');
    refused({ poles: [{ re: 0, im: first.im }, ...others] }, 'E_NOT_HURWITZ');
  });

  it('transmission zeros without mirror image and a P of another phase', () => {
    const pair = [
      { re: 1, im: 0.5 },
      { re: -1, im: 0.5 },
    ];
    const lonely = { ...good, transmissionZeros: [{ re: 1, im: 0.5 }] };
    expect(() => transversal(lonely)).toThrowError(code('E_NOT_RECIPROCAL'));
    const apart = { ...good, transmissionZeros: [pair[0] as Complex, { re: -1, im: 0.5 + 1e-9 }] };
    expect(() => transversal(apart)).toThrowError(code('E_NOT_RECIPROCAL'));
    const { re, im } = good.transmissionLead;
    refused({ transmissionLead: { re: -im, im: re } }, 'E_NOT_RECIPROCAL');
    refused({ transmissionLead: { re: 2 * re, im: 2 * im } }, 'E_NOT_RECIPROCAL');
  });

  it('power that does not balance, at the poles and at infinity, also with S11 = S22', () => {
    refused({ epsilon: good.epsilon * 1.0001 }, 'E_NOT_LOSSLESS');
    refused({ epsilonR: 1.1 * good.epsilonR }, 'E_NOT_LOSSLESS');
    refused({ reflectionZeros: good.reflectionZeros.map(({ re, im }) => ({ re: re + 1e-3, im })) }, 'E_NOT_LOSSLESS');
    const symmetric = chebyshev({ order: 4, returnLossDb: 20 });
    for (const epsilon of [symmetric.epsilon * 2, symmetric.epsilon * (1 + 1e-6)])
      expect(() => transversal({ ...symmetric, epsilon })).toThrowError(code('E_NOT_LOSSLESS'));
  });

  it('a pole that doubles cannot place, saying by how much', () => {
    const narrow = 1e-11;
    // |s-p|^2 = |s-f|^2 + 1/epsilon^2 with p = -narrow + j, f = -0.6 narrow + j.
    const polynomials: FilterPolynomials = {
      family: 'lossless',
      order: 1,
      poles: [{ re: -narrow, im: 1 }],
      reflectionZeros: [{ re: -0.6 * narrow, im: 1 }],
      transmissionZeros: [],
      transmissionLead: { re: 1, im: 0 },
      epsilon: 1 / (0.8 * narrow),
      epsilonR: 1,
    };
    expect(() => transversal(polynomials)).toThrowError(/E_ILL_CONDITIONED.*rounding that moves S by 0\.0000222/);
  });
});
