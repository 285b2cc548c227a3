/** Every sign of ASCII that could begin markup, a link, an entity or a table cell. */
const SIGNS = /[!-/:-@[-`{-~]/g;

/** Text of the user, cleaned before, on one line: each sign is escaped, so that it is nothing but itself. */
export function escapeUser(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim();
  return line.replace(SIGNS, (sign) => `\\${sign}`);
}

/** Text of the document's own: only what would change its meaning is escaped, so that the file reads well as it is. */
export function escapeOwn(text: string): string {
  return text.replace(/[\\`*_[\]<>|#]/g, (sign) => `\\${sign}`);
}
