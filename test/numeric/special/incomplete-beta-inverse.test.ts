import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { betaTail } from '../../../src/numeric/special/incomplete-beta.ts';
import {
  betaQuantilePoint,
  betaRatioQuantile,
} from '../../../src/numeric/special/incomplete-beta-inverse.ts';
import { expectWithin } from '../fixture.ts';

const shape = fc.double({ min: 0.25, max: 1e4, noNaN: true });
const power = fc.double({ min: -10, max: 0, noNaN: true });

// The tables are compared in test/numeric/distributions/f.test.ts and beta.test.ts.
describe('inverse of the incomplete beta function', () => {
  test('the tail at a quantile point is the probability, also where x rounds to 1', () => {
    fc.assert(
      fc.property(power, shape, shape, (exponent, a, b) => {
        const p = 0.5 * 10 ** exponent;
        for (const tail of ['lower', 'upper'] as const) {
          const point = betaQuantilePoint(p, a, b, tail);
          // The point is rounded to doubles before it is used here: √shape units in the last place.
          expectWithin(betaTail(point, a, b, tail), p, 1e-13 + 2e-15 * Math.sqrt(a + b));
        }
      }),
    );
    const { x, complement } = betaQuantilePoint(1e-30, 2, 0.5, 'upper');
    expect(x).toBe(1);
    // 1 - I_x(2, 1/2) is nearly (3/2) √(1 - x).
    expectWithin(complement, (1e-30 / 1.5) ** 2, 5e-14);
  });

  test('the median of equal shapes is 1/2', () => {
    expectWithin(betaRatioQuantile(0.5, 7.5, 7.5, 'upper'), 1, 1e-15);
  });

  test('says by its size that no double holds the answer', () => {
    expect(betaRatioQuantile(1e-300, 3, 0.25, 'upper')).toBeGreaterThan(1e300);
    expect(betaRatioQuantile(1e-300, 0.25, 3, 'lower')).toBeLessThan(1e-300);
  });
});
