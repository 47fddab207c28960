import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { logBeta } from '../../../src/numeric/special/log-beta.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('log-beta', logBeta);

describe('logBeta', () => {
  test('B(1, b) is 1/b and B(1/2, 1/2) is π', () => {
    expectWithin(logBeta(1, 250), -Math.log(250), 1e-15);
    expectWithin(logBeta(0.5, 0.5), Math.log(Math.PI), 1e-15);
    expect(Math.abs(logBeta(1, 1))).toBeLessThan(5e-16);
  });

  test('is symmetric', () => {
    const shape = fc.double({ min: 0.25, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(shape, shape, (a, b) => {
        expect(Math.abs(logBeta(a, b) - logBeta(b, a))).toBeLessThanOrEqual(
          1e-15 * (1 + Math.abs(logBeta(a, b))),
        );
      }),
    );
  });

  test('refuses shapes that were not verified', () => {
    expect(refusal(() => logBeta(0.1, 2))).toBe(
      'RangeError: logBeta: a is 0.1; a number from 0.25 to 10000000 is needed',
    );
  });
});
