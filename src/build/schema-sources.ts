/** Reads schema/: the base, the kinds of quantity and one fragment a method. */

import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { JsonSchema } from './json-schema.ts';

export interface SchemaSources {
  base: JsonSchema;
  quantity: JsonSchema;
  /** By name of the method, in alphabetical order. */
  fragments: Map<string, JsonSchema>;
  /** Commented starter spec of each method that has one. */
  starters: Map<string, string>;
  /** What `solve --json` prints; null until it is written. */
  result: JsonSchema | null;
}

export function readSchemaSources(root: string): SchemaSources {
  const folder = join(root, 'schema');
  const json = (path: string): JsonSchema => {
    try {
      return JSON.parse(readFileSync(join(folder, path), 'utf8')) as JsonSchema;
    } catch (error) {
      throw new Error(`schema/${path}: ${(error as Error).message}`);
    }
  };
  const names = readdirSync(join(folder, 'methods'));
  const named = <T>(ending: string, read: (file: string) => T): Map<string, T> =>
    new Map(
      names
        .filter((name) => name.endsWith(ending))
        .map((name) => name.slice(0, -ending.length))
        .sort()
        .map((method) => [method, read(join('methods', `${method}${ending}`))]),
    );
  return {
    base: json('spec.json'),
    quantity: json('quantity.json'),
    fragments: named('.json', json),
    starters: named('.new.yaml', (path) => readFileSync(join(folder, path), 'utf8')),
    result: existsSync(join(folder, 'result.json')) ? json('result.json') : null,
  };
}
