/** Small invented specs for tests of the rules, and what `check` finds in them. */

import { check } from '../../src/index.ts';
import { nestedSpec } from './nested-spec.ts';

export type Spec = Record<string, unknown>;

/** `RULE level` of everything found, and the messages by rule. */
export function judged(spec: Spec) {
  const { problems } = check(spec);
  return {
    found: problems.map(({ code, level }) => `${code} ${level}`),
    message: (rule: string) => problems.find(({ code }) => code === rule)?.message ?? '',
  };
}

/** One aim of another method in place of the nested one. */
export function aimOf(method: string, inputs: object, more: object = {}): Spec {
  const spec = nestedSpec();
  const [aim] = spec.aims as Spec[];
  return {
    ...spec,
    aims: [{ ...aim, method, inputs, criteria: { alpha: 0.05, power: 0.9, sides: 2 }, ...more }],
  };
}

export const NOTE = 'An invented committee judged that less would not justify any change of practice.';
export const slope = (changes: object = {}) => ({
  slope: { value: 1, low: 0.8, high: 1.4, basis: 'smallest-effect-of-interest', note: NOTE },
  residual_sd: { value: 5, basis: 'routine-data', note: NOTE },
  predictor_sd: { value: 1, basis: 'routine-data', note: NOTE },
  predictor_r2: { value: 0.2, basis: 'expert-judgement', note: NOTE },
  ...changes,
});
export const coefficient = (changes: object = {}, more: object = {}) =>
  aimOf('linear-coefficient', { adjusted_for: 3, predictor_values: 'sampled', effect: slope(changes) }, more);
export const interval = (criteria: object) =>
  aimOf(
    'linear-coefficient-precision',
    { adjusted_for: 3, predictor_values: 'sampled', residual_sd: 5, predictor_sd: 1, predictor_r2: 0.2 },
    { criteria },
  );
export const quantity = (changes: object) => ({
  value: 0.06,
  basis: 'smallest-effect-of-interest',
  note: NOTE,
  ...changes,
});
export const twoPrimary = (changes: Spec, criteria = { alpha: 0.05, power: 0.9 }) => {
  const [first] = nestedSpec({ criteria }).aims as Spec[];
  return { ...nestedSpec({ criteria, extraAims: [{ ...first, id: 'second' }] }), ...changes };
};
export const withTerms = (parameters: number) => {
  const spec = nestedSpec();
  const [aim] = spec.aims as Spec[];
  return { ...spec, aims: [{ ...aim, terms: { tested: [{ name: 'a factor', parameters }] } }] };
};
export const losses = (...proportions: number[]) => ({
  sample: { losses: proportions.map((proportion, index) => ({ stage: `stage ${index}`, proportion })) },
});
export const aimText = (objective: string) => {
  const spec = nestedSpec();
  const [aim] = spec.aims as Spec[];
  return { ...spec, aims: [{ ...aim, objective }] };
};
