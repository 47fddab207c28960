import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  incompleteBetaFront,
  incompleteBetaLogLower,
  incompleteBetaLogUpper,
  incompleteBetaLower,
  incompleteBetaUpper,
} from '../../../src/numeric/special/incomplete-beta.ts';
import { expectWithin, refusal } from '../fixture.ts';

const shape = fc.double({ min: 0.25, max: 2000, noNaN: true });
const x = fc.double({ min: 0.001, max: 0.999, noNaN: true });

// The tables are compared in test/numeric/distributions/beta.test.ts, which shares the code.
describe('regularised incomplete beta function', () => {
  test('for whole shapes is a binomial tail', () => {
    const terms = [10, 11, 12].map((k) => [1, 12, 66][12 - k]! * 0.3 ** k * 0.7 ** (12 - k));
    expectWithin(
      incompleteBetaLower(0.3, 10, 3),
      terms.reduce((sum, term) => sum + term),
      1e-14,
    );
  });

  test('I_x(a, b) - I_x(a + 1, b) is the front factor over a', () => {
    fc.assert(
      fc.property(x, shape, shape, (point, a, b) => {
        const lower = incompleteBetaLower(point, a, b);
        if (lower < 1e-290) return;
        const step = incompleteBetaFront(point, a, b) / a;
        const error = Math.abs(lower - incompleteBetaLower(point, a + 1, b) - step);
        expect(error).toBeLessThanOrEqual(1e-12 * lower);
      }),
    );
  });

  test('a complement that is given keeps its digits where x rounds to 1', () => {
    // With b = 1/2 and a = 1 the upper tail is √(1 - x).
    expectWithin(incompleteBetaUpper(1, 1, 0.5, 1e-40), 1e-20, 1e-14);
    expectWithin(incompleteBetaLogUpper(1, 1, 0.5, 1e-300), -150 * Math.LN10, 1e-15);
    expectWithin(incompleteBetaFront(1, 1, 0.5, 1e-40), 0.5e-20, 1e-14);
  });

  test('logarithms go on below the smallest double', () => {
    // I_x(a, 1) is x^a.
    expectWithin(incompleteBetaLogLower(1e-9, 1e5, 1), -9e5 * Math.LN10, 1e-15);
    expect(incompleteBetaLower(1e-9, 1e5, 1)).toBe(0);
  });

  test('has its limits at 0 and 1', () => {
    expect([
      incompleteBetaLower(0, 2, 3),
      incompleteBetaUpper(0, 2, 3),
      incompleteBetaFront(0, 2, 3),
    ]).toEqual([0, 1, 0]);
    expect([
      incompleteBetaLower(1, 2, 3),
      incompleteBetaUpper(1, 2, 3),
      incompleteBetaFront(1, 2, 3),
    ]).toEqual([1, 0, 0]);
    expect([incompleteBetaLogLower(0, 2, 3), incompleteBetaLogUpper(0, 2, 3)]).toEqual([-Infinity, 0]);
    expect([incompleteBetaLogLower(1, 2, 3), incompleteBetaLogUpper(1, 2, 3)]).toEqual([0, -Infinity]);
  });

  test.each([
    [
      () => incompleteBetaLower(-0.1, 2, 3),
      'RangeError: incompleteBetaLower: x is -0.1; 0 or a number from 1e-300 to 1 is needed',
    ],
    [
      () => incompleteBetaUpper(0.4, 2, 3, 0.5),
      'RangeError: incompleteBetaUpper: complement is 0.5; with x 0.4 a complement of 0.6 is needed',
    ],
    [
      () => incompleteBetaLogUpper(0.4, 2, 3, Number.NaN),
      'RangeError: incompleteBetaLogUpper: complement is NaN; 0 or a number from 1e-300 to 1 is needed',
    ],
    [
      () => incompleteBetaFront(0.4, 2, 0),
      'RangeError: incompleteBetaFront: b is 0; a number from 0.25 to 10000000 is needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
