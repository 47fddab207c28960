/** What can be wrong with a spec or a request, as data: wording lives with the check that finds it,
 *  position is added by the one place that knows the file. */

export interface Position {
  line: number;
  column: number;
}

export interface Problem {
  level: 'error' | 'warning' | 'note';
  /** Rule id such as M05, or a stable code such as `unknown-key`, for programs. */
  code: string;
  /** Path in the spec, such as `aims[0].inputs.added`; empty for the whole file. */
  path: string;
  /** One or two sentences: what was found, what is allowed, what to do. */
  message: string;
  file?: string;
  position?: Position;
  /** The reason with which the spec answers a warning. */
  acknowledged?: string;
}

/** Thrown when a spec cannot be planned. Carries every problem found, not the first. */
export class ProblemError extends Error {
  readonly problems: readonly Problem[];

  constructor(problems: readonly Problem[]) {
    super(
      problems.map((problem) => `${problem.path ? `${problem.path}: ` : ''}${problem.message}`).join('\n'),
    );
    this.name = 'ProblemError';
    this.problems = problems;
  }
}

/** One problem of level error, thrown at once. */
export function fail(code: string, path: string, message: string): never {
  throw new ProblemError([{ level: 'error', code, path, message }]);
}
