/** One aim as a template sees it. */

import { methodInputs } from '../../generated/inputs.ts';
import type { AimPlan, StudyPlan, Yield } from '../../plan/plan.ts';
import type { AimSensitivity } from '../../sensitivity/sensitivity.ts';
import type { Aim, Quantity, Study, Term } from '../../spec/study.ts';
import { formatCount, formatPercent, formatProbability, formatSignificant } from '../numbers.ts';
import { python } from '../recompute/python.ts';
import { r } from '../recompute/r.ts';
import { recomputeScript } from '../recompute/script.ts';
import { achievedText } from './achieved.ts';
import { figureReferences } from './aim-figures.ts';
import { arithmeticTables, sensitivityTables } from './aim-tables.ts';
import { doubtSentences } from './doubts.ts';
import {
  basisText,
  computedNumber,
  effectText,
  equivalentText,
  list,
  powerTarget,
  rangeText,
  roleTitle,
  sentence,
  stated,
  typedNumber,
  type Units,
  unitsOf,
  unitText,
  withArticle,
  withUnit,
} from './wording.ts';

/** Words of the study that an aim's sentences need. */
export interface CommonWords {
  unit: string;
  counts: string;
  evaluable: string;
  enrol: string;
}

export type AimView = ReturnType<typeof aimView>;

export function aimView(sensitivity: AimSensitivity, study: StudyPlan, words: Study, common: CommonWords) {
  const { plan } = sensitivity;
  const { method, calculation, effect, own, planned, attainable, oneFewer, target } = plan;
  const aim = words.aims[plan.aim.index] ?? plan.aim;
  const { criteria } = plan.aim;
  const quantities = Object.values(aim.quantities);
  const leading = quantities.find(({ key }) => key === plan.aim.effectKeys[0]) ?? null;
  const units = unitsOf(aim);
  const bySensitivity = sensitivityTables(sensitivity, study, words);
  const yieldText = (at: Yield) => ({
    n: formatCount(at.n),
    achieved: achievedText(plan, at.achieved),
    detectable: at.detectable === null ? null : detectableText(plan, at.detectable, units),
  });
  return {
    ...common,
    id: aim.id,
    role: aim.role.replace('-', ' '),
    roleTitle: roleTitle(aim.role),
    objective: sentence(aim.objective),
    outcome: aim.outcome,
    analysis: sentence(aim.analysis),
    partial: `methods/${method.name}`,
    method: {
      name: method.name,
      title: method.title.charAt(0).toUpperCase() + method.title.slice(1),
      formula: method.formula,
      sources: method.sources.map(({ key, of, at }) => ({ key, of, at: at ?? null })),
      assumptions: method.assumptions,
    },
    isTest: method.achieves === 'power',
    found: plan.unrounded !== null,
    inputs: inputWords(aim),
    terms: { tested: termsText(aim.terms.tested), adjustedFor: termsText(aim.terms.adjusted_for) },
    alpha: formatProbability(criteria.alpha),
    target: targetText(plan, target, units),
    sides: criteria.sides === null ? null : criteria.sides === 1 ? 'one-sided' : 'two-sided',
    isOneSided: criteria.sides === 1,
    sidesReason: aim.criteria.sidesReason === null ? null : sentence(aim.criteria.sidesReason),
    confidence: criteria.confidence === null ? null : formatPercent(criteria.confidence),
    widthGoal: widthGoal(plan, units),
    widthKind: criteria.assurance === null ? 'expected' : `${formatPercent(criteria.assurance)} assured`,
    stated: leading === null || effect === null ? null : statedEffect(plan, leading, units),
    effects: effectWords(plan, units),
    nuisance: quantities.filter((quantity) => quantity !== leading).map((one) => nuisanceWords(one, units)),
    values: stepValues(plan),
    own: yieldText(own),
    ownDetectable: own.detectable === null ? null : detectableText(plan, own.detectable, units),
    oneFewer: oneFewer === null ? null : yieldText(oneFewer),
    planned: yieldText(planned),
    plannedDetectable: planned.detectable === null ? null : detectableText(plan, planned.detectable, units),
    differs: planned.n !== own.n,
    attainable: attainable === null ? null : yieldText(attainable),
    detectable: planned.detectable === null ? null : detectableText(plan, planned.detectable, units),
    alternatives:
      effect === null || target === null
        ? []
        : calculation.alternatives(effect, target).map((one) => ({ ...one, n: formatCount(one.n) })),
    doubt: doubtSentences(sensitivity, words),
    tables: { ...arithmeticTables(sensitivity, words), ...bySensitivity },
    sensitivityTables: Object.values(bySensitivity).filter((table) => table !== null),
    figures: figureReferences(sensitivity),
    recompute: {
      r: recomputeScript(r, sensitivity, study),
      python: recomputeScript(python, sensitivity, study),
    },
  };
}

function detectableText(plan: AimPlan, effect: number, units: Units): string {
  return withArticle(effectText(plan.calculation.equivalents(effect), plan.aim.effectKeys[0] ?? null, units));
}

function targetText({ method }: AimPlan, target: number | null, units: Units): string | null {
  if (target === null) return null;
  if (method.achieves === 'power') return powerTarget(target);
  return withUnit(typedNumber(target, method.achievedUnit), unitText(method.achievedUnit, units));
}

/** 'at most .2 wide (lower to upper limit) with an assurance of 80 %'. */
function widthGoal(plan: AimPlan, units: Units): string | null {
  const { assurance, width } = plan.aim.criteria;
  if (width === null) return null;
  const wide = `${targetText(plan, width, units)} wide from its lower to its upper limit`;
  return assurance === null
    ? `expected to be at most ${wide}`
    : `that is at most ${wide} with a probability of ${formatProbability(assurance)}`;
}

function statedEffect(plan: AimPlan, quantity: Quantity, units: Units) {
  const others =
    plan.effect === null
      ? []
      : plan.calculation
          .equivalents(plan.effect)
          .filter(({ key }) => key !== quantity.key)
          .map((one) => equivalentText(one, units));
  return {
    text: withArticle(stated(quantity, units)),
    also: others.length === 0 ? null : others.join('; '),
    range: rangeText(quantity),
    basis: basisText(quantity.basis),
    cite: quantity.cite,
    note: quantity.note === null ? null : sentence(quantity.note),
  };
}

function nuisanceWords(quantity: Quantity, units: Units) {
  const unit = unitText(quantity.unit, units);
  return {
    title: quantity.title,
    text: withUnit(typedNumber(quantity.value, quantity.unit), unit),
    basis: basisText(quantity.basis),
    citation: quantity.cite.length === 0 ? null : quantity.cite,
    range: rangeText(quantity),
    note: quantity.note === null ? null : sentence(quantity.note),
  };
}

/** Every form of the planned effect by key, as number and as percent; null where the inputs do not give it. */
function effectWords({ calculation, effect, method }: AimPlan, units: Units) {
  const keys = ['f2', 'r2', 'partial_r2', ...method.forms.map((form) => form.keys[0])];
  const none = Object.fromEntries(keys.map((key) => [key, null]));
  if (effect === null) return none;
  const given = calculation.equivalents(effect).map(
    ({ key, value, unit }) =>
      [
        key,
        {
          text: withUnit(computedNumber(value, unit), unitText(unit, units)),
          percent: `${formatSignificant(100 * value, 3)} %`,
        },
      ] as const,
  );
  return { ...none, ...Object.fromEntries(given) };
}

/** Inputs that are no assumptions: counts as numbers, choices as `is` flags and text. */
function inputWords(aim: Aim): Record<string, string | number | boolean | null> {
  const given: Readonly<Record<string, unknown>> = { ...aim.inputs };
  const words = methodInputs[aim.method].others.map(({ path, default: preset }) => {
    const value = path.reduce<unknown>(
      (tree, key) => (tree as Record<string, unknown> | undefined)?.[key],
      given,
    );
    return [path.join('_'), (value ?? preset ?? null) as string | number | boolean | null] as const;
  });
  return { ...Object.fromEntries(words), sampled: given.predictor_values !== 'fixed' };
}

function termsText(terms: readonly Term[] | undefined): string | null {
  if (terms === undefined || terms.length === 0) return null;
  return list(
    terms.map(({ name, parameters }) => (parameters === 1 ? name : `${name} (${parameters} parameters)`)),
  );
}

/** The arithmetic's values by variable, such as the residual degrees of freedom, as whole numbers or rounded. */
function stepValues({ calculation, effect, own }: AimPlan): Record<string, string> {
  const planned = effect ?? own.detectable;
  const steps = planned === null ? [] : calculation.steps(own.n, planned);
  const text = (value: number) =>
    Number.isInteger(value) ? formatCount(value) : formatSignificant(value, 4);
  return Object.fromEntries(
    [...calculation.constants, ...steps].flatMap(({ variable, value }) =>
      value === null ? [] : [[variable, text(value)]],
    ),
  );
}
