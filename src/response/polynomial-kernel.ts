import type { FilterPolynomials, FineRoot } from '../forms/index.js';
import type { Curves } from './curves.js';

/** Roots as arrays of doubles: real part, imaginary part, its rest. */
interface RootArrays {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly rest: Float64Array;
}

function rootArrays(roots: readonly FineRoot[]): RootArrays {
  return {
    re: Float64Array.from(roots, ({ re }) => re),
    im: Float64Array.from(roots, ({ im }) => im),
    rest: Float64Array.from(roots, ({ imRest = 0 }) => imRest),
  };
}

/** Squares of distances stay in the range of doubles within this; beyond, a point is left to the function that scales. */
const FARTHEST = 1e140;

/**
 * Sweep of a product form with one common loss, O(N) a point: the same quotients as `scatteringOfPolynomials`, in scalars.
 * Gives false for a point that is too far out, which it leaves alone.
 *
 * One long function on purpose: its four products run in registers and share each pole's reciprocal square.
 */
export function polynomialKernel(
  polynomials: FilterPolynomials,
  loss: number,
): (w: number, out: Curves, n: number) => boolean {
  const poles = rootArrays(polynomials.poles);
  const reflection = rootArrays(polynomials.reflectionZeros);
  const transmission = rootArrays(polynomials.transmissionZeros);
  const { transmissionLead, epsilon, epsilonR } = polynomials;
  const count = poles.re.length;
  const [reflections, transmissions] = [reflection.re.length, transmission.re.length];
  return (w, out, n) => {
    if (Math.abs(w) > FARTHEST) return false;
    let s11Re = 1 / epsilonR;
    let s11Im = 0;
    let s22Re = s11Re;
    let s22Im = 0;
    let s21Re = transmissionLead.re / epsilon;
    let s21Im = transmissionLead.im / epsilon;
    let delay = 0;
    for (let k = 0; k < count; k++) {
      const a = loss - (poles.re[k] as number);
      const b = w - (poles.im[k] as number) - (poles.rest[k] as number);
      const inverse = 1 / (a * a + b * b);
      const c = a * inverse;
      const d = -b * inverse;
      delay += c;
      let x = c;
      let y = d;
      if (k < transmissions) {
        const p = loss - (transmission.re[k] as number);
        const q = w - (transmission.im[k] as number);
        x = p * c - q * d;
        y = p * d + q * c;
        const square = p * p + q * q;
        // Without loss, zeros on the axis or in mirrored pairs add nothing to the delay.
        if (loss !== 0 && square !== 0) delay -= p / square;
      }
      const t = s21Re * x - s21Im * y;
      s21Im = s21Re * y + s21Im * x;
      s21Re = t;
      x = c;
      y = d;
      let u = c;
      let v = d;
      if (k < reflections) {
        const f = reflection.re[k] as number;
        const q = w - (reflection.im[k] as number) - (reflection.rest[k] as number);
        const left = loss - f;
        const right = loss + f;
        x = left * c - q * d;
        y = left * d + q * c;
        u = right * c - q * d;
        v = right * d + q * c;
      }
      const e = s11Re * x - s11Im * y;
      s11Im = s11Re * y + s11Im * x;
      s11Re = e;
      const g = s22Re * u - s22Im * v;
      s22Im = s22Re * v + s22Im * u;
      s22Re = g;
    }
    out.s11.re[n] = s11Re;
    out.s11.im[n] = s11Im;
    out.s21.re[n] = s21Re;
    out.s21.im[n] = s21Im;
    out.s22.re[n] = s22Re;
    out.s22.im[n] = s22Im;
    out.groupDelay[n] = delay;
    return true;
  };
}
