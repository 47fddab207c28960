/** Lines for what happens when assumptions slip: ranges, margins, expected power. */

import type { AimPlan, StudyPlan } from '../../plan/plan.ts';
import type { Outcome } from '../../sensitivity/ranges.ts';
import type { AimSensitivity } from '../../sensitivity/sensitivity.ts';
import { type Dialect, printed } from './dialect.ts';
import { requiredLines } from './required-lines.ts';

export function doubtLines(dialect: Dialect, sensitivity: AimSensitivity, study: StudyPlan): string[][] {
  return [
    rangeLines(dialect, sensitivity, study),
    marginLines(dialect, sensitivity, study),
    assuranceLines(dialect, sensitivity),
  ];
}

function rangeLines(dialect: Dialect, { plan, ranges }: AimSensitivity, study: StudyPlan): string[] {
  if (ranges === null) return [];
  const ends = ranges.rows.flatMap(({ quantity, stage, low, high }) => {
    const name = stage === null ? quantity.title : 'proportion lost';
    return [
      { name: `${name} ${quantity.low}`, outcome: low },
      { name: `${name} ${quantity.high}`, outcome: high },
    ];
  });
  const all = { name: 'all at their unfavourable ends', outcome: ranges.allUnfavourable };
  return [
    dialect.comment(`Ranges: to analyse, to enrol, and the ${plan.method.achieves} of the planned study`),
    ...[...ends, all].flatMap(({ name, outcome }) =>
      outcome === null ? [] : [dialect.comment(name), ...outcomeLines(dialect, outcome, plan, study)],
    ),
  ];
}

function outcomeLines(dialect: Dialect, outcome: Outcome, plan: AimPlan, study: StudyPlan): string[] {
  const { required, achieved, moved } = outcome;
  const effect = dialect.call('effect', [], moved.values);
  const lines: string[] = [];
  if (required !== null) {
    const requirement = { moved: moved.values, target: plan.target ?? 0, n: required.evaluable };
    lines.push(...requiredLines(dialect, plan, requirement));
    lines.push(dialect.show(dialect.enrol(required.evaluable, moved.losses), String(required.enrol)));
  }
  if (achieved !== null) {
    if (moved.analysed !== study.evaluable) {
      lines.push(dialect.show(dialect.kept(study.enrol, moved.losses), String(moved.analysed)));
    }
    lines.push(
      dialect.show(
        dialect.call(plan.method.achieves, [dialect.number(moved.analysed), effect]),
        printed(achieved),
      ),
    );
  }
  return lines;
}

function marginLines(dialect: Dialect, { plan, margins }: AimSensitivity, study: StudyPlan): string[] {
  const name = plan.method.achieves;
  const limits = margins.flatMap(({ quantity, limits: ofRow }) =>
    ofRow.flatMap(({ value, floor, left }) => (value === null ? [] : [{ quantity, value, floor, left }])),
  );
  if (limits.length === 0) return [];
  return [
    dialect.comment(
      `Margins: at the limit of an assumption the ${name} is at its floor; at the limit of a loss`,
    ),
    dialect.comment('just as many are left as the floor needs'),
    ...limits.flatMap(({ quantity, value, floor, left }) => {
      if (left === null) {
        const effect = dialect.call('effect', [], { [quantity.key]: value });
        return [dialect.show(dialect.call(name, [dialect.number(plan.planned.n), effect]), printed(floor))];
      }
      const losses = study.study.sample.losses.map(({ proportion }) =>
        proportion.path === quantity.path ? value : proportion.value,
      );
      return [
        ...requiredLines(dialect, plan, { moved: {}, target: floor, n: left }),
        dialect.show(dialect.kept(study.enrol, losses), String(left)),
      ];
    }),
  ];
}

function assuranceLines(dialect: Dialect, { plan, assurance }: AimSensitivity): string[] {
  if (assurance === null) return [];
  const { quantity, low, mode, high, expected } = assurance;
  return [
    dialect.comment(`Expected power over a triangular distribution of ${quantity.key}`),
    ...dialect.average(plan.method.achieves, plan.planned.n, quantity.key, { low, mode, high }),
    dialect.show(dialect.averageValue, printed(expected)),
  ];
}
