/** The direct labels of a curve: the planned study, the target and the band, in the order of their claim. */

import { formatCount } from '../numbers.ts';
import type { Scale } from './axis.ts';
import { fitted, type Label, LINE_HEIGHT, labelElement, stacked } from './label.ts';
import type { Measure } from './measure.ts';
import { type Box, type Obstacles, type Placed, type Point, placeLabel, type Segment } from './place.ts';
import type { PowerCurveData, PowerCurvePoint } from './power-curve.ts';
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
  const put = (label: Label, { box, leader }: Placed) => {
    obstacles.boxes.push(box);
    if (leader !== null) {
      obstacles.lines.push(leader);
      const { from, to } = leader;
      parts.push(lineElement(from.x, from.y, to.x, to.y, { stroke: SOFT_INK, 'stroke-width': 0.75 }));
    }
    parts.push(labelElement(label, box.x, box.y));
  };

  const study = stacked([`planned n ${formatCount(planned.n)}`, measure.achieved]);
  put(study, placeLabel(study, dot, inside, obstacles));
  if (target !== null && measure.target !== null) {
    const label = fitted(measure.target, inside.width / 2, 1);
    const end = { x: plot.x + plot.width, y: y(target) };
    const strips = [y(target) - LINE_HEIGHT - ABOVE_LINE, y(target) + BELOW_LINE]
      .filter((top) => top >= 0 && top + LINE_HEIGHT <= plot.y + plot.height)
      .map((top) => ({ ...inside, y: top, height: LINE_HEIGHT }));
    // It stands at its line wherever it stands along it: no leader.
    const place = cheapest(strips.map((strip) => placeLabel(label, end, strip, obstacles)));
    if (place !== null) put(label, { ...place, leader: null });
  }
  if (band !== null) {
    const label = fitted(band, inside.width * 0.42, 4);
    const places = bandAnchors(points, drawing).map(({ at, shortfall }) => {
      const place = placeLabel(label, at, inside, obstacles);
      return { ...place, cost: place.cost + shortfall };
    });
    const place = cheapest(places);
    if (place !== null) put(label, place);
  }
  return parts.join('');
}

function cheapest(places: readonly Placed[]): Placed | null {
  return places.reduce<Placed | null>(
    (best, one) => (best === null || one.cost < best.cost ? one : best),
    null,
  );
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

/** Places to point at, halfway between curve and edge, and how much taller the band is where it is tallest. */
function bandAnchors(points: readonly PowerCurvePoint[], { plot, x, y }: Drawing) {
  const halves = points.flatMap(({ n, value, low, high }) =>
    low === null || high === null
      ? []
      : [low, high].map((edge) => {
          const [a, b] = [Math.max(y(value), plot.y), Math.max(y(edge), plot.y)];
          return { at: { x: x(n), y: (a + b) / 2 }, height: Math.abs(a - b) };
        }),
  );
  const tallest = Math.max(...halves.map(({ height }) => height));
  return halves.map(({ at, height }) => ({ at, shortfall: tallest - height }));
}
