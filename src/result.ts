/** The report as the machine contract has it: what `solve --json` prints, described by schema/result.json. */

import type { ResultJson } from './generated/result.ts';
import { version } from './generated/version.ts';
import type { AimPlan, Yield } from './plan/plan.ts';
import type { Report } from './report.ts';
import type { Judgement } from './rules/rules.ts';

type AimResult = ResultJson['aims'][number];
type YieldResult = AimResult['planned'];

export function toResult({ study, plan, judgements }: Report): ResultJson {
  return {
    samplecase: version,
    spec_hash: study.hash,
    study: {
      sample_size: { evaluable: plan.evaluable, enrol: plan.enrol },
      driven_by: plan.drivenBy?.aim.id ?? null,
      feasible: plan.shortfall === null,
      ...(plan.shortfall === null
        ? {}
        : { attainable: { enrol: plan.shortfall.maximum, evaluable: plan.shortfall.evaluable } }),
    },
    aims: plan.aims.map((aim) => aimResult(aim, judgements)),
    warnings: judgements.filter(({ aim }) => aim === null).map(warning),
  };
}

function aimResult(plan: AimPlan, judgements: readonly Judgement[]): AimResult {
  const { aim, method, own, target } = plan;
  const isTest = method.achieves === 'power';
  return {
    id: aim.id,
    role: aim.role,
    method: aim.method,
    find: aim.find,
    sample_size: { evaluable: own.n, unrounded: plan.unrounded, enrol: plan.enrol },
    power: isTest ? own.achieved : null,
    ...(isTest ? {} : { width: own.achieved }),
    effect: statedEffect(plan),
    detectable_effect: effectForms(plan, own.detectable),
    alpha: aim.criteria.alpha,
    target,
    planned: yieldResult(plan, plan.planned),
    ...(plan.attainable === null ? {} : { attainable: yieldResult(plan, plan.attainable) }),
    warnings: judgements.filter((judgement) => judgement.aim === aim.id).map(warning),
  };
}

function yieldResult(plan: AimPlan, { n, achieved, detectable }: Yield): YieldResult {
  const isTest = plan.method.achieves === 'power';
  return {
    evaluable: n,
    power: isTest ? achieved : null,
    ...(isTest ? {} : { width: achieved }),
    detectable_effect: effectForms(plan, detectable),
  };
}

/** The effect in every form, the stated one with the digits of the spec and not as computed back from the others. */
function statedEffect(plan: AimPlan): Record<string, number> | null {
  const forms = effectForms(plan, plan.effect);
  if (forms === null) return null;
  const stated = Object.entries(forms).map(([key, value]) => [key, plan.aim.quantities[key]?.value ?? value]);
  return Object.fromEntries(stated);
}

function effectForms(plan: AimPlan, effect: number | null): Record<string, number> | null {
  if (effect === null) return null;
  return Object.fromEntries(plan.calculation.equivalents(effect).map(({ key, value }) => [key, value]));
}

function warning({ rule, level, message, acknowledged }: Judgement) {
  return { rule, level, message, ...(acknowledged === null ? {} : { acknowledged }) };
}
