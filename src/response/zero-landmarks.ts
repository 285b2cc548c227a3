import { type Complex, complex, complexEigenvalues, divide, multiply, squareRoot } from '../numerics/index.js';

/** A resonance as the ports see it: complex frequency (loss below the axis) and its share `source*load` in S21. */
export interface Residue {
  readonly lambda: Complex;
  readonly share: number;
}

/**
 * The transmission zeros of `x(omega) = direct - sum share/(omega - lambda)`, complex frequencies, without expanding it.
 *
 * About a point sigma where x is not small, with `mu = 1/(omega - sigma)`, the zeros are eigenvalues of a diagonal matrix
 * plus a rank-one term: `diag(e) + b c^T/x(sigma)`, `e = 1/(lambda - sigma)`, `b c = share*e^2`. Zeros at infinity come out as
 * mu near 0 and are left out. Sigma lies off the axis in the middle of the band, about as far as the poles do.
 *
 * Source: zeros of a state-space system through its inverse (common practice, no source).
 */
export function zerosOf(residues: readonly Residue[], direct: number): readonly Complex[] {
  if (residues.length === 0) return [];
  const sigma = complex(0, 1 / residues.length);
  const inverses = residues.map(({ lambda }) =>
    divide(complex(1, 0), complex(lambda.re - sigma.re, lambda.im - sigma.im)),
  );
  // 1/(sigma - lambda) = -e
  const level = residues.reduce(
    (sum, { share }, k) => {
      const { re, im } = inverses[k] as Complex;
      return complex(sum.re + share * re, sum.im + share * im);
    },
    complex(direct, 0),
  );
  if (level.re === 0 && level.im === 0) return [];
  const roots = residues.map(({ share }, k) => multiply(inverses[k] as Complex, squareRoot(complex(share, 0))));
  const rows = inverses.map((inverse, i) =>
    roots.map((root, j) => {
      const { re, im } = divide(multiply(roots[i] as Complex, root), level);
      return i === j ? complex(inverse.re - re, inverse.im - im) : complex(-re, -im);
    }),
  );
  const part = (name: 're' | 'im'): Float64Array[] => rows.map((row) => Float64Array.from(row, (value) => value[name]));
  return complexEigenvalues({ re: part('re'), im: part('im') })
    .filter(({ re, im }) => Math.hypot(re, im) > SMALLEST_MU)
    .map((mu) => {
      const away = divide(complex(1, 0), mu);
      return complex(sigma.re + away.re, sigma.im + away.im);
    });
}

/** Zeros beyond 1e4 band widths are not told from infinity. */
const SMALLEST_MU = 1e-4;
