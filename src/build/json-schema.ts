/** JSON Schema as plain data, and the little the build needs to walk it. */

export interface JsonSchema {
  [keyword: string]: unknown;
}

export function isSchema(value: unknown): value is JsonSchema {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** A keyword that must hold an object, such as `properties`. @throws {Error} names the keyword and the place. */
export function schemaAt(schema: JsonSchema, keyword: string, place: string): JsonSchema {
  const value = schema[keyword];
  if (!isSchema(value)) throw new Error(`${place}: ${keyword} must be an object.`);
  return value;
}

/** A keyword that must hold a list of strings; an absent one is an empty list. */
export function stringsAt(schema: JsonSchema, keyword: string, place: string): string[] {
  const value = schema[keyword] ?? [];
  if (!Array.isArray(value) || !value.every((item) => typeof item === 'string')) {
    throw new Error(`${place}: ${keyword} must be a list of strings.`);
  }
  return value;
}

/** Keywords whose object is a map of names to schemas and no schema itself. */
const MAPS = new Set(['properties', '$defs']);

/** The schema with every schema in it replaced by `change`, innermost first. */
export function mapSchema(schema: JsonSchema, change: (schema: JsonSchema) => JsonSchema): JsonSchema {
  const within = (value: unknown): unknown => {
    if (Array.isArray(value)) return value.map(within);
    return isSchema(value) ? mapSchema(value, change) : value;
  };
  return change(
    mapEntries(schema, (value, keyword) =>
      MAPS.has(keyword) && isSchema(value) ? mapEntries(value, within) : within(value),
    ),
  );
}

function mapEntries(object: JsonSchema, change: (value: unknown, key: string) => unknown): JsonSchema {
  return Object.fromEntries(Object.entries(object).map(([key, value]) => [key, change(value, key)]));
}

/** What `$ref: '#/$defs/name'` points at; the schema itself when it holds no reference.
 *  Keywords beside the reference win, as a title given where a definition is used says more. */
export function resolved(schema: JsonSchema, root: JsonSchema): JsonSchema {
  const reference = schema.$ref;
  if (typeof reference !== 'string') return schema;
  const target = schemaAt(root, '$defs', 'schema')[reference.replace('#/$defs/', '')];
  if (!isSchema(target)) throw new Error(`${reference} is not defined.`);
  const { $ref: _, ...beside } = schema;
  return { ...resolved(target, root), ...beside };
}

/** A number, or an object that gives it as `value`. */
export function isQuantityKind(definition: unknown): boolean {
  if (!isSchema(definition) || !Array.isArray(definition.type)) return false;
  const properties = definition.properties;
  return (
    definition.type.includes('number') &&
    definition.type.includes('object') &&
    isSchema(properties) &&
    'value' in properties
  );
}
