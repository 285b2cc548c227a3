import type { HandOver } from '../../bandpass/index.js';
import type { Band, CouplingMatrix } from '../../forms/index.js';
import { nodeName } from '../words/nodes.js';
import { type FrequencyUnit, figures, fixed, frequencyText, signed } from '../words/numbers.js';
import { beside, table } from './layout.js';
import type { Paint } from './paint.js';

const K_DIGITS = 6;
const M_DIGITS = 4;
const Q_FIGURES = 4;

/** Stands below several couplings of one port. */
const SEVERAL = 'Of several couplings at one port, each external Q is that of one taken alone.';

/** What a hand-over table is made from. */
export interface HandOverParts {
  readonly band: Band;
  readonly matrix: CouplingMatrix;
  readonly handOver: HandOver;
  readonly unit: FrequencyUnit;
}

function entry({ matrix }: HandOverParts, i: number, j: number): string {
  return signed(matrix.values[i]?.[j] ?? 0, M_DIGITS);
}

function resonatorLines({ band, handOver, unit }: HandOverParts): readonly string[] {
  const rows = handOver.resonators.map(({ frequencyHz }, n) => [
    String(n + 1),
    fixed(frequencyHz / unit.hertz, unit.digits),
    signed((frequencyHz - band.centerHz) / unit.hertz, unit.digits),
  ]);
  return table([['resonator', unit.name, 'from center'], ...rows], 'rrr');
}

function couplingLines(parts: HandOverParts): readonly string[] {
  const { handOver, unit } = parts;
  const width = (hertz: number): string => signed(hertz / unit.hertz, unit.digits);
  const rows = handOver.couplings.map(({ between: [i, j], k, bandwidthHz }) => [
    `${i}-${j}`,
    signed(k, K_DIGITS),
    width(bandwidthHz),
    entry(parts, i, j),
  ]);
  return rows.length === 0 ? [] : table([['coupling', 'k', unit.name, 'M'], ...rows], 'lrrr');
}

/** A row for each coupling of a port; the delay is told where a port has one coupling only. */
function portRows(port: 'source' | 'load', parts: HandOverParts): readonly (readonly string[])[] {
  const { handOver, matrix, unit } = parts;
  const node = port === 'source' ? 0 : matrix.order + 1;
  const [quality, delay] = [handOver.externalQ[port], handOver.reflectedDelaySeconds[port]];
  if (quality !== null && delay !== null) {
    const resonator = (matrix.values[node] ?? []).findIndex((m, n) => m !== 0 && n > 0 && n <= matrix.order);
    const values = [
      figures(quality, Q_FIGURES),
      fixed(delay / unit.delay.seconds, unit.delay.digits),
      entry(parts, node, resonator),
    ];
    return [[port, String(resonator), ...values]];
  }
  const own = handOver.portCouplings.filter((each) => each.port === port);
  if (own.length === 0) return [[port, 'none', '', '', '']];
  return own.map(({ resonator, externalQ }) => [
    ...[port, String(resonator), figures(externalQ, Q_FIGURES), ''],
    entry(parts, node, resonator),
  ]);
}

function portLines(parts: HandOverParts): readonly string[] {
  const { directCoupling: direct, portCouplings } = parts.handOver;
  const rows = (['source', 'load'] as const).flatMap((port) => portRows(port, parts));
  const directRow = direct === 0 ? [] : [['direct', 'S-L', '', '', signed(direct, M_DIGITS)]];
  const lines = table(
    [['port', 'resonator', 'external Q', `reflected delay, ${parts.unit.delay.name}`, 'M'], ...rows, ...directRow],
    'lrrrr',
  );
  return portCouplings.length === 0 ? lines : [...lines, SEVERAL];
}

/** Resonators beside couplings, then ports; resonators that are all at the center take one line. */
export function handOverLines(parts: HandOverParts, paint: Paint): readonly string[] {
  const { band, matrix, unit } = parts;
  const isSynchronous = matrix.values.every((row, n) => row[n] === 0);
  const center = `${frequencyText(band.centerHz, unit)} ${unit.name}`;
  const couplings = couplingLines(parts);
  const [first, last] = [nodeName(1, matrix.order), nodeName(matrix.order, matrix.order)];
  const all = first === last ? `Resonator 1 at ${center}` : `Resonators ${first} to ${last} all at ${center}`;
  const upper = isSynchronous ? couplings : beside(resonatorLines(parts), couplings);
  const [head, ...rows] = upper;
  const [portHead = '', ...ports] = portLines(parts);
  return [
    ...(isSynchronous ? [all] : []),
    ...(head === undefined ? [] : [paint.dim(head)]),
    ...rows,
    paint.dim(portHead),
    ...ports,
  ];
}
