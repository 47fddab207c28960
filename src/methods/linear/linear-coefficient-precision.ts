/** Number at which the confidence interval of one coefficient is as narrow as wanted, on average or with assurance. */

import type { LinearCoefficientPrecisionInputs } from '../../generated/spec.ts';
import { normalUpperQuantile } from '../../numeric/distributions/normal.ts';
import type { EffectForm, Method, Step, Values } from '../method.ts';
import { coefficientWidth, type WidthDesign, widthSteps } from './coefficient-width.ts';
import { INTERVAL_ASSUMPTIONS } from './linear-words.ts';
import { given } from './test-forms.ts';

/** Standard error that one person would give: σ/(σx·√(1 − R²x)). It leads by the residual SD. */
const unitErrorForm: EffectForm = {
  keys: ['residual_sd', 'predictor_sd', 'predictor_r2'],
  title: 'residual SD, SD of the predictor and its R² with the others',
  toEffect: (values) =>
    given(values, 'residual_sd') /
    (given(values, 'predictor_sd') * Math.sqrt(1 - given(values, 'predictor_r2'))),
  fromEffect: (unitError, values) =>
    unitError * given(values, 'predictor_sd') * Math.sqrt(1 - given(values, 'predictor_r2')),
  expression: 'residual_sd / (predictor_sd * sqrt(1 - predictor_r2))',
  inverse: 'unit_error * predictor_sd * sqrt(1 - predictor_r2)',
};

export const linearCoefficientPrecision: Method = {
  name: 'linear-coefficient-precision',
  title: 'confidence interval of one coefficient',
  summary:
    'Number at which the confidence interval of one coefficient is as narrow as wanted, on average or with assurance.',
  achieves: 'width',
  achievedUnit: 'outcome/predictor',
  finds: ['sample-size', 'width'],
  effect: { variable: 'unit_error', symbol: 's₁', meaning: 'standard error for one person' },
  forms: [unitErrorForm],
  formula: [
    'interval: b ± t(1 − α/2; v)·s/√S, v = n − p − 2, S the part of the predictor’s sum of squares not shared with the others',
    's₁ = σ/(σx·√(1 − R²x)); width = 2·t·s₁·√(χ²ᵥ/v)/√(S/(σx²(1 − R²x)))',
    'predictor fixed: S/(σx²(1 − R²x)) = n;  sampled: χ² with n − 1 − p degrees of freedom, independent of s',
    'expected width: the mean of both factors;  assured width: the quantile of their product (χ², or F)',
  ],
  symbols: [
    { symbol: 'n', meaning: 'number analysed' },
    { symbol: 'p', meaning: 'other predictors in the model' },
    { symbol: 'v', meaning: 'residual degrees of freedom' },
    { symbol: 'α', meaning: 'one minus the confidence level' },
    { symbol: 'σ, s', meaning: 'residual standard deviation, in the population and as estimated' },
    { symbol: 'σx', meaning: 'standard deviation of the predictor' },
    { symbol: 'R²x', meaning: 'R² of the predictor with the other predictors' },
  ],
  sources: [
    {
      key: 'kelley2003',
      of: 'planning for a narrow interval of a coefficient, on average and with assurance',
    },
  ],
  assumptions: INTERVAL_ASSUMPTIONS,
  rises: 'always',
  prepare(aim) {
    const inputs = aim.inputs as LinearCoefficientPrecisionInputs;
    const { alpha, assurance } = aim.criteria;
    const design: WidthDesign = {
      adjustedFor: inputs.adjusted_for,
      isSampled: inputs.predictor_values !== 'fixed',
      alpha,
      assurance,
    };
    const stated: Values = Object.fromEntries(
      Object.values(aim.quantities).map(({ key, value }) => [key, value]),
    );
    const achieved = (n: number, unitError: number) => coefficientWidth(n, unitError, design);
    return {
      // Two residual degrees of freedom: with one the mean of a sampled width does not exist.
      smallestN: inputs.adjusted_for + 4,
      form: unitErrorForm,
      effect: unitErrorForm.toEffect(stated),
      effectAt: (values) => unitErrorForm.toEffect(values),
      achieved,
      guess: (unitError, width) =>
        inputs.adjusted_for + ((2 * normalUpperQuantile(alpha / 2) * unitError) / width) ** 2,
      steps: (n, unitError): Step[] => widthSteps(n, achieved(n, unitError), design),
      equivalents: (unitError) => [
        {
          key: 'unit_error',
          symbol: 's₁',
          meaning: 'standard error for one person',
          value: unitError,
          unit: 'outcome/predictor',
        },
      ],
      constants: [
        { variable: 'p', meaning: 'other predictors in the model', value: inputs.adjusted_for },
        { variable: 'alpha', meaning: 'one minus the confidence level', value: alpha },
        ...(assurance === null ? [] : [{ variable: 'assurance', meaning: 'assurance', value: assurance }]),
      ],
      alternatives: () => [],
    };
  },
};
