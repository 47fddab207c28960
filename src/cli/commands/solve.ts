/** `samplecase solve`: the numbers, for people or for programs. */

import { Command } from 'commander';
import { numbersTable, toResult } from '../../index.ts';
import {
  ALLOW_OUTSIDE,
  exitIfInfeasible,
  planOrExit,
  printProblems,
  readSpec,
  type SourceOptions,
} from '../spec-source.ts';
import { terminalTable, visible } from '../terminal.ts';

export function solveCommand(): Command {
  return new Command('solve')
    .description('Print the sample size, power and detectable effect of every aim')
    .argument('<spec>', 'spec file, or - for standard input')
    .option('--json', 'print the result as JSON, described by the result schema')
    .option(...ALLOW_OUTSIDE)
    .action((path: string, options: SourceOptions & { json?: boolean }) => {
      const checked = planOrExit(readSpec(path, options));
      if (options.json) {
        process.stdout.write(`${JSON.stringify(toResult(checked.report), null, 2)}\n`);
      } else {
        const { title, head, rows, lines } = numbersTable(checked.report);
        process.stdout.write(`${visible(title)}\n\n${terminalTable(head, rows)}\n\n${lines.join('\n')}\n`);
        printProblems(checked.problems.filter(({ level }) => level === 'warning'));
      }
      exitIfInfeasible(checked);
    });
}
