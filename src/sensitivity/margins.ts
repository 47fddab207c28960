/** How far each assumption can slip, alone, until the planned study falls below a floor, in its own unit. */

import { findRoot } from '../numeric/solve/root.ts';
import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import { meets } from '../plan/solve.ts';
import type { Quantity } from '../spec/study.ts';
import { candidates } from './ranges.ts';
import { requiredOrNull } from './required-table.ts';
import { achievedWith } from './scenario.ts';

export interface Limit {
  floor: number;
  /** The value at which the floor is met exactly; null when no admissible value breaks it, or the plan is
   *  already below it. */
  value: number | null;
  /** Number analysed at which the floor is met, for a loss; null for a quantity of the aim. */
  left: number | null;
  /** Why there is no value. */
  reason: 'never-breaks' | 'already-below' | null;
}

export interface Margin {
  quantity: Quantity;
  stage: string | null;
  limits: Limit[];
}

/** Floors of a power: .80 and .10 below the target. Of a width: a quarter and a half wider than wanted. */
export function floorsOf(plan: AimPlan): number[] {
  const target = plan.target ?? plan.planned.achieved;
  if (target === null) return [];
  if (plan.method.achieves === 'width') return [target * 1.25, target * 1.5];
  const below = Number((target - 0.1).toPrecision(12));
  return [...new Set([0.8, below])].filter((floor) => floor > plan.aim.criteria.alpha).sort((a, b) => b - a);
}

export function margins(plan: AimPlan, study: StudyPlan): Margin[] {
  if (plan.effect === null) return [];
  const floors = floorsOf(plan);
  return candidates(plan, study).map(({ quantity, stage }) => ({
    quantity,
    stage,
    limits: floors.map((floor) =>
      stage === null ? quantityLimit(plan, quantity, floor) : lossLimit(plan, study, quantity, floor),
    ),
  }));
}

function quantityLimit(plan: AimPlan, quantity: Quantity, floor: number): Limit {
  const { n } = plan.planned;
  const achieved = plan.planned.achieved;
  if (achieved === null || !meets(plan.method, achieved, floor))
    return { floor, value: null, left: null, reason: 'already-below' };
  const excess = (value: number) => {
    const at = achievedWith(plan, n, { [quantity.key]: value });
    return at === null ? null : plan.method.achieves === 'power' ? at - floor : floor - at;
  };
  const planned = achieved - floor;
  for (const end of endsOf(quantity)) {
    // Only the way on which things get worse: on the other the computation may have no end.
    const near = excess(quantity.value + (end - quantity.value) * 1e-3);
    if (near === null || near >= (plan.method.achieves === 'power' ? planned : -planned)) continue;
    const broken = firstBroken(quantity.value, end, excess);
    if (broken === null) continue;
    return {
      floor,
      value: findRoot((x) => excess(x) ?? 0, quantity.value, broken),
      left: null,
      reason: null,
    };
  }
  return { floor, value: null, left: null, reason: 'never-breaks' };
}

/** A thousand times the planned value stands for "without limit". */
const FAR = 1000;

/** Where the key's range ends on either side, or zero where that comes first: an effect does not slip through zero.
 *  Ends are approached to one part in 10⁹. */
function endsOf({ value, range }: Quantity): number[] {
  const lowest = Number.isFinite(range.minimum) ? range.minimum : -FAR * Math.max(1, Math.abs(value));
  const highest = Number.isFinite(range.maximum) ? range.maximum : FAR * Math.max(1, Math.abs(value));
  const lower = value > 0 ? Math.max(0, lowest) : lowest;
  const upper = value < 0 ? Math.min(0, highest) : highest;
  return [lower, upper].filter((end) => end !== value).map((end) => end + (value - end) * 1e-9);
}

/** Walk from the planned value towards `end` in steps that shrink geometrically near it; the first place where the
 *  floor is broken, or null when it holds all the way or things get better again. */
function firstBroken(from: number, end: number, excess: (value: number) => number | null): number | null {
  let before = Number.POSITIVE_INFINITY;
  for (let step = 1; step <= 60; step += 1) {
    const x = end + (from - end) * 0.7 ** step;
    const at = excess(x);
    if (at === null || at > before) return null;
    if (at < 0) return x;
    before = at;
  }
  return null;
}

/** People come whole: the largest proportion that leaves the number needed for the floor. */
function lossLimit(plan: AimPlan, study: StudyPlan, quantity: Quantity, floor: number): Limit {
  if (plan.effect === null) return { floor, value: null, left: null, reason: 'already-below' };
  const needed = requiredOrNull(plan, plan.effect, floor);
  const kept = study.study.sample.losses
    .filter((loss) => loss.proportion.path !== quantity.path)
    .reduce((product, loss) => product * (1 - loss.proportion.value), study.enrol);
  if (needed === null || needed > kept * (1 - quantity.value) + 1e-9) {
    return { floor, value: null, left: null, reason: 'already-below' };
  }
  return { floor, value: 1 - needed / kept, left: needed, reason: null };
}
