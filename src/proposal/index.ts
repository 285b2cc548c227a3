/** Proposal: from a mask to designs: order and transmission zeros with the proof that no other placement is better.
 *  Takes    a rejection mask, normalized or in hertz, a return loss, unloaded Q, wanted margins
 *  Gives    transmission zeros with the enclosure of the best margin; ranked designs with margins, loss and what the mask costs
 *  Refuses  E_MASK, E_ZERO_COUNT, E_ZERO_IN_PASSBAND, E_CHOICE, E_NO_CONVERGENCE, E_STOPPED and what the doors of the specification refuse
 *  Source   P. C. Fenton, A min-max theorem for sums of translates of a function, J. Math. Anal. Appl. 244, 2000 (from memory) */
export type {
  ExcludedDesign,
  MaskCost,
  Proposal,
  ProposedDesign,
  SmallerDesign,
} from './design/proposal.js';
export { propose } from './design/propose.js';
export type { ProposeRequest, WantedMargins } from './design/request.js';
export type { LobeRequest } from './direct/place-zeros-for-lobes.js';
export { placeZerosForLobes } from './direct/place-zeros-for-lobes.js';
export type { PlaceZerosRequest, RejectionPiece } from './placement/place-zeros.js';
export { placeZeros } from './placement/place-zeros.js';
export type { ActiveMargin, ZeroPlacement } from './placement/zero-placement.js';
