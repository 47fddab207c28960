/** Σ weight(x)·tail(shape + x) over x = offset, offset + 1, …: all terms positive, summed from the negligible ones in
 *  the direction in which the tails grow, so that nothing cancels. The terms are log-concave in x; their largest is
 *  found by bisection, however far it lies from the largest weight.
 *  Source: Benton & Krishnamoorthy (2003) for starting at the largest term; the direction of summing is ours. */

import { requireBetween } from '../domain.ts';
import type { TailLadder } from './tail-ladder.ts';
import type { Weights } from './weights.ts';

/** Terms this far (in natural logarithms) below the largest are left out: 1e-19 of it. */
const NEGLIGIBLE = 44;
/** The recurrences start afresh after so many terms, before their rounding adds up. */
const RENEW = 512;

/** Below this a sum over the range of the weights alone may lack terms that matter. */
const BULK = 1e-6;

/** @param shape of the tail that belongs to weight 0 */
export function mixtureTail(weights: Weights, ladder: TailLadder, shape: number, offset = 0): number {
  const bulk = bulkTail(weights, ladder, shape, offset);
  if (bulk > BULK) return bulk;
  const logTermAt = (i: number) => weights.logWeightAt(offset + i) + ladder.logTailAt(shape + offset + i);
  const mode = largestTerm(logTermAt, Math.max(0, Math.round(weights.centre - offset)));
  const floor = logTermAt(mode) - NEGLIGIBLE;
  const first = lastBelow(logTermAt, floor, mode, -1);
  const last = lastBelow(logTermAt, floor, mode, 1);
  return sumBetween(weights, ladder, shape, offset, first, last);
}

/** The sum over where the weights are: what it leaves out is below 1e-18, however large the tails there. */
function bulkTail(weights: Weights, ladder: TailLadder, shape: number, offset: number): number {
  const { centre, deviation } = weights;
  const middle = Math.max(0, Math.floor(centre - offset));
  const floor = weights.logWeightAt(offset + middle) - NEGLIGIBLE;
  let reach = 8 * deviation;
  const first = Math.max(0, Math.floor(middle - 9.5 * deviation - 2));
  while (weights.logWeightAt(offset + Math.ceil(middle + reach + 8)) > floor) reach = reach * 1.5 + 8;
  return sumBetween(weights, ladder, shape, offset, first, Math.ceil(middle + reach + 8));
}

function sumBetween(
  weights: Weights,
  ladder: TailLadder,
  shape: number,
  offset: number,
  first: number,
  last: number,
): number {
  requireBetween('mixtureTail', 'shape of the last term', shape + offset + last, 0.25, ladder.largestShape);
  return ladder.tail === 'upper'
    ? sumUpwards(weights, ladder, shape, offset, first, last)
    : sumDownwards(weights, ladder, shape, offset, first, last);
}

/** Index of the largest of log-concave terms. */
function largestTerm(logTermAt: (i: number) => number, start: number): number {
  const rises = (i: number) => logTermAt(i + 1) > logTermAt(i);
  let [low, high] = [start, start];
  let step = 1;
  if (rises(start)) {
    while (rises(high)) {
      low = high;
      high += step;
      step *= 2;
    }
  } else {
    while (low > 0 && !rises(low)) {
      high = low;
      low = Math.max(0, low - step);
      step *= 2;
    }
    if (low === 0 && !rises(0)) return 0;
  }
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (rises(middle)) low = middle;
    else high = middle;
  }
  return high;
}

/** From the mode outwards, the index beyond which terms are below the floor (or 0). */
function lastBelow(logTermAt: (i: number) => number, floor: number, mode: number, direction: 1 | -1): number {
  let inside = mode;
  let step = 1;
  for (;;) {
    const next = inside + direction * step;
    if (next <= 0) {
      if (direction === -1 && logTermAt(0) >= floor) return 0;
      break;
    }
    if (logTermAt(next) < floor) break;
    inside = next;
    step *= 2;
  }
  let outside = Math.max(0, inside + direction * step);
  while (Math.abs(outside - inside) > 1) {
    const middle = Math.floor((inside + outside) / 2);
    if (logTermAt(middle) < floor) outside = middle;
    else inside = middle;
  }
  return inside;
}

function sumUpwards(
  weights: Weights,
  ladder: TailLadder,
  shape: number,
  offset: number,
  first: number,
  last: number,
): number {
  let sum = 0;
  for (let from = first; from <= last; from += RENEW) {
    const to = Math.min(last, from + RENEW - 1);
    let weight = Math.exp(weights.logWeightAt(offset + from));
    let tail = ladder.tailAt(shape + offset + from);
    let step = ladder.stepAt(shape + offset + from);
    for (let i = from; i <= to; i += 1) {
      sum += weight * tail;
      weight *= weights.growthAt(offset + i);
      tail += step;
      step *= ladder.growthAt(shape + offset + i);
    }
  }
  return sum;
}

function sumDownwards(
  weights: Weights,
  ladder: TailLadder,
  shape: number,
  offset: number,
  first: number,
  last: number,
): number {
  let sum = 0;
  for (let from = last; from >= first; from -= RENEW) {
    const to = Math.max(first, from - RENEW + 1);
    let weight = Math.exp(weights.logWeightAt(offset + from));
    let tail = ladder.tailAt(shape + offset + from);
    let step = ladder.stepAt(shape + offset + from);
    for (let i = from; i >= to; i -= 1) {
      sum += weight * tail;
      if (i === to) break;
      weight /= weights.growthAt(offset + i - 1);
      step /= ladder.growthAt(shape + offset + i - 1);
      tail += step;
    }
  }
  return sum;
}
