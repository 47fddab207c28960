/** A method bound to inputs as a spec would give them, without the rest of the study. */

import { methods } from '../../src/generated/catalogue.ts';
import type { MethodName, Spec } from '../../src/generated/spec.ts';
import type { Calculation, Method } from '../../src/methods/method.ts';
import { smallestInteger } from '../../src/numeric/solve/smallest-integer.ts';
import { normalise } from '../../src/spec/normalise.ts';

export interface Bound {
  method: Method;
  calculation: Calculation;
  /** The stated effect; 0 when none is stated. */
  effect: number;
}

/** @param inputs of the aim, @param criteria default: alpha .05, power .80 */
export function bind(
  name: MethodName,
  inputs: Record<string, unknown>,
  criteria: Record<string, unknown> = { alpha: 0.05, power: 0.8 },
): Bound {
  const words = { title: 'An invented study', question: '?', population: 'invented', design: 'survey' };
  const aim = {
    id: 'aim',
    role: 'primary',
    objective: 'invented',
    outcome: { name: 'outcome', unit: 'points' },
    analysis: 'invented',
    method: name,
    inputs,
    criteria,
    find: 'power' in criteria ? 'detectable-effect' : 'sample-size',
  };
  const study = normalise({ samplecase: 1, study: words, aims: [aim] } as unknown as Spec, [], 'test');
  const method = methods[name];
  const [first] = study.aims;
  if (first === undefined) throw new Error('the study has one aim');
  const calculation = method.prepare(first);
  return { method, calculation, effect: calculation.effect ?? 0 };
}

/** Smallest n that meets the target, searched here and not by src/plan. */
export function needed({ method, calculation, effect }: Bound, target: number): number {
  const meets = (n: number) => {
    const achieved = calculation.achieved(n, effect);
    return method.achieves === 'power' ? achieved >= target : achieved <= target;
  };
  return smallestInteger(meets, calculation.smallestN, 1e6, 'always');
}
