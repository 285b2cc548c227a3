import { describe, expect, it } from 'vitest';
import { placeZeros, type ZeroPlacement } from '../../src/proposal/index.js';
import { seeded } from '../support/random.js';
import { randomRequest } from './random-masks.js';
import { closedFormRejection, sampledMargin, synthesizedRejection } from './sampled-margin.js';

const width = ({ highestDb, lowestDb }: ZeroPlacement): number => highestDb - lowestDb;

describe('placeZeros', () => {
  it('encloses the best margin to 1e-9 dB on 1,000 random masks, without one failure', () => {
    const random = seeded(20261201);
    const widths = Array.from({ length: 1000 }, () => width(placeZeros(randomRequest(random))));
    expect(Math.max(...widths)).toBeLessThanOrEqual(1e-9);
  });

  it('states the margin that the synthesized response has', () => {
    const random = seeded(11);
    for (let n = 0; n < 60; n++) {
      const request = randomRequest(random);
      const { transmissionZeros, marginDb, active } = placeZeros(request);
      const sampled = sampledMargin(request, synthesizedRejection(request, transmissionZeros), 1000);
      expect(sampled - marginDb, JSON.stringify(request)).toBeGreaterThan(-1e-6);
      // Samples miss the lowest point of a lobe by the square of their distance.
      expect(sampled - marginDb, JSON.stringify(request)).toBeLessThan(0.5);
      expect(active.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 9);
    }
  });

  it('is not beaten by 2,000 random placements for each of 12 masks', () => {
    const random = seeded(5);
    for (let n = 0; n < 12; n++) {
      const request = { ...randomRequest(random), order: 6, zeroCount: 3 };
      const best = placeZeros(request).highestDb;
      for (let k = 0; k < 2000; k++) {
        const zeros = Array.from({ length: 3 }, () => (random() < 0.5 ? -1 : 1) / (0.05 + 0.93 * random()));
        // A coarse grid can only flatter a random placement.
        if (sampledMargin(request, closedFormRejection(request, zeros), 12) <= best) continue;
        expect(sampledMargin(request, closedFormRejection(request, zeros), 3000)).toBeLessThanOrEqual(best + 1e-6);
      }
    }
  });

  it('prices the mask: a lobe raised by a little costs its weight times that', () => {
    const rejection = [
      { toOmega: -1.6, rejectionDb: 20 },
      { fromOmega: 1.4, toOmega: 1.9, rejectionDb: 50 },
      { fromOmega: 2.2, toOmega: 3, rejectionDb: 60 },
    ];
    const request = { order: 6, zeroCount: 2, returnLossDb: 20, rejection };
    const before = placeZeros(request);
    rejection.forEach((piece, n) => {
      const weight = before.active.filter((each) => each.piece === n).reduce((sum, each) => sum + each.weight, 0);
      const raised = rejection.map((each, k) => (k === n ? { ...piece, rejectionDb: piece.rejectionDb + 1e-4 } : each));
      const cost = (before.marginDb - placeZeros({ ...request, rejection: raised }).marginDb) / 1e-4;
      expect(Math.abs(cost - weight)).toBeLessThan(1e-3);
    });
  });

  it('keeps zeros outside a distance and is not beaten there either', () => {
    const random = seeded(6);
    const rejection = [
      { fromOmega: 1.15, rejectionDb: 45 },
      { toOmega: -1.25, rejectionDb: 30 },
    ];
    const request = { order: 7, zeroCount: 3, returnLossDb: 20, rejection, closestZero: 1.35 };
    const bound = placeZeros(request);
    expect(Math.min(...bound.transmissionZeros.map(Math.abs))).toBeGreaterThanOrEqual(1.35 - 1e-12);
    expect(bound.pinned.length).toBeGreaterThan(0);
    expect(bound.marginDb).toBeLessThan(placeZeros({ ...request, closestZero: 1.001 }).marginDb);
    for (let k = 0; k < 20_000; k++) {
      const zeros = Array.from({ length: 3 }, () => ((random() < 0.5 ? -1 : 1) * 1.35) / (0.02 + 0.98 * random()));
      if (sampledMargin(request, closedFormRejection(request, zeros), 12) > bound.highestDb)
        expect(sampledMargin(request, closedFormRejection(request, zeros), 3000)).toBeLessThanOrEqual(
          bound.highestDb + 1e-6,
        );
    }
  });

  it('places 600 random problems with bounds, splits or pairs: none refused, none beyond its bounds, none above the free optimum', () => {
    const random = seeded(99);
    for (let n = 0; n < 600; n++) {
      const request = randomRequest(random);
      const even = 2 * Math.floor(request.zeroCount / 2);
      const change = [
        { closestZero: 1.05 + random() },
        { zerosAbove: Math.floor((request.zeroCount + 1) * random()) },
        { symmetric: true, zeroCount: even },
      ][n % 3]!;
      const [bound, free] = [placeZeros({ ...request, ...change }), placeZeros(request)];
      expect(width(bound)).toBeLessThanOrEqual(1e-9);
      expect(bound.lowestDb).toBeLessThanOrEqual(free.highestDb);
      const { closestZero = 1, zerosAbove = request.zeroCount } = change;
      for (const w of bound.transmissionZeros) expect(Math.abs(w)).toBeGreaterThanOrEqual(closestZero * (1 - 1e-12));
      expect(bound.transmissionZeros.filter((w) => w > 0).length).toBeLessThanOrEqual(zerosAbove);
    }
  });

  it('gives pairs when asked, at most the margin of free zeros, and the same where the mask is symmetric', () => {
    const rejection = [
      { fromOmega: 1.2, rejectionDb: 40 },
      { toOmega: -1.2, rejectionDb: 40 },
    ];
    const request = { order: 8, zeroCount: 4, returnLossDb: 22, rejection };
    const [free, pairs] = [placeZeros(request), placeZeros({ ...request, symmetric: true })];
    expect(Math.abs(free.marginDb - pairs.marginDb)).toBeLessThan(1e-9);
    const skewed = {
      ...request,
      rejection: [
        { fromOmega: 1.2, rejectionDb: 40 },
        { toOmega: -1.4, rejectionDb: 40 },
      ],
    };
    const [a, b] = [placeZeros(skewed), placeZeros({ ...skewed, symmetric: true })];
    expect(b.marginDb).toBeLessThan(a.marginDb);
    expect(b.transmissionZeros.map((w) => -w).reverse()).toEqual(b.transmissionZeros);
    expect(sampledMargin(skewed, synthesizedRejection(skewed, b.transmissionZeros), 4000) - b.marginDb).toBeGreaterThan(
      -1e-6,
    );
  });

  it('sends to infinity what a forced split leaves no use for', () => {
    const rejection = [
      { fromOmega: 1.2, toOmega: 2, rejectionDb: 60 },
      { toOmega: -3, rejectionDb: 10 },
    ];
    const request = { order: 6, zeroCount: 3, returnLossDb: 20, rejection };
    expect(placeZeros(request).transmissionZeros.filter((w) => w > 0)).toHaveLength(3);
    const forced = placeZeros({ ...request, zerosAbove: 2 });
    expect(forced.transmissionZeros.filter((w) => w > 0)).toHaveLength(2);
    const fewer = placeZeros({ ...request, zeroCount: 2 });
    expect(forced.marginDb).toBeCloseTo(fewer.marginDb, 9);
    expect(forced.atInfinity).toBe(4);
  });

  it.each([
    ['an empty mask', { rejection: [] }, 'E_MASK'],
    ['a piece in the passband', { rejection: [{ fromOmega: 0.9, rejectionDb: 30 }] }, 'E_MASK'],
    ['a piece over the passband', { rejection: [{ fromOmega: -2, toOmega: 2, rejectionDb: 30 }] }, 'E_MASK'],
    ['a level of 0 dB', { rejection: [{ fromOmega: 2, rejectionDb: 0 }] }, 'E_MASK'],
    ['a slope to infinity', { rejection: [{ fromOmega: 2, rejectionDb: [20, 30] }] }, 'E_MASK'],
    [
      'as many points as zeros',
      { rejection: [1.5, 2].map((w) => ({ fromOmega: w, toOmega: w, rejectionDb: 30 })) },
      'E_MASK',
    ],
    ['an odd number in pairs', { zeroCount: 3, symmetric: true }, 'E_ZERO_COUNT'],
    ['more zeros than the order', { zeroCount: 7 }, 'E_ZERO_COUNT'],
    ['a bound inside the band', { closestZero: 0.5 }, 'E_ZERO_IN_PASSBAND'],
    ['an infinite end', { rejection: [{ fromOmega: Number.POSITIVE_INFINITY, rejectionDb: 3 }] }, 'E_NOT_FINITE'],
  ])('refuses %s', (_, change, code) => {
    const request = { order: 6, zeroCount: 2, returnLossDb: 20, rejection: [{ fromOmega: 1.5, rejectionDb: 40 }] };
    expect(() => placeZeros({ ...request, ...change } as never)).toThrow(expect.objectContaining({ code }));
  });

  it('takes points when they outnumber the zeros', () => {
    const rejection = [-2, -1.5, 1.5, 1.8].map((w) => ({ fromOmega: w, toOmega: w, rejectionDb: 30 }));
    const placed = placeZeros({ order: 6, zeroCount: 3, returnLossDb: 20, rejection });
    expect(width(placed)).toBeLessThan(1e-9);
    expect(placed.active.map(({ omega }) => Number(omega.toFixed(9))).sort((a, b) => a - b)).toEqual([
      -2, -1.5, 1.5, 1.8,
    ]);
  });
});
