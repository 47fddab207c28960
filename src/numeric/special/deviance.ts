/** u - ln(1 + u), the piece that Loader's deviance is made of, without the cancellation near u = 0.
 *  Domain (not checked): u > -1. `ratio` is 1 + u and `ratioLow` what that lost in rounding: away from 0
 *  they keep digits that u has not. Relative error about 3e-16.
 *  Source: ln(1 + u) = 2 artanh(u/(2 + u)), Abramowitz & Stegun (1964) 4.1.29, leading terms taken out. */
export function devianceTerm(u: number, ratio: number, ratioLow: number): number {
  if (u < -0.5 || u > 1) return u - (Math.log(ratio) + ratioLow / ratio);
  const reduced = u / (2 + u);
  const square = reduced * reduced;
  let sum = 0;
  // The first term left out is below 1e-17 of the sum: square^6/13, square^10/21 and square^18/37 at most.
  for (let k = square < 1e-3 ? 11 : square < 0.02 ? 19 : 35; k >= 3; k -= 2) sum = sum * square + 1 / k;
  return reduced * (u - 2 * square * sum);
}
