import type { DesignReport } from '../../design-report.js';
import { element, type Markup } from '../../svg/markup.js';
import type { CurveData } from './curve-data.js';
import { type AskedLid, lidOf } from './lids.js';
import { clipped, curvePath, curvePoints, type Plot, touches } from './plot.js';
import type { Point } from './thin.js';

/** Return-loss lines of the mask as lids. */
export function returnLossLids(design: DesignReport, plot: Plot): readonly AskedLid[] {
  return design.mask
    .filter(({ line }) => 'returnLossDb' in line && touches(plot, line))
    .flatMap((row) => lidOf(plot, row, { side: 'above', forbids: 'reflection' }, (level) => -level));
}

/** Curves of the response picture, in pixels. */
export interface Curves {
  readonly s21: readonly Point[];
  readonly s11: readonly Point[];
  readonly lossless: readonly (readonly Point[])[];
}

/** Transmission and reflection, with loss and without. */
export function curvesOf(plot: Plot, { hz, lossy, lossless, hasLoss }: CurveData): Curves {
  const points = (db: Float64Array): readonly Point[] =>
    curvePoints(
      plot,
      hz,
      db.map((value) => -value),
    );
  return {
    s21: points(lossy.attenuationDb),
    s11: points(lossy.returnLossDb),
    lossless: hasLoss ? [points(lossless.attenuationDb), points(lossless.returnLossDb)] : [],
  };
}

/** Thin lossless curves under the lossy ones. */
export function drawCurves(plot: Plot, { s21, s11, lossless }: Curves): Markup {
  const [s21Lossless, s11Lossless] = lossless;
  const thin =
    s21Lossless === undefined || s11Lossless === undefined
      ? []
      : [
          element(
            'g',
            { class: 'lossless' },
            curvePath(s11Lossless, 'thin s-reflection'),
            curvePath(s21Lossless, 'thin s-transmission'),
          ),
        ];
  return clipped(plot, 'clip', ...thin, curvePath(s11, 'medium s-reflection'), curvePath(s21, 'thick s-transmission'));
}
