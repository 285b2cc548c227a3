import type { Band } from '../forms/index.js';
import { bandFromEdges } from '../forms/index.js';
import { echo, hertzText } from './echo.js';
import type { Fault, Path } from './faults.js';
import { frequencyFromText } from './quantity.js';
import type { FrequencyInput, PassbandInput } from './specification.js';

/** Frequencies outside this range are slips, and would overflow later. */
export const LEAST_HZ = 1e-18;
export const MOST_HZ = 1e18;
/** Narrowest band that double precision still resolves with seven digits. */
const LEAST_FRACTION = 1e-9;
/** Above this fractional bandwidth the narrow-band model of couplings is questionable. */
const WIDE_FRACTION = 0.2;

/** A center below this is more likely a missing unit than a microwave filter. */
const LOW_HZ = 1e6;

const ALLOWED = '0 < lower edge < upper edge, in Hz';

/** A passband as read: the band and what deserves a look. */
export interface BandRead {
  readonly band: Band;
  readonly remarks: readonly string[];
}

/** A frequency as hertz; text goes through the unit reader. A fault is added to the list and gives undefined. */
export function readFrequency(value: FrequencyInput | undefined, path: Path, faults: Fault[]): number | undefined {
  if (value === undefined) return undefined;
  const hertz = typeof value === 'number' ? value : frequencyFromText(value, path);
  if (typeof hertz === 'number') return hertz;
  faults.push(hertz);
  return undefined;
}

function bandFault(found: string, advice: string, value: unknown): Fault {
  return { code: 'E_BAND', path: ['passband'], found, allowed: ALLOWED, advice, value };
}

function limitsFault(lowerHz: number, upperHz: number): Fault | undefined {
  const found = `edges ${lowerHz} Hz and ${upperHz} Hz`;
  const value = { lowerHz, upperHz };
  if (lowerHz <= 0 || upperHz <= 0) {
    return bandFault(found, 'write positive frequencies; check the sign and the units', value);
  }
  if (lowerHz > upperHz) return bandFault(found, 'exchange lowerHz and upperHz?', value);
  if (lowerHz === upperHz) return bandFault(found, 'the width is 0: give two different edges', value);
  if (lowerHz < LEAST_HZ || upperHz > MOST_HZ) {
    return bandFault(found, `stay between ${LEAST_HZ} and ${MOST_HZ} Hz; check the units`, value);
  }
  if ((upperHz - lowerHz) / upperHz >= LEAST_FRACTION) return undefined;
  return bandFault(found, `widen it: below ${LEAST_FRACTION} of the center frequency the digits run out`, value);
}

function fromEdges(lowerHz: number, upperHz: number, faults: Fault[]): Band | undefined {
  const fault = limitsFault(lowerHz, upperHz);
  if (fault === undefined) return bandFromEdges(lowerHz, upperHz);
  faults.push(fault);
  return undefined;
}

function fromCenter(centerHz: number, bandwidthHz: number, faults: Fault[]): Band | undefined {
  const lowerHz = centerHz - bandwidthHz / 2;
  const upperHz = centerHz + bandwidthHz / 2;
  const found = `center ${centerHz} Hz and width ${bandwidthHz} Hz, so edges near ${lowerHz} Hz and ${upperHz} Hz`;
  const value = { centerHz, bandwidthHz };
  if (centerHz <= 0 || bandwidthHz <= 0) {
    faults.push(bandFault(found, 'write a positive center and a positive width', value));
    return undefined;
  }
  if (bandwidthHz >= 2 * centerHz) {
    const advice = 'the lower edge would not be above 0: check the units of center and width';
    faults.push(bandFault(found, advice, value));
    return undefined;
  }
  const fault = limitsFault(lowerHz, upperHz);
  if (fault === undefined) return { centerHz, bandwidthHz };
  faults.push({ ...fault, found, value });
  return undefined;
}

function readPair(
  passband: PassbandInput,
  keys: readonly [keyof PassbandInput, keyof PassbandInput],
  faults: Fault[],
): readonly [number, number] | undefined {
  const [first, second] = keys.map((key) => {
    if (passband[key] === undefined) {
      const advice = `add "${key}"`;
      const allowed = 'lowerHz with upperHz, or centerHz with bandwidthHz';
      faults.push({ code: 'E_MISSING', path: ['passband', key], found: echo(undefined), allowed, advice });
    }
    return readFrequency(passband[key], ['passband', key], faults);
  });
  return first === undefined || second === undefined ? undefined : [first, second];
}

/** Reads a passband given by both edges or by center and width, whichever is there; both together are refused. */
export function readBand(passband: PassbandInput, faults: Fault[]): BandRead | undefined {
  const edges = passband.lowerHz !== undefined || passband.upperHz !== undefined;
  const center = passband.centerHz !== undefined || passband.bandwidthHz !== undefined;
  if (edges && center) {
    const advice = 'give lowerHz and upperHz, or centerHz and bandwidthHz, and remove the rest';
    faults.push(bandFault('edges mixed with center or width', advice, passband));
    return undefined;
  }
  const pair = readPair(passband, center ? ['centerHz', 'bandwidthHz'] : ['lowerHz', 'upperHz'], faults);
  if (pair === undefined) return undefined;
  const band = center ? fromCenter(...pair, faults) : fromEdges(...pair, faults);
  if (band === undefined) return undefined;
  const fraction = band.bandwidthHz / band.centerHz;
  const wide = `passband: fractional bandwidth ${fraction.toPrecision(3)}, and couplings are a narrow-band model`;
  const low = `passband: center ${hertzText(band.centerHz)} Hz, low for a microwave filter; a bare number is hertz, text may carry a unit`;
  return { band, remarks: [...(fraction > WIDE_FRACTION ? [wide] : []), ...(band.centerHz < LOW_HZ ? [low] : [])] };
}
