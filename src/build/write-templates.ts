/** Precompiles templates/, so that a run loads no template compiler. */

import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import Handlebars from 'handlebars';
import { GENERATED } from './generated-file.ts';

/** How every template is compiled, a user's own included: nothing is escaped unasked, as the text is Markdown,
 *  and a missing value is an error. */
const OPTIONS = { noEscape: true, strict: true } as const;

export function writeTemplates(root: string, note: (text: string) => void): string {
  const folder = join(root, 'templates');
  const paths = existsSync(folder)
    ? readdirSync(folder, { recursive: true, encoding: 'utf8' })
        .filter((path) => path.endsWith('.hbs'))
        .map((path) => path.replaceAll('\\', '/').replace(/\.hbs$/, ''))
        .sort()
    : [];
  if (paths.length === 0) note('no templates/**/*.hbs');
  const entries = paths.map((path) => `  '${path}': ${precompiled(join(folder, `${path}.hbs`))},`);
  return [
    '// @ts-nocheck: the bodies are Handlebars output, plain JavaScript.',
    GENERATED,
    '/** What Handlebars.template() takes, by path below templates/: `parts/losses`. */',
    'export const templates: Readonly<Record<string, object>> = {',
    ...entries,
    '};',
    '',
  ].join('\n');
}

function precompiled(path: string): string {
  try {
    return String(Handlebars.precompile(readFileSync(path, 'utf8'), OPTIONS));
  } catch (error) {
    throw new Error(`${path}: ${(error as Error).message}`);
  }
}
