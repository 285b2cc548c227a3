import type { UserText } from './content.js';

/** Control characters, direction marks, lone surrogates, and code points that are no characters: nothing for a page or a file. */
const FORBIDDEN =
  // biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters to be replaced
  /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069\ufeff\p{Surrogate}\p{Noncharacter_Code_Point}]/gu;

/** Plain text of the user without what no document should hold; each such character shows as the replacement character. */
export function cleanText(text: string): string {
  return text.replace(FORBIDDEN, '\ufffd');
}

/** Text of the user for a document. */
export function userText(text: string): UserText {
  return { user: cleanText(text) };
}

/** Text of the user line by line; lines without a word are left out. */
export function userLines(text: string): readonly UserText[] {
  const lines = cleanText(text).split(/\r\n|[\r\n]/);
  return lines.filter((line) => line.trim() !== '').map((user) => ({ user }));
}
