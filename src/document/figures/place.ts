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

/** A point that a label may name, and how much worse a one it is than the best of them. */
export interface Anchor extends Point {
  shortfall: number;
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

const STEP = { x: 6, y: 4 };
const CLEARANCE = 3;
/** Beyond this distance a label needs a leader to show what it names. */
const NEAR = 9;
const COST = { box: 100_000, leaderOverBox: 20_000, line: 400, leaderOverLine: 25 };

/**
 * Searches a grid of places inside `area`, the nearest first, so that the same data give the same figure.
 * `anchors` are the points that the label may name; null where none is given or the area is too small.
 */
export function placeLabel(
  size: { width: number; height: number },
  anchors: readonly Anchor[],
  area: Box,
  obstacles: Obstacles,
): Placed | null {
  let best: Placed | null = null;
  for (const { box, near } of nearestFirst(size, anchors, area)) {
    if (best !== null && near >= best.cost) break;
    const covered = coveredBy(box, obstacles);
    for (const anchor of anchors) {
      const distance = distanceOf(box, anchor);
      const least = distance + anchor.shortfall + covered;
      if (best !== null && least >= best.cost) continue;
      const leader = distance > NEAR ? leaderOf(box, anchor) : null;
      const cost = least + (leader === null ? 0 : crossedBy(leader, obstacles));
      if (best === null || cost < best.cost) best = { box, leader, cost };
    }
  }
  return best;
}

function nearestFirst({ width, height }: Omit<Box, 'x' | 'y'>, anchors: readonly Anchor[], area: Box) {
  const places: { box: Box; near: number }[] = [];
  for (let y = area.y; y <= area.y + area.height - height; y += STEP.y) {
    for (let x = area.x; x <= area.x + area.width - width; x += STEP.x) {
      const box = { x, y, width, height };
      const costs = anchors.map((anchor) => distanceOf(box, anchor) + anchor.shortfall);
      if (costs.length > 0) places.push({ box, near: Math.min(...costs) });
    }
  }
  return places.sort((a, b) => a.near - b.near);
}

function distanceOf({ x, y, width, height }: Box, point: Point): number {
  return Math.hypot(point.x - clamped(point.x, x, width), point.y - clamped(point.y, y, height));
}

function leaderOf({ x, y, width, height }: Box, to: Point): Segment {
  return { from: { x: clamped(to.x, x, width), y: clamped(to.y, y, height) }, to: { x: to.x, y: to.y } };
}

function clamped(value: number, start: number, length: number): number {
  return Math.min(Math.max(value, start), start + length);
}

function coveredBy(box: Box, { boxes, lines }: Obstacles): number {
  const roomy = grown(box, CLEARANCE);
  return (
    COST.box * count(boxes, (other) => overlap(roomy, other)) +
    COST.line * count(lines, (line) => crosses(line, roomy))
  );
}

function crossedBy(leader: Segment, { boxes, lines }: Obstacles): number {
  return (
    COST.leaderOverBox * count(boxes, (other) => crosses(leader, other) && !holds(other, leader.to)) +
    COST.leaderOverLine * count(lines, (line) => meet(leader, line))
  );
}

function count<T>(items: readonly T[], hit: (item: T) => boolean): number {
  let sum = 0;
  for (const item of items) if (hit(item)) sum++;
  return sum;
}

export function overlap(a: Box, b: Box): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

/** Whether a segment enters a box: clipped against its four sides (Liang and Barsky, 1984). */
export function crosses({ from, to }: Segment, box: Box): boolean {
  if (Math.max(from.x, to.x) < box.x || Math.min(from.x, to.x) > box.x + box.width) return false;
  if (Math.max(from.y, to.y) < box.y || Math.min(from.y, to.y) > box.y + box.height) return false;
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
  return side(a, b.from) !== side(a, b.to) && side(b, a.from) !== side(b, a.to);
}

function side({ from, to }: Segment, p: Point): number {
  return Math.sign((to.x - from.x) * (p.y - from.y) - (to.y - from.y) * (p.x - from.x));
}

/** The mark that a leader points at is not in its way. */
function holds({ x, y, width, height }: Box, point: Point): boolean {
  return point.x >= x && point.x <= x + width && point.y >= y && point.y <= y + height;
}

function grown({ x, y, width, height }: Box, by: number): Box {
  return { x: x - by, y: y - by, width: width + 2 * by, height: height + 2 * by };
}
