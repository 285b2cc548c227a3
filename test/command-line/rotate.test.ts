import { describe, expect, it } from 'vitest';
import { patternPairs } from '../../src/command-line/rotate/patterns.js';
import { applyRotations, folded, generalizedChebyshev, transversal } from '../../src/index.js';
import { folderWith, running, snapshot } from './room.js';

const RESPONSE = { order: 5, returnLossDb: 20, transmissionZeros: [1.28, 1.75] };
/** The classical way to the folded form of order 5: row of the source, column of the load, next row, next column. */
const TO_FOLDED = [
  { pivot: [4, 5], annihilate: [0, 5] },
  { pivot: [3, 4], annihilate: [0, 4] },
  { pivot: [2, 3], annihilate: [0, 3] },
  { pivot: [1, 2], annihilate: [0, 2] },
  { pivot: [2, 3], annihilate: [2, 6] },
  { pivot: [3, 4], annihilate: [3, 6] },
  { pivot: [4, 5], annihilate: [4, 6] },
  { pivot: [3, 4], annihilate: [1, 4] },
  { pivot: [2, 3], annihilate: [1, 3] },
  { pivot: [3, 4], annihilate: [3, 5] },
];
const SOUND = { response: RESPONSE, steps: TO_FOLDED };
const MATRIX = [
  [0, 1, 0, 0],
  [1, 0.1, 0.9, 0],
  [0, 0.9, -0.1, 1],
  [0, 0, 1, 0],
];

async function rotating(file: string | object, ...more: string[]) {
  const folder = folderWith(file);
  const before = snapshot(folder);
  const ran = await running(folder, ['rotate', 'one.json', ...more]);
  expect(snapshot(folder)).toEqual(before);
  const isText = !more.includes('--json');
  expect(ran.stdout.split('\n').filter((line) => isText && line.length > 80)).toEqual([]);
  return ran;
}

describe('irisloom rotate', () => {
  it('replays the way to the folded form: same matrix, nothing left off the pattern', async () => {
    const { status, stdout, stderr } = await rotating({ ...SOUND, pattern: 'folded' }, '--json');
    expect([status, stderr]).toEqual([0, '']);
    const { steps, matrix } = JSON.parse(stdout);
    expect(steps).toHaveLength(10);
    expect(steps[9].offPattern).toBeLessThan(1e-14);
    expect(steps[0].annihilated.element).toEqual([0, 5]);
    expect(steps[0].annihilated.before).not.toBe(0);
    expect(Math.max(...steps.map(({ drift }: { drift: number }) => drift))).toBeLessThan(1e-13);
    const expected = folded(transversal(generalizedChebyshev(RESPONSE))).matrix.values;
    matrix.values.forEach((row: number[], i: number) => {
      for (const [j, value] of row.entries())
        expect(Math.abs(Math.abs(value) - Math.abs(expected[i]![j]!))).toBeLessThan(1e-13);
    });
  });

  it('prints each step, the angle in degrees, and the matrix at the end', async () => {
    const { stdout } = await rotating({ ...SOUND, pattern: 'folded', name: 'way to folded' });
    expect(stdout).toContain('way to folded: 10 rotations');
    expect(stdout).toMatch(/step +pivot +angle, degrees +made 0 +was +off pattern +drift/);
    expect(stdout).toMatch(/\n +1 +4,5 +[+-]\d+\.\d{6} +S,5 +[+-]0\.\d{6}/);
    expect(stdout).toContain('+0.8728');
  });

  it('turns by a given angle, as applyRotations does', async () => {
    const steps = [{ pivot: [1, 2], angleDegrees: -30.5 }];
    const { stdout } = await rotating({ matrix: MATRIX, steps }, '--json');
    const { steps: traced, matrix } = JSON.parse(stdout);
    const expected = applyRotations({ order: 2, values: MATRIX }, [{ pivot: [1, 2], angle: (-30.5 / 180) * Math.PI }]);
    expect(matrix.values).toEqual(expected.values);
    expect(traced[0].angleDegrees).toBeCloseTo(-30.5, 12);
    expect(traced[0].offPattern).toBeUndefined();
  });

  it('takes no step at all, a list of pairs, and a matrix too large to show', async () => {
    expect((await rotating({ matrix: MATRIX, steps: [] })).stdout).toContain('0 rotations');
    const pattern = [
      [0, 1],
      [1, 2],
      [2, 3],
    ];
    const some = await rotating({ matrix: MATRIX, steps: [{ pivot: [1, 2], angleDegrees: 90 }], pattern }, '--json');
    expect(JSON.parse(some.stdout).steps[0].offPattern).toBe(1);
    const large = { response: { order: 20, returnLossDb: 20 }, steps: [{ pivot: [1, 20], angleDegrees: 1 }] };
    expect((await rotating(large)).stdout).toContain('too large to show');
  });

  it('starts from a butterworth response, and from zeros in hertz with a passband', async () => {
    expect((await rotating({ response: { family: 'butterworth', order: 3 }, steps: [] })).status).toBe(0);
    const passband = { centerHz: '1 GHz', bandwidthHz: '20 MHz' };
    const response = { order: 3, returnLossDb: 20, passband, transmissionZeros: ['1.02 GHz'] };
    expect((await rotating({ response, steps: [] })).status).toBe(0);
  });

  it.each<readonly [string, string | object, string, ...string[]]>([
    ['nothing', {}, 'E_MISSING', 'add "matrix" or "response"', 'steps (1:1)'],
    ['a matrix beside a response', { ...SOUND, matrix: MATRIX }, 'E_CHOICE', 'response (1:2)'],
    ['no steps', { matrix: MATRIX }, 'E_MISSING', 'steps'],
    ['steps that are no list', { matrix: MATRIX, steps: {} }, 'E_TYPE', 'a list of steps'],
    ['a step that is no object', { matrix: MATRIX, steps: [3] }, 'E_TYPE', 'steps[0] (1:'],
    [
      'a pivot on the source',
      { matrix: MATRIX, steps: [{ pivot: [0, 1], angleDegrees: 1 }] },
      'E_PIVOT',
      'steps[0].pivot (1:',
      '[0, 1]',
      'source',
    ],
    ['a pivot on the load', { matrix: MATRIX, steps: [{ pivot: [1, 3], angleDegrees: 1 }] }, 'E_PIVOT', '[1, 3]'],
    [
      'a pivot twice the same',
      { matrix: MATRIX, steps: [{ pivot: [1, 1], angleDegrees: 1 }] },
      'E_PIVOT',
      'change one',
    ],
    [
      'a pivot beyond',
      { matrix: MATRIX, steps: [{ pivot: [1, 9], angleDegrees: 1 }] },
      'E_TYPE',
      'steps[0].pivot[1] (1:',
      'found 9',
    ],
    [
      'a pivot of halves',
      { matrix: MATRIX, steps: [{ pivot: [1.5, 2], angleDegrees: 1 }] },
      'E_TYPE',
      'steps[0].pivot[0]',
    ],
    ['a pivot of one', { matrix: MATRIX, steps: [{ pivot: [1], angleDegrees: 1 }] }, 'E_TYPE', 'a pair [i, j]'],
    ['no pivot', { matrix: MATRIX, steps: [{ angleDegrees: 1 }] }, 'E_MISSING', 'steps[0].pivot'],
    ['no action', { matrix: MATRIX, steps: [{ pivot: [1, 2] }] }, 'E_MISSING', 'steps[0].angleDegrees', 'annihilate'],
    [
      'both actions',
      { matrix: MATRIX, steps: [{ pivot: [1, 2], angleDegrees: 1, annihilate: [1, 2] }] },
      'E_CHOICE',
      'one of the two',
    ],
    [
      'an angle as text',
      { matrix: MATRIX, steps: [{ pivot: [1, 2], angleDegrees: '30' }] },
      'E_TYPE',
      'remove the quotes',
    ],
    [
      'an entry that the pivot cannot reach',
      { matrix: MATRIX, steps: [{ pivot: [1, 2], annihilate: [0, 3] }] },
      'E_ELEMENT',
      '[0, 3]',
      '[1, 2]',
    ],
    [
      'an entry on the diagonal',
      { matrix: MATRIX, steps: [{ pivot: [1, 2], annihilate: [1, 1] }] },
      'E_ELEMENT',
      '[1, 1]',
    ],
    [
      'an unknown key of a step',
      { matrix: MATRIX, steps: [{ pivot: [1, 2], angleDegree: 1 }] },
      'E_UNKNOWN_KEY',
      'did you mean "angleDegrees"?',
    ],
    ['an unknown pattern', { ...SOUND, pattern: 'fold' }, 'E_CHOICE', 'pattern (1:', 'did you mean "folded"?'],
    ['a pattern of another kind', { ...SOUND, pattern: 3 }, 'E_TYPE', 'list of node pairs'],
    ['a pair beyond the nodes', { ...SOUND, pattern: [[0, 7]] }, 'E_TYPE', 'pattern[0][1] (1:'],
    [
      'a response that cannot be',
      { ...SOUND, response: { ...RESPONSE, order: 0 } },
      'E_ORDER_RANGE',
      'response.order (1:',
    ],
    [
      'zeros in hertz without passband',
      { ...SOUND, response: { order: 3, returnLossDb: 20, transmissionZeros: ['1 GHz'] } },
      'E_MISSING',
      'response.passband',
    ],
    [
      'an asymmetric matrix',
      {
        matrix: [
          [0, 1, 0],
          [2, 0, 1],
          [0, 1, 0],
        ],
        steps: [],
      },
      'E_NOT_SYMMETRIC',
      '(0,1) = 1 but (1,0) = 2',
    ],
    ['a name with a control character', { ...SOUND, name: 'a\u0007b' }, 'E_NAME', 'name (1:'],
    ['a text that is no JSON', '{', 'E_JSON_SYNTAX'],
  ])('refuses %s', async (_, file, code, ...fragments) => {
    const { status, stdout, stderr } = await rotating(file);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr.split(' ')[0]).toBe(code);
    for (const fragment of fragments) expect(stderr).toContain(fragment);
  });
});

describe('patternPairs(name, order, finiteZeros)', () => {
  it.each([
    ['folded' as const, 6, 2],
    ['folded' as const, 5, 5],
    ['folded' as const, 7, 3],
  ])('of %s, order %i, %i zeros has every coupling of such a design', (name, order, count) => {
    const zeros = Array.from({ length: count }, (_, n) => (n % 2 === 0 ? 1 : -1) * (1.2 + 0.3 * n));
    const response = generalizedChebyshev({ order, returnLossDb: 20, transmissionZeros: zeros });
    const { values } = folded(transversal(response)).matrix;
    const allowed = patternPairs(name, order, count).map(([i, j]) => `${i},${j}`);
    const present = values.flatMap((row, i) => row.flatMap((value, j) => (j > i && value !== 0 ? [`${i},${j}`] : [])));
    expect(present.filter((pair) => !allowed.includes(pair))).toEqual([]);
    expect(allowed.filter((pair) => !present.includes(pair))).toEqual([]);
  });

  it('of arrow has the chain and the last nodes before the load', () => {
    expect(patternPairs('arrow', 3, 2)).toEqual([
      [0, 1],
      [1, 2],
      [1, 4],
      [2, 3],
      [2, 4],
      [3, 4],
    ]);
  });
});
