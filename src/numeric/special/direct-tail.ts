export type Tail = 'lower' | 'upper';

/** The tail that a continued fraction gives directly at a point of the beta or gamma distribution. It is the
 *  smaller one but for shapes below 1; the other, 1 less it, is never below 1/21, so little is lost. */
export interface DirectTail {
  tail: Tail;
  /** ln of the front factor: the density of the log odds (beta) or of the logarithm (gamma). */
  logFront: number;
  /** Probability of that tail over the front factor. */
  ratio: number;
  /** Minus the slope of logFront on that scale: how far the point lies above the mean. */
  excess: number;
}

export function probabilityOf(direct: DirectTail, wanted: Tail): number {
  const probability = Math.exp(direct.logFront) * direct.ratio;
  return direct.tail === wanted ? probability : 1 - probability;
}

export function logProbabilityOf(direct: DirectTail, wanted: Tail): number {
  if (direct.tail === wanted) return direct.logFront + Math.log(direct.ratio);
  return Math.log1p(-Math.exp(direct.logFront) * direct.ratio);
}

/** Probability of the wanted tail over the front factor. */
export function ratioOf(direct: DirectTail, wanted: Tail): number {
  if (direct.tail === wanted) return direct.ratio;
  return Math.exp(-direct.logFront) - direct.ratio;
}
