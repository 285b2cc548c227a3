import { cleanText } from '../../words/clean-text.js';
import type { UserText } from './content.js';

/** Text of the user for a document. */
export function userText(text: string): UserText {
  return { user: cleanText(text) };
}

/** Text of the user line by line; lines without a word are left out. */
export function userLines(text: string): readonly UserText[] {
  const lines = cleanText(text).split(/\r\n|[\r\n]/);
  return lines.filter((line) => line.trim() !== '').map((user) => ({ user }));
}
