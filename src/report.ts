/** The path from a normalised study to everything that is known about it: plan, tables, judgements. Documents, JSON
 *  and terminal all read a report; nothing after this file computes a statistic. */

import type { StudyPlan } from './plan/plan.ts';
import { planStudy } from './plan/plan-study.ts';
import { type Judgement, judge } from './rules/rules.ts';
import { type AimSensitivity, sensitivityOf } from './sensitivity/sensitivity.ts';
import type { Study } from './spec/study.ts';

export interface Report {
  study: Study;
  plan: StudyPlan;
  judgements: Judgement[];
}

/** A report with the tables of every aim, which take longer than the numbers alone. */
export interface FullReport extends Report {
  sensitivities: AimSensitivity[];
}

/** @throws ProblemError when the study cannot be planned. */
export function buildReport(study: Study): Report {
  const plan = planStudy(study);
  return { study, plan, judgements: judge(plan) };
}

export function withSensitivities(report: Report): FullReport {
  return { ...report, sensitivities: report.plan.aims.map((aim) => sensitivityOf(aim, report.plan)) };
}
