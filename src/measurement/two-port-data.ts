import { FilterFailure } from '../numerics/index.js';

/** Numbers in an array of any kind. */
export type NumberList = ArrayLike<number>;

/** Complex samples as two lists of the same length. */
export interface ReImSamples {
  readonly re: NumberList;
  readonly im: NumberList;
}

/** S-parameters of a two-port over frequency, as a data file holds them. */
export interface TwoPortData {
  /** Hertz, rising. */
  readonly frequenciesHz: NumberList;
  readonly s11: ReImSamples;
  readonly s21: ReImSamples;
  readonly s12: ReImSamples;
  readonly s22: ReImSamples;
  /** Reference resistance of both ports, ohms; 50 when absent. */
  readonly referenceOhms?: number | undefined;
  /** Lines for the head of the file. */
  readonly comments?: readonly string[] | undefined;
}

/** Names of the S-parameters in the order in which a two-port record holds them. */
export const RECORD_ORDER = ['s11', 's21', 's12', 's22'] as const;

function refusal(code: string, argument: string, found: string, allowed: string, hint: string): FilterFailure {
  const text = `${code} ${argument}: found ${found}; allowed ${allowed}; ${hint}`;
  return new FilterFailure(code, text, { argument, value: found, limit: allowed, hint });
}

function isList(value: unknown): value is NumberList {
  return Array.isArray(value) || (ArrayBuffer.isView(value) && 'length' in value);
}

function checkNumbers(name: string, list: unknown): NumberList {
  if (!isList(list)) throw refusal('E_TYPE', name, typeof list, 'an array of numbers', 'pass an array');
  for (let n = 0; n < list.length; n += 1) {
    const value: unknown = list[n];
    const where = `${name}[${n}]`;
    if (typeof value !== 'number') throw refusal('E_TYPE', where, typeof value, 'a number', 'replace the entry');
    if (!Number.isFinite(value))
      throw refusal('E_NOT_FINITE', where, String(value), 'a finite number', 'replace the entry');
  }
  return list;
}

function checkFrequencies(list: unknown): number {
  const hertz = checkNumbers('frequenciesHz', list);
  if (hertz.length === 0) throw refusal('E_TS_EMPTY', 'frequenciesHz', 'no frequency', 'one or more', 'give a grid');
  for (let n = 0; n < hertz.length; n += 1) {
    const [before, here] = [hertz[n - 1] ?? -1, hertz[n] ?? 0];
    const where = `frequenciesHz[${n}]`;
    if (here < 0) throw refusal('E_TS_FREQUENCY', where, `${here} Hz`, '0 Hz or more', 'remove the entry');
    if (here > before) continue;
    throw refusal('E_TS_ORDER', where, `${here} Hz after ${before} Hz`, 'rising frequencies', 'sort the grid');
  }
  return hertz.length;
}

/** Checks two-port data at the room's door; gives the number of frequencies. */
export function checkTwoPortData(data: TwoPortData): number {
  if (typeof data !== 'object' || data === null) {
    throw refusal(
      'E_TYPE',
      'data',
      String(data),
      'an object with frequenciesHz and four S-parameters',
      'pass an object',
    );
  }
  const points = checkFrequencies(data.frequenciesHz);
  for (const name of RECORD_ORDER) {
    for (const part of ['re', 'im'] as const) {
      const where = `${name}.${part}`;
      const { length } = checkNumbers(where, data[name]?.[part]);
      if (length === points) continue;
      throw refusal('E_TS_COUNT', where, `${length} values`, `${points}, one for each frequency`, 'match the lengths');
    }
  }
  const ohms: unknown = data.referenceOhms ?? 50;
  if (typeof ohms !== 'number' || !(ohms > 0 && ohms < Number.POSITIVE_INFINITY)) {
    throw refusal(
      'E_TS_OPTION',
      'referenceOhms',
      String(ohms),
      'a positive number of ohms',
      'leave it out for 50 ohms',
    );
  }
  return points;
}
