import { type Child, element, fragment, type Markup } from '../../svg/markup.js';
import type { FrequencyUnit } from '../../words/numbers.js';
import { predictedText } from '../../words/requirement.js';
import { shareText } from '../../words/verdict.js';
import { boundText, type Listed, type ListedRequirement, requirementName, roomText } from '../content/requirements.js';
import { clearanceStrip, stripHead } from './strip.js';
import { numberSigns, sentenceSigns, spanSigns } from './typography.js';

const NO_BREAK = '\u00a0';
/** As wide as a figure, so that names stand under each other. */
const FIGURE_BLANK = '\u2007';

/** Roles are written out: a row that the style lays out in two lines would lose them. */
function cell(cssClass: string, ...children: readonly Child[]): Markup {
  return element('td', { role: 'cell', class: cssClass }, ...children);
}

function headCell(cssClass: string, head: string, unit: string): Markup {
  const units = unit === '' ? '' : fragment(' ', element('span', { class: 'unit' }, unit));
  return element('th', { scope: 'col', role: 'columnheader', class: cssClass }, head, units);
}

/** What is said in the heads of the columns, for a row that stands in two lines without them. */
function narrowWord(text: string): Markup {
  return element('span', { class: 'word' }, text);
}

function rowMarkup(
  { requirement, number, isExtra }: ListedRequirement,
  isRepeated: boolean,
  isWorst: boolean,
  unit: FrequencyUnit,
): Markup {
  const { unit: level, span, predicted, decimals, isMet } = requirement;
  const name = element('span', { class: isRepeated ? 'again' : undefined }, requirementName(requirement));
  const classes = [isWorst ? 'tightest' : '', isMet ? '' : 'short', isExtra ? 'on-screen' : ''];
  const all = classes.filter((word) => word !== '').join(' ');
  // A miss says its share in the strip.
  const share = isMet ? shareText(requirement) : '';
  return element(
    'tr',
    { role: 'row', class: all === '' ? undefined : all },
    element(
      'th',
      { scope: 'row', role: 'rowheader' },
      element('span', { class: 'count' }, String(number).padStart(2, FIGURE_BLANK)),
      NO_BREAK,
      name,
      NO_BREAK,
      element('span', { class: 'unit' }, level),
    ),
    cell('over', spanSigns(span), narrowWord(` ${unit.name}`)),
    cell('limit', numberSigns(boundText(requirement))),
    cell('predicted', narrowWord('predicted '), numberSigns(predictedText(predicted, level, decimals))),
    cell('room', narrowWord(isMet ? 'clear by ' : ''), roomText(requirement)),
    cell('share', clearanceStrip(requirement), ...(share === '' ? [] : [narrowWord(share)])),
  );
}

/** The requirement table of the first page, with a clearance strip in each row. */
export function requirementsMarkup({ requirements, worst, notes }: Listed, unit: FrequencyUnit): Markup {
  const rows = requirements.map((listed, n) => {
    const isRepeated = requirements[n - 1]?.requirement.name === listed.requirement.name;
    return rowMarkup(listed, isRepeated, listed.requirement === worst, unit);
  });
  const head = element(
    'tr',
    { role: 'row' },
    headCell('', 'Requirement', ''),
    headCell('n', 'Over', unit.name),
    headCell('n', 'Limit', ''),
    headCell('n', 'Predicted', ''),
    headCell('n', 'Room', ''),
    element(
      'th',
      { scope: 'col', role: 'columnheader', class: 'share' },
      element('span', { class: 'unit' }, 'room, % of limit'),
      stripHead(),
    ),
  );
  return fragment(
    element(
      'table',
      { id: 'requirements', role: 'table' },
      element('caption', { class: 'unseen' }, 'Requirements, what is predicted, and the room left'),
      element('thead', { role: 'rowgroup' }, head),
      element('tbody', { role: 'rowgroup' }, ...rows),
    ),
    ...notes.map(({ text, medium }) =>
      element('p', { class: medium === undefined ? 'note' : `note on-${medium}` }, sentenceSigns(text)),
    ),
  );
}
