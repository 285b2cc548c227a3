/** One run-time check of a result: what was checked, the size found, the limit, and whether it holds. */
export interface Certificate {
  readonly check: string;
  readonly value: number;
  readonly limit: number;
  readonly holds: boolean;
}
