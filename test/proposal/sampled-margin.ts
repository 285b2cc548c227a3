import { generalizedChebyshev, scatteringAt } from '../../src/index.js';
import type { PlaceZerosRequest, RejectionPiece } from '../../src/proposal/index.js';

/** Rejection of a lossless response at a frequency, dB. */
export type Rejection = (omega: number) => number;

const far = (omega: number): number => Math.min(Math.max(omega, -1e5), 1e5);

/** Level of a piece at omega, dB. */
function levelOf({ fromOmega = 0, toOmega = 0, rejectionDb }: RejectionPiece, omega: number): number {
  if (typeof rejectionDb === 'number') return rejectionDb;
  const [a, b] = rejectionDb;
  return a + ((b - a) * (omega - fromOmega)) / (toOmega - fromOmega);
}

/** Smallest margin over points spread over the mask (even in 1/omega): never below the true one. */
export function sampledMargin({ rejection }: PlaceZerosRequest, rejectionAt: Rejection, points: number): number {
  let worst = Number.POSITIVE_INFINITY;
  for (const piece of rejection) {
    const [low, high] = [1 / far(piece.fromOmega ?? -1e9), 1 / far(piece.toOmega ?? 1e9)];
    for (let n = 0; n <= points; n++) {
      const omega = 1 / (low + ((high - low) * n) / points);
      worst = Math.min(worst, rejectionAt(omega) - levelOf(piece, omega));
    }
  }
  return worst;
}

/** Rejection of the synthesized polynomials. */
export function synthesizedRejection({ order, returnLossDb }: PlaceZerosRequest, zeros: readonly number[]): Rejection {
  const response = generalizedChebyshev({ order, returnLossDb, transmissionZeros: zeros });
  return (omega) => {
    const { s21 } = scatteringAt(response, omega);
    return -20 * Math.log10(Math.hypot(s21.re, s21.im));
  };
}

/**
 * Rejection by the closed form: `C = cosh(sum acosh x_k)`, `x_k = (omega - 1/w_k)/(1 - omega/w_k)`, `10 log10(1 + C^2/kappa^2)`.
 * Source: R. J. Cameron, General coupling matrix synthesis methods for Chebyshev filtering functions, 1999 (from memory).
 */
export function closedFormRejection({ order, returnLossDb }: PlaceZerosRequest, zeros: readonly number[]): Rejection {
  const kappaSquared = 10 ** (returnLossDb / 10) - 1;
  const atInfinity = order - zeros.length;
  return (omega) => {
    let sum = atInfinity * Math.acosh(Math.abs(omega));
    for (const w of zeros) sum += Math.acosh(Math.max(1, Math.abs((omega - 1 / w) / (1 - omega / w))));
    return 10 * Math.log10(1 + Math.cosh(sum) ** 2 / kappaSquared);
  };
}

/** Smallest margin of a placement by the closed form: samples even in 1/omega, the lowest ones followed down between. */
export function lowestMargin(request: PlaceZerosRequest, zeros: readonly number[], points: number): number {
  const rejectionAt = closedFormRejection(request, zeros);
  let worst = Number.POSITIVE_INFINITY;
  for (const piece of request.rejection) {
    const [low, high] = [1 / far(piece.fromOmega ?? -1e9), 1 / far(piece.toOmega ?? 1e9)];
    const pitch = (high - low) / points;
    const margin = (x: number): number => rejectionAt(1 / x) - levelOf(piece, 1 / x);
    const margins = Array.from({ length: points + 1 }, (_, n) => margin(low + n * pitch));
    margins.forEach((value, n) => {
      worst = Math.min(worst, value);
      const [before = Number.POSITIVE_INFINITY, after = Number.POSITIVE_INFINITY] = [margins[n - 1], margins[n + 1]];
      if (value > before || value > after) return;
      const ends = [low + Math.max(0, n - 1) * pitch, low + Math.min(points, n + 1) * pitch] as const;
      worst = Math.min(worst, goldenMinimum(margin, Math.min(...ends), Math.max(...ends)));
    });
  }
  return worst;
}

/** Lowest value of a function with one minimum, by golden sections. */
export function goldenMinimum(f: (x: number) => number, low: number, high: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  let [x, y] = [b - ratio * (b - a), a + ratio * (b - a)];
  let [fx, fy] = [f(x), f(y)];
  for (let turn = 0; turn < 45; turn++) {
    if (fx < fy) {
      [b, y, fy] = [y, x, fx];
      x = b - ratio * (b - a);
      fx = f(x);
    } else {
      [a, x, fx] = [x, y, fy];
      y = a + ratio * (b - a);
      fy = f(y);
    }
  }
  return Math.min(fx, fy);
}
