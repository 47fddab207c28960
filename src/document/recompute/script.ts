/** The lines a reviewer runs to get every number of an aim again, in a language that is not ours. One script
 *  is built, and each language spells it. */

import type { Step } from '../../methods/method.ts';
import { enrolledFor } from '../../plan/losses.ts';
import type { AimPlan, StudyPlan } from '../../plan/plan.ts';
import type { AimSensitivity } from '../../sensitivity/sensitivity.ts';
import { type Dialect, printed } from './dialect.ts';
import { doubtLines } from './doubt-lines.ts';
import { requiredLines } from './required-lines.ts';
import { tableLines } from './table-lines.ts';

export function recomputeScript(dialect: Dialect, sensitivity: AimSensitivity, study: StudyPlan): string {
  const { plan } = sensitivity;
  const sections = [
    dialect.preamble,
    inputs(dialect, plan),
    stepByStep(dialect, plan),
    functions(dialect, plan),
    headline(dialect, plan, study),
    ...alternativeLines(dialect, plan),
    ...tableLines(dialect, sensitivity, study),
    ...doubtLines(dialect, sensitivity, study),
  ];
  return sections
    .filter((lines) => lines.length > 0)
    .map((lines) => lines.join('\n'))
    .join('\n\n');
}

function inputs(dialect: Dialect, plan: AimPlan): string[] {
  const { calculation, aim, method, target } = plan;
  const { form } = calculation;
  const named = Object.values(aim.quantities);
  return [
    dialect.comment('Inputs, with all their digits'),
    ...calculation.constants.map(({ variable, meaning, value }) =>
      annotated(dialect, dialect.assign(variable, dialect.number(value)), meaning),
    ),
    ...named.map((q) => annotated(dialect, dialect.assign(q.key, dialect.number(q.value)), q.title)),
    ...(target === null
      ? []
      : [annotated(dialect, dialect.assign('target', dialect.number(target)), targetName(plan))]),
    ...(form === null || plan.effect === null
      ? []
      : [
          ...dialect.define(
            'effect',
            named.map((q) => ({ name: q.key, value: q.value })),
            [],
            form.expression,
          ),
          dialect.show(
            dialect.assign(method.effect.variable, dialect.call('effect', [])),
            printed(plan.effect),
          ),
        ]),
  ];
}

function targetName(plan: AimPlan): string {
  return plan.method.achieves === 'power' ? 'target power' : 'wanted full width';
}

function annotated(dialect: Dialect, line: string, meaning: string): string {
  return `${line}  ${dialect.comment(meaning)}`;
}

function stepByStep(dialect: Dialect, plan: AimPlan): string[] {
  const effect = plan.effect ?? plan.own.detectable;
  if (effect === null) return [];
  const steps = plan.calculation.steps(plan.own.n, effect);
  return [
    dialect.comment(`Step by step, ${plan.own.n} analysed`),
    dialect.assign('n', dialect.number(plan.own.n)),
    ...(plan.effect === null ? [dialect.assign(plan.method.effect.variable, dialect.number(effect))] : []),
    ...steps.flatMap((step) => {
      const line = stepLine(dialect, step);
      return step.value === null ? line.split('\n') : [dialect.show(line, printed(step.value))];
    }),
  ];
}

/** A step without a variable defines functions of its own. */
function stepLine(dialect: Dialect, step: Step): string {
  const expression = step[dialect.language];
  return step.variable === '' ? expression : dialect.assign(step.variable, expression);
}

/** Steps as a function of the number analysed and the effect. */
function asFunction(dialect: Dialect, name: string, effectName: string, steps: readonly Step[]): string[] {
  const last = steps.at(-1);
  if (last === undefined) return [];
  const body = steps.slice(0, -1).flatMap((step) => stepLine(dialect, step).split('\n'));
  return dialect.define(name, [{ name: 'n' }, { name: effectName }], body, last[dialect.language]);
}

function functions(dialect: Dialect, plan: AimPlan): string[] {
  const effect = plan.effect ?? plan.own.detectable;
  if (effect === null) return [];
  const { method, calculation, own } = plan;
  return [
    dialect.comment('The same as a function of the number analysed and the effect'),
    ...asFunction(dialect, method.achieves, method.effect.variable, calculation.steps(own.n, effect)),
    ...(method.isCostly === true
      ? []
      : dialect.search(method.achieves, calculation.smallestN, method.achieves === 'power')),
  ];
}

/** Under another convention: its function, and what its number and one fewer achieve. */
function alternativeLines(dialect: Dialect, plan: AimPlan): string[][] {
  const { effect, target, calculation, method } = plan;
  if (effect === null || target === null) return [];
  return calculation.alternatives(effect, target).map(({ key, description, n, steps }) => [
    dialect.comment(description),
    ...asFunction(dialect, `${method.achieves}_${key}`, method.effect.variable, steps(n)),
    ...[n, n - 1].flatMap((count) => {
      const value = count >= calculation.smallestN ? steps(count).at(-1)?.value : null;
      if (value === null || value === undefined) return [];
      const call = dialect.call(`${method.achieves}_${key}`, [dialect.number(count), method.effect.variable]);
      return [dialect.show(call, printed(value))];
    }),
  ]);
}

function headline(dialect: Dialect, plan: AimPlan, study: StudyPlan): string[] {
  const name = plan.method.achieves;
  const effectName = plan.method.effect.variable;
  const losses = study.study.sample.losses.map((loss) => loss.proportion.value);
  const lines = [dialect.comment('Results')];
  if (plan.effect !== null && plan.unrounded !== null) {
    const target = plan.target ?? 0;
    lines.push(...requiredLines(dialect, plan, { moved: {}, target, n: plan.own.n }));
    if (plan.method.isCostly !== true && plan.oneFewer !== null && plan.oneFewer.achieved !== null) {
      const fewer = [dialect.number(plan.oneFewer.n), effectName];
      lines.push(dialect.show(dialect.call(name, fewer), printed(plan.oneFewer.achieved)));
    }
  }
  for (const at of distinctYields(plan)) {
    if (at.achieved !== null) {
      lines.push(dialect.show(dialect.call(name, [dialect.number(at.n), effectName]), printed(at.achieved)));
    }
    if (at.detectable !== null) {
      const bracket = [at.detectable / 4, at.detectable * 4] as const;
      lines.push(dialect.show(dialect.root(name, at.n, 'target', ...bracket), printed(at.detectable)));
    }
  }
  lines.push(dialect.show(dialect.enrol(plan.own.n, losses), String(enrolledFor(plan.own.n, losses))));
  return lines;
}

function distinctYields(plan: AimPlan) {
  const all = [plan.own, plan.planned, ...(plan.attainable === null ? [] : [plan.attainable])];
  return all.filter((one, index) => all.findIndex((other) => other.n === one.n) === index);
}
