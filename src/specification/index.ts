/** Specification: text or a plain object to a checked, frozen specification.
 *  Takes    design-file text | plain object; single values from other rooms' doors
 *  Gives    checked values, remarks on what was adjusted
 *  Refuses  E_ORDER_RANGE, E_RL_RANGE, E_ZERO_*, E_TYPE, E_NOT_FINITE, E_MISSING
 *  Source   RFC 8259 (JSON), RFC 3629 (UTF-8) */
export { checkOrder, checkReturnLoss } from './order-and-level.js';
export type { CheckedZeros } from './zeros.js';
export { checkTransmissionZeros } from './zeros.js';
