/** How a run ends. */

export const EXIT = {
  done: 0,
  /** The spec is invalid, infeasible or breaks a rule of level error. */
  spec: 1,
  /** Wrong use of the command line. */
  usage: 2,
  /** A defect of ours. */
  defect: 70,
} as const;

/** Thrown by a command that has said what there is to say. */
export class Exit extends Error {
  readonly code: number;

  constructor(code: number) {
    super(`exit ${code}`);
    this.code = code;
  }
}
