/** What a refusal carries beside its code. `faults` lists every fault when there are several. */
export interface FailureDetail {
  readonly argument?: string;
  readonly value?: unknown;
  readonly limit?: unknown;
  readonly hint?: string;
  readonly faults?: readonly FilterFailure[];
  readonly cause?: unknown;
}

/**
 * The one error class of the package: misuse, impossible requests and failed certificates all throw it.
 *
 * `code` is stable and machine readable (`E_ORDER_RANGE`, `E_CERT`, ...), `message` says what was found,
 * what is allowed and what to do; `argument`, `value`, `limit` and `hint` hold the parts.
 *
 * @example
 * try {
 *   chebyshev({ order: 0, returnLossDb: 20 });
 * } catch (error) {
 *   console.log(error.code); // E_ORDER_RANGE
 * }
 */
export class FilterFailure extends Error {
  override readonly name = 'FilterFailure';
  readonly code: string;
  readonly argument: string | undefined;
  readonly value: unknown;
  readonly limit: unknown;
  readonly hint: string | undefined;
  readonly faults: readonly FilterFailure[];

  constructor(code: string, message: string, detail: FailureDetail = {}) {
    super(message, detail.cause === undefined ? undefined : { cause: detail.cause });
    this.code = code;
    this.argument = detail.argument;
    this.value = detail.value;
    this.limit = detail.limit;
    this.hint = detail.hint;
    this.faults = detail.faults ?? [];
  }
}

/** A refusal in the package's message form: what was found, what is allowed, what to do. Long values are cut. */
export function refusal(code: string, argument: string, value: unknown, limit: unknown, hint: string): FilterFailure {
  const message = `${code} ${argument}: found ${shown(value)}; allowed ${limit}; ${hint}`;
  return new FilterFailure(code, message, { argument, value, limit, hint });
}

/** At most 40 characters of a value; of an object only that it is one, since its own text may throw. */
function shown(value: unknown): string {
  if (typeof value === 'function') return 'a function';
  if (typeof value === 'object' && value !== null)
    return Array.isArray(value) ? `a list of ${value.length}` : 'an object';
  return String(value).slice(0, 40);
}
