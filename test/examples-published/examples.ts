import { readFileSync } from 'node:fs';
import type { GeneralizedChebyshevRequest } from '../../src/approximation/index.js';
import type { Complex, CouplingMatrix } from '../../src/forms/index.js';

/** One entry of fixtures/published/worked-examples.json. */
export interface Example {
  readonly id: string;
  readonly title: string;
  readonly spec: string;
  readonly source: string;
  readonly provenance: string;
  // Each test knows the shape of its own entry.
  readonly printed: Readonly<Record<string, unknown>>;
  readonly recomputed: Readonly<Record<string, unknown>>;
}

const EXAMPLES = JSON.parse(
  readFileSync(new URL('../../fixtures/published/worked-examples.json', import.meta.url), 'utf8'),
) as readonly Example[];

export function example(id: string): Example {
  const found = EXAMPLES.find((each) => each.id === id);
  if (found === undefined) throw new Error(`no example ${id}`);
  return found;
}

/** The request of an entry of form "N=4, RL=22 dB, zeros ['j1.3217', '-j1.8082']". */
export function requestOf({ spec }: Example): GeneralizedChebyshevRequest {
  const order = Number(/N=(\d+)/.exec(spec)?.[1]);
  const returnLossDb = Number(/RL=([\d.]+)/.exec(spec)?.[1]);
  const transmissionZeros = [...spec.matchAll(/'(-?)j([\d.]+)'/g)].map(([, sign, value]) => Number(`${sign}${value}`));
  return { order, returnLossDb, transmissionZeros };
}

/** A complex number as the file writes it: a number, [re, im], or { re, im }. */
export function complexOf(value: unknown): Complex {
  if (typeof value === 'number') return { re: value, im: 0 };
  if (Array.isArray(value)) return { re: value[0] as number, im: value[1] as number };
  return value as Complex;
}

export const complexList = (value: unknown): Complex[] => (value as unknown[]).map(complexOf);

export const numbers = (value: unknown): number[] => value as number[];

export const matrixFrom = (value: unknown): CouplingMatrix => {
  const values = value as number[][];
  return { order: values.length - 2, values };
};

/** By falling imaginary part. */
export const byFrequency = (list: readonly Complex[]): Complex[] => [...list].sort((a, b) => b.im - a.im);

/**
 * Largest difference of two matrices after the best choice of signs for resonators and for the source row: the published
 * matrices describe the dual network. Signs follow the strongest couplings outward from the load.
 */
export function gapUpToSigns(a: CouplingMatrix, b: CouplingMatrix): number {
  const n = a.order + 2;
  const sign = new Array<number>(n).fill(0);
  sign[n - 1] = 1;
  for (let known = 1; known < n; known++) {
    // The strongest coupling from a node of known sign to one of unknown sign decides the latter.
    let best: readonly [number, number, number] | undefined;
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) {
        const strength = Math.abs(a.values[i]![j]!);
        if (sign[i] !== 0 && sign[j] === 0 && (best === undefined || strength > best[2])) best = [i, j, strength];
      }
    }
    const [i, j] = best!;
    sign[j] = sign[i]! * (a.values[i]![j]! * b.values[i]![j]! < 0 ? -1 : 1);
  }
  let gap = 0;
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++)
      gap = Math.max(gap, Math.abs(a.values[i]![j]! - sign[i]! * sign[j]! * b.values[i]![j]!));
  }
  return gap;
}
