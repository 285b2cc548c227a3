import type { DesignReport } from '../design-report.js';
import type { DesignSource } from '../files/result-json.js';
import { pictureSvg } from '../svg/drawing.js';
import { type DocumentParts, documentHtml } from './html/document-html.js';
import { documentMarkdown } from './markdown/document-markdown.js';

/** A file of the report: its name, and its text. */
export interface ReportFile {
  readonly name: string;
  readonly text: string;
}

const HTML_NAME = 'report.html';
const MARKDOWN_NAME = 'report.md';

/** Names of the files of a report, the one to open first. */
export function reportFileNames({ pictures }: DocumentParts): readonly string[] {
  return [HTML_NAME, MARKDOWN_NAME, ...pictures.map(({ name }) => `${name}.svg`)];
}

/** The document, its Markdown twin and the pictures that this one links to, from one set of drawings. */
export function reportFiles(design: DesignReport, source: DesignSource, parts: DocumentParts): readonly ReportFile[] {
  return [
    { name: HTML_NAME, text: documentHtml(design, source, parts) },
    { name: MARKDOWN_NAME, text: documentMarkdown(design, source, parts.pictures) },
    ...parts.pictures.map((picture) => ({ name: `${picture.name}.svg`, text: pictureSvg(picture) })),
  ];
}
