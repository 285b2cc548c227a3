import { checkDesign, checkSource } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import { CONVENTIONS } from '../words/conventions.js';
import { jsonText } from './json-text.js';

/** The design file that a result came from: its path relative to the folder of the result, and its SHA-256 digest. */
export interface DesignSource {
  readonly file: string;
  readonly sha256: string;
}

/**
 * A whole design as JSON text: everything `design` returned, with every digit, its version and its source first. No clock
 * and no absolute path is in it: the same design file gives the same bytes.
 *
 * @example
 * const result = design({ passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' }, order: 4, returnLossDb: 20 });
 * const text = resultJson(result, { file: '../filter.json', sha256: '0'.repeat(64) });
 * JSON.parse(text).source.file; // '../filter.json'
 */
export function resultJson(design: DesignReport, source: DesignSource): string {
  const { version, ...rest } = checkDesign(design);
  return `${jsonText({ version, source: checkSource(source), conventions: CONVENTIONS, ...rest })}\n`;
}
