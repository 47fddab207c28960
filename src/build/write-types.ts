/** TypeScript types of the schemas. */

import { compile, type JSONSchema } from 'json-schema-to-typescript';
import { GENERATED } from './generated-file.ts';
import { isQuantityKind, isSchema, type JsonSchema, mapSchema, schemaAt } from './json-schema.ts';

const OPTIONS = {
  bannerComment: '',
  additionalProperties: false,
  unreachableDefinitions: false,
  style: { singleQuote: true, printWidth: 110 },
};

/** Types of a spec: `Spec`, one `…Aim` and one `…Inputs` a method, and the unions over all methods. */
export async function writeSpecTypes(
  schema: JsonSchema,
  fragments: ReadonlyMap<string, JsonSchema>,
): Promise<string> {
  const titles = [...fragments.values()].map((fragment) => String(fragment.title));
  return [
    GENERATED,
    `export type MethodName = ${union([...fragments.keys()].map((name) => `'${name}'`))};`,
    `export type AimInputs = ${union(titles.map((title) => `${title}Inputs`))};`,
    '',
    await compile(plainer(schema) as JSONSchema, 'Spec', OPTIONS),
  ].join('\n');
}

export async function writeResultTypes(schema: JsonSchema): Promise<string> {
  return [
    GENERATED,
    await compile({ ...schema, title: 'ResultJson' } as JSONSchema, 'ResultJson', OPTIONS),
  ].join('\n');
}

function union(members: readonly string[]): string {
  return members.length === 0 ? 'never' : members.join(' | ');
}

/** The schema without what types cannot say: conditions, and ranges. All kinds of quantity become one type. */
function plainer(schema: JsonSchema): JsonSchema {
  const definitions = schemaAt(schema, '$defs', 'schema');
  const kinds = Object.keys(definitions).filter((name) => isQuantityKind(definitions[name]));
  const quantity = kinds.includes('real') ? 'real' : kinds[0];
  const plain = mapSchema(schema, (part) => {
    const {
      if: _if,
      then: _then,
      else: _else,
      allOf: _allOf,
      minItems: _least,
      maxItems: _most,
      ...kept
    } = part;
    // A title names the type, which is wanted for objects only.
    if (!isSchema(kept.properties)) delete kept.title;
    if (typeof kept.$ref !== 'string') return kept;
    const name = kept.$ref.replace('#/$defs/', '');
    if (kinds.includes(name)) return { $ref: `#/$defs/${quantity}` };
    if (name === 'text') return { type: 'string', description: kept.description };
    return { $ref: kept.$ref };
  });
  const plainDefinitions = schemaAt(plain, '$defs', 'schema');
  const shown = quantity ? plainDefinitions[quantity] : undefined;
  if (quantity && isSchema(shown)) {
    const description = 'A number an assumption rests on, alone or with its range, basis and source.';
    plainDefinitions[quantity] = { ...shown, title: 'QuantityValue', description };
  }
  return plain;
}
