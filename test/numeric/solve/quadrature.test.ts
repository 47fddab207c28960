import { describe, expect, test } from 'vitest';
import { integrate } from '../../../src/numeric/solve/quadrature.ts';
import { expectWithin, refusal } from '../fixture.ts';

describe('adaptive quadrature', () => {
  // Integrals in closed form.
  test.each([
    ['x⁶ from 0 to 2', (x: number) => x ** 6, 0, 2, 128 / 7],
    ['eˣ from −1 to 1', Math.exp, -1, 1, Math.E - 1 / Math.E],
    ['sin from 0 to π', Math.sin, 0, Math.PI, 2],
    ['1/(1 + x²) from −5 to 5', (x: number) => 1 / (1 + x * x), -5, 5, 2 * Math.atan(5)],
    ['√x from 0 to 1', Math.sqrt, 0, 1, 2 / 3],
    [
      'a narrow normal density',
      (x: number) => Math.exp(-((x - 0.3) ** 2) * 5e5),
      0,
      1,
      Math.sqrt(Math.PI / 5e5),
    ],
  ])('%s', (_name, f, lower, upper, truth) => {
    expectWithin(integrate(f, lower, upper), truth, 1e-11);
  });

  test('limits the other way round change the sign, equal limits give 0', () => {
    expectWithin(integrate(Math.exp, 1, 0), 1 - Math.E, 1e-14);
    expect(integrate(Math.exp, 2, 2)).toBe(0);
  });

  test('refuses limits and functions that are no numbers', () => {
    expect(refusal(() => integrate(Math.exp, 0, Infinity))).toBe(
      'RangeError: integrate: the limits are 0 and Infinity; finite numbers are needed',
    );
    expect(refusal(() => integrate(() => Number.NaN, 0, 1))).toBe(
      'RangeError: integrate: the function gives no number between 0 and 1',
    );
  });
});
