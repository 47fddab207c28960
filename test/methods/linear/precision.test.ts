/** Widths of intervals against computations outside the project and against identities. */

import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { coefficientWidth, type WidthDesign } from '../../../src/methods/linear/coefficient-width.ts';
import { smallestInteger } from '../../../src/numeric/solve/smallest-integer.ts';
import { bind, needed } from '../bind-aim.ts';

interface Row {
  n: number;
  r2: number;
  predictors: number;
  confidence: number;
  predictor_values: 'fixed' | 'sampled';
  expected: number;
  assured_80: number;
}

const { rows } = JSON.parse(readFileSync(join(import.meta.dirname, 'r2-precision.json'), 'utf8')) as {
  rows: Row[];
};

const close = (value: number, truth: number, tolerance: number) =>
  expect(Math.abs(value / truth - 1), `${value} against ${truth}`).toBeLessThan(tolerance);

function r2Interval(row: Row, assurance?: number) {
  const { predictors, predictor_values, r2, confidence } = row;
  const criteria = { confidence, width: 0.2, ...(assurance === undefined ? {} : { assurance }) };
  return bind('linear-r2-precision', { predictors, predictor_values, effect: { r2 } }, { ...criteria });
}

describe('the interval of R² (made outside by integrating over the observed R², see r2-precision.py)', () => {
  test('there are rows for both kinds of predictors', () => {
    expect(new Set(rows.map((row) => row.predictor_values))).toEqual(new Set(['fixed', 'sampled']));
  });

  test.each(rows)('n $n, R² $r2, $predictors $predictor_values predictors: expected width', (row) => {
    close(r2Interval(row).calculation.achieved(row.n, row.r2), row.expected, 1e-9);
  });

  // Made outside in the same way, without the observations that are exceeded with probability 1e-9, which is why these are
  // good to 1e-9 only: the smallest numbers that can be planned.
  test.each([
    [11, 0.3, 5, 'sampled', 0.7421504730289852],
    [7, 0.1, 1, 'sampled', 0.6808369114714792],
    [11, 0.3, 5, 'fixed', 0.6814082594677451],
    [16, 0.01, 10, 'fixed', 0.5784882856478845],
  ] as const)(
    'the smallest number, %d, with R² %d and %d %s predictors',
    (n, r2, predictors, values, width) => {
      const row = {
        n,
        r2,
        predictors,
        predictor_values: values,
        confidence: 0.95,
        expected: width,
        assured_80: 0,
      };
      const { calculation } = r2Interval(row);
      expect(calculation.smallestN).toBe(n);
      close(calculation.achieved(n, r2), width, 2e-9);
    },
  );

  test('both widths narrow with every further person', () => {
    for (const r2 of [0.02, 0.2, 0.5]) {
      for (const assurance of [undefined, 0.8, 0.95]) {
        const row = { n: 0, r2, predictors: 3, predictor_values: 'sampled' as const, confidence: 0.95 };
        const { calculation } = r2Interval({ ...row, expected: 0, assured_80: 0 }, assurance);
        let last = Number.POSITIVE_INFINITY;
        for (let n = calculation.smallestN; n < 45; n += 1) {
          const width = calculation.achieved(n, r2);
          expect(width, `R² ${r2}, assurance ${assurance}, n ${n}`).toBeLessThan(last);
          last = width;
        }
      }
    }
  });

  test.each(rows)('n $n, R² $r2, $predictors $predictor_values predictors: width assured to .80', (row) => {
    close(r2Interval(row, 0.8).calculation.achieved(row.n, row.r2), row.assured_80, 1e-8);
  });

  test('assurance above one half needs more people than the average', () => {
    const inputs = { predictors: 5, predictor_values: 'sampled', effect: { r2: 0.3 } };
    const plan = (assurance?: number) =>
      needed(
        bind('linear-r2-precision', inputs, {
          confidence: 0.95,
          width: 0.2,
          ...(assurance === undefined ? {} : { assurance }),
        }),
        0.2,
      );
    const [onAverage, assured] = [plan(), plan(0.8)];
    expect(assured).toBeGreaterThan(onAverage);
  });

  test('the width at the expected R² is offered as another definition, with another number', () => {
    const inputs = { predictors: 5, predictor_values: 'sampled', effect: { r2: 0.3 } };
    const bound = bind('linear-r2-precision', inputs, { confidence: 0.95, width: 0.2 });
    const [other, ...none] = bound.calculation.alternatives(bound.effect, 0.2);
    expect(none).toEqual([]);
    expect(other?.key).toBe('at_mean');
    // Concave in the observed R² where it matters, the width at the mean exceeds the mean width.
    expect(other?.n).toBeGreaterThan(needed(bound, 0.2));
    expect(other?.steps(other.n).at(-1)?.value).toBeLessThanOrEqual(0.2);
    expect(other?.steps(other.n - 1).at(-1)?.value).toBeGreaterThan(0.2);
  });
});

describe('the interval of a coefficient', () => {
  /** Fixed, and no predictor at all: v = n − 1, as for the interval of a mean. */
  const mean = (assurance: number | null): WidthDesign => ({
    adjustedFor: -1,
    isSampled: false,
    alpha: 0.05,
    assurance,
  });
  const people = (assurance: number | null) =>
    smallestInteger((n) => coefficientWidth(n, 10, mean(assurance)) <= 4, 3, 1000, 'always');

  test('M31: the mean of SD 10 to within 2 needs 98 on average, 110 and 116 with assurance .80 and .90', () => {
    expect([people(null), people(0.8), people(0.9)]).toEqual([98, 110, 116]);
  });

  const inputs = { adjusted_for: 4, residual_sd: 4.2, predictor_sd: 0.9, predictor_r2: 0.3 };
  const unitError = 4.2 / (0.9 * Math.sqrt(0.7));
  const interval = (predictor_values: string, more: object = {}) =>
    bind(
      'linear-coefficient-precision',
      { ...inputs, predictor_values },
      { confidence: 0.95, width: 1.6, ...more },
    );

  // √(V/v)/√W has the mean √(2/v)·Γ((v+1)/2)/Γ(v/2) · Γ((m−1)/2)/(√2·Γ(m/2)); with m = v + 1 the gammas cancel.
  test.each([12, 30, 200, 5000])('with %d analysed the expected sampled width is 2·t·s₁/√v', (n) => {
    const { calculation, effect } = interval('sampled');
    close(effect, unitError, 1e-14);
    const v = n - 6;
    const [critical] = calculation.steps(n, effect).filter(({ variable }) => variable === 'critical');
    close(calculation.achieved(n, effect), (2 * (critical?.value ?? 0) * unitError) / Math.sqrt(v), 1e-12);
  });

  test('simulated residuals and predictors give the expected and the assured width', () => {
    // Made outside with NumPy: r = default_rng(7); x = √(r.chisquare(24, N)/24/r.chisquare(25, N)), N = 4 million, gave a
    // mean of .2041289 (Monte Carlo error 2e-5) and a .80 quantile of .2373995; 2·t(.975; 24) = 4.127797123.
    const achieved = (more: object) => interval('sampled', more).calculation.achieved(30, 1) / 4.127797123;
    close(achieved({}), 0.2041289, 3e-4);
    close(achieved({ assurance: 0.8 }), 0.2373995, 4e-4);
  });

  test('the interval of a sampled predictor is wider than that of a fixed one, and both narrow with n', () => {
    for (const more of [{}, { assurance: 0.8 }, { assurance: 0.99 }]) {
      const [fixed, sampled] = [interval('fixed', more), interval('sampled', more)];
      for (let n = 8; n < 300; n += 1) {
        const [narrow, wide] = [fixed, sampled].map(({ calculation }) => calculation.achieved(n, 1));
        expect(wide).toBeGreaterThan(narrow ?? 0);
        expect(fixed.calculation.achieved(n + 1, 1)).toBeLessThan(narrow ?? 0);
        expect(sampled.calculation.achieved(n + 1, 1)).toBeLessThan(wide ?? 0);
      }
    }
  });

  test('an overlap of .5 doubles the number', () => {
    const at = (overlap: number) =>
      needed(
        bind(
          'linear-coefficient-precision',
          { ...inputs, predictor_values: 'fixed', predictor_r2: overlap },
          { confidence: 0.95, width: 0.4 },
        ),
        0.4,
      );
    expect(at(0.5) / at(0)).toBeCloseTo(2, 2);
  });
});
