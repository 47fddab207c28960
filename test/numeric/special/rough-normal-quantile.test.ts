import { expect, test } from 'vitest';
import { normalUpperTail } from '../../../src/numeric/distributions/normal.ts';
import { roughNormalUpperQuantile } from '../../../src/numeric/special/rough-normal-quantile.ts';

test('roughNormalUpperQuantile is within 4.5e-4 of the quantile', () => {
  for (let z = 0; z <= 37; z += 0.37) {
    expect(Math.abs(roughNormalUpperQuantile(normalUpperTail(z)) - z)).toBeLessThan(4.5e-4);
  }
});
