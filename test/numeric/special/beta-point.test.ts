import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  betaPoint,
  betaPointOfProduct,
  excessOverMean,
  reflected,
} from '../../../src/numeric/special/beta-point.ts';
import { expectWithin } from '../fixture.ts';

/** A double above 2^-400 as a whole number of 2^-500. */
function exact(x: number): bigint {
  let value = x;
  let shift = 500;
  while (!Number.isInteger(value)) {
    value *= 2;
    shift--;
  }
  return BigInt(value) << BigInt(shift);
}

describe('a point of the unit interval in extended precision', () => {
  test('keeps what 1 - x loses', () => {
    const point = betaPoint(0.1 + 2 ** -54);
    expect(exact(point.complement) + exact(point.complementLow)).toBe(exact(1) - exact(point.x));
  });

  test('takes the smaller of x and complement as exact', () => {
    expect(betaPoint(1, 1e-20)).toEqual({ x: 1, xLow: -1e-20, complement: 1e-20, complementLow: 0 });
    expect(betaPoint(1e-20)).toEqual({ x: 1e-20, xLow: 0, complement: 1, complementLow: -1e-20 });
  });

  test('of a product holds s/(s + t) and t/(s + t) to 30 digits', () => {
    const positive = fc.double({ min: -10, max: 10, noNaN: true }).map((power) => 10 ** power);
    fc.assert(
      fc.property(positive, positive, positive, (first, second, t) => {
        const point = betaPointOfProduct(first, second, t);
        // Scales: s and t are in units of 2^-1000, shares in units of 2^-500.
        const s = exact(first) * exact(second);
        const total = s + (exact(t) << 500n);
        for (const [part, share] of [
          [s, exact(point.x) + exact(point.xLow)],
          [exact(t) << 500n, exact(point.complement) + exact(point.complementLow)],
        ] as const) {
          const residual = share * total - (part << 500n);
          expect((residual < 0n ? -residual : residual) * 10n ** 30n <= part << 500n).toBe(true);
        }
      }),
    );
  });

  test('of a product goes to the ends of the range of doubles', () => {
    const far = betaPointOfProduct(8, 1e300, 2);
    expectWithin(far.complement, 2.5e-301, 1e-15);
    expect(far.x).toBe(1);
    const near = betaPointOfProduct(8, 1e-300, 2);
    expectWithin(near.x, 4e-300, 1e-15);
    expect(near.complement).toBe(1);
  });

  test('excess over the mean does not cancel', () => {
    // F = 1 + 2^-40 with a = 3e6, b = 5e6: b x - a y is a b (F - 1)/(a F + b).
    const ratio = 1 + 2 ** -40;
    const point = betaPointOfProduct(3e6, ratio, 5e6);
    expectWithin(excessOverMean(point, 3e6, 5e6), (1.5e13 * 2 ** -40) / (3e6 * ratio + 5e6), 3e-16);
    expectWithin(excessOverMean(reflected(point), 5e6, 3e6), -excessOverMean(point, 3e6, 5e6), 1e-15);
  });
});
