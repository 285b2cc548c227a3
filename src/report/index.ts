/** Report: finished results as text.
 *  Takes    a design, an analysis or a trace of rotations, each with what was checked about it
 *  Gives    strings: summaries for a terminal of 80 columns, JSON, CSV, the text of the predicted two-port response
 *  Refuses  nothing of its own: what it is given has been checked
 *  Source   Y. Shafranovich, RFC 4180, 2005 (CSV); OWASP, CSV Injection (guarded cells); both from memory */
export type { Analysis, Dip } from './analysis-text.js';
export { analysisText } from './analysis-text.js';
export { csvCell, csvText } from './csv.js';
export type { DesignReport } from './design-report.js';
export { handOverCsv } from './hand-over-csv.js';
export { jsonText } from './json-text.js';
export { matrixCsv } from './matrix-csv.js';
export type { Paint } from './paint.js';
export { PLAIN } from './paint.js';
export { responseGrid, responseText } from './response-text.js';
export type { DesignSource } from './result-json.js';
export { resultJson } from './result-json.js';
export type { TracedStep, TraceReport } from './rotation-text.js';
export { rotationText } from './rotation-text.js';
export { summaryText } from './summary-text.js';
