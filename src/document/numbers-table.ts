/** The numbers of a study as a plain table, for a terminal. */

import type { Report } from '../report.ts';
import { formatCount } from './numbers.ts';
import { achievedText } from './view/achieved.ts';
import { effectText, roleTitle, unitsOf } from './view/wording.ts';

export interface NumbersTable {
  title: string;
  head: string[];
  rows: string[][];
  /** Sentences below the table. */
  lines: string[];
}

export function numbersTable({ study, plan }: Report): NumbersTable {
  const { unit, counts } = study.sample;
  const driver = plan.drivenBy === null ? '' : `, set by the aim “${plan.drivenBy.aim.id}”`;
  return {
    title: study.title,
    head: ['aim', 'role', 'method', 'analysed', counts, 'power or width', 'at the study’s number'],
    rows: plan.aims.map((aim) => [
      aim.aim.id,
      roleTitle(aim.aim.role).toLowerCase(),
      aim.aim.method,
      formatCount(aim.own.n),
      formatCount(aim.enrol),
      achievedText(aim, aim.own.achieved) ?? '',
      achievedText(aim, aim.planned.achieved) ?? '',
    ]),
    lines: [
      `Study: ${formatCount(plan.evaluable)} ${unit} analysed, ${formatCount(plan.enrol)} ${counts}${driver}.`,
      ...plan.aims.flatMap((aim) => {
        const { detectable, n } = aim.planned;
        if (detectable === null) return [];
        const forms = effectText(
          aim.calculation.equivalents(detectable),
          aim.aim.effectKeys[0] ?? null,
          unitsOf(aim.aim),
        );
        return [`Detectable with ${formatCount(n)} analysed, aim “${aim.aim.id}”: ${forms}.`];
      }),
      ...(plan.shortfall === null
        ? []
        : [
            `At most ${formatCount(plan.shortfall.maximum)} can be ${counts}: not feasible; ${formatCount(plan.shortfall.evaluable)} would be left.`,
          ]),
    ],
  };
}
