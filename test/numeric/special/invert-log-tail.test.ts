import { describe, expect, test } from 'vitest';
import type { DirectTail } from '../../../src/numeric/special/direct-tail.ts';
import { invertLogTail } from '../../../src/numeric/special/invert-log-tail.ts';
import { expectWithin } from '../fixture.ts';

/** The exponential distribution: the upper tail is e^-v, the density of ln v is v e^-v. */
function exponential(v: number): DirectTail {
  const logFront = Math.log(v) - v;
  if (v > 1) return { tail: 'upper', logFront, ratio: 1 / v, excess: v - 1 };
  return { tail: 'lower', logFront, ratio: Math.expm1(v) / v, excess: v - 1 };
}

describe('invertLogTail', () => {
  test('converges from starts that are wrong by orders of magnitude', () => {
    for (const start of [1e-6, 0.1, 3, 500, 1e5]) {
      expectWithin(invertLogTail('upper', 1e-20, start, exponential), 20 * Math.LN10, 1e-15);
      expectWithin(invertLogTail('lower', 1e-20, start, exponential), 1e-20, 1e-13);
    }
  });

  test('gives back a start that no double should hold', () => {
    expect(invertLogTail('upper', 0.1, Infinity, exponential)).toBe(Infinity);
  });
});
