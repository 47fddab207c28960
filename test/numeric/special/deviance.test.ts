import fc from 'fast-check';
import { describe, test } from 'vitest';
import { devianceTerm } from '../../../src/numeric/special/deviance.ts';
import { expectWithin } from '../fixture.ts';

describe('devianceTerm', () => {
  test('near 0 is u²/2 - u³/3 + u⁴/4 - …', () => {
    for (const u of [1e-5, -1e-5, 1e-150]) {
      expectWithin(devianceTerm(u, 1 + u, 0), u * u * (1 / 2 - u / 3 + (u * u) / 4), 1e-15);
    }
  });

  test('on both sides of each change of method is u - ln(1 + u)', () => {
    fc.assert(
      fc.property(fc.double({ min: -0.99, max: 8, noNaN: true }), (u) => {
        if (Math.abs(u) < 0.01) return;
        // The truth itself loses about 2/|u| of its digits near 0.
        expectWithin(devianceTerm(u, 1 + u, 0), u - Math.log1p(u), 2e-15 + 1e-15 / Math.abs(u));
      }),
    );
  });

  test('takes what 1 + u lost in rounding', () => {
    // 1 + u = 1e-20 exactly enough, which u = -1 cannot say.
    expectWithin(devianceTerm(-1, 1e-20, 0), -1 + 20 * Math.LN10, 1e-15);
    expectWithin(devianceTerm(3, 4, 4e-10), 3 - Math.log(4) - 1e-10, 1e-15);
  });
});
