import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fUpperQuantile } from '../../../src/numeric/distributions/f.ts';
import {
  noncentralChiSquaredLowerTail,
  noncentralChiSquaredQuantile,
  noncentralChiSquaredUpperQuantile,
  noncentralChiSquaredUpperTail,
} from '../../../src/numeric/distributions/noncentral-chi-squared.ts';
import {
  noncentralFLowerTail,
  noncentralFQuantile,
  noncentralFUpperQuantile,
  noncentralFUpperTail,
} from '../../../src/numeric/distributions/noncentral-f.ts';
import {
  noncentralTLowerTail,
  noncentralTUpperTail,
} from '../../../src/numeric/distributions/noncentral-t.ts';
import {
  squaredMultipleCorrelationLowerTail,
  squaredMultipleCorrelationUpperTail,
} from '../../../src/numeric/distributions/squared-multiple-correlation.ts';
import { tUpperQuantile } from '../../../src/numeric/distributions/student-t.ts';
import { fTestPower, sampledFTestPower } from '../../../src/numeric/power/f-test.ts';
import { sampledTTestPower, tTestPower } from '../../../src/numeric/power/t-test.ts';
import { expectWithin, refusal } from '../fixture.ts';

describe('power of the F test', () => {
  // 40-digit arithmetic, made outside the project.
  test.each([
    [4, 115, 18, '0.933124188533955316'],
    [7, 52, 9.5, '0.521744502119673109'],
    [2, 200, 12, '0.878140033439887524'],
    [3, 2400, 12.7, '0.861554098777319249'],
    [1, 26, 8.4, '0.79668326572273001'],
    [6, 99, 0.5, '0.0692079027318654026'],
    [12, 20000, 35, '0.991561573966198927'],
  ])('with %d and %d degrees of freedom and noncentrality %d', (df1, df2, noncentrality, truth) => {
    expectWithin(fTestPower(0.05, df1, df2, noncentrality), Number(truth), 2e-14);
  });

  test('is the noncentral upper tail at the central critical value, also far beyond the fast path', () => {
    for (const [df1, df2, ncp] of [
      [3, 60, 0.1],
      [3, 60, 20],
      [40, 3000, 390],
      [40, 3000, 450],
      [3, 1e6, 5e4],
    ] as const) {
      const tail = noncentralFUpperTail(fUpperQuantile(0.05, df1, df2), df1, df2, ncp);
      expectWithin(fTestPower(0.05, df1, df2, ncp), tail, 1e-12);
    }
  });

  test('averaged over sampled predictors: .9004737714 at v = 226, .8990774 at 225 (base R, computed for M09)', () => {
    expectWithin(sampledFTestPower(0.05, 3, 226, 0.06), 0.9004737714, 1e-9);
    expectWithin(sampledFTestPower(0.05, 3, 225, 0.06), 0.8990774, 1e-6);
  });

  const df = fc.double({ min: 1, max: 500, noNaN: true });

  test('rises with noncentrality, with residual degrees of freedom and with alpha, and never leaves [alpha, 1]', () => {
    fc.assert(
      fc.property(df, df, fc.double({ min: 0, max: 60, noNaN: true }), (df1, df2, ncp) => {
        const power = fTestPower(0.05, df1, df2, ncp);
        expect(power).toBeGreaterThanOrEqual(0.05);
        expect(power).toBeLessThanOrEqual(1 + 1e-14);
        expect(fTestPower(0.05, df1, df2, ncp + 1)).toBeGreaterThanOrEqual(power);
        expect(fTestPower(0.05, df1, df2 + 1, ncp)).toBeGreaterThanOrEqual(power * (1 - 1e-13));
        expect(fTestPower(0.06, df1, df2, ncp)).toBeGreaterThan(power);
      }),
    );
  });

  test('refuses what lies outside its domain', () => {
    expect(refusal(() => fTestPower(0, 3, 60, 1))).toBe(
      'RangeError: fTestPower: alpha is 0; a number above 0 and below 1 is needed',
    );
    expect(refusal(() => fTestPower(0.05, 3, 60, 2e5))).toBe(
      'RangeError: fTestPower: noncentrality is 200000; a number from 0 to 100000 is needed',
    );
  });
});

describe('power of the one-sided t test', () => {
  test('fixed predictor: both tails together are the F test with one numerator degree of freedom', () => {
    for (const [df, delta] of [
      [5, 1],
      [26, 2.9],
      [400, 3.2],
    ] as const) {
      const t = tUpperQuantile(0.025, df);
      const both = tTestPower(0.025, df, delta) + noncentralTLowerTail(-t, df, delta);
      expectWithin(both, fTestPower(0.05, 1, df, delta * delta), 1e-13);
    }
  });

  test('sampled predictor: one tail is the F test less the tail on the wrong side, which is small', () => {
    for (const [df, r] of [
      [10, 0.5],
      [80, 0.3],
      [400, 0.15],
    ] as const) {
      const one = sampledTTestPower(0.025, df, r);
      const both = sampledFTestPower(0.05, 1, df, r * r);
      expect(one).toBeLessThan(both);
      expect(both - one).toBeLessThan(3e-3);
    }
  });
});

describe('noncentral distributions', () => {
  // Noncentral χ² giving power .80 at alpha .05 (tables of the noncentral χ², from memory): λ to two decimals.
  test.each([
    [1, 3.841458820694124, 7.85],
    [3, 7.814727903251179, 10.9],
    [5, 11.070497693516351, 12.83],
    [10, 18.307038053275146, 16.24],
    [20, 31.410432844230918, 20.96],
  ])('χ² with %d degrees of freedom', (df, critical, lambda) => {
    expect(noncentralChiSquaredUpperTail(critical, df, lambda)).toBeCloseTo(0.8, 3);
  });

  test('both tails sum to 1', () => {
    for (const x of [0.2, 1, 4, 30]) {
      expectWithin(noncentralFLowerTail(x, 3, 60, 8) + noncentralFUpperTail(x, 3, 60, 8), 1, 1e-13);
      expectWithin(noncentralChiSquaredLowerTail(x, 3, 8) + noncentralChiSquaredUpperTail(x, 3, 8), 1, 1e-13);
      for (const t of [-x, x])
        expectWithin(noncentralTLowerTail(t, 9, 2) + noncentralTUpperTail(t, 9, 2), 1, 1e-13);
    }
    const r2 = [0.3, 4, 50, 0.25] as const;
    expectWithin(
      squaredMultipleCorrelationLowerTail(...r2) + squaredMultipleCorrelationUpperTail(...r2),
      1,
      1e-13,
    );
  });

  test.each([1e-100, 1e-8, 0.05, 0.5, 0.95, 1 - 1e-10])('quantiles at %d lead back', (p) => {
    expectWithin(noncentralFLowerTail(noncentralFQuantile(p, 3, 60, 8), 3, 60, 8), p, 1e-12);
    expectWithin(noncentralFUpperTail(noncentralFUpperQuantile(p, 3, 60, 8), 3, 60, 8), p, 1e-12);
    expectWithin(noncentralChiSquaredLowerTail(noncentralChiSquaredQuantile(p, 3, 8), 3, 8), p, 1e-12);
    expectWithin(noncentralChiSquaredUpperTail(noncentralChiSquaredUpperQuantile(p, 3, 8), 3, 8), p, 1e-12);
  });
});
