import type { Aim, Term } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { isWholeModel, statedCounts } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';

export const parametersCounted: Rule = {
  id: 'M12',
  level: 'error',
  title: 'Predictors are counted in parameters, and the lists agree with the counts',
  why: 'A factor of four levels takes three coefficients, a spline as many as it has free terms, every product one. Degrees of freedom and noncentrality depend on that count and not on the number of names.',
  sources: [],
  ground: 'arithmetic',
  checkStudy: (study) =>
    study.aims.flatMap((aim) => together(aim.id, [mismatch(aim, 'tested'), mismatch(aim, 'adjusted_for')])),
};

function mismatch(aim: Aim, list: 'tested' | 'adjusted_for'): Part | null {
  const terms = aim.terms[list];
  if (terms === undefined || terms.length === 0) return null;
  const counts = statedCounts(aim);
  const stated = list === 'tested' ? counts.tested : counts.adjustedFor;
  const listed = total(terms);
  if (listed === stated || (list === 'adjusted_for' && isWholeModel(aim))) return null;
  return {
    path: `aims[${aim.index}].terms.${list}`,
    level: 'error',
    message: `The terms listed as ${list === 'tested' ? 'tested' : 'adjusted for'} take ${listed} parameters, and the inputs say ${stated}. A factor of k levels counts k − 1: give parameters with each term, or correct the count.`,
  };
}

function total(terms: readonly Term[]): number {
  return terms.reduce((sum, { parameters }) => sum + parameters, 0);
}
