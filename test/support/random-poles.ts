import { type Complex, FilterFailure, generalizedChebyshev, scatteringAt } from '../../src/index.js';
import { seeded } from './random.js';

type Zero = number | Complex;

const LEVELS_DB: readonly number[] = [0.01, 0.5, 3, 20, 40, 54, 60, 80, 100];

/** Orders 1 to 8 with axis zeros, repeated ones, and pairs down to 0.01 from the axis: where poles once merged or crossed over. */
function crowdedZeros(order: number, random: () => number): Zero[] {
  const zeros: Zero[] = [];
  while (zeros.length < order && random() < 0.8) {
    const kind = random();
    if (kind < 0.4 && zeros.length + 2 <= order) {
      const re = 0.01 + 1.5 * random() * random();
      const im = random() < 0.3 ? 0 : 3 * (random() - 0.5);
      zeros.push({ re, im }, { re: -re, im });
    } else if (kind < 0.6 && typeof zeros[0] === 'number') {
      zeros.push(zeros[0]);
    } else {
      zeros.push((random() < 0.5 ? -1 : 1) * (1 + 10 ** (-3 + 4 * random())));
    }
  }
  return zeros;
}

function isLossless(response: ReturnType<typeof generalizedChebyshev>): boolean {
  if (response.poles.some(({ re }) => re >= 0)) return false;
  return [-2, -0.9, -0.3, 0.1, 0.6, 0.99, 1.2].every((omega) => {
    const { s11, s21 } = scatteringAt(response, omega);
    return Math.abs(s11.re ** 2 + s11.im ** 2 + s21.re ** 2 + s21.im ** 2 - 1) < 1e-9;
  });
}

/** Counts responses with a pole on the wrong side or an unbalanced power, and refusals. */
export function tallyPoles(
  seed: number,
  specs: number,
): { readonly wrong: readonly string[]; readonly refused: readonly string[] } {
  const random = seeded(seed);
  const [wrong, refused]: [string[], string[]] = [[], []];
  for (let n = 0; n < specs; n++) {
    const order = 1 + Math.floor(8 * random());
    const transmissionZeros = crowdedZeros(order, random);
    const returnLossDb = LEVELS_DB[Math.floor(LEVELS_DB.length * random())] as number;
    const request = { order, returnLossDb, transmissionZeros };
    try {
      if (!isLossless(generalizedChebyshev(request))) wrong.push(JSON.stringify(request));
    } catch (error) {
      if (!(error instanceof FilterFailure)) throw error;
      refused.push(`${error.code} ${JSON.stringify(request)}`);
    }
  }
  return { wrong, refused };
}
