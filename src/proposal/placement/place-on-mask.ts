import { EPS, refusal } from '../../numerics/index.js';
import { type NodeBounds, placeBounded } from './bounded.js';
import { spreadOf } from './equalize.js';
import type { LineProblem } from './lobes.js';
import { type Coordinate, type MaskPiece, PAIRS, SINGLE, segmentsOf, sideOf } from './mask-pieces.js';
import { kappaOf } from './rejection-level.js';
import { upperEnvelope } from './segments.js';
import type { ActiveMargin, ZeroPlacement } from './zero-placement.js';

/** A checked request. */
export interface PlacementRequest {
  readonly order: number;
  readonly zeroCount: number;
  readonly returnLossDb: number;
  readonly pieces: readonly MaskPiece[];
  readonly symmetric: boolean;
  readonly closestZero?: number | undefined;
  readonly zerosAbove?: number | undefined;
  readonly offsets?: readonly number[] | undefined;
}

/** Widest enclosure that is let out, dB. */
const WIDEST_ENCLOSURE = 1e-6;

/**
 * The best placement with its enclosure.
 *
 * @throws FilterFailure E_MASK, E_NO_CONVERGENCE
 */
export function placeOnMask(request: PlacementRequest): ZeroPlacement {
  const coordinate = request.symmetric ? PAIRS : SINGLE;
  const problem = lineProblem(request, coordinate);
  refuseFewPoints(problem, request);
  const bounded = placeBounded(problem, boundsOf(request, coordinate));
  if (bounded === undefined || !(spreadOf(bounded.lobes) <= WIDEST_ENCLOSURE)) throw notPlaced(request);
  const { nodes, lobes, pinned, weights } = bounded;
  const places = pinned.map(({ at }) => at);
  const margins = lobes.map(({ marginDb }) => marginDb);
  // Margins are sums of one logarithm a zero: their own rounding belongs to the enclosure.
  const rounding = 16 * EPS * (request.order + Math.max(...lobes.map(({ potential }) => 8.7 * potential)));
  return {
    order: request.order,
    ...zerosOf([...nodes, ...places], coordinate, request.order),
    marginDb: Math.min(...margins),
    lowestDb: Math.min(...margins) - rounding,
    highestDb: Math.max(...margins) + rounding,
    active: lobes.map((lobe, i) => {
      const piece = request.pieces.find(({ source }) => source === lobe.source) as MaskPiece;
      const side = coordinate.pairs ? sideOf(piece) : 1;
      return {
        omega: side * coordinate.toOmega(lobe.at),
        marginDb: lobe.marginDb,
        weight: Math.max(0, weights[i] as number),
        piece: lobe.source,
      } satisfies ActiveMargin;
    }),
    pinned: places.filter((t) => t !== 0).map(coordinate.toOmega),
  };
}

function lineProblem(request: PlacementRequest, coordinate: Coordinate): LineProblem {
  const { order, zeroCount, pieces, returnLossDb, offsets } = request;
  const share = coordinate.pairs ? 2 : 1;
  return {
    count: zeroCount / share,
    field: [{ at: 0, weight: (order - zeroCount) / share }],
    segments: upperEnvelope(segmentsOf(pieces, coordinate)),
    kappa: kappaOf(returnLossDb),
    ...(offsets === undefined ? {} : { offsets }),
  };
}

/** As many zeros as isolated points stand on the points, and no margin is the best one. */
function refuseFewPoints({ segments, count }: LineProblem, { symmetric }: PlacementRequest): void {
  if (segments.some(({ low, high }) => low < high) || segments.length > count) return;
  throw refusal(
    'E_MASK',
    'rejection',
    `${segments.length} isolated ${segments.length === 1 ? 'frequency' : 'frequencies'}, which ${count} ${symmetric ? 'pairs of zeros' : 'zeros'} would null one by one`,
    'a stretch, or more frequencies than zeros',
    'give the width that drift and setting need, or fewer zeros',
  );
}

/** Each zero between its bounds, counted from below. */
function boundsOf(
  { zeroCount, zerosAbove, closestZero }: PlacementRequest,
  { fromOmega, pairs }: Coordinate,
): readonly NodeBounds[] {
  const count = pairs ? zeroCount / 2 : zeroCount;
  const reach = closestZero === undefined ? Number.POSITIVE_INFINITY : fromOmega(closestZero);
  const below = zerosAbove === undefined ? undefined : zeroCount - zerosAbove;
  return Array.from({ length: count }, (_, j) => ({
    low: below !== undefined && j >= below ? 0 : -reach,
    high: below !== undefined && j < below ? 0 : reach,
  }));
}

function zerosOf(
  places: readonly number[],
  { toOmega, pairs }: Coordinate,
  order: number,
): Pick<ZeroPlacement, 'transmissionZeros' | 'atInfinity'> {
  const finite = places.map(toOmega).filter(Number.isFinite);
  const zeros = (pairs ? finite.flatMap((omega) => [omega, -omega]) : finite).sort((a, b) => a - b);
  return { transmissionZeros: zeros, atInfinity: order - zeros.length };
}

function notPlaced({ order, zeroCount }: PlacementRequest): Error {
  return refusal(
    'E_NO_CONVERGENCE',
    'rejection',
    `no placement of ${zeroCount} zeros at order ${order} with equal lobes`,
    `lobes within ${WIDEST_ENCLOSURE} dB of each other`,
    'move a line of the mask slightly, or ask for another number of zeros',
  );
}
