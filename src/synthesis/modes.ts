import type { FilterPolynomials, FineRoot } from '../forms/index.js';
import { type Complex, complex, divide, magnitude, multiply, scale } from '../numerics/index.js';

/** The poles of the two modes of a two-port with S11 = S22: `even` belongs to S11 + S21, `odd` to S11 - S21. */
export interface Modes {
  readonly even: readonly FineRoot[];
  readonly odd: readonly FineRoot[];
}

/**
 * Sorts the poles into the two modes; undefined when they do not sort.
 *
 * `S11 + S21` and `S11 - S21` are all-pass, so at each pole the numerator of one of them vanishes: there
 * `(F/epsilonR)/(P/epsilon)` is -1 for a pole of S11 - S21 and +1 for a pole of S11 + S21. A ratio that is neither shows
 * that S11 and S22 differ, or a pole so narrow that rounding hides the sign.
 */
export function modesOf(polynomials: FilterPolynomials): Modes | undefined {
  const even: FineRoot[] = [];
  const odd: FineRoot[] = [];
  for (const pole of polynomials.poles) {
    const ratio = ratioAt(polynomials, pole);
    const toEven = magnitude(complex(ratio.re - 1, ratio.im));
    const toOdd = magnitude(complex(ratio.re + 1, ratio.im));
    if (!(Math.min(toEven, toOdd) < RATIO_ROOM)) return undefined;
    (toEven < toOdd ? even : odd).push(pole);
  }
  return { even, odd };
}

/**
 * A lossless symmetric response has the ratio +-1 up to rounding of the roots, which a narrow pole magnifies by 1/|Re p|:
 * 1e-16/1e-8 at worst. Half the distance still tells the two signs apart; what is wrong beyond that the certificates find.
 */
const RATIO_ROOM = 0.5;

/** `(F/epsilonR)/(P/epsilon)` in product form; factors are paired so that no partial product overflows first. */
function ratioAt(polynomials: FilterPolynomials, s: Complex): Complex {
  const lead = polynomials.transmissionLead;
  // 1/lead = conj(lead), a unit.
  let ratio = scale(complex(lead.re, -lead.im), polynomials.epsilon / polynomials.epsilonR);
  polynomials.poles.forEach((_, n) => {
    const reflection = polynomials.reflectionZeros[n];
    if (reflection !== undefined) ratio = multiply(ratio, complex(s.re - reflection.re, s.im - reflection.im));
    const transmission = polynomials.transmissionZeros[n];
    if (transmission !== undefined) ratio = divide(ratio, complex(s.re - transmission.re, s.im - transmission.im));
  });
  return ratio;
}
