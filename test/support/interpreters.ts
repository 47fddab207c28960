/** R and Python for tests that rerun printed lines. Where one is missing the test is skipped and says so; under CI
 *  a missing one is a failure. */

import { spawnSync } from 'node:child_process';

export type Language = 'r' | 'python';

const CANDIDATES: Record<Language, readonly (readonly [string, readonly string[]])[]> = {
  r: [['Rscript', ['--version']]],
  python: [
    ['python3', ['-c', 'import numpy, scipy.stats']],
    ['/usr/bin/python3', ['-c', 'import numpy, scipy.stats']],
  ],
};

const found = new Map<Language, string | null>();

function search(language: Language): string | null {
  if (!found.has(language)) {
    const works = ([command, probe]: readonly [string, readonly string[]]) =>
      spawnSync(command, probe).status === 0;
    found.set(language, CANDIDATES[language].find(works)?.[0] ?? null);
  }
  return found.get(language) ?? null;
}

/** @throws Error when there is none. */
export function interpreter(language: Language): string {
  const command = search(language);
  if (command === null) throw new Error(`no interpreter for ${language} on this machine`);
  return command;
}

/** Whether tests of the language are to be skipped. Says so once. */
export function isMissing(language: Language): boolean {
  if (search(language) !== null) return false;
  if ((process.env.CI ?? '') !== '') throw new Error(`CI needs an interpreter for ${language}`);
  console.warn(`skipped: no interpreter for ${language} on this machine`);
  return true;
}
