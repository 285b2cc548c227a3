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
import type { Structured } from './structure.js';
import { faultyElements, readStructure } from './structure.js';
import { VOCABULARY } from './vocabulary.js';

/** A specification sound in all but the part to be checked. */
const FRAME = { passband: { lowerHz: 1, upperHz: 2 }, order: 1 };

/** One part of a specification through the structure checks that the whole goes through. */
function readPart(key: keyof SpecificationInput, value: unknown): Structured {
  const copy = plainCopy(value, [key]);
  if (copy.value === undefined && copy.faults.length === 0) {
    const missing = [kindFault([key], undefined, VOCABULARY[key]?.allowed ?? '', `give "${key}"`)];
    return { parts: {}, faults: missing, unsound: missing };
  }
  return readStructure({ ...FRAME, [key]: copy.value }, copy.faults);
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
  const { parts, faults: structural } = readPart('passband', passband);
  const faults = [...structural];
  const read = parts.passband === undefined ? undefined : readBand(parts.passband, faults);
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
  const { parts, faults: structural, unsound } = readPart('mask', mask);
  const faults = [...structural];
  const lines = readMask(parts.mask ?? [], band, faultyElements('mask', unsound), faults);
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
  const { parts, faults: structural } = readPart('unloadedQ', unloadedQ);
  const faults: Fault[] = [...(wrongOrder === undefined ? [] : [wrongOrder]), ...structural];
  const { unloadedQ: q = Number.NaN } = parts;
  if (faults.length === 0) readUnloadedQ(q, order, faults);
  refuseAny(faults);
  return deepFreeze(q);
}
