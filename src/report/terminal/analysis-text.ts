import type { HandOver } from '../../bandpass/index.js';
import { type Band, type Certificate, type CouplingMatrix, hzFromOmega, type MaskRow } from '../../forms/index.js';
import type { Specification } from '../../specification/index.js';
import { CONVENTIONS, cautionsOf } from '../words/conventions.js';
import { type FrequencyUnit, fixed, frequencyText, signed, sizeText, unitOf } from '../words/numbers.js';
import { bandText, qualityText } from '../words/title.js';
import { certificateTable } from './certificate-text.js';
import { handOverLines } from './hand-over-text.js';
import { blocks, table, wrapped } from './layout.js';
import { maskTable, verdictLines } from './mask-text.js';
import { matrixTable } from './matrix-text.js';
import { type Paint, PLAIN } from './paint.js';

/** A frequency outside the band where little gets through: a minimum of |S21|. */
export interface Dip {
  readonly omega: number;
  readonly attenuationDb: number;
}

/** What was found out about a matrix that somebody already had. */
export interface Analysis {
  readonly name?: string;
  readonly matrix: CouplingMatrix;
  /** Whether the file also states a response that the matrix should have. */
  readonly isStated: boolean;
  readonly certificates: readonly Certificate[];
  /** Smaller return loss of the two ports, at its worst in the band (-1..1 in omega), without loss unless Q is known. */
  readonly worstReturnLoss: { readonly db: number; readonly omega: number };
  readonly centerLossDb: number;
  readonly dips: readonly Dip[];
  readonly band?: Band;
  readonly unloadedQ?: Specification['unloadedQ'];
  readonly handOver?: HandOver;
  readonly mask?: readonly MaskRow[];
}

const DIPS_LISTED = 8;

function placeText(omega: number, band: Band | undefined, unit: FrequencyUnit | undefined): string {
  const normalized = `w = ${signed(omega, 4)}`;
  if (band === undefined || unit === undefined) return normalized;
  return `${frequencyText(hzFromOmega(band, omega), unit)} ${unit.name} (${normalized})`;
}

function factLines(analysis: Analysis, unit: FrequencyUnit | undefined): readonly string[] {
  const { worstReturnLoss, centerLossDb, dips, band } = analysis;
  const decibels = (value: number): string => `${fixed(value, 2)} dB`;
  const place = (omega: number): string => placeText(omega, band, unit);
  const rows = [
    ['least return loss in the band', decibels(worstReturnLoss.db), place(worstReturnLoss.omega)],
    ['loss at the center', centerLossDb >= 300 ? 'over 300 dB' : `${fixed(centerLossDb, 3)} dB`, ''],
    ...dips.slice(0, DIPS_LISTED).map(({ omega, attenuationDb }) => {
      const depth = attenuationDb >= 100 ? 'over 100 dB' : decibels(attenuationDb);
      return ['lossless dip of |S21|', depth, place(omega)];
    }),
  ];
  const hidden = dips.length - DIPS_LISTED;
  const more = hidden > 0 ? [`(${hidden} more dips not shown; --json lists them)`] : [];
  const none = dips.length === 0 ? ['|S21| has no dip between 10 and 220 dB.'] : [];
  return [...table(rows, 'lrl'), ...more, ...none];
}

function agreementLines({ isStated, certificates, matrix }: Analysis, paint: Paint): readonly string[] {
  const failed = certificates.filter(({ holds }) => !holds).length;
  if (failed > 0) {
    const what = isStated ? 'The matrix does not have the stated response' : 'The response cannot be computed';
    const apart = certificates.find(({ check, holds }) => check.startsWith('C6') && !holds);
    const size = apart === undefined ? '' : `; its S-parameters are up to ${sizeText(apart.value)} off`;
    return wrapped(`${what}: ${failed} of ${certificates.length} certificates fail${size}.`).map(paint.alarm);
  }
  const text = isStated
    ? `The matrix has the stated response: ${certificates.length} of ${certificates.length} certificates hold.`
    : `A lossless reciprocal two-port of order ${matrix.order}; no response is stated to compare it with.`;
  return wrapped(text).map(paint.strong);
}

function bandLines(analysis: Analysis, unit: FrequencyUnit | undefined): readonly string[] {
  const { band, unloadedQ } = analysis;
  if (band === undefined || unit === undefined)
    return ['No passband is stated: frequencies are normalized, w = -1 to 1.'];
  return [
    ...wrapped(bandText(band, unit)),
    unloadedQ === undefined ? 'Lossless' : `Loss included: ${qualityText(unloadedQ)}`,
  ];
}

/** What a matrix is and does, for a terminal. */
export function analysisText(analysis: Analysis, paint: Paint = PLAIN): string {
  const { name, matrix, certificates, band, handOver, mask } = analysis;
  const unit = band === undefined ? undefined : unitOf(band);
  const inHertz = band !== undefined && unit !== undefined;
  const hasMask = inHertz && mask !== undefined && mask.length > 0;
  return blocks(
    [...wrapped(name ?? `Matrix of order ${matrix.order}`).map(paint.strong), ...bandLines(analysis, unit)],
    agreementLines(analysis, paint),
    factLines(analysis, unit),
    hasMask ? verdictLines(mask, unit, paint) : [],
    hasMask ? maskTable(mask, unit, paint) : [],
    inHertz && handOver !== undefined ? handOverLines({ band, matrix, handOver, unit }, paint) : [],
    matrixTable(matrix, paint),
    certificateTable(certificates, paint),
    [
      ...CONVENTIONS.map(paint.dim),
      ...(band === undefined ? [] : cautionsOf(band).flatMap((caution) => wrapped(caution, 2))),
    ],
  );
}
