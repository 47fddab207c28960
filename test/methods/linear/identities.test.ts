/** Identities that hold between the methods whatever the numbers. */

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { MethodName } from '../../../src/generated/spec.ts';
import { findRoot } from '../../../src/numeric/solve/root.ts';
import { bind, needed } from '../bind-aim.ts';

const predictorValues = fc.constantFrom('fixed' as const, 'sampled' as const);
const counts = fc.integer({ min: 0, max: 20 });
const f2 = fc.double({ min: 0.01, max: 1.5, noNaN: true });
const spare = fc.integer({ min: 1, max: 400 });
const alpha = fc.constantFrom(0.001, 0.01, 0.05, 0.1);

const close = (value: number, truth: number, tolerance: number) =>
  expect(Math.abs(value / truth - 1)).toBeLessThan(tolerance);

describe('the methods agree with each other', () => {
  test('the overall test is the partial one with nothing adjusted for', () => {
    fc.assert(
      fc.property(counts, f2, spare, predictorValues, alpha, (k, effect, extra, values, level) => {
        const criteria = { alpha: level, power: 0.9 };
        const n = k + 1 + 1 + extra;
        const shared = { predictor_values: values, effect: { f2: effect } };
        const overall = bind('linear-overall', { predictors: k + 1, ...shared }, criteria).calculation;
        const nested = bind(
          'linear-nested',
          { added: k + 1, adjusted_for: 0, ...shared },
          criteria,
        ).calculation;
        expect(overall.achieved(n, effect)).toBe(nested.achieved(n, effect));
      }),
    );
  });

  test('the two-sided test of a coefficient is the partial one of one predictor', () => {
    fc.assert(
      fc.property(counts, f2, spare, predictorValues, alpha, (p, effect, extra, values, level) => {
        const shared = { adjusted_for: p, predictor_values: values, effect: { f2: effect } };
        const two = bind('linear-coefficient', shared, { alpha: level, power: 0.9, sides: 2 }).calculation;
        const nested = bind(
          'linear-nested',
          { added: 1, ...shared },
          { alpha: level, power: 0.9 },
        ).calculation;
        const n = p + 2 + extra;
        expect(two.achieved(n, effect)).toBe(nested.achieved(n, effect));
      }),
    );
  });

  test('one-sided power lies above two-sided power at the level and meets it from below at half the level', () => {
    fc.assert(
      fc.property(counts, f2, spare, predictorValues, alpha, (p, effect, extra, values, level) => {
        const at = (sides: 1 | 2, height: number) =>
          bind(
            'linear-coefficient',
            { adjusted_for: p, predictor_values: values, effect: { f2: effect } },
            { alpha: height, power: 0.9, sides },
          ).calculation.achieved(p + 2 + extra, effect);
        const two = at(2, level);
        expect(at(1, level)).toBeGreaterThan(two * (1 - 1e-12));
        // The two-sided test also rejects in the wrong direction, which half the level bounds.
        expect(at(1, level / 2)).toBeLessThanOrEqual(two * (1 + 1e-11));
        expect(two - at(1, level / 2)).toBeLessThan(level / 2);
      }),
    );
  });

  test('an interaction is a coefficient with two more predictors adjusted for', () => {
    fc.assert(
      fc.property(counts, f2, spare, predictorValues, (p, effect, extra, values) => {
        const criteria = { alpha: 0.05, power: 0.9, sides: 2 };
        const shared = { predictor_values: values, effect: { f2: effect } };
        const product = bind(
          'linear-interaction',
          { kind: 'continuous-binary', adjusted_for: p, ...shared },
          criteria,
        ).calculation;
        const one = bind('linear-coefficient', { adjusted_for: p + 2, ...shared }, criteria).calculation;
        const n = p + 4 + extra;
        expect(product.achieved(n, effect)).toBe(one.achieved(n, effect));
      }),
    );
  });

  test('sampled predictors have less power than fixed ones where power is worth planning for', () => {
    fc.assert(
      fc.property(counts, f2, spare, (p, effect, extra) => {
        const at = (values: 'fixed' | 'sampled') => {
          const inputs = { added: 2, adjusted_for: p, predictor_values: values, effect: { f2: effect } };
          return bind('linear-nested', inputs).calculation.achieved(p + 3 + extra, effect);
        };
        fc.pre(at('fixed') > 0.6 && at('fixed') < 0.9999);
        expect(at('sampled')).toBeLessThan(at('fixed'));
      }),
    );
  });
});

/** A testing method with its inputs; the effect is f². */
const TESTS: readonly (readonly [string, MethodName, Record<string, unknown>, Record<string, unknown>])[] = [
  ['overall', 'linear-overall', { predictors: 6 }, {}],
  ['nested', 'linear-nested', { added: 3, adjusted_for: 5 }, {}],
  ['two-sided', 'linear-coefficient', { adjusted_for: 4 }, { sides: 2 }],
  ['one-sided', 'linear-coefficient', { adjusted_for: 4 }, { sides: 1 }],
  ['interaction', 'linear-interaction', { kind: 'continuous-binary', adjusted_for: 1 }, { sides: 2 }],
];

// The power of the F test rises with the noncentrality and with the residual degrees of freedom (Das Gupta & Perlman
// 1974, from memory), and λ = f²·n rises with both n and f²; so the smallest n found keeps its target for every larger
// one. Averaging over sampled predictors keeps the order in f² and in n, as the weights move stochastically upwards.
describe.each(TESTS)('the three questions agree: %s', (_, name, inputs, criteria) => {
  const at = (effect: number, values: 'fixed' | 'sampled', level = 0.05) =>
    bind(
      name,
      { ...inputs, predictor_values: values, effect: { f2: effect } },
      { alpha: level, power: 0.8, ...criteria },
    );

  test('from n to power to effect to n is the way back', () => {
    fc.assert(
      fc.property(f2, spare, predictorValues, (effect, extra, values) => {
        const bound = at(effect, values);
        const n = bound.calculation.smallestN + extra;
        const power = bound.calculation.achieved(n, effect);
        fc.pre(power > 0.06 && power < 0.999);
        const found = findRoot((x) => bound.calculation.achieved(n, x) - power, effect / 10, effect * 10);
        close(found, effect, 1e-9);
        expect(needed(bound, power * (1 - 1e-13))).toBe(n);
      }),
    );
  });

  test('power rises with n, with the effect and with alpha', () => {
    fc.assert(
      fc.property(f2, spare, predictorValues, (effect, extra, values) => {
        const { calculation } = at(effect, values);
        const n = calculation.smallestN + extra;
        const power = calculation.achieved(n, effect);
        fc.pre(power < 0.999999);
        expect(calculation.achieved(n + 1, effect)).toBeGreaterThan(power);
        expect(calculation.achieved(n, effect * 1.01)).toBeGreaterThan(power);
        expect(at(effect, values, 0.06).calculation.achieved(n, effect)).toBeGreaterThan(power);
      }),
    );
  });

  test('the number found keeps the target for the 200 numbers after it, and one fewer misses it', () => {
    fc.assert(
      fc.property(f2, predictorValues, fc.constantFrom(0.5, 0.8, 0.95), (effect, values, target) => {
        const bound = at(effect, values);
        const n = needed(bound, target);
        const { achieved, smallestN } = bound.calculation;
        for (let more = n; more < n + 200; more += 1) {
          expect(achieved(more, effect)).toBeGreaterThanOrEqual(target);
        }
        if (n > smallestN) expect(achieved(n - 1, effect)).toBeLessThan(target);
      }),
      { numRuns: 25 },
    );
  });
});

describe('directions', () => {
  test('the detectable slope, correlation and difference in slopes keep the sign of the stated one', () => {
    for (const sign of [1, -1]) {
      const slope = bind('linear-coefficient', {
        adjusted_for: 2,
        effect: { slope: sign * 0.4, residual_sd: 2, predictor_sd: 1.5, predictor_r2: 0.3 },
      });
      const difference = bind('linear-interaction', {
        kind: 'continuous-binary',
        adjusted_for: 0,
        effect: {
          slope_difference: sign * 0.4,
          residual_sd: 2,
          predictor_sd: 1.5,
          moderator_proportion: 0.4,
        },
      });
      const keys = ['slope', 'slope_difference'];
      for (const { calculation, effect } of [slope, difference]) {
        const forms = calculation.equivalents(effect);
        const stated = forms.find(({ key }) => keys.includes(key))?.value ?? 0;
        close(stated, sign * 0.4, 1e-13);
        expect(Math.sign(forms.find(({ key }) => key === 'partial_correlation')?.value ?? 0)).toBe(sign);
      }
    }
  });

  test('the detectable effect alone, without a stated one, is positive', () => {
    const inputs = { adjusted_for: 2, effect: { residual_sd: 2, predictor_sd: 1.5, predictor_r2: 0.3 } };
    const { calculation } = bind('linear-coefficient', inputs);
    expect(calculation.effect).toBeNull();
    const slope = calculation.equivalents(0.05).find(({ key }) => key === 'slope')?.value ?? 0;
    close(slope, (2 * Math.sqrt(0.05 / 0.7)) / 1.5, 1e-13);
  });
});
