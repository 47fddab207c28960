import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { stirlingError } from '../../../src/numeric/special/stirling-error.ts';

describe('stirlingError', () => {
  test('at 1/2 is (1 - ln 2)/2, from Γ(1/2) = √π, and at 1 is 1 - ln(2π)/2', () => {
    expect(Math.abs(stirlingError(0.5) - (1 - Math.LN2) / 2)).toBeLessThan(1e-16);
    expect(Math.abs(stirlingError(1) - (1 - Math.log(2 * Math.PI) / 2))).toBeLessThan(2e-16);
  });

  test('falls by (z + 1/2) ln(1 + 1/z) - 1 from z to z + 1, across the change of method as well', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.25, max: 60, noNaN: true }), (z) => {
        const fall = (z + 0.5) * Math.log1p(1 / z) - 1;
        expect(Math.abs(stirlingError(z) - stirlingError(z + 1) - fall)).toBeLessThan(5e-16);
      }),
    );
  });

  test('is continuous where the number of terms changes', () => {
    for (const z of [8, 50, 1000]) {
      expect(Math.abs(stirlingError(z) - stirlingError(z * (1 + 2 ** -52)))).toBeLessThan(1e-17);
    }
  });
});
