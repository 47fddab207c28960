/** Speed of the numeric core against base R, paired in one run: medians of ratios over alternating rounds. Prints,
 *  asserts nothing. Where R is absent it says so and skips the pairs. */

import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { linearNested } from '../../src/methods/linear/linear-nested.ts';
import { fTestPower } from '../../src/numeric/power/f-test.ts';
import { requiredNumber } from '../../src/plan/solve.ts';
import { parseSpec } from '../../src/spec/parse.ts';
import { nestedSpec } from '../support/nested-spec.ts';

const ROUNDS = 5;
const SIDE = 100;

function rSeconds(task: 'pf' | 'table'): number {
  const { stdout } = spawnSync('Rscript', [join(import.meta.dirname, 'pf.R'), task], { encoding: 'utf8' });
  return Number(stdout);
}

function elapsed(run: () => void): number {
  const start = process.hrtime.bigint();
  run();
  return Number(process.hrtime.bigint() - start) / 1e9;
}

/** Seconds a call over the noncentralities of pf.R. */
function powerSeconds(): number {
  const rounds = 200;
  const seconds = elapsed(() => {
    for (let i = 0; i < rounds; i += 1)
      for (let k = 0; k < 2000; k += 1) fTestPower(0.05, 4, 115, 10 + k / 200);
  });
  return seconds / (rounds * 2000);
}

/** Seconds for the table of pf.R, through the solver of the headline. */
function tableSeconds(): number {
  const { study } = parseSpec(JSON.stringify(nestedSpec({ predictorValues: 'fixed' })));
  const [aim] = study?.aims ?? [];
  if (aim === undefined) throw new Error('no aim');
  const calculation = linearNested.prepare(aim);
  return elapsed(() => {
    for (let i = 0; i < SIDE; i += 1) {
      const r2 = 0.02 + (0.28 * i) / (SIDE - 1);
      for (let j = 0; j < SIDE; j += 1) {
        requiredNumber(linearNested, calculation, r2 / (1 - r2), 0.6 + (0.37 * j) / (SIDE - 1));
      }
    }
  });
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? Number.NaN;
}

function compare(name: string, ours: () => number, task: 'pf' | 'table', wanted: string): void {
  ours();
  const pairs = Array.from({ length: ROUNDS }, () => ({
    ours: ours(),
    theirs: hasR ? rSeconds(task) : Number.NaN,
  }));
  const own = median(pairs.map((pair) => pair.ours));
  if (!hasR) {
    console.log(`${name}: ${own.toExponential(3)} s (no R on this machine: pair skipped)`);
    return;
  }
  const ratio = median(pairs.map((pair) => pair.ours / pair.theirs));
  const other = median(pairs.map((pair) => pair.theirs));
  console.log(
    `${name}: ${own.toExponential(3)} s against ${other.toExponential(3)} s of base R: ratio ${ratio.toFixed(2)} (wanted: at most ${wanted})`,
  );
}

const hasR = spawnSync('Rscript', ['--version']).status === 0;
compare('power of the F test, a call', powerSeconds, 'pf', '1/2');
compare('100 × 100 table of required numbers', tableSeconds, 'table', '1/5');
