import { checkSource } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import type { DesignSource } from '../files/result-json.js';
import { documentHtml } from './html/document-html.js';
import { documentParts } from './parts.js';

/**
 * A design as one HTML file, for people: the verdict on the mask first, then the pictures, the numbers that hardware is cut
 * from, and the evidence. It opens anywhere without a network, asks for nothing, and prints on A4 and letter.
 *
 * The same design gives the same bytes; texts of the specification stand in it as text, whatever they hold. `source` says
 * which design file it came from (its SHA-256 digest in hexadecimal). Cost: most of it is the sweeps of the pictures.
 *
 * @throws FilterFailure E_TYPE for what is no result of `design`; nothing for one
 *
 * @example
 * const band = { centerHz: '1 GHz', bandwidthHz: '20 MHz' };
 * const page = reportHtml(design({ passband: band, order: 4, returnLossDb: 20, date: '2026-12-01' }));
 * page.startsWith('<!DOCTYPE html>'); // true
 */
export function reportHtml(design: DesignReport, source?: DesignSource): string {
  return documentHtml(design, checkSource(source), documentParts(design));
}
