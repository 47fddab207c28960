/** Makes dist/: the library as modules with types, the command line as one file, and the schemas. Run by
 *  `npm run build`, after the generator. */

import { chmodSync, copyFileSync, existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';
import ts from 'typescript';

export interface BundleOptions {
  /** Folder that holds src/ and tsconfig.json. */
  root: string;
  /** Folder to make anew. */
  out: string;
}

export async function bundle({ root, out }: BundleOptions): Promise<void> {
  const emitLibrary = compileLibrary(root, out);
  // Only now: sources that do not compile leave the last build as it was.
  rmSync(out, { recursive: true, force: true });
  emitLibrary();
  copyGenerated(root, out);
  await bundleCommandLine(root, out);
}

/** The modules that src/index.ts reaches, each with its types: a user's bundler drops what is not used.
 *  Returns what writes them. @throws {Error} lists what does not compile */
function compileLibrary(root: string, out: string): () => void {
  const config = ts.readConfigFile(join(root, 'tsconfig.json'), ts.sys.readFile);
  const { options } = ts.parseJsonConfigFileContent(config.config, ts.sys, root);
  const program = ts.createProgram([join(root, 'src', 'index.ts')], {
    ...options,
    noEmit: false,
    declaration: true,
    rootDir: join(root, 'src'),
    outDir: out,
  });
  const errors = ts.getPreEmitDiagnostics(program);
  if (errors.length > 0) {
    throw new Error(
      ts.formatDiagnostics(errors, {
        getCanonicalFileName: (name) => name,
        getCurrentDirectory: () => root,
        getNewLine: () => '\n',
      }),
    );
  }
  return () => {
    program.emit(undefined, (file, text) => {
      ts.sys.writeFile(file, file.endsWith('.d.ts') ? withEndingsOfOutput(text) : text);
    });
  };
}

/** The compiler rewrites the endings of imports in modules and leaves them in declarations. */
function withEndingsOfOutput(declarations: string): string {
  return declarations.replace(/(\bfrom |\bimport\()(['"])(\.{1,2}\/[^'"]*)\.ts\2/g, '$1$2$3.js$2');
}

/** What the compiler does not emit: the validator, which is JavaScript already, and the schemas. */
function copyGenerated(root: string, out: string): void {
  const generated = join(root, 'src', 'generated');
  const copy = (file: string, folder: string): void => {
    mkdirSync(join(out, folder), { recursive: true });
    copyFileSync(join(generated, file), join(out, folder, file));
  };
  for (const file of readdirSync(generated)) {
    if (file.endsWith('.js') || file.endsWith('.d.ts')) copy(file, 'generated');
    if (file.endsWith('.schema.json')) copy(file, 'schema');
  }
}

/** One file but for what is seldom needed, packages included: a run then opens one module instead of some hundred. */
async function bundleCommandLine(root: string, out: string): Promise<void> {
  const entry = join(root, 'src', 'cli', 'main.ts');
  if (!existsSync(entry)) throw new Error('src/cli/main.ts is missing.');
  const outfile = join(out, 'cli', 'main.js');
  await build({
    entryPoints: [entry],
    outdir: join(out, 'cli'),
    // The compiler of users' own templates goes into a file of its own, loaded only for those who bring some.
    splitting: true,
    chunkNames: '[name]-[hash]',
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    // Half the bytes to read at every start; names are kept for the stack of a report.
    minifySyntax: true,
    minifyWhitespace: true,
    legalComments: 'eof',
    banner: {
      // Packages in CommonJS call require for what Node itself brings, and a module has none.
      js: [
        '#!/usr/bin/env node',
        "import { createRequire as requireFrom } from 'node:module';",
        'const require = requireFrom(import.meta.url);',
      ].join('\n'),
    },
    logLevel: 'warning',
  });
  chmodSync(outfile, 0o755);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const root = fileURLToPath(new URL('../../', import.meta.url));
  await bundle({ root, out: join(root, 'dist') });
}
