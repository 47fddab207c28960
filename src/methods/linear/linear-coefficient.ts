/** t test of one coefficient of a linear model, one- or two-sided. */

import type { LinearCoefficientInputs } from '../../generated/spec.ts';
import type { Method } from '../method.ts';
import { chosenForm, countsOf } from './chosen-form.ts';
import {
  F_TEST_FORMULA,
  MODEL_ASSUMPTIONS,
  ONE_SIDED_FORMULA,
  SAMPLED_ASSUMPTION,
  TEST_SOURCES,
  TEST_SYMBOLS,
} from './linear-words.ts';
import { testCalculation } from './test-calculation.ts';
import { f2Form, partialCorrelationForm, partialR2Form, slopeForm, tStatisticForm } from './test-forms.ts';

export const linearCoefficient: Method = {
  name: 'linear-coefficient',
  title: 't test of one coefficient',
  summary: 't test of one coefficient of a linear model, one- or two-sided.',
  achieves: 'power',
  achievedUnit: '',
  finds: ['sample-size', 'power', 'detectable-effect'],
  effect: { variable: 'f2', symbol: 'f²', meaning: 'Cohen’s f²' },
  forms: [slopeForm, partialCorrelationForm, partialR2Form, f2Form, tStatisticForm],
  formula: ['f² = b²·σx²·(1 − R²x)/σ²; u = 1; two-sided: F = t²', ...F_TEST_FORMULA, ...ONE_SIDED_FORMULA],
  symbols: [
    ...TEST_SYMBOLS,
    {
      symbol: 'b',
      meaning: 'slope: difference in the outcome for a difference of one unit in the predictor',
    },
    { symbol: 'σ', meaning: 'residual standard deviation of the outcome' },
    {
      symbol: 'σx',
      meaning: 'standard deviation of the predictor, with divisor n where its values are fixed',
    },
    {
      symbol: 'R²x',
      meaning: 'R² of the predictor with the other predictors; 1/(1 − R²x) is the variance inflation',
    },
  ],
  sources: [
    ...TEST_SOURCES,
    { key: 'maxwell2000', of: 'power of a single coefficient' },
    { key: 'hsieh1998', of: 'variance inflation by the other predictors' },
  ],
  assumptions: [...MODEL_ASSUMPTIONS, SAMPLED_ASSUMPTION],
  rises: 'always',
  prepare(aim) {
    const inputs = aim.inputs as LinearCoefficientInputs;
    return testCalculation({
      aim,
      tested: 1,
      adjustedFor: inputs.adjusted_for,
      predictorValues: inputs.predictor_values,
      form: chosenForm(aim, this.forms),
      counts: countsOf(inputs.effect),
    });
  },
};
