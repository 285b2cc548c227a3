import { type Band, type CouplingMatrix, hzFromOmega } from '../forms/index.js';
import { rowsOf } from '../topology/index.js';
import { bandOf } from './band.js';

/** One resonator of the hardware. */
export interface ResonatorRow {
  readonly frequencyHz: number;
}

/** One coupling between two resonators: dimensionless k and coupling bandwidth k*f0, with their sign. */
export interface CouplingRow {
  readonly between: readonly [number, number];
  readonly k: number;
  readonly bandwidthHz: number;
}

/** One of several couplings of a port: `bandwidthHz` = M*B with its sign, `externalQ` = that coupling taken alone. */
export interface PortCouplingRow {
  readonly port: 'source' | 'load';
  readonly resonator: number;
  readonly bandwidthHz: number;
  readonly externalQ: number;
}

/** A value for each port; null where the port touches no resonator or several. */
export interface PortPair {
  readonly source: number | null;
  readonly load: number | null;
}

/** The numbers that hardware is cut from. */
export interface HandOver {
  readonly resonators: readonly ResonatorRow[];
  readonly couplings: readonly CouplingRow[];
  readonly externalQ: PortPair;
  readonly reflectedDelaySeconds: PortPair;
  readonly portCouplings: readonly PortCouplingRow[];
  /** M_SL, dimensionless; 0 when source and load are not coupled directly. */
  readonly directCoupling: number;
}

/**
 * Hand-over numbers of a coupling matrix in a band.
 *
 * `resonators[i].frequencyHz = f0*(sqrt(1 + (b/2)^2) - b/2)`, `b = M_ii*B/f0` (a positive M_ii tunes below f0);
 * `k = M_ij*B/f0`, coupling bandwidth `M_ij*B`; `Qe = f0/(B*M_S1^2)`; `reflectedDelaySeconds = 2*Qe/(pi*f0)` is the peak of
 * the reflected group delay with all other resonators shorted. Only non-zero couplings are listed. A port that touches
 * several resonators has null and rows in `portCouplings`. Signs of couplings are relative: only the product round a loop
 * means something.
 *
 * @throws FilterFailure E_BAND, E_TYPE, E_MATRIX_SHAPE, E_NOT_FINITE, E_NOT_SYMMETRIC
 *
 * Source: common practice; R. J. Cameron, C. M. Kudsia, R. R. Mansour, Microwave Filters for Communication Systems, 2007
 * (from memory).
 *
 * @example
 * const { matrix } = folded(transversal(chebyshev({ order: 3, returnLossDb: 20 })));
 * const { externalQ } = denormalize(matrix, { centerHz: 1e9, bandwidthHz: 10e6 });
 * externalQ.source?.toFixed(2); // '85.34'
 */
export function denormalize(matrix: CouplingMatrix, band: Band): HandOver {
  bandOf(band);
  const rows = rowsOf(matrix);
  const order = matrix.order;
  const source = portRows(rows[0] as Float64Array, 'source', band);
  const load = portRows(rows[order + 1] as Float64Array, 'load', band);
  const single = (ports: readonly PortCouplingRow[]): number | null =>
    ports.length === 1 ? (ports[0]?.externalQ ?? null) : null;
  const externalQ = { source: single(source), load: single(load) };
  const delay = (quality: number | null): number | null =>
    quality === null ? null : (2 * quality) / (Math.PI * band.centerHz);
  return {
    resonators: rows.slice(1, order + 1).map((row, n) => ({ frequencyHz: hzFromOmega(band, -(row[n + 1] as number)) })),
    couplings: couplingRows(rows, band),
    externalQ,
    reflectedDelaySeconds: { source: delay(externalQ.source), load: delay(externalQ.load) },
    portCouplings: [source, load].filter((ports) => ports.length > 1).flat(),
    directCoupling: rows[0]?.[order + 1] as number,
  };
}

function portRows(
  row: Float64Array,
  port: 'source' | 'load',
  { centerHz, bandwidthHz }: Band,
): readonly PortCouplingRow[] {
  return Array.from(row.slice(1, -1), (value, n) => ({
    port,
    resonator: n + 1,
    bandwidthHz: value * bandwidthHz,
    externalQ: centerHz / (bandwidthHz * value * value),
  })).filter(({ bandwidthHz: width }) => width !== 0);
}

function couplingRows(rows: readonly Float64Array[], { centerHz, bandwidthHz }: Band): readonly CouplingRow[] {
  return rows.slice(1, -1).flatMap((row, n) => {
    const i = n + 1;
    return Array.from(row.slice(i + 1, -1), (value, m) => ({
      between: [i, i + 1 + m] as const,
      k: (value * bandwidthHz) / centerHz,
      bandwidthHz: value * bandwidthHz,
    })).filter(({ k }) => k !== 0);
  });
}
