import { requireBetween } from '../domain.ts';
import { chebyshevSum } from './chebyshev.ts';

/** (1 + 2x) exp(x²) erfc(x) in t = (x - 3.75)/(x + 3.75), x ≥ 0, from test/fixtures/coefficients.py.
 *  Source: Shepherd & Laframboise (1981), Chebyshev approximation of (1 + 2x) exp(x²) erfc x, with our own
 *  coefficients; the terms left out are below 3e-18. */
const scaled = new Float64Array([
  1.1775789345674017, -0.004590054580646478, -0.08424913336651792, 0.05920993999819189, -0.026658668435305753,
  0.009074997670705265, -0.002413163540417608, 0.0004907758365258086, -6.916973302501207e-5,
  4.13902798607301e-6, 7.74038306619849e-7, -2.1886401049234397e-7, 1.076499946567091e-8,
  4.521959811218287e-9, -7.754400208831351e-10, -6.318088340886684e-11, 2.86879501093067e-11,
  1.9455868545777347e-13, -9.65469674843344e-13, 3.25254814814874e-14, 3.3478119482868056e-14,
  -1.864562880419313e-15, -1.2507950530688648e-15, 7.418235256624044e-17, 5.068148904796111e-17,
  -2.2370566594359995e-18,
]);

/** exp(x²) erfc(x) for x ≥ 0 (not checked): falls like 1/(x√π), so far tails keep their digits. */
export function scaledErfc(x: number): number {
  return chebyshevSum(scaled, (x - 3.75) / (x + 3.75)) / (1 + 2 * x);
}

/** exp(-c x²), |x| ≤ 1e150 (not checked). The square is formed in two parts, the first exact: rounding x²
 *  would cost c x² units in the last place. Source: Cody (1969), Rational Chebyshev approximations for the
 *  error function, on the evaluation of erfc. */
export function expOfMinusSquare(x: number, c: number): number {
  const head = Math.trunc(x * 16) / 16;
  return Math.exp(-c * head * head) * Math.exp(-c * (x - head) * (x + head));
}

/** Error function, 2/√π ∫₀ˣ exp(-t²) dt.
 *  Domain: x from -1e150 to 1e150.
 *  Relative error (test/fixtures/error-function.json): 1.5e-15.
 *  @throws {RangeError} names argument, value and domain
 *  Source: |x| < 1, Abramowitz & Stegun (1964) 7.1.6, positive terms only; beyond, 1 - erfc. */
export function erf(x: number): number {
  requireBetween('erf', 'x', x, -1e150, 1e150);
  const magnitude = Math.abs(x);
  if (magnitude < 1) return erfSeries(x);
  return Math.sign(x) * (1 - expOfMinusSquare(magnitude, 1) * scaledErfc(magnitude));
}

/** Complementary error function, 1 - erf(x), without cancellation.
 *  Domain: x from -1e150 to 1e150. Results below 1e-307 lose digits, as doubles do.
 *  Relative error (test/fixtures/error-function.json): 1.5e-15.
 *  @throws {RangeError} names argument, value and domain
 *  Source: x < 1/2 from the series of erf; beyond, Shepherd & Laframboise (1981). */
export function erfc(x: number): number {
  requireBetween('erfc', 'x', x, -1e150, 1e150);
  if (x < 0) return 1 + erf(-x);
  if (x < 0.5) return 1 - erfSeries(x);
  return expOfMinusSquare(x, 1) * scaledErfc(x);
}

/** 2x/√π exp(-x²) Σ (2x²)^k / (2k + 1)!!, |x| ≤ 1. */
function erfSeries(x: number): number {
  const twiceSquare = 2 * x * x;
  let term = 1;
  let sum = 1;
  for (let k = 3; term > 1e-17 * sum; k += 2) {
    term *= twiceSquare / k;
    sum += term;
  }
  return ((2 * x) / Math.sqrt(Math.PI)) * Math.exp(-x * x) * sum;
}
