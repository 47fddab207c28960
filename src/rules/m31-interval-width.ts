import type { AimPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';

export const intervalWidth: Rule = {
  id: 'M31',
  level: 'note',
  title: 'The width of an interval is full, and expected or assured',
  why: 'An interval planned to be narrow enough on average is too wide in about half of all studies. The spec states the full width, from the lower to the upper limit, and may ask for it with a stated probability.',
  sources: [{ key: 'kelley2008', of: 'expected and assured widths' }],
  ground: null,
  checkAim: (plan) => together(plan.aim.id, [onAverage(plan)]),
};

function onAverage({ aim, method }: AimPlan): Part | null {
  if (method.achieves !== 'width' || aim.criteria.assurance !== null) return null;
  return {
    path: `aims[${aim.index}].criteria`,
    level: 'note',
    message:
      'The expected width is planned, so about half of such studies end with a wider interval. Add assurance: .80 to plan for a width that four in five studies keep.',
  };
}
