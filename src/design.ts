import { approximate, coefficients, type PolynomialCoefficients, zerosAskedFor } from './approximation/index.js';
import { denormalize, evaluateMask, type HandOver } from './bandpass/index.js';
import { certify } from './certification/index.js';
import type { Certificate, CouplingMatrix, FilterPolynomials, MaskRow, Rotation } from './forms/index.js';
import { refuseUncertified } from './refusal.js';
import { checkSpecification, type Specification, type SpecificationInput } from './specification/index.js';
import { transversal } from './synthesis/index.js';
import { arrow, folded, type Reduced } from './topology/index.js';
import { VERSION } from './version.js';

/** A finished, certified design: everything that is handed over but the sampled response. */
export interface Design {
  readonly version: string;
  readonly specification: Specification;
  readonly polynomials: FilterPolynomials;
  readonly coefficients: PolynomialCoefficients;
  readonly transversal: CouplingMatrix;
  readonly matrix: CouplingMatrix;
  readonly rotations: readonly Rotation[];
  readonly handOver: HandOver;
  readonly mask: readonly MaskRow[];
  readonly certificates: readonly Certificate[];
}

/**
 * From a specification to a certified coupling matrix with its hand-over numbers and mask verdict.
 *
 * The specification is the object form of a design file (README, "The design file"): passband in hertz, order, return loss
 * in dB, transmission zeros, topology, unloaded Q, mask. A mask that is not met is a verdict in `mask`, not an error; a
 * certificate that does not hold is a refusal. Cost: about 6 ms at order 10, 30 ms at order 40, 0.2 s at
 * order 100, most of it certificates.
 *
 * @throws FilterFailure E_CERT, and every code of the specification room
 *
 * @example
 * const { handOver, mask } = design({
 *   passband: { lowerHz: '3822 MHz', upperHz: '3858 MHz' },
 *   order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45], unloadedQ: 9000,
 *   mask: [{ fromHz: '3868 MHz', rejectionDb: 34 }],
 * });
 * handOver.externalQ.source?.toFixed(2); // '99.46'
 * mask[0]?.margin.toFixed(2); // '2.31'
 */
export function design(specification: SpecificationInput): Design {
  return designChecked(checkSpecification(specification));
}

/** The flow itself, for a specification that has been checked. */
export function designChecked(specification: Specification): Design {
  const { polynomials, start, reduced, certificates } = synthesize(specification);
  const { matrix, rotations } = reduced;
  refuseUncertified(certificates, specification, (tried) => synthesize(tried).certificates);
  return {
    version: VERSION,
    specification: withZeros(specification, polynomials),
    polynomials,
    coefficients: coefficients(polynomials),
    transversal: start,
    matrix,
    rotations,
    handOver: denormalize(matrix, specification.band),
    mask: maskRows(specification, polynomials, matrix),
    certificates,
  };
}

/**
 * The verdict on the mask. With one Q for all resonators it comes from the transfer function, which the matrix is certified
 * to equal and which keeps its digits in the deep stop band, where a sweep of the matrix loses them; otherwise from the matrix.
 */
function maskRows(
  { band, unloadedQ, mask }: Specification,
  polynomials: FilterPolynomials,
  matrix: CouplingMatrix,
): readonly MaskRow[] {
  if (unloadedQ === undefined) return evaluateMask(polynomials, band, mask);
  return evaluateMask(typeof unloadedQ === 'number' ? polynomials : matrix, { ...band, unloadedQ }, mask);
}

/** The specification that documents tell: with the transmission zeros also where the family placed them and nobody asked. */
function withZeros(specification: Specification, { transmissionZeros }: FilterPolynomials): Specification {
  if (zerosAskedFor(specification) !== undefined) return specification;
  return Object.freeze({ ...specification, transmissionZeros });
}

/** Transfer function, matrices and certificates, whether these hold or not. */
function synthesize(specification: Specification): {
  polynomials: FilterPolynomials;
  start: CouplingMatrix;
  reduced: Reduced;
  certificates: readonly Certificate[];
} {
  const polynomials = approximate(specification);
  const start = transversal(polynomials);
  const reduced = shape(start, specification.topology);
  const askedZeros = zerosAskedFor(specification);
  const certificates = certify(polynomials, reduced.matrix, {
    before: start,
    rotations: reduced.rotations,
    leftover: reduced.leftover,
    structure: specification.topology,
    ...(askedZeros === undefined ? {} : { askedZeros }),
  });
  return { polynomials, start, reduced, certificates };
}

function shape(start: CouplingMatrix, topology: Specification['topology']): Reduced {
  if (topology === 'arrow') return arrow(start);
  if (topology === 'transversal') return { matrix: start, rotations: [], leftover: 0 };
  // Without finite zeros the folded form has no coupling across: it is the in-line form.
  return folded(start);
}
