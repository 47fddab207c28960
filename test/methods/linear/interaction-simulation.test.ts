/** How far the power of a product of sampled predictors is from the truth: committed simulation of
 *  interaction-simulation.R against the method, and against what its page says of it. */

import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { linearInteraction } from '../../../src/methods/linear/linear-interaction.ts';
import { bind } from '../bind-aim.ts';

interface Row {
  kind: string;
  correlation: number;
  proportion: number | null;
  n: number;
  f2: number;
  simulated: number;
  error: number;
}

const { rows } = JSON.parse(
  readFileSync(join(import.meta.dirname, 'interaction-simulation.json'), 'utf8'),
) as { rows: Row[] };

const NUMBERS = [60, 120, 250, 500];
const written = (value: number) => value.toFixed(2).replace(/^0/, '');

test('the method gives .80 to every simulated design', () => {
  expect(new Set(rows.map(({ n }) => n))).toEqual(new Set(NUMBERS));
  for (const { kind, n, f2 } of rows) {
    const inputs = { kind, adjusted_for: 0, predictor_values: 'sampled', effect: { f2 } };
    const { calculation } = bind('linear-interaction', inputs, { alpha: 0.05, power: 0.8, sides: 2 });
    expect(Math.abs(calculation.achieved(n, f2) - 0.8)).toBeLessThan(1e-9);
  }
});

test('the page states the range of the simulated powers, to two decimals', () => {
  const said = linearInteraction.assumptions.map(({ ifNot }) => ifNot).join('\n');
  for (const n of NUMBERS) {
    const powers = rows.filter((row) => row.n === n).map(({ simulated }) => simulated);
    const range = `${written(Math.min(...powers))} to ${written(Math.max(...powers))} with ${n}`;
    expect(said).toContain(range);
  }
});

test('the error shrinks with n and is that of an approximation, not of chance', () => {
  const farthest = NUMBERS.map((n) =>
    Math.max(...rows.filter((row) => row.n === n).map(({ simulated }) => Math.abs(simulated - 0.8))),
  );
  expect(farthest).toEqual([...farthest].sort((a, b) => b - a));
  const first = rows.filter(({ n }) => n === 60);
  for (const { simulated, error } of first) expect(Math.abs(simulated - 0.8)).toBeGreaterThan(4 * error);
});
