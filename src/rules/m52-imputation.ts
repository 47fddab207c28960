import type { Study } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { mention } from './support/texts.ts';

export const imputation: Rule = {
  id: 'M52',
  level: 'error',
  title: 'Imputation does not replace the people who are missing',
  why: 'For an outcome that is missing at its only time point, imputing from the covariates of the model adds noise and no data. The allowance for losses stays; only auxiliary or earlier measurements recover information, and how much has to be shown.',
  sources: [{ key: 'vonhippel2007', of: 'imputation of missing outcomes' }],
  ground: null,
  checkStudy: (study) => together(null, [waived(study)]),
};

function waived({ sample }: Study): Part | null {
  if (sample.missingData === null || sample.losses.length > 0) return null;
  const found = mention(
    [{ path: 'sample.missing_data', text: sample.missingData }],
    /\b(?:imput\w+|intention[- ]to[- ]treat|carried forward)\b/i,
  );
  if (found === null) return null;
  return {
    path: found.path,
    level: 'error',
    message: `“${found.words}” is planned and no loss is allowed for. Imputation does not replace missing outcomes: state the losses that are expected.`,
  };
}
