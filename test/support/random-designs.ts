import { Complex as ComplexNumber } from 'complex.js';
import { type Complex, design, FilterFailure, scatteringAt } from '../../src/index.js';
import { seeded } from './random.js';

export interface RandomSpec {
  readonly order: number;
  readonly returnLossDb: number;
  readonly transmissionZeros: readonly (number | Complex)[];
  readonly topology: 'folded' | 'arrow';
}

/**
 * Orders 2 to 16, up to N zeros at |omega| = 1 + log-uniform 1e-3..10 on both sides, a fifth of them complex pairs, return
 * loss 10 to 35 dB; one spec in ten is adversarial: clustered, repeated, far, near the edge, of order 17 to 40, or of a return
 * loss from 0.1 to 100 dB.
 */
export function randomSpec(random: () => number): RandomSpec {
  const adversarial = random() < 0.1;
  const order = adversarial && random() < 0.5 ? 17 + Math.floor(24 * random()) : 2 + Math.floor(15 * random());
  const wanted = Math.floor((Math.min(order, 16) + 1) * random());
  const transmissionZeros: (number | Complex)[] = [];
  const axisZero = (): number => (random() < 0.5 ? -1 : 1) * (1 + 10 ** (-3 + 4 * random()));
  while (transmissionZeros.length < wanted) {
    const kind = random();
    if (kind < 0.2 && transmissionZeros.length + 2 <= wanted) {
      const re = 0.05 + 1.5 * random();
      const im = random() < 0.3 ? 0 : -1.5 + 3 * random();
      transmissionZeros.push({ re, im }, { re: -re, im });
    } else if (adversarial && kind < 0.6 && transmissionZeros.length > 0 && typeof transmissionZeros[0] === 'number') {
      transmissionZeros.push(random() < 0.5 ? transmissionZeros[0] : transmissionZeros[0] * (1 + 1e-9 * random()));
    } else {
      transmissionZeros.push(
        adversarial && random() < 0.3 ? (random() < 0.5 ? 1.001 : 900 * (1 + random())) : axisZero(),
      );
    }
  }
  const returnLossDb = adversarial && random() < 0.5 ? 10 ** (-1 + 3 * random()) : 10 + 25 * random();
  return { order, returnLossDb, transmissionZeros, topology: random() < 0.5 ? 'folded' : 'arrow' };
}

/**
 * |S21|^2 in closed form: `1/(1 + C^2/kappa^2)`, `C = (prod(c_n + d_n) + prod(c_n - d_n))/(2*prod(1 - omega/w_n))`,
 * `c_n = omega - 1/w_n`, `d_n = sqrt(omega^2 - 1)*sqrt(1 - 1/w_n^2)`: the sum of arcosh in R. J. Cameron, IEEE Trans. MTT
 * 47(4), 1999 (from memory), written as products so that no branch has to be chosen for complex zeros. complex.js computes.
 */
export function closedFormS21(spec: RandomSpec, omega: number): number {
  const kappa = Math.sqrt(10 ** (spec.returnLossDb / 10) - 1);
  const edge = new ComplexNumber(omega * omega - 1, 0).sqrt();
  let [plus, minus, below] = [new ComplexNumber(1, 0), new ComplexNumber(1, 0), new ComplexNumber(1, 0)];
  for (let n = 0; n < spec.order; n++) {
    const zero = spec.transmissionZeros[n];
    // s = j*w, so 1/w = j/s.
    const inverse = zero === undefined ? new ComplexNumber(0, 0) : inverseOf(zero);
    const c = new ComplexNumber(omega, 0).sub(inverse);
    const d = edge.mul(new ComplexNumber(1, 0).sub(inverse.mul(inverse)).sqrt());
    plus = plus.mul(c.add(d));
    minus = minus.mul(c.sub(d));
    below = below.mul(new ComplexNumber(1, 0).sub(inverse.mul(omega)));
  }
  const c = plus.add(minus).div(below.mul(2)).abs();
  return 1 / (1 + (c / kappa) ** 2);
}

function inverseOf(zero: number | Complex): ComplexNumber {
  if (typeof zero === 'number') return new ComplexNumber(1 / zero, 0);
  return new ComplexNumber(0, 1).div(new ComplexNumber(zero.re, zero.im));
}

export interface Tally {
  readonly designs: number;
  readonly refused: readonly string[];
  readonly wrong: readonly string[];
}

/** Designs random specifications and compares each accepted matrix with the closed form at 40 frequencies. */
export function tally(seed: number, designs: number): Tally {
  const random = seeded(seed);
  const refused: string[] = [];
  const wrong: string[] = [];
  for (let n = 0; n < designs; n++) {
    const spec = randomSpec(random);
    const frequencies = Array.from({ length: 40 }, () => (random() < 0.6 ? 2.4 * random() - 1.2 : 8 * random() - 4));
    try {
      const { matrix } = design({ passband: { lowerHz: 1e9, upperHz: 1.02e9 }, ...spec });
      for (const omega of frequencies) {
        const { s21 } = scatteringAt(matrix, omega);
        const error = Math.abs(s21.re ** 2 + s21.im ** 2 - closedFormS21(spec, omega));
        // The closed form in doubles loses digits next to a zero; 1e-9 is the limit of the certificates.
        if (!(error < 1e-9)) wrong.push(`${JSON.stringify(spec)} at ${omega}: ${error}`);
      }
    } catch (error) {
      if (!(error instanceof FilterFailure)) throw error;
      refused.push(`${error.code} ${JSON.stringify(spec)}`);
    }
  }
  return { designs, refused, wrong };
}
