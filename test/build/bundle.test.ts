import { execFileSync } from 'node:child_process';
import {
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  rmSync,
  statSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { bundle } from '../../src/build/bundle.ts';

/** A project of a few lines in the shape of ours; what it makes is moved to where there are no packages. */
const root = join(import.meta.dirname, '..', '..');
let folder = '';
let installed = '';

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'samplecase-bundle-'));
  const project = join(folder, 'project');
  installed = join(folder, 'installed', 'dist');
  const write = (path: string, text: string): void => {
    mkdirSync(dirname(join(project, path)), { recursive: true });
    writeFileSync(join(project, path), text);
  };
  write(
    'src/index.ts',
    "import { half } from './half.ts';\nimport { validate } from './generated/validate-spec.js';\nexport type { Half } from './half.ts';\nexport { half, validate };\n",
  );
  write(
    'src/half.ts',
    '/** Half of it. */\nexport const half = (x: number): Half => x / 2;\nexport type Half = number;\n',
  );
  write('src/unused.ts', 'export const unused = 1;\n');
  write('src/generated/validate-spec.js', 'export const validate = (x) => x === 1;\n');
  write('src/generated/validate-spec.d.ts', 'export const validate: (x: unknown) => boolean;\n');
  write('src/generated/spec.schema.json', '{"$id": "urn:x"}\n');
  write(
    'src/cli/main.ts',
    "import { readFileSync } from 'node:fs';\nimport { Command } from 'commander';\nimport { half } from '../index.ts';\n" +
      "new Command('x').argument('<n>').action((n: string) => console.log(half(Number(n)), " +
      "readFileSync(new URL('../schema/spec.schema.json', import.meta.url), 'utf8').trim())).parse();\n",
  );
  write('package.json', '{"type": "module"}');
  copyFileSync(join(root, 'tsconfig.json'), join(project, 'tsconfig.json'));
  symlinkSync(join(root, 'node_modules'), join(project, 'node_modules'));
  await bundle({ root: project, out: installed });
  writeFileSync(join(folder, 'installed', 'package.json'), '{"type": "module"}');
});

afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe('what is shipped', () => {
  it('has a command line that runs by itself, its packages in it and the schema beside it', () => {
    const file = join(installed, 'cli', 'main.js');
    expect(execFileSync(file, ['5'], { encoding: 'utf8' })).toBe('2.5 {"$id": "urn:x"}\n');
    expect(statSync(file).mode & 0o111).toBe(0o111);
    expect(readFileSync(file, 'utf8').startsWith('#!/usr/bin/env node\n')).toBe(true);
  });

  it('has a library of modules that import each other as JavaScript', () => {
    const script = `import('${join(installed, 'index.js')}').then((m) => console.log(m.half(3), m.validate(1), Object.keys(m).join()))`;
    expect(execFileSync(process.execPath, ['-e', script], { encoding: 'utf8' })).toBe(
      '1.5 true half,validate\n',
    );
  });

  it('has types, with their comments and without the endings of our sources', () => {
    expect(readFileSync(join(installed, 'half.d.ts'), 'utf8')).toContain('Half of it.');
    expect(readFileSync(join(installed, 'index.d.ts'), 'utf8')).not.toContain(".ts'");
    expect(existsSync(join(installed, 'generated', 'validate-spec.d.ts'))).toBe(true);
  });

  it('leaves out what the library does not reach', () => {
    expect(existsSync(join(installed, 'unused.js'))).toBe(false);
  });
});

it('a source that does not compile is an error that names it, and leaves the last build', async () => {
  const project = join(folder, 'project');
  writeFileSync(
    join(project, 'src', 'half.ts'),
    'export const half: string = 1;\nexport type Half = number;\n',
  );
  await expect(bundle({ root: project, out: installed })).rejects.toThrow(/half\.ts/);
  expect(existsSync(join(installed, 'index.js'))).toBe(true);
});
