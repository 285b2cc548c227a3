/**
 * A pair of complementary moduli, `k^2 + kPrime^2 = 1`, given by the nome.
 *
 * Both keep all their digits, however close one of them is to 1; `decay = -ln q = pi*K'/K` stands for the nome q itself,
 * for the nome of the other modulus has `pi^2/decay`, and `q^N` has `N*decay`: no transformation subtracts anything.
 */
export interface Modulus {
  readonly k: number;
  readonly kPrime: number;
  readonly decay: number;
}

/** With q <= exp(-pi) the factors of the products below differ from 1 by q^(2n-2) at most: exp(-14*pi) at n = 8 is rounding. */
export const TERMS = 8;

/** The modulus whose nome is `exp(-decay)`. */
export function modulusOfDecay(decay: number): Modulus {
  if (decay < Math.PI) {
    const { k, kPrime } = modulusOfDecay(Math.PI ** 2 / decay);
    return { k: kPrime, kPrime: k, decay };
  }
  const q = Math.exp(-decay);
  let [lower, upper] = [1, 1];
  for (let n = 1; n <= TERMS; n++) {
    const odd = q ** (2 * n - 1);
    lower *= (1 + q ** (2 * n)) / (1 + odd);
    upper *= (1 - odd) / (1 + odd);
  }
  return { k: 4 * Math.exp(-decay / 2) * lower ** 4, kPrime: upper ** 4, decay };
}

/** The modulus k with its complement known to all digits: `K'/K` as a quotient of two arithmetic-geometric means. */
export function modulusOf(k: number, kPrime: number): Modulus {
  return { k, kPrime, decay: (Math.PI * commonMean(kPrime)) / commonMean(k) };
}

/** Limit of the arithmetic-geometric mean of 1 and x; it converges quadratically. */
function commonMean(x: number): number {
  let [a, b] = [1, x];
  for (let step = 0; step < MOST_MEANS && a !== b; step++) [a, b] = [(a + b) / 2, Math.sqrt(a * b)];
  return (a + b) / 2;
}

/** 1 and 1e-300 meet after 15 means; a modulus next to 1 is below 1e-300 as soon. */
const MOST_MEANS = 20;

/**
 * `F(atan(tangent))/K` for the modulus that is complementary to `ripple`: the part of the quarter period at which the function
 * sn/cn reaches `tangent`.
 *
 * There sn of the modulus `ripple` itself is `j*tangent`; Landen's transformation takes that modulus to 0, where sn is the sine.
 * Every step adds positive numbers only, so that tangents far above 1 keep their digits.
 */
export function partOfQuarterPeriod(tangent: number, ripple: Modulus): number {
  let [{ k, kPrime }, value] = [ripple, tangent];
  for (let step = 0; step < MOST_MEANS && k > 0; step++) {
    const next = (k / (1 + kPrime)) ** 2;
    value *= 2 / ((1 + next) * (1 + Math.hypot(1, k * value)));
    kPrime = (2 * Math.sqrt(kPrime)) / (1 + kPrime);
    k = next;
  }
  return (2 * Math.asinh(value)) / ripple.decay;
}
