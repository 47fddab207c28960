import jstat from 'jstat';
import { describe, test } from 'vitest';
import { betaLowerTail } from '../../src/numeric/distributions/beta.ts';
import { chiSquaredLowerTail } from '../../src/numeric/distributions/chi-squared.ts';
import { fLowerTail, fQuantile } from '../../src/numeric/distributions/f.ts';
import { normalLowerTail } from '../../src/numeric/distributions/normal.ts';
import { tLowerTail } from '../../src/numeric/distributions/student-t.ts';
import { expectWithin } from './fixture.ts';

type Distribution = Record<'cdf' | 'inv', (...values: number[]) => number>;
const oracle = jstat as unknown as Record<
  'beta' | 'centralF' | 'chisquare' | 'normal' | 'studentt',
  Distribution
>;

/** An independent program, good to about 1e-8 at moderate arguments: catches exchanged arguments and tails. */
describe('against jStat, to 1e-7', () => {
  test.each([
    [0.7, 3, 17],
    [2.5, 4, 115],
    [4.1, 1, 60],
    [1.2, 25, 8],
  ])('F at %d with %d and %d degrees of freedom', (x, df1, df2) => {
    expectWithin(fLowerTail(x, df1, df2), oracle.centralF.cdf(x, df1, df2), 1e-7);
    expectWithin(fQuantile(0.95, df1, df2), oracle.centralF.inv(0.95, df1, df2), 1e-6);
  });

  test.each([
    [-1.3, 5],
    [0.4, 1],
    [2.2, 78],
  ])('t at %d with %d degrees of freedom', (t, df) => {
    expectWithin(tLowerTail(t, df), oracle.studentt.cdf(t, df), 1e-7);
  });

  test.each([
    [3.84, 1],
    [0.3, 4],
    [55, 40],
  ])('chi-squared at %d with %d degrees of freedom', (x, df) => {
    expectWithin(chiSquaredLowerTail(x, df), oracle.chisquare.cdf(x, df), 1e-7);
  });

  test.each([
    [0.3, 2, 5],
    [0.9, 20, 3],
  ])('beta at %d with shapes %d and %d', (x, a, b) => {
    expectWithin(betaLowerTail(x, a, b), oracle.beta.cdf(x, a, b), 1e-7);
  });

  test.each([-2.5, 0.3, 1.96])('normal at %d', (z) => {
    expectWithin(normalLowerTail(z), oracle.normal.cdf(z, 0, 1), 1e-7);
  });
});
