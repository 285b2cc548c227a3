import { denormalize, type HandOver } from '../../../../bandpass/index.js';
import type { Band, CouplingMatrix } from '../../../../forms/index.js';
import { checkBand } from '../../../../specification/index.js';

/** A coupling that is drawn: from < to. */
export interface Link {
  readonly from: number;
  readonly to: number;
  readonly value: number;
  /** Part of the main path, source to load. */
  readonly isMain: boolean;
}

/** What a routing picture shows of a matrix. */
export interface Network {
  readonly order: number;
  /** Every resonator hangs between both ports and touches no other one. */
  readonly isFan: boolean;
  readonly links: readonly Link[];
  /** All cross couplings, those of a crowd that are not drawn among them. */
  readonly cross: readonly Link[];
  /** M_ii of the resonators 1..N. */
  readonly detuning: readonly number[];
  /** Couplings that print as zero, and weak ones of a crowd: not drawn, but counted. */
  readonly hidden: number;
}

/** Couplings print to four decimals; what prints as zero is no line. */
const PRINTED = 5e-5;

/** Beyond so many cross couplings lines cover each other: the strongest are drawn. */
const MOST_CROSS = 150;

/** The band that stands in where none is given: hand-over numbers are then not shown. */
const NO_BAND: Band = { centerHz: 1, bandwidthHz: 1 };

/** Rounding of a synthesis leaves less than this; it is not worth a word. */
const ROUNDING = 1e-9;

/** Checks matrix and band by what hands numbers over, and gives those numbers. */
export function checkedHandOver(matrix: CouplingMatrix, band: Band | undefined): HandOver {
  return denormalize(matrix, band === undefined ? NO_BAND : checkBand(band));
}

/** Smallest size that is drawn: what prints as zero is not, unless all of the matrix is about that small. */
export function visibleSize(matrix: CouplingMatrix): number {
  const largest = Math.max(...matrix.values.map((row) => Math.max(...row.map(Math.abs))));
  return largest < 100 * PRINTED ? PRINTED * largest : PRINTED;
}

/** Is every resonator coupled to both ports and to no other resonator? */
function hangsBetweenPorts(order: number, pairs: readonly Omit<Link, 'isMain'>[]): boolean {
  const toPorts = pairs.filter(({ from, to }) => (from === 0) !== (to === order + 1)).length;
  const between = pairs.some(({ from, to }) => from > 0 && to <= order);
  return order > 1 && toPorts === 2 * order && !between;
}

/** The couplings of a matrix as lines to be drawn. */
export function networkOf(matrix: CouplingMatrix): Network {
  const { order, values } = matrix;
  const smallest = visibleSize(matrix);
  const noise = (ROUNDING / PRINTED) * smallest;
  const pairs = values.flatMap((row, from) =>
    row.map((value, to) => ({ from, to, value })).filter(({ to, value }) => to > from && Math.abs(value) > noise),
  );
  const visible = pairs.filter(({ value }) => Math.abs(value) >= smallest);
  const fan = hangsBetweenPorts(order, visible);
  const links = visible.map((pair) => ({ ...pair, isMain: fan ? !isDirect(pair, order) : pair.to === pair.from + 1 }));
  const cross = links.filter(({ isMain }) => !isMain);
  // Of equals the first are drawn.
  const kept = new Set([...cross].sort((a, b) => Math.abs(b.value) - Math.abs(a.value)).slice(0, MOST_CROSS));
  const drawn = links.filter((link) => link.isMain || kept.has(link));
  return {
    order,
    isFan: fan,
    links: drawn,
    cross,
    detuning: values.slice(1, order + 1).map((row, n) => row[n + 1] as number),
    hidden: pairs.length - drawn.length,
  };
}

function isDirect({ from, to }: Omit<Link, 'isMain'>, order: number): boolean {
  return from === 0 && to === order + 1;
}
