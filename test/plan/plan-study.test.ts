import { describe, expect, test } from 'vitest';
import type { StudyPlan } from '../../src/plan/plan.ts';
import { planStudy } from '../../src/plan/plan-study.ts';
import { ProblemError } from '../../src/problem.ts';
import { parseSpec } from '../../src/spec/parse.ts';
import { type NestedChanges, nestedSpec } from '../support/nested-spec.ts';

function planOf(changes: NestedChanges = {}): StudyPlan {
  const { study, problems } = parseSpec(JSON.stringify(nestedSpec(changes)));
  expect(problems).toEqual([]);
  if (study === null) throw new Error('no study');
  return planStudy(study);
}

function onlyAim(plan: StudyPlan) {
  const [aim] = plan.aims;
  if (aim === undefined) throw new Error('no aim');
  return aim;
}

describe('the number a study needs', () => {
  test('sampled predictors: 235 analysed, 282 invited (M09, M02)', () => {
    const plan = planOf();
    const aim = onlyAim(plan);
    expect([plan.evaluable, plan.enrol]).toEqual([235, 282]);
    expect(aim.own.achieved).toBeCloseTo(0.9004737714, 9);
    expect(aim.oneFewer?.achieved).toBeCloseTo(0.8990774, 6);
    expect(plan.drivenBy?.aim.id).toBe('main');
    expect(plan.stages.map(({ before, after }) => [before, after])).toEqual([
      [282, 248],
      [248, 235],
    ]);
  });

  test('fixed predictors: 227 analysed (M08)', () => {
    const aim = onlyAim(planOf({ predictorValues: 'fixed' }));
    expect(aim.own.n).toBe(227);
    expect(aim.own.achieved).toBeCloseTo(0.90133, 4);
    expect(aim.oneFewer?.achieved).toBeCloseTo(0.89992, 4);
  });

  test('the real-valued solution lies in the last step and meets the target exactly', () => {
    const { unrounded, calculation, effect } = onlyAim(planOf());
    expect(unrounded).toBeGreaterThan(234);
    expect(unrounded).toBeLessThanOrEqual(235);
    expect(calculation.achieved(unrounded ?? 0, effect ?? 0)).toBeCloseTo(0.9, 12);
  });

  test('the detectable effect at the planned number has the target power', () => {
    const { planned, calculation } = onlyAim(planOf());
    expect(calculation.achieved(planned.n, planned.detectable ?? 0)).toBeCloseTo(0.9, 12);
  });
});

describe('a number that is given', () => {
  test('power at a given number', () => {
    const aim = onlyAim(planOf({ find: 'power', evaluable: 234, criteria: { alpha: 0.05 } }));
    expect(aim.own.achieved).toBeCloseTo(0.8990774, 6);
    expect([aim.unrounded, aim.oneFewer, aim.own.detectable]).toEqual([null, null, null]);
  });

  test('without evaluable the number follows from the maximum and the losses', () => {
    const plan = planOf({
      find: 'power',
      sample: { maximum: 320, losses: [{ stage: 'drops out', proportion: 0.164 }] },
    });
    // 320 · .836 = 267.52
    expect([plan.evaluable, plan.enrol, onlyAim(plan).own.n]).toEqual([267, 320, 267]);
  });

  test('detectable effect and power agree with each other', () => {
    const found = onlyAim(planOf({ find: 'detectable-effect', evaluable: 180 }));
    const f2 = found.own.detectable ?? 0;
    const back = onlyAim(planOf({ find: 'power', evaluable: 180, partialR2: f2 / (1 + f2) }));
    expect(back.own.achieved).toBeCloseTo(0.9, 12);
  });

  test('too few for a residual degree of freedom is refused, with the number needed', () => {
    expect(() => planOf({ find: 'power', evaluable: 9 })).toThrow(
      new ProblemError([
        {
          level: 'error',
          code: 'M05',
          path: 'aims[0].evaluable',
          message: '9 analysed leave no residual degree of freedom; at least 10 are needed.',
        },
      ]),
    );
  });
});

describe('a maximum', () => {
  test('that is too small is told, with what it buys', () => {
    const plan = planOf({ sample: { maximum: 200, losses: [{ stage: 'drops out', proportion: 0.1 }] } });
    expect(plan.shortfall).toEqual({ maximum: 200, evaluable: 180 });
    expect(plan.evaluable).toBe(235);
    const { attainable } = onlyAim(plan);
    expect(attainable?.n).toBe(180);
    expect(attainable?.achieved).toBeLessThan(0.9);
    expect(attainable?.detectable).toBeGreaterThan(onlyAim(plan).planned.detectable ?? 0);
  });

  test('that is just enough is no shortfall', () => {
    const losses = [{ stage: 'drops out', proportion: 0.1 }];
    expect(planOf({ sample: { maximum: 262, losses } }).shortfall).toBeNull();
    expect(planOf({ sample: { maximum: 261, losses } }).shortfall).toEqual({ maximum: 261, evaluable: 234 });
  });
});

describe('several aims', () => {
  const second = (role: string, partialR2: number) => ({
    ...(nestedSpec({ partialR2 }).aims as Record<string, unknown>[])[0],
    id: 'second',
    role,
  });

  test('the largest primary or key-secondary requirement drives the study', () => {
    const plan = planOf({ extraAims: [second('key-secondary', 0.05)] });
    expect(plan.drivenBy?.aim.id).toBe('second');
    expect(plan.aims[0]?.own.n).toBe(235);
    expect(plan.aims[0]?.planned.n).toBe(plan.aims[1]?.own.n);
    expect(plan.aims[0]?.planned.achieved).toBeGreaterThan(0.9);
  });

  test('a secondary aim gets the power it has', () => {
    const plan = planOf({ extraAims: [second('secondary', 0.03)] });
    expect(plan.drivenBy?.aim.id).toBe('main');
    expect(plan.evaluable).toBe(235);
    expect(plan.aims[1]?.planned.achieved).toBeLessThan(0.9);
  });
});

test('a target that no number of ours reaches is refused in words', () => {
  expect(() => planOf({ partialR2: 1e-9 })).toThrow(/cannot be reached/);
});
