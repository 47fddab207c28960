import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { logGamma } from '../../../src/numeric/special/log-gamma.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('log-gamma', logGamma);

describe('logGamma', () => {
  test('is 0 at 1 and 2 and ln 10! at 11', () => {
    expect([logGamma(1), logGamma(2)]).toEqual([0, 0]);
    expectWithin(logGamma(11), Math.log(3628800), 1e-15);
  });

  test('logGamma(x + 1) is logGamma(x) + ln x', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1e6, noNaN: true }), (x) => {
        const stepped = logGamma(x) + Math.log(x);
        expect(Math.abs(logGamma(x + 1) - stepped)).toBeLessThanOrEqual(4e-15 * (1 + Math.abs(stepped)));
      }),
    );
  });

  test.each([0, -1.5, Infinity, Number.NaN])('refuses %d', (x) => {
    expect(refusal(() => logGamma(x))).toBe(
      `RangeError: logGamma: x is ${x}; a finite number above 0 is needed`,
    );
  });
});
