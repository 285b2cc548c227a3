/** Longest echo of anything a caller wrote, in characters. */
const ECHO_LIMIT = 40;

/** Control characters, direction marks, line separators, byte-order mark. Written as ranges of code units. */
const UNSAFE: readonly (readonly [number, number])[] = [
  [0x00, 0x1f],
  [0x7f, 0x9f],
  [0x061c, 0x061c],
  [0x200e, 0x200f],
  [0x2028, 0x202e],
  [0x2066, 0x2069],
  [0xd800, 0xdfff],
  [0xfeff, 0xfeff],
];

/** Whether a code point must never reach a terminal or a page as it is. A surrogate is unsafe only when it stands alone. */
export function isUnsafe(codePoint: number): boolean {
  return UNSAFE.some(([from, to]) => codePoint >= from && codePoint <= to);
}

function escapeCharacter(character: string): string {
  const codePoint = character.codePointAt(0) ?? 0;
  if (isUnsafe(codePoint)) return `\\u${codePoint.toString(16).padStart(4, '0')}`;
  return character === '"' || character === '\\' ? `\\${character}` : character;
}

/** Text with unsafe characters escaped, cut to `limit` characters. */
export function escapeText(text: string, limit: number = ECHO_LIMIT): string {
  let out = '';
  for (const character of text.slice(0, limit + 1)) {
    const next = escapeCharacter(character);
    if (out.length + next.length > limit) return `${out.slice(0, limit - 1)}…`;
    out += next;
  }
  return out;
}

function describeObject(value: object): string {
  try {
    if (Array.isArray(value)) return `a list of ${String(value.length)}`;
    for (const boxed of [Number, String, Boolean]) if (value instanceof boxed) return `a ${boxed.name} object`;
    return 'an object';
  } catch {
    return 'an object that cannot be read';
  }
}

/** A value as it appears after the word "found": never throws, never longer than the limit, nothing unescaped. */
export function echo(value: unknown): string {
  switch (typeof value) {
    case 'number':
      return Object.is(value, -0) ? '-0' : String(value);
    case 'string':
      return `the string "${escapeText(value, ECHO_LIMIT - 2)}"`;
    case 'boolean':
      return String(value);
    case 'undefined':
      return 'nothing';
    case 'bigint':
      return 'a BigInt';
    case 'object':
      return value === null ? 'null' : describeObject(value);
    default:
      return `a ${typeof value}`;
  }
}

/** A complex number `re + j*im` as it appears in messages. */
export function echoComplex(value: { readonly re: number; readonly im: number }): string {
  if (value.re === 0) return `${value.im}j`;
  return value.im < 0 ? `${value.re}-${-value.im}j` : `${value.re}+${value.im}j`;
}

/** Hertz without the last digit or two, which conversion leaves noisy. */
export function hertzText(hertz: number): string {
  return String(Number(hertz.toPrecision(14)));
}
