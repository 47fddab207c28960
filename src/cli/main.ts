/** The command line, as a table of contents: which commands there are, and how a run ends. */

import { Command, CommanderError } from 'commander';
import { ProblemError, version } from '../index.ts';
import { checkCommand } from './commands/check.ts';
import { methodsCommand } from './commands/methods.ts';
import { newCommand } from './commands/new.ts';
import { rulesCommand } from './commands/rules.ts';
import { solveCommand } from './commands/solve.ts';
import { writeCommand } from './commands/write.ts';
import { EXIT, Exit } from './exit.ts';
import { painter, problemText } from './terminal.ts';

function program(): Command {
  const root = new Command('samplecase')
    .description('Makes the case for a study’s sample size: one spec in, numbers and documents out.')
    .version(version)
    .option('--debug', 'print the stack of a defect')
    .showHelpAfterError('(samplecase --help lists the commands)')
    .exitOverride()
    .addHelpText(
      'after',
      `
Examples:
  samplecase new study.yaml --method linear-nested   a commented spec to edit
  samplecase check study.yaml                        valid, complete, feasible?
  samplecase solve study.yaml                        the numbers; --json for programs
  samplecase write study.yaml --out documents/       every document the spec asks for
  cat study.yaml | samplecase solve - --json         read standard input

Exit codes: 0 done; 1 the spec is invalid, infeasible or breaks a rule; 2 wrong use; 70 a defect of ours.
Colours are left out when NO_COLOR is set. Nothing is sent anywhere.`,
    );
  const commands = [newCommand, checkCommand, solveCommand, writeCommand, methodsCommand, rulesCommand];
  for (const command of commands) root.addCommand(command().copyInheritedSettings(root));
  return root;
}

async function run(arguments_: readonly string[]): Promise<number> {
  try {
    await program().parseAsync(arguments_, { from: 'user' });
    return EXIT.done;
  } catch (error) {
    return exitCodeOf(error, arguments_.includes('--debug'));
  }
}

function exitCodeOf(error: unknown, debug: boolean): number {
  if (error instanceof Exit) return error.code;
  // commander has printed its message already; help and version are no errors.
  if (error instanceof CommanderError) return error.exitCode === 0 ? EXIT.done : EXIT.usage;
  if (error instanceof ProblemError) {
    const paint = painter(process.stderr);
    for (const problem of error.problems) process.stderr.write(`${problemText(problem, paint)}\n`);
    return EXIT.spec;
  }
  process.stderr.write(
    `samplecase ${version} has met a defect of its own: ${error instanceof Error ? error.message : String(error)}\n` +
      'Please report it with the spec that shows it, or a smaller one that does.\n',
  );
  if (debug && error instanceof Error) process.stderr.write(`${error.stack}\n`);
  return EXIT.defect;
}

// A reader that closes the pipe early (`| head`) has seen what it wanted.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code === 'EPIPE') process.exit(EXIT.done);
  throw error;
});

process.exitCode = await run(process.argv.slice(2));
