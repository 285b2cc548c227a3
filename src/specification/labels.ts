import { echo, isUnsafe } from './echo.js';
import type { Fault } from './faults.js';

const NAME_LIMIT = 120;
const NOTES_LIMIT = 1000;
const REVISION_LIMIT = 20;
/** Line ends and tabs may stand in notes, not in a name. */
const NOTES_CONTROLS = '\n\r\t';

function labelFault(key: string, text: string, limit: number, controls: string): Fault | undefined {
  const base = { code: 'E_NAME', path: [key], value: text.slice(0, limit), limit };
  const allowed = `at most ${limit} characters, none of them control or direction marks`;
  if (text.length > limit) return { ...base, found: `${text.length} characters`, allowed, advice: 'shorten it' };
  for (const character of text) {
    if (controls.includes(character) || !isUnsafe(character.codePointAt(0) ?? 0)) continue;
    return { ...base, found: `${echo(character)} within it`, allowed, advice: 'remove that character' };
  }
  return undefined;
}

/** The fault of a name, if it has one. What remains is kept as written and escaped wherever it goes. */
export function nameFault(name: string): Fault | undefined {
  return labelFault('name', name, NAME_LIMIT, '');
}

/** The fault of a revision, if it has one. */
export function revisionFault(revision: string): Fault | undefined {
  return labelFault('revision', revision, REVISION_LIMIT, '');
}

/** The fault of notes, if they have one. */
export function notesFault(notes: string): Fault | undefined {
  return labelFault('notes', notes, NOTES_LIMIT, NOTES_CONTROLS);
}
