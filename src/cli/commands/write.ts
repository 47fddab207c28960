/** `samplecase write`: every document the spec asks for, and nothing outside the folder named by --out. */

import { join } from 'node:path';
import { Command } from 'commander';
import { readTemplates } from '../../files/read-templates.ts';
import { writeWhole } from '../../files/write-whole.ts';
import { renderAll } from '../../index.ts';
import { EXIT, Exit } from '../exit.ts';
import { ALLOW_OUTSIDE, exitIfInfeasible, planOrExit, readSpec, type SourceOptions } from '../spec-source.ts';

interface WriteOptions extends SourceOptions {
  out: string;
  templates?: string;
}

export function writeCommand(): Command {
  return new Command('write')
    .description('Write every document the spec asks for')
    .argument('<spec>', 'spec file, or - for standard input')
    .requiredOption('--out <folder>', 'folder for the documents; made when it is missing')
    .option('--templates <folder>', 'your own templates, which replace ours file by file')
    .option(...ALLOW_OUTSIDE)
    .action(async (path: string, options: WriteOptions) => {
      const checked = planOrExit(readSpec(path, options));
      if (checked.report.study.documents.length === 0) {
        process.stderr.write(
          `${path} asks for no document. Add documents, such as [{kind: ethics}, {kind: appendix}].\n`,
        );
        throw new Exit(EXIT.spec);
      }
      const templates = options.templates === undefined ? {} : await ownTemplates(options.templates);
      const documents = renderAll(checked.report, templates);
      const files = documents.flatMap(({ files: ofDocument }) => ofDocument);
      const distinct = new Map(files.map(({ name, content }) => [join(options.out, name), content]));
      writeWhole([...distinct].map(([file, content]) => ({ path: file, content })));
      for (const { remarks } of documents) for (const remark of remarks) process.stderr.write(`${remark}\n`);
      for (const file of distinct.keys()) process.stdout.write(`${file}\n`);
      exitIfInfeasible(checked);
    });
}

/** The template compiler is loaded only for those who bring templates. */
async function ownTemplates(folder: string) {
  const { compileTemplates } = await import('../../document/compile-templates.ts');
  return compileTemplates(readTemplates(folder));
}
