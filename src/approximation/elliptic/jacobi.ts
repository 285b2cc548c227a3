import { type Modulus, TERMS } from './modulus.js';

/** The three elliptic functions of Jacobi at one real argument. */
export interface JacobiValues {
  readonly sn: number;
  readonly cn: number;
  readonly dn: number;
}

/**
 * sn, cn and dn at `part*K`; `rest` is 1 - part, so that neither end of the quarter period loses digits.
 *
 * Products of the theta functions in the smaller of the two nomes: every factor is positive and formed without
 * cancellation, so that each value keeps its digits however small it is.
 *
 * Source: C. G. J. Jacobi, Fundamenta nova theoriae functionum ellipticarum, 1829 (the products; from memory).
 */
export function jacobi(part: number, rest: number, modulus: Modulus): JacobiValues {
  return modulus.decay < Math.PI ? hyperbolic(part, rest, modulus) : circular(part, rest, modulus);
}

/** Products in q = exp(-decay), the nome of the modulus itself. */
function circular(part: number, rest: number, { kPrime, decay }: Modulus): JacobiValues {
  const q = Math.exp(-decay);
  const sine = Math.sin((Math.PI * part) / 2);
  const cosine = Math.sin((Math.PI * rest) / 2);
  let [sn, cn, dn, lead] = [sine, cosine, 1, 1];
  for (let n = 1; n <= TERMS; n++) {
    const odd = q ** (2 * n - 1);
    const even = q ** (2 * n);
    const below = (1 - odd) ** 2 + 4 * odd * sine * sine;
    sn *= ((1 - even) ** 2 + 4 * even * sine * sine) / below;
    cn *= ((1 - even) ** 2 + 4 * even * cosine * cosine) / below;
    dn *= ((1 - odd) ** 2 + 4 * odd * cosine * cosine) / below;
    lead *= (1 + odd) / (1 + even);
  }
  const root = Math.sqrt(kPrime);
  return { sn: lead * lead * sn, cn: lead * lead * root * cn, dn: root * dn };
}

/** Products in exp(-pi^2/decay), the nome of the complementary modulus: the functions of an imaginary argument. */
function hyperbolic(part: number, rest: number, { k, decay }: Modulus): JacobiValues {
  const rate = Math.PI ** 2 / decay;
  const q = Math.exp(-rate);
  const a = rate / 2;
  let [sn, cn, dn, lead] = [Math.tanh(a * part), 1, 1, 1];
  for (let n = 1; n <= TERMS; n++) {
    sn *= Math.tanh(a * (2 * n - part)) * Math.tanh(a * (2 * n + part));
    const [near, far] = [rate * (2 * n - 2 + rest), rate * (2 * n - 1 + part)];
    const below = (1 + Math.exp(-rate * (2 * n - part))) * (1 + Math.exp(-rate * (2 * n + part)));
    cn *= (Math.expm1(-near) * Math.expm1(-far)) / below;
    dn *= ((1 + Math.exp(-near)) * (1 + Math.exp(-far))) / below;
    lead *= (1 + q ** (2 * n)) / (1 + q ** (2 * n - 1));
  }
  const height = (lead * lead) / Math.cosh(a * part);
  const root = Math.sqrt(k);
  return { sn: sn / root, cn: (height * cn) / root, dn: height * dn };
}
