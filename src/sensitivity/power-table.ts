/** Power (or width) over effect × overall loss, the enrolled number held as planned. */

import { evaluableFrom, overallLoss, proportionsOf } from '../plan/losses.ts';
import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import type { Quantity } from '../spec/study.ts';
import { effectAxis, lossAxis } from './axes.ts';
import { achievedWith, leadingQuantity } from './scenario.ts';

export interface PowerTable {
  quantity: Quantity;
  effects: number[];
  losses: number[];
  /** Number analysed under each loss. */
  evaluable: number[];
  cells: (number | null)[][];
  planned: { row: number; column: number };
}

export function powerTable(plan: AimPlan, study: StudyPlan): PowerTable | null {
  const quantity = leadingQuantity(plan);
  if (quantity === null) return null;
  const effects = effectAxis(plan, quantity, study.study.sensitivity.effects);
  const plannedLoss = overallLoss(proportionsOf(study.study.sample.losses));
  const losses = lossAxis(study, plannedLoss);
  const evaluable = losses.map((loss) =>
    loss === plannedLoss ? study.evaluable : evaluableFrom(study.enrol, [loss]),
  );
  return {
    quantity,
    effects,
    losses,
    evaluable,
    cells: effects.map((value) => evaluable.map((n) => achievedWith(plan, n, { [quantity.key]: value }))),
    planned: { row: effects.indexOf(quantity.value), column: losses.indexOf(plannedLoss) },
  };
}
