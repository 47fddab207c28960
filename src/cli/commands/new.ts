/** `samplecase new`: a commented spec to edit. */

import { existsSync, realpathSync } from 'node:fs';
import { dirname, relative, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Command, Option } from 'commander';
import { writeWhole } from '../../files/write-whole.ts';
import { type MethodName, newSpecs } from '../../index.ts';
import { EXIT, Exit } from '../exit.ts';

interface NewOptions {
  method: MethodName;
  force?: boolean;
}

export function newCommand(): Command {
  return new Command('new')
    .description('Write a commented, valid spec to edit')
    .argument('<file>', 'file to write, or - for standard output')
    .addOption(
      new Option('--method <name>', 'design method').choices(Object.keys(newSpecs)).makeOptionMandatory(),
    )
    .option('--force', 'replace the file if it exists')
    .action((file: string, { method, force = false }: NewOptions) => {
      const text = newSpecs[method].replace('SCHEMA_PATH', schemaPath(file === '-' ? '.' : dirname(file)));
      if (file === '-') {
        process.stdout.write(text);
        return;
      }
      if (existsSync(file) && !force) {
        process.stderr.write(`${file} exists already; choose another name, or add --force to replace it.\n`);
        throw new Exit(EXIT.usage);
      }
      writeWhole([{ path: file, content: text }]);
      process.stdout.write(`${file}\n`);
    });
}

/** Where an editor finds the schema, as seen from the new spec. */
function schemaPath(folder: string): string {
  const schema = fileURLToPath(new URL('../schema/spec.schema.json', import.meta.url));
  const from = existsSync(folder) ? realpathSync(folder) : resolve(folder);
  return relative(from, schema).replaceAll('\\', '/');
}
