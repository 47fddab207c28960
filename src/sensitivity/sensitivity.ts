/** Every table and curve of one aim, built from its plan: the table of contents of this folder. */

import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import { type Assurance, expectedPower } from './assurance.ts';
import { type Curve, powerCurve } from './curve.ts';
import { type DetectableTable, detectableTable } from './detectable-table.ts';
import { type Margin, margins } from './margins.ts';
import { type PowerTable, powerTable } from './power-table.ts';
import { type Ranges, ranges } from './ranges.ts';
import { type RequiredTable, requiredTable } from './required-table.ts';

export interface AimSensitivity {
  plan: AimPlan;
  /** Required n over effect × target; null when no effect is stated. */
  required: RequiredTable | null;
  /** Power (or width) over effect × losses at the planned number. */
  power: PowerTable | null;
  /** Detectable effect over n × target power; null for an interval. */
  detectable: DetectableTable | null;
  ranges: Ranges | null;
  margins: Margin[];
  assurance: Assurance | null;
  curve: Curve | null;
}

export function sensitivityOf(plan: AimPlan, study: StudyPlan): AimSensitivity {
  return {
    plan,
    required: requiredTable(plan, study),
    power: powerTable(plan, study),
    detectable: detectableTable(plan, study),
    ranges: ranges(plan, study),
    margins: margins(plan, study),
    assurance: expectedPower(plan),
    curve: powerCurve(plan),
  };
}
