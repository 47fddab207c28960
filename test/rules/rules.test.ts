import { describe, expect, test } from 'vitest';
import { check, rules } from '../../src/index.ts';
import { upperFactor } from '../../src/rules/m18-pilot-spread.ts';
import { nestedSpec } from '../support/nested-spec.ts';
import {
  aimOf,
  aimText,
  coefficient,
  interval,
  judged,
  losses,
  NOTE,
  quantity,
  type Spec,
  twoPrimary,
  withTerms,
} from '../support/study.ts';

/** A spec that breaks the rule, and one just on the other side of its threshold. */
const CASES: [finding: string, broken: Spec, kept: Spec][] = [
  ['M01 warning', nestedSpec(losses(0.41)), nestedSpec(losses(0.4))],
  ['M01 note', nestedSpec({ sample: {} }), nestedSpec(losses(0.1))],
  ['M02 warning', nestedSpec(losses(0.1, 0.05, 0.15)), nestedSpec(losses(0.1, 0.05, 0.16))],
  ['M02 note', nestedSpec(losses(0.1, 0.05)), nestedSpec(losses(0.1))],
  [
    'M05 error',
    nestedSpec({ criteria: { alpha: 0.5, power: 0.9 } }),
    nestedSpec({ criteria: { alpha: 0.49, power: 0.9 } }),
  ],
  ['M05 warning', nestedSpec({ find: 'power', evaluable: 18 }), nestedSpec({ find: 'power', evaluable: 19 })],
  [
    'M08 note',
    nestedSpec(),
    aimOf(
      'linear-overall',
      { predictors: 3, effect: { r2: quantity({}) } },
      { criteria: { alpha: 0.05, power: 0.9 } },
    ),
  ],
  [
    'M09 warning',
    aimOf(
      'linear-overall',
      { predictors: 3, effect: { r2: quantity({}) } },
      { criteria: { alpha: 0.05, power: 0.9 } },
    ),
    nestedSpec(),
  ],
  ['M09 note', nestedSpec({ study: { design: 'Randomised experiment' } }), nestedSpec()],
  [
    'M10 warning',
    nestedSpec({ partialR2: quantity({ basis: 'routine-data' }) }),
    nestedSpec({
      partialR2: quantity({
        basis: 'routine-data',
        note: 'The partial R² of the registry after it had been adjusted for eight predictors.',
      }),
    }),
  ],
  ['M11 warning', coefficient({ predictor_r2: 0.81 }), coefficient({ predictor_r2: 0.8 })],
  ['M12 error', withTerms(2), withTerms(3)],
  [
    'M13 warning',
    nestedSpec({
      partialR2: quantity({
        note: 'We planned with 10 people per predictor as the committee had asked for.',
      }),
    }),
    nestedSpec(),
  ],
  [
    'M14 warning',
    nestedSpec({ partialR2: quantity({ value: 0.13, basis: 'convention' }) }),
    nestedSpec({ partialR2: quantity({ value: 0.13 }) }),
  ],
  ['M15 warning', nestedSpec({ partialR2: 0.06 }), nestedSpec({ sample: {} })],
  [
    'M16 warning',
    nestedSpec({ partialR2: quantity({ basis: 'published-estimate', source: { n: 58, studies: 3 } }) }),
    nestedSpec({ partialR2: quantity({ basis: 'published-estimate', source: { n: 59, studies: 3 } }) }),
  ],
  ['M17 warning', nestedSpec({ partialR2: quantity({ basis: 'pilot-data' }) }), nestedSpec()],
  [
    'M18 warning',
    coefficient({ residual_sd: { value: 5, basis: 'pilot-data', note: NOTE, source: { n: 70 } } }),
    coefficient({ residual_sd: { value: 5, basis: 'pilot-data', note: NOTE, source: { n: 71 } } }),
  ],
  [
    'M19 error',
    aimText('To report the post hoc power of the finished study'),
    aimText('To report the estimate of the finished study'),
  ],
  ['M20 note', nestedSpec({ find: 'detectable-effect', evaluable: 235 }), nestedSpec()],
  [
    'M21 warning',
    coefficient({}, { criteria: { alpha: 0.05, power: 0.9, sides: 1 } }),
    coefficient(
      {},
      {
        criteria: {
          alpha: 0.05,
          power: 0.9,
          sides: 1,
          sides_reason: 'A harmful effect would leave practice as it is, so it need not be told from none.',
        },
      },
    ),
  ],
  [
    'M23 warning',
    nestedSpec({ find: 'power', evaluable: 60 }),
    nestedSpec({ find: 'power', evaluable: 200 }),
  ],
  ['M23 note', nestedSpec({ criteria: { alpha: 0.04, power: 0.9 } }), nestedSpec()],
  ['M24 error', twoPrimary({}), twoPrimary({ primary_aims: 'all' })],
  [
    'M24 error',
    twoPrimary({ primary_aims: 'any' }),
    twoPrimary({ primary_aims: 'any' }, { alpha: 0.025, power: 0.9 }),
  ],
  [
    'M24 warning',
    twoPrimary({ primary_aims: 'all' }, { alpha: 0.025, power: 0.9 }),
    twoPrimary({ primary_aims: 'all' }),
  ],
  ['M27 warning', aimText('To learn whether the effect differs between the two subgroups'), nestedSpec()],
  [
    'M31 note',
    interval({ confidence: 0.95, width: 2 }),
    interval({ confidence: 0.95, width: 2, assurance: 0.8 }),
  ],
  [
    'M41 warning',
    aimOf('linear-interaction', {
      kind: 'continuous-binary',
      adjusted_for: 1,
      predictor_values: 'sampled',
      predictor_reliability: 0.69,
      effect: { f2: quantity({}) },
    }),
    aimOf('linear-interaction', {
      kind: 'continuous-binary',
      adjusted_for: 1,
      predictor_values: 'sampled',
      predictor_reliability: 0.7,
      effect: { f2: quantity({}) },
    }),
  ],
  [
    'M52 error',
    nestedSpec({ sample: { missing_data: 'Missing outcomes are imputed.' } }),
    nestedSpec({
      sample: {
        missing_data: 'Missing outcomes are imputed.',
        losses: [{ stage: 'drops out', proportion: 0.1 }],
      },
    }),
  ],
  [
    'M54 warning',
    nestedSpec({ sample: { recruitment: { eligible_per_month: 23, months: 10 } } }),
    nestedSpec({ sample: { recruitment: { eligible_per_month: 24, months: 10 } } }),
  ],
  [
    'M54 note',
    nestedSpec({ documents: [{ kind: 'grant' }] }),
    nestedSpec({ documents: [{ kind: 'ethics' }] }),
  ],
];

describe('each rule on both sides of its threshold', () => {
  test.each(CASES)('%s', (finding, broken, kept) => {
    expect(judged(broken).found).toContain(finding);
    const [rule = '', level = ''] = finding.split(' ');
    const same = judged(kept).found.filter((one) => one === `${rule} ${level}`);
    if (rule === 'M15') expect(judged(kept).message('M15')).not.toContain('partial R²');
    else expect(same).toEqual([]);
  });
});

describe('what the messages say', () => {
  test.each([
    [
      'M02',
      nestedSpec(losses(0.1, 0.1)),
      'The 2 stages together lose 19 %, not the 20 % of their sum, because each acts on those whom the stages before it left.',
    ],
    [
      'M08',
      nestedSpec({ predictorValues: 'fixed' }),
      'Noncentrality is taken as f²·n. Under the older convention f²·(u + v + 1), with fixed predictors, 231 would have to be analysed; the number here is 227.',
    ],
    [
      'M09',
      {
        ...nestedSpec(),
        aims: [
          {
            ...(nestedSpec().aims as Spec[])[0],
            inputs: { added: 3, adjusted_for: 5, effect: { partial_r2: quantity({}) } },
          },
        ],
      },
      'It is not stated whether the values of the predictors are set by the design or observed; they are treated as sampled. State predictor_values: fixed or sampled.',
    ],
    [
      'M11',
      coefficient({ predictor_r2: 0.9 }),
      'The other predictors explain .9 of this one, which multiplies the number by 10. Ask whether its own contribution can be told from theirs at all, or test them together.',
    ],
    [
      'M12',
      withTerms(2),
      'The terms listed as tested take 2 parameters, and the inputs say 3. A factor of k levels counts k − 1: give parameters with each term, or correct the count.',
    ],
    [
      'M24',
      twoPrimary({}),
      'There are 2 primary tests, and it is not stated whether the study succeeds only if all do or if any does. State primary_aims: all or any.',
    ],
    [
      'M02',
      nestedSpec(losses(0.1, 0.05, 0.15)),
      'The loss at “stage 2” (15 %) is the sum of the other stages, so the same people seem to be lost twice. Leave out the total, or the parts. The 3 stages together lose 27.3 %, not the 30 % of their sum, because each acts on those whom the stages before it left.',
    ],
    [
      'M14',
      nestedSpec({ partialR2: quantity({ value: 0.13, basis: 'convention' }) }),
      'The partial R² (.13) is one of the conventional size labels and has no other basis. Say what it means in units of the outcome, and who needs to find an effect of that size and why.',
    ],
    [
      'M17',
      nestedSpec({ partialR2: quantity({ basis: 'pilot-data' }) }),
      'The partial R² (.06) is taken from pilot data. Plan for the smallest effect that would matter, and use the pilot for spread and losses.',
    ],
    [
      'M18',
      coefficient({ residual_sd: { value: 5, basis: 'pilot-data', note: NOTE, source: { n: 12 } } }),
      'The residual standard deviation comes from 12 people. At its upper one-sided 80 % limit, 6.27, 526 instead of 337 would have to be analysed. Plan with a larger value, or answer why this one is trusted.',
    ],
    [
      'M24',
      twoPrimary({ primary_aims: 'any' }),
      'Any of 2 primary tests may count as success, and their significance levels add up to .100. Divide .050 among them and state the divided level as alpha of each.',
    ],
    [
      'M31',
      interval({ confidence: 0.95, width: 2 }),
      'The expected width is planned, so about half of such studies end with a wider interval. Add assurance: .80 to plan for a width that four in five studies keep, which needs 145 analysed instead of 128.',
    ],
    [
      'M52',
      nestedSpec({ sample: { missing_data: 'Missing outcomes are imputed.' } }),
      '“imputed” is planned and no loss is allowed for. Imputation does not replace missing outcomes: state the losses that are expected.',
    ],
  ] as [string, Spec, string][])('%s', (rule, spec, message) => {
    expect(judged(spec).message(rule)).toBe(message);
  });

  test('a bare number is allowed, and reported as having no basis stated', () => {
    const { found, message } = judged(nestedSpec({ partialR2: 0.06 }));
    expect(found.filter((one) => one.endsWith('error'))).toEqual([]);
    expect(message('M15')).toContain('no basis stated');
  });
});

describe('check values', () => {
  // M18 of the project's standards, computed there with base distribution functions.
  test.each([
    [11, 0.8, 1.255],
    [11, 0.95, 1.551],
    [19, 0.8, 1.177],
    [29, 0.95, 1.28],
    [69, 0.8, 1.082],
  ])('upper limit of a standard deviation with %d degrees of freedom', (df, coverage, factor) => {
    expect(upperFactor(df, coverage)).toBeCloseTo(factor, 3);
  });

  test('two independent primary tests of .90 have .81 together, and never less than .80 (M24)', () => {
    const message = judged(twoPrimary({ primary_aims: 'all' })).message('M24');
    expect(message).toMatch(/is \.81\d if they are independent, and never below \.80\d/);
  });
});

describe('answers', () => {
  const answered = (rule: string, reason: string) => ({
    ...nestedSpec({ partialR2: quantity({ basis: 'pilot-data' }) }),
    acknowledge: [{ rule, reason }],
  });

  test('answer a warning, and keep the reason', () => {
    const { problems } = check(answered('M17', 'No better value is to be had.'));
    expect(problems.find(({ code }) => code === 'M17')).toMatchObject({
      level: 'note',
      acknowledged: 'No better value is to be had.',
    });
  });

  test('to a warning that nobody gives are pointed out', () => {
    const { message } = judged(answered('M41', 'There is nothing to answer.'));
    expect(message('M41')).toBe('M41 is answered here, but does not warn. Leave the answer out.');
  });

  test('do not answer an error', () => {
    const { found } = judged({ ...twoPrimary({}), acknowledge: [{ rule: 'M24', reason: 'It is fine.' }] });
    expect(found).toContain('M24 error');
  });
});

describe('the list of rules', () => {
  test('holds at least 20, each once, in order, with a reason and a source or a ground', () => {
    const ids = rules.map(({ id }) => id);
    expect(ids.length).toBeGreaterThanOrEqual(20);
    expect(ids).toEqual([...new Set(ids)].sort());
    for (const rule of rules) {
      expect(rule.why.split(' ').length).toBeGreaterThan(20);
      expect(rule.sources.length > 0 || rule.ground !== null).toBe(true);
    }
  });

  test('has a case for every rule but those that other tests cover', () => {
    const covered = new Set(CASES.map(([finding]) => finding.split(' ')[0]));
    expect(rules.map(({ id }) => id).filter((id) => !covered.has(id))).toEqual(['M50']);
  });

  test('M50: an aim of prediction is not sized by a test', () => {
    expect(judged(aimText('To develop a prediction model for the outcome')).found.join()).toMatch(/M50/);
    expect(judged(nestedSpec()).found.join()).not.toMatch(/M50/);
  });
});
