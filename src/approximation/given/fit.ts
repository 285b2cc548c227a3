import type { FineRoot } from '../../forms/index.js';
import { refusal } from '../../numerics/index.js';
import { halfRoots, isConjugate, symmetrized } from './half-roots.js';
import { largestRatio, lookingPoints } from './peak.js';
import { inverseSquare, ONE, powerRatio } from './power-sum.js';
import { reflectionHalf } from './reflection-half.js';
import { onSides, type ReflectionSides } from './sides.js';

/** Roots and constants, nothing else. */
export interface Parts {
  readonly poles: readonly FineRoot[];
  readonly reflectionZeros: readonly FineRoot[];
  readonly transmissionZeros: readonly FineRoot[];
  readonly epsilon: number;
  readonly epsilonR: number;
}

/** Poles that fit the zeros and constants: left roots of `|F|^2/epsilonR^2 + |P|^2/epsilon^2`, from `starts` if there are any. */
export function polesOf(parts: Omit<Parts, 'poles'>, starts?: readonly FineRoot[]): readonly FineRoot[] {
  const { reflectionZeros, transmissionZeros, epsilon, epsilonR } = parts;
  const zeros = reflectionZeros.length >= transmissionZeros.length ? reflectionZeros : transmissionZeros;
  const sum = {
    first: { constant: inverseSquare(epsilonR), roots: reflectionZeros },
    second: { constant: inverseSquare(epsilon), roots: transmissionZeros },
  };
  const poles = halfRoots(
    sum,
    // Between zeros and spread, on no symmetric figure.
    starts ?? zeros.map(({ re, im }, n) => ({ re: Math.abs(re) + 0.3 + 0.01 * n, im: im + 0.003 * (n + 1) })),
  );
  const isSymmetric = isConjugate(reflectionZeros) && isConjugate(transmissionZeros);
  return isSymmetric ? symmetrized(poles) : [...poles].sort((a, b) => b.im - a.im || a.re - b.re);
}

/** Largest excess of power that default data of six digits have, and the largest contradiction between roots of six digits. */
export const SIX_DIGITS = 1e-4;

/**
 * Reflection zeros that fit poles, transmission zeros and epsilon.
 *
 * @throws FilterFailure E_NOT_LOSSLESS, E_CHOICE, E_NO_CONVERGENCE
 */
export function reflectionZerosOf(
  parts: Pick<Parts, 'poles' | 'transmissionZeros' | 'epsilon'>,
  sides: ReflectionSides | undefined,
  { limit, open }: { readonly limit: number; readonly open: number },
): readonly FineRoot[] {
  const { poles, transmissionZeros, epsilon } = parts;
  const transmitted = { constant: inverseSquare(epsilon), roots: transmissionZeros };
  const peak = largestRatio(transmitted, { constant: ONE, roots: poles });
  const excess = peak.value - 1;
  if (!(excess <= limit)) {
    throw refusal(
      'E_NOT_LOSSLESS',
      'epsilon',
      `a power |S21|^2 above 1 by ${excess.toPrecision(3)}`,
      limit,
      `it is so at omega = ${peak.omega.toPrecision(6)}; epsilon must be at least ${(epsilon * Math.sqrt(peak.value)).toPrecision(6)}`,
    );
  }
  const half = reflectionHalf(parts, Math.max(0, excess), open);
  const isSymmetric = isConjugate(poles) && isConjugate(transmissionZeros);
  return onSides(isSymmetric ? symmetrized(half) : half, sides);
}

/** Largest defect of `|S11|^2 + |S21|^2 = 1` where poles are looked at, and the frequency. */
export function largestDefect(parts: Parts): { readonly omega: number; readonly value: number } {
  const below = { constant: ONE, roots: parts.poles };
  const reflected = { constant: inverseSquare(parts.epsilonR), roots: parts.reflectionZeros };
  const transmitted = { constant: inverseSquare(parts.epsilon), roots: parts.transmissionZeros };
  return lookingPoints(parts.poles).reduce(
    (worst, omega) => {
      const value = Math.abs(powerRatio(reflected, below, omega) + powerRatio(transmitted, below, omega) - 1);
      return value <= worst.value ? worst : { omega, value };
    },
    { omega: 0, value: 0 },
  );
}

/** How far each root lies from the nearest one of another list, each of which is taken once. */
export function movesOf(roots: readonly FineRoot[], given: readonly FineRoot[]): readonly number[] {
  const open = [...given];
  return roots.map((root) => {
    const gaps = open.map((other) => Math.hypot(root.re - other.re, root.im - other.im + difference(root, other)));
    const best = gaps.indexOf(Math.min(...gaps));
    open.splice(best, 1);
    return gaps[best] ?? Number.POSITIVE_INFINITY;
  });
}

const difference = (a: FineRoot, b: FineRoot): number => (a.imRest ?? 0) - (b.imRest ?? 0);
