/** Specification: text or a plain object to a checked, frozen specification; the doors for single values.
 *  Takes    bytes | design-file text (JSON) | plain object; frequencies in hertz or as text with a unit
 *  Gives    Specification: every default filled in, hertz, zeros in the normalized s-plane, remarks; JSON Schema; JSON with places
 *  Refuses  E_ENCODING, E_FILE_SIZE, E_JSON_*, E_FORBIDDEN_KEY, E_NUMBER_OVERFLOW, E_MISSING, E_UNKNOWN_KEY, E_TYPE, E_NOT_FINITE,
 *           E_CHOICE, E_QUANTITY, E_NAME, E_DATE, E_BAND, E_ORDER_RANGE, E_RL_RANGE, E_REJECTION_RANGE, E_STOP_BAND, E_FAMILY_KEY, E_ZERO_*, E_TOPOLOGY_ZEROS, E_Q_RANGE, E_MASK, E_SWEEP
 *  Source   T. Bray (ed.), RFC 8259, 2017 (JSON); F. Yergeau, RFC 3629, 2003 (UTF-8) */
export { checkSpecification } from './check.js';
export { checkBand, checkMask, checkUnloadedQ } from './doors.js';
export { echo, escapeText } from './echo.js';
export type { Fault, Path, Position } from './faults.js';
export { failureOf, kindFault, pathText } from './faults.js';
export type { JsonValue } from './json/places.js';
export type { JsonText } from './json/reader.js';
export { readJson } from './json/reader.js';
export { decodeUtf8 } from './json/utf8.js';
export { nearestKey } from './nearest-key.js';
export { checkOrder, checkReturnLoss } from './order-and-level.js';
export { parseSpecification } from './parse.js';
export { specificationJsonSchema } from './schema.js';
export type {
  FrequencyInput,
  LevelInput,
  MaskLineInput,
  PassbandInput,
  PortCouplings,
  ReflectionSide,
  Specification,
  SpecificationFamily,
  SpecificationInput,
  SweepInput,
  SweepRange,
  Topology,
  ZeroInput,
} from './specification.js';
export { checkRejection, checkStopBandEdge, REJECTION_DB } from './stop-band.js';
export type { CheckedZeros } from './zeros/zeros.js';
export { checkTransmissionZeros } from './zeros/zeros.js';
