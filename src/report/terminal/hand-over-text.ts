import type { HandOver } from '../../bandpass/index.js';
import type { Band, CouplingMatrix } from '../../forms/index.js';
import { nodeName } from '../words/nodes.js';
import { type FrequencyUnit, figures, fixed, frequencyText, signed } from '../words/numbers.js';
import { beside, table } from './layout.js';
import type { Paint } from './paint.js';

const K_DIGITS = 6;
const M_DIGITS = 4;

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
  const { handOver, matrix, unit } = parts;
  const width = (hertz: number): string => signed(hertz / unit.hertz, unit.digits);
  const inner = handOver.couplings.map(({ between: [i, j], k, bandwidthHz }) => [
    `${i}-${j}`,
    signed(k, K_DIGITS),
    width(bandwidthHz),
    entry(parts, i, j),
  ]);
  const ports = handOver.portCouplings.map(({ port, resonator, bandwidthHz }) => {
    const node = port === 'source' ? 0 : matrix.order + 1;
    const pair = port === 'source' ? `S-${resonator}` : `${resonator}-L`;
    return [pair, '', width(bandwidthHz), entry(parts, node, resonator)];
  });
  const rows = [...inner, ...ports];
  return rows.length === 0 ? [] : table([['coupling', 'k', unit.name, 'M'], ...rows], 'lrrr');
}

function portLines(parts: HandOverParts): readonly string[] {
  const { handOver, matrix } = parts;
  const rows = (['source', 'load'] as const).map((port) => {
    const node = port === 'source' ? 0 : matrix.order + 1;
    const quality = handOver.externalQ[port];
    const delay = handOver.reflectedDelaySeconds[port];
    const touched = (matrix.values[node] ?? []).slice(1, -1).flatMap((value, n) => (value === 0 ? [] : [n + 1]));
    const at = touched.length === 1 ? String(touched[0]) : touched.length === 0 ? 'none' : 'several';
    const values = quality === null || delay === null ? ['', ''] : [figures(quality, 4), fixed(delay * 1e9, 3)];
    return [port, at, ...values, touched.length === 1 ? entry(parts, node, touched[0] ?? 0) : ''];
  });
  const direct = handOver.directCoupling;
  const directRow = direct === 0 ? [] : [['direct', 'S-L', '', '', signed(direct, M_DIGITS)]];
  return table([['port', 'resonator', 'external Q', 'reflected delay, ns', 'M'], ...rows, ...directRow], 'lrrrr');
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
