/** Number at which the confidence interval of R² is as narrow as wanted, on average or with stated assurance. */

import { r2FromF2 } from '../../effects/effect-size.ts';
import type { LinearR2PrecisionInputs } from '../../generated/spec.ts';
import { normalUpperQuantile } from '../../numeric/distributions/normal.ts';
import { smallestInteger } from '../../numeric/solve/smallest-integer.ts';
import type { Alternative, EffectForm, Method, Values } from '../method.ts';
import { chosenForm, countsOf } from './chosen-form.ts';
import { atAim } from './contradiction.ts';
import { INTERVAL_ASSUMPTIONS } from './linear-words.ts';
import { assuredWidth, expectedWidth, type R2Design, widthAtMean } from './r2-interval.ts';
import { r2IntervalSteps, widthAtMeanSteps } from './r2-interval-steps.ts';
import { adjustedR2Form, f2Form, observedR2Form, r2Form } from './test-forms.ts';

/** The forms of the test lead to f²; an interval is about R² itself. */
function aboutR2(form: EffectForm): EffectForm {
  return {
    ...form,
    toEffect: (values) => r2FromF2(form.toEffect(values)),
    fromEffect: (r2, values) => form.fromEffect(r2 / (1 - r2), values),
    expression: `1 - 1 / (1 + ${form.expression})`,
    inverse: form.inverse.replaceAll('f2', '(r2 / (1 - r2))'),
  };
}

const ofR2: EffectForm = {
  ...aboutR2(r2Form),
  toEffect: (values) => values.r2 ?? Number.NaN,
  fromEffect: (r2) => r2,
  expression: 'r2',
  inverse: 'r2',
};

const ofAdjustedR2: EffectForm = {
  ...aboutR2(adjustedR2Form),
  toEffect: (values) => values.adjusted_r2 ?? Number.NaN,
  fromEffect: (r2) => r2,
  expression: 'adjusted_r2',
  inverse: 'r2',
};

/** Five residual degrees of freedom: with fewer the interval spans nearly everything whatever is observed, and its ends
 *  come too near to 0 and 1 for the accuracy that is promised. */
function smallestNumber({ predictors }: R2Design): number {
  return predictors + 6;
}

/** The number by the definition of Kelley (2008; from memory): the width of the interval at the mean of R² in place of the
 *  mean of the width. */
function atMean(r2: number, width: number, design: R2Design, assurance: number | null): Alternative[] {
  const widthWith = (n: number) => widthAtMean(r2, n, design);
  try {
    const n = smallestInteger(
      (count) => widthWith(count) <= width,
      design.predictors + 3,
      LARGEST_N,
      'always',
    );
    return [
      {
        key: 'at_mean',
        description: `with the width of the interval at the expected R² in place of the ${assurance === null ? 'expected' : 'assured'} width`,
        n,
        steps: (count) => widthAtMeanSteps(count, design, widthWith(count)),
      },
    ];
  } catch (error) {
    if (error instanceof RangeError) return [];
    throw error;
  }
}

const LARGEST_N = 1e7;

export const linearR2Precision: Method = {
  name: 'linear-r2-precision',
  title: 'confidence interval of R²',
  summary:
    'Number at which the confidence interval of R² is as narrow as wanted, on average or with stated assurance.',
  achieves: 'width',
  achievedUnit: '',
  finds: ['sample-size', 'width'],
  effect: { variable: 'r2', symbol: 'R²', meaning: 'R²' },
  forms: [ofR2, aboutR2(f2Form), ofAdjustedR2, aboutR2(observedR2Form)],
  formula: [
    'the limits of the interval for an observed x are the R² under which x is the upper and the lower α/2 point',
    'expected width = ∫ P(q(r; 1 − α/2) < x ≤ q(r; α/2)) dr, q(r; p) the x exceeded with probability p if R² = r',
    'assured width: the w for which P(width ≤ w) is the assurance',
    'P(x > q): predictors sampled Σ NegBin(j; m, 1 − R²)·P(Beta(k/2 + j, v/2) > q), m = (n − 1)/2, v = n − k − 1;',
    '          predictors fixed   Σ Poisson(j; λ/2)·P(Beta(k/2 + j, v/2) > q), λ = n·R²/(1 − R²)',
  ],
  symbols: [
    { symbol: 'n', meaning: 'number analysed' },
    { symbol: 'k', meaning: 'predictors, in parameters' },
    { symbol: 'v', meaning: 'residual degrees of freedom' },
    { symbol: 'α', meaning: 'one minus the confidence level' },
    { symbol: 'R²', meaning: 'share of variance explained in the population' },
    { symbol: 'x', meaning: 'R² as the study will observe it' },
    { symbol: 'λ', meaning: 'noncentrality with fixed predictors' },
  ],
  sources: [
    { key: 'kelley2008', of: 'planning for a narrow interval of R², on average and with assurance' },
    { key: 'gatsonis1989', of: 'distribution of R² with sampled predictors' },
  ],
  assumptions: INTERVAL_ASSUMPTIONS,
  isCostly: true,
  rises: 'always',
  prepare(aim) {
    const inputs = aim.inputs as LinearR2PrecisionInputs;
    const { alpha, assurance } = aim.criteria;
    const design: R2Design = {
      predictors: inputs.predictors,
      isSampled: inputs.predictor_values !== 'fixed',
      alpha,
    };
    const form = chosenForm(aim, this.forms);
    const counts = countsOf(inputs.effect);
    const effectAt = (values: Values) =>
      atAim(
        aim.index,
        (key) => aim.quantities[key]?.path,
        () => form?.toEffect({ ...counts, ...values }) ?? Number.NaN,
      );
    const achieved = (n: number, r2: number) =>
      assurance === null ? expectedWidth(r2, n, design) : assuredWidth(assurance, r2, n, design);
    const stated = Object.fromEntries(Object.values(aim.quantities).map(({ key, value }) => [key, value]));
    return {
      smallestN: smallestNumber(design),
      form,
      effect: form === null ? null : effectAt(stated),
      effectAt,
      achieved,
      guess: (r2, width) =>
        inputs.predictors + ((4 * normalUpperQuantile(alpha / 2) * Math.sqrt(r2) * (1 - r2)) / width) ** 2,
      steps: (n, r2) => r2IntervalSteps({ n, r2, design, assurance, width: achieved(n, r2) }),
      equivalents: (r2) => [
        { key: 'r2', symbol: 'R²', meaning: 'R²', value: r2, unit: '' },
        { key: 'f2', symbol: 'f²', meaning: 'f²', value: r2 / (1 - r2), unit: '' },
      ],
      constants: [
        { variable: 'k', meaning: 'predictors', value: inputs.predictors },
        { variable: 'alpha', meaning: 'one minus the confidence level', value: alpha },
        ...(assurance === null ? [] : [{ variable: 'assurance', meaning: 'assurance', value: assurance }]),
        ...Object.entries(counts).map(([variable, value]) => ({
          variable,
          meaning: 'of the source of R²',
          value,
        })),
      ],
      alternatives: (r2, width) => atMean(r2, width, design, assurance),
    };
  },
};
