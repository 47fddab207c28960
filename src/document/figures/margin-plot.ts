/** How far each assumption can slip: its planned value, its stated range, and its limits, on its own scale. */

import { formatSignificant } from '../numbers.ts';
import { linearScale, type Scale } from './axis.ts';
import { type Flag, hangFlags } from './flags.ts';
import { FONT_SIZE, fitted, LINE_HEIGHT, labelElement } from './label.ts';
import { element, FIGURE_WIDTH, frame, HAIRLINE, INK, lineElement, SOFT_INK, titleElement } from './svg.ts';

export interface MarginLimit {
  /** What is no longer reached beyond the limit: 'power .80'. */
  floor: string;
  /** null where no value of the assumption is the limit; `text` then says so. */
  value: number | null;
  text: string;
}

export interface MarginRow {
  label: string;
  /** '' for a number without one. */
  unit: string;
  planned: number;
  plannedText: string;
  limits: MarginLimit[];
  /** The stated range; null where an end is not stated. */
  low: number | null;
  high: number | null;
}

export interface MarginPlotData {
  prefix: string;
  title: string;
  description: string;
  rows: MarginRow[];
}

const STRIP = { x: 168, width: FIGURE_WIDTH - 168 };
const STRIP_END = STRIP.x + STRIP.width;
/** Keeps marks off the ends of the strip. */
const INSET = 10;
const LABEL_WIDTH = STRIP.x - 18;
/** Two labels have room side by side. */
const LIMIT_WIDTH = STRIP.width / 2 - 10;
const ROW_GAP = 20;
const TICK = 7;
const BAR = 10;
const DOT = 4.5;

/**
 * Draws the rows as SVG, 12 cm wide in print.
 * @throws {RangeError} where a value is not finite, or there is no row
 */
export function marginPlot(data: MarginPlotData): string {
  if (data.rows.length === 0) throw new RangeError('rows is empty; one row at least is needed');
  const parts: string[] = [];
  let y = 2;
  for (const row of data.rows) {
    const { svg, height } = drawRow(row, y);
    const rule = y + height + ROW_GAP / 2;
    parts.push(svg, lineElement(0, rule, FIGURE_WIDTH, rule, { stroke: '#d6d6d6', 'stroke-width': 0.75 }));
    y += height + ROW_GAP;
  }
  return frame({ ...data, height: y + LINE_HEIGHT + 4 }, [...parts, key(y)]);
}

function drawRow(row: MarginRow, top: number): { svg: string; height: number } {
  const x = scaleOf(row);
  const axis = top + LINE_HEIGHT + BAR;
  const below = axis + TICK + 6;
  const name = fitted(row.label, LABEL_WIDTH, 4);
  const planned = fitted(row.plannedText, STRIP.width, 1);
  const at = x(row.planned);
  const half = planned.width / 2;
  const plannedMiddle = Math.min(Math.max(at, STRIP.x + half), STRIP_END - half);
  const flags = hangFlags(flagsOf(row, x), STRIP.x, STRIP_END);
  const lowest = Math.max(0, ...flags.map(({ box }) => box.y + box.height));
  const svg = [
    titleElement(fullText(row)),
    labelElement(name, 0, top),
    range(row, x, axis),
    lineElement(STRIP.x, axis, STRIP_END, axis, { stroke: HAIRLINE, 'stroke-width': 1 }),
    ...flags.map((flag) =>
      flag.at === null || flag.pole === null
        ? ''
        : lineElement(flag.at, axis - TICK, flag.at, below + flag.pole, {
            stroke: INK,
            'stroke-width': 1.25,
          }),
    ),
    element('circle', { cx: at, cy: axis, r: DOT, fill: INK, stroke: '#ffffff', 'stroke-width': 1.5 }),
    labelElement(planned, plannedMiddle, top, { 'text-anchor': 'middle', 'font-weight': 'bold' }),
    ...flags.map(({ at: pole, box, label }) => {
      const { anchor, offset } = alignment(pole, box);
      const colour = pole === null ? SOFT_INK : INK;
      return labelElement(label, box.x + offset, below + box.y, { 'text-anchor': anchor, fill: colour });
    }),
  ].join('');
  return { svg: element('g', {}, svg), height: Math.max(name.height, below - top + lowest) };
}

function scaleOf({ planned, limits, low, high }: MarginRow): Scale {
  const values = [planned, low, high, ...limits.map(({ value }) => value)].filter((value) => value !== null);
  const wrong = values.find((value) => !Number.isFinite(value));
  if (wrong !== undefined) throw new RangeError(`a value of rows is ${wrong}; it has to be finite`);
  return linearScale([Math.min(...values), Math.max(...values)], [STRIP.x + INSET, STRIP_END - INSET]);
}

function flagsOf({ limits, unit }: MarginRow, x: Scale): Flag[] {
  return limits.map(({ floor, value, text }) =>
    value === null
      ? { at: null, label: fitted(`${floor}: ${text}`, STRIP.width, 2) }
      : { at: x(value), label: fitted(`${floor}: ${withoutUnit(text, unit)}`, LIMIT_WIDTH, 2) },
  );
}

/** The planned value shows the unit already. */
function withoutUnit(text: string, unit: string): string {
  return unit !== '' && text.endsWith(` ${unit}`) ? text.slice(0, -unit.length - 1) : text;
}

/** A label keeps to its pole: its lines begin or end there, or are centred on it. */
function alignment(pole: number | null, { x, width }: { x: number; width: number }) {
  if (pole === null || pole <= x) return { anchor: 'start', offset: 0 };
  if (pole >= x + width) return { anchor: 'end', offset: width };
  return { anchor: 'middle', offset: width / 2 };
}

/** A range with one end runs from the planned value to it. */
function range({ planned, low, high }: MarginRow, x: Scale, axis: number): string {
  if (low === null && high === null) return '';
  const [from, to] = [x(low ?? planned), x(high ?? planned)];
  return rangeBar(Math.min(from, to), Math.abs(to - from), axis);
}

function rangeBar(x: number, width: number, axis: number): string {
  return element('rect', { x, y: axis - BAR / 2, width, height: BAR, fill: '#cccccc' });
}

/** What a row shows, in words, for the pointer and where a label had to be shortened. */
function fullText({ label, unit, plannedText, limits, low, high }: MarginRow): string {
  const end = (value: number | null) => (value === null ? '…' : formatSignificant(value, 12));
  const stated =
    low === null && high === null
      ? []
      : [`stated range ${end(low)} to ${end(high)}${unit === '' ? '' : ` ${unit}`}`];
  return [
    `${label}: planned ${plannedText}`,
    ...stated,
    ...limits.map(({ floor, text }) => `${floor}: ${text}`),
  ].join('; ');
}

function key(top: number): string {
  const middle = top + FONT_SIZE / 2 + 1;
  const text = (words: string, x: number) =>
    labelElement(fitted(words, FIGURE_WIDTH - x, 1), x, top, { fill: SOFT_INK });
  return element(
    'g',
    {},
    [
      element('circle', { cx: 6, cy: middle, r: DOT, fill: INK }),
      text('planned', 16),
      rangeBar(90, 24, middle),
      text('stated range', 120),
      lineElement(232, middle - TICK, 232, middle + TICK, { stroke: INK, 'stroke-width': 1.25 }),
      text('limit: falls short beyond it', 240),
    ].join(''),
  );
}
