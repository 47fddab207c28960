/** z with upper normal tail p, 0 < p ≤ 1/2, to 4.5e-4: a start for iterations.
 *  Source: Hastings, in Abramowitz & Stegun (1964) 26.2.23. */
export function roughNormalUpperQuantile(p: number): number {
  const t = Math.sqrt(-2 * Math.log(p));
  return (
    t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)))
  );
}
