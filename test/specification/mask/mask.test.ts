import { describe, expect, it } from 'vitest';
import { checkMask } from '../../../src/specification/index.js';
import { expectRefusal } from '../refusal.js';

const BAND = { centerHz: 3_839_957_812.2682543, bandwidthHz: 36e6 };

describe('checkMask(mask, band)', () => {
  it('gives lines in hertz with their keys, frozen', () => {
    const lines = checkMask(
      [
        { fromHz: '3864 MHz', rejectionDb: [24, 30], toHz: 3900e6 },
        { toHz: '3816 MHz', rejectionDb: 24, relativeTo: 'center' },
        { fromHz: 3840e6, toHz: 3840e6, insertionLossDb: 0.6 },
        { fromHz: '3823 MHz', toHz: '3857 MHz', insertionLossVariationDb: 0.5 },
        { fromHz: '3823 MHz', toHz: '3857 MHz', groupDelayVariationSeconds: 40e-9 },
        { fromHz: '3823 MHz', toHz: '3857 MHz', returnLossDb: 20 },
      ],
      BAND,
    );
    expect(lines[0]).toEqual({ fromHz: 3864e6, toHz: 3900e6, rejectionDb: [24, 30] });
    expect(lines[1]).toEqual({ toHz: 3816e6, relativeTo: 'center', rejectionDb: 24 });
    expect(lines).toHaveLength(6);
    expect(Object.isFrozen(lines) && Object.isFrozen(lines[0])).toBe(true);
  });

  it('allows rejection from a band edge outward', () => {
    expect(
      checkMask(
        [
          { toHz: '3822 MHz', rejectionDb: 1 },
          { fromHz: '3858 MHz', rejectionDb: 1 },
        ],
        BAND,
      ),
    ).toHaveLength(2);
  });

  const rows: readonly (readonly [name: string, line: object, fragment: string])[] = [
    ['both ends absent', { rejectionDb: 20 }, 'neither fromHz nor toHz'],
    ['ends exchanged', { fromHz: 3, toHz: 2, rejectionDb: 20 }, 'exchange'],
    ['no level', { fromHz: 3 }, 'no level'],
    ['two levels', { fromHz: 3, rejectionDb: 20, returnLossDb: 20 }, '2 levels: rejectionDb, returnLossDb'],
    ['a negative level', { fromHz: 3, rejectionDb: -20 }, 'drop the sign'],
    ['a negative level in a pair', { fromHz: 3, toHz: 4, rejectionDb: [20, -20] }, 'drop the sign'],
    ['a level beyond sense', { fromHz: 3, rejectionDb: 1e308 }, '1000 dB'],
    ['a frequency of 0', { fromHz: 0, rejectionDb: 20 }, 'positive frequency'],
    ['a frequency of nearly 0', { fromHz: 1e-320, rejectionDb: 20 }, '1e-18'],
    ['a pair on an open span', { fromHz: 3, rejectionDb: [20, 30] }, 'pair'],
    ['a slope at a point', { fromHz: 3, toHz: 3, rejectionDb: [20, 30] }, 'two values at one frequency'],
    ['a variation over a point', { fromHz: 3, toHz: 3, insertionLossVariationDb: 1 }, 'variation over a point'],
    ['a delay variation over a point', { fromHz: 3, toHz: 3, groupDelayVariationSeconds: 1 }, 'variation over a point'],
    ['a loss variation without end', { fromHz: 3, insertionLossVariationDb: 1 }, 'open span'],
    ['rejection in the passband', { fromHz: '3840 MHz', toHz: '3840 MHz', rejectionDb: 24 }, 'within the passband'],
    ['rejection across an edge', { fromHz: '3857 MHz', rejectionDb: 24 }, 'within the passband'],
  ];
  it.each(rows)('refuses %s and names the line', (_name, line, fragment) => {
    const sound = { fromHz: 1e9, toHz: 2e9, rejectionDb: 1 };
    expectRefusal(() => checkMask([sound, line], BAND), 'E_MASK', 'mask[1]', fragment);
  });

  it('refuses two lines that contradict each other and names both', () => {
    const mask = [
      { fromHz: 1, toHz: 5, insertionLossDb: 0.6 },
      { fromHz: 4, toHz: 8, rejectionDb: 24 },
    ];
    expectRefusal(() => checkMask(mask), 'E_MASK', 'mask[1]', 'mask[0]', '24 dB', '0.6 dB');
  });

  it('lets two lines touch at an end, and does not compare levels with different references', () => {
    const loss = { fromHz: 1, toHz: 5, insertionLossDb: 0.6 };
    expect(checkMask([loss, { fromHz: 5, toHz: 8, rejectionDb: 24 }])).toHaveLength(2);
    expect(checkMask([loss, { fromHz: 4, rejectionDb: 24, relativeTo: 'center' }])).toHaveLength(2);
  });

  it.each([
    ['not finite', { fromHz: 3, rejectionDb: Number.NaN }, 'E_NOT_FINITE'],
    ['three values', { fromHz: 3, rejectionDb: [1, 2, 3] }, 'E_TYPE'],
    ['quoted', { fromHz: 3, rejectionDb: '20' }, 'E_TYPE'],
    ['misspelled', { formHz: 3, rejectionDb: 20 }, 'E_UNKNOWN_KEY'],
    ['another reference', { fromHz: 3, rejectionDb: 20, relativeTo: 'edge' }, 'E_CHOICE'],
    ['no object', 5, 'E_TYPE'],
  ])('refuses the structure of a line: %s', (_name, line, code) => {
    expectRefusal(() => checkMask([line]), code, 'mask[0]');
  });

  it('refuses more lines than it will compare', () => {
    expectRefusal(() => checkMask(Array(1001).fill({ fromHz: 1, rejectionDb: 1 })), 'E_MASK', '1000');
    expectRefusal(() => checkMask(Array(20_000).fill({ fromHz: 1, rejectionDb: 1 })), 'E_TYPE', '10000');
    expectRefusal(() => checkMask(undefined), 'E_MISSING', 'mask');
  });
});
