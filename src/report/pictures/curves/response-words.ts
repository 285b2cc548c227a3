import { hzFromOmega } from '../../../forms/index.js';
import type { DesignReport } from '../../design-report.js';
import type { Picture } from '../../svg/drawing.js';
import { unitOf } from '../../words/numbers.js';
import { requirementOf } from '../../words/requirement.js';
import { NO_MASK } from '../../words/verdict.js';
import { type CurveData, isInBand } from './curve-data.js';
import { limitFinding, roomText, spanWords } from './limit-words.js';

/** Which of the marks are in the picture, and what they say. */
function captionOf(design: DesignReport, data: CurveData, hasLimits: boolean): string {
  const { band, transmissionZeros } = design.specification;
  const onAxis = transmissionZeros.filter(({ re }) => re === 0).map(({ im }) => hzFromOmega(band, im));
  const shown = onAxis.filter((hz) => hz >= data.spanHz[0] && hz <= data.spanHz[1]).length;
  const outside = onAxis.length - shown;
  const lines = data.hasLoss ? 'Thick: transmission with loss; thin: lossless.' : 'Lossless: no unloaded Q is stated.';
  const marks = [
    ...(hasLimits ? ['hatching has the color of the curve it limits', 'dot: worst point of a limit'] : []),
    ...(shown > 0 ? ['▽ transmission zero'] : []),
    ...(outside > 0 ? [`${outside === 1 ? 'one zero lies' : `${outside} zeros lie`} outside the picture`] : []),
  ].join('; ');
  return marks === '' ? lines : `${lines} ${marks.charAt(0).toUpperCase()}${marks.slice(1)}.`;
}

/** Finding, caption and alternative of the response picture. */
export function responseWords(
  design: DesignReport,
  data: CurveData,
): Pick<Picture, 'finding' | 'caption' | 'alternative'> {
  const unit = unitOf(design.specification.band);
  // Limits on other quantities have pictures of their own.
  const shown = design.mask.filter(({ line }) => !isInBand(line) || 'returnLossDb' in line);
  const requirements = shown.map((row) => requirementOf(row, unit));
  const list = requirements
    .map((each) => `${each.name} ${spanWords(each.span)} ${unit.name} ${roomText(each)}`)
    .join('; ');
  const isEmpty = requirements.length === 0;
  return {
    finding: isEmpty ? 'Transmission and reflection' : limitFinding(requirements),
    caption: captionOf(design, data, !isEmpty),
    alternative: isEmpty
      ? `Transmission and reflection in dB over frequency. ${design.mask.length === 0 ? NO_MASK : ''}`.trim()
      : `Transmission and reflection in dB over frequency with the limits of the mask: ${list}.`,
  };
}
