import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  betaLowerTail,
  betaQuantile,
  betaUpperQuantile,
  betaUpperTail,
} from '../../../src/numeric/distributions/beta.ts';
import { fUpperTail } from '../../../src/numeric/distributions/f.ts';
import { incompleteBetaFront } from '../../../src/numeric/special/incomplete-beta.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('beta', betaLowerTail, betaUpperTail, incompleteBetaFront);
describeFixture('beta-quantile', betaQuantile, betaUpperQuantile);

const shape = fc.double({ min: 0.25, max: 1e5, noNaN: true });
const x = fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true });

describe('beta distribution', () => {
  test('with a = 1 has the upper tail (1 - x)^b', () => {
    expectWithin(betaUpperTail(0.3, 1, 12.5), 0.7 ** 12.5, 1e-14);
    expectWithin(betaLowerTail(1e-12, 1, 3), -Math.expm1(3 * Math.log1p(-1e-12)), 1e-15);
  });

  test('with shapes 1/2 is the arcsine distribution', () => {
    expectWithin(betaLowerTail(0.2, 0.5, 0.5), (2 / Math.PI) * Math.asin(Math.sqrt(0.2)), 1e-15);
  });

  test('is F with 2a and 2b degrees of freedom at b x / (a (1 - x))', () => {
    // At x = 1/4 the ratio is exact.
    expectWithin(betaUpperTail(0.25, 3, 9), fUpperTail(1, 6, 18), 1e-15);
  });

  test('has all probability between 0 and 1', () => {
    expect([
      betaLowerTail(0, 2, 3),
      betaUpperTail(0, 2, 3),
      betaLowerTail(1, 2, 3),
      betaUpperTail(1, 2, 3),
    ]).toEqual([0, 1, 1, 0]);
  });

  test('tails sum to 1 and the reflected distribution exchanges them', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 4095 }), shape, shape, (numerator, a, b) => {
        const point = numerator / 4096;
        expectWithin(betaLowerTail(point, a, b) + betaUpperTail(point, a, b), 1, 1e-15);
        expectWithin(betaLowerTail(1 - point, b, a), betaUpperTail(point, a, b), 1e-12);
      }),
    );
  });

  test('the lower tail grows with x', () => {
    fc.assert(
      fc.property(x, x, shape, shape, (one, other, a, b) => {
        const [less, more] = [Math.min(one, other), Math.max(one, other)];
        expect(betaLowerTail(less, a, b)).toBeLessThanOrEqual(betaLowerTail(more, a, b) * (1 + 1e-12));
      }),
    );
  });

  test('the quantile of the smaller tail is the point it came from', () => {
    fc.assert(
      fc.property(x, shape, shape, (point, a, b) => {
        const lower = betaLowerTail(point, a, b);
        const upper = betaUpperTail(point, a, b);
        if (Math.min(lower, upper) < 1e-200) return;
        expectWithin(
          lower < upper ? betaQuantile(lower, a, b) : betaUpperQuantile(upper, a, b),
          point,
          1e-12,
        );
      }),
    );
  });

  test.each([
    [
      () => betaLowerTail(1.5, 2, 3),
      'RangeError: betaLowerTail: x is 1.5; 0 or a number from 1e-300 to 1 is needed',
    ],
    [
      () => betaUpperTail(0.5, 0.2, 3),
      'RangeError: betaUpperTail: a is 0.2; a number from 0.25 to 10000000 is needed',
    ],
    [
      () => betaQuantile(0.5, 2, 2e7),
      'RangeError: betaQuantile: b is 20000000; a number from 0.25 to 10000000 is needed',
    ],
    [
      () => betaUpperQuantile(Number.NaN, 2, 3),
      'RangeError: betaUpperQuantile: p is NaN; a number above 0 and below 1 is needed',
    ],
    [
      () => betaQuantile(1e-200, 0.5, 3),
      'RangeError: betaQuantile: p is 1e-200; with a 0.5 and b 3 a less extreme probability is needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
