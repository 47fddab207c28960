import type { AimPlan } from '../plan/plan.ts';
import { requiredOrNull } from '../sensitivity/required-table.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';

const ASSURANCE = 0.8;

export const intervalWidth: Rule = {
  id: 'M31',
  level: 'note',
  title: 'The width of an interval is full, and expected or assured',
  why: 'An interval planned to be narrow enough on average is too wide in about half of all studies. The spec states the full width, from the lower to the upper limit, and may ask for it with a stated probability.',
  sources: [{ key: 'kelley2008', of: 'expected and assured widths' }],
  ground: null,
  checkAim: (plan) => together(plan.aim.id, [onAverage(plan)]),
};

function onAverage(plan: AimPlan): Part | null {
  const { aim, method } = plan;
  if (method.achieves !== 'width' || aim.criteria.assurance !== null) return null;
  return {
    path: `aims[${aim.index}].criteria`,
    level: 'note',
    message: `The expected width is planned, so about half of such studies end with a wider interval. Add assurance: .80 to plan for a width that four in five studies keep${assured(plan)}.`,
  };
}

/** What the assured width would need; silent where no number is sought or the search takes long. */
function assured(plan: AimPlan): string {
  const { aim, method, own, effect, target } = plan;
  if (method.isCostly === true || aim.find !== 'sample-size' || effect === null || target === null) return '';
  const calculation = method.prepare({ ...aim, criteria: { ...aim.criteria, assurance: ASSURANCE } });
  const needed = requiredOrNull({ ...plan, calculation }, effect, target);
  return needed === null ? '' : `, which needs ${needed} analysed instead of ${own.n}`;
}
