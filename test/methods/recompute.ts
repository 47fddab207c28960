/** Runs the printed steps of calculations in R or Python, all cases in one process. */

import { spawnSync } from 'node:child_process';
import type { Step } from '../../src/methods/method.ts';
import { interpreter, type Language } from '../support/interpreters.ts';

export interface StepCase {
  name: string;
  /** Numbers that the steps use by name: constants, the effect, n. */
  given: Readonly<Record<string, number>>;
  steps: readonly Pick<Step, 'variable' | 'value' | 'r' | 'python'>[];
}

export interface Rerun {
  /** `case: variable`. */
  name: string;
  printed: number;
  rerun: number;
}

const ASSIGN = { r: '<-', python: '=' } as const;

/** Python gets what the page's own preamble imports. */
const PREAMBLE = {
  r: '',
  python:
    'from math import ceil, exp, floor, sqrt\nimport numpy as np\nfrom scipy import integrate, optimize, special, stats\n',
} as const;

/** Every step that is printed as a value, as the language gives it. @throws Error when the script stops. */
export function rerunSteps(cases: readonly StepCase[], language: Language): Rerun[] {
  const script = PREAMBLE[language] + cases.map((one) => block(one, language)).join('\n');
  const [command, args] = [interpreter(language), language === 'r' ? ['-'] : ['-']];
  const { status, stdout, stderr } = spawnSync(command, args, { input: script, encoding: 'utf8' });
  if (status !== 0) throw new Error(`${language} stopped: ${stderr}`);
  const values = stdout.trim().split(/\s+/).map(Number);
  const printed = cases.flatMap(({ name, steps }) =>
    steps.flatMap(({ variable, value }) =>
      value === null ? [] : [{ name: `${name}: ${variable}`, printed: value }],
    ),
  );
  if (values.length !== printed.length) {
    throw new Error(`${language} gave ${values.length} values for ${printed.length} steps`);
  }
  return printed.map((one, index) => ({ ...one, rerun: values[index] ?? Number.NaN }));
}

function block({ given, steps }: StepCase, language: Language): string {
  const show =
    language === 'r'
      ? (name: string) => `cat(sprintf("%.17g\\n", ${name}))`
      : (name: string) => `print(repr(float(${name})))`;
  return [
    ...Object.entries(given).map(([name, value]) => `${name} ${ASSIGN[language]} ${value}`),
    // A step without a variable defines functions; Python ends such a block with an empty line.
    ...steps.flatMap((step) => [
      step.variable === '' ? step[language] : `${step.variable} ${ASSIGN[language]} ${step[language]}`,
      ...(step.value === null ? [] : [show(step.variable)]),
    ]),
  ].join('\n');
}

/** Reruns that differ from what is printed by more than the relative tolerance. */
export function differences(reruns: readonly Rerun[], tolerance: number): string[] {
  return reruns.flatMap(({ name, printed, rerun }) => {
    const error = printed === rerun ? 0 : Math.abs(rerun - printed) / Math.abs(printed);
    return error <= tolerance ? [] : [`${name} is printed as ${printed} and reruns as ${rerun} (${error})`];
  });
}
