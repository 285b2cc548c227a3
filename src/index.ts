/**
 * irisloom: microwave band-pass filter synthesis, from a specification to a certified coupling matrix and the numbers that
 * hardware is made from. One call does it all (`design`); the steps are public too, in the order of the rooms.
 *
 * @packageDocumentation
 */
export type {
  BesselRequest,
  CoefficientsRequest,
  EllipticRequest,
  GeneralizedChebyshevRequest,
  GivenResponse,
  InverseChebyshevRequest,
  MagnitudeRequest,
  Moves,
  PolynomialCoefficients,
  Predistortion,
  PredistortionRequest,
  PrototypeElements,
  PrototypeRequest,
  ReflectionSides,
  RootsRequest,
  SquarePolynomial,
  TransmissionZero,
} from './approximation/index.js';
export {
  bandstop,
  bessel,
  butterworth,
  chebyshev,
  coefficients,
  elliptic,
  generalizedChebyshev,
  inlineMatrix,
  inverseChebyshev,
  predistort,
  prototypeElements,
  responseFromCoefficients,
  responseFromMagnitude,
  responseFromRoots,
} from './approximation/index.js';
export type {
  CouplingRow,
  HandOver,
  LossyBand,
  PortCouplingRow,
  PortPair,
  ResonatorRow,
  SweepHz,
} from './bandpass/index.js';
export { denormalize, evaluateMask, sweepHz } from './bandpass/index.js';
export type { CertificationContext, Structure } from './certification/index.js';
export { certify, certifyMatrix } from './certification/index.js';
export type { Design } from './design.js';
export { design } from './design.js';
export type {
  Band,
  Certificate,
  Complex,
  CouplingMatrix,
  Family,
  FilterPolynomials,
  FineRoot,
  Level,
  MaskLine,
  MaskRow,
  Rotation,
  Scattering,
  Span,
} from './forms/index.js';
export { bandFromEdges, edgesOfBand, hzFromOmega, omegaFromHz } from './forms/index.js';
export type { NumberList, ReImSamples, TwoPortData } from './measurement/index.js';
export { formatTouchstone } from './measurement/index.js';
export type { FailureDetail, PolynomialRoot } from './numerics/index.js';
export { FilterFailure, polynomialRoots } from './numerics/index.js';
export type {
  ActiveMargin,
  ExcludedDesign,
  LobeRequest,
  MaskCost,
  PlaceZerosRequest,
  Proposal,
  ProposedDesign,
  ProposeRequest,
  RejectionPiece,
  SmallerDesign,
  WantedMargins,
  ZeroPlacement,
} from './proposal/index.js';
export { placeZeros, placeZerosForLobes, propose } from './proposal/index.js';
export type { DesignReport, DesignSource, Drawing, Markup, Paint, Picture } from './report/index.js';
export {
  bandPicture,
  designPictures,
  groupDelayPicture,
  handOverCsv,
  matrixCsv,
  matrixPicture,
  pictureSvg,
  polesAndZerosPicture,
  reportHtml,
  reportMarkdown,
  resonatorPicture,
  responsePicture,
  responseText,
  resultJson,
  routingPicture,
  summaryText,
} from './report/index.js';
export type { ComplexSamples, Curves, Model, Sweep, SweepOptions } from './response/index.js';
export { scatteringAt, sweep } from './response/index.js';
export type {
  FrequencyInput,
  LevelInput,
  MaskLineInput,
  PassbandInput,
  PortCouplings,
  ReflectionSide,
  Specification,
  SpecificationFamily,
  SpecificationInput,
  SweepInput,
  SweepRange,
  Topology,
  ZeroInput,
} from './specification/index.js';
export { checkSpecification, parseSpecification, specificationJsonSchema } from './specification/index.js';
export { transversal } from './synthesis/index.js';
export type { Annihilation, Reduced, RotationRequest, RotationTrace, TraceStep } from './topology/index.js';
export { annihilate, applyRotations, arrow, folded, rotate, traceRotations } from './topology/index.js';
export { VERSION } from './version.js';
