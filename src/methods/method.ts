/** The interface a design method fills. A method is one file here, one schema fragment, one template partial
 *  and one test; solvers, tables, figures and documents work from this interface alone. */

import type { MethodName } from '../generated/spec.ts';
import type { Aim, Find } from '../spec/study.ts';

/** Values of the aim's quantities by key, in their own units. */
export type Values = Readonly<Record<string, number>>;

/** A built-in reference, and where in it the formula stands. */
export interface Source {
  /** Key in src/sources/sources.json. */
  key: string;
  /** What it is the source of, as a noun phrase: 'exact power with sampled predictors'. */
  of: string;
  /** Equation, section or chapter, when known. */
  at?: string;
}

/** One form in which the field reports an effect, and the way to and from the method's own effect. */
export interface EffectForm {
  /** Spec keys the form needs; the leading one first: it is the axis of tables and the unit of margins. */
  keys: readonly [string, ...string[]];
  title: string;
  /** The method's effect from the values. @throws ProblemError through `fail` when the values contradict each other. */
  toEffect(values: Values): number;
  /** The leading value that gives `effect`, the others held. */
  fromEffect(effect: number, values: Values): number;
  /** The same two as expressions that read alike in R and Python (only + - * / ( ) sqrt and names of keys). */
  expression: string;
  /** Uses the name of the method's effect, such as `f2`. */
  inverse: string;
}

/** An effect written in one form. */
export interface Equivalent {
  /** Key for programs: f2, r2, partial_r2, partial_correlation, slope, … */
  key: string;
  symbol: string;
  meaning: string;
  value: number;
  unit: string;
}

/** One line of the arithmetic: printed as an intermediate value, and run by a reader in R and Python. */
export interface Step {
  /** Name in the recompute lines. */
  variable: string;
  /** Symbol on the page, such as `λ`. */
  symbol: string;
  meaning: string;
  /** Formula on the page, such as `λ = f²·n`; may be empty. */
  formula: string;
  /** null for a helper line (a vector, say) that is run but not printed as a value. */
  value: number | null;
  r: string;
  python: string;
}

/** What must hold, and what follows if it does not. */
export interface Assumption {
  statement: string;
  ifNot: string;
}

/** A method with one aim's inputs bound. Pure; every number asked for is computed afresh. */
export interface Calculation {
  /** Smallest n with a residual degree of freedom. */
  readonly smallestN: number;
  /** The form the author chose; null when no effect is stated. */
  readonly form: EffectForm | null;
  /** The method's effect at the stated values; null when none is stated. */
  readonly effect: number | null;
  /** The effect at other values of the aim's quantities. */
  effectAt(values: Values): number;
  /** Power, or width of the interval, with n analysed (n may be a real number) and the given effect. */
  achieved(n: number, effect: number): number;
  /** A rough number for the target, from an asymptotic formula: where the search begins, never a result. */
  guess(effect: number, target: number): number;
  /** The arithmetic behind `achieved`, in order; the last step is the achieved value itself. */
  steps(n: number, effect: number): Step[];
  /** The effect in every form the field reports. */
  equivalents(effect: number): Equivalent[];
  /** Whole-number inputs that the steps use by name, in order: `u`, `p`, `sides`, … */
  readonly constants: readonly { variable: string; meaning: string; value: number }[];
  /** Numbers that other conventions give, worth printing beside the result; may be empty. */
  alternatives(effect: number, target: number): Alternative[];
}

export interface Alternative {
  key: string;
  /** A clause for the appendix: 'with predictor values fixed by design'. */
  description: string;
  /** Number to analyse under it. */
  n: number;
  /** The arithmetic under it, as in `Calculation.steps`. */
  steps(n: number): Step[];
}

export interface Method {
  readonly name: MethodName;
  /** Noun phrase: 'partial F test of added predictors'. */
  readonly title: string;
  /** One sentence on what it plans, for `samplecase methods`. */
  readonly summary: string;
  /** What is achieved: the power of a test, or the width of an interval. */
  readonly achieves: 'power' | 'width';
  /** Unit of a width, in the schema's words ('outcome/predictor'); '' for a power and for pure numbers. */
  readonly achievedUnit: string;
  readonly finds: readonly Find[];
  /** The method's own effect: f² for tests. */
  readonly effect: { variable: string; symbol: string; meaning: string };
  readonly forms: readonly EffectForm[];
  /** Formula as text lines for the page, symbols explained by `symbols`. */
  readonly formula: readonly string[];
  readonly symbols: readonly { symbol: string; meaning: string }[];
  readonly sources: readonly Source[];
  readonly assumptions: readonly Assumption[];
  /** Whether one evaluation takes so long in R and Python that printed lines check a number rather than search it. */
  readonly isCostly?: boolean;
  /** Whether what is achieved improves with every further n, or only eventually. */
  readonly rises: 'always' | 'eventually';
  /** Bind one aim. @throws ProblemError when the inputs contradict each other. */
  prepare(aim: Aim): Calculation;
}
