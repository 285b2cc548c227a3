/** Signs that make markup wherever they stand: code, emphasis, links, tags, tables, mathematics, and what templates read. */
const ANYWHERE = /[\\`*[\]<|~$@{}]/g;
/** A low line between letters is nothing but itself; at the edge of a word it is emphasis. */
const EMPHASIS = /(?<![\p{L}\p{N}])_|_(?![\p{L}\p{N}])/gu;
/** What ends a head, begins an entity or an address, and colons round words that readers turn into small pictures. */
const ELSEWHERE = /#+$|&(?=#?\w+;)|:(?=\/\/|[\w+-]+:)|(?<=\bwww)\./gi;
/** Signs that Markdown means nothing by after a backslash (CommonMark 0.31, 2.4, from memory). */
const SIGN = /[!-/:-@[-`{-~]/g;

function escaped(text: string): string {
  return text.replace(SIGN, '\\$&');
}

/** Text of the user, cleaned before, on one line: what could mean more than itself is escaped, and nothing else. */
export function escapeUser(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim();
  return line.replace(ANYWHERE, escaped).replace(EMPHASIS, escaped).replace(ELSEWHERE, escaped);
}

/** Text of the document's own: only what would change its meaning is escaped, so that the file reads well as it is. */
export function escapeOwn(text: string): string {
  return text.replace(/[\\`*[\]<|]/g, escaped).replace(EMPHASIS, escaped);
}

/** An escaped text that begins a line or an item of a list: it makes no head, quotation, list or rule of it. */
export function lineStart(text: string): string {
  return text.replace(/^[#>+=-]/, escaped).replace(/^(\d+)([.)])/, '$1\\$2');
}
