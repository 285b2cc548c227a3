import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { designPictures, pictureSvg } from '../../src/index.js';
import { fixtureDesign } from '../report/designs.js';

const README = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

describe('pictures of the README', () => {
  it.each(['response', 'routing'])('%s: is what the tool draws today (npm run pictures makes them again)', (name) => {
    const path = `fixtures/pictures/tern-quay-${name}.svg`;
    const drawn = designPictures(fixtureDesign('tern-quay')).find((picture) => picture.name === name)!;
    expect(README).toContain(`](${path})`);
    expect(readFileSync(new URL(`../../${path}`, import.meta.url), 'utf8')).toBe(pictureSvg(drawn));
  });
});
