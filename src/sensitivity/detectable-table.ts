/** Smallest detectable effect over numbers analysed × target power: what fewer or more people would buy. */

import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import { detectableEffect, OutOfReach } from '../plan/solve.ts';
import { targetAxis } from './axes.ts';

export interface DetectableTable {
  numbers: number[];
  targets: number[];
  /** The method's effect; null where none is large enough. */
  cells: (number | null)[][];
  planned: { row: number; column: number };
}

/** Shares of the planned number shown beside it. */
const SHARES = [0.75, 0.9, 1, 1.1, 1.25];

export function detectableTable(plan: AimPlan, { study }: StudyPlan): DetectableTable | null {
  if (plan.method.achieves !== 'power') return null;
  const { n } = plan.planned;
  const numbers = [
    ...new Set(SHARES.map((share) => Math.max(plan.calculation.smallestN, Math.round(n * share)))),
  ];
  const targets = targetAxis(plan, study.sensitivity.targets);
  return {
    numbers,
    targets,
    cells: numbers.map((count) => targets.map((target) => detectableOrNull(plan, count, target))),
    planned: { row: numbers.indexOf(n), column: plan.target === null ? -1 : targets.indexOf(plan.target) },
  };
}

function detectableOrNull(plan: AimPlan, n: number, target: number): number | null {
  try {
    return detectableEffect(plan.calculation, n, target);
  } catch (error) {
    if (error instanceof OutOfReach) return null;
    throw error;
  }
}
