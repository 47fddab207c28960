/** Forms of an effect that several methods of the linear family accept, all leading to f². */

import {
  adjustedR2,
  f2FromIncrease,
  f2FromR2,
  f2FromSlope,
  f2FromT,
  observedR2,
  r2FromF2,
} from '../../effects/effect-size.ts';
import type { EffectForm, Values } from '../method.ts';
import { contradiction } from './contradiction.ts';

/** A value by key; the schema has made sure that it is there. */
export function given(values: Values, key: string): number {
  const value = values[key];
  if (value === undefined) throw new TypeError(`no value for ${key}`);
  return value;
}

export const f2Form: EffectForm = {
  keys: ['f2'],
  title: 'Cohen’s f²',
  toEffect: (values) => given(values, 'f2'),
  fromEffect: (f2) => f2,
  expression: 'f2',
  inverse: 'f2',
};

/** R² of the whole model (`r2`) or of the tested predictors (`partial_r2`). */
function shareForm(key: 'r2' | 'partial_r2', title: string): EffectForm {
  return {
    keys: [key],
    title,
    toEffect: (values) => f2FromR2(given(values, key)),
    fromEffect: r2FromF2,
    expression: `${key} / (1 - ${key})`,
    inverse: 'f2 / (1 + f2)',
  };
}

export const r2Form = shareForm('r2', 'R²');
export const partialR2Form = shareForm('partial_r2', 'partial R²');

export const partialCorrelationForm: EffectForm = {
  keys: ['partial_correlation'],
  title: 'partial correlation',
  toEffect(values) {
    const r = given(values, 'partial_correlation');
    if (r === 0) contradiction('partial_correlation', 'is 0; an effect that is not zero is needed.');
    return f2FromR2(r * r);
  },
  fromEffect: (f2, values) => signOf(values, 'partial_correlation') * Math.sqrt(r2FromF2(f2)),
  expression: 'partial_correlation * partial_correlation / (1 - partial_correlation * partial_correlation)',
  inverse: 'sqrt(f2 / (1 + f2))',
};

export const tStatisticForm: EffectForm = {
  keys: ['t_statistic', 't_df'],
  title: 't statistic with its degrees of freedom',
  toEffect(values) {
    const t = given(values, 't_statistic');
    if (t === 0) contradiction('t_statistic', 'is 0; an effect that is not zero is needed.');
    return f2FromT(t, given(values, 't_df'));
  },
  fromEffect: (f2, values) => signOf(values, 't_statistic') * Math.sqrt(f2 * given(values, 't_df')),
  expression: 't_statistic * t_statistic / t_df',
  inverse: 'sqrt(f2 * t_df)',
};

export const fullAndReducedForm: EffectForm = {
  keys: ['r2_full', 'r2_reduced'],
  title: 'R² of the full and of the reduced model',
  toEffect(values) {
    const [full, reduced] = [given(values, 'r2_full'), given(values, 'r2_reduced')];
    if (full <= reduced) {
      contradiction(
        'r2_full',
        `is ${full} and r2_reduced is ${reduced}; the full model must explain more than the reduced one.`,
      );
    }
    return f2FromIncrease(full, reduced);
  },
  fromEffect: (f2, values) => (f2 + given(values, 'r2_reduced')) / (1 + f2),
  expression: '(r2_full - r2_reduced) / (1 - r2_full)',
  inverse: '(f2 + r2_reduced) / (1 + f2)',
};

export const increaseForm: EffectForm = {
  keys: ['r2_increase', 'r2_full'],
  title: 'increase in R² and R² of the full model',
  toEffect(values) {
    const [increase, full] = [given(values, 'r2_increase'), given(values, 'r2_full')];
    if (increase > full) {
      contradiction(
        'r2_increase',
        `is ${increase} and r2_full is ${full}; the increase is part of what the full model explains.`,
      );
    }
    return increase / (1 - full);
  },
  fromEffect: (f2, values) => f2 * (1 - given(values, 'r2_full')),
  expression: 'r2_increase / (1 - r2_full)',
  inverse: 'f2 * (1 - r2_full)',
};

export const adjustedR2Form: EffectForm = {
  keys: ['adjusted_r2', 'source_n', 'source_predictors'],
  title: 'adjusted R² with the n and the number of predictors of its source',
  toEffect: (values) => f2FromR2(given(values, 'adjusted_r2')),
  fromEffect: r2FromF2,
  expression: 'adjusted_r2 / (1 - adjusted_r2)',
  inverse: 'f2 / (1 + f2)',
};

export const observedR2Form: EffectForm = {
  keys: ['observed_r2', 'source_n', 'source_predictors'],
  title: 'R² as observed, with the n and the number of predictors of its source; it is adjusted before use',
  toEffect(values) {
    const [n, k] = [given(values, 'source_n'), given(values, 'source_predictors')];
    if (n <= k + 1) contradiction('source_n', `is ${n}; more than ${k + 1} are needed with ${k} predictors.`);
    const adjusted = adjustedR2(given(values, 'observed_r2'), n, k);
    if (adjusted <= 0) {
      contradiction(
        'observed_r2',
        `adjusts to ${adjusted.toPrecision(3)} with n ${n} and ${k} predictors; this source supports no effect.`,
      );
    }
    return f2FromR2(adjusted);
  },
  fromEffect: (f2, values) =>
    observedR2(r2FromF2(f2), given(values, 'source_n'), given(values, 'source_predictors')),
  expression: '(source_n - source_predictors - 1) / ((1 - observed_r2) * (source_n - 1)) - 1',
  inverse: '1 - (source_n - source_predictors - 1) / ((1 + f2) * (source_n - 1))',
};

export const slopeForm: EffectForm = {
  keys: ['slope', 'residual_sd', 'predictor_sd', 'predictor_r2'],
  title: 'slope with the residual SD, the SD of the predictor and its R² with the others',
  toEffect(values) {
    const slope = given(values, 'slope');
    if (slope === 0) contradiction('slope', 'is 0; an effect that is not zero is needed.');
    return f2FromSlope(
      slope,
      given(values, 'residual_sd'),
      given(values, 'predictor_sd'),
      given(values, 'predictor_r2'),
    );
  },
  fromEffect: (f2, values) =>
    (signOf(values, 'slope') *
      given(values, 'residual_sd') *
      Math.sqrt(f2 / (1 - given(values, 'predictor_r2')))) /
    given(values, 'predictor_sd'),
  expression:
    'slope * slope * predictor_sd * predictor_sd * (1 - predictor_r2) / (residual_sd * residual_sd)',
  inverse: 'residual_sd * sqrt(f2 / (1 - predictor_r2)) / predictor_sd',
};

/** Direction of the stated effect; upwards when only its size is sought. */
export function signOf(values: Values, key: string): 1 | -1 {
  return (values[key] ?? 1) < 0 ? -1 : 1;
}
