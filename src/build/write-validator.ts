/** Compiles the schemas to plain JavaScript now, so that a run does not spend a quarter of a second on it. */

import { Ajv2020 } from 'ajv/dist/2020.js';
import standalone from 'ajv/dist/standalone/index.js';
import { build } from 'esbuild';
import { type JsonSchema, mapSchema } from './json-schema.ts';

/** Source of a module that exports validation functions: by name, the part of the schema each checks. */
export async function writeValidator(
  schema: JsonSchema,
  parts: Readonly<Record<string, string>>,
  resolveFrom: string,
): Promise<string> {
  const ajv = new Ajv2020({
    schemas: [schema],
    allErrors: true,
    discriminator: true,
    strict: true,
    strictRequired: false,
    allowUnionTypes: true,
    messages: false,
    inlineRefs: false,
    keywords: annotationsOf(schema),
    code: { source: true, esm: true },
  });
  const references = Object.fromEntries(
    Object.entries(parts).map(([name, part]) => [name, `${schema.$id}${part}`]),
  );
  // ajv's own output still requires its helpers as CommonJS; bundling them in leaves no import at all.
  const bundled = await build({
    stdin: { contents: standalone.default(ajv, references), resolveDir: resolveFrom, loader: 'js' },
    bundle: true,
    format: 'esm',
    target: 'node20',
    minify: true,
    write: false,
    logLevel: 'warning',
  });
  return bundled.outputFiles[0]?.text ?? '';
}

export function writeValidatorTypes(names: readonly string[]): string {
  return [
    '/** What is wrong at one place, before it is put into words. */',
    'export interface SchemaError {',
    '  keyword: string;',
    '  instancePath: string;',
    '  schemaPath: string;',
    '  params: Record<string, unknown>;',
    '}',
    'export interface Validate {',
    '  (data: unknown): boolean;',
    '  errors?: SchemaError[] | null;',
    '}',
    ...names.map((name) => `export const ${name}: Validate;`),
    '',
  ].join('\n');
}

/** Our own annotations, which strict mode must be told of. */
function annotationsOf(schema: JsonSchema): string[] {
  const found = new Set<string>();
  mapSchema(schema, (part) => {
    for (const key of Object.keys(part)) if (key.startsWith('x-')) found.add(key);
    return part;
  });
  return [...found].sort();
}
