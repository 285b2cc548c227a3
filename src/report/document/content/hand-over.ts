import type { DesignReport } from '../../design-report.js';
import { nodeName } from '../../words/nodes.js';
import { type FrequencyUnit, figures, fixed, signed, trimmed, unitOf } from '../../words/numbers.js';
import { type Column, numberColumn, type Row, type Table, textColumn } from './content.js';

const K_DECIMALS = 6;
const M_DECIMALS = 4;
const QUALITY_FIGURES = 4;

/** How the signs and numbers of the tables are to be taken. */
export const SIGN_SENTENCE =
  'Numbers follow the routing picture. The sign of a single coupling is free: turning the reference of a resonator changes all of its signs at once, so only the product of the signs round a loop means something.';

/** Couplings between resonators and between the ports; those of negative sign are marked. */
export function couplingTable({ handOver, matrix }: DesignReport, unit: FrequencyUnit): Table {
  const inner = handOver.couplings.map(({ between: [i, j], k, bandwidthHz }): Row => {
    const kind = Math.abs(i - j) === 1 ? 'main' : 'cross';
    const m = matrix.values[i]?.[j] ?? 0;
    const cells = [
      `${i} - ${j}`,
      m < 0 ? `◇ ${kind}, negative` : kind,
      signed(m, M_DECIMALS),
      signed(k, K_DECIMALS),
      signed(bandwidthHz / unit.hertz, unit.digits),
    ];
    return { cells, tones: m < 0 ? ['negative'] : [] };
  });
  const { directCoupling: direct } = handOver;
  const cells = ['S - L', direct < 0 ? '◇ direct, negative' : 'direct', signed(direct, M_DECIMALS), '', ''];
  const directRow: readonly Row[] = direct === 0 ? [] : [{ cells, tones: direct < 0 ? ['negative'] : [] }];
  return {
    id: 'couplings',
    caption: 'Couplings',
    columns: [
      textColumn('Between'),
      textColumn('Kind'),
      numberColumn('M'),
      numberColumn('k'),
      numberColumn('Bandwidth', unit.name),
    ],
    rows: [...inner, ...directRow],
  };
}

/** Resonators: where each is tuned, how far that is from the center, and its Q where one was given. */
export function resonatorTable({ handOver, matrix, specification }: DesignReport, unit: FrequencyUnit): Table {
  const { band, unloadedQ } = specification;
  const qualities: readonly Column[] = unloadedQ === undefined ? [] : [numberColumn('Unloaded Q')];
  const rows = handOver.resonators.map(({ frequencyHz }, n): Row => {
    const quality = typeof unloadedQ === 'number' ? unloadedQ : unloadedQ?.[n];
    return {
      cells: [
        String(n + 1),
        fixed(frequencyHz / unit.hertz, unit.digits),
        signed((frequencyHz - band.centerHz) / unit.hertz, unit.digits),
        signed(matrix.values[n + 1]?.[n + 1] ?? 0, M_DECIMALS),
        ...(quality === undefined ? [] : [trimmed(quality, 3)]),
      ],
    };
  });
  return {
    id: 'resonators',
    caption: 'Resonators',
    columns: [
      numberColumn('No.'),
      numberColumn('Frequency', unit.name),
      numberColumn('From center', unit.name),
      numberColumn('M'),
      ...qualities,
    ],
    rows,
  };
}

function portRow(
  report: DesignReport,
  port: 'source' | 'load',
  resonator: number,
  externalQ: number,
): readonly string[] {
  const { matrix, specification } = report;
  const { delay } = unitOf(specification.band);
  const m = matrix.values[port === 'source' ? 0 : matrix.order + 1]?.[resonator] ?? 0;
  const delaySeconds = (2 * externalQ) / (Math.PI * specification.band.centerHz);
  const pair = port === 'source' ? `S - ${resonator}` : `${resonator} - L`;
  const values = [figures(externalQ, QUALITY_FIGURES), fixed(delaySeconds / delay.seconds, delay.digits)];
  return [`${port}, ${pair}`, signed(m, M_DECIMALS), ...values];
}

/** Ports: a row for each resonator that a port touches. Several at one port are each taken alone. */
export function portTable(report: DesignReport): Table {
  const { handOver, matrix, specification } = report;
  const { delay } = unitOf(specification.band);
  const single = (['source', 'load'] as const).flatMap((port) => {
    const quality = handOver.externalQ[port];
    const line = matrix.values[port === 'source' ? 0 : matrix.order + 1] ?? [];
    const resonator = line.findIndex((m, node) => m !== 0 && node > 0 && node <= matrix.order);
    return quality === null || resonator < 1 ? [] : [portRow(report, port, resonator, quality)];
  });
  const several = handOver.portCouplings.map(({ port, resonator, externalQ }) =>
    portRow(report, port, resonator, externalQ),
  );
  const rows = [...single, ...several].map(
    (cells): Row => ({
      cells,
      tones: cells[1]?.startsWith('-') === true ? ['negative'] : [],
    }),
  );
  const note = `${nodeName(0, matrix.order)} is the source, ${nodeName(matrix.order + 1, matrix.order)} the load. Reflected delay is that of the reflected signal at the center with all other resonators shorted.`;
  const alone = ' Where a port touches several resonators, each value is that of one coupling alone.';
  return {
    id: 'ports',
    caption: 'Ports',
    columns: [
      textColumn('Port'),
      numberColumn('M'),
      numberColumn('External Q'),
      numberColumn('Reflected delay', delay.name),
    ],
    rows,
    note: several.length === 0 ? note : note + alone,
  };
}
