/** The modules that carry data files, so that a run reads no file of the package: built-in references and the
 *  style sheet of the page. */

import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { GENERATED, literal } from './generated-file.ts';

export function writeReferences(root: string): string {
  const items: unknown = JSON.parse(readFileSync(join(root, 'src', 'sources', 'sources.json'), 'utf8'));
  return [
    GENERATED,
    "import type { Reference } from '../spec/study.ts';",
    '',
    `export const references = ${literal(items)} as readonly Reference[];`,
    '',
  ].join('\n');
}

/** The style sheet without comments and indentation, and the hash by which the page's policy allows it. */
export function writePageStyle(root: string): string {
  const css = readFileSync(join(root, 'templates', 'page', 'style.css'), 'utf8')
    .replace(/\/\*[\s\S]*?\*\//g, '')
    .replace(/\s*\n\s*/g, '\n')
    .trim();
  const hash = createHash('sha256').update(css).digest('base64');
  return [
    GENERATED,
    `export const pageStyle = ${literal({ css, source: `'sha256-${hash}'` })} as const;`,
    '',
  ].join('\n');
}
