import type { AimPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { shownLevel, shownNumber } from './support/numbers.ts';
import { inView, modelCounts } from './support/plan.ts';

const FEWEST_RESIDUAL_DF = 10;

export const impossibleInputs: Rule = {
  id: 'M05',
  level: 'error',
  title: 'Inputs are possible, and the model leaves degrees of freedom',
  why: 'A number computed from an impossible input looks as good as any other. Most such inputs are refused when the spec is read; this rule adds what is possible by itself and cannot be meant, and warns below 10 residual degrees of freedom, where power depends strongly on normal residuals (the line at 10 is common practice, without a source).',
  sources: [],
  ground: 'arithmetic',
  checkAim: (plan) =>
    together(plan.aim.id, [alphaTooLarge(plan), confidenceTooSmall(plan), widthTooLarge(plan), fewDf(plan)]),
};

function alphaTooLarge({ aim }: AimPlan): Part | null {
  const { alpha, confidence } = aim.criteria;
  if (confidence !== null || alpha < 0.5) return null;
  return {
    path: `aims[${aim.index}].criteria.alpha`,
    level: 'error',
    message: `alpha is ${shownLevel(alpha)}: such a test rejects true null hypotheses at least as often as it keeps them. State the significance level, such as .05, and not the confidence level.`,
  };
}

function confidenceTooSmall({ aim }: AimPlan): Part | null {
  const { confidence } = aim.criteria;
  if (confidence === null || confidence > 0.5) return null;
  return {
    path: `aims[${aim.index}].criteria.confidence`,
    level: 'error',
    message: `confidence is ${shownLevel(confidence)}: such an interval misses the true value at least as often as it holds it. State the confidence level, such as .95, and not alpha.`,
  };
}

function widthTooLarge({ aim, method }: AimPlan): Part | null {
  const { width } = aim.criteria;
  if (width === null || method.effect.variable !== 'r2' || width < 1) return null;
  return {
    path: `aims[${aim.index}].criteria.width`,
    level: 'error',
    message: `The wanted width is ${shownNumber(width)}, but R² lies between 0 and 1, so every interval of it is narrower. State the full width that is wanted, such as .20.`,
  };
}

function fewDf(plan: AimPlan): Part | null {
  const { n } = inView(plan);
  const { tested, adjustedFor } = modelCounts(plan);
  const df = n - tested - adjustedFor - 1;
  if (df >= FEWEST_RESIDUAL_DF) return null;
  return {
    path: `aims[${plan.aim.index}]`,
    level: 'warning',
    message: `${n} analysed leave ${df} residual degrees of freedom. Below ${FEWEST_RESIDUAL_DF} the result depends strongly on normal residuals: analyse more, or put fewer predictors into the model.`,
  };
}
