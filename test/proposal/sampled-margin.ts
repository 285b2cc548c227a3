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
