import { expect, test } from 'vitest';
import { arrow, evaluateMask, folded, generalizedChebyshev, sweepHz, transversal } from '../../src/index.js';
import { landmarks } from '../../src/response/index.js';

test.each([
  { order: 4, zeros: [1.3217, 1.8082] },
  { order: 8, zeros: [-1.3553, 1.1093, 1.218] },
  { order: 4, zeros: [-3.7431, -1.8051, 1.5699, 6.191] },
  { order: 20, zeros: [1.05, -1.2, 1.4] },
  { order: 40, zeros: [1.05, -1.2] },
])('landmarks(matrix of order $order) stand at the poles and the transmission zeros', ({ order, zeros }) => {
  const response = generalizedChebyshev({ order, returnLossDb: 22, transmissionZeros: zeros });
  const start = transversal(response);
  for (const matrix of [start, folded(start).matrix, arrow(start).matrix]) {
    const marks = landmarks(matrix, 0);
    for (const zero of zeros) expect(Math.min(...marks.map(({ omega }) => Math.abs(omega - zero)))).toBeLessThan(1e-4);
    for (const { im } of response.poles)
      expect(Math.min(...marks.map(({ omega }) => Math.abs(omega - im)))).toBeLessThan(1e-9);
  }
});

test('landmarks(matrix of complex zeros) stand at them with their distance from the axis', () => {
  const response = generalizedChebyshev({
    order: 6,
    returnLossDb: 22,
    transmissionZeros: [
      { re: 0.7, im: 0.4 },
      { re: -0.7, im: 0.4 },
    ],
  });
  const marks = landmarks(folded(transversal(response)).matrix, 0);
  expect(Math.min(...marks.map(({ omega, halfWidth }) => Math.hypot(omega - 0.4, halfWidth - 0.7)))).toBeLessThan(1e-9);
});

test('a notch beside a weakly coupled resonator is found in the loss of a span', () => {
  // Resonator 4 hangs on resonator 2 alone: its pole is narrow, and the zero beside it narrower still.
  const start = folded(transversal(generalizedChebyshev({ order: 3, returnLossDb: 20 }))).matrix;
  const values = Array.from({ length: 6 }, () => new Array<number>(6).fill(0));
  for (let i = 0; i < 5; i++)
    for (let j = 0; j < 5; j++) (values[i === 4 ? 5 : i] as number[])[j === 4 ? 5 : j] = start.values[i]?.[j] as number;
  (values[4] as number[])[4] = -0.3;
  (values[2] as number[])[4] = (values[4] as number[])[2] = 2e-4;
  const band = { centerHz: 3.84e9, bandwidthHz: 36e6, unloadedQ: 1e9 };
  const matrix = { order: 4, values };
  const [row] = evaluateMask(matrix, band, [{ fromHz: 3.83e9, toHz: 3.85e9, insertionLossDb: 1 }]);
  const at = row?.worstHz as number;
  const grid = Float64Array.from({ length: 20_001 }, (_, n) => at + (n - 10_000) * 0.1);
  const { s21 } = sweepHz(matrix, band, grid);
  const deepest = Math.max(
    ...Array.from(grid, (_, n) => -20 * Math.log10(Math.hypot(s21.re[n] as number, s21.im[n] as number))),
  );
  expect(row?.predicted).toBeGreaterThan(deepest - 1e-3);
  expect(row?.predicted).toBeGreaterThan(1);
});
