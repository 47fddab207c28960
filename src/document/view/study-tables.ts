/** Tables about the study as a whole. */

import type { StudyPlan } from '../../plan/plan.ts';
import type { FullReport } from '../../report.ts';
import type { Study } from '../../spec/study.ts';
import { formatCount, formatPercent } from '../numbers.ts';
import type { Table } from '../table.ts';
import { achievedText } from './achieved.ts';
import { roleTitle } from './wording.ts';

export function stagesTable(plan: StudyPlan, study: Study): Table {
  return {
    caption: `From ${study.sample.counts} to analysed`,
    columns: [
      { head: 'stage', align: 'left' },
      { head: 'enter it', align: 'right' },
      { head: 'proportion lost', align: 'right' },
      { head: 'leave it', align: 'right' },
    ],
    rows: plan.stages.map((stage, index) => [
      study.sample.losses[index]?.stage ?? '',
      formatCount(stage.before),
      formatPercent(stage.proportion),
      formatCount(stage.after),
    ]),
  };
}

/** One row an aim: what it needs, and what it gets. */
export function aimsTable({ plan }: FullReport): Table {
  return {
    caption: 'Aims, what each needs, and what it has at the planned number',
    columns: [
      { head: 'aim', align: 'left' },
      { head: 'role', align: 'left' },
      { head: 'finds', align: 'left' },
      { head: 'analysed, of its own', align: 'right' },
      { head: 'power or width there', align: 'right' },
      { head: 'analysed, as planned', align: 'right' },
      { head: 'power or width there', align: 'right' },
    ],
    rows: plan.aims.map((aim) => [
      aim.aim.id,
      roleTitle(aim.aim.role).toLowerCase(),
      aim.aim.find.replaceAll('-', ' '),
      formatCount(aim.own.n),
      achievedText(aim, aim.own.achieved) ?? '–',
      formatCount(aim.planned.n),
      achievedText(aim, aim.planned.achieved) ?? '–',
    ]),
  };
}
