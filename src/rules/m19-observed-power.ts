import { listed } from '../spec/shown.ts';
import type { Aim, Study } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { isTest, leadingOf } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { mention, notesOf, purposeOf } from './support/texts.ts';

const OBSERVED_POWER =
  /\b(?:post[\s-]?hoc|achieved|observed|retrospective)(?: statistical)? power\b|\bpower (?:was |is )?(?:achieved|observed)\b/i;

/** The study's own result, given as the source of an effect. */
const OWN_RESULT =
  /\b(?:this|our|the present|the current|the same|the completed) (?:own )?(?:study|survey|trial|sample|data|analysis)\b|\bour (?:own )?(?:result|estimate|finding)s?\b/i;

export const observedPower: Rule = {
  id: 'M19',
  level: 'error',
  title: 'No power is computed from the effect just observed',
  why: 'For a given test the power at the observed effect is the p value on another scale: a result that is not significant always looks underpowered, and p = .05 in a two-sided normal test always gives .50. Once data are in, intervals say what is known. Power for an effect that was fixed from outside the data remains a fair question, and so does planning a new study from old data.',
  sources: [{ key: 'hoenig2001', of: 'observed power as a function of the p value' }],
  ground: null,
  checkStudy: (study) =>
    study.aims.flatMap((aim) => together(aim.id, [inWords(aim), ownEffect(aim, study), tooLate(aim, study)])),
};

function inWords(aim: Aim): Part | null {
  const found = mention([...purposeOf(aim), ...notesOf(aim)], OBSERVED_POWER);
  if (found === null) return null;
  return {
    path: found.path,
    level: 'error',
    message: `The text speaks of “${found.words}”. Power at the observed effect repeats the p value and adds nothing. Report the estimate with its interval, or the power for an effect fixed from outside the data.`,
  };
}

/** Power asked for when data are in, for an effect that is, or may be, their own. */
function ownEffect(aim: Aim, { dataCollection, sample }: Study): Part | null {
  const hasData = dataCollection === 'complete' || dataCollection === 'started';
  const effect = leadingOf(aim);
  if (!hasData || aim.find !== 'power' || !isTest(aim) || effect === null) return null;
  const state = `Data collection is ${dataCollection === 'complete' ? 'complete' : 'under way'}`;
  const { basis, note, source, path } = effect;
  const isSameNumber = source.n !== null && [aim.evaluable, sample.maximum].includes(source.n);
  const isOwn = note !== null && mention([{ path, text: note }], OWN_RESULT) !== null;
  if (isOwn || (isSameNumber && basis !== 'meta-analysis')) {
    const why = listed(
      [
        ...(isOwn ? ['its note names this study'] : []),
        ...(isSameNumber ? [`its source has the same ${source.n} people`] : []),
      ],
      'and',
    );
    return {
      path,
      level: 'error',
      message: `${state}, and power is asked for the effect of these same data: ${why}. That power repeats the p value. Report the estimate with its interval, or take an effect fixed from outside the data.`,
    };
  }
  if (basis !== null && basis !== 'pilot-data') return null;
  return {
    path,
    level: 'warning',
    message: `${state}, and power is asked for an effect ${basis === null ? 'without a basis' : 'from pilot data'}. If these data suggested it, that power repeats the p value: take an effect fixed from outside the data, or say that this one is.`,
  };
}

function tooLate(aim: Aim, { dataCollection }: Study): Part | null {
  if (dataCollection !== 'complete' || aim.find !== 'sample-size') return null;
  return {
    path: `aims[${aim.index}].find`,
    level: 'warning',
    message: `Data collection is complete, so the number cannot be chosen any more. Give evaluable, the number there is, and find ${isTest(aim) ? 'the power or the detectable effect' : 'the width'} at it.`,
  };
}
