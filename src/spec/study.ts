/** The normalised study: what every later stage reads. Shorthand and defaults are expanded, nothing is left
 *  optional; what the author did not state is `null`, so that a page can say so. */

import type { AimInputs, MethodName } from '../generated/spec.ts';

export type Basis =
  | 'smallest-effect-of-interest'
  | 'published-estimate'
  | 'meta-analysis'
  | 'pilot-data'
  | 'routine-data'
  | 'expert-judgement'
  | 'convention';

/** A number an assumption rests on. */
export interface Quantity {
  /** Path in the spec, such as `aims[0].inputs.effect.partial_r2`. */
  path: string;
  /** The key it is given under, such as `partial_r2`. */
  key: string;
  /** Name for a reader, from the schema, such as `partial R²`. */
  title: string;
  /** Short symbol for formulas, from the schema. */
  symbol: string;
  /** Unit for a reader: `outcome`, `predictor`, … as the schema states; '' when it has none. */
  unit: string;
  /** Open or closed range the schema allows. */
  range: Range;
  value: number;
  low: number | null;
  high: number | null;
  basis: Basis | null;
  cite: string[];
  note: string | null;
  /** People and studies behind the value, where the author states them. */
  source: { n: number | null; studies: number | null };
}

export interface Range {
  minimum: number;
  maximum: number;
  minimumIncluded: boolean;
  maximumIncluded: boolean;
}

export type Role = 'primary' | 'key-secondary' | 'secondary' | 'exploratory';
export type Find = 'sample-size' | 'power' | 'detectable-effect' | 'width';

export interface Criteria {
  /** Significance level of the test; for an interval, 1 − confidence. */
  alpha: number;
  /** Target power; null for a study planned by the width of an interval. */
  power: number | null;
  /** 1 or 2 for a t test, null for an F test (which has no sides). */
  sides: 1 | 2 | null;
  sidesReason: string | null;
  confidence: number | null;
  /** Full width of the interval, from lower to upper limit; null for a test. */
  width: number | null;
  /** Probability that the interval is no wider than `width`; null when the expected width is planned. */
  assurance: number | null;
}

/** A term of the model, counted in parameters (a factor of k levels counts k − 1). */
export interface Term {
  name: string;
  parameters: number;
}

export interface Aim {
  index: number;
  id: string;
  role: Role;
  objective: string;
  outcome: { name: string; unit: string; instrument: string | null; time: string | null };
  analysis: string;
  method: MethodName;
  /** The method's inputs as the schema types them, quantities included as written. */
  inputs: AimInputs;
  /** Every quantity of the aim by key, in the order of the schema. */
  quantities: Record<string, Quantity>;
  /** Keys of the effect form the author chose, leading key first; empty when no effect is stated. */
  effectKeys: string[];
  terms: Record<string, Term[]>;
  criteria: Criteria;
  find: Find;
  /** Number analysed, where the author gives it. */
  evaluable: number | null;
}

export interface Loss {
  stage: string;
  proportion: Quantity;
}

export interface Sample {
  /** What one unit is, plural: `participants` unless stated. */
  unit: string;
  /** What the first number counts: enrolled, invited, approached. */
  counts: 'enrolled' | 'invited' | 'approached';
  maximum: number | null;
  losses: Loss[];
  recruitment: {
    sites: number;
    eligiblePerMonth: number;
    consent: number;
    months: number;
    startUpMonths: number;
  } | null;
  missingData: string | null;
}

export interface SensitivityRequest {
  /** Values of the leading effect quantity; null: from low, value and high. */
  effects: number[] | null;
  /** Target powers (or interval widths, for a study of precision); null: defaults. */
  targets: number[] | null;
  /** Overall proportions lost; null: from the losses. */
  losses: number[] | null;
}

export type DocumentKind = 'ethics' | 'grant' | 'preregistration' | 'protocol' | 'appendix';
export type DocumentFormat = 'markdown' | 'html';
export type CitationStyle = 'apa' | 'vancouver';

export interface DocumentRequest {
  kind: DocumentKind;
  formats: DocumentFormat[];
  words: number | null;
  citations: CitationStyle;
}

export interface Acknowledgement {
  rule: string;
  reason: string;
  aim: string | null;
}

/** A CSL-JSON item, as far as the page needs it. */
export interface Reference {
  id: string;
  type: string;
  title?: string;
  author?: { family?: string; given?: string; literal?: string }[];
  issued?: { 'date-parts'?: (number | string)[][]; literal?: string };
  'container-title'?: string;
  publisher?: string;
  'publisher-place'?: string;
  edition?: string | number;
  volume?: string | number;
  issue?: string | number;
  page?: string;
  number?: string | number;
  DOI?: string;
  URL?: string;
  custom?: { verified?: string; doi?: string; use?: string };
}

export interface Study {
  title: string;
  question: string;
  population: string;
  design: string;
  risk: 'minimal' | 'more-than-minimal';
  burden: string | null;
  dataCollection: 'not-started' | 'started' | 'complete' | null;
  reviewer: string | null;
  /** How several primary aims combine: all must succeed, any one suffices; null when unstated. */
  primaryAims: 'all' | 'any' | null;
  aims: Aim[];
  sample: Sample;
  sensitivity: SensitivityRequest;
  documents: DocumentRequest[];
  references: Reference[];
  acknowledge: Acknowledgement[];
  /** SHA-256 of the canonical JSON of the spec as read. */
  hash: string;
}
