/** What happens if an assumption is off, in one or two sentences an aim. */

import type { RangeRow } from '../../sensitivity/ranges.ts';
import type { AimSensitivity } from '../../sensitivity/sensitivity.ts';
import type { Study } from '../../spec/study.ts';
import { formatCount, formatPercent, formatPower } from '../numbers.ts';
import { achievedText } from './achieved.ts';
import {
  computedNumber,
  list,
  powerTarget,
  typedNumber,
  type Units,
  unitsOf,
  unitText,
  withUnit,
} from './wording.ts';

export interface DoubtWords {
  whatIf: string | null;
  margin: string | null;
  worst: string | null;
  /** Ends before the citation and the full stop. */
  assurance: string | null;
}

export function doubtSentences(sensitivity: AimSensitivity, words: Study): DoubtWords {
  return {
    whatIf: whatIf(sensitivity, words),
    margin: margin(sensitivity, words),
    worst: worst(sensitivity, words),
    assurance: assurance(sensitivity, words),
  };
}

/** The range that moves the number most, at its unfavourable end. */
function whatIf({ plan, ranges }: AimSensitivity, { sample, aims }: Study): string | null {
  const row = ranges?.rows[0];
  if (row === undefined) return null;
  if (row.unfavourable === null) {
    return `Nowhere in its range does the ${nameOf(row, sample.losses)} ask for more than planned.`;
  }
  const end = row[row.unfavourable];
  const value = row.quantity[row.unfavourable];
  if (end === null || value === null) return null;
  const units = unitsOf(aims[plan.aim.index] ?? plan.aim);
  const ifIs = `If the ${nameOf(row, sample.losses)} is ${valueText(row, value, units)}, the planned study has ${achievedPhrase(plan, end.achieved)}`;
  if (end.required === null || plan.target === null) return `${ifIs}.`;
  const goal =
    plan.method.achieves === 'power' ? `a power of ${powerTarget(plan.target)}` : 'the wanted width';
  return `${ifIs}, and ${formatCount(end.required.evaluable)} ${sample.unit} would have to be analysed (${formatCount(end.required.enrol)} ${sample.counts}) to reach ${goal}.`;
}

function nameOf(
  { stage, quantity }: Pick<RangeRow, 'stage' | 'quantity'>,
  losses: Study['sample']['losses'],
): string {
  if (stage === null) return quantity.title;
  const loss = losses.find(({ proportion }) => proportion.path === quantity.path);
  return `proportion lost at “${loss?.stage ?? stage}”`;
}

function valueText(
  { quantity, stage }: Pick<RangeRow, 'stage' | 'quantity'>,
  value: number,
  units: Units,
): string {
  if (stage !== null) return formatPercent(value);
  return withUnit(typedNumber(value, quantity.unit), unitText(quantity.unit, units));
}

function achievedPhrase(plan: AimSensitivity['plan'], achieved: number | null): string {
  const text = achievedText(plan, achieved);
  if (text === null) return 'no defined result';
  return plan.method.achieves === 'power' ? `a power of ${text}` : `an interval ${text} wide`;
}

/** Where each assumption breaks the highest floor that the plan still meets. */
function margin({ plan, margins }: AimSensitivity, { aims }: Study): string | null {
  const units = unitsOf(aims[plan.aim.index] ?? plan.aim);
  const floors = margins[0]?.limits.map(({ floor }) => floor) ?? [];
  const floor = floors.find((one) => one !== plan.target) ?? null;
  if (floor === null) return null;
  const clauses = margins.flatMap(({ quantity, stage, limits }) => {
    const limit = limits.find((one) => one.floor === floor);
    if (stage !== null || limit === undefined || limit.value === null) return [];
    const text = withUnit(computedNumber(limit.value, quantity.unit), unitText(quantity.unit, units));
    return [`the ${quantity.title} is ${text}`];
  });
  // Whatever the losses, they work through the number that is left.
  const left = margins.flatMap(({ limits }) =>
    limits.filter((one) => one.floor === floor && one.left !== null),
  )[0]?.left;
  if (left !== undefined && left !== null) clauses.push(`only ${formatCount(left)} are analysed`);
  if (clauses.length === 0) return null;
  const falls =
    plan.method.achieves === 'power'
      ? `The power falls to ${powerTarget(floor)}`
      : `The interval widens to ${achievedText(plan, floor)}`;
  return clauses.length === 1
    ? `${falls} if ${clauses[0]}.`
    : `${falls} if one of these holds: ${list(clauses, 'or')}.`;
}

function worst({ plan, ranges }: AimSensitivity, { sample }: Study): string | null {
  const all = ranges?.allUnfavourable ?? null;
  if (all === null) return null;
  const needed =
    all.required === null
      ? ''
      : `, and ${formatCount(all.required.enrol)} ${sample.unit} would have to be ${sample.counts} for the target`;
  return `With every assumption at the unfavourable end of its range at once, the planned study has ${achievedPhrase(plan, all.achieved)}${needed}.`;
}

function assurance({ plan, assurance: found }: AimSensitivity, { aims }: Study): string | null {
  if (found === null) return null;
  const { quantity, low, high, mode, expected } = found;
  const units = unitsOf(aims[plan.aim.index] ?? plan.aim);
  const text = (value: number) => typedNumber(value, quantity.unit);
  const unit = unitText(quantity.unit, units);
  return `Averaged over a triangular distribution of the ${quantity.title} from ${text(low)} to ${withUnit(text(high), unit)} with its mode at ${text(mode)}, the expected power is ${formatPower(expected)}`;
}
