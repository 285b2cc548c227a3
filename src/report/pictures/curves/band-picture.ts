import { checkDesign } from '../../check-design.js';
import type { DesignReport } from '../../design-report.js';
import { type Drawing, FORMAT_WIDTH, type Format, type Picture } from '../../svg/drawing.js';
import { hatchPatterns } from '../../svg/hatch.js';
import { unitOf } from '../../words/numbers.js';
import { type Requirement, requirementOf } from '../../words/requirement.js';
import { closePlot } from './close-plot.js';
import { type CurveData, curveData } from './curve-data.js';
import { limitFinding, limitWords, spanWords } from './limit-words.js';
import { lossLevels, lossPanel, lossRange } from './loss-panel.js';
import { matchLevels, matchPanel, matchRange } from './match-panel.js';
import { axisRoom, clipFrame, plotFrame } from './plot.js';
import { ruler } from './ruler.js';

const TOP = 26;
/** Heights of the two panels and of the gap between them. */
const HEIGHTS: Readonly<Record<Format, readonly [number, number, number]>> = {
  wide: [160, 34, 150],
  narrow: [150, 34, 130],
};

function drawing(design: DesignReport, data: CurveData, format: Format): Drawing {
  const [lossHeight, gap, matchHeight] = HEIGHTS[format];
  const [upper, lower] = lossRange(design, data);
  const [least, most] = matchRange(design);
  const room = Math.max(axisRoom(lossLevels(upper, lower)), axisRoom(matchLevels(least, most)));
  const loss = closePlot(design, data, format, { name: 'band', top: TOP, height: lossHeight, upper, lower, room });
  const matchTop = TOP + lossHeight + gap;
  const match = closePlot(design, data, format, {
    name: 'band',
    top: matchTop,
    height: matchHeight,
    upper: least,
    lower: most,
    room,
  });
  const scale = ruler(match, match.bottom, []);
  const body = plotFrame(
    loss,
    loss.top,
    match.bottom,
    hatchPatterns(loss.prefix, ['transmission', 'reflection']),
    clipFrame(loss, 'loss'),
    clipFrame(match, 'match'),
    lossPanel(design, data, loss),
    matchPanel(design, data, match),
    scale.markup,
  );
  return { width: FORMAT_WIDTH[format], height: match.bottom + scale.height, body };
}

function requirementsOf(design: DesignReport): readonly Requirement[] {
  const unit = unitOf(design.specification.band);
  const isOfLevel = (key: string): boolean =>
    ['returnLossDb', 'insertionLossDb', 'insertionLossVariationDb'].includes(key);
  return design.mask.filter(({ line }) => Object.keys(line).some(isOfLevel)).map((row) => requirementOf(row, unit));
}

function words(
  design: DesignReport,
  { centerLossDb, hasLoss }: CurveData,
): Pick<Picture, 'finding' | 'caption' | 'alternative'> {
  const unit = unitOf(design.specification.band);
  const requirements = requirementsOf(design);
  const limits = requirements.map(
    ({ name, span, predicted, limit }) =>
      `${name} ${predicted.toFixed(2)} dB of ${limitWords(limit)} dB at ${spanWords(span)} ${unit.name}`,
  );
  const loss = hasLoss ? `Insertion loss ${centerLossDb.toFixed(2)} dB at the center` : 'Lossless';
  const hasBox = design.mask.some(({ line }) => 'insertionLossVariationDb' in line);
  const finding = requirements.length === 0 ? 'Loss and match of the passband' : limitFinding(requirements);
  return {
    finding,
    caption: `Above: insertion loss, down is more loss${hasBox ? '; a box holds the variation allowed' : ''}. Below: return loss, down is a better match; one ruler for both.`,
    alternative: `${loss}; ${limits.length === 0 ? 'no limits are asked for in the passband' : limits.join(', ')}.`,
  };
}

/** The picture from curves that are there already. */
export function bandPictureOf(design: DesignReport, data: CurveData): Picture {
  return {
    name: 'band',
    ...words(design, data),
    wide: drawing(design, data, 'wide'),
    narrow: drawing(design, data, 'narrow'),
  };
}

/**
 * The passband close up: insertion loss above, return loss below, on one ruler, with their limits.
 *
 * @param design what `design` returned
 * @returns a picture of 560 and of 340 pixels width
 *
 * @example
 * const picture = bandPicture(design({
 *   passband: { lowerHz: '3822 MHz', upperHz: '3858 MHz' }, order: 6, returnLossDb: 22, transmissionZeros: [1.45, -1.45],
 *   unloadedQ: 9000, mask: [{ fromHz: '3823 MHz', toHz: '3857 MHz', returnLossDb: 20 }],
 * }));
 * picture.finding; // 'Return loss clear by 2.3 dB'
 */
export function bandPicture(design: DesignReport): Picture {
  return bandPictureOf(checkDesign(design), curveData(design));
}
