/** What rules ask of an aim again and again. */

import type { Aim, Basis, Quantity, Study } from '../../spec/study.ts';

/** Sized by the power of a test, not by the width of an interval. */
export function isTest(aim: Aim): boolean {
  return aim.criteria.confidence === null;
}

/** Sized as a test of a product term. */
export function isInteraction(aim: Aim): boolean {
  return aim.method === 'linear-interaction';
}

/** Concerns all predictors of the model at once. */
export function isWholeModel(aim: Aim): boolean {
  return 'predictors' in aim.inputs;
}

/** The quantity in which the effect is stated; null when none is. */
export function leadingOf(aim: Aim): Quantity | null {
  const key = aim.effectKeys[0];
  return key === undefined ? null : (aim.quantities[key] ?? null);
}

/** Estimated from a sample of people, so that chance and selection are in it. */
export function isFromData(basis: Basis | null): boolean {
  return basis === 'published-estimate' || basis === 'pilot-data' || basis === 'routine-data';
}

/** Predictors as the spec counts them, in parameters. */
export function statedCounts(aim: Aim): { tested: number; adjustedFor: number } {
  const counts: { added?: number; predictors?: number; adjusted_for?: number } = { ...aim.inputs };
  return { tested: counts.added ?? counts.predictors ?? 1, adjustedFor: counts.adjusted_for ?? 0 };
}

/** 'fixed', 'sampled', or undefined when it is not stated. */
export function predictorValues(aim: Aim): string | undefined {
  const { predictor_values }: { predictor_values?: string } = { ...aim.inputs };
  return predictor_values;
}

/** Whether the author calls the study an experiment or a trial, with values set by design. */
export function isExperiment(study: Study): boolean {
  const isDenied = /\b(?:non|quasi)[\s-]?(?:experiment|randomi)|\bnot randomi|\bobservational\b/i.test(
    study.design,
  );
  return !isDenied && /\brandomi[sz]|\bexperiment|\bfactorial\b|\btrial\b/i.test(study.design);
}
