import { expect, test } from 'vitest';
import { coefficientsFromRoots, polynomialRoots } from '../../src/numerics/index.js';

test.each([[1], [2], [5]])(
  'polynomialRoots(coefficients) finds a root at 0 of multiplicity %d beside others',
  (multiplicity) => {
    const zeros = new Array(multiplicity).fill({ re: 0, im: 0 });
    const found = polynomialRoots(coefficientsFromRoots([...zeros, { re: 1, im: 1 }, { re: -2, im: 0.5 }]));
    expect(found.filter(({ re, im }) => re === 0 && im === 0)).toHaveLength(multiplicity);
    expect(found).toHaveLength(multiplicity + 2);
  },
);
