/** A spec named on the command line: a file, or `-` for standard input, and the references file beside it. */

import { dirname, resolve } from 'node:path';
import { readStandardInput } from '../files/read-standard-input.ts';
import { readUnderRoot } from '../files/read-under-root.ts';
import { type Checked, check, INFEASIBLE, type Problem, type SpecOptions } from '../index.ts';
import { EXIT, Exit } from './exit.ts';
import { painter, problemText } from './terminal.ts';

export interface SpecSource {
  text: string;
  options: SpecOptions;
}

export interface SourceOptions {
  allowOutside?: boolean;
}

export const ALLOW_OUTSIDE = [
  '--allow-outside',
  'let the spec name a references file outside its own folder',
] as const;

export function readSpec(path: string, { allowOutside = false }: SourceOptions): SpecSource {
  const isInput = path === '-';
  const folder = isInput ? process.cwd() : dirname(path);
  return {
    text: isInput ? readStandardInput() : readUnderRoot(resolve(path), { root: folder, allowOutside: true }),
    options: {
      file: isInput ? 'standard input' : path,
      readReferences: (references) => readUnderRoot(references, { root: folder, allowOutside }),
    },
  };
}

/** Check a spec and say on stderr what stops it. @throws Exit when it cannot be planned or breaks a rule of level
 *  error; a study that is merely infeasible goes on, since its documents say so. */
export function planOrExit({
  text,
  options,
}: SpecSource): Checked & { report: NonNullable<Checked['report']> } {
  const checked = check(text, options);
  const errors = checked.problems.filter(({ level }) => level === 'error');
  printProblems(errors);
  const { report } = checked;
  if (report === null || errors.some(({ code }) => code !== INFEASIBLE)) throw new Exit(EXIT.spec);
  return { ...checked, report };
}

export function printProblems(problems: readonly Problem[]): void {
  const paint = painter(process.stderr);
  for (const problem of problems) process.stderr.write(`${problemText(problem, paint)}\n`);
}

/** A study that asks for more people than can be had ends with the exit code of an infeasible spec. */
export function exitIfInfeasible({ problems }: Checked): void {
  if (problems.some(({ code }) => code === INFEASIBLE)) throw new Exit(EXIT.spec);
}
