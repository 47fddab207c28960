import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join, relative, resolve } from 'node:path';
import { describe, expect, test } from 'vitest';

const SRC = resolve(import.meta.dirname, '../src');

/** Which folder (or file directly under src/) may import which; everything but numeric may use problem. */
const ALLOWED: Record<string, readonly string[]> = {
  numeric: [],
  files: [],
  problem: [],
  generated: ['methods', 'spec', 'generated'],
  effects: ['numeric'],
  spec: ['generated', 'sources'],
  sources: ['spec', 'generated'],
  methods: ['effects', 'numeric', 'generated', 'spec'],
  plan: ['methods', 'effects', 'numeric', 'spec', 'generated'],
  sensitivity: ['plan', 'methods', 'spec', 'numeric'],
  rules: ['sensitivity', 'plan', 'methods', 'numeric', 'spec', 'generated', 'effects'],
  document: ['rules', 'sensitivity', 'plan', 'methods', 'spec', 'sources', 'generated', 'report'],
  report: ['rules', 'sensitivity', 'plan', 'spec'],
  result: ['report', 'rules', 'plan', 'generated'],
  index: ['document', 'generated', 'methods', 'report', 'result', 'rules', 'spec', 'plan', 'sensitivity'],
  cli: ['index', 'files', 'document'],
  build: ['spec', 'generated', 'sources'],
};

/** Third-party packages, and the one place below src/ that imports each (build/ apart, which is not shipped). */
const PACKAGES: Record<string, string> = {
  'js-yaml': 'spec/',
  canonicalize: 'spec/canonical.ts',
  'fastest-levenshtein': 'spec/nearest.ts',
  jstat: 'sensitivity/assurance.ts',
  'handlebars/runtime.js': 'document/templates.ts',
  // The compiler is loaded by compile-templates.ts only; templates.ts takes its types.
  handlebars: 'document/',
  'markdown-it': 'document/markdown/',
  'd3-scale': 'document/figures/',
  'd3-shape': 'document/figures/',
  commander: 'cli/',
};

interface Import {
  from: string;
  target: string;
  isTypeOnly: boolean;
}

const files = readdirSync(SRC, { recursive: true, encoding: 'utf8' })
  .map((path) => path.replaceAll('\\', '/'))
  .filter((path) => path.endsWith('.ts') && !path.endsWith('.d.ts') && !path.startsWith('generated/'));

const imports: Import[] = files.flatMap((from) => {
  const text = readFileSync(join(SRC, from), 'utf8');
  const pattern = /^(?:import|export)\s+(type\s+)?(?:[^'";]*?from\s+)?'([^']+)'|import\('([^']+)'\)/gm;
  return [...text.matchAll(pattern)].map((match) => ({
    from,
    target: match[2] ?? match[3] ?? '',
    isTypeOnly: match[1] !== undefined,
  }));
});

function folderOf(path: string): string {
  return path.includes('/') ? (path.split('/')[0] ?? path) : path.replace(/\.ts$/, '');
}

function resolved({ from, target }: Import): string {
  return relative(SRC, join(SRC, dirname(from), target)).replaceAll('\\', '/');
}

describe('the directions of imports', () => {
  const inner = imports.filter(({ target }) => target.startsWith('.'));

  test('there is something to look at', () => {
    expect(files.length).toBeGreaterThan(60);
    expect(inner.length).toBeGreaterThan(100);
  });

  test('every folder imports only what it may, type imports included', () => {
    const broken = inner
      .map((one) => ({ ...one, here: folderOf(one.from), there: folderOf(resolved(one)) }))
      .filter(({ here, there }) => here !== there)
      .filter(({ here, there }) => !(there === 'problem' && here !== 'numeric'))
      .filter(({ here, there }) => !(ALLOWED[here] ?? []).includes(there))
      .map(({ from, target }) => `${from} → ${target}`);
    expect(broken).toEqual([]);
  });

  test('no file stands in a cycle, type imports included', () => {
    const next = new Map<string, string[]>();
    for (const one of inner) next.set(one.from, [...(next.get(one.from) ?? []), resolved(one)]);
    const done = new Set<string>();
    const cycles: string[] = [];
    const visit = (file: string, path: readonly string[]) => {
      if (path.includes(file)) cycles.push([...path.slice(path.indexOf(file)), file].join(' → '));
      if (done.has(file) || path.includes(file)) return;
      for (const target of next.get(file) ?? []) visit(target, [...path, file]);
      done.add(file);
    };
    for (const file of files) visit(file, []);
    expect(cycles).toEqual([]);
  });

  test('each third-party package is imported in one place', () => {
    const strays = imports
      .filter(
        ({ from, target }) =>
          !target.startsWith('.') && !target.startsWith('node:') && !from.startsWith('build/'),
      )
      .filter(({ from, target }) => !from.startsWith(PACKAGES[target] ?? '(nowhere)'))
      .map(({ from, target }) => `${from} → ${target}`);
    expect(strays).toEqual([]);
  });

  test('only files/, cli/ and build/ touch the disk', () => {
    const touching = imports
      .filter(({ target }) => /^node:(fs|os|child_process|net|http|https|process)/.test(target))
      .map(({ from }) => from)
      .filter((from) => !/^(files|cli|build)\//.test(from));
    expect(touching).toEqual([]);
  });
});

describe('the size of files', () => {
  test('no source file is longer than one reading can hold', () => {
    const long = files
      .map((file) => ({ file, lines: readFileSync(join(SRC, file), 'utf8').split('\n').length }))
      .filter(({ lines }) => lines > 400);
    expect(long).toEqual([]);
  });
});
