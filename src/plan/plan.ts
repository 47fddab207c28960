/** What the planning of a study yields, as data. */

import type { Calculation, Method } from '../methods/method.ts';
import type { Aim, Study } from '../spec/study.ts';
import type { StageCount } from './losses.ts';

/** What a given number analysed buys for one aim. */
export interface Yield {
  n: number;
  /** Power, or width of the interval; null when no effect is stated. */
  achieved: number | null;
  /** Smallest effect with the target power; null for an interval, without a target, or out of reach. */
  detectable: number | null;
}

export interface AimPlan {
  aim: Aim;
  method: Method;
  calculation: Calculation;
  /** Target power, or wanted width; null when power is asked for and none is stated. */
  target: number | null;
  effect: number | null;
  /** The number analysed that the aim itself needs, or the number given. */
  own: Yield;
  /** The same with one analysed fewer, to show that `own.n` is the smallest; null when n was given. */
  oneFewer: Yield | null;
  /** Real-valued solution; null when n was given. */
  unrounded: number | null;
  /** To enrol for `own.n`. */
  enrol: number;
  /** At the number the study plans with. */
  planned: Yield;
  /** At the most that can be had; null when that is enough or no maximum is stated. */
  attainable: Yield | null;
}

export interface StudyPlan {
  study: Study;
  aims: AimPlan[];
  /** Number analysed that the study plans with. */
  evaluable: number;
  enrol: number;
  stages: StageCount[];
  /** The aim with the largest requirement among primary and key-secondary ones; null when the number was given. */
  drivenBy: AimPlan | null;
  /** What the stated maximum leaves for the analysis, when it is too small; otherwise null. */
  shortfall: { maximum: number; evaluable: number } | null;
}

export function drivesSize(aim: Aim): boolean {
  return aim.role === 'primary' || aim.role === 'key-secondary';
}
