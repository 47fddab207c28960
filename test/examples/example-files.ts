/** The shipped examples: what they are called, and what they write. */

import { readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { check, renderAll } from '../../src/index.ts';

export const EXAMPLES = resolve(import.meta.dirname, '../../examples');

export function exampleNames(): string[] {
  return readdirSync(EXAMPLES, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map(({ name }) => name)
    .sort();
}

export function exampleSpec(name: string): string {
  return readFileSync(join(EXAMPLES, name, 'spec.yaml'), 'utf8');
}

/** Documents and figures by file name. */
export function exampleFiles(name: string): Map<string, string> {
  const { report, problems } = check(exampleSpec(name), { file: `${name}/spec.yaml` });
  if (report === null) throw new Error(problems.map(({ path, message }) => `${path}: ${message}`).join('\n'));
  return new Map(
    renderAll(report).flatMap(({ files }) => files.map(({ name: file, content }) => [file, content])),
  );
}
