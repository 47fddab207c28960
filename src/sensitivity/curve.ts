/** What each number analysed achieves, with the band that the stated range of the effect spans. */

import type { AimPlan } from '../plan/plan.ts';
import { achievedWith, leadingQuantity } from './scenario.ts';

export interface CurvePoint {
  n: number;
  value: number;
  low: number | null;
  high: number | null;
}

export interface Curve {
  points: CurvePoint[];
  /** Whether `low` and `high` are drawn. */
  hasBand: boolean;
}

/** Enough for a smooth line at 12 cm; fewer where an evaluation takes long. */
const POINTS = 48;
const COSTLY_POINTS = 16;
/** The curve begins at this share of the planned number: below it nobody would plan. */
const FIRST_SHARE = 0.2;

export function powerCurve(plan: AimPlan): Curve | null {
  const quantity = leadingQuantity(plan);
  if (quantity === null || plan.effect === null) return null;
  const { effect, calculation } = plan;
  const first = Math.max(calculation.smallestN, Math.round(plan.planned.n * FIRST_SHARE));
  const count = plan.method.isCostly === true ? COSTLY_POINTS : POINTS;
  const last = Math.max(first + 10, Math.ceil(plan.planned.n * 1.8));
  const numbers = new Set(
    Array.from({ length: count }, (_, index) => Math.round(first + ((last - first) * index) / (count - 1))),
  );
  numbers.add(plan.planned.n);
  const at = (n: number, value: number | null) =>
    value === null ? null : achievedWith(plan, n, { [quantity.key]: value });
  return {
    points: [...numbers]
      .sort((a, b) => a - b)
      .map((n) => ({
        n,
        value: calculation.achieved(n, effect),
        low: at(n, quantity.low ?? (quantity.high === null ? null : quantity.value)),
        high: at(n, quantity.high ?? (quantity.low === null ? null : quantity.value)),
      })),
    hasBand: quantity.low !== null || quantity.high !== null,
  };
}
