/** What the schema says about one method's inputs, as data: `samplecase methods NAME`, the normaliser and
 *  the documents read it. The data itself is generated (src/generated/inputs.ts). */

import type { Find, Range } from './study.ts';

/** A number an assumption rests on. */
export interface QuantityInput {
  key: string;
  /** Where it stands below the aim's `inputs`: `['effect', 'partial_r2']`. */
  path: readonly string[];
  /** Name for a reader: `partial R²`. */
  title: string;
  symbol: string;
  /** `outcome`, `predictor`, … ; '' when it has none. */
  unit: string;
  description: string;
  /** Kind of quantity in schema/quantity.json, such as `proportion`. */
  kind: string;
  range: Range;
  inEffect: boolean;
  required: boolean;
}

/** An input that is no assumption: a count, a choice, a switch, a text. */
export interface PlainInput {
  key: string;
  path: readonly string[];
  title: string;
  symbol: string;
  description: string;
  kind: 'whole-number' | 'number' | 'choice' | 'switch' | 'text';
  required: boolean;
  /** What holds when nothing is stated; null when there is no default. */
  default: string | number | boolean | null;
  /** null unless the input is a number. */
  range: Range | null;
  /** Allowed values of a choice; empty for the others. */
  choices: readonly (string | number)[];
}

/** One way to state the effect: its keys, the leading one first. */
export interface EffectFormInput {
  title: string;
  keys: readonly string[];
}

export interface MethodInputs {
  description: string;
  finds: readonly Find[];
  quantities: readonly QuantityInput[];
  forms: readonly EffectFormInput[];
  others: readonly PlainInput[];
  criteria: readonly PlainInput[];
}
