import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { design } from '../../src/design.js';
import type { SpecificationInput } from '../../src/specification/index.js';
import { fill, folderWith, running } from './room.js';

const folder = new URL('../../fixtures/designs-families/', import.meta.url);
const names = readdirSync(folder).filter((name) => name.endsWith('.json'));
const read = (name: string): SpecificationInput => JSON.parse(readFileSync(new URL(name, folder), 'utf8'));

describe('design files of the classical families', () => {
  test.each(names)('%s runs through the program, and its result through analyze', async (name) => {
    const here = folderWith(read(name));
    const made = await running(here, ['design', 'one.json', '--out', 'made']);
    expect([made.status, made.stderr]).toEqual([0, '']);
    const isAllPole = name === 'plover-sound.json';
    expect(made.stdout.includes('No finite transmission zeros')).toBe(isAllPole);
    const looked = await running(here, ['analyze', 'made/result.json', '--json']);
    expect([looked.status, looked.stderr]).toEqual([0, '']);
    const { certificates } = JSON.parse(looked.stdout) as { certificates: readonly { check: string }[] };
    // The law of the family is looked at again.
    expect(certificates.filter(({ check }) => check.startsWith('C4')).length).toBeGreaterThan(1);
  });

  test('a matrix file that states one of them is certified against it', async () => {
    const { matrix } = design(read('sorrel-hill.json'));
    const stated = { family: 'inverseChebyshev', returnLossDb: 20, rejectionDb: 50 };
    const here = folderWith({ matrix: matrix.values, ...stated });
    expect((await running(here, ['analyze', 'one.json'])).status).toBe(0);
    fill(here, { 'two.json': JSON.stringify({ matrix: matrix.values, ...stated, rejectionDb: 49 }) });
    expect((await running(here, ['analyze', 'two.json'])).status).toBe(3);
  });

  test('a rotation file starts from one of them', async () => {
    const response = { family: 'elliptic', order: 4, returnLossDb: 20, rejectionDb: 40 };
    const here = folderWith({ response, steps: [{ pivot: [1, 2], angleDegrees: 10 }] });
    expect((await running(here, ['rotate', 'one.json'])).status).toBe(0);
  });
});
