/** The linear family against published and independently computed values. Each says where its truth comes from; where a
 *  published number is off by rounding or by an approximation, the test says how. "Computed outside" means: from base
 *  distribution functions of SciPy, not by this project. */

import { describe, expect, test } from 'vitest';
import { type Bound, bind, needed } from '../bind-aim.ts';
import {
  ADD_FIVE,
  COHEN_1992,
  COHEN_1992_F2,
  GREEN_1991,
  GREEN_1991_PREDICTORS,
} from './published-tables.ts';

type Values = 'fixed' | 'sampled';

function overall(predictors: number, effect: object, predictorValues: Values, alpha = 0.05): Bound {
  const criteria = { alpha, power: 0.8 };
  return bind('linear-overall', { predictors, predictor_values: predictorValues, effect }, criteria);
}

/** A simple correlation is a coefficient with nothing adjusted for. */
function correlation(r: number, criteria: object): Bound {
  const inputs = { adjusted_for: 0, predictor_values: 'sampled', effect: { partial_correlation: r } };
  return bind('linear-coefficient', inputs, { ...criteria });
}

function coefficient(adjustedFor: number, f2: number, predictorValues: Values): Bound {
  const inputs = { adjusted_for: adjustedFor, predictor_values: predictorValues, effect: { f2 } };
  return bind('linear-coefficient', inputs, { alpha: 0.05, power: 0.8, sides: 2 });
}

describe('the overall F test in published tables', () => {
  test.each(COHEN_1992)('Cohen (1992), alpha %d, %d predictors', (alpha, k, printed, exact) => {
    const found = COHEN_1992_F2.map((f2) => needed(overall(k, { f2 }, 'fixed', alpha), 0.8));
    expect(found).toEqual(exact);
    found.forEach((n, index) => {
      expect(Math.abs(n - (printed[index] ?? 0))).toBeLessThanOrEqual(5);
    });
  });

  test.each(GREEN_1991)('Green (1991), f² $f2', ({ f2, r2, printed, fixedF2, fixedR2, sampledR2 }) => {
    const column = (effect: object, values: Values) =>
      GREEN_1991_PREDICTORS.map((k) => needed(overall(k, effect, values), 0.8));
    expect(column({ f2 }, 'fixed')).toEqual(fixedF2);
    expect(column({ r2 }, 'fixed')).toEqual(fixedR2);
    expect(column({ r2 }, 'sampled')).toEqual(sampledR2);
    fixedF2.forEach((n, index) => {
      const inPrint = printed[index] ?? 0;
      if (inPrint !== 844) expect(Math.abs(n - inPrint)).toBeLessThanOrEqual(5);
    });
  });

  test.each(ADD_FIVE)('Gatsonis & Sampson (1989): R² %d, %d predictors', (r2, k, fixed, sampled) => {
    expect(needed(overall(k, { r2 }, 'fixed'), 0.8)).toBe(fixed);
    expect(needed(overall(k, { r2 }, 'sampled'), 0.8)).toBe(sampled);
    // The rule is safe and generous: the exact differences are 2 or 3.
    expect(sampled - fixed).toBeLessThanOrEqual(5);
  });

  // 40-digit arithmetic, rounded to doubles, as given in the project's notes on libraries: df1, df2, λ, power at alpha .05.
  test.each([
    [4, 115, 18, 0.9331241885339553],
    [7, 52, 9.5, 0.5217445021196732],
    [2, 200, 12, 0.8781400334398876],
    [3, 2400, 12.7, 0.8615540987773193],
    [1, 26, 8.4, 0.79668326572273],
    [6, 99, 0.5, 0.0692079027318654],
    [12, 20000, 35, 0.9915615739661989],
  ])('the power at %d and %d degrees of freedom with λ %d is right to 1e-12', (k, v, lambda, power) => {
    const n = k + v + 1;
    const { calculation } = overall(k, { f2: lambda / n }, 'fixed');
    expect(Math.abs(calculation.achieved(n, lambda / n) / power - 1)).toBeLessThan(1e-12);
  });
});

describe('the project’s check values for regression (computed outside)', () => {
  const nested = (predictorValues: Values) =>
    bind(
      'linear-nested',
      {
        added: 3,
        adjusted_for: 5,
        predictor_values: predictorValues,
        effect: { partial_r2: 0.06 },
      },
      { alpha: 0.05, power: 0.9 },
    );

  test('M08: fixed predictors need 227; the older convention for the noncentrality needs 231', () => {
    const { calculation, effect } = nested('fixed');
    expect(needed(nested('fixed'), 0.9)).toBe(227);
    expect(calculation.achieved(227, effect)).toBeCloseTo(0.90133, 5);
    expect(calculation.achieved(226, effect)).toBeCloseTo(0.89992, 5);
    const found = calculation.alternatives(effect, 0.9).map(({ n, steps }) => [n, steps(n).at(-1)?.value]);
    expect(found.map(([n]) => n)).toEqual([235, 231]);
    expect(found[1]?.[1]).toBeCloseTo(0.90004, 5);
  });

  test('M09: sampled predictors need 235', () => {
    const { calculation, effect } = nested('sampled');
    expect(needed(nested('sampled'), 0.9)).toBe(235);
    expect(calculation.achieved(235, effect)).toBeCloseTo(0.9004737714, 10);
    expect(calculation.achieved(234, effect)).toBeCloseTo(0.8990774, 7);
    expect(calculation.alternatives(effect, 0.9).map(({ n }) => n)).toEqual([227, 231]);
  });

  test('M07: R² .30 against .25 is f² .07143', () => {
    const inputs = { added: 2, adjusted_for: 3, effect: { r2_full: 0.3, r2_reduced: 0.25 } };
    expect(bind('linear-nested', inputs).effect).toBeCloseTo(0.05 / 0.7, 14);
    const increase = { added: 2, adjusted_for: 3, effect: { r2_increase: 0.05, r2_full: 0.3 } };
    expect(bind('linear-nested', increase).effect).toBeCloseTo(0.05 / 0.7, 14);
  });

  test('M10: R² .20 of 50 people and 6 predictors shrinks to .0884', () => {
    const effect = { observed_r2: 0.2, source_n: 50, source_predictors: 6 };
    const bound = bind('linear-overall', { predictors: 6, effect });
    expect(bound.effect / (1 + bound.effect)).toBeCloseTo(0.0884, 4);
  });

  test('M11: an overlap of .5 doubles the number', () => {
    const at = (overlap: number) =>
      needed(
        bind('linear-coefficient', {
          adjusted_for: 4,
          predictor_values: 'fixed',
          effect: { slope: 0.1, residual_sd: 1, predictor_sd: 1, predictor_r2: overlap },
        }),
        0.8,
      );
    expect(at(0.5) / at(0)).toBeCloseTo(2, 2);
  });

  test('M13: 50 + 8m people for 8 predictors have power .80 from R² .124 on, and .33 for R² .05', () => {
    const { calculation } = overall(8, { r2: 0.124 }, 'fixed');
    expect(calculation.achieved(114, 0.124 / 0.876)).toBeCloseTo(0.8, 2);
    expect(calculation.achieved(114, 0.05 / 0.95)).toBeCloseTo(0.33, 2);
  });

  test('M21: one-sided .05 instead of two-sided .05 saves 21 % at power .80', () => {
    const one = needed(correlation(0.1, { alpha: 0.05, power: 0.8, sides: 1 }), 0.8);
    const two = needed(correlation(0.1, { alpha: 0.05, power: 0.8, sides: 2 }), 0.8);
    expect(1 - one / two).toBeCloseTo(0.21, 2);
  });
});

describe('one coefficient among equally correlated predictors', () => {
  /** f² of one of k predictors when every correlation, with the outcome and among predictors, is r. */
  const partialF2 = (k: number, r: number) => {
    const r2 = (count: number) => (count * r * r) / (1 + (count - 1) * r);
    return (r2(k) - r2(k - 1)) / (1 - r2(k));
  };

  // Maxwell (2000), all correlations .30, power .80, from memory. The printed number is 7.85/f² + k − 1 rounded up; the
  // exact ones (computed outside) lie on both sides of it.
  test.each([
    [2, 141, 142, 146],
    [3, 218, 218, 222],
    [4, 311, 309, 315],
    [5, 419, 417, 423],
    [6, 543, 540, 547],
  ])('Maxwell (2000): %d predictors', (k, printed, fixed, sampled) => {
    const f2 = partialF2(k, 0.3);
    expect(Math.ceil(7.85 / f2 + k - 1)).toBe(printed);
    expect(needed(coefficient(k - 1, f2, 'fixed'), 0.8)).toBe(fixed);
    expect(needed(coefficient(k - 1, f2, 'sampled'), 0.8)).toBe(sampled);
  });

  test('Maxwell (2004): 100 people have power .26 for one of five predictors', () => {
    const f2 = partialF2(5, 0.3);
    const sampled = coefficient(4, f2, 'sampled').calculation.achieved(100, f2);
    const fixed = coefficient(4, f2, 'fixed').calculation.achieved(100, f2);
    // Computed outside; the printed .26 fits sampled predictors, not λ = f²·n.
    expect(sampled).toBeCloseTo(0.2640398, 7);
    expect(fixed).toBeCloseTo(0.2755273, 7);
  });
});

describe('a simple correlation, exact for bivariate normal data', () => {
  // Printed: Cohen (1992), table 2, from memory; .1 and .3 follow Fisher's z, .5 is one low. Exact: computed outside.
  test.each([
    [0.01, [1163, 125, 41], [1163, 125, 42]],
    [0.05, [783, 85, 28], [782, 84, 29]],
    [0.1, [617, 68, 22], [616, 67, 23]],
  ])('Cohen (1992), two-sided alpha %d', (alpha, printed, exact) => {
    const found = [0.1, 0.3, 0.5].map((r) => needed(correlation(r, { alpha, power: 0.8, sides: 2 }), 0.8));
    expect(found).toEqual(exact);
    found.forEach((n, index) => {
      expect(Math.abs(n - (printed[index] ?? 0))).toBeLessThanOrEqual(1);
    });
  });

  test('Zar (2010), from memory: .5 with power .99 needs 64', () => {
    expect(needed(correlation(0.5, { alpha: 0.05, power: 0.99, sides: 2 }), 0.99)).toBe(64);
  });

  test('a printed table for power .90 is Fisher’s z rounded up, the exact number the same or one less', () => {
    // Table of the MRC Cognition and Brain Sciences Unit, Pearson column; exact: computed outside.
    const printed = [1047, 259, 113, 62, 38, 25, 17, 12];
    const found = printed.map((_, index) =>
      needed(correlation((index + 1) / 10, { alpha: 0.05, power: 0.9, sides: 2 }), 0.9),
    );
    expect(found).toEqual([1046, 258, 112, 61, 37, 24, 17, 11]);
  });

  test('Dunlap & Myers (1997): 8/r² has at least power .80', () => {
    const found = [1, 2, 3, 4, 5, 6].map((tenths) =>
      needed(correlation(tenths / 10, { alpha: 0.05, power: 0.8, sides: 2 }), 0.8),
    );
    expect(found).toEqual([782, 193, 84, 46, 29, 19]);
    found.forEach((n, index) => {
      expect(n).toBeLessThanOrEqual(Math.ceil(800 / (index + 1) ** 2));
    });
  });
});

describe('interactions', () => {
  const halves = { predictor_proportion: 0.5, moderator_proportion: 0.5, predictor_correlation: 0 };
  const product = (difference: number, criteria: object = { alpha: 0.05, power: 0.8, sides: 2 }) =>
    bind(
      'linear-interaction',
      {
        kind: 'binary-binary',
        adjusted_for: 0,
        predictor_values: 'fixed',
        effect: { slope_difference: difference, residual_sd: 1, ...halves },
      },
      { ...criteria },
    );
  /** The main effect of a balanced binary predictor: the variance of the predictor is a quarter. */
  const main = bind('linear-coefficient', {
    adjusted_for: 1,
    predictor_values: 'fixed',
    effect: { slope: 0.2, residual_sd: 1, predictor_sd: 0.5, predictor_r2: 0 },
  });

  test('Brookes (2004): an interaction as large as the main effect needs four times the number', () => {
    expect(main.effect / product(0.2).effect).toBeCloseTo(4, 12);
    expect(main.effect / product(0.1).effect).toBeCloseTo(16, 12);
    // Four is the ratio of the noncentralities; of the numbers it is the limit, reached from below because the smaller
    // study pays more for estimating its variance.
    const ratio = needed(product(0.2), 0.8) / needed(main, 0.8);
    expect(ratio).toBeLessThan(4);
    expect(ratio).toBeGreaterThan(3.99);
  });

  test('M27: with the number of the main effect it has power .29, and of half the size .10', () => {
    const n = needed(main, 0.8);
    const { calculation, effect } = product(0.2);
    expect(calculation.achieved(n, effect)).toBeCloseTo(0.29, 2);
    // .10 leaves out rejections in the wrong direction: one-sided at half the level it is .104, two-sided .108.
    const half = product(0.1, { alpha: 0.025, power: 0.8, sides: 1 });
    expect(half.calculation.achieved(n, half.effect)).toBeCloseTo(0.104, 3);
    expect(calculation.achieved(n, half.effect)).toBeCloseTo(0.108, 3);
  });

  test('McClelland & Judd (1993): five even levels have a quarter of the efficiency of the four corners', () => {
    const of = (variance: number) =>
      bind('linear-interaction', {
        kind: 'continuous-continuous',
        adjusted_for: 0,
        effect: {
          slope_difference: 0.1,
          moderator_contrast: 1,
          residual_sd: 1,
          predictor_sd: Math.sqrt(variance),
          moderator_sd: Math.sqrt(variance),
          predictor_correlation: 0,
        },
      }).effect;
    // Five even levels from −1 to 1 have variance .5, the two corners 1.
    expect(of(0.5) / of(1)).toBeCloseTo(0.25, 14);
  });

  test('M41: a reliability of .7 needs 1.43 times the number, of .8 1.25 times', () => {
    const at = (reliability: number) =>
      needed(
        bind('linear-interaction', {
          kind: 'continuous-binary',
          adjusted_for: 0,
          predictor_values: 'fixed',
          predictor_reliability: reliability,
          effect: { slope_difference: 0.1, residual_sd: 1, predictor_sd: 1, moderator_proportion: 0.5 },
        }),
        0.8,
      );
    expect(at(0.7) / at(1)).toBeCloseTo(1.43, 2);
    expect(at(0.8) / at(1)).toBeCloseTo(1.25, 2);
  });

  test('Busemeyer & Jones (1983): the reliability of a product of two predictors', () => {
    const at = (correlation: number, reliability: number) =>
      bind('linear-interaction', {
        kind: 'continuous-continuous',
        adjusted_for: 0,
        predictor_reliability: reliability,
        moderator_reliability: reliability,
        effect: {
          slope_difference: 0.001,
          moderator_contrast: 1,
          residual_sd: 1,
          predictor_sd: 1,
          moderator_sd: 1,
          predictor_correlation: correlation,
        },
      }).effect;
    // Unrelated predictors with .7 each: .49. Correlated .5: (.25 + .49)/1.25 = .592. The effect is so small that what
    // joins the residual does not show.
    expect(at(0, 0.7) / at(0, 1)).toBeCloseTo(0.49, 5);
    expect(at(0.5, 0.7) / at(0.5, 1)).toBeCloseTo(0.592, 5);
  });
});
