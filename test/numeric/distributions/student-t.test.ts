import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fUpperTail } from '../../../src/numeric/distributions/f.ts';
import { normalUpperTail } from '../../../src/numeric/distributions/normal.ts';
import {
  tLowerTail,
  tQuantile,
  tUpperQuantile,
  tUpperTail,
} from '../../../src/numeric/distributions/student-t.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('student-t', tLowerTail, tUpperTail);
describeFixture('student-t-quantile', tUpperQuantile);

const df = fc.double({ min: 0.5, max: 1e6, noNaN: true });
const t = fc.double({ min: -9, max: 9, noNaN: true });

describe("Student's t distribution", () => {
  test('with 1 degree of freedom is the Cauchy distribution', () => {
    expectWithin(tUpperTail(3, 1), Math.atan(1 / 3) / Math.PI, 1e-15);
    expectWithin(tUpperQuantile(1e-9, 1), 1 / Math.tan(Math.PI * 1e-9), 5e-15);
  });

  test('with 2 degrees of freedom has the upper tail 1/2 - t/(2√(2 + t²))', () => {
    expectWithin(tUpperTail(1.5, 2), 0.5 - 0.75 / Math.sqrt(4.25), 1e-14);
  });

  test('with 2e7 degrees of freedom is the normal distribution to 1e-7', () => {
    expectWithin(tUpperTail(1.96, 2e7), normalUpperTail(1.96), 1e-6);
  });

  test('its square is F with 1 and df degrees of freedom', () => {
    // 1.5² is exact.
    expectWithin(2 * tUpperTail(1.5, 9), fUpperTail(2.25, 1, 9), 1e-15);
  });

  test('is symmetric and its tails sum to 1', () => {
    fc.assert(
      fc.property(t, df, (value, freedom) => {
        expect(tLowerTail(-value, freedom)).toBe(tUpperTail(value, freedom));
        expectWithin(tLowerTail(value, freedom) + tUpperTail(value, freedom), 1, 1e-15);
      }),
    );
    expect(tQuantile(0.5, 3)).toBe(0);
    expect(tQuantile(0.025, 3)).toBe(-tUpperQuantile(0.025, 3));
  });

  test('the upper tail falls as t grows', () => {
    fc.assert(
      fc.property(t, fc.double({ min: 1e-3, max: 3, noNaN: true }), df, (value, more, freedom) => {
        expect(tUpperTail(value + more, freedom)).toBeLessThanOrEqual(tUpperTail(value, freedom));
      }),
    );
  });

  test('the quantile of a tail is the point it came from', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 9, noNaN: true }), df, (value, freedom) => {
        expectWithin(tUpperQuantile(tUpperTail(value, freedom), freedom), value, 1e-13);
        expectWithin(tQuantile(tUpperTail(value, freedom), freedom), -value, 1e-13);
      }),
    );
  });

  test('quantiles above the median mirror those below', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2 ** 20 - 1 }), df, (numerator, freedom) => {
        const p = numerator / 2 ** 21;
        expect(tUpperQuantile(1 - p, freedom)).toBe(-tUpperQuantile(p, freedom));
      }),
    );
  });

  test.each([
    [
      () => tUpperTail(Number.NaN, 7),
      'RangeError: tUpperTail: t is NaN; a number from -1e+150 to 1e+150 is needed',
    ],
    [() => tLowerTail(1, 0.4), 'RangeError: tLowerTail: df is 0.4; a number from 0.5 to 20000000 is needed'],
    [() => tQuantile(1, 7), 'RangeError: tQuantile: p is 1; a number above 0 and below 1 is needed'],
    [
      () => tUpperQuantile(0.1, -2),
      'RangeError: tUpperQuantile: df is -2; a number from 0.5 to 20000000 is needed',
    ],
    [
      () => tUpperQuantile(1e-200, 1),
      'RangeError: tUpperQuantile: p is 1e-200; with df 1 a less extreme probability is needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
