/** The modules that list what the folders hold: methods, starter specs, keys of built-in sources, version. */

import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { GENERATED, literal } from './generated-file.ts';

/** `name → method` for every file src/methods/<family>/<name>.ts that has a fragment of the same name. */
export function writeCatalogue(root: string, names: readonly string[], note: (text: string) => void): string {
  const folder = join(root, 'src', 'methods');
  const found = new Map<string, string>();
  for (const family of readdirSync(folder, { withFileTypes: true }).filter((entry) => entry.isDirectory())) {
    for (const file of readdirSync(join(folder, family.name))) {
      const name = file.replace(/\.ts$/, '');
      if (names.includes(name)) found.set(name, `../methods/${family.name}/${file}`);
    }
  }
  const missing = names.filter((name) => !found.has(name));
  if (missing.length > 0) note(`no file in src/methods/ for ${missing.join(', ')}`);
  const listed = names.filter((name) => found.has(name));
  return [
    GENERATED,
    ...listed.map((name) => `import { ${camelCase(name)} } from '${found.get(name)}';`),
    "import type { Method } from '../methods/method.ts';",
    "import type { MethodName } from './spec.ts';",
    '',
    'export const methods: Readonly<Record<MethodName, Method>> = {',
    ...listed.map((name) => `  '${name}': ${camelCase(name)},`),
    `}${missing.length > 0 ? ' as Readonly<Record<MethodName, Method>>' : ''};`,
    '',
  ].join('\n');
}

export function writeNewSpecs(
  names: readonly string[],
  starters: ReadonlyMap<string, string>,
  note: (text: string) => void,
): string {
  const missing = names.filter((name) => !starters.has(name));
  if (missing.length > 0)
    note(`no starter spec (schema/methods/<method>.new.yaml) for ${missing.join(', ')}`);
  const listed = Object.fromEntries(
    names.flatMap((name) => (starters.has(name) ? [[name, starters.get(name)]] : [])),
  );
  const type = 'Readonly<Record<MethodName, string>>';
  return [
    GENERATED,
    "import type { MethodName } from './spec.ts';",
    '',
    "/** The commented spec that `samplecase new` writes; SCHEMA_PATH in its first line is the caller's to fill. */",
    `export const newSpecs: ${type} = ${literal(listed)}${missing.length > 0 ? ` as ${type}` : ''};`,
    '',
  ].join('\n');
}

/** Keys under which a spec may cite what ships with the package. */
export function writeSourceKeys(root: string, note: (text: string) => void): string {
  const path = join(root, 'src', 'sources', 'sources.json');
  if (!existsSync(path)) note('no src/sources/sources.json');
  const items = existsSync(path) ? (JSON.parse(readFileSync(path, 'utf8')) as { id: string }[]) : [];
  const keys = items.map(({ id }) => id).sort();
  return [GENERATED, `export const sourceKeys: readonly string[] = ${literal(keys)};`, ''].join('\n');
}

export function writeVersion(root: string): string {
  const { version } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as { version: string };
  return [GENERATED, `export const version = '${version}';`, ''].join('\n');
}

/** `linear-nested` → `linearNested`. */
function camelCase(name: string): string {
  return name.replace(/-(\w)/g, (_, letter: string) => letter.toUpperCase());
}
