/** The direct labels of a curve: the planned study, the target and the band, in the order of their claim. */

import { formatCount } from '../numbers.ts';
import type { Scale } from './axis.ts';
import { fitted, type Label, LINE_HEIGHT, labelElement, stacked } from './label.ts';
import type { Measure } from './measure.ts';
import {
  type Anchor,
  type Box,
  type Obstacles,
  type Placed,
  type Point,
  placeLabel,
  type Segment,
} from './place.ts';
import type { PowerCurveData, PowerCurvePoint } from './power-curve-data.ts';
import { lineElement, SOFT_INK } from './svg.ts';

export interface Drawing {
  plot: Box;
  x: Scale;
  y: Scale;
  dot: Point;
  /** Radius of the dot. */
  radius: number;
}

/** Keeps labels off the axes. */
const INSET = 5;
/** From the target line to the label above and below it; letters leave more room above themselves. */
const ABOVE_LINE = 4;
const BELOW_LINE = 3.5;
/** Above the plot, short of the name of the axis. */
const INTO_HEAD = 12;
/** Of the points of the band, as many as are looked at: neighbours are alike. */
const EVERY = 4;

export function curveLabels(data: PowerCurveData, measure: Measure, drawing: Drawing): string {
  const { planned, target, band, points } = data;
  const { plot, y, dot } = drawing;
  const inside = {
    x: plot.x + INSET,
    y: plot.y,
    width: plot.width - INSET,
    height: plot.height - INSET,
  };
  const obstacles = obstaclesOf(data, drawing);
  const parts: string[] = [];
  const put = (label: Label, place: Placed | null) => {
    if (place === null) throw new RangeError(`label '${label.lines.join(' ')}' has no room in the plot`);
    const { box, leader } = place;
    obstacles.boxes.push(box);
    if (leader !== null) {
      obstacles.lines.push(leader);
      const { from, to } = leader;
      parts.push(lineElement(from.x, from.y, to.x, to.y, { stroke: SOFT_INK, 'stroke-width': 0.75 }));
    }
    parts.push(labelElement(label, box.x, box.y));
  };

  const study = stacked([`planned n ${formatCount(planned.n)}`, measure.achieved]);
  put(study, placeLabel(study, [{ ...dot, shortfall: 0 }], inside, obstacles));
  if (target !== null && measure.target !== null) {
    const label = stacked([measure.target]);
    put(label, alongLine(label, y(target), inside, obstacles));
  }
  const anchors = band === null ? [] : bandAnchors(points, drawing);
  if (band !== null && anchors.length > 0) {
    const label = fitted(band, inside.width * 0.42, 4);
    put(label, placeLabel(label, anchors, inside, obstacles));
  }
  return parts.join('');
}

/** Above or below a horizontal line, near its right end if that is free. It names its line without a leader. */
function alongLine(label: Label, level: number, inside: Box, obstacles: Obstacles): Placed | null {
  const end = { x: inside.x + inside.width, y: level, shortfall: 0 };
  const places = [level - LINE_HEIGHT - ABOVE_LINE, level + BELOW_LINE]
    .filter((top) => top >= inside.y - INTO_HEAD && top + LINE_HEIGHT <= inside.y + inside.height)
    .map((top) => placeLabel(label, [end], { ...inside, y: top, height: LINE_HEIGHT }, obstacles))
    .filter((place) => place !== null);
  const [first, second] = places;
  if (first === undefined) return null;
  const place = second !== undefined && second.cost < first.cost ? second : first;
  return { ...place, leader: null };
}

function obstaclesOf(
  { points, target, band }: PowerCurveData,
  { plot, x, y, dot, radius }: Drawing,
): Obstacles {
  const [right, bottom] = [plot.x + plot.width, plot.y + plot.height];
  const reach = radius + 1;
  const keys = band === null ? (['value'] as const) : (['value', 'low', 'high'] as const);
  const curves = keys.flatMap((key) => {
    const corners = points.flatMap((point) => {
      const value = point[key];
      return value === null ? [] : [{ x: x(point.n), y: Math.max(y(value), plot.y) }];
    });
    return corners.slice(1).map((to, index): Segment => ({ from: corners[index]!, to }));
  });
  const targets =
    target === null ? [] : [{ from: { x: plot.x, y: y(target) }, to: { x: right, y: y(target) } }];
  return {
    boxes: [{ x: dot.x - reach, y: dot.y - reach, width: 2 * reach, height: 2 * reach }],
    lines: [{ from: dot, to: { x: dot.x, y: bottom } }, ...targets, ...curves],
  };
}

/** Points to name, halfway between curve and edge, and how much taller the band is where it is tallest. */
function bandAnchors(points: readonly PowerCurvePoint[], { plot, x, y }: Drawing): Anchor[] {
  const halves = points.flatMap(({ n, value, low, high }, index) =>
    low === null || high === null || index % EVERY !== 0
      ? []
      : [low, high].map((edge) => {
          const [a, b] = [Math.max(y(value), plot.y), Math.max(y(edge), plot.y)];
          return { x: x(n), y: (a + b) / 2, height: Math.abs(a - b) };
        }),
  );
  const tallest = Math.max(...halves.map(({ height }) => height));
  return halves.map(({ height, ...point }) => ({ ...point, shortfall: tallest - height }));
}
