/** Where a label goes: the nearest place to what it names that covers neither text nor line. */

export interface Box {
  x: number;
  y: number;
  width: number;
  height: number;
}

export interface Point {
  x: number;
  y: number;
}

export interface Segment {
  from: Point;
  to: Point;
}

export interface Obstacles {
  /** Text and marks, never to be covered. */
  boxes: Box[];
  /** Lines, to be crossed only where nothing else is free. */
  lines: Segment[];
}

export interface Placed {
  box: Box;
  /** From the label to what it names, where they stand apart. */
  leader: Segment | null;
  /** Distance from what it names, and what it has to cover. */
  cost: number;
}

const STEP = 4;
const CLEARANCE = 3;
/** Beyond this distance a label needs a leader to show what it names. */
const NEAR = 9;
const COST = { box: 100_000, leaderOverBox: 20_000, line: 400, leaderOverLine: 25 };

/**
 * Searches a grid of places inside `area`, in a fixed order, so that the same data give the same figure.
 * `size` has to fit into `area`.
 */
export function placeLabel(
  size: { width: number; height: number },
  anchor: Point,
  area: Box,
  obstacles: Obstacles,
): Placed {
  let best: Placed | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (let y = area.y; y <= area.y + area.height - size.height; y += STEP) {
    for (let x = area.x; x <= area.x + area.width - size.width; x += STEP) {
      const box = { x, y, ...size };
      const end = nearestPoint(box, anchor);
      const distance = Math.hypot(end.x - anchor.x, end.y - anchor.y);
      if (distance >= least) continue;
      const leader = distance > NEAR ? { from: end, to: anchor } : null;
      const cost = distance + costOf(box, leader, obstacles);
      if (cost < least) [best, least] = [{ box, leader, cost }, cost];
    }
  }
  if (best === null) {
    throw new RangeError(
      `size is ${size.width} × ${size.height}; it has to fit ${area.width} × ${area.height}`,
    );
  }
  return best;
}

function costOf(box: Box, leader: Segment | null, { boxes, lines }: Obstacles): number {
  const roomy = grown(box, CLEARANCE);
  const count = <T>(items: readonly T[], hit: (item: T) => boolean) => items.filter(hit).length;
  return (
    COST.box * count(boxes, (other) => overlap(roomy, other)) +
    COST.line * count(lines, (line) => crosses(line, roomy)) +
    (leader === null
      ? 0
      : COST.leaderOverBox * count(boxes, (other) => crosses(leader, other) && !holds(other, leader.to)) +
        COST.leaderOverLine * count(lines, (line) => meet(leader, line)))
  );
}

export function overlap(a: Box, b: Box): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

/** Whether a segment enters a box: clipped against its four sides (Liang and Barsky, 1984). */
export function crosses({ from, to }: Segment, box: Box): boolean {
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  let [enter, leave] = [0, 1];
  for (const [slope, room] of [
    [-dx, from.x - box.x],
    [dx, box.x + box.width - from.x],
    [-dy, from.y - box.y],
    [dy, box.y + box.height - from.y],
  ] as const) {
    if (slope === 0) {
      if (room < 0) return false;
    } else if (slope < 0) enter = Math.max(enter, room / slope);
    else leave = Math.min(leave, room / slope);
  }
  return enter <= leave;
}

function meet(a: Segment, b: Segment): boolean {
  const side = ({ from, to }: Segment, p: Point) =>
    Math.sign((to.x - from.x) * (p.y - from.y) - (to.y - from.y) * (p.x - from.x));
  return side(a, b.from) !== side(a, b.to) && side(b, a.from) !== side(b, a.to);
}

/** The mark that a leader points at is not in its way. */
function holds({ x, y, width, height }: Box, point: Point): boolean {
  return point.x >= x && point.x <= x + width && point.y >= y && point.y <= y + height;
}

function grown({ x, y, width, height }: Box, by: number): Box {
  return { x: x - by, y: y - by, width: width + 2 * by, height: height + 2 * by };
}

function nearestPoint({ x, y, width, height }: Box, { x: px, y: py }: Point): Point {
  return { x: Math.min(Math.max(px, x), x + width), y: Math.min(Math.max(py, y), y + height) };
}
