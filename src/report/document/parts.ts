import { checkDesign } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import { curveData } from '../pictures/curves/curve-data.js';
import { sweepData } from '../pictures/curves/sweep-data.js';
import { designPicturesOf } from '../pictures/design-pictures.js';
import { emblem } from '../pictures/network/routing/emblem.js';
import type { DocumentParts } from './html/document-html.js';

/** What is drawn and swept for the document of a design: one sweep for all pictures and for the cursor. */
export function documentParts(design: DesignReport): DocumentParts {
  const data = curveData(checkDesign(design));
  return { pictures: designPicturesOf(design, data), emblem: emblem(design.matrix), sweep: { ...sweepData(data) } };
}
