/** One self-contained JSON Schema from the base, the quantities and the fragments. Every reference in it
 *  is local, so that an editor needs this one file. */

import { isSchema, type JsonSchema, mapSchema, schemaAt, stringsAt } from './json-schema.ts';
import type { SchemaSources } from './schema-sources.ts';

const DIALECT = 'https://json-schema.org/draft/2020-12/schema';

/** Keys of an aim that a fragment describes; the base only names them. */
const FROM_FRAGMENT = ['inputs', 'criteria', 'find'];

export function assembleSpecSchema(sources: SchemaSources): JsonSchema {
  const base = withLocalReferences(sources.base);
  const { aim, ...shared } = schemaAt(base, '$defs', 'schema/spec.json');
  if (!isSchema(aim)) throw new Error('schema/spec.json: $defs.aim is missing.');
  const branches = [...sources.fragments].map(
    ([method, fragment]) => [method, aimOfMethod(method, aim, withLocalReferences(fragment))] as const,
  );
  const properties = schemaAt(base, 'properties', 'schema/spec.json');
  const aims = schemaAt(properties, 'aims', 'schema/spec.json');
  return {
    ...base,
    $schema: DIALECT,
    $id: 'urn:samplecase:spec:1',
    properties: {
      ...properties,
      aims: {
        ...aims,
        items: {
          type: 'object',
          required: ['method'],
          discriminator: { propertyName: 'method' },
          oneOf: branches.map(([method]) => ({ $ref: `#/$defs/${method}` })),
        },
      },
    },
    $defs: mergedDefinitions([
      shared,
      // Checked when the method is unknown, so that no branch applies.
      { aim: aimOfAnyMethod(aim, sources.fragments) },
      schemaAt(withLocalReferences(sources.quantity), '$defs', 'schema/quantity.json'),
      ...[...sources.fragments.values()].map((fragment) =>
        isSchema(fragment.$defs) ? (withLocalReferences(fragment.$defs) as JsonSchema) : {},
      ),
      Object.fromEntries(branches),
    ]),
  };
}

export function assembleResultSchema(sources: SchemaSources): JsonSchema | null {
  return (
    sources.result && {
      ...withLocalReferences(sources.result),
      $schema: DIALECT,
      $id: 'urn:samplecase:result:1',
    }
  );
}

/** One branch of the aims: the shared keys and the fragment's, in one flat closed object. */
function aimOfMethod(method: string, aim: JsonSchema, fragment: JsonSchema): JsonSchema {
  const place = `schema/methods/${method}.json`;
  const own = schemaAt(fragment, 'properties', place);
  for (const key of FROM_FRAGMENT) schemaAt(own, key, place);
  const inputs = schemaAt(own, 'inputs', place);
  const { effect, ...others } = schemaAt(inputs, 'properties', place);
  const properties = schemaAt(aim, 'properties', 'schema/spec.json');
  const branch: JsonSchema = {
    title: `${String(fragment.title)}Aim`,
    description: fragment.description,
    type: 'object',
    required: aim.required,
    additionalProperties: false,
    properties: {
      ...properties,
      method: { ...schemaAt(properties, 'method', 'schema/spec.json'), const: method },
      inputs: { title: `${String(fragment.title)}Inputs`, ...inputs },
      criteria: own.criteria,
      find: {
        description: schemaAt(properties, 'find', 'schema/spec.json').description,
        ...schemaAt(own, 'find', place),
      },
    },
  };
  if (!isSchema(effect)) return branch;
  const { oneOf, ...anyEffect } = effect;
  const forms = formsOf(oneOf, place);
  schemaAt(branch, 'properties', place).inputs = {
    title: `${String(fragment.title)}Inputs`,
    ...inputs,
    properties: { ...others, effect: { ...anyEffect, minProperties: 1 } },
  };
  const wholeForm = {
    type: 'object',
    required: ['effect'],
    properties: { effect: { type: 'object', oneOf: forms } },
  };
  const maySeekEffect = stringsAt(schemaAt(own, 'find', place), 'enum', place).includes('detectable-effect');
  if (!maySeekEffect) return { ...branch, allOf: [{ type: 'object', properties: { inputs: wholeForm } }] };
  return {
    ...branch,
    if: { type: 'object', required: ['find'], properties: { find: { const: 'detectable-effect' } } },
    // biome-ignore lint/suspicious/noThenProperty: a keyword of JSON Schema
    then: {
      type: 'object',
      properties: {
        inputs: {
          type: 'object',
          properties: { effect: { type: 'object', anyOf: forms.map(withoutLeadingKey) } },
        },
      },
    },
    else: { type: 'object', properties: { inputs: wholeForm } },
  };
}

/** The keys that all methods share; inputs and criteria can hold anything. */
function aimOfAnyMethod(aim: JsonSchema, fragments: ReadonlyMap<string, JsonSchema>): JsonSchema {
  const properties = schemaAt(aim, 'properties', 'schema/spec.json');
  const finds = [...fragments].flatMap(([method, fragment]) =>
    stringsAt(schemaAt(schemaAt(fragment, 'properties', method), 'find', method), 'enum', method),
  );
  const oneOf = (key: string, values: Iterable<string>): JsonSchema => ({
    ...schemaAt(properties, key, 'schema/spec.json'),
    enum: [...new Set(values)],
  });
  return {
    ...aim,
    additionalProperties: false,
    properties: { ...properties, method: oneOf('method', fragments.keys()), find: oneOf('find', finds) },
  };
}

/** The fragment lists the keys of each form; here each form also shuts out the keys of the others. */
function formsOf(oneOf: unknown, place: string): JsonSchema[] {
  if (!Array.isArray(oneOf)) throw new Error(`${place}: inputs.effect needs oneOf, the list of its forms.`);
  return oneOf.map((form: unknown) => {
    if (!isSchema(form)) throw new Error(`${place}: a form of the effect must be an object.`);
    const keys = stringsAt(form, 'required', place);
    if (keys.length === 0) throw new Error(`${place}: a form of the effect needs required keys.`);
    return { title: form.title, required: keys, propertyNames: { enum: keys } };
  });
}

function withoutLeadingKey(form: JsonSchema): JsonSchema {
  return { ...form, required: stringsAt(form, 'required', 'form').slice(1) };
}

function withLocalReferences(schema: JsonSchema): JsonSchema {
  return mapSchema(schema, (part) =>
    typeof part.$ref === 'string' ? { ...part, $ref: part.$ref.replace(/^[^#]*#/, '#') } : part,
  );
}

function mergedDefinitions(groups: readonly JsonSchema[]): JsonSchema {
  const merged: JsonSchema = {};
  for (const group of groups) {
    for (const [name, schema] of Object.entries(group)) {
      if (name in merged) throw new Error(`schema/: two definitions are called ${name}.`);
      merged[name] = schema;
    }
  }
  return merged;
}
