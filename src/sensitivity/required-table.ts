/** Required n over effect × target, each cell by the solver of the headline. */

import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import { OutOfReach, requiredNumber } from '../plan/solve.ts';
import type { Quantity } from '../spec/study.ts';
import { effectAxis, targetAxis } from './axes.ts';
import { effectWith, leadingQuantity } from './scenario.ts';

export interface RequiredTable {
  quantity: Quantity;
  effects: number[];
  targets: number[];
  /** Rows follow `effects`, columns `targets`; null where the target is out of reach. */
  cells: (number | null)[][];
  /** Row and column of the plan; column -1 when no target is stated. */
  planned: { row: number; column: number };
}

export function requiredTable(plan: AimPlan, { study }: StudyPlan): RequiredTable | null {
  const quantity = leadingQuantity(plan);
  if (quantity === null) return null;
  const effects = effectAxis(plan, quantity, study.sensitivity.effects);
  const targets = targetAxis(plan, study.sensitivity.targets);
  return {
    quantity,
    effects,
    targets,
    cells: effects.map((value) => {
      const effect = effectWith(plan, { [quantity.key]: value });
      return targets.map((target) => (effect === null ? null : requiredOrNull(plan, effect, target)));
    }),
    planned: {
      row: effects.indexOf(quantity.value),
      column: plan.target === null ? -1 : targets.indexOf(plan.target),
    },
  };
}

/** null where the target is out of reach. */
export function requiredOrNull(plan: AimPlan, effect: number, target: number): number | null {
  try {
    return requiredNumber(plan.method, plan.calculation, effect, target);
  } catch (error) {
    if (error instanceof OutOfReach || error instanceof RangeError) return null;
    throw error;
  }
}
