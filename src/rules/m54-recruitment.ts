import type { StudyPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { shownComputed, shownNumber, shownPercent } from './support/numbers.ts';

/** Consent above this needs a source; common practice, no source. */
const OPTIMISTIC_CONSENT = 0.8;

export const recruitment: Rule = {
  id: 'M54',
  level: 'warning',
  title: 'So many people can be recruited in the time',
  why: 'About half of publicly funded trials reach their target and as many are extended. Whether that many eligible people turn up, and say yes, is part of the justification.',
  sources: [
    { key: 'sully2013', of: 'how many trials reach their target' },
    { key: 'walters2017', of: 'recruitment and retention in a later series' },
  ],
  ground: null,
  checkPlan: (plan) => together(null, [tooSlow(plan), consent(plan), unstated(plan)]),
};

function tooSlow({ study, enrol }: StudyPlan): Part | null {
  const { recruitment: how } = study.sample;
  if (how === null) return null;
  const needed = enrol / (how.sites * how.eligiblePerMonth * how.consent) + how.startUpMonths;
  if (needed <= how.months) return null;
  return {
    path: 'sample.recruitment.months',
    level: 'warning',
    message: `At the stated pace ${enrol} people take ${shownComputed(needed)} months with the start-up, and ${shownNumber(how.months)} are planned; at half that pace ${shownComputed(2 * (needed - how.startUpMonths) + how.startUpMonths)}. Plan more sites or more time.`,
  };
}

function consent({ study }: StudyPlan): Part | null {
  const { recruitment: how, losses } = study.sample;
  if (
    how === null ||
    how.consent <= OPTIMISTIC_CONSENT ||
    losses.some(({ stage }) => /declin|refus|consent/i.test(stage))
  )
    return null;
  return {
    path: 'sample.recruitment.consent',
    level: 'note',
    message: `${shownPercent(how.consent)} of eligible people are expected to take part, and no stage of loss counts refusals. Say where that comes from.`,
  };
}

function unstated({ study }: StudyPlan): Part | null {
  const asksFor = study.documents.find(({ kind }) => kind === 'grant' || kind === 'protocol');
  if (study.sample.recruitment !== null || asksFor === undefined) return null;
  return {
    path: 'sample',
    level: 'note',
    message: `A ${asksFor.kind === 'grant' ? 'grant application' : 'protocol'} is asked for, and nothing says how the people are found. State sample.recruitment: eligible people a month, sites, months.`,
  };
}
