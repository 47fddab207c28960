/** F test of a whole linear model: all its predictors at once. */

import type { LinearOverallInputs } from '../../generated/spec.ts';
import type { Method } from '../method.ts';
import { chosenForm, countsOf } from './chosen-form.ts';
import {
  F_TEST_FORMULA,
  MODEL_ASSUMPTIONS,
  SAMPLED_ASSUMPTION,
  TEST_SOURCES,
  TEST_SYMBOLS,
} from './linear-words.ts';
import { testCalculation } from './test-calculation.ts';
import { adjustedR2Form, f2Form, observedR2Form, r2Form } from './test-forms.ts';

export const linearOverall: Method = {
  name: 'linear-overall',
  title: 'overall F test of a linear model',
  summary:
    'F test of whether a linear model explains anything: all its coefficients but the intercept at once.',
  achieves: 'power',
  achievedUnit: '',
  finds: ['sample-size', 'power', 'detectable-effect'],
  effect: { variable: 'f2', symbol: 'f²', meaning: 'Cohen’s f²' },
  forms: [r2Form, f2Form, adjustedR2Form, observedR2Form],
  formula: ['F = (R²/u)/((1 − R²)/v), p = 0', ...F_TEST_FORMULA],
  symbols: TEST_SYMBOLS,
  sources: TEST_SOURCES,
  assumptions: [...MODEL_ASSUMPTIONS, SAMPLED_ASSUMPTION],
  rises: 'always',
  prepare(aim) {
    const inputs = aim.inputs as LinearOverallInputs;
    return testCalculation({
      aim,
      tested: inputs.predictors,
      adjustedFor: 0,
      predictorValues: inputs.predictor_values,
      form: chosenForm(aim, this.forms),
      counts: countsOf(inputs.effect),
      isWholeModel: true,
    });
  },
};
