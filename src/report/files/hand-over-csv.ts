import { checkDesign } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import { csvText } from './csv.js';

type Cell = string | number | null;

const HEAD = [
  'kind',
  'from',
  'to',
  'M',
  'k',
  'coupling bandwidth (Hz)',
  'resonator frequency (Hz)',
  'offset from center (Hz)',
  'external Q',
  'reflected delay (s)',
] as const;

/** What stands in a row beside kind, from, to and M. */
interface Values {
  readonly k?: number;
  readonly bandwidthHz?: number;
  readonly frequencyHz?: number;
  readonly offsetHz?: number;
  readonly externalQ?: number;
  readonly delaySeconds?: number | null;
}

function row(kind: string, from: string, to: string, m: number, values: Values): readonly Cell[] {
  const { k, bandwidthHz, frequencyHz, offsetHz, externalQ, delaySeconds } = values;
  const cells = [k, bandwidthHz, frequencyHz, offsetHz, externalQ, delaySeconds];
  return [kind, from, to, m, ...cells.map((cell) => cell ?? null)];
}

function portRows({ specification, matrix, handOver }: DesignReport): readonly (readonly Cell[])[] {
  const { centerHz, bandwidthHz: width } = specification.band;
  return (['source', 'load'] as const).flatMap((port) => {
    const node = port === 'source' ? 0 : matrix.order + 1;
    const couplings = (matrix.values[node] ?? []).slice(1, -1);
    return couplings.flatMap((m, n) => {
      if (m === 0) return [];
      const externalQ = centerHz / (width * m * m);
      const delaySeconds = handOver.reflectedDelaySeconds[port];
      return [row('port', port === 'source' ? 'S' : 'L', String(n + 1), m, { externalQ, delaySeconds })];
    });
  });
}

/**
 * The hand-over numbers as one table: a row for each resonator, each coupling between resonators, each coupling of a port,
 * and the direct coupling of source and load. Units stand in the head row; a cell that has no meaning in its row is empty: a
 * coupling of a port has an external Q, that of the coupling taken alone, and no coupling bandwidth.
 *
 * @example
 * const table = handOverCsv(design({ passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' }, order: 4, returnLossDb: 20 }));
 * table.split('\r\n')[0]?.startsWith('kind,from,to,M,k,'); // true
 */
export function handOverCsv(report: DesignReport): string {
  const { specification, matrix, handOver } = checkDesign(report);
  const entry = (i: number, j: number): number => matrix.values[i]?.[j] ?? 0;
  const resonators = handOver.resonators.map(({ frequencyHz }, n) => {
    const offsetHz = frequencyHz - specification.band.centerHz;
    return row('resonator', String(n + 1), String(n + 1), entry(n + 1, n + 1), { frequencyHz, offsetHz });
  });
  const couplings = handOver.couplings.map(({ between: [i, j], k, bandwidthHz }) =>
    row('coupling', String(i), String(j), entry(i, j), { k, bandwidthHz }),
  );
  const { directCoupling } = handOver;
  const direct = directCoupling === 0 ? [] : [row('direct', 'S', 'L', directCoupling, {})];
  return csvText([HEAD, ...resonators, ...couplings, ...portRows(report), ...direct]);
}
