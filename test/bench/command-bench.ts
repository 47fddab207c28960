/** `samplecase write` cold against an empty Node process: wall time and peak memory, in pairs, medians of ratios.
 *  Prints, asserts nothing. Needs `npm run build` and GNU time for the memory. */

import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';

const ROUNDS = 9;
const ROOT = resolve(import.meta.dirname, '../..');
const MAIN = join(ROOT, 'dist/cli/main.js');
const SPEC = join(ROOT, 'examples/ferry-crews/spec.yaml');
const out = mkdtempSync(join(tmpdir(), 'command-bench-'));

interface Run {
  seconds: number;
  kilobytes: number;
}

/** Peak memory is what the process itself reports at its end, so that no other tool is needed. */
function measured(arguments_: readonly string[]): Run {
  const report =
    'process.on("exit", () => process.stderr.write("\\nPEAK " + process.resourceUsage().maxRSS + "\\n"))';
  const start = process.hrtime.bigint();
  const { stderr } = spawnSync(
    process.execPath,
    ['--import', `data:text/javascript,${encodeURIComponent(report)}`, ...arguments_],
    { encoding: 'utf8' },
  );
  const seconds = Number(process.hrtime.bigint() - start) / 1e9;
  return { seconds, kilobytes: Number(/PEAK (\d+)/.exec(stderr)?.[1] ?? Number.NaN) };
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? Number.NaN;
}

const pairs = Array.from({ length: ROUNDS }, () => ({
  write: measured([MAIN, 'write', SPEC, '--out', out]),
  empty: measured(['-e', '0']),
}));
rmSync(out, { recursive: true, force: true });

const ratio = (key: keyof Run) => median(pairs.map(({ write, empty }) => write[key] / empty[key])).toFixed(2);
const typical = (which: 'write' | 'empty', key: keyof Run) => median(pairs.map((pair) => pair[which][key]));
console.log(`samplecase write, cold, against an empty Node process, ${ROUNDS} pairs, medians`);
console.log(
  `  time    ${typical('write', 'seconds').toFixed(3)} s against ${typical('empty', 'seconds').toFixed(3)} s: ratio ${ratio('seconds')} (wanted: at most 3)`,
);
console.log(
  `  memory  ${(typical('write', 'kilobytes') / 1024).toFixed(0)} MiB against ${(typical('empty', 'kilobytes') / 1024).toFixed(0)} MiB: ratio ${ratio('kilobytes')} (wanted: at most 2)`,
);
