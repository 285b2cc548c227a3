import { type Complex, powerOfJ } from '../numerics/index.js';

/**
 * Leading coefficient of P: `(-j)^(N+1) * j^(axis zeros above the band) * (-j)^(axis zeros below) * (-1)^(pairs off the axis)`.
 *
 * With it S21 keeps its phase in the band as a zero moves in from infinity, and a matrix with a positive main line has
 * exactly this S21.
 */
export function transmissionLead(order: number, zeros: readonly Complex[]): Complex {
  const onAxis = zeros.filter((zero) => zero.re === 0);
  const above = onAxis.filter((zero) => zero.im > 0).length;
  const below = onAxis.length - above;
  const pairs = (zeros.length - onAxis.length) / 2;
  return powerOfJ(-(order + 1) + above - below + 2 * pairs);
}
