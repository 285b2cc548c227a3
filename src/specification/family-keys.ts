import type { Fault } from './faults.js';
import { kindFault } from './faults.js';
import type { SpecificationFamily, SpecificationInput } from './specification.js';
import { rejectionFault, stopBandEdgeFault } from './stop-band.js';

type Parts = Partial<SpecificationInput>;

/** Keys that only some families know, and which. */
const KNOWN_TO: Readonly<Record<string, readonly SpecificationFamily[]>> = {
  rejectionDb: ['inverseChebyshev', 'elliptic'],
  stopBandEdge: ['elliptic'],
  largestPairAtInfinity: ['elliptic'],
  reflectionSide: ['bessel'],
};

/**
 * Largest orders of flat-delay designs: with all reflection zeros on one side the energy sits at one end of the filter, and
 * above these orders the matrix in doubles has too few digits left for its certificates (tests go to these orders).
 */
const BESSEL_ORDER = { oneSided: 48, alternating: 60 };

/** Faults of the keys that belong to single families: strangers, missing ones, their ranges. `isBad` tells unsound keys. */
export function familyKeyFaults(parts: Parts, isBad: (key: string) => boolean): readonly Fault[] {
  const family = parts.family ?? 'generalizedChebyshev';
  const present = (key: keyof SpecificationInput): boolean => parts[key] !== undefined || isBad(key);
  const strangers = Object.entries(KNOWN_TO)
    .filter(([key, families]) => parts[key as keyof Parts] !== undefined && !families.includes(family))
    .map(([key, families]) => strangerFault(key, family, families));
  const ranges = [
    parts.rejectionDb === undefined ? undefined : rejectionFault(parts.rejectionDb),
    parts.stopBandEdge === undefined ? undefined : stopBandEdgeFault(parts.stopBandEdge),
    movedFault(parts),
    besselFault(parts),
    missingFault(family, present('rejectionDb'), present('stopBandEdge')),
  ].filter((fault) => fault !== undefined);
  return [...strangers, ...ranges];
}

function strangerFault(key: string, family: string, families: readonly string[]): Fault {
  const names = families.map((name) => `"${name}"`).join(' or ');
  return {
    code: 'E_FAMILY_KEY',
    path: [key],
    found: `a key that family "${family}" does not know`,
    allowed: `${key} with family ${names} only`,
    advice: `remove it, or set family to ${names}`,
    limit: families,
    onKey: true,
  };
}

/** inverseChebyshev needs the level of its stop band, elliptic the level or the edge, not both. */
function missingFault(family: SpecificationFamily, hasLevel: boolean, hasEdge: boolean): Fault | undefined {
  if (family === 'inverseChebyshev' && !hasLevel) {
    return kindFault(['rejectionDb'], undefined, 'the rejection of the stop band, dB', 'add "rejectionDb"');
  }
  if (family !== 'elliptic' || hasLevel !== hasEdge) return undefined;
  const allowed = 'one of rejectionDb and stopBandEdge: the other follows from it';
  if (!hasLevel) return kindFault(['rejectionDb'], undefined, allowed, 'add "rejectionDb" or "stopBandEdge"');
  const base = { code: 'E_STOP_BAND', path: ['stopBandEdge'], found: 'an edge beside rejectionDb', allowed };
  return { ...base, advice: 'remove one', onKey: true };
}

function movedFault({ family, order, largestPairAtInfinity }: Parts): Fault | undefined {
  if (family !== 'elliptic' || largestPairAtInfinity !== true || order === undefined || order % 2 !== 1)
    return undefined;
  return {
    code: 'E_ORDER_RANGE',
    path: ['largestPairAtInfinity'],
    found: `true with order ${order}`,
    allowed: 'even orders',
    advice: 'remove it: an odd order needs no direct coupling',
    value: order,
  };
}

function besselFault({ family, order, reflectionSide }: Parts): Fault | undefined {
  if (family !== 'bessel' || order === undefined) return undefined;
  const isAlternating = reflectionSide === 'alternating';
  const limit = isAlternating ? BESSEL_ORDER.alternating : BESSEL_ORDER.oneSided;
  if (!(order > limit)) return undefined;
  return {
    code: 'E_ORDER_RANGE',
    path: ['order'],
    found: `${order} with family "bessel"`,
    allowed: isAlternating ? `1 to ${limit}` : `1 to ${limit} with all reflection zeros in one half plane`,
    advice: isAlternating
      ? 'lower it'
      : `lower it, or set reflectionSide to "alternating" (to ${BESSEL_ORDER.alternating})`,
    value: order,
    limit: [1, limit],
  };
}
