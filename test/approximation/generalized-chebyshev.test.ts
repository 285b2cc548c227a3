import { describe, expect, test } from 'vitest';
import { chebyshev, type GeneralizedChebyshevRequest, generalizedChebyshev } from '../../src/approximation/index.js';
import { EPS } from '../../src/numerics/index.js';
import { scatteringAt } from '../../src/response/index.js';
import { distance, energyDefect, sharpness, size } from '../support/models.js';
import { LONG_SPECS, SPECS } from '../support/specs.js';

const ORDERS = [1, 2, 3, 4, 5, 8, 13, 20, 37, 64, 100];
const LEVELS = [0.01, 3, 10, 20, 40, 100];

describe.each(ORDERS)('chebyshev({ order: %d })', (order) => {
  test('has reflection zeros cos((2k-1) pi/2N), exactly symmetric', () => {
    const { reflectionZeros } = chebyshev({ order, returnLossDb: 20 });
    reflectionZeros.forEach(({ re, im }, n) => {
      expect(re).toBe(0);
      expect(Math.abs(im - Math.cos(((2 * n + 1) * Math.PI) / (2 * order)))).toBeLessThan(4 * EPS);
      expect(im + reflectionZeros[order - 1 - n]!.im).toBe(0);
    });
  });

  test.each(LEVELS)('has poles -sinh(eta) sin(t) + j cosh(eta) cos(t) at %d dB', (returnLossDb) => {
    const eta = Math.asinh(Math.sqrt(Math.expm1((returnLossDb * Math.LN10) / 10))) / order;
    const { poles } = chebyshev({ order, returnLossDb });
    poles.forEach((pole, n) => {
      const t = ((2 * n + 1) * Math.PI) / (2 * order);
      const reference = { re: -Math.sinh(eta) * Math.sin(t), im: Math.cosh(eta) * Math.cos(t) };
      // Relative in the real part, which decides bandwidth and loss.
      expect(Math.abs(pole.re / reference.re - 1)).toBeLessThan(40 * EPS);
      expect(Math.abs(pole.im - reference.im)).toBeLessThan(40 * EPS * Math.cosh(eta));
    });
  });

  test.each(LEVELS)('has epsilon = 2^(N-1)/sqrt(10^(RL/10) - 1) at %d dB', (returnLossDb) => {
    const { epsilon, epsilonR } = chebyshev({ order, returnLossDb });
    // F is T_N/2^(N-1), so |F(j)| = 2^(1-N).
    const closed = 2 ** (order - 1) / Math.sqrt(Math.expm1((returnLossDb * Math.LN10) / 10));
    expect(Math.abs(epsilon / closed - 1)).toBeLessThan(40 * order * EPS);
    expect(epsilonR).toBe(1);
  });
});

test('chebyshev({ order: 2 }) and ({ order: 3 }) are the known rational responses', () => {
  // Order 2, 20 dB: F = s^2 + 1/2, epsilon^2 = 4/99; |S21|^2 = 1/(1 + T2^2/99).
  for (const omega of [0, 0.5, Math.SQRT1_2, 1, 2]) {
    const { s11, s21 } = scatteringAt(chebyshev({ order: 2, returnLossDb: 20 }), omega);
    const t = 2 * omega * omega - 1;
    expect(size(s21)).toBeCloseTo(1 / Math.sqrt(1 + (t * t) / 99), 14);
    expect(size(s11)).toBeCloseTo(Math.abs(t) / Math.sqrt(99 + t * t), 14);
  }
  for (const omega of [0, 0.5, Math.sqrt(0.75), 1, 2]) {
    const { s21 } = scatteringAt(chebyshev({ order: 3, returnLossDb: 20 }), omega);
    const t = 4 * omega ** 3 - 3 * omega;
    expect(size(s21)).toBeCloseTo(1 / Math.sqrt(1 + (t * t) / 99), 14);
  }
});

test('generalizedChebyshev({ order: 1, one zero }) is the closed form', () => {
  // C = x_1 = (w - 1/z)/(1 - w/z): reflection zero 1/z; |S11(1)| = RL.
  for (const zero of [1.2, -3, 50]) {
    const response = generalizedChebyshev({ order: 1, returnLossDb: 20, transmissionZeros: [zero] });
    expect(response.reflectionZeros[0]!.im).toBeCloseTo(1 / zero, 15);
    for (const omega of [-2, 0, 0.4, 1]) {
      const c = (omega - 1 / zero) / (1 - omega / zero);
      expect(size(scatteringAt(response, omega).s21)).toBeCloseTo(1 / Math.sqrt(1 + (c * c) / 99), 13);
    }
  }
});

test('generalizedChebyshev({ order: 2, two zeros }) is the closed form', () => {
  const zeros = [1.7, -2.4];
  const response = generalizedChebyshev({ order: 2, returnLossDb: 15, transmissionZeros: zeros });
  const kappa2 = 10 ** 1.5 - 1;
  for (const omega of [-5, -1.2, -0.9, 0, 0.3, 1, 1.5]) {
    // cosh(acosh a + acosh b) = a b + sqrt(a^2-1) sqrt(b^2-1), signs kept.
    const x = zeros.map((zero) => (omega - 1 / zero) / (1 - omega / zero));
    const root = zeros.map((zero) => Math.sqrt(1 - 1 / zero ** 2) / (1 - omega / zero));
    const c = x[0]! * x[1]! + (omega * omega - 1) * root[0]! * root[1]!;
    expect(size(scatteringAt(response, omega).s21)).toBeCloseTo(1 / Math.sqrt(1 + (c * c) / kappa2), 13);
  }
});

describe.each([...SPECS, ...LONG_SPECS])('generalizedChebyshev(%s)', (_, request) => {
  const response = generalizedChebyshev(request);
  const { order, returnLossDb } = request;
  const level = 10 ** (-returnLossDb / 20);
  const reflection = (omega: number): number => size(scatteringAt(response, omega).s11);

  test('is lossless at every frequency', () => {
    expect(energyDefect(response)).toBeLessThan(60 * order * EPS * Math.sqrt(sharpness(response)));
  });

  test('has the asked return loss at both edges', () => {
    for (const edge of [-1, 1])
      expect(Math.abs(reflection(edge) / level - 1)).toBeLessThan(60 * order * EPS * sharpness(response));
  });

  test('has N reflection zeros in the band, falling, and N-1 peaks between them at the asked level', () => {
    const zeros = response.reflectionZeros.map(({ im }) => im);
    zeros.forEach((zero, n) => {
      expect(Math.abs(zero)).toBeLessThan(1);
      if (n > 0) expect(zero).toBeLessThan(zeros[n - 1]!);
    });
    for (let n = 1; n < order; n++) expect(peak(reflection, zeros[n]!, zeros[n - 1]!) / level).toBeCloseTo(1, 7);
  });

  test('has its poles in the left half plane, by falling frequency', () => {
    response.poles.forEach((pole, n) => {
      expect(pole.re).toBeLessThan(0);
      if (n > 0) expect(pole.im).toBeLessThanOrEqual(response.poles[n - 1]!.im);
    });
  });

  test('vanishes at its transmission zeros and keeps them in the order given', () => {
    const asked = (request.transmissionZeros ?? []).map((zero) =>
      typeof zero === 'number' ? { re: 0, im: zero } : zero,
    );
    expect(response.transmissionZeros).toEqual(asked);
    for (const zero of asked) {
      if (zero.re !== 0) continue;
      const { s11, s21 } = scatteringAt(response, zero.im);
      expect(size(s21)).toBe(0);
      expect(size(s11)).toBeCloseTo(1, 12);
    }
  });

  test('has the ripple constants of its roots at s = j', () => {
    const at = (roots: readonly { re: number; im: number }[]): number =>
      roots.reduce((product, root) => product * distance({ re: 0, im: 1 }, root), 1);
    const k = at(response.transmissionZeros) / at(response.reflectionZeros) / Math.sqrt(10 ** (returnLossDb / 10) - 1);
    const canonical = response.transmissionZeros.length === order;
    const room = 200 * order * EPS * (1 / Math.min(...response.reflectionZeros.map(({ im }) => 1 - im)));
    expect(Math.abs(response.epsilon / (canonical ? Math.sqrt(1 + k * k) : k) - 1)).toBeLessThan(room);
    expect(Math.abs(response.epsilonR / (canonical ? Math.sqrt(1 + k * k) / k : 1) - 1)).toBeLessThan(room);
  });

  test('S11 tends to 1 far from the band unless fully canonical', () => {
    const { s11, s21 } = scatteringAt(response, 1e9);
    if (response.transmissionZeros.length < order) expect(distance(s11, { re: 1, im: 0 })).toBeLessThan(1e-6);
    else {
      expect(size(s21)).toBeCloseTo(1 / response.epsilon, 6);
      expect(size(s11)).toBeCloseTo(1 / response.epsilonR, 6);
    }
  });
});

/** Largest value of a function with one maximum between two points. */
function peak(f: (x: number) => number, low: number, high: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  for (let turn = 0; turn < 60; turn++) {
    const [c, d] = [b - golden * (b - a), a + golden * (b - a)];
    if (f(c) > f(d)) b = d;
    else a = c;
  }
  return f((a + b) / 2);
}

test('generalizedChebyshev without zeros is chebyshev, bit for bit', () => {
  for (const order of [1, 4, 9]) {
    const plain = chebyshev({ order, returnLossDb: 17 });
    expect(generalizedChebyshev({ order, returnLossDb: 17 })).toEqual(plain);
    expect(generalizedChebyshev({ order, returnLossDb: 17, transmissionZeros: [] })).toEqual(plain);
  }
});

test('generalizedChebyshev of an exactly symmetric request has exactly symmetric roots', () => {
  for (const [name, request] of SPECS) {
    if (!/symmetric|real pair|equalized|close|narrow/.test(name)) continue;
    const { poles, reflectionZeros } = generalizedChebyshev(request);
    const key = ({ re, im }: { re: number; im: number }): string => `${re} ${im + 0}`;
    for (const list of [poles, reflectionZeros]) {
      const all = new Set(list.map(key));
      for (const { re, im } of list) expect(all.has(key({ re, im: -im }))).toBe(true);
    }
  }
});

test('generalizedChebyshev gives the leading coefficient of P that the zeros ask for', () => {
  const lead = (order: number, transmissionZeros: GeneralizedChebyshevRequest['transmissionZeros'] & object): object =>
    generalizedChebyshev({ order, returnLossDb: 20, transmissionZeros }).transmissionLead;
  // (-j)^(N+1) * j^above * (-j)^below * (-1)^pairs
  expect(lead(1, [])).toEqual({ re: -1, im: 0 });
  expect(lead(2, [])).toEqual({ re: 0, im: 1 });
  expect(lead(3, [])).toEqual({ re: 1, im: 0 });
  expect(lead(3, [1.5])).toEqual({ re: 0, im: 1 });
  expect(lead(3, [-1.5])).toEqual({ re: 0, im: -1 });
  expect(lead(3, [1.5, -1.5])).toEqual({ re: 1, im: 0 });
  expect(
    lead(3, [
      { re: 2, im: 1 },
      { re: -2, im: 1 },
    ]),
  ).toEqual({ re: -1, im: 0 });
});

test('generalizedChebyshev takes a zero as a number, as { re, im }, or as an object that inherits them', () => {
  const plain = generalizedChebyshev({ order: 3, returnLossDb: 20, transmissionZeros: [1.5] });
  expect(generalizedChebyshev({ order: 3, returnLossDb: 20, transmissionZeros: [{ re: 0, im: 1.5 }] })).toEqual(plain);
});

test('generalizedChebyshev with zeros right at the edge stays lossless', () => {
  for (const zero of [1.1, 1.01, 1.001, 1.0001, 1.00001]) {
    const response = generalizedChebyshev({ order: 6, returnLossDb: 20, transmissionZeros: [zero, -zero] });
    expect(energyDefect(response) / sharpness(response)).toBeLessThan(30 * 6 * EPS);
  }
});

test('generalizedChebyshev with pairs off the axis finds N different poles at every level', () => {
  // Two poles of these meet on the real axis as the level rises; a path of poles must not merge them.
  const requests: GeneralizedChebyshevRequest[] = [];
  for (const returnLossDb of [5, 10, 20, 26, 30, 40]) {
    for (const re of [0.1, 0.5, 1, 2]) {
      for (const im of [0, 0.05, 0.3, 1.2]) {
        for (const order of [2, 3, 4, 5, 8]) {
          requests.push({
            order,
            returnLossDb,
            transmissionZeros: [
              { re, im },
              { re: -re, im },
            ],
          });
        }
      }
    }
  }
  const worst = requests.reduce((most, request) => {
    const response = generalizedChebyshev(request);
    return Math.max(most, energyDefect(response, [-3, -1, -0.5, 0, 0.2, 0.7, 1, 2]) / sharpness(response));
  }, 0);
  expect(worst).toBeLessThan(1e-13);
});

const refusals: readonly (readonly [string, unknown, string])[] = [
  ['order 0', { order: 0, returnLossDb: 20 }, 'E_ORDER_RANGE'],
  ['order 101', { order: 101, returnLossDb: 20 }, 'E_ORDER_RANGE'],
  ['a broken order', { order: 2.5, returnLossDb: 20 }, 'E_ORDER_RANGE'],
  ['return loss 0', { order: 3, returnLossDb: 0 }, 'E_RL_RANGE'],
  ['a negative return loss', { order: 3, returnLossDb: -20 }, 'E_RL_RANGE'],
  ['a return loss above 100 dB', { order: 3, returnLossDb: 101 }, 'E_RL_RANGE'],
  ['too many zeros', { order: 2, returnLossDb: 20, transmissionZeros: [2, 3, 4] }, 'E_ZERO_COUNT'],
  ['a zero in the band', { order: 3, returnLossDb: 20, transmissionZeros: [0.5] }, 'E_ZERO_IN_PASSBAND'],
  ['a zero at the center', { order: 3, returnLossDb: 20, transmissionZeros: [0] }, 'E_ZERO_IN_PASSBAND'],
  ['a zero on the edge', { order: 3, returnLossDb: 20, transmissionZeros: [1] }, 'E_ZERO_ON_EDGE'],
  ['a zero on the lower edge', { order: 3, returnLossDb: 20, transmissionZeros: [-1] }, 'E_ZERO_ON_EDGE'],
  ['a zero off the axis alone', { order: 3, returnLossDb: 20, transmissionZeros: [{ re: 1, im: 1 }] }, 'E_ZERO_PAIR'],
  [
    'a conjugate pair',
    {
      order: 3,
      returnLossDb: 20,
      transmissionZeros: [
        { re: 1, im: 1 },
        { re: 1, im: -1 },
      ],
    },
    'E_ZERO_PAIR',
  ],
  ['a zero beyond 1e4', { order: 3, returnLossDb: 20, transmissionZeros: [2e4] }, 'E_ZERO_RANGE'],
];

test.each(refusals)('generalizedChebyshev refuses %s', (_, request, code) => {
  expect(() => generalizedChebyshev(request as GeneralizedChebyshevRequest)).toThrowError(
    expect.objectContaining({ name: 'FilterFailure', code }),
  );
});

test('generalizedChebyshev does not write its argument', () => {
  const request = { order: 4, returnLossDb: 20, transmissionZeros: [2, -2] };
  const copy = structuredClone(request);
  generalizedChebyshev(request);
  expect(request).toEqual(copy);
});
