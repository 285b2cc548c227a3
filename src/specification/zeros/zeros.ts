import type { Band, Complex } from '../../forms/index.js';
import type { Fault, Path } from '../faults.js';
import { kindFault, refuseAny } from '../faults.js';
import { checkOrder, MAX_ORDER } from '../order-and-level.js';
import { plainCopy } from '../plain-copy.js';
import { pairZeros } from './pairs.js';
import { magnitude, placeFault, readZero } from './values.js';

const NAME = 'transmissionZeros';
const PATH: Path = [NAME];
/** Distinct zeros closer than this, relative to their size, get a remark. */
const CLOSE = 1e-4;

/** Zeros of a specification, checked, in the caller's order. */
export interface CheckedZeros {
  readonly zeros: readonly Complex[];
  /** What was adjusted or deserves a look. */
  readonly remarks: readonly string[];
}

/** The same with what is wrong; `faulty` elements are left out of `zeros`. */
export interface ReadZeros extends CheckedZeros {
  readonly faults: readonly Fault[];
}

function countFault(count: number, order: number): Fault | undefined {
  if (count <= order) return undefined;
  return {
    code: 'E_ZERO_COUNT',
    path: PATH,
    found: `${count} zeros for order ${order}`,
    allowed: `at most N = ${order} (N-1 = ${order - 1} without direct source-load coupling; N-2 if source and load also touch one resonator each)`,
    advice: `remove ${count - order}, or raise the order`,
    value: count,
    limit: order,
  };
}

function closeRemarks(zeros: readonly Complex[]): string[] {
  const remarks: string[] = [];
  zeros.forEach((zero, index) => {
    const size = magnitude(zero);
    if (zeros.findIndex((each) => each.re === zero.re && each.im === zero.im) < index) return;
    for (let other = index + 1; other < zeros.length; other += 1) {
      const near = zeros[other] ?? zero;
      const distance = magnitude({ re: zero.re - near.re, im: zero.im - near.im });
      if (distance === 0 || distance > CLOSE * size) continue;
      const condition = `condition number of telling them apart about ${(size / distance).toPrecision(3)}`;
      remarks.push(`${NAME}[${index}] and [${other}]: ${distance.toPrecision(3)} apart, ${condition}`);
      return;
    }
  });
  return remarks;
}

/** Reads a copied list of zeros. `skip` holds the indices already known to be faulty, or not readable without a band. */
export function readZeros(
  list: readonly unknown[],
  order: number | undefined,
  band: Band | undefined,
  skip: ReadonlySet<number> = new Set(),
): ReadZeros {
  const tooMany = countFault(list.length, order ?? MAX_ORDER);
  const faults: Fault[] = tooMany === undefined ? [] : [tooMany];
  const zeros: Complex[] = [];
  const remarks: string[] = [];
  list.forEach((value, index) => {
    if (skip.has(index)) return;
    const path = [...PATH, index];
    const read = readZero(value, path, `${NAME}[${index}]`, band);
    const fault = 'code' in read ? read : placeFault(read, value, path, band);
    if (fault !== undefined) faults.push(fault);
    if ('code' in read) return;
    zeros.push(read.zero);
    remarks.push(...read.remarks);
  });
  if (zeros.length < list.length) return { zeros, remarks, faults };
  const paired = pairZeros(zeros, PATH, NAME);
  return {
    zeros: paired.zeros,
    remarks: [...remarks, ...paired.remarks, ...closeRemarks(paired.zeros)],
    faults: [...faults, ...paired.faults],
  };
}

/**
 * Checks a list of finite transmission zeros for a filter of the given order.
 *
 * A zero is a number w (the zero s = jw), a complex value with `re` and `im` in the s-plane (own or inherited fields),
 * or, where the band is given, text with a unit. On the axis abs(w) must exceed 1; off the axis zeros come in pairs
 * s and -conj(s); abs(s) is at most 1e4. Rounding within 4 units in the last place is repaired and recorded.
 *
 * @param zeros anything; the argument is called `transmissionZeros` in the message
 * @param order number of resonators, 1 to 100
 * @param band passband in hertz, for zeros given as text and for messages
 * @returns the zeros in the caller's order, s-plane, normalized, and remarks; O(zeros^2) time
 * @throws FilterFailure E_ZERO_COUNT, E_ZERO_RANGE, E_ZERO_IN_PASSBAND, E_ZERO_ON_EDGE, E_ZERO_PAIR, E_QUANTITY,
 *   E_TYPE, E_NOT_FINITE, E_MISSING, E_ORDER_RANGE
 * @example
 * const { zeros } = checkTransmissionZeros([1.3, { re: 0.8, im: 0 }, { re: -0.8, im: 0 }], 6);
 * zeros[0]; // { re: 0, im: 1.3 }
 */
export function checkTransmissionZeros(zeros: unknown, order: number, band?: Band): CheckedZeros {
  const resonators = checkOrder(order);
  const copy = plainCopy(zeros, PATH);
  refuseAny(copy.faults);
  if (!Array.isArray(copy.value)) {
    refuseAny([kindFault(PATH, copy.value, 'a list of zeros', 'give a list, empty for none')]);
    return { zeros: [], remarks: [] };
  }
  const read = readZeros(copy.value, resonators, band);
  refuseAny(read.faults);
  return { zeros: read.zeros, remarks: read.remarks };
}
