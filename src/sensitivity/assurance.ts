/// <reference path="./jstat.d.ts" />
/** Expected power over the stated range of the effect (assurance; O'Hagan, Stevens & Campbell 2005): power averaged
 *  over a triangular distribution that has its mode at the planned value and ends at the stated low and high. */

import jstat from 'jstat';
import { integrate } from '../numeric/solve/quadrature.ts';
import type { AimPlan } from '../plan/plan.ts';
import type { Quantity } from '../spec/study.ts';
import { achievedWith, leadingQuantity } from './scenario.ts';

export interface Assurance {
  quantity: Quantity;
  low: number;
  mode: number;
  high: number;
  /** Expected power at the planned number. */
  expected: number;
}

/** null for an interval, and when the effect has no range. */
export function expectedPower(plan: AimPlan): Assurance | null {
  const quantity = leadingQuantity(plan);
  if (plan.method.achieves !== 'power' || quantity === null) return null;
  const { value: mode } = quantity;
  const low = quantity.low ?? mode;
  const high = quantity.high ?? mode;
  if (low === high) return null;
  const { n } = plan.planned;
  if (achievedWith(plan, n, { [quantity.key]: low }) === null) return null;
  if (achievedWith(plan, n, { [quantity.key]: high }) === null) return null;
  const weighted = (x: number) =>
    jstat.triangular.pdf(x, low, high, mode) * (achievedWith(plan, n, { [quantity.key]: x }) ?? 0);
  // The density has a corner at the mode, so each side is integrated by itself.
  const side = (from: number, to: number) => (from === to ? 0 : integrate(weighted, from, to));
  return { quantity, low, mode, high, expected: side(low, mode) + side(mode, high) };
}
