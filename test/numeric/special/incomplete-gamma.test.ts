import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  gammaLogLowerTail,
  gammaLogUpperTail,
  gammaLowerTail,
  gammaUpperTail,
} from '../../../src/numeric/special/incomplete-gamma.ts';
import { logGamma } from '../../../src/numeric/special/log-gamma.ts';
import { expectWithin, refusal } from '../fixture.ts';

// The tables are compared in test/numeric/distributions/chi-squared.test.ts, which shares the code.
describe('regularised incomplete gamma functions', () => {
  test('for whole shapes are Poisson tails', () => {
    const terms = [1, 2.5, 2.5 ** 2 / 2, 2.5 ** 3 / 6];
    expectWithin(gammaUpperTail(2.5, 4), Math.exp(-2.5) * terms.reduce((sum, term) => sum + term), 1e-14);
  });

  test('P(shape, x) - P(shape + 1, x) is x^shape e^-x / Γ(shape + 1)', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.25, max: 300, noNaN: true }),
        fc.double({ min: 0.01, max: 600, noNaN: true }),
        (shape, x) => {
          const lower = gammaLowerTail(x, shape);
          if (lower < 1e-290) return;
          const step = Math.exp(shape * Math.log(x) - x - logGamma(shape + 1));
          const error = Math.abs(lower - gammaLowerTail(x, shape + 1) - step);
          expect(error).toBeLessThanOrEqual(1e-12 * lower + 1e-12 * step);
        },
      ),
    );
  });

  test('at shape 1000 keep the digits that shorter algorithms lose', () => {
    // P(1000, 1010) to four digits, from 34-digit mpmath.
    expect(gammaLowerTail(1010, 1000).toFixed(4)).toBe('0.6277');
  });

  test('logarithms go on below the smallest double', () => {
    expectWithin(gammaLogUpperTail(1e50, 1), -1e50, 1e-15);
    // Leading term of Abramowitz & Stegun (1964) 6.5.29; the next is 1e-290 of it.
    expectWithin(gammaLogLowerTail(1e-290, 50), -14500 * Math.LN10 - logGamma(51), 1e-15);
  });

  test('have their limits at 0', () => {
    const at0 = [gammaLowerTail, gammaUpperTail, gammaLogLowerTail, gammaLogUpperTail];
    expect(at0.map((tail) => tail(0, 3))).toEqual([0, 1, -Infinity, 0]);
  });

  test.each([
    [
      () => gammaLowerTail(-0.1, 2),
      'RangeError: gammaLowerTail: x is -0.1; 0 or a number from 1e-300 to 1e+100 is needed',
    ],
    [
      () => gammaUpperTail(2, 0.1),
      'RangeError: gammaUpperTail: shape is 0.1; a number from 0.25 to 10000000 is needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
