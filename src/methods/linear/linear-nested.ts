/** Partial F test of predictors added to a linear model that holds others. */

import type { LinearNestedInputs } from '../../generated/spec.ts';
import { fail } from '../../problem.ts';
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
import {
  f2Form,
  fullAndReducedForm,
  increaseForm,
  partialCorrelationForm,
  partialR2Form,
  tStatisticForm,
} from './test-forms.ts';

/** Forms that describe one coefficient. */
const OF_ONE_COEFFICIENT = [partialCorrelationForm, tStatisticForm];

export const linearNested: Method = {
  name: 'linear-nested',
  title: 'partial F test of added predictors',
  summary: 'Partial F test of predictors added to a linear model that already holds others.',
  achieves: 'power',
  achievedUnit: '',
  finds: ['sample-size', 'power', 'detectable-effect'],
  effect: { variable: 'f2', symbol: 'f²', meaning: 'Cohen’s f²' },
  forms: [partialR2Form, f2Form, fullAndReducedForm, increaseForm, ...OF_ONE_COEFFICIENT],
  formula: ['F = ((R²f − R²r)/u)/((1 − R²f)/v), f: full model, r: reduced model', ...F_TEST_FORMULA],
  symbols: TEST_SYMBOLS,
  sources: TEST_SOURCES,
  assumptions: [...MODEL_ASSUMPTIONS, SAMPLED_ASSUMPTION],
  rises: 'always',
  prepare(aim) {
    const inputs = aim.inputs as LinearNestedInputs;
    const form = chosenForm(aim, this.forms);
    if (form !== null && OF_ONE_COEFFICIENT.includes(form) && inputs.added > 1) {
      fail(
        'M06',
        `aims[${aim.index}].inputs.effect.${form.keys[0]}`,
        `A ${form.title} describes one coefficient, and ${inputs.added} predictors are added; state the partial R² of all of them.`,
      );
    }
    return testCalculation({
      aim,
      tested: inputs.added,
      adjustedFor: inputs.adjusted_for,
      predictorValues: inputs.predictor_values,
      form,
      counts: countsOf(inputs.effect),
    });
  },
};
