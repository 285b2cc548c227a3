import { describe, expect, test } from 'vitest';
import { butterworth, chebyshev, generalizedChebyshev } from '../../src/approximation/index.js';
import type { Complex, CouplingMatrix } from '../../src/forms/index.js';
import { EPS } from '../../src/numerics/index.js';
import { type Model, type Sweep, type SweepOptions, scatteringAt, sweep } from '../../src/response/index.js';
import { transversal } from '../../src/synthesis/index.js';
import { arrow, folded } from '../../src/topology/index.js';
import { distance, entry, GRID, matrixOf, randomMatrix, sharpness, size, withEntry } from '../support/models.js';
import { seeded } from '../support/random.js';
import { SPECS } from '../support/specs.js';

/** The S-parameters of point n of a sweep. */
const pointOf = (result: Sweep, n: number): Record<'s11' | 's21' | 's12' | 's22', Complex> => {
  const at = (samples: Sweep['s11']): Complex => ({ re: samples.re[n]!, im: samples.im[n]! });
  return { s11: at(result.s11), s21: at(result.s21), s12: at(result.s12), s22: at(result.s22) };
};

const gapOf = (a: ReturnType<typeof pointOf>, b: ReturnType<typeof pointOf>): number =>
  Math.max(distance(a.s11, b.s11), distance(a.s21, b.s21), distance(a.s12, b.s12), distance(a.s22, b.s22));

/**
 * The response with loss by a dense complex elimination of this file alone: columns of A^-1 and the derivative of S21.
 */
function denseResponse(
  matrix: CouplingMatrix,
  omega: number,
  loss: readonly number[],
): ReturnType<typeof pointOf> & { delay: number } {
  const n = matrix.order + 2;
  const a = matrix.values.map((row, i) =>
    row.map((value, j): Complex => {
      if (i !== j) return { re: value, im: 0 };
      return i === 0 || i === n - 1 ? { re: value, im: -1 } : { re: value + omega, im: -loss[i - 1]! };
    }),
  );
  const x = solve(a, 0);
  const y = solve(a, n - 1);
  const s = (value: Complex, own: number): Complex => ({ re: 2 * value.im - own, im: -2 * value.re });
  const s21 = s(x[n - 1]!, 0);
  let sum: Complex = { re: 0, im: 0 };
  for (let i = 1; i < n - 1; i++) sum = plus(sum, times(x[i]!, y[i]!));
  // dS21/domega = 2j*sum x_i y_i; delay = -Im(dS21/S21).
  const slope = times({ re: 0, im: 2 }, sum);
  const ratio = over(slope, s21);
  return { s11: s(x[0]!, 1), s21, s12: s(y[0]!, 0), s22: s(y[n - 1]!, 1), delay: -ratio.im };
}

const plus = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
const over = (a: Complex, b: Complex): Complex => {
  const square = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
};

function solve(matrix: readonly (readonly Complex[])[], column: number): Complex[] {
  const n = matrix.length;
  const a = matrix.map((row, i) => [...row, { re: i === column ? 1 : 0, im: 0 }]);
  for (let k = 0; k < n; k++) {
    let best = k;
    for (let i = k + 1; i < n; i++) if (size(a[i]![k]!) > size(a[best]![k]!)) best = i;
    [a[k], a[best]] = [a[best]!, a[k]!];
    for (let i = 0; i < n; i++) {
      if (i === k) continue;
      const factor = over(a[i]![k]!, a[k]![k]!);
      for (let j = k; j <= n; j++) {
        const part = times(factor, a[k]![j]!);
        a[i]![j] = { re: a[i]![j]!.re - part.re, im: a[i]![j]!.im - part.im };
      }
    }
  }
  return a.map((row, i) => over(row[n]!, row[i]!));
}

const common = (matrix: CouplingMatrix, loss: number): number[] => new Array<number>(matrix.order).fill(loss);

describe.each(SPECS)('sweep(%s)', (_, request) => {
  const polynomials = generalizedChebyshev(request);
  const start = transversal(polynomials);
  const room = 60 * request.order * EPS * sharpness(polynomials);
  const models: readonly (readonly [string, Model])[] = [
    ['polynomials', polynomials],
    ['transversal', start],
    ['folded', folded(start).matrix],
    ['arrow', arrow(start).matrix],
  ];

  test.each(models)('of %s equals scatteringAt point by point', (__, model) => {
    const result = sweep(model, GRID);
    GRID.forEach((omega, n) => {
      expect(gapOf(pointOf(result, n), scatteringAt(model, omega))).toBeLessThan(room);
    });
    expect(Array.from(result.omega)).toEqual(GRID);
  });

  test.each(models)('of %s has the lossless delay, the sum over the poles', (__, model) => {
    const { groupDelay } = sweep(model, GRID);
    GRID.forEach((omega, n) => {
      const delay = polynomials.poles.reduce((sum, p) => sum - p.re / (p.re * p.re + (omega - p.im) ** 2), 0);
      expect(groupDelay[n]! / delay).toBeCloseTo(1, 9);
    });
  });

  test.each(models.slice(1))('of %s with common loss equals a dense elimination', (__, model) => {
    for (const loss of [1e-3, 0.05, 1]) {
      const result = sweep(model, GRID, { loss });
      GRID.forEach((omega, n) => {
        const reference = denseResponse(model as CouplingMatrix, omega, common(model as CouplingMatrix, loss));
        expect(gapOf(pointOf(result, n), reference)).toBeLessThan(room);
        if (size(reference.s21) > 1e-5) expect(result.groupDelay[n]! / reference.delay).toBeCloseTo(1, 6);
      });
    }
  });

  test('of polynomials with common loss equals the sweep of the matrix', () => {
    const result = sweep(polynomials, GRID, { loss: 0.02 });
    const other = sweep(start, GRID, { loss: 0.02 });
    GRID.forEach((___, n) => {
      expect(gapOf(pointOf(result, n), pointOf(other, n))).toBeLessThan(room);
    });
  });

  test.each(models.slice(1))('of %s with a loss for each resonator equals a dense elimination', (__, model) => {
    const matrix = model as CouplingMatrix;
    const random = seeded(request.order);
    const loss = common(matrix, 0).map(() => 0.001 + 0.1 * random());
    for (const list of [
      loss,
      loss.map((value, n) => (n === 0 ? 0 : value)),
      loss.map((value, n) => (n % 2 === 0 ? 0 : value)),
    ]) {
      const result = sweep(matrix, GRID, { loss: list });
      GRID.forEach((omega, n) => {
        const reference = denseResponse(matrix, omega, list);
        expect(gapOf(pointOf(result, n), reference)).toBeLessThan(room);
        if (size(reference.s21) > 1e-5) expect(result.groupDelay[n]! / reference.delay).toBeCloseTo(1, 6);
      });
    }
  });

  test('with equal losses in a list equals the sweep with that loss, bit for bit', () => {
    const one = sweep(start, GRID, { loss: 0.03 });
    expect(sweep(start, GRID, { loss: common(start, 0.03) })).toEqual(one);
  });

  test('with loss 0 equals the sweep without loss, bit for bit', () => {
    expect(sweep(start, GRID, { loss: 0 })).toEqual(sweep(start, GRID));
  });
});

test.each(SPECS)(
  'sweep(detuned %s), S11 different from S22, equals scatteringAt and a dense elimination',
  (_, request) => {
    const { matrix } = folded(transversal(generalizedChebyshev(request)));
    const detuned = withEntry(matrix, 1, 1, entry(matrix, 1, 1) + 0.2);
    const plain = sweep(detuned, GRID);
    const lossy = sweep(detuned, GRID, { loss: 0.02 });
    GRID.forEach((omega, n) => {
      expect(gapOf(pointOf(plain, n), scatteringAt(detuned, omega))).toBeLessThan(1e-10);
      const reference = denseResponse(detuned, omega, common(detuned, 0.02));
      expect(gapOf(pointOf(lossy, n), reference)).toBeLessThan(1e-10);
      if (size(reference.s21) > 1e-5) expect(lossy.groupDelay[n]! / reference.delay).toBeCloseTo(1, 6);
    });
  },
);

test('sweep(full random matrix) equals a dense elimination, with and without loss', () => {
  const random = seeded(91);
  for (let order = 1; order <= 10; order++) {
    const matrix = randomMatrix(order, random);
    const list = common(matrix, 0).map(() => random());
    const options: readonly [SweepOptions, readonly number[]][] = [
      [{}, common(matrix, 0)],
      [{ loss: 0.1 }, common(matrix, 0.1)],
      [{ loss: list }, list],
    ];
    for (const [option, loss] of options) {
      const result = sweep(matrix, GRID, option);
      GRID.forEach((omega, n) => {
        const reference = denseResponse(matrix, omega, loss);
        expect(gapOf(pointOf(result, n), reference)).toBeLessThan(1e-10);
        if (size(reference.s21) > 1e-5)
          expect(Math.abs(result.groupDelay[n]! / reference.delay - 1)).toBeLessThan(1e-5);
      });
    }
  }
});

test('sweep(matrix with self-coupled ports and direct coupling) equals a dense elimination', () => {
  const matrix = matrixOf(2, [
    [0, 0, 0.2],
    [0, 3, 0.3],
    [3, 3, -0.4],
    [0, 1, 1],
    [1, 2, 0.8],
    [2, 3, 0.9],
    [1, 1, 0.1],
  ]);
  const result = sweep(matrix, GRID, { loss: 0.01 });
  GRID.forEach((omega, n) => {
    expect(gapOf(pointOf(result, n), denseResponse(matrix, omega, [0.01, 0.01]))).toBeLessThan(1e-13);
  });
});

test('sweep(matrix) at an eigenvalue of the resonator block, hit exactly without loss, equals scatteringAt', () => {
  for (const [, request] of SPECS) {
    const matrix = transversal(generalizedChebyshev(request));
    const hits = Array.from({ length: request.order }, (_, k) => -entry(matrix, k + 1, k + 1));
    for (const model of [matrix, withEntry(matrix, 0, 1, entry(matrix, 0, 1) * 1.1)]) {
      const grid = hits.flatMap((hit) => [hit, hit * (1 + EPS), hit * (1 - EPS), hit + 1e-9, hit + 1e-5]);
      const result = sweep(model, grid);
      grid.forEach((omega, n) => {
        expect(gapOf(pointOf(result, n), scatteringAt(model, omega))).toBeLessThan(1e-9);
        expect(result.groupDelay[n]).toBeGreaterThan(0);
        expect(Number.isFinite(result.groupDelay[n])).toBe(true);
      });
    }
  }
});

test('sweep at an exact hit with the smallest of losses stays finite and close to the lossless value', () => {
  const matrix = transversal(chebyshev({ order: 4, returnLossDb: 20 }));
  const omega = -entry(matrix, 2, 2);
  const reference = scatteringAt(matrix, omega);
  for (const loss of [1e-320, 1e-200, 1e-100, 1e-12]) {
    const point = pointOf(sweep(matrix, [omega], { loss }), 0);
    expect(gapOf(point, reference)).toBeLessThan(1e-9);
  }
});

test('sweep(Butterworth) has delay 1/sin(pi/2N) at the center', () => {
  for (const order of [1, 2, 3, 5, 8, 16]) {
    const { groupDelay } = sweep(butterworth({ order }), [0]);
    expect(groupDelay[0]! * Math.sin(Math.PI / (2 * order))).toBeCloseTo(1, 12);
    const matrix = folded(transversal(butterworth({ order }))).matrix;
    expect(sweep(matrix, [0]).groupDelay[0]! * Math.sin(Math.PI / (2 * order))).toBeCloseTo(1, 11);
  }
});

/** -d phase(S21)/d omega by a central difference of order 8, S21 unwrapped by division. */
function differenceDelay(model: Model, omega: number, loss: number, step: number): number {
  const weights = [4 / 5, -1 / 5, 4 / 105, -1 / 280];
  const center = pointOf(sweep(model, [omega], { loss }), 0).s21;
  return weights.reduce((sum, weight, n) => {
    const h = (n + 1) * step;
    const two = sweep(model, [omega - h, omega + h], { loss });
    const turned = (k: number): number => {
      const ratio = over(pointOf(two, k).s21, center);
      return Math.atan2(ratio.im, ratio.re);
    };
    return sum - (weight * (turned(1) - turned(0))) / step;
  }, 0);
}

test.each(SPECS.filter(([, { order }]) => order <= 9))(
  'sweep(%s) has the delay of an eighth-order difference quotient',
  (_, request) => {
    const polynomials = generalizedChebyshev(request);
    const start = transversal(polynomials);
    const step = 0.02 / sharpness(polynomials);
    for (const model of [polynomials, start, folded(start).matrix]) {
      for (const loss of [0, 0.03]) {
        for (const omega of [-0.9, -0.2, 0, 0.6, 1]) {
          const reference = differenceDelay(model, omega, loss, step);
          expect(sweep(model, [omega], { loss }).groupDelay[0]! / reference).toBeCloseTo(1, 7);
        }
      }
    }
  },
);

test('sweep has a finite, continuous delay at a transmission zero of a lossless model', () => {
  const polynomials = generalizedChebyshev({ order: 4, returnLossDb: 22, transmissionZeros: [1.3217, 1.8082] });
  const start = transversal(polynomials);
  for (const model of [polynomials, start, folded(start).matrix]) {
    const { groupDelay, s21 } = sweep(model, [1.3217 - 1e-6, 1.3217, 1.3217 + 1e-6]);
    expect(Math.hypot(s21.re[1]!, s21.im[1]!)).toBeLessThan(1e-14);
    expect(groupDelay[1]).toBeCloseTo((groupDelay[0]! + groupDelay[2]!) / 2, 7);
  }
});

test('sweep is pointwise: a part of a grid, in any order, gives the same bits', () => {
  const start = transversal(generalizedChebyshev({ order: 6, returnLossDb: 20, transmissionZeros: [1.4, -2] }));
  const detuned = withEntry(start, 1, 1, 1.4);
  for (const model of [start, detuned, generalizedChebyshev({ order: 3, returnLossDb: 20 })]) {
    for (const loss of [0, 0.1]) {
      const whole = sweep(model, GRID, { loss });
      const part = [...GRID.keys()].filter((n) => n % 2 === 0).reverse();
      const piece = sweep(
        model,
        part.map((n) => GRID[n]!),
        { loss },
      );
      part.forEach((n, k) => {
        expect(pointOf(piece, k)).toEqual(pointOf(whole, n));
        expect(piece.groupDelay[k]).toBe(whole.groupDelay[n]);
      });
    }
  }
});

test('sweep takes any array-like grid, empty too, and does not write it', () => {
  const model = butterworth({ order: 2 });
  expect(sweep(model, []).groupDelay).toHaveLength(0);
  const grid = Float64Array.of(0, 1);
  const result = sweep(model, grid);
  expect(result).toEqual(sweep(model, [0, 1]));
  result.omega[0] = 9;
  expect(grid[0]).toBe(0);
});

const matrix3 = transversal(chebyshev({ order: 3, returnLossDb: 20 }));
const refusals: readonly (readonly [string, unknown, unknown, unknown, string])[] = [
  ['a number for a grid', matrix3, 3, {}, 'E_TYPE'],
  ['no grid', matrix3, undefined, {}, 'E_TYPE'],
  ['null for a grid', matrix3, null, {}, 'E_TYPE'],
  ['text in the grid', matrix3, [0, '1'], {}, 'E_TYPE'],
  ['NaN in the grid', matrix3, [0, Number.NaN], {}, 'E_NOT_FINITE'],
  ['infinity in the grid', matrix3, [Number.POSITIVE_INFINITY], {}, 'E_NOT_FINITE'],
  ['a negative loss', matrix3, [0], { loss: -0.1 }, 'E_LOSS'],
  ['a NaN loss', matrix3, [0], { loss: Number.NaN }, 'E_NOT_FINITE'],
  ['loss as text', matrix3, [0], { loss: '1' }, 'E_LOSS'],
  ['too few losses', matrix3, [0], { loss: [0.1, 0.1] }, 'E_LOSS'],
  ['a negative loss in a list', matrix3, [0], { loss: [0.1, -0.1, 0.1] }, 'E_LOSS'],
  ['a loss list for polynomials', chebyshev({ order: 3, returnLossDb: 20 }), [0], { loss: [0.1, 0.2, 0.1] }, 'E_LOSS'],
  ['a matrix of the wrong shape', { order: 3, values: [[0]] }, [0], {}, 'E_MATRIX_SHAPE'],
  [
    'an asymmetric matrix',
    {
      order: 1,
      values: [
        [0, 1, 0],
        [2, 0, 1],
        [0, 1, 0],
      ],
    },
    [0],
    {},
    'E_NOT_SYMMETRIC',
  ],
];

test.each(refusals)('sweep refuses %s', (_, model, grid, options, code) => {
  expect(() => sweep(model as Model, grid as number[], options as SweepOptions)).toThrowError(
    expect.objectContaining({ name: 'FilterFailure', code }),
  );
});
