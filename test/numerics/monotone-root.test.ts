import fc from 'fast-check';
import { expect, test } from 'vitest';
import { EPS, monotoneRoot, type RisingFunction } from '../../src/numerics/index.js';

const shifted =
  (root: number): RisingFunction =>
  (x) => ({ value: x - root, slope: 1 });

test('monotoneRoot(straight line) hits its root from any start', () => {
  for (const start of [-1e9, -1, 0, 0.5, 3, 1e9, Number.NaN]) {
    expect(monotoneRoot(shifted(0.3), -1, 3, start)).toBeCloseTo(0.3, 15);
  }
});

test('monotoneRoot(f) is within 4 ulp of the closed form for steep, flat and saturating functions', () => {
  const cases: readonly (readonly [RisingFunction, number, number, number])[] = [
    [(x) => ({ value: x ** 3 - 2, slope: 3 * x * x }), -10, 10, Math.cbrt(2)],
    [(x) => ({ value: Math.exp(x) - 7, slope: Math.exp(x) }), -50, 300, Math.log(7)],
    [(x) => ({ value: Math.atan(x - 1000), slope: 1 / (1 + (x - 1000) ** 2) }), -1e6, 1e6, 1000],
    [(x) => ({ value: Math.atan(1e8 * (x - 0.1)), slope: 1e8 / (1 + (1e8 * (x - 0.1)) ** 2) }), 0, 1, 0.1],
    [(x) => ({ value: Math.tan(x) - 1, slope: 1 + Math.tan(x) ** 2 }), -1.5, 1.5, Math.PI / 4],
    [(x) => ({ value: Math.log(x) + 20, slope: 1 / x }), 1e-300, 1, Math.exp(-20)],
  ];
  for (const [f, low, high, root] of cases) {
    for (const start of [low, (low + high) / 2, high, root]) {
      expect(Math.abs(monotoneRoot(f, low, high, start) - root)).toBeLessThanOrEqual(4 * EPS * Math.abs(root));
    }
  }
});

test('monotoneRoot(f) returns an end of the bracket that is the root', () => {
  expect(monotoneRoot(shifted(-1), -1, 3, 2)).toBe(-1);
  expect(monotoneRoot(shifted(3), -1, 3, 2)).toBe(3);
});

test('monotoneRoot(f) finds a root at 0, where no relative step is small', () => {
  expect(monotoneRoot(shifted(0), -1, 3, 2)).toBe(0);
  const cube: RisingFunction = (x) => ({ value: x ** 3, slope: 3 * x * x });
  expect(Math.abs(monotoneRoot(cube, -1, 3, 2))).toBeLessThan(1e-25);
});

test('monotoneRoot(f) survives a vanishing slope at the start', () => {
  const cube: RisingFunction = (x) => ({ value: x ** 3 - 1e-3, slope: 3 * x * x });
  expect(Math.abs(monotoneRoot(cube, -1, 1, 0) - 0.1)).toBeLessThanOrEqual(4 * EPS * 0.1);
});

test('monotoneRoot(sum of arctangents) stays in its bracket and at the sign change', () => {
  const knot = fc.record({
    at: fc.double({ min: -2, max: 2, noNaN: true }),
    width: fc.double({ min: 1e-6, max: 3, noNaN: true }),
  });
  fc.assert(
    fc.property(
      fc.array(knot, { minLength: 1, maxLength: 20 }),
      fc.double({ min: -0.9, max: 0.9, noNaN: true }),
      (knots, level) => {
        const f: RisingFunction = (x) => ({
          value: knots.reduce(
            (sum, { at, width }) => sum + Math.atan((x - at) / width),
            (-level * knots.length * Math.PI) / 2,
          ),
          slope: knots.reduce((sum, { at, width }) => sum + width / (width * width + (x - at) ** 2), 0),
        });
        const root = monotoneRoot(f, -1e3, 1e3, 0);
        expect(Math.abs(root)).toBeLessThanOrEqual(1e3);
        const { value, slope } = f(root);
        // Rounding of the sum itself is up to n*2*pi/2*eps.
        expect(Math.abs(value)).toBeLessThanOrEqual(8 * EPS * (knots.length * Math.PI + slope * Math.abs(root)));
      },
    ),
    { seed: 41, numRuns: 200 },
  );
});
