const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const NO_BREAK = '\u00a0';

function superscript(digits: string): string {
  return digits.replace(/\d/g, (digit) => SUPERSCRIPTS[Number(digit)] ?? digit).replace('-', '⁻');
}

/** Signs of order as one character each. */
function ordered(text: string): string {
  return text.replace(/>= ?/g, `≥${NO_BREAK}`).replace(/<= ?/g, `≤${NO_BREAK}`);
}

/** A number of a cell: true minus, signs of order, the power of ten written out. */
export function numberSigns(text: string): string {
  const power = text.replace(/e([+-])0*(\d+)$/, (_, sign: string, digits: string) => {
    return `${NO_BREAK}×${NO_BREAK}10${superscript(sign === '-' ? `-${digits}` : digits)}`;
  });
  return ordered(power).replaceAll('-', '−');
}

/** A span of frequency: a hyphen between two numbers is "to". */
export function spanSigns(text: string): string {
  return ordered(text).replace(/(\d)-(\d)/g, '$1–$2');
}

/** A sentence or a name: minus before a number, dash between two nodes or numbers, powers of s. */
export function sentenceSigns(text: string): string {
  return ordered(text)
    .replace(/(^|[\s(=^])-(?=[\d.j])/g, '$1−')
    .replaceAll(' - ', ' – ')
    .replace(/(\d) (?=(?:dB|[kMG]?Hz|[nµm]s|%)(?![A-Za-z]))/g, `$1${NO_BREAK}`)
    .replace(/\bepsilon(R?)\b/g, 'ε$1')
    .replace(/([\wε)])\*(?=[\wε(])/g, '$1·')
    .replace(/\bs\^(\d+)/g, (_, digits: string) => `s${superscript(digits)}`);
}

/** A formula: Greek where it is spoken so, a dot for the product, true minus. */
export function formulaSigns(text: string): string {
  return text
    .replace(/\bw\b/g, 'ω')
    .replace(/\bpi\b/g, 'π')
    .replace(/\bsqrt\(/g, '√(')
    .replace(/\bf0\b/g, 'f₀')
    .replace(/\bf1\b/g, 'f₁')
    .replace(/\bf2\b/g, 'f₂')
    .replace(/\blog10\b/g, 'log₁₀')
    .replace(/\^2\b/g, '²')
    .replaceAll('^-1', '⁻¹')
    .replaceAll('*', '·')
    .replace(/(^|[\s(=])-(?=[\dj])/g, '$1−')
    .replaceAll(' - ', ' − ');
}
