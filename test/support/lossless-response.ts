import type { Complex, FilterPolynomials } from '../../src/forms/index.js';
import { seeded } from './random.js';

/**
 * Reflection zeros anywhere, transmission zeros mirrored in the axis, as many as the order of one kind at least; level of |S11|
 * at omega = 1 (fewer transmission zeros), far out (as many of both), or times |s| to the difference far out (fewer of reflection).
 */
export interface LosslessRequest {
  readonly reflectionZeros: readonly Complex[];
  readonly transmissionZeros: readonly Complex[];
  readonly level: number;
}

const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });

const over = (a: Complex, b: Complex): Complex => {
  const square = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
};

/** `prod (z - r)(z + conj r)` over the same of the poles, the difference of pole k to itself left out. */
function ratio(roots: readonly Complex[], poles: readonly Complex[], k: number): Complex {
  const z = poles[k] as Complex;
  let value: Complex = { re: 1, im: 0 };
  poles.forEach((pole, n) => {
    const root = roots[n];
    const im = root === undefined ? 0 : z.im - root.im;
    if (root !== undefined) value = times(value, times({ re: z.re - root.re, im }, { re: z.re + root.re, im }));
    value = over(value, { re: z.re + pole.re, im: z.im - pole.im });
    if (n !== k) value = over(value, { re: z.re - pole.re, im: z.im - pole.im });
  });
  return value;
}

/**
 * A lossless response by spectral factorization in product form, in doubles: the left roots of `F F#/epsilonR^2 + P P#/epsilon^2`
 * by simultaneous steps from the reflection zeros moved left. Undefined where they do not settle to a few ulp.
 */
export function losslessResponse(request: LosslessRequest): FilterPolynomials | undefined {
  const { reflectionZeros, transmissionZeros, level } = request;
  const order = Math.max(reflectionZeros.length, transmissionZeros.length);
  const isFull = transmissionZeros.length === order;
  const isStop = reflectionZeros.length < order;
  const atEdge = (roots: readonly Complex[]): number =>
    roots.reduce((product, { re, im }) => product * Math.hypot(re, 1 - im), 1);
  const edge = (atEdge(transmissionZeros) / atEdge(reflectionZeros)) * (level / Math.sqrt(1 - level * level));
  const transmitted = isStop ? 1 : 1 / Math.sqrt(1 - level * level);
  const [epsilon, epsilonR] = isFull ? [transmitted, 1 / level] : [edge, 1];
  const starts = isStop ? transmissionZeros : reflectionZeros;
  const poles = starts.map(({ im }, n) => ({ re: -0.5 - 0.01 * n, im: im + 0.003 * n }));
  const reflectedSign = reflectionZeros.length % 2 === 0 ? 1 : -1;
  const transmittedSign = transmissionZeros.length % 2 === 0 ? 1 : -1;
  const lead = order % 2 === 0 ? 1 : -1;
  let largest = Infinity;
  for (let sweep = 0; sweep < 500 && largest > 1e-15; sweep++) {
    largest = 0;
    for (let k = 0; k < order; k++) {
      const f = ratio(reflectionZeros, poles, k);
      const p = ratio(transmissionZeros, poles, k);
      const [a, b] = [reflectedSign / epsilonR ** 2 / lead, transmittedSign / epsilon ** 2 / lead];
      const step = { re: a * f.re + b * p.re, im: a * f.im + b * p.im };
      const pole = poles[k] as { re: number; im: number };
      largest = Math.max(largest, Math.hypot(step.re, step.im) / Math.hypot(pole.re, pole.im));
      pole.re = -Math.abs(pole.re - step.re);
      pole.im -= step.im;
    }
  }
  if (!(largest < 1e-13)) return undefined;
  const isOdd = (order + transmissionZeros.length) % 2 === 1;
  return {
    family: 'lossless',
    order,
    poles,
    reflectionZeros,
    transmissionZeros,
    transmissionLead: isOdd ? { re: 1, im: 0 } : { re: 0, im: 1 },
    epsilon,
    epsilonR,
  };
}

/** A random request: orders 1 to `most`, reflection zeros up to 0.4 from the axis on both sides, any number of zeros. */
export function randomLossless(seed: number, most: number): LosslessRequest {
  const random = seeded(seed);
  const order = 1 + Math.floor(most * random());
  const reflectionZeros = Array.from({ length: order }, (_, k) => ({
    re: (random() - 0.5) * 10 ** (-random() * 3),
    im: Math.cos(((2 * k + 1) * Math.PI) / (2 * order)) + (0.2 * (random() - 0.5)) / order ** 2,
  }));
  const count = Math.floor((order + 1) * random());
  const transmissionZeros: Complex[] = [];
  while (transmissionZeros.length < count) {
    const pair = random() < 0.4 && transmissionZeros.length + 2 <= count;
    const [re, im] = [0.2 + random(), 2 * random() - 1];
    if (pair) transmissionZeros.push({ re, im }, { re: -re, im });
    else transmissionZeros.push({ re: 0, im: (random() < 0.5 ? -1 : 1) * (1.05 + 2 * random()) });
  }
  return { reflectionZeros, transmissionZeros, level: 0.05 + 0.6 * random() };
}
