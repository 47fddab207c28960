/** Labels that hang below a scale, each from a pole at its value, so that no label covers another or a pole. */

import { type Label, LINE_HEIGHT } from './label.ts';
import { type Box, overlap } from './place.ts';

export interface Flag {
  /** Where the pole stands; null for a label without a place on the scale. */
  at: number | null;
  label: Label;
}

export interface HungFlag extends Flag {
  /** Measured from the top of the first line of labels. */
  box: Box;
  /** How far the pole reaches below the top of the first line. */
  pole: number | null;
}

/** Between a pole and the label beside it. */
const BESIDE = 4;
const APART = 4;
/** A pole reaches up to the scale. */
const ABOVE = 100;

/** Hangs the flags between `left` and `right`, as high as they go; the order of the flags is kept. */
export function hangFlags(flags: readonly Flag[], left: number, right: number): HungFlag[] {
  const poles = flags.filter(({ at }) => at !== null);
  const hung = new Map<Flag, HungFlag>();
  for (const one of hangPoles(poles, left, right) ?? listed(poles, left)) hung.set(one.flag, one.hung);
  for (const flag of flags) {
    if (flag.at === null) hung.set(flag, hangLoose(flag, [...hung.values()], left, right));
  }
  return flags.map((flag) => hung.get(flag)!);
}

interface Hanging {
  flag: Flag;
  hung: HungFlag;
}

/** Searches the lowest number of lines that holds all labels; null where no number of them does. */
function hangPoles(flags: readonly Flag[], left: number, right: number): Hanging[] | null {
  const sum = flags.reduce((lines, { label }) => lines + label.lines.length, 0);
  for (let deepest = 1; deepest <= sum; deepest++) {
    const found = extend([], flags, deepest, left, right);
    if (found !== null) return found;
  }
  return flags.length === 0 ? [] : null;
}

function extend(
  done: readonly Hanging[],
  rest: readonly Flag[],
  deepest: number,
  left: number,
  right: number,
): Hanging[] | null {
  const [flag, ...others] = rest;
  if (flag === undefined) return [...done];
  for (let line = 0; line + flag.label.lines.length <= deepest; line++) {
    for (const hung of placesOf(flag, line, left, right)) {
      if (done.some((other) => areInTheWay(hung, other.hung))) continue;
      const found = extend([...done, { flag, hung }], others, deepest, left, right);
      if (found !== null) return found;
    }
  }
  return null;
}

/** Under the pole, to its right, to its left, or up to the middle of the scale from either side. */
function placesOf(flag: Flag, line: number, left: number, right: number): HungFlag[] {
  const { width } = flag.label;
  const [at, middle] = [flag.at!, (left + right) / 2];
  const under = Math.min(Math.max(at - width / 2, left), right - width);
  const starts = [under, at + BESIDE, at - BESIDE - width, middle - width - APART, middle + APART];
  return starts
    .filter((x) => x >= left && x + width <= right && at >= x - BESIDE && at <= x + width + BESIDE)
    .map((x) => {
      const box = boxOf(flag.label, x, line);
      const isBeside = at < x || at > x + width;
      return { ...flag, box, pole: isBeside ? box.y + box.height - 3 : box.y };
    });
}

function hangLoose(flag: Flag, hung: readonly HungFlag[], left: number, right: number): HungFlag {
  for (let line = 0; ; line++) {
    for (let x = left; x + flag.label.width <= right; x += 2 * APART) {
      const loose = { ...flag, box: boxOf(flag.label, x, line), pole: null };
      if (!hung.some((other) => areInTheWay(loose, other))) return loose;
    }
  }
}

/** One below the other without poles: the values in the labels say which mark is meant. */
function listed(flags: readonly Flag[], left: number): Hanging[] {
  let line = 0;
  return flags.map((flag) => {
    const hung = { ...flag, box: boxOf(flag.label, left, line), pole: -BESIDE };
    line += flag.label.lines.length;
    return { flag, hung };
  });
}

function areInTheWay(a: HungFlag, b: HungFlag): boolean {
  const roomy = { ...a.box, x: a.box.x - APART, width: a.box.width + 2 * APART };
  const poleBoxes = (one: HungFlag): Box[] =>
    one.at === null || one.pole === null
      ? []
      : [{ x: one.at - 2, y: -ABOVE, width: 4, height: ABOVE + one.pole }];
  return (
    overlap(roomy, b.box) ||
    poleBoxes(a).some((pole) => overlap(pole, b.box)) ||
    poleBoxes(b).some((pole) => overlap(pole, a.box))
  );
}

function boxOf({ width, height }: Label, x: number, line: number): Box {
  return { x, y: line * LINE_HEIGHT, width, height };
}
