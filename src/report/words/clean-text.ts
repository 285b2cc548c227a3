/** Control characters, direction marks, lone surrogates, and code points that are no characters: nothing for a page, a file or a terminal. */
const FORBIDDEN =
  // biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters to be replaced
  /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069\ufeff\p{Surrogate}\p{Noncharacter_Code_Point}]/gu;

/** Plain text without what no text for people should hold; each such character shows as the replacement character. */
export function cleanText(text: string): string {
  return text.replace(FORBIDDEN, '\ufffd');
}

/** Plain text on one line. */
export function cleanLine(text: string): string {
  return cleanText(text.replace(/[\r\n\t]+/g, ' '));
}
