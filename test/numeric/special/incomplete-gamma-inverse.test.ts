import { describe, expect, test } from 'vitest';
import { gammaTailQuantile } from '../../../src/numeric/special/incomplete-gamma-inverse.ts';
import { expectWithin } from '../fixture.ts';

// The tables are compared in test/numeric/distributions/chi-squared.test.ts.
describe('inverse of the incomplete gamma functions', () => {
  test('with shape 1 is a logarithm', () => {
    expectWithin(gammaTailQuantile(1e-200, 1, 'upper'), 200 * Math.LN10, 1e-15);
    expectWithin(gammaTailQuantile(0.75, 1, 'lower'), Math.log(4), 1e-15);
    expectWithin(gammaTailQuantile(1e-12, 1, 'lower'), -Math.log1p(-1e-12), 5e-15);
  });

  test('says by its size that no double holds the answer', () => {
    expect(gammaTailQuantile(1e-300, 0.25, 'lower')).toBeLessThan(1e-300);
  });
});
