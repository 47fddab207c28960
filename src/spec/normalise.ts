/** A valid spec → the Study that every later stage reads. Shorthand and defaults are expanded here and nowhere
 *  else. What each method takes comes from the schema, as generated data: no method is named here. */

import { methodInputs } from '../generated/inputs.ts';
import type * as Written from '../generated/spec.ts';
import { formOf } from './effect-form.ts';
import type { MethodInputs, QuantityInput } from './method-inputs.ts';
import { formatPath, type Segments } from './path.ts';
import type {
  Aim,
  Criteria,
  DocumentRequest,
  Loss,
  Quantity,
  Reference,
  Sample,
  Study,
  Term,
} from './study.ts';
import { childOf, isGroup, valueAt } from './tree.ts';

/** @param spec a spec without problems, its references given as items
 *  @param hash of the spec, see `specHash` */
export function normalise(spec: Written.Spec, references: readonly Reference[], hash: string): Study {
  const { study } = spec;
  return {
    title: study.title,
    question: study.question,
    population: study.population,
    design: study.design,
    risk: study.risk ?? 'minimal',
    burden: study.burden ?? null,
    dataCollection: study.data_collection ?? null,
    reviewer: study.reviewer ?? null,
    primaryAims: spec.primary_aims ?? null,
    aims: spec.aims.map(aimOf),
    sample: sampleOf(spec.sample ?? {}),
    sensitivity: {
      effects: spec.sensitivity?.effects ?? null,
      targets: spec.sensitivity?.targets ?? null,
      losses: spec.sensitivity?.losses ?? null,
    },
    documents: (spec.documents ?? []).map(documentOf),
    references: [...references],
    acknowledge: (spec.acknowledge ?? []).map(({ rule, reason, aim }) => ({
      rule,
      reason,
      aim: aim ?? null,
    })),
    hash,
  };
}

type WrittenAim = Written.Spec['aims'][number];

function aimOf(aim: WrittenAim, index: number): Aim {
  const method = methodInputs[aim.method];
  const inputs = withDefaults(aim.inputs, method);
  const effect = 'effect' in aim.inputs ? aim.inputs.effect : undefined;
  const form = formOf(Object.keys(effect ?? {}), method.forms, aim.find === 'detectable-effect');
  return {
    index,
    id: aim.id,
    role: aim.role,
    objective: aim.objective,
    outcome: {
      name: aim.outcome.name,
      unit: aim.outcome.unit,
      instrument: aim.outcome.instrument ?? null,
      time: aim.outcome.time ?? null,
    },
    analysis: aim.analysis,
    method: aim.method,
    inputs,
    quantities: quantitiesOf(inputs, method, ['aims', index, 'inputs']),
    effectKeys: [...(form?.keys ?? [])],
    terms: termsOf(aim.terms ?? {}),
    criteria: criteriaOf(aim.criteria, method),
    find: aim.find,
    evaluable: aim.evaluable ?? null,
  };
}

/** The inputs with the schema's defaults filled in; the spec as read stays as it is. */
function withDefaults(inputs: WrittenAim['inputs'], method: MethodInputs): WrittenAim['inputs'] {
  const filled = structuredClone(inputs);
  for (const { path, default: preset } of method.others) {
    const holder = valueAt(filled, path.slice(0, -1));
    const key = path.at(-1) ?? '';
    if (preset !== null && isGroup(holder) && !Object.hasOwn(holder, key)) {
      (holder as Record<string, unknown>)[key] = preset;
    }
  }
  return filled;
}

function quantitiesOf(inputs: unknown, method: MethodInputs, at: Segments): Record<string, Quantity> {
  return Object.fromEntries(
    method.quantities.flatMap((input) => {
      const written = valueAt(inputs, input.path) as Written.QuantityValue | undefined;
      return written === undefined
        ? []
        : [[input.key, quantityOf(written, input, formatPath([...at, ...input.path]))]];
    }),
  );
}

type Words = Pick<QuantityInput, 'key' | 'title' | 'symbol' | 'unit' | 'range'>;

function quantityOf(written: Written.QuantityValue, words: Words, path: string): Quantity {
  const stated = typeof written === 'number' ? { value: written } : written;
  return {
    path,
    key: words.key,
    title: words.title,
    symbol: words.symbol,
    unit: words.unit,
    range: words.range,
    value: stated.value,
    low: stated.low ?? null,
    high: stated.high ?? null,
    basis: stated.basis ?? null,
    cite: [...(stated.cite ?? [])],
    note: stated.note ?? null,
    source: { n: stated.source?.n ?? null, studies: stated.source?.studies ?? null },
  };
}

function termsOf(terms: { tested?: Written.Terms; adjusted_for?: Written.Terms }): Record<string, Term[]> {
  return Object.fromEntries(
    Object.entries(terms).map(([key, list]) => [
      key,
      list.map(({ name, parameters }): Term => ({ name, parameters: parameters ?? 1 })),
    ]),
  );
}

/** Criteria of a test or of an interval, as the method's schema has them. */
function criteriaOf(written: object, method: MethodInputs): Criteria {
  const stated = (key: string): unknown =>
    childOf(written, key) ?? method.criteria.find((item) => item.key === key)?.default;
  const number = (key: string): number | null => {
    const value = stated(key);
    return typeof value === 'number' ? value : null;
  };
  const confidence = number('confidence');
  const reason = stated('sides_reason');
  return {
    alpha: number('alpha') ?? (confidence === null ? missingAlpha() : complement(confidence)),
    power: number('power'),
    sides: number('sides') as 1 | 2 | null,
    sidesReason: typeof reason === 'string' ? reason : null,
    confidence,
    width: number('width'),
    assurance: number('assurance'),
  };
}

/** Every fragment has one of the two; the build checks it. */
function missingAlpha(): never {
  throw new TypeError('normalise: criteria must hold alpha or confidence.');
}

/** 1 − x in decimals: .95 gives .05 and not .050000000000000044, as an author would write it. */
function complement(proportion: number): number {
  return Number((1 - proportion).toPrecision(15));
}

function sampleOf(sample: Written.Sample): Sample {
  const { recruitment } = sample;
  return {
    unit: sample.unit ?? 'participants',
    counts: sample.counts ?? 'enrolled',
    maximum: sample.maximum ?? null,
    losses: (sample.losses ?? []).map(lossOf),
    recruitment: recruitment
      ? {
          sites: recruitment.sites ?? 1,
          eligiblePerMonth: recruitment.eligible_per_month,
          consent: recruitment.consent ?? 1,
          months: recruitment.months,
          startUpMonths: recruitment.start_up_months ?? 0,
        }
      : null,
    missingData: sample.missing_data ?? null,
  };
}

function lossOf(loss: { stage: string; proportion: Written.QuantityValue }, index: number): Loss {
  return {
    stage: loss.stage,
    proportion: quantityOf(
      loss.proportion,
      {
        key: 'proportion',
        title: 'proportion lost',
        symbol: 'd',
        unit: '',
        range: { minimum: 0, maximum: 1, minimumIncluded: true, maximumIncluded: false },
      },
      formatPath(['sample', 'losses', index, 'proportion']),
    ),
  };
}

function documentOf(document: Written.Document): DocumentRequest {
  return {
    kind: document.kind,
    formats: [...(document.formats ?? (['markdown', 'html'] as const))],
    words: document.words ?? null,
    citations: document.citations ?? 'apa',
  };
}
