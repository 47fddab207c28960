/** Linear scales, and the two axes of a curve: marks outside the plot, no grid, no box. */

import { scaleLinear } from 'd3-scale';
import { FONT_SIZE, textWidth } from './label.ts';
import type { Box } from './place.ts';
import { FIGURE_WIDTH, HAIRLINE, lineElement, SOFT_INK, textElement } from './svg.ts';

export type Scale = (value: number) => number;

export interface Tick {
  value: number;
  text: string;
}

const MARK = 5;
const GAP = 10;

/** From values to coordinates. Values that all agree are drawn in the middle. */
export function linearScale(domain: readonly [number, number], range: readonly [number, number]): Scale {
  if (domain[0] === domain[1]) return () => (range[0] + range[1]) / 2;
  return scaleLinear(domain, range);
}

/** Round values of the domain, about `count` of them. */
export function roundTicks(domain: readonly [number, number], count: number): number[] {
  return scaleLinear(domain, [0, 1]).ticks(count);
}

/** The domain from 0 to the next round value. */
export function fromZero(top: number): [number, number] {
  const [low, high] = scaleLinear([0, top], [0, 1]).nice(5).domain();
  return [low ?? 0, high ?? top];
}

export function leftAxis(ticks: readonly Tick[], scale: Scale, plot: Box): string {
  return ticks
    .flatMap(({ value, text }) => {
      const y = scale(value);
      return [
        lineElement(plot.x - MARK, y, plot.x, y, { stroke: HAIRLINE, 'stroke-width': 1 }),
        textElement(text, {
          x: plot.x - MARK - 4,
          y: y + FONT_SIZE * 0.35,
          'text-anchor': 'end',
          fill: SOFT_INK,
        }),
      ];
    })
    .join('');
}

/** The bottom axis; `stressed` is always named, and round values too close to it are not. */
export function bottomAxis(ticks: readonly Tick[], stressed: Tick, scale: Scale, plot: Box): string {
  const y = plot.y + plot.height;
  const taken = [spanOf(stressed, scale)];
  const named = ticks.filter((tick) => {
    const [start, end] = spanOf(tick, scale);
    if (taken.some(([from, to]) => start < to + GAP && from < end + GAP)) return false;
    taken.push([start, end]);
    return true;
  });
  return [
    lineElement(plot.x, y, plot.x + plot.width, y, { stroke: HAIRLINE, 'stroke-width': 1 }),
    ...ticks.map(({ value }) =>
      lineElement(scale(value), y, scale(value), y + MARK, { stroke: HAIRLINE, 'stroke-width': 1 }),
    ),
    ...[...named, stressed].map((tick) =>
      textElement(tick.text, {
        x: middleOf(tick, scale),
        y: y + MARK + FONT_SIZE + 1,
        'text-anchor': 'middle',
        ...(tick === stressed ? { 'font-weight': 'bold' } : { fill: SOFT_INK }),
      }),
    ),
  ].join('');
}

function spanOf(tick: Tick, scale: Scale): [number, number] {
  const [middle, half] = [middleOf(tick, scale), textWidth(tick.text) / 2];
  return [middle - half, middle + half];
}

/** Under its mark, moved inwards where it would leave the figure. */
function middleOf({ value, text }: Tick, scale: Scale): number {
  const half = textWidth(text) / 2;
  return Math.min(Math.max(scale(value), half), FIGURE_WIDTH - half);
}
