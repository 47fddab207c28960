/** Inputs that are each allowed and contradict each other. The whole message is read. */

import { describe, expect, test } from 'vitest';
import type { MethodName } from '../../../src/generated/spec.ts';
import { ProblemError } from '../../../src/problem.ts';
import { bind } from '../bind-aim.ts';

function refusal(name: MethodName, inputs: Record<string, unknown>): string {
  try {
    bind(name, inputs);
  } catch (error) {
    if (error instanceof ProblemError) return error.message;
    throw error;
  }
  return 'not refused';
}

const corners = { residual_sd: 1, predictor_proportion: 0.9, moderator_proportion: 0.1 };
const slope = { residual_sd: 1, predictor_sd: 1, predictor_r2: 0 };

describe('contradictions are refused, with the place and what is needed', () => {
  test.each<[string, MethodName, Record<string, unknown>, RegExp[]]>([
    [
      'a reduced model that explains more than the full one',
      'linear-nested',
      { added: 2, adjusted_for: 3, effect: { r2_full: 0.2, r2_reduced: 0.3 } },
      [/aims\[0\]\.inputs\.effect\.r2_full/, /0\.2/, /0\.3/],
    ],
    [
      'an increase larger than the whole',
      'linear-nested',
      { added: 2, adjusted_for: 3, effect: { r2_increase: 0.4, r2_full: 0.3 } },
      [/r2_increase/, /0\.4/],
    ],
    [
      'a partial correlation for several predictors',
      'linear-nested',
      { added: 2, adjusted_for: 3, effect: { partial_correlation: 0.3 } },
      [/partial_correlation/, /one coefficient/, /2 predictors/],
    ],
    [
      'a t statistic for several predictors',
      'linear-nested',
      { added: 2, adjusted_for: 3, effect: { t_statistic: 2.5, t_df: 80 } },
      [/t_statistic/, /one coefficient/],
    ],
    [
      'a source that supports no effect',
      'linear-overall',
      { predictors: 6, effect: { observed_r2: 0.1, source_n: 30, source_predictors: 6 } },
      [/observed_r2/, /this source supports no effect/],
    ],
    [
      'a source with fewer people than its model has parameters',
      'linear-overall',
      { predictors: 6, effect: { observed_r2: 0.5, source_n: 7, source_predictors: 6 } },
      [/source_n/, /more than 7/],
    ],
    [
      'a slope of zero',
      'linear-coefficient',
      { adjusted_for: 3, effect: { slope: 0, ...slope } },
      [/slope is 0/],
    ],
    [
      'a correlation of zero',
      'linear-coefficient',
      { adjusted_for: 3, effect: { partial_correlation: 0 } },
      [/partial_correlation is 0/],
    ],
    [
      'a t statistic of zero',
      'linear-coefficient',
      { adjusted_for: 3, effect: { t_statistic: 0, t_df: 50 } },
      [/t_statistic is 0/],
    ],
    [
      'cells that two proportions and their correlation cannot have',
      'linear-interaction',
      {
        kind: 'binary-binary',
        adjusted_for: 0,
        effect: { slope_difference: 1, predictor_correlation: 0.5, ...corners },
      },
      [/predictor_correlation/, /0\.9/, /0\.1/, /cell/],
    ],
    [
      'a form that belongs to another kind of predictors',
      'linear-interaction',
      {
        kind: 'continuous-continuous',
        adjusted_for: 0,
        effect: { slope_difference: 1, residual_sd: 1, predictor_sd: 1, moderator_proportion: 0.5 },
      },
      [/continuous-continuous/, /two groups/],
    ],
  ])('%s', (_, name, inputs, parts) => {
    const message = refusal(name, inputs);
    for (const part of parts) expect(message).toMatch(part);
  });
});

describe('reliability', () => {
  const inputs = {
    kind: 'continuous-continuous',
    adjusted_for: 0,
    predictor_reliability: 0.7,
    moderator_reliability: 0.7,
    effect: { partial_r2: 0.05 },
  };

  test('the effect as it will be seen and the one without error are both given, under their own names', () => {
    const { calculation, effect } = bind('linear-interaction', inputs);
    const given = Object.fromEntries(
      calculation.equivalents(effect).map(({ key, meaning, value }) => [key, { meaning, value }]),
    );
    // f² .0526 at a reliability of .49: .49·f²/(1 + .51·f²).
    expect(given.f2?.value).toBeCloseTo((0.49 * (0.05 / 0.95)) / (1 + 0.51 * (0.05 / 0.95)), 12);
    expect(given.f2?.meaning).toBe('f² as it will be seen');
    expect(given.partial_r2?.meaning).toBe('partial R² as it will be seen');
    expect(given.true_partial_r2).toEqual({
      meaning: 'partial R² without error of measurement',
      value: expect.closeTo(0.05, 12),
    });
  });

  test('an effect that such measurement can never show has no counterpart without error', () => {
    const { calculation } = bind('linear-interaction', inputs);
    // At a reliability of .49 the f² seen stays below .49/.51.
    const keys = calculation.equivalents(0.97).map(({ key }) => key);
    expect(keys).not.toContain('true_f2');
  });
});
