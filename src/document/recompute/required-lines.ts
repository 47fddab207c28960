/** Lines that give the number an effect needs: a search, or, where one evaluation takes long, what that number and one
 *  fewer achieve. */

import type { AimPlan } from '../../plan/plan.ts';
import { effectWith } from '../../sensitivity/scenario.ts';
import { type Dialect, type Named, printed } from './dialect.ts';

export interface Requirement {
  /** Quantities that differ from the plan. */
  moved: Named;
  target: number;
  n: number;
}

export function requiredLines(dialect: Dialect, plan: AimPlan, { moved, target, n }: Requirement): string[] {
  const effect = dialect.call('effect', [], moved);
  const goal = target === plan.target ? 'target' : dialect.number(target);
  if (plan.method.isCostly !== true) return [dialect.show(dialect.call('needed', [effect, goal]), String(n))];
  return checkLines(dialect, plan, effect, effectWith(plan, moved), n);
}

/** The number achieves the target, and one fewer does not. */
function checkLines(
  dialect: Dialect,
  plan: AimPlan,
  call: string,
  effect: number | null,
  n: number,
): string[] {
  if (effect === null) return [];
  const { method, calculation } = plan;
  return [n, n - 1]
    .filter((count) => count >= calculation.smallestN)
    .map((count) =>
      dialect.show(
        dialect.call(method.achieves, [dialect.number(count), call]),
        printed(calculation.achieved(count, effect)),
      ),
    );
}
