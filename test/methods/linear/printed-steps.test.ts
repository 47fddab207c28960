/** The arithmetic that a page prints, rerun in base R and in Python with SciPy: every step and every conversion. */

import { describe, expect, test } from 'vitest';
import type { MethodName } from '../../../src/generated/spec.ts';
import { isMissing } from '../../support/interpreters.ts';
import { type Bound, bind } from '../bind-aim.ts';
import { differences, rerunSteps, type StepCase } from '../recompute.ts';

function stepCase(name: string, bound: Bound, n: number, effect = bound.effect): StepCase {
  const { calculation, method } = bound;
  const constants = calculation.constants.map(({ variable, value }) => [variable, value]);
  const given = { ...Object.fromEntries(constants), n, [method.effect.variable]: effect };
  return { name: `${method.name} ${name}, n ${n}`, given, steps: calculation.steps(n, effect) };
}

const PREDICTOR_VALUES = ['fixed', 'sampled'] as const;

const tests: StepCase[] = PREDICTOR_VALUES.flatMap((values) => {
  const nested = (added: number, adjustedFor: number, f2: number, alpha = 0.05) =>
    bind(
      'linear-nested',
      { added, adjusted_for: adjustedFor, predictor_values: values, effect: { f2 } },
      { alpha, power: 0.9 },
    );
  const oneSided = (f2: number) =>
    bind(
      'linear-coefficient',
      { adjusted_for: 4, predictor_values: values, effect: { f2 } },
      { alpha: 0.025, power: 0.8, sides: 1 },
    );
  const overall = bind('linear-overall', {
    predictors: 6,
    predictor_values: values,
    effect: { observed_r2: 0.2, source_n: 50, source_predictors: 6 },
  });
  return [
    stepCase(values, nested(3, 5, 0.06), 235),
    stepCase(`${values}, one residual degree of freedom`, nested(3, 5, 0.06), 10),
    stepCase(`${values}, large`, nested(12, 40, 0.0004), 60_000),
    stepCase(`${values}, strong`, nested(2, 0, 4), 30),
    stepCase(`${values}, strict`, nested(1, 0, 0.02, 1e-6), 500),
    stepCase(values, overall, 140),
    stepCase(`${values}, one-sided`, oneSided(0.04), 155),
    stepCase(`${values}, one-sided, large`, oneSided(0.0005), 16_000),
    stepCase(`${values}, one-sided, strong`, oneSided(2), 20),
  ];
});

const interaction = bind('linear-interaction', {
  kind: 'continuous-continuous',
  adjusted_for: 3,
  predictor_values: 'sampled',
  predictor_reliability: 0.8,
  effect: { partial_r2: 0.03 },
});
tests.push(stepCase('sampled', interaction, 330));

const widths: StepCase[] = PREDICTOR_VALUES.flatMap((values) =>
  [undefined, 0.8, 0.99].flatMap((assurance) => {
    const criteria = { confidence: 0.95, width: 1, ...(assurance === undefined ? {} : { assurance }) };
    const inputs = { adjusted_for: 4, residual_sd: 4.2, predictor_sd: 0.9, predictor_r2: 0.3 };
    const bound = bind(
      'linear-coefficient-precision',
      { ...inputs, predictor_values: values },
      { ...criteria },
    );
    return [8, 40, 400, 20_000].map((n) => stepCase(`${values} ${assurance ?? 'expected'}`, bound, n));
  }),
);

const r2Widths: StepCase[] = PREDICTOR_VALUES.flatMap((values) => {
  const interval = (more: object) =>
    bind(
      'linear-r2-precision',
      { predictors: 3, predictor_values: values, effect: { r2: 0.3 } },
      { confidence: 0.95, width: 0.3, ...more },
    );
  const expected = interval({});
  const base = stepCase(`${values} expected`, expected, 60);
  const others = expected.calculation.alternatives(0.3, 0.3).map(({ key, steps }) => ({
    ...base,
    name: `linear-r2-precision ${values} ${key}`,
    steps: steps(60),
  }));
  return [base, stepCase(`${values} assured`, interval({ assurance: 0.8 }), 60), ...others];
});

/** The steps under other conventions, of which the appendix prints the functions. */
const otherConventions: StepCase[] = PREDICTOR_VALUES.flatMap((values) => {
  const inputs = { adjusted_for: 4, predictor_values: values, effect: { f2: 0.05 } };
  return ([1, 2] as const).flatMap((sides) => {
    const bound = bind('linear-coefficient', inputs, { alpha: 0.05, power: 0.8, sides });
    return bound.calculation.alternatives(bound.effect, 0.8).map(({ key, n, steps }) => ({
      ...stepCase(`${values}, ${sides} sides, ${key}`, bound, n),
      steps: steps(n),
    }));
  });
});

/** Every form of every method, with values that do not contradict each other. */
const FORMS: readonly [MethodName, Record<string, unknown>][] = [
  ['linear-overall', { predictors: 4, effect: { r2: 0.13 } }],
  ['linear-overall', { predictors: 4, effect: { f2: 0.15 } }],
  ['linear-overall', { predictors: 4, effect: { adjusted_r2: 0.1, source_n: 60, source_predictors: 4 } }],
  ['linear-overall', { predictors: 4, effect: { observed_r2: 0.2, source_n: 60, source_predictors: 4 } }],
  ['linear-nested', { added: 2, adjusted_for: 3, effect: { partial_r2: 0.06 } }],
  ['linear-nested', { added: 2, adjusted_for: 3, effect: { r2_full: 0.3, r2_reduced: 0.25 } }],
  ['linear-nested', { added: 2, adjusted_for: 3, effect: { r2_increase: 0.05, r2_full: 0.3 } }],
  ['linear-nested', { added: 1, adjusted_for: 3, effect: { partial_correlation: -0.2 } }],
  ['linear-nested', { added: 1, adjusted_for: 3, effect: { t_statistic: -2.5, t_df: 80 } }],
  [
    'linear-coefficient',
    { adjusted_for: 3, effect: { slope: -0.4, residual_sd: 9.5, predictor_sd: 8, predictor_r2: 0.45 } },
  ],
  [
    'linear-interaction',
    {
      kind: 'continuous-continuous',
      adjusted_for: 0,
      predictor_reliability: 0.8,
      moderator_reliability: 0.9,
      effect: {
        slope_difference: -0.3,
        moderator_contrast: 2,
        residual_sd: 1.5,
        predictor_sd: 2,
        moderator_sd: 1.2,
        predictor_correlation: 0.4,
      },
    },
  ],
  [
    'linear-interaction',
    {
      kind: 'continuous-binary',
      adjusted_for: 0,
      predictor_reliability: 0.8,
      effect: { slope_difference: 0.3, residual_sd: 1.5, predictor_sd: 1, moderator_proportion: 0.3 },
    },
  ],
  [
    'linear-interaction',
    {
      kind: 'binary-binary',
      adjusted_for: 0,
      effect: {
        slope_difference: 0.6,
        residual_sd: 1.5,
        predictor_proportion: 0.4,
        moderator_proportion: 0.3,
        predictor_correlation: -0.2,
      },
    },
  ],
  ['linear-r2-precision', { predictors: 4, effect: { f2: 0.15 } }],
  [
    'linear-r2-precision',
    { predictors: 4, effect: { observed_r2: 0.2, source_n: 60, source_predictors: 4 } },
  ],
  ['linear-coefficient-precision', { adjusted_for: 3, residual_sd: 4, predictor_sd: 0.9, predictor_r2: 0.3 }],
];

function conversion(name: MethodName, inputs: Record<string, unknown>): StepCase {
  const interval = name.endsWith('precision');
  const bound = bind(name, inputs, interval ? { confidence: 0.95, width: 0.2 } : undefined);
  const { calculation, effect, method } = bound;
  const { form } = calculation;
  if (form === null) throw new Error('a form is stated');
  const { effect: inEffect = {}, ...others } = inputs as { effect?: Record<string, number> };
  const numbers = Object.entries({ ...others, ...inEffect }).filter(([, value]) => typeof value === 'number');
  const given = Object.fromEntries(numbers) as Record<string, number>;
  const leading = form.keys[0];
  const { expression, inverse } = form;
  // The inverse gives the size of what has a sign. It is run with the effect as a number, as the page runs it.
  return {
    name: `${name} from ${leading}`,
    given: { ...given },
    steps: [
      { variable: 'effect', value: effect, r: expression, python: expression },
      { variable: method.effect.variable, value: effect, r: 'effect', python: 'effect' },
      { variable: 'back', value: Math.abs(given[leading] ?? 0), r: inverse, python: inverse },
    ],
  };
}

describe.each(['r', 'python'] as const)('printed lines in %s', (language) => {
  test.skipIf(isMissing(language))('the steps of every test give the printed values to 1e-9', () => {
    expect(otherConventions.length).toBe(8);
    expect(differences(rerunSteps([...tests, ...otherConventions], language), 1e-9)).toEqual([]);
  });

  test.skipIf(isMissing(language))('the steps of the width of a coefficient do so too', () => {
    expect(differences(rerunSteps(widths, language), 1e-9)).toEqual([]);
  });

  test.skipIf(isMissing(language))(
    'the steps of the width of R² agree to 1e-7, as their integrals do',
    () => {
      expect(differences(rerunSteps(r2Widths, language), 1e-7)).toEqual([]);
    },
    120_000,
  );

  test.skipIf(isMissing(language))('every form converts to the effect and back', () => {
    const cases = FORMS.map(([name, inputs]) => conversion(name, inputs));
    expect(differences(rerunSteps(cases, language), 1e-12)).toEqual([]);
  });
});
