import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { findRoot } from '../../../src/numeric/solve/root.ts';
import { expectWithin, refusal } from '../fixture.ts';

/** Runs findRoot and counts the evaluations. */
function counted(
  f: (x: number) => number,
  lower: number,
  upper: number,
): { root: number; evaluations: number } {
  let evaluations = 0;
  const root = findRoot(
    (x) => {
      evaluations++;
      return f(x);
    },
    lower,
    upper,
  );
  return { root, evaluations };
}

describe('findRoot', () => {
  test('finds ln 5 to rounding in few evaluations', () => {
    const { root, evaluations } = counted((x) => Math.exp(x) - 5, -10, 10);
    expectWithin(root, Math.log(5), 3e-16);
    expect(evaluations).toBeLessThanOrEqual(15);
  });

  test('takes the limits in either order', () => {
    expectWithin(
      findRoot((x) => x * x - 2, 3, 0),
      Math.SQRT2,
      5e-16,
    );
  });

  test('returns a limit at which the function is 0', () => {
    expect(findRoot((x) => x - 1, 1, 5)).toBe(1);
    expect(findRoot((x) => x - 5, 1, 5)).toBe(5);
  });

  test('finds where a step changes sign, to neighbouring doubles', () => {
    const { root, evaluations } = counted((x) => (x < Math.PI ? -1 : 1), 0, 100);
    expectWithin(root, Math.PI, 5e-16);
    expect(evaluations).toBeLessThanOrEqual(4 * 70);
  });

  test('follows infinite values and flat stretches', () => {
    expectWithin(
      findRoot((x) => (x > 50 ? Infinity : (x - 7) ** 9), -10, 100),
      7,
      1e-15,
    );
    expectWithin(
      findRoot((x) => Math.tanh(1e6 * (x - 0.3)), -4, 9),
      0.3,
      5e-16,
    );
  });

  test('a looser tolerance is met and costs less', () => {
    let evaluations = 0;
    const root = findRoot(
      (x) => {
        evaluations++;
        return Math.cos(x) - x;
      },
      0,
      2,
      { relativeTolerance: 1e-4 },
    );
    expectWithin(root, 0.7390851332151607, 1e-4);
    expect(evaluations).toBeLessThan(counted((x) => Math.cos(x) - x, 0, 2).evaluations);
  });

  test('inverts increasing functions over wide brackets', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-8, max: 1e8, noNaN: true }),
        fc.double({ min: 0.2, max: 5, noNaN: true }),
        (truth, power) => {
          const { root, evaluations } = counted((x) => x ** power - truth ** power, 0, 1e9);
          // The function itself is 0 over a stretch of 1e-16/power around the root.
          expectWithin(root, truth, 5e-15);
          expect(evaluations).toBeLessThanOrEqual(250);
        },
      ),
    );
  });

  test.each([
    [
      () => findRoot((x) => x * x + 1, -1, 2),
      'RangeError: findRoot: f(-1) is 2 and f(2) is 5; opposite signs are needed',
    ],
    [
      () => findRoot((x) => (x > 0.4 ? Number.NaN : -1), 0, 1),
      'RangeError: findRoot: f(1) is NaN; a number is needed',
    ],
    [
      () => findRoot((x) => x, -Infinity, 1),
      'RangeError: findRoot: lower is -Infinity and upper is 1; finite numbers are needed',
    ],
  ])('%o is refused', (call, text) => {
    expect(refusal(call)).toBe(text);
  });
});
