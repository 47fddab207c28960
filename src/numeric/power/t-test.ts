import { betaUpperTail } from '../distributions/beta.ts';
import { tUpperQuantile } from '../distributions/student-t.ts';
import { logGamma } from '../special/log-gamma.ts';

function signedMixture(
  t: number,
  df: number,
  logFirst: (j: number) => number,
  logSecond: (j: number) => number,
  peak: number,
): number {
  const x = (t * t) / (df + t * t);
  let sum = 0;
  for (let j = 0; ; j += 1) {
    const term =
      (Math.exp(logFirst(j)) * betaUpperTail(x, j + 0.5, df / 2) +
        Math.exp(logSecond(j)) * betaUpperTail(x, j + 1, df / 2)) /
      2;
    sum += term;
    if (j > peak && term < 1e-17 * sum) return sum;
  }
}

export function tTestPower(alpha: number, df: number, noncentrality: number): number {
  const half = noncentrality ** 2 / 2;
  if (half === 0) return alpha;
  return signedMixture(
    tUpperQuantile(alpha, df),
    df,
    (j) => j * Math.log(half) - half - logGamma(j + 1),
    (j) => (j + 0.5) * Math.log(half) - half - logGamma(j + 1.5),
    half,
  );
}

export function sampledTTestPower(alpha: number, df: number, partialCorrelation: number): number {
  const r2 = partialCorrelation ** 2;
  if (r2 === 0) return alpha;
  const m = (df + 1) / 2;
  const base = m * Math.log1p(-r2) - logGamma(m);
  return signedMixture(
    tUpperQuantile(alpha, df),
    df,
    (j) => base + j * Math.log(r2) + logGamma(m + j) - logGamma(j + 1),
    (j) => base + (j + 0.5) * Math.log(r2) + logGamma(m + j + 0.5) - logGamma(j + 1.5),
    (m * r2) / (1 - r2),
  );
}
