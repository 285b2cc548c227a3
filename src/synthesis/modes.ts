import type { FilterPolynomials, FineRoot } from '../forms/index.js';
import { type Complex, complex, divide, FilterFailure, magnitude, multiply, scale } from '../numerics/index.js';

/** The poles of the two modes of a two-port with S11 = S22: `even` belongs to S11 + S21, `odd` to S11 - S21. */
export interface Modes {
  readonly even: readonly FineRoot[];
  readonly odd: readonly FineRoot[];
}

/**
 * Sorts the poles into the two modes.
 *
 * `S11 + S21` and `S11 - S21` are all-pass, so at each pole the numerator of one of them vanishes: there
 * `(F/epsilonR)/(P/epsilon)` is -1 for a pole of S11 - S21 and +1 for a pole of S11 + S21. A ratio that is neither shows
 * that S11 and S22 differ or that the polynomials are not lossless.
 *
 * @throws FilterFailure E_NOT_SYMMETRIC_RESPONSE
 */
export function modesOf(polynomials: FilterPolynomials): Modes {
  const even: FineRoot[] = [];
  const odd: FineRoot[] = [];
  polynomials.poles.forEach((pole, index) => {
    const ratio = ratioAt(polynomials, pole);
    const toEven = magnitude(complex(ratio.re - 1, ratio.im));
    const toOdd = magnitude(complex(ratio.re + 1, ratio.im));
    if (!(Math.min(toEven, toOdd) < RATIO_ROOM)) refuseRatio(index, Math.min(toEven, toOdd));
    (toEven < toOdd ? even : odd).push(pole);
  });
  return { even, odd };
}

/**
 * A lossless symmetric response has the ratio +-1 up to rounding of the roots, which a narrow pole magnifies by 1/|Re p|:
 * 1e-16/1e-8 at worst. Half the distance still tells the two signs apart; what is wrong beyond that the certificates find.
 */
const RATIO_ROOM = 0.5;

function refuseRatio(index: number, distance: number): never {
  throw new FilterFailure(
    'E_NOT_SYMMETRIC_RESPONSE',
    `E_NOT_SYMMETRIC_RESPONSE polynomials: found a pole (index ${index}) where S11 and S21 differ by ${distance.toExponential(2)} from an even or odd mode; allowed lossless responses with S11 = S22; check the reflection zeros (they must lie on the imaginary axis) and epsilon`,
    {
      argument: 'polynomials',
      value: distance,
      limit: RATIO_ROOM,
      hint: 'reflection zeros must lie on the imaginary axis',
    },
  );
}

/** `(F/epsilonR)/(P/epsilon)` in product form; factors are paired so that no partial product overflows first. */
function ratioAt(polynomials: FilterPolynomials, s: Complex): Complex {
  const lead = polynomials.transmissionLead;
  // 1/lead = conj(lead), a unit.
  let ratio = scale(complex(lead.re, -lead.im), polynomials.epsilon / polynomials.epsilonR);
  polynomials.reflectionZeros.forEach((zero, n) => {
    ratio = multiply(ratio, complex(s.re - zero.re, s.im - zero.im));
    const transmission = polynomials.transmissionZeros[n];
    if (transmission !== undefined) ratio = divide(ratio, complex(s.re - transmission.re, s.im - transmission.im));
  });
  return ratio;
}
