import { checkTwoPortData, RECORD_ORDER, type TwoPortData } from './two-port-data.js';

const COMMENT_LIMIT = 200;

/** Shortest decimal text of a double: it reads back to the same bits. Minus zero becomes 0. */
function numberText(value: number): string {
  return value === 0 ? '0' : String(value);
}

/** One comment line: plain ASCII, so that nothing in it can end the line or the comment. */
function commentLine(comment: string): string {
  const plain = Array.from(String(comment).slice(0, COMMENT_LIMIT), (character) => {
    const code = character.codePointAt(0) ?? 0;
    if (code === 9 || code === 10 || code === 13) return ' ';
    return code >= 0x20 && code <= 0x7e ? character : '?';
  });
  return `! ${plain.join('')}`.trimEnd();
}

/**
 * Text of a two-port data file in Touchstone format 1.x: hertz, S-parameters, real and imaginary parts.
 *
 * `frequenciesHz` rising, hertz; `s11`, `s21`, `s12`, `s22` each `{ re, im }`, lists as long as the grid (what `sweepHz`
 * returns fits); `referenceOhms` of both ports, 50 when absent; `comments` become lines that start with `!`, reduced to
 * printable ASCII. A record is one line in the order f, 11, 21, 12, 22 that the format has for two-ports. Numbers are
 * written with as many digits as read back to the same double. Cost O(frequencies), about 200 bytes each.
 *
 * @throws FilterFailure E_TS_EMPTY, E_TS_COUNT, E_TS_FREQUENCY, E_TS_ORDER, E_TS_OPTION, E_NOT_FINITE, E_TYPE
 *
 * Source: EIA/IBIS Open Forum, Touchstone File Format Specification, Rev 1.1, 2002 (from memory).
 *
 * @example
 * const response = chebyshev({ order: 3, returnLossDb: 20 });
 * const data = sweepHz(response, { centerHz: 1e9, bandwidthHz: 20e6 }, [0.99e9, 1e9, 1.01e9]);
 * formatTouchstone({ ...data, comments: ['three frequencies'] }).split('\n')[1]; // '# Hz S RI R 50'
 */
export function formatTouchstone(data: TwoPortData): string {
  const points = checkTwoPortData(data);
  const lines = (data.comments ?? []).map(commentLine);
  lines.push(`# Hz S RI R ${numberText(data.referenceOhms ?? 50)}`);
  for (let n = 0; n < points; n += 1) {
    const parts = RECORD_ORDER.flatMap((name) => [data[name].re[n] ?? 0, data[name].im[n] ?? 0]);
    lines.push([data.frequenciesHz[n] ?? 0, ...parts].map(numberText).join(' '));
  }
  return `${lines.join('\n')}\n`;
}
