import { checkCopied } from './check.js';
import { readJson } from './json/reader.js';
import { plainCopy } from './plain-copy.js';
import type { Specification } from './specification.js';

/**
 * Reads a design file's text: strict JSON, then the checks of `checkSpecification`, each fault with its line and column.
 *
 * @param text the whole text of the file, at most 1048576 characters
 * @returns a deep-frozen specification
 * @throws FilterFailure the codes of `readJson` (at the first fault) and of `checkSpecification` (all faults together)
 * @example
 * const parsed = parseSpecification(`{
 *   "passband": { "centerHz": "10 GHz", "bandwidthHz": "40 MHz" },
 *   "order": 4,
 *   "returnLossDb": 20
 * }`);
 * parsed.band.centerHz; // 10000000000
 */
export function parseSpecification(text: string): Specification {
  const { value, positionOf } = readJson(text);
  const copy = plainCopy(value, []);
  return checkCopied(copy.value, copy.faults, positionOf);
}
