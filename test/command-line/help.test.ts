import { describe, expect, it } from 'vitest';
import { checkSpecification, specificationJsonSchema, VERSION } from '../../src/index.js';
import { folderWith, freshFolder, running, SMALL } from './room.js';

describe('irisloom --help and --version', () => {
  it.each([
    ['--help'],
    ['-h'],
    ['design', '--help'],
    ['analyze', '-h'],
    ['rotate', '--help', 'x.json'],
    ['schema', '--help'],
  ])('%s %s gives help on standard output within 80 columns', async (...args) => {
    const { status, stdout, stderr } = await running(freshFolder(), args);
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toMatch(/^irisloom/);
    expect(stdout.split('\n').filter((line) => line.length > 80)).toEqual([]);
  });

  it('names every command, option and exit status', async () => {
    const { stdout } = await running(freshFolder(), ['--help']);
    for (const word of [
      'design',
      'analyze',
      'rotate',
      'schema',
      '--version',
      '0 done',
      '2 ',
      '3 ',
      '4 ',
      '70 ',
      '130 ',
    ])
      expect(stdout).toContain(word);
    expect((await running(freshFolder(), ['design', '--help'])).stdout).toContain('--overwrite');
  });

  it('shows a least design file that is sound', async () => {
    const { stdout } = await running(freshFolder(), ['design', '--help']);
    const example = /\{ "passband"[\s\S]*?"returnLossDb": 22 \}/.exec(stdout)![0];
    expect(checkSpecification(JSON.parse(example)).order).toBe(6);
  });

  it('gives the version', async () => {
    expect((await running(freshFolder(), ['--version'])).stdout).toBe(`${VERSION}\n`);
  });
});

describe('irisloom schema', () => {
  it('prints the JSON Schema of a design file', async () => {
    const { status, stdout } = await running(freshFolder(), ['schema']);
    expect(status).toBe(0);
    expect(JSON.parse(stdout)).toEqual(JSON.parse(JSON.stringify(specificationJsonSchema())));
  });
});

describe('a fault of the program', () => {
  const broken = () => {
    throw new TypeError('planted');
  };

  it('gives status 70 and the way to report it, without a trace', async () => {
    const files = { realpath: broken } as never;
    const { status, stdout, stderr } = await running(folderWith(SMALL), ['design', 'one.json'], { files });
    expect([status, stdout]).toEqual([70, '']);
    expect(stderr).toContain('TypeError: planted');
    expect(stderr).toContain('report');
    expect(stderr).not.toMatch(/^\s+at /m);
  });

  it('shows the trace with IRISLOOM_DEBUG=1', async () => {
    const files = { realpath: broken } as never;
    const environment = { IRISLOOM_DEBUG: '1' };
    const { stderr } = await running(folderWith(SMALL), ['design', 'one.json'], { files, environment });
    expect(stderr).toMatch(/^\s+at /m);
  });
});
