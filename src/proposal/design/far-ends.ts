import { hzFromOmega, type MaskLine, omegaFromHz } from '../../forms/index.js';
import type { CheckedRequest } from './request.js';

/**
 * An open rejection line, ended where nothing can happen any more: the verdict is the same and is found several times faster.
 *
 * All roots of a proposed design lie within |omega| = 6 and at least two zeros are at infinity, or there are none at all: beyond
 * `max(100, 8*order)` the slope of the rejection, at least `order/(omega + 1) - (order - 2)/(omega - 6)` nepers, is positive.
 */
export function endedFarOut(line: MaskLine, band: CheckedRequest['band'], order: number): MaskLine {
  if (!('rejectionDb' in line)) return line;
  const far = Math.max(100, 8 * order);
  const [lowHz, highHz] = [hzFromOmega(band, -far), hzFromOmega(band, far)];
  if (line.fromHz === undefined && line.toHz !== undefined && omegaFromHz(band, line.toHz) > -far)
    return { ...line, fromHz: lowHz };
  if (line.toHz === undefined && line.fromHz !== undefined && omegaFromHz(band, line.fromHz) < far)
    return { ...line, toHz: highHz };
  return line;
}
