import { checkPolynomials, type FilterPolynomials, type FineRoot } from '../forms/index.js';
import { complex, EPS, refusal } from '../numerics/index.js';

/**
 * The band-stop response of a low-pass one: S11 and S21 change places.
 *
 * What was reflected passes and what passed is reflected: the pass band of the given response becomes the stop band, its
 * return loss the rejection. The result has as many finite transmission zeros as its order, all power passes at infinite
 * frequency when the given response had fewer, and its matrix has a direct coupling (1 then). `family` is `lossless`: it
 * obeys no law of its own.
 *
 * Refused (E_NOT_RECIPROCAL): reflection zeros off the axis without their mirror image, as those of `bessel`, since no
 * reciprocal network has such transmission zeros; and (E_ZERO_COUNT) a response whose order exceeds the number of its
 * finite transmission zeros by an odd number, or that has some of them off the axis without being fully canonical, for then
 * S11 and S22 differ in sign, which the form of the polynomials does not hold. Cost O(N^2).
 *
 * @throws FilterFailure E_NOT_RECIPROCAL, E_ZERO_COUNT, E_TYPE, E_NOT_FINITE, E_POLYNOMIALS
 *
 * Source: R. J. Cameron, M. Yu, Y. Wang, Direct-coupled microwave filters with single and dual stopbands, IEEE Trans. MTT
 * 53(11), 2005 (the exchange; from memory).
 *
 * @example
 * const notch = bandstop(chebyshev({ order: 4, returnLossDb: 20 }));
 * notch.transmissionZeros.length; // 4
 * transversal(notch).values[0][5].toFixed(6); // '1.000000'
 */
export function bandstop(polynomials: FilterPolynomials): FilterPolynomials {
  const { order, poles, reflectionZeros, transmissionZeros, epsilon, epsilonR } = checkPolynomials(polynomials);
  checkMirrored(reflectionZeros);
  checkCount(order, transmissionZeros);
  return {
    family: 'lossless',
    order,
    poles,
    reflectionZeros: transmissionZeros,
    transmissionZeros: reflectionZeros.map(({ re, im }) => complex(re, im)),
    // The direct coupling comes out positive.
    transmissionLead: complex(0, -1),
    epsilon: epsilonR,
    epsilonR: epsilon,
  };
}

/** Mirror images may differ by this many units in the last place, as in every list of zeros. */
const PAIR_ULPS = 4;

function checkMirrored(zeros: readonly FineRoot[]): void {
  const open = zeros.filter(({ re }) => re < 0);
  for (const zero of zeros.filter(({ re }) => re > 0)) {
    const limit = PAIR_ULPS * EPS * Math.hypot(zero.re, zero.im);
    const index = open.findIndex(({ re, im }) => Math.hypot(zero.re + re, zero.im - im) <= limit);
    if (index < 0) refuseUnpaired(zero);
    open.splice(index, 1);
  }
  if (open[0] !== undefined) refuseUnpaired(open[0]);
}

function refuseUnpaired({ re, im }: FineRoot): never {
  throw refusal(
    'E_NOT_RECIPROCAL',
    'polynomials.reflectionZeros',
    `${re.toPrecision(6)}${im < 0 ? ' - ' : ' + '}${Math.abs(im).toPrecision(6)}j without its mirror image`,
    'zeros on the imaginary axis, or in pairs z and -conj z',
    'no reciprocal network has this as a transmission zero; take a response with S11 = S22',
  );
}

function checkCount(order: number, zeros: FilterPolynomials['transmissionZeros']): void {
  const missing = order - zeros.length;
  if (missing === 0 || (missing % 2 === 0 && zeros.every(({ re }) => re === 0))) return;
  throw refusal(
    'E_ZERO_COUNT',
    'polynomials.transmissionZeros',
    `${zeros.length} with order ${order}`,
    'as many as the order, or an even number fewer, all on the axis',
    'change the order by one, or the number of finite transmission zeros',
  );
}
