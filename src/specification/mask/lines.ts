import type { Band, Level, MaskLine, Span } from '../../forms/index.js';
import { edgesOfBand } from '../../forms/index.js';
import { LEAST_HZ, MOST_HZ, readFrequency } from '../band.js';
import { definedOnly } from '../defined.js';
import type { Fault, Path } from '../faults.js';
import type { MaskLineInput } from '../specification.js';
import type { LevelKey, PlacedLine } from './contradictions.js';
import { contradictionFaults, LEVELS } from './contradictions.js';

const MOST_DB = 1000;
const MOST_LINES = 1000;
const ALLOWED_HZ = `a positive frequency, ${LEAST_HZ} to ${MOST_HZ} Hz`;

function maskFault(path: Path, found: string, allowed: string, advice: string, value?: unknown): Fault {
  return { code: 'E_MASK', path, found, allowed, advice, value };
}

function readSpan(line: MaskLineInput, path: Path, faults: Fault[]): Span | undefined {
  const before = faults.length;
  const fromHz = readFrequency(line.fromHz, [...path, 'fromHz'], faults);
  const toHz = readFrequency(line.toHz, [...path, 'toHz'], faults);
  if (line.fromHz === undefined && line.toHz === undefined) {
    const advice = 'add fromHz, toHz, or both (equal for a point)';
    faults.push(maskFault(path, 'neither fromHz nor toHz', 'at least one end', advice));
  }
  for (const [key, hertz] of [
    ['fromHz', fromHz],
    ['toHz', toHz],
  ] as const) {
    if (hertz === undefined || (hertz >= LEAST_HZ && hertz <= MOST_HZ)) continue;
    faults.push(maskFault([...path, key], `${hertz} Hz`, ALLOWED_HZ, 'leave the key out for an open end', hertz));
  }
  if (fromHz !== undefined && toHz !== undefined && fromHz > toHz) {
    faults.push(maskFault(path, `fromHz ${fromHz} above toHz ${toHz}`, 'fromHz up to toHz', 'exchange them?'));
  }
  if (faults.length > before) return undefined;
  return definedOnly({ fromHz, toHz, relativeTo: line.relativeTo });
}

function sizeFault(key: LevelKey, level: Level, path: Path): Fault | undefined {
  const inDb = key.endsWith('Db');
  const values = typeof level === 'number' ? [level] : level;
  const wrong = values.find((value) => !(value >= 0 && value <= (inDb ? MOST_DB : Number.MAX_VALUE)));
  if (wrong === undefined) return undefined;
  const allowed = inDb ? `0 to ${MOST_DB} dB` : 'a positive number of seconds';
  const advice = wrong < 0 ? 'drop the sign: levels are positive' : 'lower it';
  return maskFault(path, String(wrong), allowed, advice, level);
}

/** A pair needs both ends, and a width to slope over. */
function pairFault(level: Level, span: Span, path: Path): Fault | undefined {
  if (typeof level === 'number') return undefined;
  if (span.fromHz === undefined || span.toHz === undefined) {
    const advice = 'give the other end, or one value';
    return maskFault(path, 'a pair on an open span', 'a pair only with both ends', advice, level);
  }
  if (span.fromHz !== span.toHz || level[0] === level[1]) return undefined;
  const advice = 'widen the span, or give one value';
  return maskFault(path, 'two values at one frequency', 'one value at a point', advice, level);
}

/** A variation needs a width; that of the loss has no bound over an open span. */
function variationFault(key: LevelKey, span: Span, path: Path): Fault | undefined {
  if (!key.includes('Variation')) return undefined;
  if (span.fromHz === span.toHz) {
    return maskFault(path, 'a variation over a point', 'a span with a width', 'widen the span');
  }
  const open = span.fromHz === undefined || span.toHz === undefined;
  if (!open || key === 'groupDelayVariationSeconds') return undefined;
  const allowed = 'both ends: loss has no bound far out';
  return maskFault(path, 'a loss variation over an open span', allowed, 'add the other end');
}

function readLevel(
  line: MaskLineInput,
  span: Span | undefined,
  path: Path,
  faults: Fault[],
): readonly [LevelKey, Level] | undefined {
  const present = LEVELS.filter((key) => line[key] !== undefined);
  const [key] = present;
  if (key === undefined || present.length > 1) {
    const found = key === undefined ? 'no level' : `${present.length} levels: ${present.join(', ')}`;
    faults.push(maskFault(path, found, `one of ${LEVELS.join(', ')}`, 'give one level a line'));
    return undefined;
  }
  const level = line[key];
  if (level === undefined || span === undefined) return undefined;
  const inner = [...path, key];
  const fault = sizeFault(key, level, inner) ?? pairFault(level, span, inner) ?? variationFault(key, span, path);
  if (fault === undefined) return [key, level];
  faults.push(fault);
  return undefined;
}

/** Reads the lines of a mask; `skip` holds the indices whose structure is already known to be wrong. */
export function readMask(
  lines: readonly MaskLineInput[],
  band: Band | undefined,
  skip: ReadonlySet<number>,
  faults: Fault[],
): readonly MaskLine[] {
  if (lines.length > MOST_LINES) {
    faults.push(
      maskFault(['mask'], `${lines.length} lines`, `at most ${MOST_LINES} lines`, 'join lines into longer spans'),
    );
    return [];
  }
  const placed: PlacedLine[] = [];
  lines.forEach((line, index) => {
    if (skip.has(index)) return;
    const path = ['mask', index];
    const span = readSpan(line, path, faults);
    const read = readLevel(line, span, path, faults);
    if (span !== undefined && read !== undefined) placed.push({ index, span, key: read[0], level: read[1] });
  });
  faults.push(...contradictionFaults(placed, band === undefined ? undefined : edgesOfBand(band)));
  // The key decides the kind of line, which a computed key hides from the compiler.
  return placed.map(({ span, key, level }) => ({ ...span, [key]: level }) as MaskLine);
}
