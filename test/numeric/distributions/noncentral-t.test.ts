import { expect, test } from 'vitest';
import {
  noncentralTLowerTail,
  noncentralTQuantile,
  noncentralTUpperQuantile,
  noncentralTUpperTail,
} from '../../../src/numeric/distributions/noncentral-t.ts';
import { describeFixture, expectWithin, refusal } from '../fixture.ts';

describeFixture('noncentral-t', noncentralTLowerTail, noncentralTUpperTail);

test.each([1e-100, 1e-8, 0.05, 0.5, 0.95, 1 - 1e-10])('quantiles at %d lead back, for either sign', (p) => {
  for (const delta of [-3, -0.2, 0, 2.5, 30]) {
    expectWithin(noncentralTLowerTail(noncentralTQuantile(p, 40, delta), 40, delta), p, 2e-12);
    expectWithin(noncentralTUpperTail(noncentralTUpperQuantile(p, 40, delta), 40, delta), p, 2e-12);
  }
});

test('a probability outside 0 to 1 is refused', () => {
  expect(refusal(() => noncentralTQuantile(1, 40, 2))).toBe(
    'RangeError: noncentralTQuantile: p is 1; a number above 0 and below 1 is needed',
  );
});
