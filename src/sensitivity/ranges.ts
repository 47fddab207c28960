/** Each quantity with a stated range moved alone to either end, and all together to their unfavourable ends,
 *  ranked by how much the move changes the number to enrol (or, where the number is given, what it achieves). */

import type { Values } from '../methods/method.ts';
import { enrolledFor, evaluableFrom } from '../plan/losses.ts';
import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import type { Quantity } from '../spec/study.ts';
import { requiredOrNull } from './required-table.ts';
import { achievedWith, effectWith } from './scenario.ts';

/** Quantities moved, by path. */
type Moves = ReadonlyMap<string, number>;

export interface Outcome {
  /** To analyse and to enrol so that the target is met; null without a target, or out of reach. */
  required: { evaluable: number; enrol: number } | null;
  /** What the planned enrolment achieves. */
  achieved: number | null;
  /** What was moved: quantities of the aim by key, every loss, and the number these losses leave. */
  moved: { values: Values; losses: number[]; analysed: number };
}

export interface RangeRow {
  quantity: Quantity;
  /** Stage of a loss; null for a quantity of the aim. */
  stage: string | null;
  low: Outcome | null;
  high: Outcome | null;
  /** The end at which the plan fares worse than planned; null when neither is. */
  unfavourable: 'low' | 'high' | null;
  /** Enrolled people (or power, width) between the best and the worst end. */
  swing: number;
}

export interface Ranges {
  rows: RangeRow[];
  planned: Outcome;
  /** null with fewer than two ranges. */
  allUnfavourable: Outcome | null;
}

/** null when no quantity has a range. */
export function ranges(plan: AimPlan, study: StudyPlan): Ranges | null {
  if (plan.effect === null) return null;
  const rows = candidates(plan, study)
    .filter(({ quantity }) => quantity.low !== null || quantity.high !== null)
    .map((candidate) => rangeRow(plan, study, candidate))
    .sort((a, b) => b.swing - a.swing);
  if (rows.length === 0) return null;
  const worst = new Map(rows.map((row) => [row.quantity.path, worstValue(row)]));
  return {
    rows,
    planned: outcome(plan, study, new Map()),
    allUnfavourable: rows.length > 1 ? outcome(plan, study, worst) : null,
  };
}

interface Candidate {
  quantity: Quantity;
  stage: string | null;
}

export function candidates(plan: AimPlan, { study }: StudyPlan): Candidate[] {
  return [
    ...Object.values(plan.aim.quantities).map((quantity) => ({ quantity, stage: null })),
    ...study.sample.losses.map((loss) => ({ quantity: loss.proportion, stage: loss.stage })),
  ];
}

function outcome(plan: AimPlan, study: StudyPlan, moves: Moves): Outcome {
  const values = Object.fromEntries(
    Object.values(plan.aim.quantities).flatMap(({ path, key }) => {
      const value = moves.get(path);
      return value === undefined ? [] : [[key, value]];
    }),
  );
  const planned = study.study.sample.losses;
  const losses = planned.map(({ proportion }) => moves.get(proportion.path) ?? proportion.value);
  const effect = effectWith(plan, values);
  const required =
    effect === null || plan.target === null || plan.aim.find !== 'sample-size'
      ? null
      : requiredOrNull(plan, effect, plan.target);
  const unchanged = losses.every((loss, index) => loss === planned[index]?.proportion.value);
  const analysed = unchanged ? study.evaluable : evaluableFrom(study.enrol, losses);
  return {
    required: required === null ? null : { evaluable: required, enrol: enrolledFor(required, losses) },
    achieved: achievedWith(plan, analysed, values),
    moved: { values, losses, analysed },
  };
}

function rangeRow(plan: AimPlan, study: StudyPlan, { quantity, stage }: Candidate): RangeRow {
  const end = (value: number | null) =>
    value === null ? null : outcome(plan, study, new Map([[quantity.path, value]]));
  const planned = outcome(plan, study, new Map());
  const low = end(quantity.low);
  const high = end(quantity.high);
  const badness = (at: Outcome | null) => cost(plan, at ?? planned);
  const [ofLow, ofHigh] = [badness(low), badness(high)];
  return {
    quantity,
    stage,
    low,
    high,
    unfavourable: Math.max(ofLow, ofHigh) <= cost(plan, planned) ? null : ofLow >= ofHigh ? 'low' : 'high',
    swing: Math.abs(ofLow - ofHigh),
  };
}

/** Larger is worse: people to enrol, or the power lacking, or the width. Out of reach is worst. */
function cost(plan: AimPlan, { required, achieved }: Outcome): number {
  if (plan.aim.find === 'sample-size') return required?.enrol ?? Number.POSITIVE_INFINITY;
  if (achieved === null) return Number.POSITIVE_INFINITY;
  return plan.method.achieves === 'power' ? 1 - achieved : achieved;
}

function worstValue({ quantity, unfavourable }: RangeRow): number {
  return unfavourable === null ? quantity.value : (quantity[unfavourable] ?? quantity.value);
}
