/** The rules a study is held against, and what they say of it. */

import type { StudyPlan } from '../plan/plan.ts';
import type { Study } from '../spec/study.ts';
import { lossesDivide } from './m01-losses-divide.ts';
import { stagesMultiply } from './m02-stages-multiply.ts';
import { impossibleInputs } from './m05-impossible-inputs.ts';
import { noncentrality } from './m08-noncentrality.ts';
import { predictorsSetOrObserved } from './m09-predictor-values.ts';
import { shrunkenR2 } from './m10-shrunken-r2.ts';
import { overlap } from './m11-overlap.ts';
import { parametersCounted } from './m12-parameters.ts';
import { headCounts } from './m13-head-counts.ts';
import { sizeLabels } from './m14-size-labels.ts';
import { statedBasis } from './m15-stated-basis.ts';
import { publishedEffects } from './m16-published-effects.ts';
import { pilotEffects } from './m17-pilot-effects.ts';
import { pilotSpread } from './m18-pilot-spread.ts';
import { observedPower } from './m19-observed-power.ts';
import { effectFromNumber } from './m20-effect-from-number.ts';
import { oneSidedTests } from './m21-one-sided-tests.ts';
import { errorRates } from './m23-error-rates.ts';
import { severalPrimaryAims } from './m24-several-primary-aims.ts';
import { interactions } from './m27-interactions.ts';
import { intervalWidth } from './m31-interval-width.ts';
import { reliability } from './m41-reliability.ts';
import { predictionModels } from './m50-prediction-models.ts';
import { imputation } from './m52-imputation.ts';
import { recruitment } from './m54-recruitment.ts';
import type { Finding, Level, Rule } from './rule.ts';

/** In the order of their ids. */
export const rules: readonly Rule[] = [
  lossesDivide,
  stagesMultiply,
  impossibleInputs,
  noncentrality,
  predictorsSetOrObserved,
  shrunkenR2,
  overlap,
  parametersCounted,
  headCounts,
  sizeLabels,
  statedBasis,
  publishedEffects,
  pilotEffects,
  pilotSpread,
  observedPower,
  effectFromNumber,
  oneSidedTests,
  errorRates,
  severalPrimaryAims,
  interactions,
  intervalWidth,
  reliability,
  predictionModels,
  imputation,
  recruitment,
];

/** A finding, with its rule and the answer the spec gives to it. */
export interface Judgement {
  rule: string;
  level: Level;
  path: string;
  aim: string | null;
  message: string;
  /** Reason with which the spec answers a warning; null when it does not. An error cannot be answered. */
  acknowledged: string | null;
}

export function judge(plan: StudyPlan): Judgement[] {
  const { study } = plan;
  const found = rules.flatMap((rule) =>
    [
      ...(rule.checkStudy?.(study) ?? []),
      ...(rule.checkPlan?.(plan) ?? []),
      ...(rule.checkAim === undefined ? [] : plan.aims.flatMap((aim) => rule.checkAim?.(aim, plan) ?? [])),
    ].map((finding) => judgement(rule, finding, study)),
  );
  return [...found, ...idleAnswers(study, found)];
}

function judgement(rule: Rule, { path, aim, message, level = rule.level }: Finding, study: Study): Judgement {
  const answer = study.acknowledge.find(
    (one) => one.rule === rule.id && (one.aim === null || one.aim === aim),
  );
  const acknowledged = level === 'warning' ? (answer?.reason ?? null) : null;
  return { rule: rule.id, level, path, aim, message, acknowledged };
}

/** An answer to a warning that nobody gives may hide that the spec has changed since. */
function idleAnswers(study: Study, found: readonly Judgement[]): Judgement[] {
  return study.acknowledge.flatMap(({ rule, aim, reason }, index) =>
    found.some((one) => one.rule === rule && one.acknowledged === reason && (aim === null || one.aim === aim))
      ? []
      : [
          {
            rule,
            level: 'note' as const,
            path: `acknowledge[${index}]`,
            aim,
            message: `${rule} is answered here, but does not warn${aim === null ? '' : ' of this aim'}. Leave the answer out.`,
            acknowledged: null,
          },
        ],
  );
}
