import { describe, expect, test } from 'vitest';
import { nestedSpec } from '../support/nested-spec.ts';
import { aimText, interval, judged, losses, quantity, twoPrimary } from '../support/study.ts';

const isFound = (finding: string, spec: Record<string, unknown>) => judged(spec).found.includes(finding);
const noted = (note: string) => nestedSpec({ partialR2: quantity({ note }) });

describe('words that a rule looks for', () => {
  test.each([
    'We planned with 10 per variable, as is usual in our field.',
    'The committee asked for thirty per group and for no more than that.',
    'We took ten events per candidate parameter from an earlier protocol.',
    'The number follows from 50 + 8 times the number of predictors.',
    'The number follows from 104 + the number of predictors tested.',
  ])('M13 knows the head count of: %s', (note) => {
    expect(isFound('M13 warning', noted(note))).toBe(true);
  });

  test.each([
    'The committee did not use 10 per variable but asked for an effect worth finding.',
    'Each of the 30 wards reported the effect that would change its own practice.',
  ])('M13 leaves alone: %s', (note) => {
    expect(isFound('M13 warning', noted(note))).toBe(false);
  });

  test.each([
    'To learn whether age moderates the association',
    'To learn whether clubs moderate the association',
    'To learn whether age and training interact',
    'To compare the association among subgroups',
  ])('M27 takes as a difference of effects: %s', (objective) => {
    expect(isFound('M27 warning', aimText(objective))).toBe(true);
  });

  test.each([
    'To find a moderate association',
    'To evaluate an interactive course',
    'To learn whether moderately warm rooms matter',
  ])('M27 does not take as one: %s', (objective) => {
    expect(isFound('M27 warning', aimText(objective))).toBe(false);
  });
});

describe('a size label', () => {
  const without = (value: number) => nestedSpec({ partialR2: { value, note: 'No basis is known for it.' } });

  // A label .13 is met within half a unit of its last digit.
  test.each([
    [0.126, true],
    [0.134, true],
    [0.124, false],
    [0.136, false],
  ])('a partial R² of %d without a basis: label %s', (value, isLabel) => {
    expect(isFound('M14 warning', without(value))).toBe(isLabel);
  });

  test('as a value with another basis is none', () => {
    expect(isFound('M14 warning', nestedSpec({ partialR2: quantity({ value: 0.13 }) }))).toBe(false);
  });
});

describe('an effect that equals the detectable one (M20)', () => {
  // Detectable at 235 analysed, power .90, is just below .06, at which 235 is the smallest number (check value M09).
  const given = (value: number, basis: string) =>
    nestedSpec({ find: 'power', evaluable: 235, partialR2: quantity({ value, basis }) });

  test('is questioned when it is said to come from elsewhere', () => {
    const found = [0.0596, 0.0597, 0.0598, 0.0599, 0.06].filter((value) =>
      isFound('M20 warning', given(value, 'expert-judgement')),
    );
    expect(found.length).toBeGreaterThan(0);
    expect(found.length).toBeLessThan(3);
    const [value = 0] = found;
    expect(isFound('M20 warning', given(value, 'smallest-effect-of-interest'))).toBe(false);
  });
});

describe('several primary tests (M24)', () => {
  const two = (primary_aims: string, alpha: number, power = 0.8) =>
    twoPrimary({ primary_aims }, { alpha, power });

  test('levels rounded to the third decimal count as divided', () => {
    expect(isFound('M24 error', two('any', 0.0255))).toBe(false);
    expect(isFound('M24 error', two('any', 0.026))).toBe(true);
    expect(isFound('M24 warning', two('all', 0.0251))).toBe(true);
    expect(isFound('M24 warning', two('all', 0.01))).toBe(false);
  });

  test('two of .80 have .64 together if independent, and at least .60', () => {
    expect(judged(two('all', 0.05)).message('M24')).toMatch(/is \.6[45]\d if .*, and never below \.6[01]\d/);
  });
});

describe('error rates (M23)', () => {
  const at = (n: number) => judged(nestedSpec({ find: 'power', evaluable: n }));

  test('below .80 the chance of missing is told in words, below one half it is a warning', () => {
    expect(at(150).found).toContain('M23 note');
    expect(at(150).message('M23')).toMatch(
      /^With 150 analysed the power is \.\d{3}: a true effect of this size would be missed about .* in .* times\.$/,
    );
    expect(at(60).found).toContain('M23 warning');
  });

  test.each([0.05, 0.025, 0.01, 0.005, 0.001])('alpha %d is usual', (alpha) => {
    expect(isFound('M23 note', nestedSpec({ criteria: { alpha, power: 0.9 } }))).toBe(false);
  });
});

describe('an effect from a publication (M16)', () => {
  const published = (source: object, basis = 'published-estimate') =>
    isFound('M16 warning', nestedSpec({ partialR2: quantity({ basis, source }) }));

  test('is questioned from a single study, however large, and from one of unknown size', () => {
    expect(published({ n: 5000, studies: 1 })).toBe(true);
    expect(published({ studies: 4 })).toBe(true);
    expect(published({ n: 5000, studies: 4 })).toBe(false);
  });

  test('is not questioned from a meta-analysis', () => {
    expect(published({ n: 5000, studies: 9 }, 'meta-analysis')).toBe(false);
  });
});

describe('an interval (M31)', () => {
  test('is told the number for the assured width', () => {
    const wide = interval({ confidence: 0.95, width: 2 });
    const match = /needs (\d+) analysed instead of (\d+)\.$/.exec(judged(wide).message('M31'));
    const [assured, expected] = [Number(match?.[1]), Number(match?.[2])];
    expect(assured).toBeGreaterThan(expected);
    expect(assured).toBeLessThan(expected * 1.25);
  });
});

describe('losses', () => {
  test('several large stages are each questioned', () => {
    const { found } = judged(nestedSpec(losses(0.5, 0.45)));
    expect(found.filter((one) => one === 'M01 warning')).toHaveLength(2);
  });
});
