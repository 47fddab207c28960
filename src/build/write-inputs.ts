/** The inputs of each method as data, read from the assembled schema. */

import type { EffectFormInput, MethodInputs, PlainInput, QuantityInput } from '../spec/method-inputs.ts';
import type { Find, Range } from '../spec/study.ts';
import { GENERATED, literal } from './generated-file.ts';
import { isQuantityKind, isSchema, type JsonSchema, resolved, schemaAt, stringsAt } from './json-schema.ts';

export function writeInputs(inputs: Readonly<Record<string, MethodInputs>>): string {
  return [
    GENERATED,
    "import type { MethodInputs } from '../spec/method-inputs.ts';",
    "import type { MethodName } from './spec.ts';",
    '',
    `export const methodInputs: Readonly<Record<MethodName, MethodInputs>> = ${literal(inputs)};`,
    '',
  ].join('\n');
}

export function inputsOfMethods(schema: JsonSchema, methods: Iterable<string>): Record<string, MethodInputs> {
  return Object.fromEntries([...methods].map((method) => [method, inputsOf(schema, method)]));
}

function inputsOf(root: JsonSchema, method: string): MethodInputs {
  const branch = schemaAt(schemaAt(root, '$defs', 'schema'), method, 'schema');
  const properties = schemaAt(branch, 'properties', method);
  const inputs = leavesOf(schemaAt(properties, 'inputs', method), root, []);
  const criteria = leavesOf(resolved(schemaAt(properties, 'criteria', method), root), root, []);
  const quantities = inputs.flatMap((leaf) => (leaf.kind === null ? [] : [quantityOf(leaf, leaf.kind)]));
  if (!criteria.some(({ path }) => path[0] === 'alpha' || path[0] === 'confidence')) {
    throw new Error(`schema/methods/${method}.json: criteria need alpha or confidence.`);
  }
  const twice = quantities.find(
    ({ key }, index) => quantities.findIndex((other) => other.key === key) < index,
  );
  if (twice) throw new Error(`schema/methods/${method}.json: two quantities are called ${twice.key}.`);
  return {
    description: String(branch.description ?? ''),
    finds: stringsAt(schemaAt(properties, 'find', method), 'enum', method) as Find[],
    quantities,
    forms: formsOf(branch),
    others: inputs.filter((leaf) => leaf.kind === null).map(plainOf),
    criteria: criteria.map(plainOf),
  };
}

interface Leaf {
  path: string[];
  schema: JsonSchema;
  /** Words given where the input is declared; a definition it refers to speaks of all its uses. */
  words: { title: string; description: string };
  required: boolean;
  /** Kind of quantity; null for an input that is none. */
  kind: string | null;
}

/** Every input below a schema, in the order in which the fragment lists them. */
function leavesOf(schema: JsonSchema, root: JsonSchema, path: string[]): Leaf[] {
  const required = stringsAt(schema, 'required', path.join('.'));
  return Object.entries(schemaAt(schema, 'properties', path.join('.'))).flatMap(([key, property]): Leaf[] => {
    if (!isSchema(property)) throw new Error(`${[...path, key].join('.')} must be a schema.`);
    const definition = resolved(property, root);
    const words = {
      title: String(property.title ?? key.replaceAll('_', ' ')),
      description: String(property.description ?? ''),
    };
    const leaf = { path: [...path, key], schema: definition, words, required: required.includes(key) };
    if (isQuantityKind(definition)) {
      return [{ ...leaf, kind: String(property.$ref).replace('#/$defs/', '') }];
    }
    if (isSchema(definition.properties)) return leavesOf(definition, root, leaf.path);
    return [{ ...leaf, kind: null }];
  });
}

function quantityOf({ path, schema, words, required }: Leaf, kind: string): QuantityInput {
  return {
    key: keyOf(path),
    path,
    title: words.title,
    symbol: String(schema['x-symbol'] ?? ''),
    unit: String(schema['x-unit'] ?? ''),
    description: words.description,
    kind,
    range: rangeOf(schema),
    inEffect: path[0] === 'effect',
    required,
  };
}

function plainOf({ path, schema, words, required }: Leaf): PlainInput {
  const kind = plainKind(path, schema);
  const isNumber = kind === 'whole-number' || kind === 'number';
  const preset = schema.default;
  return {
    key: keyOf(path),
    path,
    title: words.title,
    symbol: String(schema['x-symbol'] ?? ''),
    description: words.description,
    kind,
    required,
    default: preset === undefined ? null : (preset as string | number | boolean),
    range: isNumber ? rangeOf(schema) : null,
    choices: Array.isArray(schema.enum) ? (schema.enum as (string | number)[]) : [],
  };
}

function plainKind(path: readonly string[], schema: JsonSchema): PlainInput['kind'] {
  if (Array.isArray(schema.enum)) return 'choice';
  if (schema.type === 'integer') return 'whole-number';
  if (schema.type === 'number') return 'number';
  if (schema.type === 'boolean') return 'switch';
  if (schema.type === 'string') return 'text';
  throw new Error(`${path.join('.')}: an input is a quantity, a number, a choice, a switch or a text.`);
}

function keyOf(path: readonly string[]): string {
  return path.at(-1) ?? '';
}

function rangeOf(schema: JsonSchema): Range {
  const bound = (keyword: string): number | null => {
    const value = schema[keyword];
    return typeof value === 'number' ? value : null;
  };
  const [least, most] = [bound('minimum'), bound('maximum')];
  return {
    minimum: least ?? bound('exclusiveMinimum') ?? -Infinity,
    maximum: most ?? bound('exclusiveMaximum') ?? Infinity,
    minimumIncluded: least !== null,
    maximumIncluded: most !== null,
  };
}

function formsOf(branch: JsonSchema): EffectFormInput[] {
  const holder = Array.isArray(branch.allOf) ? branch.allOf[0] : branch.else;
  if (!isSchema(holder)) return [];
  const inputs = schemaAt(schemaAt(holder, 'properties', 'effect'), 'inputs', 'effect');
  const effect = schemaAt(schemaAt(inputs, 'properties', 'effect'), 'effect', 'effect');
  return (effect.oneOf as JsonSchema[]).map((form) => {
    const keys = stringsAt(form, 'required', 'effect');
    return { title: String(form.title ?? keys.join(' and ')), keys };
  });
}
