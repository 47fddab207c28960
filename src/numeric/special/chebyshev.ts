/** Σ c_j T_j(t) for t in [-1, 1].
 *  Source: Clenshaw (1955), A note on the summation of Chebyshev series. */
export function chebyshevSum(coefficients: Float64Array, t: number): number {
  const twice = 2 * t;
  let next = 0;
  let afterNext = 0;
  for (let j = coefficients.length - 1; j > 0; j--) {
    const current = coefficients[j]! + twice * next - afterNext;
    afterNext = next;
    next = current;
  }
  return coefficients[0]! + t * next - afterNext;
}
