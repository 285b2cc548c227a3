/** Report: finished results as text.
 *  Takes    a design, an analysis or a trace of rotations, each with what was checked about it
 *  Gives    strings: summaries for a terminal of 80 columns, JSON, CSV, the text of the predicted two-port response
 *  Refuses  nothing of its own: what it is given has been checked
 *  Source   Y. Shafranovich, RFC 4180, 2005 (CSV); OWASP, CSV Injection (guarded cells); both from memory */

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
export type { Analysis, Dip } from './terminal/analysis-text.js';
export { analysisText } from './terminal/analysis-text.js';
export type { Paint } from './terminal/paint.js';
export { PLAIN } from './terminal/paint.js';
export type { TracedStep, TraceReport } from './terminal/rotation-text.js';
export { rotationText } from './terminal/rotation-text.js';
export { summaryText } from './terminal/summary-text.js';
