import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, test } from 'vitest';

interface Region {
  largest_error: number;
  rows: string[][];
}

interface Fixture {
  with: string;
  columns: string[];
  regions: Record<string, Region>;
}

function readFixture(name: string): Fixture {
  return JSON.parse(
    readFileSync(resolve(import.meta.dirname, `../fixtures/${name}.json`), 'utf8'),
  ) as Fixture;
}

/** What to compute from a row's leading columns, one function per remaining column of the table. */
export type Computed = (...inputs: number[]) => number;

/** Compares functions with a table of test/fixtures, region by region, each within its declared relative error;
 *  an empty cell says that the function must refuse. Failing rows print themselves. */
export function describeFixture(name: string, ...computed: Computed[]): void {
  const { regions, columns, with: maker } = readFixture(name);
  const inputs = columns.length - computed.length;
  describe(`${name} against ${maker}`, () => {
    for (const [region, { largest_error: largestError, rows }] of Object.entries(regions)) {
      test(`${region}: ${rows.length} rows are within ${largestError}`, () => {
        expect(rows.length).toBeGreaterThan(0);
        const failures = rows.flatMap((row) =>
          computed.flatMap((compute, index) => failure(row, inputs, columns, index, compute, largestError)),
        );
        expect(failures).toEqual([]);
      });
    }
  });
}

function failure(
  row: string[],
  inputs: number,
  columns: string[],
  index: number,
  compute: Computed,
  largestError: number,
): string[] {
  const call = `${columns[inputs + index]}(${row.slice(0, inputs).join(', ')})`;
  const truth = row[inputs + index] ?? '';
  const values = row.slice(0, inputs).map(Number);
  if (truth === '') {
    try {
      return [`${call} is ${compute(...values)} but should be refused`];
    } catch (error) {
      return error instanceof RangeError ? [] : [`${call} threw ${error}`];
    }
  }
  const value = compute(...values);
  const error = relativeError(value, Number(truth));
  return error <= largestError ? [] : [`${call} is ${value}, truth ${truth}, relative error ${error}`];
}

/** |value - truth| / |truth|, and 0 where both are the same, 0 or infinite included. */
export function relativeError(value: number, truth: number): number {
  if (Object.is(value, truth)) return 0;
  return Math.abs(value - truth) / Math.abs(truth);
}

/** Fails unless the relative error is at most `largest`. */
export function expectWithin(value: number, truth: number, largest: number): void {
  const error = relativeError(value, truth);
  expect(error <= largest, `${value} against ${truth}: relative error ${error}, allowed ${largest}`).toBe(
    true,
  );
}

/** The whole text of what a call throws, with its kind. */
export function refusal(call: () => unknown): string {
  try {
    return `no refusal: ${call()}`;
  } catch (error) {
    return String(error);
  }
}
