/** One aim of a test in a linear model, bound: power, arithmetic and equivalents of an F or one-sided t test of `tested`
 *  predictors in a model that also holds `adjustedFor` others. Every test of this family is this one. */

import { observedR2, r2FromF2 } from '../../effects/effect-size.ts';
import { normalQuantile, normalUpperQuantile } from '../../numeric/distributions/normal.ts';
import { fTestPower, sampledFTestPower } from '../../numeric/power/f-test.ts';
import { sampledTTestPower, tTestPower } from '../../numeric/power/t-test.ts';
import { smallestInteger } from '../../numeric/solve/smallest-integer.ts';
import type { Aim } from '../../spec/study.ts';
import type { Alternative, Calculation, EffectForm, Equivalent, Step, Values } from '../method.ts';
import { atAim } from './contradiction.ts';
import { given, signOf } from './test-forms.ts';
import { fTestSteps, tTestSteps } from './test-steps.ts';

export interface TestDesign {
  aim: Aim;
  /** Predictors whose coefficients are tested, in parameters. */
  tested: number;
  /** Other predictors in the model, in parameters. */
  adjustedFor: number;
  /** Observed together with the outcome; unstated counts as sampled. */
  predictorValues: 'fixed' | 'sampled' | undefined;
  /** The form the aim uses; null when it states no effect. */
  form: EffectForm | null;
  /** Whole-number inputs behind the effect, such as the n of its source. */
  counts?: Values;
  /** The share of variance is that of the whole model, not a partial one. */
  isWholeModel?: boolean;
}

export function testCalculation(design: TestDesign): Calculation {
  const { aim, tested, adjustedFor, form, counts = {} } = design;
  const isSampled = design.predictorValues !== 'fixed';
  const { alpha } = aim.criteria;
  const isOneSided = aim.criteria.sides === 1;
  const stated: Values = {
    ...counts,
    ...Object.fromEntries(Object.values(aim.quantities).map(({ key, value }) => [key, value])),
  };
  const effectAt = (values: Values) =>
    atAim(
      aim.index,
      (key) => aim.quantities[key]?.path,
      () => (form === null ? given(values, 'f2') : form.toEffect({ ...counts, ...values })),
    );
  const achieved = (n: number, f2: number) =>
    power({ alpha, tested, residualDf: n - tested - adjustedFor - 1, n, f2, isSampled, isOneSided });
  const isStated = form !== null && form.keys[0] in stated;
  return {
    smallestN: tested + adjustedFor + 2,
    form,
    effect: isStated ? effectAt(stated) : null,
    effectAt,
    achieved,
    steps(n, f2) {
      const numbers = { n, f2, tested, adjustedFor, alpha, power: achieved(n, f2) };
      return isOneSided ? tTestSteps(numbers, isSampled) : fTestSteps(numbers, isSampled);
    },
    equivalents: (f2) => equivalents(design, f2, stated),
    constants: [
      { variable: 'u', meaning: 'predictors tested', value: tested },
      { variable: 'p', meaning: 'predictors adjusted for', value: adjustedFor },
      {
        variable: 'alpha',
        meaning: isOneSided ? 'significance level, one-sided' : 'significance level',
        value: alpha,
      },
      ...Object.entries(counts).map(([variable, value]) => ({
        variable,
        meaning: COUNT_MEANINGS[variable] ?? variable,
        value,
      })),
    ],
    guess: (f2, target) =>
      roughNumber(f2, target, isOneSided ? alpha : alpha / 2, tested, tested + adjustedFor),
    alternatives: (f2, target) =>
      alternatives({ alpha, tested, adjustedFor, f2, isSampled, isOneSided, target }),
  };
}

/** Noncentrality that the normal approximation of the t test asks for, times a power of the predictors tested that
 *  follows the noncentral χ² within a few hundredths (fitted to u from 1 to 20); a little low, as the search goes up. */
function roughNumber(f2: number, target: number, tail: number, tested: number, predictors: number): number {
  const ofOne = (normalUpperQuantile(tail) - normalQuantile(1 - target)) ** 2;
  return predictors + (0.97 * ofOne * tested ** 0.31) / f2;
}

const COUNT_MEANINGS: Record<string, string> = {
  source_n: 'people in the source of R²',
  source_predictors: 'predictors in the source of R²',
  t_df: 'degrees of freedom of the t statistic',
};

interface PowerInputs {
  alpha: number;
  tested: number;
  residualDf: number;
  n: number;
  f2: number;
  isSampled: boolean;
  isOneSided: boolean;
}

function power({ alpha, tested, residualDf, n, f2, isSampled, isOneSided }: PowerInputs): number {
  if (isOneSided) {
    return isSampled
      ? sampledTTestPower(alpha, residualDf, Math.sqrt(r2FromF2(f2)))
      : tTestPower(alpha, residualDf, Math.sqrt(f2 * n));
  }
  return isSampled
    ? sampledFTestPower(alpha, tested, residualDf, r2FromF2(f2))
    : fTestPower(alpha, tested, residualDf, f2 * n);
}

function equivalents(
  { tested, form, isWholeModel = false }: TestDesign,
  f2: number,
  stated: Values,
): Equivalent[] {
  const r2 = r2FromF2(f2);
  const share: Equivalent = isWholeModel
    ? { key: 'r2', symbol: 'R²', meaning: 'R²', value: r2, unit: '' }
    : { key: 'partial_r2', symbol: 'R²ₚ', meaning: 'partial R²', value: r2, unit: '' };
  const found: Equivalent[] = [share, { key: 'f2', symbol: 'f²', meaning: 'f²', value: f2, unit: '' }];
  if (tested === 1 && !isWholeModel) {
    const value = signOf(stated, form?.keys[0] ?? '') * Math.sqrt(r2);
    found.push({ key: 'partial_correlation', symbol: 'r', meaning: 'partial correlation', value, unit: '' });
  }
  const leading = form?.keys[0];
  if (form !== null && leading !== undefined && !found.some(({ key }) => key === leading)) {
    const words = LEADING_WORDS[leading];
    if (words !== undefined) found.push({ key: leading, ...words, value: form.fromEffect(f2, stated) });
  }
  if (leading === 'r2_full') {
    const full = form?.fromEffect(f2, stated) ?? 0;
    const value = full - given(stated, 'r2_reduced');
    found.push({ key: 'r2_increase', symbol: 'ΔR²', meaning: 'increase in R²', value, unit: '' });
  }
  if (leading === 'adjusted_r2') {
    const value = observedR2(r2, given(stated, 'source_n'), given(stated, 'source_predictors'));
    found.push({
      key: 'observed_r2',
      symbol: 'R²ₒ',
      meaning: 'unadjusted R² in the source',
      value,
      unit: '',
    });
  }
  return found;
}

/** Forms that stand for themselves only, in the words of the page. */
const LEADING_WORDS: Record<string, Omit<Equivalent, 'key' | 'value'>> = {
  slope: { symbol: 'b', meaning: 'slope', unit: 'outcome/predictor' },
  slope_difference: { symbol: 'Δb', meaning: 'difference in slopes', unit: 'outcome/predictor' },
  r2_full: { symbol: 'R²f', meaning: 'R² of the full model', unit: '' },
  r2_increase: { symbol: 'ΔR²', meaning: 'increase in R²', unit: '' },
  adjusted_r2: { symbol: 'R²ₐ', meaning: 'adjusted R²', unit: '' },
  observed_r2: { symbol: 'R²ₒ', meaning: 'R² as observed in the source', unit: '' },
  t_statistic: { symbol: 't', meaning: 't statistic in the source', unit: '' },
};

interface AlternativeInputs extends Omit<PowerInputs, 'n' | 'residualDf'> {
  adjustedFor: number;
  target: number;
}

const LARGEST_N = 1e7;

/** The numbers that other conventions give (M08, M09): predictors taken the other way, and for fixed predictors the
 *  older λ = f²·(u + v + 1), which is f²·(n − p). */
function alternatives(inputs: AlternativeInputs): Alternative[] {
  const { tested, adjustedFor, f2, isSampled, target } = inputs;
  const smallest = (powerAt: (n: number) => number): number | null => {
    try {
      return smallestInteger((n) => powerAt(n) >= target, tested + adjustedFor + 2, LARGEST_N, 'always');
    } catch (error) {
      if (error instanceof RangeError) return null;
      throw error;
    }
  };
  const at = (n: number, changes: Partial<PowerInputs>) =>
    power({ ...inputs, n, f2, residualDf: n - tested - adjustedFor - 1, ...changes });
  const steps = (isSampledThen: boolean, isOlder: boolean) => (n: number) => {
    const lambdaN = isOlder ? n - adjustedFor : n;
    const numbers = { ...inputs, n, power: at(n, { isSampled: isSampledThen, n: lambdaN }) };
    const found = inputs.isOneSided ? tTestSteps(numbers, isSampledThen) : fTestSteps(numbers, isSampledThen);
    return isOlder
      ? found.map((step) => (step.variable === 'ncp' ? olderNoncentrality(step, f2 * lambdaN) : step))
      : found;
  };
  const other = smallest((n) => at(n, { isSampled: !isSampled }));
  const older = adjustedFor === 0 ? null : smallest((n) => at(n, { isSampled: false, n: n - adjustedFor }));
  return [
    other === null
      ? null
      : {
          key: isSampled ? 'fixed' : 'sampled',
          description: isSampled
            ? 'with predictor values fixed by the design and λ = f²·n'
            : 'with predictors sampled together with the outcome',
          n: other,
          steps: steps(!isSampled, false),
        },
    older === null
      ? null
      : {
          key: 'older',
          description: 'with fixed predictors and the older textbook convention λ = f²·(u + v + 1)',
          n: older,
          steps: steps(false, true),
        },
  ].filter((one) => one !== null);
}

function olderNoncentrality(step: Step, value: number): Step {
  return { ...step, formula: 'λ = f²·(u + v + 1)', value, r: 'f2 * (u + v + 1)', python: 'f2 * (u + v + 1)' };
}
