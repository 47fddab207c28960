/** Lines for the tables of required numbers, of power under losses, and of detectable effects: a line a row. */

import type { StudyPlan } from '../../plan/plan.ts';
import type { AimSensitivity } from '../../sensitivity/sensitivity.ts';
import { type Dialect, printed } from './dialect.ts';
import { requiredLines } from './required-lines.ts';

export function tableLines(dialect: Dialect, sensitivity: AimSensitivity, study: StudyPlan): string[][] {
  return [
    requiredTableLines(dialect, sensitivity),
    powerLines(dialect, sensitivity, study),
    detectableLines(dialect, sensitivity),
  ];
}

interface Cell {
  /** Value of the column. */
  at: number;
  cell: number;
}

/** The cells of a row that hold a number, with their columns. */
function known(columns: readonly number[], cells: readonly (number | null)[] | undefined): Cell[] {
  return columns.flatMap((at, column) => {
    const cell = cells?.[column] ?? null;
    return cell === null ? [] : [{ at, cell }];
  });
}

/** One line that gives a row, or none when no cell of it holds a number. */
function row(
  dialect: Dialect,
  cells: readonly Cell[],
  variable: string,
  call: string,
  shown: readonly string[],
) {
  if (cells.length === 0) return [];
  const columns = cells.map(({ at }) => at);
  return [dialect.show(dialect.each(columns, variable, call), shown.join(' '))];
}

function requiredTableLines(dialect: Dialect, { plan, required }: AimSensitivity): string[] {
  if (required === null || plan.target === null) return [];
  const { quantity, effects, targets, cells } = required;
  return [
    dialect.comment('Table of required numbers'),
    ...effects.flatMap((value, index) => {
      const found = known(targets, cells[index]);
      if (plan.method.isCostly === true) {
        return found.flatMap(({ at, cell }) =>
          requiredLines(dialect, plan, { moved: { [quantity.key]: value }, target: at, n: cell }),
        );
      }
      const call = dialect.call('needed', [dialect.call('effect', [], { [quantity.key]: value }), 't']);
      return row(
        dialect,
        found,
        't',
        call,
        found.map(({ cell }) => String(cell)),
      );
    }),
  ];
}

function powerLines(dialect: Dialect, { plan, power }: AimSensitivity, study: StudyPlan): string[] {
  if (power === null) return [];
  const { quantity, effects, losses, evaluable, cells, planned } = power;
  const name = plan.method.achieves;
  return [
    dialect.comment(`Table of ${name} under losses; first what each loss leaves for the analysis`),
    ...losses.flatMap((loss, column) =>
      column === planned.column
        ? []
        : [dialect.show(dialect.kept(study.enrol, [loss]), String(evaluable[column]))],
    ),
    ...effects.flatMap((value, index) => {
      const found = known(evaluable, cells[index]);
      const call = dialect.call(name, ['m', dialect.call('effect', [], { [quantity.key]: value })]);
      return row(
        dialect,
        found,
        'm',
        call,
        found.map(({ cell }) => printed(cell)),
      );
    }),
  ];
}

/** The effects are printed, and the power that each has is shown to be its target. */
function detectableLines(dialect: Dialect, { plan, detectable }: AimSensitivity): string[] {
  if (detectable === null) return [];
  const { numbers, targets, cells } = detectable;
  const name = plan.method.achieves;
  return [
    dialect.comment(`Table of detectable effects: the ${name} that each of them has is its target`),
    ...numbers.flatMap((n, index) => {
      const effects = known(targets, cells[index]).map(({ at, cell }) => ({ at: cell, cell: at }));
      const call = dialect.call(name, [dialect.number(n), 'e']);
      return row(
        dialect,
        effects,
        'e',
        call,
        effects.map(({ cell }) => printed(cell)),
      );
    }),
  ];
}
