/** What the vertical axis of a curve measures, how far it reaches, and how its values are written. */

import { formatPower, formatProbability, formatSignificant } from '../numbers.ts';
import { fromZero, roundTicks, type Tick } from './axis.ts';
import type { PowerCurveData } from './power-curve-data.ts';

export interface Measure {
  domain: [number, number];
  ticks: Tick[];
  /** 'power .905' */
  achieved: string;
  /** 'target .90'; null without a target. */
  target: string | null;
}

/** A width grows without bound as n falls; the axis ends at this multiple of what matters. */
const TALLEST = 3;

export function measureOf(data: PowerCurveData): Measure {
  return isPower(data) ? powerMeasure(data) : widthMeasure(data);
}

/** Power lies in 0 to 1 and rises with n; the width of an interval falls with it. */
function isPower({ points, planned, target }: PowerCurveData): boolean {
  const values = [...points.map(({ value }) => value), planned.value, target ?? 0];
  return values.every((value) => value <= 1) && points[0]!.value <= points.at(-1)!.value;
}

function powerMeasure({ planned, target }: PowerCurveData): Measure {
  return {
    domain: [0, 1],
    ticks: [0, 0.2, 0.4, 0.6, 0.8, 1].map((value) => ({ value, text: formatProbability(value) })),
    achieved: `power ${formatPower(planned.value, target ?? undefined)}`,
    target: target === null ? null : `target ${twoDecimals(formatProbability(target))}`,
  };
}

function twoDecimals(text: string): string {
  return /^\.\d$/.test(text) ? `${text}0` : text;
}

function widthMeasure({ points, planned, target, band }: PowerCurveData): Measure {
  const matters = Math.max(planned.value, target ?? 0);
  const values = points.flatMap(({ value, low, high }) =>
    band === null ? [value] : [value, low ?? value, high ?? value],
  );
  const domain = fromZero(Math.min(Math.max(...values, matters), TALLEST * matters));
  return {
    domain,
    ticks: roundTicks(domain, 5).map((value) => ({ value, text: formatSignificant(value, 12) })),
    achieved: `width ${formatSignificant(planned.value, 3)}`,
    target: target === null ? null : `target ${formatSignificant(target, 12)}`,
  };
}
