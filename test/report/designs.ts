import { readFileSync } from 'node:fs';
import { designChecked } from '../../src/design.js';
import { type Design, design, parseSpecification, type SpecificationInput } from '../../src/index.js';

/** The design of a fixture. */
export function fixtureDesign(name: string): Design {
  const file = new URL(`../../fixtures/designs/${name}.json`, import.meta.url);
  return designChecked(parseSpecification(readFileSync(file, 'utf8')));
}

/** A design in a band at 1 GHz. */
export function sampleDesign(more: Partial<SpecificationInput>): Design {
  return design({ passband: { centerHz: '1 GHz', bandwidthHz: '20 MHz' }, order: 4, returnLossDb: 20, ...more });
}
