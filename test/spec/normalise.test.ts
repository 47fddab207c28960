import { describe, expect, it } from 'vitest';
import { parseSpec } from '../../src/spec/parse.ts';
import type { Study } from '../../src/spec/study.ts';
import { type AnySpec, changed, validAim, validSpec } from './valid-spec.ts';

function studyOf(spec: AnySpec): Study {
  const { study, problems } = parseSpec(JSON.stringify(spec));
  expect(problems).toEqual([]);
  if (!study) throw new Error('no study');
  return study;
}

describe('the normalised study', () => {
  it('states what the author stated, and null for what is not', () => {
    const study = studyOf(validSpec());
    expect(study).toMatchObject({
      title: 'Tide tables and boredom',
      risk: 'minimal',
      burden: null,
      dataCollection: null,
      reviewer: null,
      primaryAims: null,
      sensitivity: { effects: null, targets: null, losses: null },
      documents: [
        { kind: 'ethics', formats: ['markdown', 'html'], words: null, citations: 'apa' },
        { kind: 'appendix', formats: ['markdown', 'html'], words: null, citations: 'apa' },
      ],
      acknowledge: [{ rule: 'M14', reason: 'It is invented.', aim: 'boredom' }],
    });
    expect(study.aims[0]).toMatchObject({
      index: 0,
      id: 'boredom',
      outcome: { name: 'boredom', unit: 'points', instrument: null, time: null },
      effectKeys: ['partial_r2'],
      terms: {},
      criteria: {
        alpha: 0.05,
        power: 0.9,
        sides: null,
        sidesReason: null,
        confidence: null,
        width: null,
        assurance: null,
      },
      evaluable: null,
    });
  });

  it('makes a quantity of a number alone, with no basis', () => {
    const [aim] = studyOf(changed(['aims', 0, 'inputs', 'effect'], { partial_r2: 0.1 })).aims;
    expect(aim?.quantities.partial_r2).toEqual({
      path: 'aims[0].inputs.effect.partial_r2',
      key: 'partial_r2',
      title: 'partial R²',
      symbol: 'R²ₚ',
      unit: '',
      range: { minimum: 0, maximum: 1, minimumIncluded: false, maximumIncluded: false },
      value: 0.1,
      low: null,
      high: null,
      basis: null,
      cite: [],
      note: null,
      source: { n: null, studies: null },
    });
  });

  it('keeps everything said about a quantity', () => {
    const written = {
      value: 0.2,
      low: 0.1,
      high: 0.3,
      basis: 'pilot-data',
      cite: ['harbour2020'],
      note: 'Small.',
      source: { n: 30, studies: 1 },
    };
    const [aim] = studyOf(changed(['aims', 0, 'inputs', 'effect'], { partial_r2: written })).aims;
    expect(aim?.quantities.partial_r2).toMatchObject(written);
  });

  it('lists the keys of the form in the order of the schema, whatever the order in the file', () => {
    const study = studyOf(changed(['aims', 0, 'inputs', 'effect'], { r2_reduced: 0.1, r2_full: 0.2 }));
    expect(study.aims[0]?.effectKeys).toEqual(['r2_full', 'r2_reduced']);
    expect(Object.keys(study.aims[0]?.quantities ?? {})).toEqual(['r2_full', 'r2_reduced']);
  });

  it('names the form of which only the leading key is left to find', () => {
    const inputs = { added: 3, adjusted_for: 5, effect: { r2_reduced: 0.1 } };
    const study = studyOf(changed(['aims', 0], { ...validAim(), inputs, find: 'detectable-effect' }));
    expect(study.aims[0]?.effectKeys).toEqual(['r2_full', 'r2_reduced']);
    expect(Object.keys(study.aims[0]?.quantities ?? {})).toEqual(['r2_reduced']);
  });

  it('has two sides where the method has sides and none are stated', () => {
    const inputs = { adjusted_for: 2, effect: { partial_correlation: 0.3 } };
    const sided = { ...validAim(), method: 'linear-coefficient', inputs };
    const sidesOf = (criteria: object): unknown => {
      const { sides, sidesReason } =
        studyOf(changed(['aims', 0], { ...sided, criteria })).aims[0]?.criteria ?? {};
      return { sides, sidesReason };
    };
    expect(sidesOf({ alpha: 0.05, power: 0.9 })).toEqual({ sides: 2, sidesReason: null });
    expect(sidesOf({ alpha: 0.05, power: 0.9, sides: 1, sides_reason: 'So.' })).toEqual({
      sides: 1,
      sidesReason: 'So.',
    });
  });

  it.each([
    [0.95, 0.05],
    [0.9, 0.1],
    [0.99, 0.01],
    [0.999, 0.001],
    [0.8, 0.2],
  ])('an interval of confidence %d has alpha %d, to the last digit', (confidence, alpha) => {
    const aim = {
      ...validAim(),
      method: 'linear-r2-precision',
      inputs: { predictors: 5, effect: { r2: 0.3 } },
      criteria: { confidence, width: 0.2, assurance: 0.8 },
    };
    expect(studyOf(changed(['aims', 0], aim)).aims[0]?.criteria).toEqual({
      alpha,
      power: null,
      sides: null,
      sidesReason: null,
      confidence,
      width: 0.2,
      assurance: 0.8,
    });
  });

  it('counts a term as one parameter unless it says more', () => {
    const terms = { tested: [{ name: 'tide' }], adjusted_for: [{ name: 'port', parameters: 4 }] };
    expect(studyOf(changed(['aims', 0, 'terms'], terms)).aims[0]?.terms).toEqual({
      tested: [{ name: 'tide', parameters: 1 }],
      adjusted_for: [{ name: 'port', parameters: 4 }],
    });
  });

  it('fills in the sample', () => {
    const { sample } = studyOf(
      changed(
        ['sample'],
        { recruitment: { eligible_per_month: 12, months: 6 } },
        changed(['references'], []),
      ),
    );
    expect(sample).toEqual({
      unit: 'participants',
      counts: 'enrolled',
      maximum: null,
      losses: [],
      recruitment: { sites: 1, eligiblePerMonth: 12, consent: 1, months: 6, startUpMonths: 0 },
      missingData: null,
    });
  });
});

describe('the hash of a spec', () => {
  it('is the same for YAML and JSON, and for any order of keys', () => {
    const spec = validSpec();
    const reversed = Object.fromEntries(Object.entries(spec).reverse());
    const yaml = `# a comment\n${Object.entries(spec)
      .map(([key, value]) => `${key}: ${JSON.stringify(value)}`)
      .join('\n')}\n`;
    const { hash } = studyOf(spec);
    expect(hash).toMatch(/^[0-9a-f]{64}$/);
    expect(studyOf(reversed).hash).toBe(hash);
    expect(parseSpec(yaml).study?.hash).toBe(hash);
  });

  it('changes with any value', () => {
    expect(studyOf(changed(['study', 'title'], 'Another')).hash).not.toBe(studyOf(validSpec()).hash);
  });

  it('is that of the references themselves when a file holds them', () => {
    const spec = validSpec();
    const items = JSON.stringify(spec.references);
    const { study } = parseSpec(JSON.stringify({ ...spec, references: 'refs.json' }), {
      readReferences: () => items,
    });
    expect(study?.hash).toBe(studyOf(spec).hash);
  });
});
