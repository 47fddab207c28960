import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  adjustedR2,
  f2FromIncrease,
  f2FromR2,
  f2FromSlope,
  f2FromT,
  observedR2,
  r2FromF2,
} from '../../src/effects/effect-size.ts';

const share = fc.double({ min: 0.001, max: 0.95, noNaN: true });
const close = (value: number, truth: number) => expect(Math.abs(value / truth - 1)).toBeLessThan(1e-12);

describe('published values', () => {
  // Cohen (1988), chapter 9, from memory; they agree to two decimals.
  test.each([
    [0.02, 0.02],
    [0.13, 0.15],
    [0.26, 0.35],
  ])('R² %d is f² %d', (r2, f2) => {
    expect(f2FromR2(r2)).toBeCloseTo(f2, 2);
  });

  test('R² .20 of 50 people and 6 predictors adjusts to .0884', () => {
    expect(adjustedR2(0.2, 50, 6)).toBeCloseTo(0.0884, 4);
  });
});

describe('conversions', () => {
  test('f² and R² are each other’s inverse', () => {
    fc.assert(
      fc.property(share, (r2) => {
        close(r2FromF2(f2FromR2(r2)), r2);
      }),
    );
  });

  test('the adjusted and the observed R² are each other’s inverse', () => {
    fc.assert(
      fc.property(share, fc.integer({ min: 30, max: 5000 }), fc.integer({ min: 1, max: 20 }), (r2, n, k) => {
        expect(observedR2(adjustedR2(r2, n, k), n, k)).toBeCloseTo(r2, 12);
      }),
    );
  });

  test('an increase over nothing is the whole, and over something its partial share', () => {
    fc.assert(
      fc.property(share, share, (a, b) => {
        fc.pre(Math.abs(a - b) > 0.001);
        const [reduced, full] = [Math.min(a, b), Math.max(a, b)];
        close(f2FromIncrease(full, 0), f2FromR2(full));
        close(r2FromF2(f2FromIncrease(full, reduced)), (full - reduced) / (1 - reduced));
      }),
    );
  });

  test('a t statistic and a slope give the partial R² of textbook algebra', () => {
    close(r2FromF2(f2FromT(-2.5, 80)), 6.25 / (6.25 + 80));
    // Without overlap f² is the squared standardised slope over what is left of a variance of 1.
    close(f2FromSlope(0.3, Math.sqrt(1 - 0.09), 1, 0), 0.09 / 0.91);
    close(f2FromSlope(0.3, 2, 5, 0.5), f2FromSlope(0.3, 2, 5, 0) / 2);
  });
});
