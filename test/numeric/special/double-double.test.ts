import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { productError, quotientError, sumError } from '../../../src/numeric/special/double-double.ts';

/** A double as a whole number of 2^-1200: exact for what these tests use. */
function exact(x: number): bigint {
  let value = x;
  let shift = 1200;
  while (!Number.isInteger(value)) {
    value *= 2;
    shift--;
  }
  return BigInt(value) << BigInt(shift);
}

const double = fc
  .tuple(
    fc.double({ min: 0.5, max: 1, noNaN: true }),
    fc.integer({ min: -100, max: 100 }),
    fc.constantFrom(-1, 1),
  )
  .map(([fraction, exponent, sign]) => sign * fraction * 2 ** exponent);

describe('double-double', () => {
  test('a rounded sum and its error are the exact sum', () => {
    fc.assert(
      fc.property(double, double, (a, b) => {
        expect(exact(a + b) + exact(sumError(a, b, a + b))).toBe(exact(a) + exact(b));
      }),
    );
  });

  test('a rounded product and its error are the exact product', () => {
    fc.assert(
      fc.property(double, double, (a, b) => {
        const sum = exact(a * b) + exact(productError(a, b, a * b));
        expect(sum << 1200n).toBe(exact(a) * exact(b));
      }),
    );
  });

  test('a rounded quotient and its error are the exact quotient to 30 digits', () => {
    fc.assert(
      fc.property(double, double, (n, d) => {
        const quotient = n / d;
        const sum = exact(quotient) + exact(quotientError(n, 0, d, 0, quotient));
        const residual = sum * exact(d) - (exact(n) << 1200n);
        const size = exact(n) << 1200n;
        expect((residual < 0n ? -residual : residual) * 10n ** 30n <= (size < 0n ? -size : size)).toBe(true);
      }),
    );
  });
});
