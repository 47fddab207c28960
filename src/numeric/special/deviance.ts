/** u - ln(1 + u), the piece that Loader's deviance is made of, without the cancellation near u = 0.
 *  Domain (not checked): u > -1. `ratio` is 1 + u and `ratioLow` what that lost in rounding: away from 0
 *  they keep digits that u has not, and only there are they used. Relative error about 3e-16.
 *  Source: ln(1 + u) = 2 artanh(u/(2 + u)), Abramowitz & Stegun (1964) 4.1.29, leading terms taken out. */
export function devianceTerm(u: number, ratio: number, ratioLow: number): number {
  if (!isNearMean(u)) return u - (Math.log(ratio) + ratioLow / ratio);
  const reduced = u / (2 + u);
  const square = reduced * reduced;
  // As many terms as leave less than 1e-17 of the sum.
  const last = square < 1e-3 ? 4 : square < 0.02 ? 8 : artanhTerms.length - 1;
  let sum = 0;
  for (let k = last; k >= 0; k--) sum = sum * square + artanhTerms[k]!;
  return reduced * (u - 2 * square * sum);
}

/** Whether the series serves, so that `ratio` is not looked at. */
export function isNearMean(u: number): boolean {
  return u >= -0.5 && u <= 1;
}

/** 1/3, 1/5, 1/7, …: at u = 1 the square is 1/9. */
const artanhTerms = Float64Array.from({ length: 17 }, (_, k) => 1 / (2 * k + 3));
