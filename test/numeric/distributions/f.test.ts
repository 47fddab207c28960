import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  fLogLowerTail,
  fLogUpperTail,
  fLowerTail,
  fQuantile,
  fUpperQuantile,
  fUpperTail,
} from '../../../src/numeric/distributions/f.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('f', fLowerTail, fUpperTail);
describeFixture('f-quantile', fQuantile, fUpperQuantile);

const df = fc.double({ min: 0.5, max: 1e6, noNaN: true });
const x = fc.double({ min: -4, max: 4, noNaN: true }).map(Math.exp);

describe('F distribution', () => {
  test('with 2 numerator degrees of freedom has the upper tail (1 + 2x/df2)^(-df2/2), whose logarithm goes on', () => {
    expectWithin(fUpperTail(3.5, 2, 40), (1 + 7 / 40) ** -20, 1e-14);
    expectWithin(fLogUpperTail(1e6, 2, 4000), -2000 * Math.log1p(500), 1e-14);
    expect(fUpperTail(1e6, 2, 4000)).toBe(0);
  });

  test('with 2 denominator degrees of freedom has the lower tail (1 + 2/(df1 x))^(-df1/2)', () => {
    expectWithin(fLowerTail(0.25, 6, 2), (1 + 2 / 1.5) ** -3, 1e-14);
    expectWithin(fLogLowerTail(1e-290, 6, 2), -3 * Math.log(2 / 6e-290), 1e-14);
  });

  test('at 0 all probability is above', () => {
    expect([
      fLowerTail(0, 3, 7),
      fUpperTail(0, 3, 7),
      fLogLowerTail(0, 3, 7),
      fLogUpperTail(0, 3, 7),
    ]).toEqual([0, 1, -Infinity, 0]);
  });

  test('tails sum to 1 and logarithms agree with them', () => {
    fc.assert(
      fc.property(x, df, df, (value, df1, df2) => {
        const lower = fLowerTail(value, df1, df2);
        const upper = fUpperTail(value, df1, df2);
        expectWithin(lower + upper, 1, 1e-15);
        if (lower > 1e-290) expectWithin(Math.exp(fLogLowerTail(value, df1, df2)), lower, 2e-13);
        if (upper > 1e-290) expectWithin(Math.exp(fLogUpperTail(value, df1, df2)), upper, 2e-13);
      }),
    );
  });

  test('1/X has the degrees of freedom exchanged', () => {
    fc.assert(
      fc.property(fc.integer({ min: -4, max: 4 }), df, df, (power, df1, df2) => {
        // Powers of 2 have exact reciprocals.
        expectWithin(fLogUpperTail(2 ** -power, df2, df1), fLogLowerTail(2 ** power, df1, df2), 1e-13);
      }),
    );
  });

  test('the upper tail falls as x grows', () => {
    fc.assert(
      fc.property(x, fc.double({ min: 1e-6, max: 3, noNaN: true }), df, df, (value, more, df1, df2) => {
        expect(fLogUpperTail(value + more, df1, df2)).toBeLessThanOrEqual(fLogUpperTail(value, df1, df2));
      }),
    );
  });

  test('the quantile of the smaller tail is the point it came from', () => {
    fc.assert(
      fc.property(x, df, df, (value, df1, df2) => {
        const lower = fLowerTail(value, df1, df2);
        const upper = fUpperTail(value, df1, df2);
        if (Math.min(lower, upper) < 1e-200) return;
        const back = lower < upper ? fQuantile(lower, df1, df2) : fUpperQuantile(upper, df1, df2);
        expectWithin(back, value, 1e-12);
      }),
    );
  });

  test.each([
    [
      () => fUpperTail(-1, 3, 7),
      'RangeError: fUpperTail: x is -1; 0 or a number from 1e-300 to 1e+300 is needed',
    ],
    [
      () => fLowerTail(Number.NaN, 3, 7),
      'RangeError: fLowerTail: x is NaN; 0 or a number from 1e-300 to 1e+300 is needed',
    ],
    [
      () => fLogUpperTail(1, 0, 7),
      'RangeError: fLogUpperTail: df1 is 0; a number from 0.5 to 20000000 is needed',
    ],
    [
      () => fLogLowerTail(1, 3, 3e7),
      'RangeError: fLogLowerTail: df2 is 30000000; a number from 0.5 to 20000000 is needed',
    ],
    [() => fQuantile(0, 3, 7), 'RangeError: fQuantile: p is 0; a number above 0 and below 1 is needed'],
    [
      () => fUpperQuantile(1e-200, 3, 1),
      'RangeError: fUpperQuantile: p is 1e-200; with df1 3 and df2 1 a less extreme probability is needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
