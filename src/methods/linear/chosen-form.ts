/** Which form of the effect an aim uses, and the whole numbers that stand beside it. */

import type { Aim } from '../../spec/study.ts';
import type { EffectForm, Values } from '../method.ts';

/** null when no effect is stated. */
export function chosenForm(aim: Aim, forms: readonly EffectForm[]): EffectForm | null {
  const { effectKeys } = aim;
  const isThis = ({ keys }: EffectForm) =>
    keys.length === effectKeys.length && keys.every((key) => effectKeys.includes(key));
  return forms.find(isThis) ?? null;
}

/** Inputs below `effect` that are no quantities: the n of a source, degrees of freedom. */
export function countsOf(effect: object | undefined): Values {
  const counts = ['source_n', 'source_predictors', 't_df'] as const;
  const given = (effect ?? {}) as Readonly<Record<string, unknown>>;
  return Object.fromEntries(
    counts.flatMap((key) => {
      const value = given[key];
      return typeof value === 'number' ? [[key, value]] : [];
    }),
  );
}
