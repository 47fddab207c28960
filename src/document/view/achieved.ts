/** Power or width as text, never rounded across the target. */

import type { AimPlan } from '../../plan/plan.ts';
import { formatPower } from '../numbers.ts';
import { computedNumber, unitsOf, unitText, withUnit } from './wording.ts';

export function achievedText(plan: AimPlan, achieved: number | null, target = plan.target): string | null {
  if (achieved === null) return null;
  if (plan.method.achieves === 'power') return formatPower(achieved, target ?? undefined);
  const unit = plan.method.achievedUnit;
  return withUnit(computedNumber(achieved, unit, target ?? undefined), unitText(unit, unitsOf(plan.aim)));
}
