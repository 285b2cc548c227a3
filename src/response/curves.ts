/** Complex samples as two arrays of doubles. */
export interface ComplexSamples {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** S-parameters and normalized group delay of S21 (-d phase/d omega) over a grid. `s12` is `s21`. */
export interface Curves {
  readonly s11: ComplexSamples;
  readonly s21: ComplexSamples;
  readonly s12: ComplexSamples;
  readonly s22: ComplexSamples;
  readonly groupDelay: Float64Array;
}

/** Room for a sweep's results; `sameReflection` shares one array between S11 and S22. */
export function emptyCurves(points: number, sameReflection: boolean): Curves {
  const samples = (): ComplexSamples => ({ re: new Float64Array(points), im: new Float64Array(points) });
  const s11 = samples();
  const s21 = samples();
  return { s11, s21, s12: s21, s22: sameReflection ? s11 : samples(), groupDelay: new Float64Array(points) };
}
