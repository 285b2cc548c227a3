import { checkDesign } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import { cleanLine } from '../words/clean-text.js';
import { CONVENTIONS, cautionsOf } from '../words/conventions.js';
import { unitOf } from '../words/numbers.js';
import { certificateSentence } from './certificate-text.js';
import { handOverLines } from './hand-over-text.js';
import { blocks, wrapped } from './layout.js';
import { maskTable, verdictLines } from './mask-text.js';
import { matrixTable } from './matrix-text.js';
import { type Paint, PLAIN } from './paint.js';
import { titleLines } from './title-text.js';

/** Beyond this order the list of couplings stands for the matrix. */
const LARGEST_MATRIX = 10;

/**
 * A design as a person reads it in ten seconds: what it is, whether it meets its mask and where it is tightest, then the
 * mask line by line, the hand-over numbers, the matrix, what was certified, and the conventions. 80 columns at most, but
 * for a single word that is longer.
 *
 * @example
 * const text = summaryText(design({ name: 'Larkmoor', passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' }, order: 4, returnLossDb: 20 }));
 * text.split('\n')[0]; // 'Larkmoor'
 */
export function summaryText(design: DesignReport, paint: Paint = PLAIN): string {
  const { specification, matrix, handOver, mask, certificates } = checkDesign(design);
  const { band, remarks } = specification;
  const unit = unitOf(band);
  const isLarge = matrix.order > LARGEST_MATRIX;
  return blocks(
    titleLines(specification, unit, paint),
    verdictLines(mask, unit, paint),
    maskTable(mask, unit, paint),
    handOverLines({ band, matrix, handOver, unit }, paint),
    isLarge ? ['All couplings are listed above; the whole matrix is in matrix.csv.'] : matrixTable(matrix, paint),
    certificateSentence(certificates),
    remarks.flatMap((remark) => wrapped(`Remark: ${cleanLine(remark)}`, 2)),
    [...CONVENTIONS.map(paint.dim), ...cautionsOf(band).flatMap((caution) => wrapped(caution, 2))],
  );
}
