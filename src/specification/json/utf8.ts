import { FilterFailure } from '../../numerics/index.js';
import { failureOf, kindFault } from '../faults.js';

const CHUNK = 4096;

/** Lead-byte classes: first byte range, number of following bytes, range of the first of them (RFC 3629, section 4). */
const SEQUENCES: readonly (readonly [number, number, number, number, number])[] = [
  [0xc2, 0xdf, 1, 0x80, 0xbf],
  [0xe0, 0xe0, 2, 0xa0, 0xbf],
  [0xe1, 0xec, 2, 0x80, 0xbf],
  [0xed, 0xed, 2, 0x80, 0x9f],
  [0xee, 0xef, 2, 0x80, 0xbf],
  [0xf0, 0xf0, 3, 0x90, 0xbf],
  [0xf1, 0xf3, 3, 0x80, 0xbf],
  [0xf4, 0xf4, 3, 0x80, 0x8f],
];

function encodingFailure(bytes: Uint8Array, offset: number): FilterFailure {
  const byte = bytes[offset];
  const found = byte === undefined ? 'the end within a character' : `byte 0x${byte.toString(16).padStart(2, '0')}`;
  const wide = (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
  const advice = wide ? 'it looks like UTF-16: save it as UTF-8' : 'save the file as UTF-8';
  const text = `E_ENCODING (byte ${offset}): found ${found}; allowed UTF-8; ${advice}`;
  return new FilterFailure('E_ENCODING', text, { value: offset, hint: advice });
}

/** Code point of the sequence at `offset` and its length. */
function decodeSequence(bytes: Uint8Array, offset: number): readonly [number, number] {
  const lead = bytes[offset] ?? 0;
  const found = SEQUENCES.find(([from, to]) => lead >= from && lead <= to);
  if (found === undefined) throw encodingFailure(bytes, offset);
  const [, , count, least, most] = found;
  let codePoint = lead & (0x3f >> count);
  for (let index = 1; index <= count; index += 1) {
    const byte = bytes[offset + index] ?? 0;
    if (byte < (index === 1 ? least : 0x80) || byte > (index === 1 ? most : 0xbf)) {
      throw encodingFailure(bytes, Math.min(offset + index, bytes.length));
    }
    codePoint = (codePoint << 6) | (byte & 0x3f);
  }
  return [codePoint, count + 1];
}

/**
 * Decodes UTF-8 strictly: overlong forms, surrogates and cut sequences are refused; a byte-order mark stays in the text.
 *
 * @param bytes the whole file
 * @returns the text; linear time
 * @throws FilterFailure E_ENCODING with the offset of the offending byte; E_TYPE
 * @example
 * decodeUtf8(new Uint8Array([0x4d, 0x48, 0x7a])); // 'MHz'
 */
export function decodeUtf8(bytes: Uint8Array): string {
  if (!(bytes instanceof Uint8Array)) throw failureOf(kindFault(['bytes'], bytes, 'a Uint8Array', 'pass raw bytes'));
  const pieces: string[] = [];
  let units: number[] = [];
  for (let offset = 0; offset < bytes.length; ) {
    const byte = bytes[offset] ?? 0;
    const [codePoint, length] = byte < 0x80 ? ([byte, 1] as const) : decodeSequence(bytes, offset);
    units.push(codePoint);
    offset += length;
    if (units.length < CHUNK) continue;
    pieces.push(String.fromCodePoint(...units));
    units = [];
  }
  pieces.push(String.fromCodePoint(...units));
  return pieces.join('');
}
