import { beforeAll, describe, expect, it } from 'vitest';
import { type Bundle, bundle, ENTRIES } from './bundle.js';
import { sizeTable } from './table.js';

interface Ceiling {
  readonly bytes: number;
  readonly gzippedBytes: number;
}

/** About a tenth above what was measured: a bundle grows by intent, not by accident. */
const CEILINGS: Readonly<Record<string, Ceiling>> = {
  // Measured on 1 December 2026: 214.2 kB, 68.6 kB gzipped; 183 kB before the further families and S11 other than S22.
  design: { bytes: 235_000, gzippedBytes: 75_000 },
  // Measured on 1 December 2026: 52.6 kB, 19.3 kB gzipped; 42 kB before synthesis took S11 other than S22.
  folded: { bytes: 58_000, gzippedBytes: 21_200 },
};

describe('bundles for browsers', () => {
  let bundles: readonly Bundle[] = [];
  const named = (name: string): Bundle => {
    const found = bundles.find((each) => each.name === name);
    if (found === undefined) throw new Error(`no bundle ${name}`);
    return found;
  };

  beforeAll(async () => {
    bundles = await Promise.all(ENTRIES.map(bundle));
    console.log(sizeTable(bundles));
  }, 60_000);

  it.each(Object.entries(CEILINGS))('%s stays below its ceiling', (name, ceiling) => {
    const { bytes, gzippedBytes } = named(name);
    expect(bytes).toBeLessThan(ceiling.bytes);
    expect(gzippedBytes).toBeLessThan(ceiling.gzippedBytes);
    // Far below it, the ceiling guards nothing.
    expect(bytes).toBeGreaterThan(0.8 * ceiling.bytes);
  });

  it('have a ceiling each', () => {
    expect(Object.keys(CEILINGS)).toEqual(ENTRIES);
  });

  it('come from the built package, not from its sources', () => {
    for (const { contents } of bundles) {
      expect(Object.keys(contents)).toContain('dist/synthesis');
      expect(Object.keys(contents).filter((place) => place.startsWith('src/'))).toEqual([]);
    }
  });

  it('leave out what a specification to folded matrix does not need', () => {
    const { contents } = named('folded');
    for (const place of ['zod', 'ml-matrix', 'd3-scale', 'd3-shape', 'dist/certification', 'dist/report'])
      expect(Object.keys(contents)).not.toContain(place);
    expect(Object.keys(contents)).toEqual(expect.arrayContaining(['complex.js', 'dist/approximation']));
  });

  it('leave the pictures out of a design', () => {
    const places = Object.keys(named('design').contents);
    expect(places.filter((place) => /^d3-|^dist\/(report|command-line)$/.test(place))).toEqual([]);
  });
});
