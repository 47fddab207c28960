/** Default axes of the tables: from what the author called plausible, else from the value itself. */

import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import type { Quantity } from '../spec/study.ts';

/** Where no range is stated: multiples of the value. */
const MULTIPLES = [0.5, 0.75, 1, 1.25, 1.5];
/** The same where an evaluation takes long. */
const FEW_MULTIPLES = [0.75, 1, 1.25];
/** Powers that protocols ask for; common practice, no source. */
const POWERS = [0.8, 0.85, 0.9, 0.95];

/** Losses are shown at multiples of this around the planned one. */
const LOSS_STEP = 0.05;

/** Ascending, the planned value always among them, each within the range its key allows. */
export function effectAxis(plan: AimPlan, quantity: Quantity, asked: readonly number[] | null): number[] {
  if (asked !== null) return ascending([...asked, quantity.value].filter((x) => within(quantity, x)));
  const { value, low, high } = quantity;
  const isCostly = plan.method.isCostly === true;
  if (low === null && high === null) {
    return ascending(
      (isCostly ? FEW_MULTIPLES : MULTIPLES)
        .map((multiple) => tidy(value * multiple))
        .filter((x) => within(quantity, x)),
    );
  }
  const ends = [low, high].filter((end) => end !== null);
  return ascending([value, ...ends.flatMap((end) => (isCostly ? [end] : [end, tidy((end + value) / 2)]))]);
}

/** Target powers above alpha, or widths around the wanted one. */
export function targetAxis(plan: AimPlan, asked: readonly number[] | null): number[] {
  const target = plan.target ?? 0.8;
  if (plan.method.achieves === 'width') {
    const multiples = plan.method.isCostly === true ? FEW_MULTIPLES : MULTIPLES;
    return ascending([target, ...(asked ?? multiples.map((multiple) => tidy(target * multiple)))]);
  }
  const powers = (asked ?? POWERS).filter((power) => power < 1 && power > plan.aim.criteria.alpha);
  return ascending(plan.target === null ? powers : [target, ...powers]);
}

/** Overall proportions lost, the planned one among them. */
export function lossAxis(study: StudyPlan, planned: number): number[] {
  const asked = study.study.sensitivity.losses;
  const below = Math.floor(planned / LOSS_STEP);
  const steps = [-1, 0, 1, 2, 4].map((step) => tidy((below + step) * LOSS_STEP));
  return ascending([planned, ...(asked ?? steps)].filter((loss) => loss >= 0 && loss < 1));
}

function within({ range }: Quantity, x: number): boolean {
  const above = range.minimumIncluded ? x >= range.minimum : x > range.minimum;
  const below = range.maximumIncluded ? x <= range.maximum : x < range.maximum;
  return above && below;
}

function ascending(values: readonly number[]): number[] {
  return [...new Set(values)].sort((a, b) => a - b);
}

/** Three significant digits: an axis is read, not computed with beyond what it prints. */
function tidy(value: number): number {
  return Number(value.toPrecision(3));
}
