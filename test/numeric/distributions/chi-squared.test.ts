import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  chiSquaredLogLowerTail,
  chiSquaredLogUpperTail,
  chiSquaredLowerTail,
  chiSquaredQuantile,
  chiSquaredUpperQuantile,
  chiSquaredUpperTail,
} from '../../../src/numeric/distributions/chi-squared.ts';
import { normalUpperTail } from '../../../src/numeric/distributions/normal.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('chi-squared', chiSquaredLowerTail, chiSquaredUpperTail);
describeFixture('chi-squared-quantile', chiSquaredQuantile, chiSquaredUpperQuantile);

const df = fc.double({ min: 0.5, max: 1e6, noNaN: true });
const perDf = fc.double({ min: -3, max: 2, noNaN: true }).map(Math.exp);

describe('chi-squared distribution', () => {
  test('with 1 degree of freedom is the square of a normal variate', () => {
    for (const z of [0.5, 1.5, 4, 20]) {
      expectWithin(chiSquaredUpperTail(z * z, 1), 2 * normalUpperTail(z), 1e-13);
    }
  });

  test('with 2 degrees of freedom has the upper tail exp(-x/2), whose logarithm goes on', () => {
    expectWithin(chiSquaredUpperTail(5, 2), Math.exp(-2.5), 1e-15);
    expectWithin(chiSquaredLogUpperTail(1e90, 2), -5e89, 1e-15);
    expect(chiSquaredUpperTail(1e90, 2)).toBe(0);
    expectWithin(chiSquaredLogLowerTail(1e-299, 2), Math.log(5e-300), 1e-15);
  });

  test('at 0 all probability is above', () => {
    const at0 = [chiSquaredLowerTail, chiSquaredUpperTail, chiSquaredLogLowerTail, chiSquaredLogUpperTail];
    expect(at0.map((tail) => tail(0, 3))).toEqual([0, 1, -Infinity, 0]);
  });

  test('tails sum to 1 and logarithms agree with them', () => {
    fc.assert(
      fc.property(perDf, df, (value, freedom) => {
        const lower = chiSquaredLowerTail(value * freedom, freedom);
        const upper = chiSquaredUpperTail(value * freedom, freedom);
        expectWithin(lower + upper, 1, 1e-15);
        if (lower > 1e-290)
          expectWithin(Math.exp(chiSquaredLogLowerTail(value * freedom, freedom)), lower, 2e-13);
        if (upper > 1e-290)
          expectWithin(Math.exp(chiSquaredLogUpperTail(value * freedom, freedom)), upper, 2e-13);
      }),
    );
  });

  test('the upper tail falls as x grows', () => {
    fc.assert(
      fc.property(perDf, perDf, df, (value, more, freedom) => {
        const x = value * freedom;
        expect(chiSquaredLogUpperTail(x + more, freedom)).toBeLessThanOrEqual(
          chiSquaredLogUpperTail(x, freedom),
        );
      }),
    );
  });

  test('the quantile of the smaller tail is the point it came from', () => {
    fc.assert(
      fc.property(perDf, df, (value, freedom) => {
        const x = value * freedom;
        const lower = chiSquaredLowerTail(x, freedom);
        const upper = chiSquaredUpperTail(x, freedom);
        if (Math.min(lower, upper) < 1e-200) return;
        const back =
          lower < upper ? chiSquaredQuantile(lower, freedom) : chiSquaredUpperQuantile(upper, freedom);
        expectWithin(back, x, 1e-12);
      }),
    );
  });

  test.each([
    [
      () => chiSquaredUpperTail(-1, 7),
      'RangeError: chiSquaredUpperTail: x is -1; 0 or a number from 1e-299 to 1e+100 is needed',
    ],
    [
      () => chiSquaredLogLowerTail(1, 0),
      'RangeError: chiSquaredLogLowerTail: df is 0; a number from 0.5 to 20000000 is needed',
    ],
    [
      () => chiSquaredQuantile(-0.1, 7),
      'RangeError: chiSquaredQuantile: p is -0.1; a number above 0 and below 1 is needed',
    ],
    [
      () => chiSquaredQuantile(1e-200, 1),
      'RangeError: chiSquaredQuantile: p is 1e-200; with df 1 a less extreme probability is needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
