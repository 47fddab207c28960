/** A small invented spec for tests of plan, tables and documents: the partial F test of 3 predictors added to 5.
 *  Check values (M08, M09 of the project's standards, computed there with base distribution functions):
 *  partial R² .06, alpha .05, power .90 need 227 analysed with fixed predictors (power .90133; at 226 .89992) and 235
 *  with sampled ones (power .9004737714; at 234 .8990774). */

export interface NestedChanges {
  predictorValues?: 'fixed' | 'sampled';
  partialR2?: unknown;
  criteria?: Record<string, unknown>;
  find?: string;
  evaluable?: number;
  sample?: Record<string, unknown>;
  sensitivity?: Record<string, unknown>;
  extraAims?: Record<string, unknown>[];
  documents?: Record<string, unknown>[];
  study?: Record<string, unknown>;
}

export function nestedSpec(changes: NestedChanges = {}): Record<string, unknown> {
  const quantity = {
    value: 0.06,
    low: 0.04,
    high: 0.09,
    basis: 'smallest-effect-of-interest',
    note: 'An invented committee judged that less would not justify any change of practice.',
  };
  return {
    samplecase: 1,
    study: {
      title: 'An invented study',
      question: 'Do three measures explain the outcome beyond five others?',
      population: 'Invented adults',
      design: 'Cross-sectional survey',
      ...changes.study,
    },
    aims: [
      {
        id: 'main',
        role: 'primary',
        objective: 'To learn whether three measures explain the outcome beyond five others.',
        outcome: { name: 'an invented outcome', unit: 'points' },
        analysis: 'Partial F test of the three measures.',
        method: 'linear-nested',
        inputs: {
          added: 3,
          adjusted_for: 5,
          predictor_values: changes.predictorValues ?? 'sampled',
          effect: { partial_r2: changes.partialR2 ?? quantity },
        },
        criteria: changes.criteria ?? { alpha: 0.05, power: 0.9 },
        find: changes.find ?? 'sample-size',
        ...(changes.evaluable === undefined ? {} : { evaluable: changes.evaluable }),
      },
      ...(changes.extraAims ?? []),
    ],
    sample: changes.sample ?? {
      counts: 'invited',
      losses: [
        {
          stage: 'declines to take part',
          proportion: { value: 0.12, low: 0.1, high: 0.2, basis: 'routine-data' },
        },
        { stage: 'has no usable measurement', proportion: 0.05 },
      ],
    },
    ...(changes.sensitivity === undefined ? {} : { sensitivity: changes.sensitivity }),
    documents: changes.documents ?? [{ kind: 'ethics' }, { kind: 'appendix' }],
  };
}
