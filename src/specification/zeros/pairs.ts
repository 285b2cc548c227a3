import type { Complex } from '../../forms/index.js';
import { echoComplex } from '../echo.js';
import type { Fault, Path } from '../faults.js';
import { isRounding, magnitude, ULPS } from './values.js';

/** A partner this close, relative to its size, was meant as the partner. */
const NEAR_MISS = 1e-3;
const ALLOWED = 'off-axis zeros in pairs s and -conj(s), each as often as the other';

/** Zeros with exact partners, or the faults of those that have none. */
export interface Paired {
  readonly zeros: readonly Complex[];
  readonly remarks: readonly string[];
  readonly faults: readonly Fault[];
}

/** The mirror image in the imaginary axis, -conj(s). */
function mirrorOf(zero: Complex): Complex {
  return { re: -zero.re, im: zero.im };
}

function apart(a: Complex, b: Complex): number {
  return magnitude({ re: a.re - b.re, im: a.im - b.im });
}

function isSame(a: Complex, b: Complex): boolean {
  return isRounding(apart(a, b), magnitude(a));
}

function nearest(zeros: readonly Complex[], candidates: readonly number[], target: Complex): number | undefined {
  let best: number | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const index of candidates) {
    const distance = apart(zeros[index] ?? target, target);
    if (distance < least) [best, least] = [index, distance];
  }
  return best;
}

function faultOf(
  zeros: readonly Complex[],
  index: number,
  open: readonly number[],
  base: Path,
): readonly [Fault, number] {
  const zero = zeros[index] ?? { re: 0, im: 0 };
  const mirror = mirrorOf(zero);
  const other = nearest(zeros, open, mirror);
  const near = other === undefined ? undefined : zeros[other];
  const fault = { code: 'E_ZERO_PAIR', path: [...base, index], allowed: ALLOWED, value: zero, limit: ULPS };
  if (near !== undefined && other !== undefined && apart(near, mirror) <= NEAR_MISS * magnitude(zero)) {
    const found = `${echoComplex(zero)} and ${echoComplex(near)}, which miss being mirrored by ${apart(near, mirror)}`;
    return [{ ...fault, found, advice: `make the partner exactly ${echoComplex(mirror)}` }, other];
  }
  const count = zeros.filter((each) => isSame(zero, each)).length;
  const mirrored = zeros.filter((each) => isSame(mirror, each)).length;
  const partner = `${echoComplex(mirror)} (the mirror in the imaginary axis, not the conjugate)`;
  const found =
    mirrored === 0
      ? `${echoComplex(zero)} without its partner`
      : `${echoComplex(zero)} ${count} times and its partner ${mirrored} times: unequal multiplicity`;
  return [{ ...fault, found, advice: `add the partner ${partner}` }, -1];
}

/** Matches off-axis zeros with their mirror images: exact ones first, then those off by rounding, which are made exact. */
export function pairZeros(given: readonly Complex[], path: Path, name: string): Paired {
  const zeros = [...given];
  const remarks: string[] = [];
  let open = zeros.map((_, index) => index).filter((index) => zeros[index]?.re !== 0);
  const take = (first: number, second: number): void => {
    open = open.filter((index) => index !== first && index !== second);
  };
  for (const accept of [(a: Complex, b: Complex) => apart(a, b) === 0, isSame]) {
    for (const index of [...open]) {
      const zero = zeros[index];
      if (zero === undefined || !open.includes(index)) continue;
      const mirror = mirrorOf(zero);
      const other = nearest(zeros, open, mirror);
      const partner = other === undefined ? undefined : zeros[other];
      if (other === undefined || partner === undefined || !accept(mirror, partner)) continue;
      if (apart(mirror, partner) > 0) {
        remarks.push(`${name}[${other}]: made exactly ${echoComplex(mirror)}, the mirror of ${name}[${index}]`);
        zeros[other] = mirror;
      }
      take(index, other);
    }
  }
  const faults: Fault[] = [];
  for (let index = open[0]; index !== undefined; index = open[0]) {
    take(index, index);
    const [fault, other] = faultOf(zeros, index, open, path);
    faults.push(fault);
    take(other, other);
  }
  return { zeros, remarks, faults };
}
