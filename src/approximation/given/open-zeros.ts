import type { FilterPolynomials } from '../../forms/index.js';
import { type Complex, complex, divide, magnitude, multiply, refusal, subtract } from '../../numerics/index.js';

/** A change of S11 that the last digit of the data may cause: more, and the data do not say what S11 is. */
const MOST = 1e-7;

/** S11 on the axis, factor by factor. */
function reflectionAt({ poles, reflectionZeros, epsilonR }: FilterPolynomials, omega: number): Complex {
  return poles.reduce<Complex>(
    (product, pole, n) => {
      const zero = reflectionZeros[n];
      const above = zero === undefined ? complex(1, 0) : complex(-zero.re, omega - zero.im - (zero.imRest ?? 0));
      return multiply(product, divide(above, complex(-pole.re, omega - pole.im - (pole.imRest ?? 0))));
    },
    complex(1 / epsilonR, 0),
  );
}

/** Frequencies where S11 shows a shift of its zeros: beside each root, and outside all of them. */
function looked({ poles, reflectionZeros }: FilterPolynomials): readonly number[] {
  const roots = [...poles, ...reflectionZeros];
  const outermost = Math.max(...roots.map(({ re, im }) => Math.hypot(re, im)));
  return [...roots.flatMap(({ re, im }) => [im - re, im, im + re]), -1.5 * outermost, 1.5 * outermost];
}

/**
 * Refuses reflection zeros that the data leave open: those found from the data and from the same data with their last digit
 * changed must give one S11. Where the band reflects little more power than poles are rounded to, they do not.
 *
 * @throws FilterFailure E_ILL_CONDITIONED
 */
export function refuseOpenZeros(found: FilterPolynomials, nudged: FilterPolynomials, tolerance: number): void {
  const apart = looked(found).map((omega) =>
    magnitude(subtract(reflectionAt(found, omega), reflectionAt(nudged, omega))),
  );
  const worst = Math.max(...apart);
  if (worst <= Math.max(MOST, tolerance)) return;
  throw refusal(
    'E_ILL_CONDITIONED',
    'poles',
    `S11 off by ${worst.toExponential(1)} with their last digit`,
    `a change of at most ${MOST}`,
    'give the reflection zeros, or a tolerance as large as that change',
  );
}
