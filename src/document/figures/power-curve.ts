/** The curve of an aim: power, or the width of an interval, against the number analysed. */

import { area, line } from 'd3-shape';
import { formatCount } from '../numbers.ts';
import { bottomAxis, leftAxis, linearScale, roundTicks, type Scale, type Tick } from './axis.ts';
import { curveLabels } from './curve-labels.ts';
import { fitted, labelElement, textWidth } from './label.ts';
import { measureOf } from './measure.ts';
import type { PowerCurveData, PowerCurvePoint } from './power-curve-data.ts';
import { element, FIGURE_WIDTH, frame, HAIRLINE, INK, lineElement, SOFT_INK } from './svg.ts';

const PLOT_HEIGHT = 240;
const RIGHT = 20;
const DOT = 4;
const BAND_FILL = '#e6e6e6';

/**
 * Draws the curve as SVG, 12 cm wide in print.
 * @throws {RangeError} where there is no point, or one is negative or not finite
 */
export function powerCurve(data: PowerCurveData): string {
  check(data);
  const { points, planned, target } = data;
  const measure = measureOf(data);
  const yTitle = fitted(data.yLabel, FIGURE_WIDTH, 2);
  const xTitle = fitted(data.xLabel, FIGURE_WIDTH - 40, 2);
  const left = Math.ceil(Math.max(...measure.ticks.map(({ text }) => textWidth(text)))) + 12;
  const plot = { x: left, y: yTitle.height + 14, width: FIGURE_WIDTH - left - RIGHT, height: PLOT_HEIGHT };
  const [right, bottom] = [plot.x + plot.width, plot.y + plot.height];

  const numbers = [...points.map(({ n }) => n), planned.n];
  const span: [number, number] = [Math.min(...numbers), Math.max(...numbers)];
  const x = linearScale(span, [plot.x, right]);
  const y = linearScale(measure.domain, [bottom, plot.y]);
  const dot = { x: x(planned.n), y: y(planned.value) };
  const ticks = roundTicks(span, 7).filter(Number.isInteger).map(countTick);

  const clip = `${data.prefix}-plot`;
  const dashed = (dashes: string) => ({ stroke: INK, 'stroke-width': 1, 'stroke-dasharray': dashes });
  return frame({ ...data, height: bottom + 26 + xTitle.height }, [
    element('clipPath', { id: clip }, element('rect', { ...plot })),
    element('g', { 'clip-path': `url(#${clip})` }, curves(data, x, y)),
    leftAxis(measure.ticks, y, plot),
    bottomAxis(ticks, countTick(planned.n), x, plot),
    ...(target === null ? [] : [lineElement(plot.x, y(target), right, y(target), dashed('8 4'))]),
    lineElement(dot.x, dot.y, dot.x, bottom, dashed('1.5 3')),
    element('circle', { cx: dot.x, cy: dot.y, r: DOT, fill: INK, stroke: '#ffffff', 'stroke-width': 1.5 }),
    curveLabels(data, measure, { plot, x, y, dot, radius: DOT }),
    labelElement(yTitle, 0, 0, { fill: SOFT_INK }),
    labelElement(xTitle, right, bottom + 24, { 'text-anchor': 'end', fill: SOFT_INK }),
  ]);
}

function countTick(n: number): Tick {
  return { value: n, text: formatCount(n) };
}

function curves({ points, band }: PowerCurveData, x: Scale, y: Scale): string {
  type Pair = [number, number];
  const pairs = (key: 'value' | 'low' | 'high') =>
    points.map((point): Pair | null => {
      const value = point[key];
      return value === null ? null : [x(point.n), y(value)];
    });
  const stroke = line<Pair | null>()
    .defined((pair) => pair !== null)
    .x((pair) => pair![0])
    .y((pair) => pair![1])
    .digits(2);
  const path = (key: 'value' | 'low' | 'high', width: number, colour: string) =>
    element('path', {
      d: stroke(pairs(key)) ?? '',
      fill: 'none',
      stroke: colour,
      'stroke-width': width,
      'stroke-linejoin': 'round',
    });
  if (band === null) return path('value', 2, INK);
  const filled = area<PowerCurvePoint>()
    .defined(({ low, high }) => low !== null && high !== null)
    .x(({ n }) => x(n))
    .y0(({ low }) => y(low!))
    .y1(({ high }) => y(high!))
    .digits(2);
  return [
    element('path', { d: filled(points) ?? '', fill: BAND_FILL }),
    path('low', 0.75, HAIRLINE),
    path('high', 0.75, HAIRLINE),
    path('value', 2, INK),
  ].join('');
}

function valuesOf(points: readonly PowerCurvePoint[]): number[] {
  return points.flatMap(({ value, low, high }) => [value, low, high].filter((one) => one !== null));
}

function check({ points, planned, target }: PowerCurveData): void {
  if (points.length === 0) throw new RangeError('points is empty; one point at least is needed');
  const numbers = [...points.map(({ n }) => n), ...valuesOf(points), planned.n, planned.value, target ?? 0];
  const wrong = numbers.find((value) => !Number.isFinite(value) || value < 0);
  if (wrong !== undefined) {
    throw new RangeError(
      `a value of points, planned or target is ${wrong}; it has to be finite and not negative`,
    );
  }
}
