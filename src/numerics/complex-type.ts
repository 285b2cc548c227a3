/** A complex number as plain data. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}
