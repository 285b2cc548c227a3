import type { Band, Complex } from '../../forms/index.js';
import { edgesOfBand, hzFromOmega, omegaFromHz } from '../../forms/index.js';
import { echo, echoComplex, hertzText } from '../echo.js';
import type { Fault, Path } from '../faults.js';
import { isQuotedNumber, kindFault } from '../faults.js';
import { frequencyFromText } from '../quantity.js';

/** Largest magnitude of a finite zero; farther out it cannot be told from one at infinity. */
const MAX_MAGNITUDE = 1e4;
const EPSILON = Number.EPSILON;
/** Frequencies within this and its inverse go through the band-pass map. */
const MAPPED_HZ = 1e90;
/** A few units in the last place of `magnitude`: what arithmetic on the caller's side may have left. */
export const ULPS = 4;

export const ZERO_ALLOWED =
  'a number w (the zero s = jw), {re, im} in the s-plane, or with a passband text with a unit (a frequency)';
const ZERO_ADVICE = 'write the zero in one of these ways';

const INFINITE_TEXT = /^\s*[+-]?(inf|infinity|infinite|∞)\s*j?\s*$/i;

/** One zero as read, with what was adjusted; `onEdge` marks a frequency that is a band edge to rounding. */
export interface ZeroRead {
  readonly zero: Complex;
  readonly remarks: readonly string[];
  readonly onEdge?: boolean;
}

/** Magnitude of a complex number whose parts are moderate. */
export function magnitude(value: Complex): number {
  const larger = Math.max(Math.abs(value.re), Math.abs(value.im));
  if (larger === 0) return 0;
  const x = value.re / larger;
  const y = value.im / larger;
  return larger * Math.sqrt(x * x + y * y);
}

/** Whether a deviation is no more than a few units in the last place of `size`. */
export function isRounding(deviation: number, size: number): boolean {
  return Math.abs(deviation) <= ULPS * EPSILON * size;
}

function infiniteFault(path: Path, value: unknown): Fault {
  const allowed = `finite zeros, abs(w) up to ${MAX_MAGNITUDE}`;
  return {
    code: 'E_ZERO_RANGE',
    path,
    found: echo(value),
    allowed,
    advice: 'leave zeros at infinity out',
    value,
    limit: MAX_MAGNITUDE,
  };
}

function fromText(text: string, path: Path, band: Band | undefined): ZeroRead | Fault {
  if (INFINITE_TEXT.test(text.slice(0, 40))) return infiniteFault(path, text);
  if (band === undefined || isQuotedNumber(text)) {
    const advice = band === undefined ? ZERO_ADVICE : 'remove the quotes, or add a unit';
    return kindFault(path, text, ZERO_ALLOWED, advice);
  }
  const hertz = frequencyFromText(text, path);
  if (typeof hertz !== 'number') return hertz;
  if (hertz <= 0) {
    const advice = 'write the band-pass frequency of the zero';
    return { code: 'E_QUANTITY', path, found: echo(text), allowed: 'a positive frequency', advice, value: text };
  }
  const { lowerHz, upperHz } = edgesOfBand(band);
  const onEdge = isRounding(hertz - lowerHz, hertz) || isRounding(hertz - upperHz, hertz);
  // Far beyond what the map takes, only the side counts: such a zero is refused by its size.
  const side = hertz < band.centerHz ? -Number.MAX_VALUE : Number.MAX_VALUE;
  const mapped = hertz > MAPPED_HZ || hertz < 1 / MAPPED_HZ ? side : omegaFromHz(band, hertz);
  return { zero: { re: 0, im: mapped }, remarks: [], onEdge };
}

function partOf(value: object, key: 're' | 'im', path: Path): number | Fault {
  const part: unknown = Reflect.get(value, key);
  if (typeof part === 'number' && Number.isFinite(part)) return part;
  return kindFault([...path, key], part, 'a finite number', `give both re and im`);
}

/** Reads -0 as 0 and a real part of rounding size as 0; says what it did. */
function snapped(re: number, im: number, name: string): ZeroRead {
  const remarks: string[] = [];
  if (Object.is(re, -0) || Object.is(im, -0)) remarks.push(`${name}: -0 read as 0`);
  const size = magnitude({ re, im });
  const onAxis = re !== 0 && isRounding(re, size);
  if (onAxis) remarks.push(`${name}: real part ${re} read as 0, within ${ULPS} units in the last place of ${size}`);
  return { zero: { re: onAxis ? 0 : re + 0, im: im + 0 }, remarks };
}

/** Reads one element of a list of zeros: number, complex pair, or frequency text. */
export function readZero(value: unknown, path: Path, name: string, band?: Band): ZeroRead | Fault {
  if (typeof value === 'string') return fromText(value, path, band);
  if (typeof value === 'number') {
    if (Number.isFinite(value)) return snapped(0, value, name);
    return kindFault(path, value, ZERO_ALLOWED, 'leave zeros at infinity out');
  }
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    return kindFault(path, value, ZERO_ALLOWED, ZERO_ADVICE);
  }
  const re = partOf(value, 're', path);
  const im = partOf(value, 'im', path);
  if (typeof re !== 'number') return re;
  if (typeof im !== 'number') return im;
  return snapped(re, im, name);
}

function placeText(zero: Complex, band: Band | undefined): string {
  if (band === undefined) return echoComplex(zero);
  const { lowerHz, upperHz } = edgesOfBand(band);
  const passband = `passband ${hertzText(lowerHz)} to ${hertzText(upperHz)} Hz`;
  return `${echoComplex(zero)}, at ${hertzText(hzFromOmega(band, zero.im))} Hz (${passband})`;
}

/** The fault of a zero's place: too far out, inside the passband, or on its edge. */
export function placeFault(read: ZeroRead, value: unknown, path: Path, band?: Band): Fault | undefined {
  const { zero } = read;
  const size = magnitude(zero);
  const base = { path, value };
  if (!(size <= MAX_MAGNITUDE)) return { ...infiniteFault(path, value), found: echoComplex(zero) };
  if (zero.re !== 0) return undefined;
  const found = placeText(zero, band);
  if (read.onEdge === true || size === 1) {
    const advice = 'move it outward: S21 cannot be 0 where the return loss is asked for';
    return { ...base, code: 'E_ZERO_ON_EDGE', found, allowed: 'abs(w) above 1', advice, limit: 1 };
  }
  if (size > 1) return undefined;
  const advice = 'move it out of the passband, where abs(w) < 1: it would null the signal';
  return { ...base, code: 'E_ZERO_IN_PASSBAND', found, allowed: 'abs(w) above 1 on the axis', advice, limit: 1 };
}
