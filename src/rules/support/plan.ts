/** What rules ask of a planned aim again and again. */

import type { Values } from '../../methods/method.ts';
import type { AimPlan, Yield } from '../../plan/plan.ts';
import { requiredOrNull } from '../../sensitivity/required-table.ts';
import { achievedWith, effectWith } from '../../sensitivity/scenario.ts';
import { shownComputed, shownPower } from './numbers.ts';

/** What the aim will have: at its own number where that is given, at the most that can be had where that is too small,
 *  else at the number the study plans with. */
export function inView(plan: AimPlan): Yield {
  return plan.aim.evaluable === null ? (plan.attainable ?? plan.planned) : plan.own;
}

/** Predictors in the model as calculated with, in parameters: those tested, and the others. */
export function modelCounts(plan: AimPlan): { tested: number; adjustedFor: number } {
  const count = (name: string) => plan.calculation.constants.find(({ variable }) => variable === name)?.value;
  return { tested: count('u') ?? count('k') ?? 1, adjustedFor: count('p') ?? 0 };
}

/** Number to analyse with some quantities replaced; null when no number is sought or none is enough. */
export function neededWith(plan: AimPlan, changes: Values): number | null {
  if (plan.aim.find !== 'sample-size' || plan.target === null) return null;
  const effect = effectWith(plan, changes);
  return effect === null ? null : requiredOrNull(plan, effect, plan.target);
}

/** What follows if quantities take other values, as the rest of a sentence that begins with "then"; null when nothing
 *  can be said. */
export function consequence(plan: AimPlan, changes: Values): string | null {
  if (plan.aim.find === 'sample-size') {
    const needed = neededWith(plan, changes);
    if (needed === null) return 'the target would be out of reach';
    return needed === plan.own.n
      ? `the number to analyse would stay at ${needed}`
      : `${needed} instead of ${plan.own.n} would have to be analysed`;
  }
  const { n, achieved } = inView(plan);
  const changed = achievedWith(plan, n, changes);
  if (changed === null || achieved === null) return null;
  return plan.method.achieves === 'power'
    ? `the power with ${n} analysed would be ${shownPower(changed, plan.target)} instead of ${shownPower(achieved, plan.target)}`
    : `the width with ${n} analysed would be ${shownComputed(changed)} instead of ${shownComputed(achieved)}`;
}
