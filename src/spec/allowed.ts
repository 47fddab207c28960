/** What a schema allows, in words. */

import { listed, shown } from './shown.ts';

export interface SchemaNode {
  [keyword: string]: unknown;
}

export function isNode(value: unknown): value is SchemaNode {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** Keys that an object may have. */
export function knownKeys(object: SchemaNode | null): string[] {
  return isNode(object?.properties) ? Object.keys(object.properties) : [];
}

/** Types a value may have; a choice has none of its own. */
export function typesOf(schema: SchemaNode): string[] {
  if (Array.isArray(schema.type)) return schema.type as string[];
  return typeof schema.type === 'string' ? [schema.type] : [];
}

/** A noun phrase: `a whole number from 1 to 10,000`. */
export function allowed(schema: SchemaNode): string {
  if ('const' in schema) return constant(schema.const);
  if (Array.isArray(schema.enum)) return choice(schema.enum.map(constant));
  const phrases = typesOf(schema).map((type) => ofType(type, schema));
  return phrases.length === 0 ? 'another value' : listed(phrases, 'or');
}

function ofType(type: string, schema: SchemaNode): string {
  switch (type) {
    case 'integer':
      return `a whole number${range(schema)}`;
    case 'number':
      return `a number${range(schema)}`;
    case 'string':
      return typeof schema['x-allowed'] === 'string' ? schema['x-allowed'] : 'text';
    case 'boolean':
      return 'true or false';
    case 'array':
      return 'a list';
    case 'object':
      if (typesOf(schema).includes('number')) return 'a group of keys with that number as value';
      return `a group of keys${knownKeys(schema).length > 0 ? ` (${knownKeys(schema).join(', ')})` : ''}`;
    default:
      return type;
  }
}

function constant(value: unknown): string {
  return typeof value === 'string' ? shown(value) : String(value);
}

function choice(values: readonly string[]): string {
  return values.length === 1 ? (values[0] ?? '') : `one of ${listed(values, 'or')}`;
}

/** ` from 1 to 10,000`, ` more than 0 and less than 1`; empty when every number is allowed. */
function range(schema: SchemaNode): string {
  const { minimum, maximum, exclusiveMinimum, exclusiveMaximum } = schema as Record<
    string,
    number | undefined
  >;
  if (minimum !== undefined) {
    if (maximum !== undefined) return ` from ${digits(minimum)} to ${digits(maximum)}`;
    const upper =
      exclusiveMaximum === undefined ? '' : ` up to, but not including, ${digits(exclusiveMaximum)}`;
    return ` from ${digits(minimum)}${upper}`;
  }
  const parts = [
    ...(exclusiveMinimum === undefined ? [] : [`more than ${digits(exclusiveMinimum)}`]),
    ...(maximum === undefined ? [] : [`at most ${digits(maximum)}`]),
    ...(exclusiveMaximum === undefined ? [] : [`less than ${digits(exclusiveMaximum)}`]),
  ];
  return parts.length === 0 ? '' : ` ${parts.join(' and ')}`;
}

function digits(value: number): string {
  return value.toLocaleString('en', { maximumFractionDigits: 15 });
}
