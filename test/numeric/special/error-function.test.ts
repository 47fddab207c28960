import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { erf, erfc } from '../../../src/numeric/special/error-function.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('error-function', erf, erfc);

describe('erf and erfc', () => {
  test('sum to 1, and erf is odd', () => {
    fc.assert(
      fc.property(fc.double({ min: -6, max: 6, noNaN: true }), (x) => {
        expectWithin(erf(x) + erfc(x), 1, 1e-15);
        expect(erf(-x)).toBe(-erf(x));
      }),
    );
  });

  test('reach their limits', () => {
    expect([erf(0), erfc(0), erf(30), erfc(-30), erfc(1e150)]).toEqual([0, 1, 1, 2, 0]);
  });

  test('refuse what is not finite', () => {
    const text = 'x is NaN; a number from -1e+150 to 1e+150 is needed';
    expect(refusal(() => erf(Number.NaN))).toBe(`RangeError: erf: ${text}`);
    expect(refusal(() => erfc(Number.NaN))).toBe(`RangeError: erfc: ${text}`);
  });
});
