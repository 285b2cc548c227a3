import type { Band, MaskLine } from '../forms/index.js';
import { readBand } from './band.js';
import { deepFreeze } from './defined.js';
import type { Fault } from './faults.js';
import { kindFault, refuseAny } from './faults.js';
import { readUnloadedQ } from './losses-and-sweep.js';
import { readMask } from './mask/lines.js';
import { orderFault } from './order-and-level.js';
import { plainCopy } from './plain-copy.js';
import type { SpecificationInput } from './specification.js';
import { faultyElements, readStructure } from './structure.js';
import { VOCABULARY } from './vocabulary.js';

/** A specification sound in all but the part to be checked. */
const FRAME = { passband: { lowerHz: 1, upperHz: 2 }, order: 1 };

/** One part of a specification through the structure checks that the whole goes through. */
function readPart(key: keyof SpecificationInput, value: unknown, faults: Fault[]): Partial<SpecificationInput> {
  const copy = plainCopy(value, [key]);
  if (copy.value === undefined && copy.faults.length === 0) {
    faults.push(kindFault([key], undefined, VOCABULARY[key]?.allowed ?? '', `give "${key}"`));
    return {};
  }
  const { parts, faults: found } = readStructure({ ...FRAME, [key]: copy.value }, copy.faults);
  faults.push(...found);
  return parts;
}

/**
 * Checks a passband given by both edges or by center and width, in hertz or as text with a unit.
 *
 * @param passband anything; the argument is called `passband` in the message; no other keys beside the two
 * @returns geometric center and width, hertz, frozen
 * @throws FilterFailure E_BAND, E_QUANTITY, E_UNKNOWN_KEY, E_TYPE, E_NOT_FINITE or E_MISSING
 * @example
 * checkBand({ centerHz: '10 GHz', bandwidthHz: 40e6 }); // { centerHz: 10000000000, bandwidthHz: 40000000 }
 */
export function checkBand(passband: unknown): Band {
  const faults: Fault[] = [];
  const { passband: part } = readPart('passband', passband, faults);
  const read = part === undefined ? undefined : readBand(part, faults);
  refuseAny(faults);
  return deepFreeze(read?.band ?? { centerHz: Number.NaN, bandwidthHz: Number.NaN });
}

/**
 * Checks the lines of a mask: spans, levels, and what contradicts the passband or another line.
 *
 * @param mask anything; the argument is called `mask` in the message
 * @param band passband in hertz; without it rejection within the passband is not looked for
 * @returns the lines with frequencies in hertz, frozen; O(lines^2) time, at most 1000 lines
 * @throws FilterFailure E_MASK, E_QUANTITY, E_UNKNOWN_KEY, E_TYPE, E_NOT_FINITE, E_CHOICE or E_MISSING
 * @example
 * checkMask([{ fromHz: '3864 MHz', rejectionDb: 24 }]); // [{ fromHz: 3864000000, rejectionDb: 24 }]
 */
export function checkMask(mask: unknown, band?: Band): readonly MaskLine[] {
  const faults: Fault[] = [];
  const { mask: part } = readPart('mask', mask, faults);
  const lines = readMask(part ?? [], band, faultyElements('mask', faults), faults);
  refuseAny(faults);
  return deepFreeze(lines);
}

/**
 * Checks an unloaded Q: one positive finite number, or a list with one for each resonator.
 *
 * @param unloadedQ anything; the argument is called `unloadedQ` in the message
 * @param order number of resonators, which a list must have as its length
 * @returns the same values, a list copied and frozen
 * @throws FilterFailure E_Q_RANGE, E_TYPE, E_NOT_FINITE, E_MISSING or E_ORDER_RANGE
 * @example
 * checkUnloadedQ(9000, 6); // 9000
 */
export function checkUnloadedQ(unloadedQ: unknown, order: number): number | readonly number[] {
  const wrongOrder = orderFault(order);
  const faults: Fault[] = wrongOrder === undefined ? [] : [wrongOrder];
  const { unloadedQ: part = Number.NaN } = readPart('unloadedQ', unloadedQ, faults);
  if (faults.length === 0) readUnloadedQ(part, order, faults);
  refuseAny(faults);
  return deepFreeze(part);
}
