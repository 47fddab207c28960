/** How wide the confidence interval of a coefficient will be. Its width is 2·t·s₁·√(V/v)/√W: V the residual sum of
 *  squares over σ², χ² with v degrees of freedom; W the predictor's own sum of squares over its variance, n for a fixed
 *  predictor, and independent of V χ² with n − 1 − p degrees of freedom for a sampled one (Kelley & Maxwell 2003 for the
 *  fixed case; the sampled one by the same argument). */

import { chiSquaredQuantile } from '../../numeric/distributions/chi-squared.ts';
import { fQuantile } from '../../numeric/distributions/f.ts';
import { tUpperQuantile } from '../../numeric/distributions/student-t.ts';
import { logGamma } from '../../numeric/special/log-gamma.ts';
import type { Step } from '../method.ts';

export interface WidthDesign {
  adjustedFor: number;
  isSampled: boolean;
  /** 1 − confidence. */
  alpha: number;
  /** null: the expected width is planned. */
  assurance: number | null;
}

export function coefficientWidth(n: number, unitError: number, design: WidthDesign): number {
  const v = n - design.adjustedFor - 2;
  return 2 * tUpperQuantile(design.alpha / 2, v) * unitError * spread(n, v, design);
}

/** Mean, or quantile at the assurance, of √(V/v)/√W. */
function spread(n: number, v: number, { adjustedFor, isSampled, assurance }: WidthDesign): number {
  const m = n - 1 - adjustedFor;
  if (assurance === null) {
    const ofResidual = (Math.SQRT2 * gammaRatio((v + 1) / 2, v / 2)) / Math.sqrt(v);
    const ofPredictor = isSampled ? gammaRatio((m - 1) / 2, m / 2) / Math.SQRT2 : 1 / Math.sqrt(n);
    return ofResidual * ofPredictor;
  }
  return isSampled
    ? Math.sqrt(fQuantile(assurance, v, m) / m)
    : Math.sqrt(chiSquaredQuantile(assurance, v) / v / n);
}

/** Γ(a)/Γ(b). */
function gammaRatio(a: number, b: number): number {
  return Math.exp(logGamma(a) - logGamma(b));
}

/** An expression that both languages read alike. */
function same(step: Omit<Step, 'r' | 'python'>, expression: string): Step {
  return { ...step, r: expression, python: expression };
}

export function widthSteps(n: number, width: number, design: WidthDesign): Step[] {
  const { adjustedFor, alpha, isSampled, assurance } = design;
  const v = n - adjustedFor - 2;
  const m = n - 1 - adjustedFor;
  return [
    same(
      {
        variable: 'v',
        symbol: 'v',
        meaning: 'residual degrees of freedom',
        formula: 'v = n − p − 2',
        value: v,
      },
      'n - p - 2',
    ),
    {
      variable: 'critical',
      symbol: 't',
      meaning: 'critical value of t with v degrees of freedom',
      formula: 'P(t > t(1 − α/2; v)) = α/2',
      value: tUpperQuantile(alpha / 2, v),
      r: 'qt(alpha / 2, v, lower.tail = FALSE)',
      python: 'stats.t.isf(alpha / 2, v)',
    },
    ...(isSampled
      ? [
          same(
            {
              variable: 'm',
              symbol: 'm',
              meaning: 'degrees of freedom of the predictor',
              formula: 'm = n − 1 − p',
              value: m,
            },
            'n - 1 - p',
          ),
        ]
      : []),
    {
      variable: 'spread',
      symbol: 'c',
      meaning: assurance === null ? 'mean of √(V/v)/√W' : 'quantile of √(V/v)/√W at the assurance',
      formula: SPREAD_FORMULAS[isSampled ? 'sampled' : 'fixed'][assurance === null ? 'expected' : 'assured'],
      value: spread(n, v, design),
      ...SPREAD_LINES[isSampled ? 'sampled' : 'fixed'][assurance === null ? 'expected' : 'assured'],
    },
    same(
      {
        variable: 'achieved',
        symbol: 'w',
        meaning: assurance === null ? 'expected full width' : 'full width not exceeded with the assurance',
        formula: 'w = 2·t·s₁·c',
        value: width,
      },
      '2 * critical * unit_error * spread',
    ),
  ];
}

const SPREAD_FORMULAS = {
  fixed: { expected: '√2·Γ((v+1)/2)/(Γ(v/2)·√(v·n))', assured: '√(χ²(assurance; v)/(v·n))' },
  sampled: {
    expected: 'Γ((v+1)/2)·Γ((m−1)/2)/(Γ(v/2)·Γ(m/2)·√v)',
    assured: '√(F(assurance; v, m)/m)',
  },
} as const;

const SPREAD_LINES = {
  fixed: {
    expected: {
      r: 'sqrt(2 / (v * n)) * exp(lgamma((v + 1) / 2) - lgamma(v / 2))',
      python: 'sqrt(2 / (v * n)) * exp(special.gammaln((v + 1) / 2) - special.gammaln(v / 2))',
    },
    assured: {
      r: 'sqrt(qchisq(assurance, v) / (v * n))',
      python: 'sqrt(stats.chi2.ppf(assurance, v) / (v * n))',
    },
  },
  sampled: {
    expected: {
      r: 'exp(lgamma((v + 1) / 2) - lgamma(v / 2) + lgamma((m - 1) / 2) - lgamma(m / 2)) / sqrt(v)',
      python:
        'exp(special.gammaln((v + 1) / 2) - special.gammaln(v / 2) + special.gammaln((m - 1) / 2) - special.gammaln(m / 2)) / sqrt(v)',
    },
    assured: { r: 'sqrt(qf(assurance, v, m) / m)', python: 'sqrt(stats.f.ppf(assurance, v, m) / m)' },
  },
} as const;
