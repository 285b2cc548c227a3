import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import { type Drawing, inlineSvg } from '../../svg/drawing.js';
import { element, type Markup } from '../../svg/markup.js';
import { unitOf } from '../../words/numbers.js';
import { NO_MASK } from '../../words/verdict.js';
import { bandFacts } from '../content/band-facts.js';
import { listedRequirements, pageVerdict } from '../content/requirements.js';
import { conditions, KICKER, nameOf, SIGNATURES, titleCells, titleFacts } from '../content/title.js';
import { requirementsMarkup } from './requirements-html.js';
import { cellMarkup, tableMarkup } from './table-html.js';
import { sentenceSigns, spanSigns } from './typography.js';

const DOT = ' \u00b7 ';

/** The title strip: what this is, its own emblem, and the facts that tell one issue of it from another. */
export function titleStrip(
  design: DesignReport,
  source: DesignSource | undefined,
  emblem: Drawing | undefined,
): Markup {
  const cells = titleCells(design, source).map(({ head, value }) =>
    element(
      'div',
      {},
      element('dt', {}, head),
      element(
        'dd',
        {},
        cellMarkup(value, (text) => text),
      ),
    ),
  );
  const picture = emblem === undefined ? [] : [inlineSvg(emblem, 'Routing of this design, small', 'emblem')];
  return element(
    'header',
    { class: 'title' },
    element(
      'div',
      { class: 'name' },
      element('p', { class: 'kicker' }, KICKER),
      element(
        'h1',
        {},
        cellMarkup(nameOf(design.specification), (text) => text),
      ),
      element('p', { class: 'facts' }, spanSigns(titleFacts(design.specification).join(DOT))),
    ),
    ...picture,
    element('dl', { class: 'cells' }, ...cells),
  );
}

/** Name and the facts that tell one issue from another, at the head of every printed sheet after the first. */
export function runningHead(design: DesignReport, source: DesignSource | undefined): Markup {
  const plain = (text: string): string => text;
  const cells = titleCells(design, source).flatMap(({ head, value }) => [`${DOT}${head} `, cellMarkup(value, plain)]);
  const name = cellMarkup(nameOf(design.specification), plain);
  return element('p', { class: 'running', 'aria-hidden': 'true' }, name, ...cells);
}

/** The verdict: the answer, what is tightest, and the conditions under which it holds. */
function verdictMarkup({ specification, mask }: DesignReport): Markup {
  const verdict = pageVerdict(mask, unitOf(specification.band));
  const isShort = verdict !== undefined && !verdict.isMet;
  const nearest = verdict === undefined ? [] : [element('p', { class: 'nearest' }, sentenceSigns(verdict.nearest))];
  return element(
    'div',
    { class: isShort ? 'verdict short' : 'verdict' },
    element('h2', { id: 'verdict' }, verdict === undefined ? NO_MASK : verdict.answer),
    ...nearest,
    ...conditions(specification).map((text) => element('p', { class: 'conditions' }, sentenceSigns(text))),
  );
}

function signatureLines(): Markup {
  return element(
    'div',
    { class: 'signatures' },
    ...SIGNATURES.map((who) => element('p', {}, element('span', {}, who), element('span', {}, 'Date'))),
  );
}

/** The first page below its title: it answers before it explains. */
export function firstPage(design: DesignReport, response: Markup | undefined): Markup {
  const { specification, mask } = design;
  const unit = unitOf(specification.band);
  const table =
    mask.length === 0 ? tableMarkup(bandFacts(design, unit)) : requirementsMarkup(listedRequirements(mask, unit), unit);
  return element(
    'section',
    { class: 'first', 'aria-labelledby': 'verdict' },
    verdictMarkup(design),
    element(
      'div',
      { class: 'answer' },
      element('div', { class: 'limits' }, table),
      ...(response === undefined ? [] : [response]),
      signatureLines(),
    ),
  );
}
