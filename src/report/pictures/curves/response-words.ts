import type { DesignReport } from '../../design-report.js';
import type { Picture } from '../../svg/drawing.js';
import { type FrequencyUnit, fixed, unitOf } from '../../words/numbers.js';
import { RELATIVE, type Requirement, requirementOf, roomText } from '../../words/requirement.js';
import { NO_MASK, tightest, verdictOf } from '../../words/verdict.js';
import { type CurveData, isInBand } from './curve-data.js';
import { spanWords } from './flags.js';

/** Where a requirement is tightest, in words. */
function where({ at }: Requirement, unit: FrequencyUnit): string {
  if (at === 'far above') return 'far above the band';
  return `at ${fixed(Number(at), Math.min(unit.digits, 1))} ${unit.name}`;
}

/** What a frequency picture finds about some of the requirements: clear of every limit, or which is short. */
export function limitFinding(requirements: readonly Requirement[], unit: FrequencyUnit): string {
  const worst = tightest(requirements);
  if (worst === undefined) return 'No limits are asked for here';
  const short = requirements.filter(({ isMet }) => !isMet).length;
  const size = roomText(worst.margin, worst.isMet, worst.unit).replace(/ (clear|short)$/, '');
  const isOneKind = requirements.every(({ name }) => name === worst.name);
  const name = isOneKind ? '' : `${worst.name.replace(RELATIVE, '')} `;
  const place = `${name}${size}, ${where(worst, unit)}`;
  if (short === 0) return `Clear of ${requirements.length === 1 ? 'the limit' : 'every limit'}; least room: ${place}`;
  return `Short of ${short === 1 ? 'one limit' : `${short} limits`}; farthest off: ${place}`;
}

/** With a small first letter, to stand after a colon. */
export function decapitalized(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}

function capitalized(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** Finding, caption and alternative of the response picture. */
export function responseWords(
  design: DesignReport,
  { hasLoss }: CurveData,
): Pick<Picture, 'finding' | 'caption' | 'alternative'> {
  const { band } = design.specification;
  const unit = unitOf(band);
  const shown = design.mask.filter(({ line }) => !isInBand(line) || 'returnLossDb' in line);
  const requirements = shown.map((row) => requirementOf(row, unit));
  // Limits on other quantities have pictures of their own: the finding says which ones it is about.
  const kinds = [...new Set(requirements.map(({ name }) => name.replace(RELATIVE, '')))].join(' and ');
  const found = decapitalized(limitFinding(requirements, unit));
  const finding = requirements.length === 0 ? 'Transmission and reflection' : `${capitalized(kinds)}: ${found}`;
  const lines = hasLoss ? 'Thick: transmission with loss; thin: lossless.' : 'Lossless: no unloaded Q is stated.';
  const verdict = verdictOf(shown, unit);
  const list = requirements
    .map((each) => `${each.name} ${spanWords(each.span)} ${unit.name} ${roomText(each.margin, each.isMet, each.unit)}`)
    .join('; ');
  return {
    finding,
    caption: `${lines} Hatching wears the color of the curve it forbids; dot: worst point; ▽ transmission zero.`,
    alternative:
      verdict === undefined
        ? `Transmission and reflection in dB over frequency. ${NO_MASK}`
        : `Transmission and reflection in dB over frequency with the limits of the mask: ${list}.`,
  };
}
