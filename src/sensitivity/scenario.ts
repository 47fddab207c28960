/** A plan with some of its quantities moved: what every table of this folder asks about. */

import type { Values } from '../methods/method.ts';
import type { AimPlan } from '../plan/plan.ts';
import { ProblemError } from '../problem.ts';
import type { Quantity } from '../spec/study.ts';

/** The quantity the effect is stated in: axis of the tables. null when no effect is stated. */
export function leadingQuantity(plan: AimPlan): Quantity | null {
  const key = plan.aim.effectKeys[0] ?? Object.keys(plan.aim.quantities)[0];
  return plan.effect === null || key === undefined ? null : (plan.aim.quantities[key] ?? null);
}

/** The aim's quantities, some replaced. */
export function valuesWith(plan: AimPlan, changes: Values): Values {
  const planned = Object.fromEntries(Object.values(plan.aim.quantities).map((q) => [q.key, q.value]));
  return { ...planned, ...changes };
}

/** The method's effect with some quantities replaced; null where they contradict each other. */
export function effectWith(plan: AimPlan, changes: Values): number | null {
  try {
    return plan.calculation.effectAt(valuesWith(plan, changes));
  } catch (error) {
    if (error instanceof ProblemError || error instanceof RangeError) return null;
    throw error;
  }
}

/** What n analysed achieve with some quantities replaced; null where that is not defined or beyond computation. */
export function achievedWith(plan: AimPlan, n: number, changes: Values): number | null {
  const effect = effectWith(plan, changes);
  if (effect === null || n < plan.calculation.smallestN) return null;
  try {
    return plan.calculation.achieved(n, effect);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
