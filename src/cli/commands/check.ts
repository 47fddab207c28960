/** `samplecase check`: is the spec valid, complete and feasible, and which rules does it break? */

import { Command } from 'commander';
import { check } from '../../index.ts';
import { EXIT, Exit } from '../exit.ts';
import { ALLOW_OUTSIDE, printProblems, readSpec, type SourceOptions } from '../spec-source.ts';

export function checkCommand(): Command {
  return new Command('check')
    .description('Check a spec: valid, complete, feasible, and which rules it breaks')
    .argument('<spec>', 'spec file, or - for standard input')
    .option('--json', 'print the problems as JSON on standard output')
    .option(...ALLOW_OUTSIDE)
    .action((path: string, options: SourceOptions & { json?: boolean }) => {
      const { text, options: specOptions } = readSpec(path, options);
      const { problems } = check(text, specOptions);
      if (options.json) process.stdout.write(`${JSON.stringify({ problems }, null, 2)}\n`);
      else printProblems(problems);
      const count = (level: string) => problems.filter((problem) => problem.level === level).length;
      const summary = [
        named(count('error'), 'error'),
        named(count('warning'), 'warning'),
        named(count('note'), 'note'),
      ].join(', ');
      process.stderr.write(`${path}: ${summary}\n`);
      if (count('error') > 0) throw new Exit(EXIT.spec);
    });
}

function named(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}
