/** Control characters, direction marks and lone surrogates: nothing that a text file should hold. */
const FORBIDDEN =
  // biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters to be removed
  /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u200e\u200f\u2028-\u202e\u2066-\u2069\u061c\ufeff\ufffe\uffff]|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g;

/** Every sign of ASCII that could begin markup, a link, an entity or a table cell. */
const SIGNS = /[!-/:-@[-`{-~]/g;

/** Text of the user on one line: each sign is escaped, so that it is nothing but itself. */
export function escapeUser(text: string): string {
  const line = text.replace(FORBIDDEN, '\ufffd').replace(/\s+/g, ' ').trim();
  return line.replace(SIGNS, (sign) => `\\${sign}`);
}

/** Text of the document's own: only what would change its meaning is escaped, so that the file reads well as it is. */
export function escapeOwn(text: string): string {
  return text.replace(/[\\`*_[\]<>|#]/g, (sign) => `\\${sign}`);
}
