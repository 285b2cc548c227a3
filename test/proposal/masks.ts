import { bandFromEdges, type MaskLine, omegaFromHz } from '../../src/index.js';
import type { ProposeRequest, RejectionPiece } from '../../src/proposal/index.js';

/** An invented filter: passband edges and rejection lines in MHz, `[from, to, dB]`, undefined for an open end. */
interface InventedMask {
  readonly edges: readonly [number, number];
  readonly returnLossDb: number;
  readonly lines: readonly (readonly [number | undefined, number | undefined, number])[];
}

const MHZ = 1e6;

/** A narrow channel, a front end with a blocker above, a base-station band, a cryogenic filter, a diplexer arm. */
export const MASKS = {
  channel: {
    edges: [3822, 3858],
    returnLossDb: 22,
    lines: [
      [undefined, 3816, 24],
      [3864, undefined, 24],
      [undefined, 3812, 34],
      [3868, undefined, 34],
    ],
  },
  frontEnd: {
    edges: [2516, 2558],
    returnLossDb: 20,
    lines: [
      [2563, 2600, 30],
      [2600, 2700, 42],
      [undefined, 2480, 25],
      [undefined, 2490, 19],
    ],
  },
  baseStation: {
    edges: [1850, 1910],
    returnLossDb: 21,
    lines: [
      [undefined, 1840, 32],
      [1915, undefined, 30],
      [1916, undefined, 38],
    ],
  },
  cryogenic: {
    edges: [1942.5, 1957.5],
    returnLossDb: 22,
    lines: [
      [undefined, 1942, 40],
      [1958, undefined, 40],
      [undefined, 1941.5, 52],
      [1958.5, undefined, 52],
      [undefined, 1938, 75],
      [1962, undefined, 75],
    ],
  },
  diplexer: {
    edges: [2304, 2346],
    returnLossDb: 22,
    lines: [
      [2357, 2397, 80],
      [undefined, 2290, 20],
    ],
  },
} as const satisfies Record<string, InventedMask>;

export type MaskName = keyof typeof MASKS;

/** The mask as lines in hertz. */
export function maskLines(name: MaskName): readonly MaskLine[] {
  const lines: InventedMask['lines'] = MASKS[name].lines;
  return lines.map(([from, to, rejectionDb]) => ({
    ...(from === undefined ? {} : { fromHz: from * MHZ }),
    ...(to === undefined ? {} : { toHz: to * MHZ }),
    rejectionDb,
  }));
}

/** A request for a proposal. */
export function requestFor(name: MaskName, change: Partial<ProposeRequest> = {}): ProposeRequest {
  const { edges, returnLossDb } = MASKS[name];
  const passband = { lowerHz: edges[0] * MHZ, upperHz: edges[1] * MHZ };
  return { passband, returnLossDb, mask: maskLines(name), ...change };
}

/** The mask as normalized pieces. */
export function piecesFor(name: MaskName): readonly RejectionPiece[] {
  const [lower, upper] = MASKS[name].edges;
  const band = bandFromEdges(lower * MHZ, upper * MHZ);
  const lines: InventedMask['lines'] = MASKS[name].lines;
  return lines.map(([from, to, rejectionDb]) => ({
    ...(from === undefined ? {} : { fromOmega: omegaFromHz(band, from * MHZ) }),
    ...(to === undefined ? {} : { toOmega: omegaFromHz(band, to * MHZ) }),
    rejectionDb,
  }));
}
