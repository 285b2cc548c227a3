/** Measurement: two-port data as text of a data file.
 *  Takes    frequencies in hertz and S-parameters as re and im arrays
 *  Gives    text of a Touchstone 1.x two-port file, numbers that read back bit for bit
 *  Refuses  E_TS_EMPTY, E_TS_COUNT, E_TS_FREQUENCY, E_TS_ORDER, E_TS_OPTION, E_NOT_FINITE, E_TYPE
 *  Source   EIA/IBIS Open Forum, Touchstone File Format Specification, Rev 1.1, 2002 (from memory) */

export { formatTouchstone } from './touchstone-text.js';
export type { NumberList, ReImSamples, TwoPortData } from './two-port-data.js';
