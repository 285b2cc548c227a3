import { type Child, element, fragment, type Markup } from '../../svg/markup.js';
import type { FrequencyUnit } from '../../words/numbers.js';
import { predictedText, RELATIVE, type Requirement } from '../../words/requirement.js';
import { boundText, type Listed, RELATIVE_NOTE, requirementName, roomText } from '../content/requirements.js';
import { clearanceStrip, stripHead } from './strip.js';
import { numberSigns, sentenceSigns, spanSigns } from './typography.js';

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

function rowMarkup(requirement: Requirement, isRepeated: boolean, isWorst: boolean, unit: FrequencyUnit): Markup {
  const { unit: level, span, predicted, decimals, isMet } = requirement;
  const name = element('span', { class: isRepeated ? 'again' : undefined }, requirementName(requirement));
  const classes = [isWorst ? 'tightest' : '', isMet ? '' : 'short'].filter((word) => word !== '').join(' ');
  return element(
    'tr',
    { role: 'row', class: classes === '' ? undefined : classes },
    element('th', { scope: 'row', role: 'rowheader' }, name, ' ', element('span', { class: 'unit' }, level)),
    cell('over', spanSigns(span), narrowWord(` ${unit.name}`)),
    cell('limit', numberSigns(boundText(requirement))),
    cell('predicted', narrowWord('predicted '), numberSigns(predictedText(predicted, level, decimals))),
    cell('room', narrowWord(isMet ? 'clear by ' : ''), roomText(requirement)),
    cell('share', clearanceStrip(requirement)),
  );
}

/** The requirement table of the first page, with a clearance strip in each row. */
export function requirementsMarkup({ requirements, worst, more }: Listed, unit: FrequencyUnit): Markup {
  const rows = requirements.map((requirement, n) => {
    const isRepeated = requirements[n - 1]?.name === requirement.name;
    return rowMarkup(requirement, isRepeated, requirement === worst, unit);
  });
  const head = element(
    'tr',
    { role: 'row' },
    headCell('', 'Requirement', ''),
    headCell('n', 'Over', unit.name),
    headCell('n', 'Limit', ''),
    headCell('n', 'Predicted', ''),
    headCell('n', 'Clear by', ''),
    element(
      'th',
      { scope: 'col', role: 'columnheader', class: 'share' },
      element('span', { class: 'unit' }, 'clear by, % of limit'),
      stripHead(),
    ),
  );
  const isRelative = requirements.some(({ name }) => name.endsWith(RELATIVE));
  const notes = [...(isRelative ? [`${RELATIVE_NOTE}.`] : []), ...(more === undefined ? [] : [more])];
  return fragment(
    element(
      'table',
      { id: 'requirements', role: 'table' },
      element('caption', { class: 'unseen' }, 'Requirements, what is predicted, and the room left'),
      element('thead', { role: 'rowgroup' }, head),
      element('tbody', { role: 'rowgroup' }, ...rows),
    ),
    ...notes.map((note) => element('p', { class: 'note' }, sentenceSigns(note))),
  );
}
