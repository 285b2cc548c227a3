import type { FineRoot } from '../../forms/index.js';
import { add, type Complex, complex, divide, multiply, scale, squareRoot } from '../../numerics/index.js';
import { rootBelowEdge } from '../half-band.js';
import { type JacobiValues, jacobi } from './jacobi.js';
import { type Modulus, modulusOfDecay } from './modulus.js';

/** The upper half (omega >= 0) of an elliptic response, from the band edge inward. */
export interface UpperHalf {
  readonly reflectionZeros: readonly FineRoot[];
  readonly transmissionZeros: readonly number[];
  readonly poles: readonly FineRoot[];
  /** |P(j)/F(j)|. */
  readonly ratioAtEdge: number;
  readonly stopBandEdge: number;
}

/** A map of the squared frequency `x -> x*(1 - b)/(1 - b*x)`, which keeps 0 and 1; b = 0 changes nothing. */
interface Move {
  readonly b: number;
  readonly rest: number;
  /** The largest pair of zeros, which goes to infinity; undefined when nothing moves. */
  readonly last: JacobiValues | undefined;
}

/**
 * Roots of the response whose filtering function is `cd(N*u*K1/K, k1)` with `omega = cd(u, k)`.
 *
 * Reflection zeros at `cd((2i-1)*K/N)`, transmission zeros at the inverse of k times these, poles at
 * `cd((2i-1)*K/N - j*part*K')`, all from real functions of Jacobi: with sn, cn, dn at K minus the argument nothing cancels,
 * and `1 - omega^2` is a square known to all its digits.
 */
export function upperHalf(order: number, modulus: Modulus, part: number, rest: number, isMoved: boolean): UpperHalf {
  const half = Math.floor(order / 2);
  // cd of the reflection zeros is sn at the complementary argument.
  const values = Array.from({ length: Math.ceil(order / 2) }, (_, i) =>
    jacobi((order - 1 - 2 * i) / order, (2 * i + 1) / order, modulus),
  );
  const pairs = values.slice(0, half);
  const last = isMoved ? pairs[half - 1] : undefined;
  const { k } = modulus;
  const move: Move =
    last === undefined ? { b: 0, rest: 1, last } : { b: (k * last.sn) ** 2, rest: last.dn * last.dn, last };
  const across = jacobi(part, rest, modulusOfDecay(Math.PI ** 2 / modulus.decay));
  const zeros = (isMoved ? pairs.slice(0, -1) : pairs).map((each) => zeroAt(each, k, move));
  const ratioAtEdge = pairs.reduce((ratio, { cn }, i) => {
    const beyond = zeros[i]?.beyond ?? 1;
    return (ratio * beyond * (move.rest + move.b * cn * cn)) / (cn * cn);
  }, 1);
  return {
    reflectionZeros: values.map((each) => reflectionAt(each, move)),
    transmissionZeros: zeros.map(({ omega }) => omega),
    poles: values.map((each) => poleAt(each, across, k, move)),
    ratioAtEdge,
    stopBandEdge: isMoved && values[0] !== undefined ? 1 / (k * values[0].sn) : 1 / k,
  };
}

/** A transmission zero, and its `omega^2 - 1`. */
function zeroAt({ sn, cn, dn }: JacobiValues, k: number, { last }: Move): { omega: number; beyond: number } {
  if (last === undefined) return { omega: 1 / (k * sn), beyond: (dn / (k * sn)) ** 2 };
  const apart = k * Math.sqrt((last.cn - cn) * (last.cn + cn));
  return { omega: last.dn / apart, beyond: (dn / apart) ** 2 };
}

function reflectionAt({ sn, cn }: JacobiValues, { b, rest }: Move): FineRoot {
  if (sn === 0) return { re: 0, im: 0 };
  const below = rest + b * cn * cn;
  const omega = sn * Math.sqrt(rest / below);
  return omega < HALF ? { re: 0, im: omega } : rootBelowEdge(0, (cn * cn) / below / (1 + omega));
}

/** Nearer to the band edge than to the center the distance from the edge is the better number. */
const HALF = 0.5;

/** `s = j*omega`, omega = X - j*Y: X = sn*d1/D, Y = cn*dn*s1*c1/D, D = c1^2 + (k*sn*s1)^2, where s1, c1, d1 lie across. */
function poleAt({ sn, cn, dn }: JacobiValues, across: JacobiValues, k: number, move: Move): FineRoot {
  const scaleBy = 1 / (across.cn * across.cn + (k * sn * across.sn) ** 2);
  const omega = complex(sn * across.dn * scaleBy, -cn * dn * across.sn * across.cn * scaleBy);
  // Odd orders, where nothing moves: the pole on the real axis.
  if (sn === 0) return { re: omega.im, im: 0 };
  const root = complex(cn * across.cn * scaleBy, sn * dn * across.sn * across.dn * scaleBy);
  const square = multiply(root, root);
  if (move.last === undefined) return rooted(omega, divide(square, complex(1 + omega.re, omega.im)));
  const below = add(complex(move.rest, 0), scale(square, move.b));
  const moved = multiply(omega, squareRoot(divide(complex(move.rest, 0), below)));
  const offset = divide(divide(square, below), complex(1 + moved.re, moved.im));
  return rooted(offset.re < HALF ? complex(moved.re, -offset.im) : moved, offset);
}

/** The pole of s = j*omega from omega and 1 - omega. */
function rooted(omega: Complex, offset: Complex): FineRoot {
  return offset.re < HALF ? rootBelowEdge(omega.im, offset.re) : { re: omega.im, im: omega.re };
}
