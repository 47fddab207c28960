/** Rewrites the committed documents of examples/: run after a change of prose or numbers, then read the difference. */

import { mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { EXAMPLES, exampleFiles, exampleNames } from './example-files.ts';

for (const name of exampleNames()) {
  const folder = join(EXAMPLES, name, 'documents');
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true });
  for (const [file, content] of exampleFiles(name)) writeFileSync(join(folder, file), content);
  console.log(folder);
}
