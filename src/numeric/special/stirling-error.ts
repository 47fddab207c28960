import { chebyshevSum } from './chebyshev.ts';

/** Chebyshev coefficients for z in [1/4, 8] in the variable s = (√z - 1)/(√z + 1), scaled to [-1, 1]: the
 *  map takes the plane cut along the negative axis to the unit disc, so few terms serve although z = 0 is
 *  near. Computed by test/fixtures/coefficients.py; the terms left out are below 1e-17. */
const near = new Float64Array([
  0.10014011603108113, -0.1223275206531589, 0.04003066788432057, -0.008603993545845887, 0.0012835774569293068,
  -0.00011591259168665952, 5.543167155127603e-6, -1.966021906010037e-6, 9.18872137358303e-7,
  -1.754335803306262e-7, 9.11126405664289e-9, 5.231071045520212e-10, 6.968305255322152e-10,
  -2.5553085119947047e-10, 1.7426235914122884e-11, 3.2555865446375318e-12, 5.318467038463049e-13,
  -3.910994140917229e-13, 2.521974540452699e-14, 7.656916401136844e-15, 6.917133101489677e-16,
  -6.055835017811206e-16, 1.5114461221105475e-17, 1.3103597678367545e-17,
]);
const nearCentre = ((Math.sqrt(8) - 1) / (Math.sqrt(8) + 1) - 1 / 3) / 2;
const nearHalfWidth = ((Math.sqrt(8) - 1) / (Math.sqrt(8) + 1) + 1 / 3) / 2;

/** B_2k / (2k (2k - 1)): at z = 8 the first term left out is below 1e-18. */
const far = new Float64Array([
  0.08333333333333333, -0.002777777777777778, 0.0007936507936507937, -0.0005952380952380953,
  0.0008417508417508417, -0.0019175269175269176, 0.00641025641025641, -0.029550653594771242,
  0.17964437236883057, -1.3924322169059011, 13.402864044168393,
]);

/** ln Γ(z) - [(z - 1/2) ln z - z + ln(2π)/2]: what Stirling's leading terms leave.
 *  Domain (not checked): z ≥ 1/4. Absolute error below 1e-16.
 *  Source: z > 8, asymptotic series, Abramowitz & Stegun (1964) 6.1.40; z ≤ 8, Chebyshev series. */
export function stirlingError(z: number): number {
  if (z <= 8) {
    const root = Math.sqrt(z);
    return chebyshevSum(near, ((root - 1) / (root + 1) - nearCentre) / nearHalfWidth);
  }
  const inverse = 1 / z;
  const inverseSquare = inverse * inverse;
  // Fewer terms serve further out: 3 beyond 1000 and 5 beyond 50 leave less than 1e-19.
  let sum = 0;
  for (let k = z > 1000 ? 2 : z > 50 ? 4 : far.length - 1; k >= 0; k--) sum = sum * inverseSquare + far[k]!;
  return sum * inverse;
}
