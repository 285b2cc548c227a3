import type { Certificate, Complex } from './forms/index.js';
import { FilterFailure } from './numerics/index.js';
import type { Specification } from './specification/index.js';

/** Distances from the band edge that are tried for the hint, smallest first. */
const DISTANCES: readonly number[] = [1e-8, 1e-7, 1e-6, 1e-5, 1e-4, 1e-3, 1e-2];

/**
 * Throws E_CERT when a certificate does not hold: every failed one with its size and limit, and the nearest change that
 * passes. `certificatesOf` synthesizes a changed specification; it runs only here, after a failure.
 */
export function refuseUncertified(
  certificates: readonly Certificate[],
  specification: Specification,
  certificatesOf: (changed: Specification) => readonly Certificate[],
): void {
  const failed = certificates.filter(({ holds }) => !holds);
  if (failed.length === 0) return;
  const hint = hintFor(specification, certificatesOf);
  const faults = failed.map(
    ({ check, value, limit }) =>
      new FilterFailure(
        'E_CERT',
        `E_CERT ${check}: found ${value.toPrecision(3)}; allowed ${limit.toPrecision(3)}; ${hint}`,
        {
          argument: check,
          value,
          limit,
          hint,
        },
      ),
  );
  const [{ argument = '', value, limit }] = faults as [FilterFailure];
  throw new FilterFailure('E_CERT', faults.map(({ message }) => message).join('\n'), {
    argument,
    value,
    limit,
    hint,
    faults,
  });
}

function hintFor(
  specification: Specification,
  certificatesOf: (changed: Specification) => readonly Certificate[],
): string {
  const distance = DISTANCES.find((tried) =>
    passes({ ...specification, transmissionZeros: movedOut(specification.transmissionZeros, tried) }, certificatesOf),
  );
  if (distance === undefined) return 'lower the order, the return loss or the number of zeros near the band edge';
  const nearest = nearestPassing(specification, certificatesOf, distance / 10, distance);
  return `move the transmission zeros out to |omega| >= ${Number((1 + nearest).toPrecision(12))}, which passes: closer ones leave the matrix too few digits`;
}

/** Halves the decade between a distance that fails and one that passes, in the logarithm, to a fifth of it. */
function nearestPassing(
  specification: Specification,
  certificatesOf: (changed: Specification) => readonly Certificate[],
  fails: number,
  passing: number,
): number {
  let [low, high] = [fails, passing];
  for (let turn = 0; turn < 3; turn++) {
    const middle = Number(Math.sqrt(low * high).toPrecision(2));
    const zeros = movedOut(specification.transmissionZeros, middle);
    if (passes({ ...specification, transmissionZeros: zeros }, certificatesOf)) high = middle;
    else low = middle;
  }
  return high;
}

function passes(changed: Specification, certificatesOf: (changed: Specification) => readonly Certificate[]): boolean {
  try {
    return certificatesOf(changed).every(({ holds }) => holds);
  } catch {
    // A change that cannot be synthesized is no suggestion.
    return false;
  }
}

/** Axis zeros closer to the band edge than `distance` are put there. */
function movedOut(zeros: readonly Complex[], distance: number): readonly Complex[] {
  return zeros.map((zero) => {
    if (zero.re !== 0 || Math.abs(zero.im) >= 1 + distance) return zero;
    return { re: 0, im: Math.sign(zero.im) * (1 + distance) };
  });
}
