import { expect, test } from 'vitest';
import { chebyshevSum } from '../../../src/numeric/special/chebyshev.ts';

test('chebyshevSum adds polynomials cos(j arccos t), each with its coefficient', () => {
  const coefficients = new Float64Array([0.5, -2, 0.25, 3]);
  for (const t of [-1, -0.3, 0, 0.7, 1]) {
    const truth = coefficients.reduce((sum, c, j) => sum + c * Math.cos(j * Math.acos(t)), 0);
    expect(Math.abs(chebyshevSum(coefficients, t) - truth)).toBeLessThan(3e-15);
  }
});
