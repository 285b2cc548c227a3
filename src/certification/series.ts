/** Complex values over the sample points, split in real and imaginary parts. */
export interface Series {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** The scattering parameters of one source (matrix or roots) over the sample points. */
export interface Response {
  readonly omega: Float64Array;
  readonly s11: Series;
  readonly s21: Series;
  readonly s12: Series;
  readonly s22: Series;
}

export function emptySeries(length: number): Series {
  return { re: new Float64Array(length), im: new Float64Array(length) };
}

/** |value|^2 at point i. */
export function squared(series: Series, i: number): number {
  const re = series.re[i] as number;
  const im = series.im[i] as number;
  return re * re + im * im;
}

/** |a - b| at point i. */
export function distance(a: Series, b: Series, i: number): number {
  const re = (a.re[i] as number) - (b.re[i] as number);
  const im = (a.im[i] as number) - (b.im[i] as number);
  return Math.sqrt(re * re + im * im);
}
