/** Study → plan: each aim's requirement, the study's number, and what every aim gets at that number. */

import { methods } from '../generated/catalogue.ts';
import type { Calculation, Method } from '../methods/method.ts';
import { fail, type Problem, ProblemError } from '../problem.ts';
import type { Aim, Study } from '../spec/study.ts';
import { enrolledFor, evaluableFrom, proportionsOf, stageCounts } from './losses.ts';
import { type AimPlan, drivesSize, type StudyPlan, type Yield } from './plan.ts';
import { detectableEffect, OutOfReach, realValuedNumber, requiredNumber } from './solve.ts';

interface BoundAim {
  aim: Aim;
  method: Method;
  calculation: Calculation;
  target: number | null;
  /** What the aim needs; null when its number is given. */
  required: { n: number; unrounded: number } | null;
}

/** @throws ProblemError with every aim that cannot be planned. */
export function planStudy(study: Study): StudyPlan {
  const bound = collect(study.aims, bindAim);
  const losses = proportionsOf(study.sample.losses);
  const { maximum } = study.sample;
  const available = maximum === null ? null : evaluableFrom(maximum, losses);
  const driver = largestRequirement(bound);
  const evaluable = driver?.required?.n ?? available ?? largestGiven(study.aims);
  if (evaluable === null) {
    fail(
      'no-number',
      'aims',
      'No aim finds a sample size, and neither evaluable nor sample.maximum gives a number.',
    );
  }
  const enrol = driver === null && maximum !== null ? maximum : enrolledFor(evaluable, losses);
  const short = maximum !== null && enrol > maximum ? maximum : null;
  const attainable = short === null ? null : available;

  const aims = collect(bound, (one) => planAim(one, { evaluable, available, attainable, losses }));
  return {
    study,
    aims,
    evaluable,
    enrol,
    stages: stageCounts(evaluable, study.sample.losses),
    drivenBy: driver === null ? null : (aims.find((plan) => plan.aim.id === driver.aim.id) ?? null),
    shortfall: short === null || attainable === null ? null : { maximum: short, evaluable: attainable },
  };
}

/** Run for each; problems of all are thrown together. */
function collect<In, Out>(items: readonly In[], run: (item: In) => Out): Out[] {
  const problems: Problem[] = [];
  const done: Out[] = [];
  for (const item of items) {
    try {
      done.push(run(item));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      problems.push(...error.problems);
    }
  }
  if (problems.length > 0) throw new ProblemError(problems);
  return done;
}

function bindAim(aim: Aim): BoundAim {
  const method = methods[aim.method];
  const calculation = method.prepare(aim);
  const target = method.achieves === 'power' ? aim.criteria.power : aim.criteria.width;
  const bound = { aim, method, calculation, target, required: null };
  if (aim.find !== 'sample-size') return bound;
  const { effect } = calculation;
  if (effect === null || target === null) {
    fail(
      'incomplete',
      `aims[${aim.index}]`,
      'A sample size can be found only for a stated effect and target.',
    );
  }
  const required = reached(aim, () => {
    const n = requiredNumber(method, calculation, effect, target);
    return { n, unrounded: realValuedNumber(calculation, n, effect, target) };
  });
  return { ...bound, required };
}

/** Turn what is out of reach into a problem of the aim. */
function reached<Out>(aim: Aim, solve: () => Out): Out {
  try {
    return solve();
  } catch (error) {
    if (error instanceof OutOfReach || error instanceof RangeError) {
      fail('out-of-reach', `aims[${aim.index}]`, error.message);
    }
    throw error;
  }
}

function largestRequirement(bound: readonly BoundAim[]): BoundAim | null {
  const sized = bound.filter((one) => one.required !== null);
  const driving = sized.filter((one) => drivesSize(one.aim));
  const candidates = driving.length > 0 ? driving : sized;
  return candidates.reduce<BoundAim | null>(
    (largest, one) => ((one.required?.n ?? 0) > (largest?.required?.n ?? 0) ? one : largest),
    null,
  );
}

function largestGiven(aims: readonly Aim[]): number | null {
  const given = aims.flatMap((aim) => (aim.evaluable === null ? [] : [aim.evaluable]));
  return given.length === 0 ? null : Math.max(...given);
}

interface Numbers {
  evaluable: number;
  /** What the stated maximum leaves, when there is one. */
  available: number | null;
  attainable: number | null;
  losses: readonly number[];
}

function planAim(bound: BoundAim, numbers: Numbers): AimPlan {
  const { aim, method, calculation, target, required } = bound;
  const n = required?.n ?? aim.evaluable ?? numbers.available ?? numbers.evaluable;
  const at = (count: number) => reached(aim, () => yieldAt(bound, count));
  const own = at(n);
  return {
    aim,
    method,
    calculation,
    target,
    effect: calculation.effect,
    own,
    oneFewer: required !== null && n > calculation.smallestN ? at(n - 1) : null,
    unrounded: required?.unrounded ?? null,
    enrol: enrolledFor(n, numbers.losses),
    planned: numbers.evaluable === n ? own : at(numbers.evaluable),
    attainable: numbers.attainable === null ? null : at(numbers.attainable),
  };
}

function yieldAt({ aim, method, calculation, target }: BoundAim, n: number): Yield {
  if (n < calculation.smallestN) {
    fail(
      'M05',
      `aims[${aim.index}].evaluable`,
      `${n} analysed leave no residual degree of freedom; at least ${calculation.smallestN} are needed.`,
    );
  }
  const achieved = calculation.effect === null ? null : calculation.achieved(n, calculation.effect);
  return { n, achieved, detectable: detectable(method, calculation, n, target) };
}

/** null when the question does not arise, or when no effect is large enough for so few. */
function detectable(
  method: Method,
  calculation: Calculation,
  n: number,
  target: number | null,
): number | null {
  if (method.achieves !== 'power' || target === null) return null;
  try {
    return detectableEffect(calculation, n, target);
  } catch (error) {
    if (error instanceof OutOfReach) return null;
    throw error;
  }
}
