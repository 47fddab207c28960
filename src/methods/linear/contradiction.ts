/** Inputs that are each in their range but not together. */

import { ProblemError } from '../../problem.ts';

/** @throws ProblemError; the path is completed by `atAim`. */
export function contradiction(key: string, sentence: string): never {
  throw new ProblemError([{ level: 'error', code: 'M05', path: key, message: `${key} ${sentence}` }]);
}

/** Run with the paths of contradictions completed: `slope` becomes `aims[2].inputs.effect.slope`. */
export function atAim<Out>(index: number, pathOf: (key: string) => string | undefined, run: () => Out): Out {
  try {
    return run();
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error;
    throw new ProblemError(
      error.problems.map((problem) => ({
        ...problem,
        path: pathOf(problem.path) ?? `aims[${index}].inputs.effect.${problem.path}`,
      })),
    );
  }
}
