import { requirePositive } from '../domain.ts';
import { stirlingError } from './stirling-error.ts';

/** (ζ(k) - 1)/k for k = 2, 3, …, from test/fixtures/coefficients.py. */
const zetaTerms = new Float64Array([
  0.3224670334241132, 0.0673523010531981, 0.020580808427784546, 0.007385551028673986, 0.0028905103307415234,
  0.001192753911703261, 0.0005096695247430425, 0.00022315475845357939, 9.945751278180853e-5,
  4.492623673813314e-5, 2.050721277567069e-5, 9.439488275268397e-6, 4.374866789907488e-6,
  2.039215753801366e-6, 9.55141213040742e-7, 4.492469198764566e-7, 2.1207184805554665e-7,
  1.0043224823968099e-7, 4.7698101693639804e-8, 2.2711094608943164e-8, 1.0838659214896955e-8,
  5.183475041970047e-9, 2.4836745438024785e-9, 1.1921401405860912e-9, 5.731367241678862e-10,
  2.7595228851242334e-10,
]);
const EULER = 0.5772156649015329;
const HALF_LOG_TWO_PI = 0.9189385332046728;

/** Natural logarithm of the gamma function.
 *  Domain: x > 0, finite. Its zeros at 1 and 2 keep full relative precision.
 *  Relative error (test/fixtures/log-gamma.json): 3e-15.
 *  @throws {RangeError} x not in the domain
 *  Source: Abramowitz & Stegun (1964), 6.1.33 up to 5/2, 6.1.40 beyond. */
export function logGamma(x: number): number {
  requirePositive('logGamma', 'x', x);
  if (x >= 2.5) return (x - 0.5) * Math.log(x) - x + HALF_LOG_TWO_PI + stirlingError(x);
  if (x >= 1.5) return logGammaNearTwo(x - 2);
  if (x >= 0.5) return logGammaNearTwo(x - 1) - Math.log1p(x - 1);
  return logGammaNearTwo(x) - Math.log1p(x) - Math.log(x);
}

/** ln Γ(2 + t), |t| ≤ 1/2. */
function logGammaNearTwo(t: number): number {
  let sum = 0;
  for (let k = zetaTerms.length - 1; k >= 0; k--) sum = zetaTerms[k]! - t * sum;
  return t * (1 - EULER + t * sum);
}
