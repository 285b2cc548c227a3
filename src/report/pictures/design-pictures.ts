import { checkDesign } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import type { Picture } from '../svg/drawing.js';
import { bandPictureOf } from './curves/band-picture.js';
import { type CurveData, curveData } from './curves/curve-data.js';
import { groupDelayPictureOf } from './curves/group-delay-picture.js';
import { responsePictureOf } from './curves/response-picture.js';
import { matrixPicture } from './network/matrix/matrix-picture.js';
import { polesAndZerosPicture } from './network/poles-zeros/poles-zeros-picture.js';
import { resonatorPicture } from './network/resonators/resonator-picture.js';
import { routingPicture } from './network/routing/routing-picture.js';

/** The pictures of a design in the order of its document, from curves that are there already. */
export function designPicturesOf(design: DesignReport, data: CurveData): readonly Picture[] {
  const { matrix, polynomials, specification } = design;
  const { band } = specification;
  return [
    responsePictureOf(design, data),
    bandPictureOf(design, data),
    groupDelayPictureOf(design, data),
    routingPicture(matrix, band),
    polesAndZerosPicture(polynomials),
    matrixPicture(matrix),
    resonatorPicture(matrix, band),
  ];
}

/**
 * All pictures of a design, in the order of its document: response, band, group delay, routing, poles and zeros, matrix,
 * resonators.
 *
 * @param design what `design` returned
 * @returns pictures with the names of their files; `pictureSvg` makes the files
 *
 * @example
 * const pictures = designPictures(design({ passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' }, order: 4, returnLossDb: 20 }));
 * pictures[0]?.name; // 'response'
 */
export function designPictures(design: DesignReport): readonly Picture[] {
  return designPicturesOf(checkDesign(design), curveData(design));
}
