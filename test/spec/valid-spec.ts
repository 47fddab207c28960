/** A valid spec for tests to bend. Invented. */

export interface AnySpec {
  [key: string]: unknown;
}

/** A fresh copy each time, so that a test can change it. */
export function validSpec(): AnySpec {
  return {
    samplecase: 1,
    study: {
      title: 'Tide tables and boredom',
      question: 'Do tide tables explain boredom beyond age?',
      population: 'Harbour pilots',
      design: 'Cross-sectional survey',
    },
    aims: [validAim()],
    sample: {
      maximum: 400,
      losses: [
        { stage: 'declines', proportion: { value: 0.1, low: 0.05, high: 0.2, cite: ['harbour2020'] } },
      ],
    },
    documents: [{ kind: 'ethics' }, { kind: 'appendix' }],
    references: [{ id: 'harbour2020', type: 'report', title: 'Invented harbour records' }],
    acknowledge: [{ rule: 'M14', reason: 'It is invented.', aim: 'boredom' }],
  };
}

export function validAim(): AnySpec {
  return {
    id: 'boredom',
    role: 'primary',
    objective: 'To learn whether tide tables explain boredom',
    outcome: { name: 'boredom', unit: 'points' },
    analysis: 'Partial F test in a linear regression',
    method: 'linear-nested',
    inputs: {
      added: 3,
      adjusted_for: 5,
      predictor_values: 'sampled',
      effect: { partial_r2: { value: 0.06, low: 0.04, high: 0.09, basis: 'pilot-data' } },
    },
    criteria: { alpha: 0.05, power: 0.9 },
    find: 'sample-size',
  };
}

/** The spec with one place changed; `undefined` removes it. */
export function changed(path: readonly (string | number)[], value: unknown, spec = validSpec()): AnySpec {
  let holder: unknown = spec;
  for (const segment of path.slice(0, -1)) holder = (holder as AnySpec)[segment];
  const key = path.at(-1) ?? '';
  if (value === undefined) delete (holder as AnySpec)[key];
  else (holder as AnySpec)[key] = value;
  return spec;
}
