/** t test of the product of two predictors: does the slope of one depend on the other? */

import { r2FromF2 } from '../../effects/effect-size.ts';
import type { LinearInteractionInputs } from '../../generated/spec.ts';
import { fail } from '../../problem.ts';
import type { Equivalent, Method } from '../method.ts';
import { chosenForm } from './chosen-form.ts';
import {
  attenuated,
  differenceForms,
  type InteractionForm,
  isAttenuated,
  withoutError,
} from './interaction-forms.ts';
import {
  F_TEST_FORMULA,
  MODEL_ASSUMPTIONS,
  ONE_SIDED_FORMULA,
  TEST_SOURCES,
  TEST_SYMBOLS,
} from './linear-words.ts';
import { testCalculation } from './test-calculation.ts';
import { f2Form, increaseForm, partialR2Form } from './test-forms.ts';

const forms: readonly InteractionForm[] = [
  ...differenceForms,
  ...[increaseForm, partialR2Form, f2Form].map((form) => ({ ...form, kind: null })),
];

/** The two predictors of the product are in the model too. */
const MAIN_TERMS = 2;

/** Under imperfect measurement both effects are shown: the one that will be seen, on which the power rests, and the one
 *  without error of measurement, in which the aim is stated. */
function seenAndTrue(seen: readonly Equivalent[], trueF2: number | null): Equivalent[] {
  const labelled = seen.map((one) =>
    SEEN.includes(one.key) ? { ...one, meaning: `${one.meaning} as it will be seen` } : one,
  );
  if (trueF2 === null) return labelled;
  const meaning = (name: string) => `${name} without error of measurement`;
  const r2 = r2FromF2(trueF2);
  return [
    ...labelled,
    { key: 'true_partial_r2', symbol: 'R²ₜ', meaning: meaning('partial R²'), value: r2, unit: '' },
    { key: 'true_f2', symbol: 'f²ₜ', meaning: meaning('f²'), value: trueF2, unit: '' },
  ];
}

const SEEN: readonly string[] = ['partial_r2', 'f2', 'partial_correlation'];

export const linearInteraction: Method = {
  name: 'linear-interaction',
  title: 't test of the product of two predictors',
  summary: 't test of the product of two predictors: whether the slope of one depends on the other.',
  achieves: 'power',
  achievedUnit: '',
  finds: ['sample-size', 'power', 'detectable-effect'],
  effect: { variable: 'f2', symbol: 'f²', meaning: 'Cohen’s f²' },
  forms,
  formula: [
    'f² = Δb²·V/σ², V the variance of the product beyond the two predictors; u = 1; p counts the two predictors',
    'two continuous: V = σx²·σz²·(1 + ρ²)/c²; continuous and binary: V = σx²·π(1 − π); two binary: 1/V = Σ 1/cell',
    'seen through reliabilities: f² → rel·f²/(1 + (1 − rel)·f²); two-sided: F = t²',
    ...F_TEST_FORMULA,
    ...ONE_SIDED_FORMULA,
  ],
  symbols: [
    ...TEST_SYMBOLS,
    { symbol: 'Δb', meaning: 'difference in slopes between two values of the moderator that lie c apart' },
    { symbol: 'σ', meaning: 'residual standard deviation of the outcome' },
    { symbol: 'σx, σz', meaning: 'standard deviations of predictor and moderator' },
    { symbol: 'ρ', meaning: 'correlation of predictor and moderator' },
    { symbol: 'π', meaning: 'proportion with the binary moderator' },
    { symbol: 'rel', meaning: 'reliability of the product' },
  ],
  sources: [
    ...TEST_SOURCES,
    { key: 'mcclelland1993', of: 'variance of a product term' },
    { key: 'busemeyer1983', of: 'reliability of a product' },
  ],
  assumptions: [
    ...MODEL_ASSUMPTIONS,
    {
      statement:
        'sampled predictors and their product are treated as jointly normal, which a product never quite is',
      // test/methods/linear/interaction-simulation.R and the test beside it, which holds these numbers to it.
      ifNot:
        'the power is an approximation, more often too high than too low: simulated designs for which it is .80 had .71 to .81 with 60 analysed, .76 to .81 with 120, .78 to .80 with 250 and .79 to .80 with 500',
    },
  ],
  rises: 'always',
  prepare(aim) {
    const inputs = aim.inputs as LinearInteractionInputs;
    const chosen = chosenForm(aim, forms) as InteractionForm | null;
    if (chosen !== null && chosen.kind !== null && chosen.kind !== inputs.kind) {
      fail(
        'M06',
        `aims[${aim.index}].inputs.effect`,
        `The effect is stated as a ${chosen.title}, and kind is ${inputs.kind}; state the form that belongs to it.`,
      );
    }
    const calculation = testCalculation({
      aim,
      tested: 1,
      adjustedFor: inputs.adjusted_for + MAIN_TERMS,
      predictorValues: inputs.predictor_values,
      form: chosen === null ? null : attenuated(chosen, inputs.kind, Object.keys(aim.quantities)),
    });
    if (!isAttenuated(Object.keys(aim.quantities))) return calculation;
    const values = Object.fromEntries(Object.values(aim.quantities).map(({ key, value }) => [key, value]));
    return {
      ...calculation,
      equivalents: (seen) =>
        seenAndTrue(calculation.equivalents(seen), withoutError(seen, inputs.kind, values)),
    };
  },
};
