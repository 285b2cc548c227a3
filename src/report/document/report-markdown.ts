import { checkSource } from '../check-design.js';
import type { DesignReport } from '../design-report.js';
import type { DesignSource } from '../files/result-json.js';
import { documentMarkdown } from './markdown/document-markdown.js';
import { documentParts } from './parts.js';

/**
 * A design as Markdown with tables, for a repository or a wiki: what `reportHtml` says, with links to the pictures as files
 * that lie beside it (`response.svg` and so on). Texts of the specification are escaped: they make no markup and no link.
 *
 * The same design gives the same bytes. `source` says which design file it came from. Cost: that of `reportHtml`.
 *
 * @throws FilterFailure E_TYPE for what is no result of `design`; nothing for one
 *
 * @example
 * const band = { centerHz: '1 GHz', bandwidthHz: '20 MHz' };
 * reportMarkdown(design({ name: 'A & B', passband: band, order: 4, returnLossDb: 20 })).split('\n')[0]; // '# A & B'
 */
export function reportMarkdown(design: DesignReport, source?: DesignSource): string {
  return documentMarkdown(design, checkSource(source), documentParts(design).pictures);
}
