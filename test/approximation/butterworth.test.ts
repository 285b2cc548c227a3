import { expect, test } from 'vitest';
import { butterworth } from '../../src/approximation/index.js';
import { EPS } from '../../src/numerics/index.js';
import { scatteringAt } from '../../src/response/index.js';
import { energyDefect, size } from '../support/models.js';

const ORDERS = [1, 2, 3, 4, 5, 9, 16, 31, 64, 100];

test.each(ORDERS)('butterworth({ order: %d }) has its poles on the unit circle, by falling frequency', (order) => {
  const { poles } = butterworth({ order });
  expect(poles).toHaveLength(order);
  poles.forEach((pole, n) => {
    const theta = ((2 * n + 1) * Math.PI) / (2 * order);
    expect(Math.abs(pole.re + Math.sin(theta))).toBeLessThan(4 * EPS);
    expect(Math.abs(pole.im - Math.cos(theta))).toBeLessThan(4 * EPS);
    expect(pole.re).toBeLessThan(0);
    const mirror = poles[order - 1 - n]!;
    expect(mirror.re).toBe(pole.re);
    expect(mirror.im + pole.im).toBe(0);
  });
});

test.each(ORDERS)('butterworth({ order: %d }) has |S21|^2 = 1/(1 + omega^2N)', (order) => {
  const response = butterworth({ order });
  for (const omega of [0, 0.3, 0.9, 1, -1, 1.01, -1.7, 3]) {
    const { s11, s21 } = scatteringAt(response, omega);
    const power = omega ** (2 * order);
    const room = 10 * order * EPS;
    expect(Math.abs(size(s21) * Math.sqrt(1 + power) - 1)).toBeLessThan(room);
    expect(Math.abs(size(s11) - Math.sqrt(power / (1 + power)))).toBeLessThan(room);
  }
  expect(energyDefect(response)).toBeLessThan(20 * order * EPS);
});

test('butterworth({ order }) is at half power (3.0103 dB) at omega = +-1', () => {
  for (const omega of [1, -1]) {
    const { s21 } = scatteringAt(butterworth({ order: 7 }), omega);
    expect(-20 * Math.log10(size(s21))).toBeCloseTo(3.010299956639812, 12);
  }
});

test('butterworth({ order: 2 }) and ({ order: 3 }) are the known rational responses', () => {
  // E = s^2 + sqrt(2) s + 1 and (s + 1)(s^2 + s + 1) at s = 2j.
  const second = scatteringAt(butterworth({ order: 2 }), 2);
  const [a, b] = [-3, 2 * Math.SQRT2];
  // S21 = j/E, S11 = s^2/E.
  expect(second.s21.re).toBeCloseTo(b / 17, 15);
  expect(second.s21.im).toBeCloseTo(a / 17, 15);
  expect(second.s11.re).toBeCloseTo((-4 * a) / 17, 15);
  expect(second.s11.im).toBeCloseTo((4 * b) / 17, 15);
  // E(2j) = (1 + 2j)(-3 + 2j) = -7 - 4j; S21 = 1/E, S11 = (2j)^3/E = -8j/E.
  const third = scatteringAt(butterworth({ order: 3 }), 2);
  expect(third.s21.re).toBeCloseTo(-7 / 65, 15);
  expect(third.s21.im).toBeCloseTo(4 / 65, 15);
  expect(third.s11.re).toBeCloseTo(32 / 65, 15);
  expect(third.s11.im).toBeCloseTo(56 / 65, 15);
});

test('butterworth({ order: 1 }) has S21 = -1/(s + 1)', () => {
  const { s21, s11 } = scatteringAt(butterworth({ order: 1 }), 1);
  expect(s21.re).toBeCloseTo(-0.5, 15);
  expect(s21.im).toBeCloseTo(0.5, 15);
  expect(s11.re).toBeCloseTo(0.5, 15);
  expect(s11.im).toBeCloseTo(0.5, 15);
});

test('butterworth has N reflection zeros at 0, no finite transmission zero, unit constants and no return loss', () => {
  const response = butterworth({ order: 4 });
  expect(response.reflectionZeros).toEqual(Array.from({ length: 4 }, () => ({ re: 0, im: 0 })));
  expect(response).toMatchObject({ family: 'butterworth', order: 4, transmissionZeros: [], epsilon: 1, epsilonR: 1 });
  expect('returnLossDb' in response).toBe(false);
});

test.each([0, -1, 1.5, 101, Number.NaN, Number.POSITIVE_INFINITY, '3', undefined, null])(
  'butterworth refuses order %s',
  (order) => {
    expect(() => butterworth({ order: order as number })).toThrowError(
      expect.objectContaining({ name: 'FilterFailure', argument: 'order' }),
    );
  },
);
