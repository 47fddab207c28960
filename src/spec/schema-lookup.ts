/** The schema that holds at a place in a spec. */

import { methodInputs } from '../generated/inputs.ts';
import { specSchema } from '../generated/spec-schema.ts';
import { isNode, type SchemaNode } from './allowed.ts';
import type { Segments } from './path.ts';
import { childOf } from './tree.ts';

/** null where the schema says nothing. Aims have one schema a
 *  method; an aim whose method is not known has the shared keys only. */
export function schemaOf(path: Segments, tree: unknown): SchemaNode | null {
  let schema: SchemaNode | null = specSchema;
  let value = tree;
  for (const segment of path) {
    schema = typeof segment === 'number' ? itemsOf(schema) : schemaOfKey(schema, segment);
    value = childOf(value, segment);
    if (schema?.discriminator) schema = definition(branchOf(value));
  }
  return schema;
}

function branchOf(aim: unknown): string {
  const method = childOf(aim, 'method');
  return typeof method === 'string' && Object.hasOwn(methodInputs, method) ? method : 'aim';
}

function itemsOf(list: SchemaNode | null): SchemaNode | null {
  return isNode(list?.items) ? followed(list.items) : null;
}

function definition(name: string): SchemaNode | null {
  const found = (specSchema.$defs as SchemaNode)[name];
  return isNode(found) ? followed(found) : null;
}

/** The definition behind a reference; what stands beside the reference wins. */
function followed(node: SchemaNode): SchemaNode {
  if (typeof node.$ref !== 'string') return node;
  const { $ref: reference, ...beside } = node;
  return { ...definition(reference.replace('#/$defs/', '')), ...beside };
}

/** Schema of one key of an object. */
export function schemaOfKey(object: SchemaNode | null, key: string): SchemaNode | null {
  const properties = object?.properties;
  if (!isNode(properties) || !Object.hasOwn(properties, key)) return null;
  const property = properties[key];
  return isNode(property) ? followed(property) : null;
}
