import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { describe, expect, test } from 'vitest';
import packageJson from '../package.json' with { type: 'json' };
import { check, solve } from '../src/index.ts';

const ROOT = resolve(import.meta.dirname, '..');
const text = (name: string) => readFileSync(join(ROOT, name), 'utf8');
const PAGES = ['README.md', 'DEVELOPERS.md', 'CHANGELOG.md'];

describe.each(PAGES)('%s', (page) => {
  test('names only files and folders that exist', () => {
    const named = [
      ...text(page).matchAll(/`((?:src|schema|templates|test|examples|\.ci)\/[\w./-]*)`|\]\(([\w./-]+)\)/g),
    ]
      .map((match) => (match[1] ?? match[2] ?? '').replace(/\/$/, ''))
      .filter((path) => !/linear-example|generated/.test(path));
    const missing = named.filter((path) => !existsSync(join(ROOT, path)));
    expect(missing).toEqual([]);
  });

  test('names only npm scripts that exist', () => {
    const scripts = [...text(page).matchAll(/npm run ([\w-]+)/g)].map((match) => match[1] ?? '');
    expect(scripts.filter((script) => !(script in packageJson.scripts))).toEqual([]);
  });
});

test('the README’s spec is valid and solves to the numbers printed below it', () => {
  const readme = text('README.md');
  const spec = /```yaml\n([\s\S]*?)```/.exec(readme)?.[1] ?? '';
  expect(check(spec).problems.filter(({ level }) => level === 'error')).toEqual([]);
  const { study, aims } = solve(spec);
  expect(readme).toContain(
    `${study.sample_size.evaluable} analysed, ${study.sample_size.enrol} invited, power ${(aims[0]?.power ?? 0).toFixed(3).replace(/^0/, '')}`,
  );
});

test('the README lists every method', async () => {
  const { methods } = await import('../src/index.ts');
  for (const name of Object.keys(methods)) expect(text('README.md')).toContain(name);
});

test('every dependency has its reason in DEVELOPERS.md', () => {
  const page = text('DEVELOPERS.md');
  const packages = [...Object.keys(packageJson.dependencies), ...Object.keys(packageJson.devDependencies)];
  expect(
    packages.filter((name) => !name.startsWith('@types/') && !page.includes(name.replace(/^@[^/]+\//, ''))),
  ).toEqual([]);
});
