import type { FineRoot } from '../../forms/index.js';
import { EPS, refusal } from '../../numerics/index.js';

/** Most roots of one list: no response of a higher order has been compared with a reference. */
const MOST_ROOTS = 100;

/**
 * A list of roots as a caller gave it; a bare number `w` means `s = j*w`.
 *
 * @throws FilterFailure E_TYPE, E_NOT_FINITE, E_ORDER_RANGE
 */
export function readRoots(name: string, value: unknown): readonly FineRoot[] {
  if (!Array.isArray(value))
    throw refusal('E_TYPE', name, value, 'a list of roots', 'pass a list of { re, im }, or of numbers on the axis');
  if (value.length > MOST_ROOTS)
    throw refusal('E_ORDER_RANGE', name, `${value.length} roots`, `at most ${MOST_ROOTS}`, 'lower the order');
  return value.map((root, n) => readRoot(`${name}[${n}]`, root));
}

function readRoot(name: string, root: unknown): FineRoot {
  if (typeof root === 'number') return { re: 0, im: readNumber(name, root) };
  if (typeof root !== 'object' || root === null)
    throw refusal('E_TYPE', name, root, 'a root', 'pass { re, im }, or a number w for s = j*w');
  const [re, im] = [
    readNumber(`${name}.re`, Reflect.get(root, 're')),
    readNumber(`${name}.im`, Reflect.get(root, 'im')),
  ];
  const rest: unknown = Reflect.get(root, 'imRest');
  return rest === undefined ? { re: re + 0, im } : { re: re + 0, im, imRest: readNumber(`${name}.imRest`, rest) };
}

/** @throws FilterFailure E_TYPE, E_NOT_FINITE */
export function readNumber(name: string, value: unknown): number {
  if (typeof value !== 'number') throw refusal('E_TYPE', name, value, 'a number', 'give a number');
  if (!Number.isFinite(value)) throw refusal('E_NOT_FINITE', name, value, 'a finite number', 'replace it');
  return value;
}

/** @throws FilterFailure E_TYPE, E_NOT_FINITE, E_POLYNOMIALS */
export function readPositive(name: string, value: unknown): number {
  const number = readNumber(name, value);
  if (number > 0) return number;
  throw refusal('E_POLYNOMIALS', name, number, 'a number above 0', 'correct the constant');
}

/** @throws FilterFailure E_NOT_HURWITZ unless every pole lies in the left half plane */
export function checkHurwitz(poles: readonly FineRoot[], name = 'poles'): void {
  const index = poles.findIndex(({ re }) => !(re < 0));
  if (index < 0) return;
  throw refusal(
    'E_NOT_HURWITZ',
    `${name}[${index}].re`,
    poles[index]?.re,
    'numbers below 0',
    'poles must lie in the left half plane; check the sign convention of s',
  );
}

/** Data of six digits are off by half a unit of the sixth: mirrored zeros may differ by twice that, and some reading. */
const PAIR_SHARE = 2e-5;

/**
 * Transmission zeros as a reciprocal network has them: on the axis, or in pairs mirrored in it exactly. What is off by no
 * more than the rounding of six digits is averaged; order and places in the list stay.
 *
 * @throws FilterFailure E_NOT_RECIPROCAL
 */
export function mirroredPairs(zeros: readonly FineRoot[]): readonly FineRoot[] {
  const result = [...zeros];
  const open = new Set(zeros.keys());
  const byDistance = [...zeros.keys()].sort((a, b) => Math.abs(zeros[b]?.re ?? 0) - Math.abs(zeros[a]?.re ?? 0));
  for (const k of byDistance) {
    if (!open.delete(k)) continue;
    const zero = zeros[k] as FineRoot;
    const room = PAIR_SHARE * Math.hypot(zero.re, zero.im);
    let [best, gap] = [-1, 2 * Math.abs(zero.re)];
    for (const n of open) {
      const other = zeros[n] as FineRoot;
      const off = Math.hypot(zero.re + other.re, zero.im - other.im);
      if (zero.re * other.re < 0 && off <= gap) [best, gap] = [n, off];
    }
    if (!(gap <= room)) refuseUnpaired(k, zero, gap);
    if (best < 0) {
      result[k] = { re: 0, im: zero.im };
      continue;
    }
    const other = zeros[best] as FineRoot;
    const [re, im] = [(zero.re - other.re) / 2, (zero.im + other.im) / 2];
    [result[k], result[best]] = [
      { re, im },
      { re: -re, im },
    ];
    open.delete(best);
  }
  return result;
}

function refuseUnpaired(index: number, zero: FineRoot, gap: number): never {
  throw refusal(
    'E_NOT_RECIPROCAL',
    `transmissionZeros[${index}]`,
    `${zero.re.toPrecision(4)}, ${zero.im.toPrecision(4)} off its mirror by ${gap.toPrecision(3)}`,
    `${(PAIR_SHARE * Math.hypot(zero.re, zero.im)).toPrecision(3)}`,
    'a reciprocal network has zeros on the axis, or in pairs z and -conj z',
  );
}

/** @throws FilterFailure E_NOT_HURWITZ when a transmission zero on the axis is a reflection zero too, and so a pole */
export function checkNoCommon(reflectionZeros: readonly FineRoot[], transmissionZeros: readonly FineRoot[]): void {
  for (const [n, zero] of transmissionZeros.entries()) {
    const room = 4 * EPS * Math.hypot(zero.re, zero.im);
    const isCommon = ({ re, im }: FineRoot): boolean => Math.hypot(re, im - zero.im) <= room;
    if (zero.re === 0 && reflectionZeros.some(isCommon)) {
      const hint = 'leave the common root out of both lists and lower the order';
      throw refusal(
        'E_NOT_HURWITZ',
        `transmissionZeros[${n}]`,
        zero.im,
        'no root of F and P on the axis at once',
        hint,
      );
    }
  }
}
