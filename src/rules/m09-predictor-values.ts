import type { Aim, Study } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { isExperiment, predictorValues } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';

export const predictorsSetOrObserved: Rule = {
  id: 'M09',
  level: 'warning',
  title: 'The spec says whether predictor values are set or observed',
  why: 'Where predictors are observed together with the outcome, power is an average over their distribution; where the design sets them, it is that of the values chosen. The difference is small for moderate numbers and grows with the number of predictors, but a reader cannot know which was computed unless it is said.',
  sources: [{ key: 'gatsonis1989', of: 'the two powers and how far they differ' }],
  ground: null,
  checkStudy: (study) =>
    study.aims.flatMap((aim) => together(aim.id, [unstated(aim), setByDesign(aim, study)])),
};

function unstated(aim: Aim): Part | null {
  if (predictorValues(aim) !== undefined) return null;
  return {
    path: `aims[${aim.index}].inputs`,
    level: 'warning',
    message:
      'It is not stated whether the values of the predictors are set by the design or observed; they are treated as sampled. State predictor_values: fixed or sampled.',
  };
}

function setByDesign(aim: Aim, study: Study): Part | null {
  if (predictorValues(aim) !== 'sampled' || !isExperiment(study)) return null;
  return {
    path: `aims[${aim.index}].inputs.predictor_values`,
    level: 'note',
    message:
      'The study is an experiment, and the predictors are treated as sampled. If the design sets the values of those that are tested, state fixed.',
  };
}
