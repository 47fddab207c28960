import type { AimPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { leadingOf } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { shownNumber, shownQuantity } from './support/numbers.ts';
import { consequence } from './support/plan.ts';

/** A source with fewer than this share of the planned number says little; common practice, no source. */
const SMALL_SHARE = 0.25;

export const publishedEffects: Rule = {
  id: 'M16',
  level: 'warning',
  title: 'A published effect is discounted or its source is shown to be large',
  why: 'Significance filters upwards: what is published is too large on average, the more so the smaller the studies. With a normal estimate tested at two-sided .05, significant results overstate the true effect on average by a factor of 1.12 at a true power of .80 and of 2.26 at .20 (computed).',
  sources: [{ key: 'button2013', of: 'inflated effects from small studies' }],
  ground: null,
  checkAim: (plan) => together(plan.aim.id, [fromOneStudy(plan)]),
};

function fromOneStudy(plan: AimPlan): Part | null {
  const effect = leadingOf(plan.aim);
  if (effect === null || effect.basis !== 'published-estimate') return null;
  const { n, studies } = effect.source;
  const doubt =
    n === null
      ? 'the n of its source is not stated'
      : n < SMALL_SHARE * plan.planned.n
        ? `its source has only ${n} people`
        : studies === null || studies === 1
          ? 'it comes from a single study'
          : null;
  if (doubt === null) return null;
  const low = effect.low === null ? null : consequence(plan, { [effect.key]: effect.low });
  const then =
    low === null
      ? 'Give the lower end that its interval allows as low.'
      : `At its low end (${shownNumber(effect.low ?? 0)}) ${low}.`;
  return {
    path: effect.path,
    level: 'warning',
    message: `The ${shownQuantity(effect)} is a published estimate and ${doubt}; published effects are too large on average. ${then} Answer with the reason why it is not discounted, or discount it.`,
  };
}
