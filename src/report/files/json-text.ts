const LINE = 100;

function isPlain(value: unknown): boolean {
  return typeof value !== 'object' || value === null;
}

/**
 * JSON with two blanks an indent, where a list or an object of plain values that fits a line stands on it, and a list of
 * numbers always: a matrix reads row by row.
 */
export function jsonText(value: unknown, indent = ''): string {
  if (typeof value !== 'object' || value === null) return JSON.stringify(value) ?? 'null';
  const isList = Array.isArray(value);
  const entries = Object.entries(value).filter(([, inner]) => isList || inner !== undefined);
  const [open, close] = isList ? '[]' : '{}';
  if (entries.length === 0) return `${open}${close}`;
  const deeper = `${indent}  `;
  const members = entries.map(([key, inner]) => {
    const text = jsonText(inner, deeper);
    return isList ? text : `${JSON.stringify(key)}: ${text}`;
  });
  const numbersOnly = isList && value.every((inner) => typeof inner === 'number');
  const short = entries.every(([, inner]) => isPlain(inner)) && members.join(', ').length + indent.length < LINE;
  const pad = isList ? '' : ' ';
  if (numbersOnly || short) return `${open}${pad}${members.join(', ')}${pad}${close}`;
  return `${open}\n${members.map((member) => deeper + member).join(',\n')}\n${indent}${close}`;
}
