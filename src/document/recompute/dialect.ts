/** How one language spells what a script says. The languages differ in punctuation only. */

/** Named arguments: the quantities that differ from the plan. */
export type Named = Readonly<Record<string, number>>;

export interface Dialect {
  language: 'r' | 'python';
  comment(text: string): string;
  preamble: readonly string[];
  assign(name: string, expression: string): string;
  /** A number with all its digits. */
  number(value: number): string;
  /** A function with default arguments; the last line is its value. */
  define(name: string, parameters: readonly Parameter[], body: readonly string[], value: string): string[];
  /** Smallest whole number, from `smallest` on, at which `name(n, effect)` meets the target. */
  search(name: string, smallest: number, improvesUpwards: boolean): string[];
  /** A list of the values of `expression` (a call that uses `variable`) at each of the given numbers. */
  each(values: readonly number[], variable: string, expression: string): string;
  call(name: string, positional: readonly string[], named?: Named): string;
  /** The effect for which `achieved(n, effect)` is the target, between two bounds. */
  root(name: string, n: number, target: string, lower: number, upper: number): string;
  /** ceil(evaluable / product of (1 − loss)); decimals that have no binary form are rounded off first. */
  enrol(evaluable: number, losses: readonly number[]): string;
  /** floor(enrolled · product of (1 − loss)), likewise. */
  kept(enrolled: number, losses: readonly number[]): string;
  /** Integral over a triangular density of what `achieved(n, effect(key = x))` gives, from `low` to `high`. */
  average(name: string, n: number, key: string, range: { low: number; mode: number; high: number }): string[];
  /** The expression whose value the lines of `average` leave. */
  averageValue: string;
  /** A line whose value is printed beside it. */
  show(expression: string, result: string): string;
}

export interface Parameter {
  name: string;
  value?: number;
}

/** Results are compared by a reader's eye: ten significant digits, more than any page rounds to; whole numbers as
 *  they are. */
export function printed(value: number): string {
  if (Number.isInteger(value)) return String(value);
  return String(Number(value.toPrecision(10)));
}
