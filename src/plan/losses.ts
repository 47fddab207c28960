/** From the number analysed to the number enrolled, and back. Losses compound, and decimals are taken as the
 *  author wrote them: 90 / (1 − .1) is 100, never 101 because .9 has no exact binary form. */

import type { Loss } from '../spec/study.ts';

/** A proportion as an exact fraction of whole numbers. */
interface Fraction {
  numerator: bigint;
  denominator: bigint;
}

export interface StageCount {
  stage: string;
  proportion: number;
  /** Needed on entering the stage, rounded up once. */
  before: number;
  /** Needed on leaving it. */
  after: number;
}

/** The shortest decimal that denotes the number, as a fraction: 0.05 is 5/100. */
function exactDecimal(value: number): Fraction {
  const [mantissa = '0', exponent = '0'] = value.toString().split('e');
  const [whole = '0', decimals = ''] = mantissa.split('.');
  const scale = decimals.length - Number(exponent);
  const digits = BigInt(whole + decimals);
  return scale >= 0
    ? { numerator: digits, denominator: 10n ** BigInt(scale) }
    : { numerator: digits * 10n ** BigInt(-scale), denominator: 1n };
}

/** Π(1 − loss), exactly. */
function retention(proportions: readonly number[]): Fraction {
  return proportions.reduce<Fraction>(
    (product, proportion) => {
      const loss = exactDecimal(proportion);
      return {
        numerator: product.numerator * (loss.denominator - loss.numerator),
        denominator: product.denominator * loss.denominator,
      };
    },
    { numerator: 1n, denominator: 1n },
  );
}

/** Number to enrol so that `evaluable` remain: ceil(evaluable / Π(1 − loss)). Each loss lies in [0, 1). */
export function enrolledFor(evaluable: number, proportions: readonly number[]): number {
  const { numerator, denominator } = retention(proportions);
  const needed = BigInt(evaluable) * denominator;
  return Number((needed + numerator - 1n) / numerator);
}

/** Whole people left of `enrolled`: floor(enrolled · Π(1 − loss)). */
export function evaluableFrom(enrolled: number, proportions: readonly number[]): number {
  const { numerator, denominator } = retention(proportions);
  return Number((BigInt(enrolled) * numerator) / denominator);
}

/** Overall proportion lost, 1 − Π(1 − loss). */
export function overallLoss(proportions: readonly number[]): number {
  const { numerator, denominator } = retention(proportions);
  return Number(denominator - numerator) / Number(denominator);
}

/** The chain of numbers in the order in which people are lost. Every number is rounded up once, from the exact
 *  quotient, so the first is the number to enrol and the last the number analysed. */
export function stageCounts(evaluable: number, losses: readonly Loss[]): StageCount[] {
  return losses.map((loss, index) => {
    const fromHere = losses.slice(index).map((later) => later.proportion.value);
    return {
      stage: loss.stage,
      proportion: loss.proportion.value,
      before: enrolledFor(evaluable, fromHere),
      after: enrolledFor(evaluable, fromHere.slice(1)),
    };
  });
}

export function proportionsOf(losses: readonly Loss[]): number[] {
  return losses.map((loss) => loss.proportion.value);
}
