/** Noncentral t distribution.
 *  Domain: any t, df .5–1e7, noncentrality δ from −316 to 316 (δ² ≤ 1e5).
 *  Relative error (test/fixtures/noncentral-t.json): 1e-12 for both tails down to 1e-200.
 *  @throws {RangeError} names argument, value and domain
 *
 *  Where t and δ have the same sign the tail beyond t is half a sum over whole and half-integer weights of tails of
 *  beta distributions (Benton & Krishnamoorthy 2003), and the tail before it is that below 0 and half the sum of the
 *  other tails: all positive. Where the signs differ the series would alternate; the tail beyond t is then the
 *  integral of normal tails over the distribution of the standard deviation, whose integrand is positive. */

import { requireBetween, requireFinite, requireProbability } from '../domain.ts';
import { mixtureTail } from '../mixtures/mixture-tail.ts';
import { betaLadder } from '../mixtures/tail-ladder.ts';
import { poissonWeights } from '../mixtures/weights.ts';
import { integrate } from '../solve/quadrature.ts';
import { findRoot } from '../solve/root.ts';
import { betaPointOfProduct } from '../special/beta-point.ts';
import { devianceTerm } from '../special/deviance.ts';
import type { Tail } from '../special/direct-tail.ts';
import { stirlingError } from '../special/stirling-error.ts';
import { normalLogUpperTail, normalLowerTail } from './normal.ts';
import { tLowerTail, tUpperTail } from './student-t.ts';

/** P(T > t). */
export function noncentralTUpperTail(t: number, df: number, noncentrality: number): number {
  check('noncentralTUpperTail', t, df, noncentrality);
  if (noncentrality === 0) return tUpperTail(t, df);
  if (noncentrality < 0) return lowerTail(-t, df, -noncentrality);
  return upperTail(t, df, noncentrality);
}

/** P(T ≤ t). */
export function noncentralTLowerTail(t: number, df: number, noncentrality: number): number {
  check('noncentralTLowerTail', t, df, noncentrality);
  if (noncentrality === 0) return tLowerTail(t, df);
  if (noncentrality < 0) return upperTail(-t, df, -noncentrality);
  return lowerTail(t, df, noncentrality);
}

/** The t with P(T ≤ t) = p, 0 < p < 1. */
export function noncentralTQuantile(p: number, df: number, noncentrality: number): number {
  check('noncentralTQuantile', 0, df, noncentrality);
  requireProbability('noncentralTQuantile', 'p', p);
  // The smaller of the two tails decides, so that neither end of the axis loses digits.
  const side = p <= 0.5 ? noncentralTLowerTail : noncentralTUpperTail;
  const goal = Math.log(Math.min(p, 1 - p));
  const miss = (t: number) => Math.log(Math.max(side(t, df, noncentrality), Number.MIN_VALUE)) - goal;
  const above = miss(noncentrality) > 0;
  // Each tail grows towards the other's end.
  let step = above === p <= 0.5 ? -1 : 1;
  let [from, to] = [noncentrality, noncentrality + step];
  while (miss(to) > 0 === above) {
    from = to;
    step *= 2;
    to += step;
  }
  return findRoot(miss, from, to);
}

/** The t with P(T > t) = p, 0 < p < 1. */
export function noncentralTUpperQuantile(p: number, df: number, noncentrality: number): number {
  return -noncentralTQuantile(p, df, -noncentrality);
}

function check(name: string, t: number, df: number, noncentrality: number): void {
  requireFinite(name, 't', t);
  requireBetween(name, 'df', df, 0.5, 1e7);
  requireBetween(name, 'noncentrality', noncentrality, -316, 316);
}

/** P(T > t) for δ > 0. */
function upperTail(t: number, df: number, delta: number): number {
  if (t === 0) return normalLowerTail(delta);
  return t > 0 ? halfMixture(t, df, delta, 'upper') : 1 - oppositeTail(-t, df, delta);
}

/** P(T ≤ t) for δ > 0. */
function lowerTail(t: number, df: number, delta: number): number {
  if (t === 0) return normalLowerTail(-delta);
  return t > 0 ? normalLowerTail(-delta) + halfMixture(t, df, delta, 'lower') : oppositeTail(-t, df, delta);
}

function halfMixture(t: number, df: number, delta: number, tail: Tail): number {
  const weights = poissonWeights((delta * delta) / 2);
  const ladder = betaLadder(betaPointOfProduct(t, t, df), df / 2, tail);
  return (mixtureTail(weights, ladder, 0.5) + mixtureTail(weights, ladder, 0.5, 0.5)) / 2;
}

/** Terms of the integrand this far below its largest are left out. */
const NEGLIGIBLE = 44;

/** P(T < −t) for t, δ > 0: the integral over s of P(Z > δ + t·s), s the standard deviation of df normals. */
function oppositeTail(t: number, df: number, delta: number): number {
  const half = df / 2;
  const constant = 0.5 * Math.log(half / (2 * Math.PI)) - stirlingError(half) + Math.LN2;
  // Over u = ln s, where the density of s is e^(constant − half·(w − 1 − ln w)), w = s².
  const logIntegrand = (u: number) => {
    const w = Math.exp(2 * u);
    return (
      constant - half * devianceTerm(Math.expm1(2 * u), w, 0) + normalLogUpperTail(delta + t * Math.exp(u))
    );
  };
  const mode = highest(logIntegrand, Math.min(0, -Math.log(t + 1)));
  const top = logIntegrand(mode);
  const edge = (direction: 1 | -1) => {
    let step = 1 / Math.sqrt(df + 1);
    while (logIntegrand(mode + direction * step) > top - NEGLIGIBLE) step *= 1.5;
    return mode + direction * step;
  };
  const scaled = (u: number) => Math.exp(logIntegrand(u) - top);
  return Math.exp(top) * (integrate(scaled, edge(-1), mode) + integrate(scaled, mode, edge(1)));
}

/** Where a log-concave function is highest, well enough to place its peak. */
function highest(f: (u: number) => number, start: number): number {
  let step = 0.5;
  let at = start;
  while (step > 1e-7) {
    const here = f(at);
    if (f(at + step) > here) at += step;
    else if (f(at - step) > here) at -= step;
    else step /= 2;
  }
  return at;
}
