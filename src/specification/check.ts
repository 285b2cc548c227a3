import type { Band } from '../forms/index.js';
import { readBand } from './band.js';
import { dateFault } from './calendar-date.js';
import { deepFreeze, definedOnly } from './defined.js';
import { familyKeyFaults } from './family-keys.js';
import type { Fault, Locate } from './faults.js';
import { kindFault, refuseAny } from './faults.js';
import { formFaults } from './form-rules.js';
import { nameFault, notesFault, revisionFault } from './labels.js';
import { lossRemarks, readSweep, readUnloadedQ } from './losses-and-sweep.js';
import { readMask } from './mask/lines.js';
import { levelRemarks, orderFault, returnLossFault } from './order-and-level.js';
import { plainCopy } from './plain-copy.js';
import type { Specification, SpecificationInput } from './specification.js';
import type { Structured } from './structure.js';
import { faultyElements, readStructure } from './structure.js';
import { VOCABULARY } from './vocabulary.js';
import type { ReadZeros } from './zeros/zeros.js';
import { readZeros } from './zeros/zeros.js';

type Parts = Partial<SpecificationInput>;

function push(faults: Fault[], fault: Fault | undefined): void {
  if (fault !== undefined) faults.push(fault);
}

/** The return loss belongs to the families whose edges it marks: required there, meaningless for half-power edges. */
function readReturnLoss(parts: Parts, isPresent: boolean, faults: Fault[]): void {
  if (parts.returnLossDb !== undefined) push(faults, returnLossFault(parts.returnLossDb));
  const path = ['returnLossDb'];
  if (parts.family !== 'butterworth' && parts.family !== 'bessel') {
    const misspelled = faults.some((fault) => fault.code === 'E_UNKNOWN_KEY' && fault.limit === 'returnLossDb');
    if (isPresent || misspelled) return;
    faults.push(kindFault(path, undefined, VOCABULARY.returnLossDb?.allowed ?? '', 'add "returnLossDb"'));
  } else if (isPresent) {
    const advice = 'remove it, or choose another family';
    const allowed = `no return loss with family "${parts.family}", whose band edges are half-power points`;
    faults.push({ code: 'E_RL_RANGE', path, found: String(parts.returnLossDb), allowed, advice });
  }
}

/** Zeros as frequencies wait for a sound passband; those are skipped without one. */
function readPartZeros(parts: Parts, band: Band | undefined, unsound: readonly Fault[]): ReadZeros {
  const list = parts.transmissionZeros ?? [];
  const skip = new Set(faultyElements('transmissionZeros', unsound));
  for (const [index, zero] of list.entries()) if (band === undefined && typeof zero === 'string') skip.add(index);
  const order = orderFault(parts.order) === undefined ? parts.order : undefined;
  return readZeros(list, order, band, skip);
}

/** The rules on one part each, then those between parts. */
function readParts({ parts, unsound }: Structured, faults: Fault[]): Specification {
  const { name, notes, revision, date, order = 0, family = 'generalizedChebyshev', returnLossDb, unloadedQ } = parts;
  const { topology = 'folded', portCouplings = 'any' } = parts;
  const { rejectionDb, stopBandEdge, largestPairAtInfinity, reflectionSide } = parts;
  const isBad = (key: string): boolean => unsound.some(({ path }) => path.length === 0 || path[0] === key);
  if (name !== undefined) push(faults, nameFault(name));
  if (notes !== undefined) push(faults, notesFault(notes));
  if (revision !== undefined) push(faults, revisionFault(revision));
  if (date !== undefined) push(faults, dateFault(date));
  const read = parts.passband === undefined ? undefined : readBand(parts.passband, faults);
  if (parts.order !== undefined) push(faults, orderFault(order));
  if (!isBad('family')) readReturnLoss(parts, returnLossDb !== undefined || isBad('returnLossDb'), faults);
  if (!isBad('family')) faults.push(...familyKeyFaults(parts, isBad));
  const zeros = readPartZeros(parts, read?.band, unsound);
  faults.push(...zeros.faults);
  if (order > 0 && !['family', 'topology', 'portCouplings', 'transmissionZeros'].some(isBad)) {
    const count = parts.transmissionZeros?.length ?? 0;
    const isMoved = largestPairAtInfinity === true;
    faults.push(...formFaults({ order, zeros: count, family, isMoved, topology, portCouplings }));
  }
  if (unloadedQ !== undefined) readUnloadedQ(unloadedQ, parts.order, faults);
  const mask = readMask(parts.mask ?? [], read?.band, faultyElements('mask', unsound), faults);
  const sweep = parts.sweep === undefined ? undefined : readSweep(parts.sweep, faults);
  const band = read?.band ?? { centerHz: Number.NaN, bandwidthHz: Number.NaN };
  const remarks = [
    ...(read?.remarks ?? []),
    ...zeros.remarks,
    ...levelRemarks(returnLossDb),
    ...lossRemarks(unloadedQ, band),
  ];
  const ofFamily = { returnLossDb, rejectionDb, stopBandEdge, largestPairAtInfinity, reflectionSide };
  const optional = definedOnly({ name, notes, revision, date, ...ofFamily, unloadedQ, sweep });
  return { ...optional, band, order, family, transmissionZeros: zeros.zeros, topology, portCouplings, mask, remarks };
}

/** Checks a copied value; every fault that can be told is told, with its place where there is a text. */
export function checkCopied(value: unknown, known: readonly Fault[], locate?: Locate): Specification {
  const structured = readStructure(value, known);
  const faults = [...structured.faults];
  // Where a part is missing there is a fault, so that what stands in its place never gets out.
  const specification = readParts(structured, faults);
  refuseAny(inOrder(faults, locate), locate);
  return deepFreeze(specification);
}

/** Faults in the order of the text, missing keys last; without a text as they were found. */
function inOrder(faults: readonly Fault[], locate: Locate | undefined): readonly Fault[] {
  if (locate === undefined) return faults;
  const rank = (fault: Fault): number => {
    const place = locate(fault.path, fault.onKey === true);
    if (place === undefined || fault.code === 'E_MISSING') return Number.POSITIVE_INFINITY;
    return place.line * 1e7 + place.column;
  };
  const ranked = faults.map((fault) => ({ fault, rank: rank(fault) }));
  return ranked.sort((a, b) => (a.rank === b.rank ? 0 : a.rank - b.rank)).map(({ fault }) => fault);
}

/**
 * Checks a specification given as a plain object and fills in the defaults. All faults are listed together.
 *
 * Frequencies are numbers of hertz or text with a unit (`"3822 MHz"`); zeros are numbers w (s = jw, normalized), points
 * {re, im} of the normalized s-plane, or frequencies as text. See `specificationJsonSchema` for every key and its range.
 *
 * @param specification anything; never written to, every field read once
 * @returns a deep-frozen copy with frequencies in hertz and zeros in the s-plane, and remarks on what was adjusted
 * @throws FilterFailure with one code, or with the first code and all faults (20 at most) in `faults`: E_MISSING,
 *   E_UNKNOWN_KEY, E_FORBIDDEN_KEY, E_TYPE, E_NOT_FINITE, E_CHOICE, E_QUANTITY, E_NUMBER_OVERFLOW, E_NAME, E_DATE, E_BAND,
 *   E_ORDER_RANGE, E_RL_RANGE, E_REJECTION_RANGE, E_STOP_BAND, E_FAMILY_KEY, E_ZERO_COUNT, E_ZERO_RANGE, E_ZERO_IN_PASSBAND, E_ZERO_ON_EDGE, E_ZERO_PAIR,
 *   E_ZERO_TOPOLOGY, E_TOPOLOGY_ZEROS, E_Q_RANGE, E_MASK, E_SWEEP
 * @example
 * const checked = checkSpecification({
 *   passband: { lowerHz: '3822 MHz', upperHz: '3858 MHz' },
 *   order: 6,
 *   returnLossDb: 22,
 *   transmissionZeros: [-1.45, 1.45],
 * });
 * checked.band.bandwidthHz; // 36000000
 */
export function checkSpecification(specification: unknown): Specification {
  const copy = plainCopy(specification, []);
  return checkCopied(copy.value, copy.faults);
}
