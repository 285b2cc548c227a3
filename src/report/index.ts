/** Report: finished results as text and pictures.
 *  Takes    a design, an analysis or a trace of rotations, each with what was checked about it; a matrix or a transfer function to draw
 *  Gives    strings: one HTML document and its Markdown twin, SVG pictures, summaries for a terminal of 80 columns, JSON, CSV,
 *           the text of the predicted two-port response
 *  Refuses  what is no matrix, transfer function or band, where it is given one to draw; a design has been checked
 *  Source   Y. Shafranovich, RFC 4180, 2005 (CSV); OWASP, CSV Injection (guarded cells); W3C, SVG 2 and Content Security Policy; all
 *           from memory */

export type { DesignReport } from './design-report.js';
export type { DocumentParts } from './document/html/document-html.js';
export { documentParts } from './document/parts.js';
export type { ReportFile } from './document/report-files.js';
export { reportFileNames, reportFiles } from './document/report-files.js';
export { reportHtml } from './document/report-html.js';
export { reportMarkdown } from './document/report-markdown.js';
export { csvCell, csvText } from './files/csv.js';
export { handOverCsv } from './files/hand-over-csv.js';
export { jsonText } from './files/json-text.js';
export { matrixCsv } from './files/matrix-csv.js';
export { responseGrid, responseText } from './files/response-text.js';
export type { DesignSource } from './files/result-json.js';
export { resultJson } from './files/result-json.js';
export { bandPicture } from './pictures/curves/band-picture.js';
export { groupDelayPicture } from './pictures/curves/group-delay-picture.js';
export { responsePicture } from './pictures/curves/response-picture.js';
export { designPictures } from './pictures/design-pictures.js';
export { matrixPicture } from './pictures/network/matrix/matrix-picture.js';
export { polesAndZerosPicture } from './pictures/network/poles-zeros/poles-zeros-picture.js';
export { resonatorPicture } from './pictures/network/resonators/resonator-picture.js';
export { routingPicture } from './pictures/network/routing/routing-picture.js';
export type { Drawing, Picture } from './svg/drawing.js';
export { pictureSvg } from './svg/drawing.js';
export type { Markup } from './svg/markup.js';
export type { Analysis, Dip } from './terminal/analysis-text.js';
export { analysisText } from './terminal/analysis-text.js';
export type { Paint } from './terminal/paint.js';
export { PLAIN } from './terminal/paint.js';
export type { TracedStep, TraceReport } from './terminal/rotation-text.js';
export { rotationText } from './terminal/rotation-text.js';
export { summaryText } from './terminal/summary-text.js';
