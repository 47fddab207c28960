/** The tables of one aim. */

import type { StudyPlan } from '../../plan/plan.ts';
import type { Limit } from '../../sensitivity/margins.ts';
import type { Outcome, RangeRow } from '../../sensitivity/ranges.ts';
import type { AimSensitivity } from '../../sensitivity/sensitivity.ts';
import type { Quantity, Study } from '../../spec/study.ts';
import { formatCount, formatExact, formatPercent, formatSignificant } from '../numbers.ts';
import type { Table } from '../table.ts';
import { achievedText } from './achieved.ts';
import {
  basisText,
  computedNumber,
  powerTarget,
  typedNumber,
  type Units,
  unitsOf,
  unitText,
  withUnit,
} from './wording.ts';

type Column = Table['columns'][number];
const left = (head: string): Column => ({ head, align: 'left' });
const right = (head: string): Column => ({ head, align: 'right' });
const NOTHING = '–';

/** Inputs, symbols, steps, equivalents and assumptions: what the arithmetic rests on. */
export function arithmeticTables({ plan }: AimSensitivity, words: Study) {
  const { method, calculation, effect, own } = plan;
  const aim = words.aims[plan.aim.index] ?? plan.aim;
  const units = unitsOf(aim);
  const used = effect ?? own.detectable;
  const steps = used === null ? [] : calculation.steps(own.n, used).filter(({ value }) => value !== null);
  return {
    inputs: {
      caption: 'Inputs, with all the digits given',
      columns: [left('input'), right('value'), left('range'), left('basis'), left('note')],
      rows: [
        ...calculation.constants.map(({ variable, meaning, value }) => [
          `${meaning} (${code(variable)})`,
          formatExact(value),
          NOTHING,
          NOTHING,
          NOTHING,
        ]),
        ...(plan.target === null
          ? []
          : [
              [
                `${method.achieves === 'power' ? 'target power' : 'wanted full width'} (${code('target')})`,
                formatExact(plan.target),
                NOTHING,
                NOTHING,
                NOTHING,
              ],
            ]),
        ...Object.values(aim.quantities).map((quantity) => [
          `${quantity.title} (${code(quantity.key)})`,
          withUnit(formatExact(quantity.value), unitText(quantity.unit, units)),
          rangeCell(quantity),
          basisText(quantity.basis) ?? 'no basis stated',
          quantity.note ?? NOTHING,
        ]),
      ],
    },
    equivalents:
      used === null
        ? null
        : {
            caption:
              effect === null
                ? 'The detectable effect in its other forms'
                : 'The planned effect in its other forms',
            columns: [left('form'), left('symbol'), right('value')],
            rows: calculation
              .equivalents(used)
              .map(({ meaning, symbol, value, unit }) => [
                meaning,
                symbol,
                withUnit(formatSignificant(value, 10), unitText(unit, units)),
              ]),
          },
    symbols: {
      caption: 'Symbols',
      columns: [left('symbol'), left('meaning')],
      rows: method.symbols.map(({ symbol, meaning }) => [symbol, meaning]),
    },
    steps:
      steps.length === 0
        ? null
        : {
            caption: `Intermediate values with ${formatCount(own.n)} analysed`,
            columns: [left('quantity'), left('formula'), left('name in the lines'), right('value')],
            rows: steps.map(({ meaning, symbol, formula, variable, value }) => [
              `${meaning} (${symbol})`,
              formula === '' ? NOTHING : formula,
              code(variable),
              value === null
                ? NOTHING
                : Number.isInteger(value)
                  ? String(value)
                  : formatSignificant(value, 10),
            ]),
          },
    assumptions: {
      caption: 'Assumptions, and what follows if one fails',
      columns: [left('assumption'), left('if it fails')],
      rows: method.assumptions.map(({ statement, ifNot }) => [statement, ifNot]),
    },
  };
}

/** The tables of src/sensitivity; null where they do not arise. */
export function sensitivityTables(sensitivity: AimSensitivity, study: StudyPlan, words: Study) {
  const aim = words.aims[sensitivity.plan.aim.index] ?? sensitivity.plan.aim;
  return {
    required: requiredTable(sensitivity, unitsOf(aim), words.sample.unit),
    power: powerTable(sensitivity, unitsOf(aim), study, words),
    detectable: detectableTable(sensitivity),
    ranges: rangesTable(sensitivity, unitsOf(aim), words),
    margins: marginsTable(sensitivity, unitsOf(aim), words),
  };
}

function requiredTable({ required, plan }: AimSensitivity, units: Units, unit: string): Table | null {
  if (required === null) return null;
  const { quantity, effects, targets, cells, planned } = required;
  const isPower = plan.method.achieves === 'power';
  return {
    caption: `Number of ${unit} to analyse, by ${quantity.title} and ${isPower ? 'target power' : 'wanted width'}`,
    columns: [
      left(head(quantity, units)),
      ...targets.map((target) => right(isPower ? `power ${powerTarget(target)}` : `width ${pure(target)}`)),
    ],
    rows: effects.map((value, row) => [
      marked(typedNumber(value, quantity.unit), row === planned.row),
      ...targets.map((_, column) => {
        const cell = cells[row]?.[column] ?? null;
        const text = cell === null ? 'out of reach' : formatCount(cell);
        return marked(text, row === planned.row && column === planned.column);
      }),
    ]),
  };
}

function powerTable(
  { power, plan }: AimSensitivity,
  units: Units,
  study: StudyPlan,
  words: Study,
): Table | null {
  if (power === null) return null;
  const { quantity, effects, losses, evaluable, cells, planned } = power;
  const what = plan.method.achieves === 'power' ? 'Power' : 'Width of the interval';
  return {
    caption: `${what} with ${formatCount(study.enrol)} ${words.sample.counts}, by ${quantity.title} and overall proportion lost`,
    columns: [
      left(head(quantity, units)),
      ...losses.map((loss, column) =>
        right(
          `${formatPercent(Number(loss.toPrecision(3)))} lost, ${formatCount(evaluable[column] ?? 0)} left`,
        ),
      ),
    ],
    rows: effects.map((value, row) => [
      marked(typedNumber(value, quantity.unit), row === planned.row),
      ...losses.map((_, column) => {
        const text = achievedText(plan, cells[row]?.[column] ?? null) ?? NOTHING;
        return marked(text, row === planned.row && column === planned.column);
      }),
    ]),
  };
}

function detectableTable({ detectable, plan }: AimSensitivity): Table | null {
  if (detectable === null) return null;
  const { numbers, targets, cells, planned } = detectable;
  const { symbol, meaning } = plan.method.effect;
  return {
    caption: `Smallest detectable effect (${meaning}, ${symbol}), by number analysed and target power`,
    columns: [right('analysed'), ...targets.map((target) => right(`power ${powerTarget(target)}`))],
    rows: numbers.map((n, row) => [
      marked(formatCount(n), row === planned.row),
      ...targets.map((_, column) => {
        const cell = cells[row]?.[column] ?? null;
        const text = cell === null ? 'none' : computedNumber(cell, '');
        return marked(text, row === planned.row && column === planned.column);
      }),
    ]),
  };
}

function rangesTable({ ranges, plan }: AimSensitivity, units: Units, words: Study): Table | null {
  if (ranges === null) return null;
  const cellsOf = (outcome: Outcome | null) =>
    outcome === null
      ? [NOTHING, NOTHING]
      : [
          outcome.required === null ? NOTHING : formatCount(outcome.required.enrol),
          achievedText(plan, outcome.achieved) ?? NOTHING,
        ];
  const what = plan.method.achieves === 'power' ? 'power' : 'width';
  const counts = words.sample.counts;
  const name = (row: RangeRow) =>
    row.stage === null
      ? row.quantity.title
      : `lost: ${words.sample.losses.find(({ proportion }) => proportion.path === row.quantity.path)?.stage ?? row.stage}`;
  return {
    caption: `Each assumption moved alone over its range, ranked by its influence`,
    columns: [
      left('assumption'),
      left('low to high'),
      right(`to be ${counts} at the low end`),
      right(`${what} of the plan there`),
      right(`to be ${counts} at the high end`),
      right(`${what} of the plan there`),
    ],
    rows: [
      ...ranges.rows.map((row) => [
        name(row),
        row.stage === null
          ? withUnit(rangeCell(row.quantity), unitText(row.quantity.unit, units))
          : rangeCell(row.quantity),
        ...cellsOf(row.low),
        ...cellsOf(row.high),
      ]),
      ...(ranges.allUnfavourable === null
        ? []
        : [
            ['all at their unfavourable ends', NOTHING, ...cellsOf(ranges.allUnfavourable), NOTHING, NOTHING],
          ]),
    ],
  };
}

function marginsTable({ margins, plan }: AimSensitivity, units: Units, words: Study): Table | null {
  const first = margins[0];
  if (first === undefined || first.limits.length === 0) return null;
  const isPower = plan.method.achieves === 'power';
  return {
    caption: `How far each assumption can slip, alone, before the planned study falls short`,
    columns: [
      left('assumption'),
      right('planned'),
      ...first.limits.map(({ floor }) =>
        right(isPower ? `power ${powerTarget(floor)} at` : `width ${achievedText(plan, floor)} at`),
      ),
    ],
    rows: margins.map(({ quantity, stage, limits }) => {
      const asLoss = stage !== null;
      const text = (value: number) =>
        asLoss
          ? formatPercent(Number(value.toPrecision(3)))
          : withUnit(computedNumber(value, quantity.unit), unitText(quantity.unit, units));
      return [
        asLoss
          ? `lost: ${words.sample.losses.find(({ proportion }) => proportion.path === quantity.path)?.stage ?? stage}`
          : quantity.title,
        asLoss
          ? formatPercent(quantity.value)
          : withUnit(typedNumber(quantity.value, quantity.unit), unitText(quantity.unit, units)),
        ...limits.map((limit) => limitText(limit, text)),
      ];
    }),
  };
}

export function limitText({ value, reason }: Limit, text: (value: number) => string): string {
  if (value !== null) return text(value);
  return reason === 'already-below' ? 'already short of it' : 'at no value';
}

function head(quantity: Quantity, units: Units): string {
  const unit = unitText(quantity.unit, units);
  return unit === '' ? quantity.title : `${quantity.title} (${unit})`;
}

function rangeCell({ low, high, unit }: Quantity): string {
  if (low === null && high === null) return NOTHING;
  const text = (value: number | null) => (value === null ? '…' : typedNumber(value, unit));
  return `${text(low)} to ${text(high)}`;
}

/** A target: no unit, no leading zero below 1. */
function pure(value: number): string {
  return typedNumber(value, '');
}

function marked(text: string, isPlanned: boolean): string {
  return isPlanned ? `**${text}**` : text;
}

function code(name: string): string {
  return `\`${name}\``;
}
