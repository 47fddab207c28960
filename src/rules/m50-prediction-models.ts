import type { Rule } from './rule.ts';
import { isTest } from './support/aim.ts';
import { together } from './support/findings.ts';
import { mention } from './support/texts.ts';

const MODEL =
  /\b(?:prediction|predictive|prognostic|risk[\s-]prediction) (?:model|rule|tool|equation|score)s?\b|\brisk (?:score|calculator)s?\b|\bpredict (?:individual|future|which|who|whether)\b/i;
const VERB = /\bpredict(?:s|ed|ing|ion|ions|ive)?\b/i;

export const predictionModels: Rule = {
  id: 'M50',
  level: 'error',
  title: 'A prediction model is not sized by a test',
  why: 'A model can pass every test and still predict badly: what has to be controlled in development is overfitting and the error of the predictions, and in evaluation the precision of calibration and discrimination. Each has a calculation of its own, from the number of candidate parameters and the variance the model will explain.',
  sources: [
    { key: 'riley2019a', of: 'number of people for developing a model of a continuous outcome' },
    { key: 'riley2020', of: 'the aims that the number for developing a prediction model must meet' },
  ],
  ground: null,
  checkStudy: ({ aims }) =>
    aims.filter(isTest).flatMap((aim) => {
      const objective = [{ path: `aims[${aim.index}].objective`, text: aim.objective }];
      const model = mention(objective, MODEL);
      const found = model ?? mention(objective, VERB);
      if (found === null) return [];
      const { path, words } = found;
      const part =
        model !== null
          ? {
              path,
              level: 'error' as const,
              message: `The objective speaks of “${words}”, and the aim is sized by the power of a test. A test says nothing about how well individuals are predicted: size the aim by criteria for prediction models, or state the association that is tested.`,
            }
          : {
              path,
              level: 'warning' as const,
              message: `The objective says “${words}”, and the aim is sized by the power of a test. If a relation is meant, write “is related to” or “explains”; if prediction of individuals is meant, a test does not size it.`,
            };
      return together(aim.id, [part]);
    }),
};
