import { add, type Complex, complex, divide, multiply, scale, squareRoot } from '../numerics/index.js';

/**
 * The filtering function as a phase.
 *
 * With `omega = cos(phi)` and `t = tan(phi/2)` a transmission zero at `w` adds the phase `2*atan(q*t)`,
 * `q = sqrt((w+1)/(w-1))`, to `Phi(phi)`; a zero at infinity has q = 1 and adds `phi` itself; then
 * `C_N(omega) = cos(Phi)`, and Phi climbs from 0 to N*pi. Derived from the sum of `acosh x_n` in R. J. Cameron,
 * General coupling matrix synthesis methods for Chebyshev filtering functions, IEEE Trans. MTT 47(4), 1999 (from
 * memory) through the half-angle map; every q keeps its digits however close w is to the band edge.
 */
export interface BandPhase {
  /** One entry a finite zero, sorted, so that the order in which zeros are given cannot change a bit of the result. */
  readonly finite: readonly PhaseZero[];
  /** How many zeros lie at infinity. */
  readonly atInfinity: number;
}

/** A finite transmission zero in both coordinates: omega plane, and the ratio q of its phase term. */
export interface PhaseZero {
  readonly w: Complex;
  readonly q: Complex;
}

/** Maps prescribed zeros (omega plane, complex) to the phase description. */
export function bandPhase(order: number, zerosOmega: readonly Complex[]): BandPhase {
  const finite = zerosOmega
    .map((w) => ({ w, q: halfAngleRatio(w) }))
    .sort((a, b) => a.q.re - b.q.re || Math.abs(a.q.im) - Math.abs(b.q.im) || a.q.im - b.q.im);
  return { finite, atInfinity: order - finite.length };
}

/** `sqrt((w+1)/(w-1))`, real part > 0; numerator and denominator are formed without cancellation. */
function halfAngleRatio(w: Complex): Complex {
  if (w.im === 0) return complex(Math.sqrt((w.re + 1) / (w.re - 1)), 0);
  const distance = (w.re - 1) * (w.re - 1) + w.im * w.im;
  return squareRoot(complex(((w.re - 1) * (w.re + 1) + w.im * w.im) / distance, (-2 * w.im) / distance));
}

/** Phi and its derivative at a real angle; a mirrored pair of complex zeros contributes the real part of its two terms. */
export function phaseAt(phase: BandPhase, phi: number): { readonly value: number; readonly slope: number } {
  const t = Math.tan(phi / 2);
  let value = phase.atInfinity * phi;
  let slope = phase.atInfinity;
  for (const { q } of phase.finite) {
    const { re, im } = q;
    if (im === 0) {
      value += 2 * Math.atan(re * t);
      slope += (re * (1 + t * t)) / (1 + re * re * t * t);
    } else {
      value += Math.atan2(re * t, 1 - im * t) + Math.atan2(re * t, 1 + im * t);
      slope += complexSlope(re, im, t);
    }
  }
  return { value, slope };
}

/** Real part of `q*(1+t^2)/(1+q^2 t^2)` for complex q: the derivative of the two half phases above. */
function complexSlope(re: number, im: number, t: number): number {
  const below = 1 + (re * re - im * im) * t * t;
  const across = 2 * re * im * t * t;
  return ((1 + t * t) * (re * below + im * across)) / (below * below + across * across);
}

/** Zeros farther out than this are handled by their distance in omega: in t they crowd at j, near the zeros at infinity. */
const FAR = 2;

/**
 * `exp(j*Phi)` and `dPhi/dphi` at a complex angle `phi`, as a product of N factors: a product of numbers near the unit
 * circle keeps sqrt(N) ulp, a sum of N arctangents would not, and no branch has to be chosen.
 *
 * A zero adds the factor `(1 + j*q*t)/(1 - j*q*t)` and the slope `q*(1 + t^2)/(1 + q^2*t^2)`. With
 * `1 + q^2*t^2 = 2*(w - omega)/((w - 1)*(1 + omega))` both follow from w - omega as well; whichever does not cancel is used.
 */
export function phasorAt(phase: BandPhase, phi: Complex): { readonly phasor: Complex; readonly slope: Complex } {
  const t = tangentOfHalf(phi);
  const omega = cosine(phi);
  const edgeDistance = complex(1 + omega.re, omega.im);
  const tt = multiply(t, t);
  const onePlus = complex(1 + tt.re, tt.im);
  const m = phase.atInfinity;
  const decay = Math.exp(-m * phi.im);
  let phasor = complex(decay * Math.cos(m * phi.re), decay * Math.sin(m * phi.re));
  let slope = complex(m, 0);
  for (const { w, q } of phase.finite) {
    const qt = multiply(q, t);
    const below = complex(1 + qt.im, -qt.re);
    if (w.re * w.re + w.im * w.im > FAR * FAR) {
      const away = complex(w.re - omega.re, w.im - omega.im);
      const edge = complex(w.re - 1, w.im);
      const square = divide(scale(away, 2), multiply(edge, edgeDistance));
      phasor = multiply(phasor, divide(square, multiply(below, below)));
      slope = add(slope, divide(multiply(q, edge), away));
    } else {
      const qtqt = multiply(qt, qt);
      phasor = multiply(phasor, divide(complex(1 - qt.im, qt.re), below));
      slope = add(slope, divide(multiply(q, onePlus), complex(1 + qtqt.re, qtqt.im)));
    }
  }
  return { phasor, slope };
}

function cosine(phi: Complex): Complex {
  return complex(Math.cos(phi.re) * Math.cosh(phi.im), -Math.sin(phi.re) * Math.sinh(phi.im));
}

/** `tan(phi/2) = (sin x + j sinh y)/(cos x + cosh y)`; no cancellation for x in (0, pi/2]. */
function tangentOfHalf(phi: Complex): Complex {
  const below = Math.cos(phi.re) + Math.cosh(phi.im);
  return complex(Math.sin(phi.re) / below, Math.sinh(phi.im) / below);
}
