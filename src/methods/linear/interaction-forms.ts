/** Forms of the effect of a product term. From a difference in slopes, f² is that difference squared times the variance
 *  that the product has beyond the two predictors, over the residual variance. That variance is
 *    two continuous predictors, jointly normal:  σx²·σz²·(1 + ρ²)
 *    continuous and binary, σx within groups:    σx²·π(1 − π)
 *    two binary predictors:                      1/(1/π₀₀ + 1/π₀₁ + 1/π₁₀ + 1/π₁₁), the π being the cells
 *  (algebra; for the balanced cases McClelland & Judd 1993). */

import type { EffectForm, Values } from '../method.ts';
import { contradiction } from './contradiction.ts';
import { given, signOf } from './test-forms.ts';

export type InteractionKind = 'continuous-continuous' | 'continuous-binary' | 'binary-binary';

export interface InteractionForm extends EffectForm {
  /** The kinds of predictors it describes; null: any. */
  kind: InteractionKind | null;
}

/** A form from a difference in slopes: `variance` is that of the product per squared difference. */
function differenceForm(
  kind: InteractionKind,
  title: string,
  keys: EffectForm['keys'],
  variance: (values: Values) => number,
  expression: string,
): InteractionForm {
  return {
    kind,
    keys,
    title,
    toEffect(values) {
      const difference = given(values, 'slope_difference');
      if (difference === 0) contradiction('slope_difference', 'is 0; an effect that is not zero is needed.');
      return (difference ** 2 * variance(values)) / given(values, 'residual_sd') ** 2;
    },
    fromEffect: (f2, values) =>
      signOf(values, 'slope_difference') * given(values, 'residual_sd') * Math.sqrt(f2 / variance(values)),
    expression: `slope_difference * slope_difference * (${expression}) / (residual_sd * residual_sd)`,
    inverse: `residual_sd * sqrt(f2 / (${expression}))`,
  };
}

const twoContinuous = differenceForm(
  'continuous-continuous',
  'difference in slopes, two continuous predictors',
  [
    'slope_difference',
    'moderator_contrast',
    'residual_sd',
    'predictor_sd',
    'moderator_sd',
    'predictor_correlation',
  ],
  (values) => {
    const scale =
      (given(values, 'predictor_sd') * given(values, 'moderator_sd')) / given(values, 'moderator_contrast');
    return scale ** 2 * (1 + given(values, 'predictor_correlation') ** 2);
  },
  'predictor_sd * predictor_sd * moderator_sd * moderator_sd * (1 + predictor_correlation * predictor_correlation) / (moderator_contrast * moderator_contrast)',
);

const withGroups = differenceForm(
  'continuous-binary',
  'difference in slopes between two groups',
  ['slope_difference', 'residual_sd', 'predictor_sd', 'moderator_proportion'],
  (values) => {
    const share = given(values, 'moderator_proportion');
    return given(values, 'predictor_sd') ** 2 * share * (1 - share);
  },
  'predictor_sd * predictor_sd * moderator_proportion * (1 - moderator_proportion)',
);

/** Proportion in the cell where both are present, and the cells that follow from it. */
function cells(values: Values): [number, number, number, number] {
  const x = given(values, 'predictor_proportion');
  const z = given(values, 'moderator_proportion');
  const rho = given(values, 'predictor_correlation');
  const both = x * z + rho * Math.sqrt(x * (1 - x) * z * (1 - z));
  const found: [number, number, number, number] = [1 - x - z + both, z - both, x - both, both];
  if (found.some((cell) => cell <= 0)) {
    contradiction(
      'predictor_correlation',
      `is ${rho}; with proportions ${x} and ${z} that would leave a cell of the two predictors empty or negative.`,
    );
  }
  return found;
}

const BOTH =
  '(predictor_proportion * moderator_proportion + predictor_correlation * sqrt(predictor_proportion * (1 - predictor_proportion) * moderator_proportion * (1 - moderator_proportion)))';

const twoBinary = differenceForm(
  'binary-binary',
  'difference of differences, two binary predictors',
  [
    'slope_difference',
    'residual_sd',
    'predictor_proportion',
    'moderator_proportion',
    'predictor_correlation',
  ],
  (values) => 1 / cells(values).reduce((sum, cell) => sum + 1 / cell, 0),
  `1 / (1 / (1 - predictor_proportion - moderator_proportion + ${BOTH}) + 1 / (moderator_proportion - ${BOTH}) + 1 / (predictor_proportion - ${BOTH}) + 1 / ${BOTH})`,
);

export const differenceForms: readonly InteractionForm[] = [twoContinuous, withGroups, twoBinary];

/** Reliability of the product from those of its parts: two continuous predictors (ρ² + ρx·ρz)/(1 + ρ²) (Busemeyer &
 *  Jones 1983), else the product of the two; for a binary predictor the squared correlation of recorded and true. */
function reliability(kind: InteractionKind, values: Values): number {
  const product = (values.predictor_reliability ?? 1) * (values.moderator_reliability ?? 1);
  if (kind !== 'continuous-continuous') return product;
  const rho2 = (values.predictor_correlation ?? 0) ** 2;
  return (rho2 + product) / (1 + rho2);
}

function reliabilityExpression(kind: InteractionKind, keys: readonly string[]): string {
  const parts = ['predictor_reliability', 'moderator_reliability'].filter((key) => keys.includes(key));
  const product = parts.length === 0 ? '1' : parts.join(' * ');
  if (kind !== 'continuous-continuous' || !keys.includes('predictor_correlation')) return product;
  const rho2 = 'predictor_correlation * predictor_correlation';
  return `(${rho2} + ${product}) / (1 + ${rho2})`;
}

/** Whether any reliability is stated.
 *  @param keys quantities the aim states */
export function isAttenuated(keys: readonly string[]): boolean {
  return keys.some((key) => key.endsWith('_reliability'));
}

/** The effect without error of measurement that is seen as f² `seen`; null when measurement is so poor that none is. */
export function withoutError(seen: number, kind: InteractionKind, values: Values): number | null {
  const kept = reliability(kind, values);
  return kept > (1 - kept) * seen ? seen / (kept - (1 - kept) * seen) : null;
}

/** The form as it is seen through imperfect measurement: the share `rel` of what the product explains is still carried
 *  by it and the rest joins the residual, f²(seen) = rel·f²/(1 + (1 − rel)·f²).
 *  @param keys quantities the aim states */
export function attenuated(form: EffectForm, kind: InteractionKind, keys: readonly string[]): EffectForm {
  if (!isAttenuated(keys)) return form;
  const rel = reliabilityExpression(kind, keys);
  return {
    ...form,
    toEffect(values) {
      const f2 = form.toEffect(values);
      const kept = reliability(kind, values);
      return (kept * f2) / (1 + (1 - kept) * f2);
    },
    fromEffect(seen, values) {
      const f2 = withoutError(seen, kind, values);
      if (f2 === null) {
        contradiction('predictor_reliability', 'is too low: no true effect would be seen as this one.');
      }
      return form.fromEffect(f2, values);
    },
    expression: `(${rel}) * (${form.expression}) / (1 + (1 - (${rel})) * (${form.expression}))`,
    inverse: form.inverse.replaceAll('f2', `(f2 / ((${rel}) - (1 - (${rel})) * f2))`),
  };
}
