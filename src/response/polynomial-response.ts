import type { FilterPolynomials, FineRoot, Scattering } from '../forms/index.js';
import { type Complex, complex, divide, multiply, scale } from '../numerics/index.js';

/**
 * Scattering parameters of a product form at any complex s. Factors are taken in quotients, so that nothing overflows; S22
 * follows from losslessness, `S22 = prod(s + conj f)/(epsilonR*E)`, and is continued to complex s.
 */
export function scatteringOfPolynomials(polynomials: FilterPolynomials, s: Complex): Scattering {
  const { poles, reflectionZeros, transmissionZeros, transmissionLead, epsilon, epsilonR } = polynomials;
  let s11 = complex(1 / epsilonR, 0);
  let s22 = s11;
  let s21 = scale(transmissionLead, 1 / epsilon);
  poles.forEach((pole, n) => {
    const below = complex(s.re - pole.re, above(s.im, pole));
    const reflection = reflectionZeros[n];
    const transmission = transmissionZeros[n];
    const [left, right] =
      reflection === undefined
        ? [ONE, ONE]
        : [
            complex(s.re - reflection.re, above(s.im, reflection)),
            complex(s.re + reflection.re, above(s.im, reflection)),
          ];
    s11 = multiply(s11, divide(left, below));
    s22 = multiply(s22, divide(right, below));
    const factor = transmission === undefined ? ONE : complex(s.re - transmission.re, s.im - transmission.im);
    s21 = multiply(s21, divide(factor, below));
  });
  return { s11, s21, s12: s21, s22 };
}

/** The factor of a zero at infinity. */
const ONE: Complex = complex(1, 0);

/**
 * Group delay of S21 at `s = loss + j*omega`, `-d phase/d omega = -sum Re 1/(s - z) + sum Re 1/(s - p)`.
 *
 * Without loss, zeros on the axis or in mirrored pairs add nothing and are left out, so that the delay stays finite at a
 * transmission zero.
 */
export function delayOfPolynomials(polynomials: FilterPolynomials, omega: number, loss: number): number {
  let delay = 0;
  for (const pole of polynomials.poles) delay += realOfInverse(loss - pole.re, above(omega, pole));
  if (loss === 0) return delay;
  for (const zero of polynomials.transmissionZeros) delay -= realOfInverse(loss - zero.re, omega - zero.im);
  return delay;
}

/** How far a frequency lies above a root, with the root's rest. */
const above = (omega: number, { im, imRest = 0 }: FineRoot): number => omega - im - imRest;

/** Real part of 1/(re + j*im); 0 on the root itself, where S21 = 0 has no phase. */
function realOfInverse(re: number, im: number): number {
  const square = re * re + im * im;
  return square === 0 ? 0 : re / square;
}
