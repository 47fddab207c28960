import { spawnSync } from 'node:child_process';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { ResultJson } from '../../src/generated/result.ts';
import { nestedSpec } from '../support/nested-spec.ts';

const MAIN = resolve(import.meta.dirname, '../../src/cli/main.ts');
const TSX = resolve(import.meta.dirname, '../../node_modules/tsx/dist/cli.mjs');
const folder = mkdtempSync(join(tmpdir(), 'command-line-'));
const spec = join(folder, 'study.json');

function run(arguments_: readonly string[], input = '', environment: Record<string, string> = {}) {
  const { status, stdout, stderr } = spawnSync(process.execPath, [TSX, MAIN, ...arguments_], {
    cwd: folder,
    encoding: 'utf8',
    input,
    env: { ...process.env, ...environment },
  });
  return { status, stdout, stderr };
}

beforeAll(() => writeFileSync(spec, JSON.stringify(nestedSpec())));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('exit codes', () => {
  test('0 for help and version, on standard output', () => {
    expect(run(['--help'])).toMatchObject({ status: 0, stderr: '' });
    expect(run(['--version']).stdout).toMatch(/^\d+\.\d+\.\d+\n$/);
  });

  test('2 for wrong use', () => {
    expect(run(['solv', 'study.json']).status).toBe(2);
    expect(run(['solve']).status).toBe(2);
    expect(run(['write', 'study.json']).status).toBe(2);
    expect(run(['new', 'x.yaml', '--method', 'none']).status).toBe(2);
    expect(run(['methods', 'none']).status).toBe(2);
    expect(run([]).status).toBe(2);
  });

  test('1 for an invalid spec, with file, line and column on standard error and nothing on standard output', () => {
    const { status, stdout, stderr } = run(['solve', '-'], 'samplecase: 1\nstudyy: {}\n');
    expect({ status, stdout }).toEqual({ status: 1, stdout: '' });
    expect(stderr).toContain('standard input:2:1');
  });

  test('1 for a file that is not there, and the file is named', () => {
    const { status, stderr } = run(['check', 'nowhere.yaml']);
    expect(status).toBe(1);
    expect(stderr).toContain('nowhere.yaml');
  });
});

describe('solve', () => {
  test('--json prints the result, from a file as from standard input', () => {
    const { status, stdout } = run(['solve', 'study.json', '--json']);
    const result = JSON.parse(stdout) as ResultJson;
    expect(status).toBe(0);
    expect(result.study.sample_size).toEqual({ evaluable: 235, enrol: 282 });
    expect(result.aims[0]).toMatchObject({
      id: 'main',
      method: 'linear-nested',
      find: 'sample-size',
      alpha: 0.05,
    });
    expect(run(['solve', '-', '--json'], readFileSync(spec, 'utf8')).stdout).toBe(stdout);
  });

  test('prints a table for people, without colour where there is no terminal', () => {
    const { stdout, stderr } = run(['solve', 'study.json']);
    expect(stdout).toContain('Study: 235 participants analysed, 282 invited');
    // biome-ignore lint/suspicious/noControlCharactersInRegex: the test is about control characters
    expect(stdout + stderr).not.toMatch(/\u001b/);
  });

  test('an infeasible study is solved, reported, and ends with 1', () => {
    const small = JSON.stringify(nestedSpec({ sample: { maximum: 100 } }));
    const { status, stdout, stderr } = run(['solve', '-', '--json'], small);
    expect(status).toBe(1);
    expect((JSON.parse(stdout) as ResultJson).study).toMatchObject({
      feasible: false,
      attainable: { enrol: 100, evaluable: 100 },
    });
    expect(stderr).toContain('not feasible');
  });
});

describe('write', () => {
  test('writes what the spec asks for below --out, lists it, and leaves nothing else', () => {
    const before = readdirSync(folder).sort();
    const { status, stdout } = run(['write', 'study.json', '--out', 'made/documents']);
    expect(status).toBe(0);
    const files = stdout.trim().split('\n');
    expect(files.every((file) => existsSync(join(folder, file)))).toBe(true);
    expect(readdirSync(join(folder, 'made/documents')).sort()).toEqual(
      files.map((file) => file.replace('made/documents/', '')).sort(),
    );
    expect(readdirSync(folder).sort()).toEqual([...before, 'made'].sort());
  });

  test('the same input gives the same bytes, whatever the locale, time zone and clock', () => {
    run(['write', 'study.json', '--out', 'one']);
    run(['write', 'study.json', '--out', 'two'], '', { LC_ALL: 'tr_TR.UTF-8', TZ: 'Pacific/Auckland' });
    for (const name of readdirSync(join(folder, 'one'))) {
      expect(readFileSync(join(folder, 'two', name), 'utf8')).toBe(
        readFileSync(join(folder, 'one', name), 'utf8'),
      );
    }
  });

  test('a user’s templates replace ours, one by one', () => {
    mkdirSync(join(folder, 'own/parts'), { recursive: true });
    writeFileSync(join(folder, 'own/parts/caution.hbs'), '\nAsk Ulrike before you rely on {{enrol}}.\n');
    run(['write', 'study.json', '--out', 'with-own', '--templates', 'own']);
    const page = readFileSync(join(folder, 'with-own/ethics.md'), 'utf8');
    expect(page).toContain('Ask Ulrike before you rely on 282.');
    expect(page).toContain('**235**');
  });

  test('a spec that asks for no document is told so', () => {
    const { documents: _, ...bare } = nestedSpec();
    const { status, stderr } = run(['write', '-', '--out', 'none'], JSON.stringify(bare));
    expect({ status, stderr }).toEqual({
      status: 1,
      stderr: '- asks for no document. Add documents, such as [{kind: ethics}, {kind: appendix}].\n',
    });
  });

  test('a broken template of a user is told by name', () => {
    mkdirSync(join(folder, 'broken/parts'), { recursive: true });
    writeFileSync(join(folder, 'broken/parts/caution.hbs'), '{{#if}');
    const { status, stderr } = run(['write', 'study.json', '--out', 'never', '--templates', 'broken']);
    expect(status).toBe(1);
    expect(stderr).toContain('parts/caution');
    expect(existsSync(join(folder, 'never'))).toBe(false);
  });
});

describe('new, methods, rules', () => {
  test('new writes a spec that passes check, and does not replace a file unasked', () => {
    expect(run(['new', 'fresh.yaml', '--method', 'linear-nested']).status).toBe(0);
    expect(readFileSync(join(folder, 'fresh.yaml'), 'utf8')).toMatch(
      /^# yaml-language-server: \$schema=\S+\n/,
    );
    expect(run(['check', 'fresh.yaml']).status).toBe(0);
    const again = run(['new', 'fresh.yaml', '--method', 'linear-nested']);
    expect(again.status).toBe(2);
    expect(again.stderr).toContain('--force');
  });

  test('methods lists all, and shows one with inputs, formula and sources', () => {
    expect(run(['methods']).stdout).toContain('linear-nested');
    const { stdout } = run(['methods', 'linear-nested']);
    for (const part of ['Inputs', 'Formula', 'Sources', 'adjusted_for']) expect(stdout).toContain(part);
  });

  test('rules shows each with its reason and source', () => {
    expect(run(['rules']).stdout.match(/^Source: /gm)?.length).toBeGreaterThanOrEqual(20);
  });
});
