import { describe, expect, it } from 'vitest';
import type { Problem } from '../../src/problem.ts';
import { parseSpec } from '../../src/spec/parse.ts';
import { changed, validAim, validSpec } from './valid-spec.ts';

type Path = readonly (string | number)[];

function problemsOf(spec: unknown): Problem[] {
  return parseSpec(JSON.stringify(spec)).problems;
}

/** The spec with several places changed. */
function with_(...changes: readonly (readonly [Path, unknown])[]): unknown {
  return changes.reduce((spec, [path, value]) => changed(path, value, spec), validSpec());
}

const aim = (change: object): object => ({ ...validAim(), ...change });
const NO_MAXIMUM = [['sample', 'maximum'], undefined] as const;
const interval = {
  method: 'linear-r2-precision',
  inputs: { predictors: 5, effect: { r2: 0.3 } },
  criteria: { confidence: 0.95, width: 0.2 },
};
const power = { find: 'power', criteria: { alpha: 0.05 } };

describe('a spec without contradiction', () => {
  it('has no problem', () => {
    expect(problemsOf(validSpec())).toEqual([]);
  });

  it.each<[string, unknown]>([
    ['aims with ids of their own', with_([['aims'], [validAim(), aim({ id: 'other' })]])],
    ['documents of different kinds', with_([['documents'], [{ kind: 'grant' }, { kind: 'ethics' }]])],
    [
      'low, value and high that are equal',
      with_([['aims', 0, 'inputs', 'effect', 'partial_r2'], { value: 0.1, low: 0.1, high: 0.1 }]),
    ],
    ['power just above alpha', with_([['aims', 0, 'criteria'], { alpha: 0.05, power: 0.0500001 }])],
    ['power found without a target', with_([['aims', 0], aim(power)])],
    ['power found from the maximum', with_([['aims', 0], aim(power)])],
    ['power found at a number analysed', with_([['aims', 0], aim({ ...power, evaluable: 100 })], NO_MAXIMUM)],
    [
      'power found beside an aim that finds the sample size',
      with_([['aims'], [validAim(), aim({ ...power, id: 'b' })]], NO_MAXIMUM),
    ],
    ['as many analysed as can be had', with_([['aims', 0], aim({ ...power, evaluable: 400 })])],
    [
      'no effect where the detectable effect is sought',
      with_([['aims', 0], aim({ find: 'detectable-effect', inputs: { added: 1, adjusted_for: 0 } })]),
    ],
    [
      'a form without its leading key where the detectable effect is sought',
      with_([
        ['aims', 0],
        aim({
          find: 'detectable-effect',
          inputs: { added: 1, adjusted_for: 0, effect: { r2_reduced: 0.2 } },
        }),
      ]),
    ],
    [
      'a whole form where the detectable effect is sought',
      with_([['aims', 0], aim({ find: 'detectable-effect' })]),
    ],
    [
      'tables of possible effects and powers',
      with_([['sensitivity'], { effects: [0.01, 0.99], targets: [0.5, 0.999], losses: [0, 0.5] }]),
    ],
    [
      'an interval that needs no power, and tables of any width',
      with_([['aims', 0], aim(interval)], [['sensitivity'], { targets: [5] }]),
    ],
    ['an acknowledgement of any aim', with_([['acknowledge'], [{ rule: 'M14', reason: 'So.' }]])],
  ])('%s', (_, spec) => {
    expect(problemsOf(spec)).toEqual([]);
  });
});

describe('a contradiction is one problem at its place', () => {
  it.each<[string, unknown, string, RegExp]>([
    [
      'two aims with one id',
      with_([['aims'], [validAim(), validAim()]]),
      'aims[1].id',
      /called "boredom" already/,
    ],
    [
      'two documents of one kind',
      with_([['documents'], [{ kind: 'grant' }, { kind: 'grant' }]]),
      'documents[1].kind',
      /asked for already/,
    ],
    [
      'two references with one id',
      with_([['references'], [{ id: 'harbour2020' }, { id: 'harbour2020' }]]),
      'references[1].id',
      /Two references/,
    ],
    [
      'a citation that leads nowhere',
      with_([['references'], []]),
      'sample.losses[0].proportion.cite[0]',
      /No reference has the id "harbour2020"\. Add it/,
    ],
    [
      'a citation that is nearly one',
      with_([['references', 0, 'id'], 'harbour2021']),
      'sample.losses[0].proportion.cite[0]',
      /Did you mean "harbour2021"\?/,
    ],
    [
      'an answer for no aim',
      with_([['acknowledge', 0, 'aim'], 'boredoom']),
      'acknowledge[0].aim',
      /Did you mean "boredom"\?/,
    ],
    [
      'low above the value',
      with_([['aims', 0, 'inputs', 'effect', 'partial_r2', 'low'], 0.061]),
      'aims[0].inputs.effect.partial_r2.low',
      /low 0\.061 above the value 0\.06/,
    ],
    [
      'high below the value',
      with_([['aims', 0, 'inputs', 'effect', 'partial_r2', 'high'], 0.059]),
      'aims[0].inputs.effect.partial_r2.high',
      /high 0\.059 below/,
    ],
    [
      'a loss out of its range',
      with_([['sample', 'losses', 0, 'proportion'], { value: 0.1, high: 0.05 }]),
      'sample.losses[0].proportion.high',
      /high 0\.05 below/,
    ],
    [
      'power equal to alpha',
      with_([['aims', 0, 'criteria'], { alpha: 0.05, power: 0.05 }]),
      'aims[0].criteria.power',
      /larger than alpha/,
    ],
    [
      'a sample size sought without a target',
      with_([['aims', 0, 'criteria'], { alpha: 0.05 }]),
      'aims[0].criteria.power',
      /The sample size follows/,
    ],
    [
      'a detectable effect sought without a target',
      with_([['aims', 0], aim({ find: 'detectable-effect', criteria: { alpha: 0.05 } })]),
      'aims[0].criteria.power',
      /The detectable effect follows/,
    ],
    [
      'a sample size sought and given',
      with_([['aims', 0, 'evaluable'], 100]),
      'aims[0].evaluable',
      /find asks for it/,
    ],
    [
      'power sought at no number',
      with_([['aims', 0], aim(power)], NO_MAXIMUM),
      'aims[0].evaluable',
      /number of people is missing/,
    ],
    [
      'more analysed than can be had',
      with_([['aims', 0], aim({ ...power, evaluable: 401 })]),
      'aims[0].evaluable',
      /401 analysed, but sample\.maximum is 400/,
    ],
    [
      'an effect in the tables that cannot be',
      with_([['sensitivity'], { effects: [0.05, 1] }]),
      'sensitivity.effects[1]',
      /partial R², cannot be/,
    ],
    [
      'a power in the tables that cannot be',
      with_([['sensitivity'], { targets: [0.8, 1] }]),
      'sensitivity.targets[1]',
      /less than 1\.$/,
    ],
    [
      'no effect where one is needed',
      with_([['aims', 0, 'inputs'], { added: 1, adjusted_for: 0 }]),
      'aims[0].inputs.effect',
      /No effect is stated/,
    ],
    [
      'a form without its leading key where it is needed',
      with_([['aims', 0, 'inputs', 'effect'], { r2_reduced: 0.1 }]),
      'aims[0].inputs.effect',
      /Found r2_reduced, which is not a whole form: add r2_full\./,
    ],
    [
      'a path that is no JSON file',
      with_([['references'], 'refs.yaml']),
      'references',
      /path of a \.json file/,
    ],
  ])('%s', (_, spec, path, message) => {
    const problems = problemsOf(spec);
    expect(problems.map((problem) => problem.path)).toEqual([path]);
    expect(problems[0]?.message).toMatch(message);
    expect(problems[0]?.level).toBe('error');
  });
});
