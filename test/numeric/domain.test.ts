import { describe, expect, test } from 'vitest';
import {
  requireBetween,
  requireFinite,
  requireNonNegative,
  requirePositive,
  requireProbability,
  requireWholeBetween,
  requireZeroOrBetween,
} from '../../src/numeric/domain.ts';
import { refusal } from './fixture.ts';

describe('a refusal names function, argument, value and domain', () => {
  test.each([
    [() => requirePositive('f', 'x', 0), 'RangeError: f: x is 0; a finite number above 0 is needed'],
    [
      () => requirePositive('f', 'x', Infinity),
      'RangeError: f: x is Infinity; a finite number above 0 is needed',
    ],
    [() => requireFinite('f', 'x', -Infinity), 'RangeError: f: x is -Infinity; a finite number is needed'],
    [() => requireNonNegative('f', 'x', -1), 'RangeError: f: x is -1; a finite number from 0 is needed'],
    [
      () => requireNonNegative('f', 'x', Number.NaN),
      'RangeError: f: x is NaN; a finite number from 0 is needed',
    ],
    [() => requireBetween('f', 'x', 3, -1, 2), 'RangeError: f: x is 3; a number from -1 to 2 is needed'],
    [
      () => requireZeroOrBetween('f', 'x', 1e-310, 1e-300, 1),
      'RangeError: f: x is 1e-310; 0 or a number from 1e-300 to 1 is needed',
    ],
    [() => requireProbability('f', 'p', 0), 'RangeError: f: p is 0; a number above 0 and below 1 is needed'],
    [() => requireProbability('f', 'p', 1), 'RangeError: f: p is 1; a number above 0 and below 1 is needed'],
    [
      () => requireWholeBetween('f', 'n', 2.5, 1, 9),
      'RangeError: f: n is 2.5; a whole number from 1 to 9 is needed',
    ],
  ])('%o', (call, text) => {
    expect(refusal(call)).toBe(text);
  });

  test('what lies in the domain passes, ends included', () => {
    expect(() => {
      requireFinite('f', 'x', -1e308);
      requirePositive('f', 'x', 1e-300);
      requireNonNegative('f', 'x', 0);
      requireBetween('f', 'x', 2, -1, 2);
      requireZeroOrBetween('f', 'x', 0, 1e-300, 1);
      requireProbability('f', 'p', 1e-300);
      requireWholeBetween('f', 'n', 9, 1, 9);
    }).not.toThrow();
  });
});
