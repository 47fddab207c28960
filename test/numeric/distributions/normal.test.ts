import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  normalDensity,
  normalLogUpperTail,
  normalLowerTail,
  normalQuantile,
  normalUpperQuantile,
  normalUpperTail,
} from '../../../src/numeric/distributions/normal.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('normal', normalLowerTail, normalUpperTail, normalLogUpperTail);
describeFixture('normal-quantile', normalQuantile);

describe('normal distribution', () => {
  test('has the density exp(-z²/2)/√(2π)', () => {
    expectWithin(normalDensity(0), 1 / Math.sqrt(2 * Math.PI), 1e-15);
    // Twice the logarithm of the density's fall from 0 is z².
    expectWithin(-2 * Math.log(normalDensity(-3) * Math.sqrt(2 * Math.PI)), 9, 1e-15);
    expect(normalDensity(1e150)).toBe(0);
  });

  test('is symmetric and its tails sum to 1', () => {
    fc.assert(
      fc.property(fc.double({ min: -37, max: 37, noNaN: true }), (z) => {
        expect(normalLowerTail(-z)).toBe(normalUpperTail(z));
        expectWithin(normalLowerTail(z) + normalUpperTail(z), 1, 1e-15);
      }),
    );
    expect(normalQuantile(0.5)).toBe(0);
    expect(normalUpperQuantile(0.5)).toBe(0);
  });

  test('the upper tail falls as z grows', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -8, max: 37, noNaN: true }),
        fc.double({ min: 1e-6, max: 3, noNaN: true }),
        (z, more) => {
          expect(normalLogUpperTail(z + more)).toBeLessThan(normalLogUpperTail(z));
        },
      ),
    );
  });

  test('the quantile of a tail is the point it came from', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 36, noNaN: true }), (z) => {
        expectWithin(normalUpperQuantile(normalUpperTail(z)), z, 1e-14);
        expectWithin(normalQuantile(normalUpperTail(z)), -z, 1e-14);
      }),
    );
  });

  test('the logarithm goes on where the tail is below the smallest double', () => {
    // Leading terms of Abramowitz & Stegun (1964) 26.2.12; the rest is below 1e-12 of the whole.
    expectWithin(normalLogUpperTail(1e4), -5e7 - Math.log(1e4 * Math.sqrt(2 * Math.PI)), 1e-15);
    expect(normalUpperTail(1e4)).toBe(0);
  });

  test.each([
    [
      () => normalUpperTail(Infinity),
      'RangeError: normalUpperTail: z is Infinity; a number from -1e+150 to 1e+150 is needed',
    ],
    [
      () => normalDensity(Number.NaN),
      'RangeError: normalDensity: z is NaN; a number from -1e+150 to 1e+150 is needed',
    ],
    [() => normalQuantile(0), 'RangeError: normalQuantile: p is 0; a number above 0 and below 1 is needed'],
    [
      () => normalUpperQuantile(1.5),
      'RangeError: normalUpperQuantile: p is 1.5; a number above 0 and below 1 is needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
