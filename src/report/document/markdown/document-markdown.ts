import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import type { Picture } from '../../svg/drawing.js';
import { unitOf } from '../../words/numbers.js';
import { NO_MASK } from '../../words/verdict.js';
import { bandFacts } from '../content/band-facts.js';
import { listedRequirements, pageVerdict, requirementTable } from '../content/requirements.js';
import { sheetsOf } from '../content/sheets.js';
import { conditions, KICKER, nameOf, SIGNATURES, titleCells, titleFacts } from '../content/title.js';
import { cellText, pictureLines, sheetLines, tableLines } from './blocks-markdown.js';
import { escapeOwn } from './escape.js';

function titleLines(design: DesignReport, source: DesignSource | undefined): readonly string[] {
  const { specification } = design;
  const cells = titleCells(design, source).map(({ head, value }) => `- ${head}: ${cellText(value)}`);
  return [
    `# ${cellText(nameOf(specification))}`,
    '',
    KICKER,
    '',
    escapeOwn(titleFacts(specification).join(', ')),
    '',
    ...cells,
    '',
  ];
}

function verdictLines(design: DesignReport): readonly string[] {
  const { specification, mask } = design;
  const unit = unitOf(specification.band);
  const verdict = pageVerdict(mask, unit);
  const nearest = verdict === undefined ? [] : [escapeOwn(verdict.nearest), ''];
  const table = mask.length === 0 ? bandFacts(design, unit) : requirementTable(listedRequirements(mask, unit), unit);
  return [
    `## ${escapeOwn(verdict === undefined ? NO_MASK : verdict.answer)}`,
    '',
    ...nearest,
    ...conditions(specification).flatMap((sentence) => [escapeOwn(sentence), '']),
    ...tableLines(table),
  ];
}

/** The whole document as Markdown, from a design and what was drawn of it. */
export function documentMarkdown(
  design: DesignReport,
  source: DesignSource | undefined,
  pictures: readonly Picture[],
): string {
  const pictureOf = (name: string): Picture | undefined => pictures.find((picture) => picture.name === name);
  const response = pictureOf('response');
  const lines = [
    ...titleLines(design, source),
    ...verdictLines(design),
    ...(response === undefined ? [] : pictureLines(response)),
    ...SIGNATURES.map((who) => `- ${who}, name and date: `),
    '',
    ...sheetsOf(design, source).flatMap((sheet) => sheetLines(sheet, pictureOf)),
  ];
  return `${lines.join('\n').trimEnd()}\n`;
}
