import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { check, solve } from '../../src/index.ts';
import { isMissing, type Language } from '../support/interpreters.ts';
import { codeBlocks, largestDifference, runPrintedLines } from '../support/printed-lines.ts';
import { EXAMPLES, exampleFiles, exampleNames, exampleSpec } from './example-files.ts';

/** Lines print ten significant digits, so half a unit of the tenth is the least that can be asked. */
const PRINTED_PRECISION = 1e-9;

describe.each(exampleNames())('the example %s', (name) => {
  const spec = exampleSpec(name);
  const files = exampleFiles(name);

  test('has no error and no warning that it leaves unanswered', () => {
    const { problems } = check(spec);
    expect(problems.filter(({ level }) => level !== 'note')).toEqual([]);
  });

  test('its committed documents are what it writes today', () => {
    const folder = join(EXAMPLES, name, 'documents');
    expect(readdirSync(folder).sort()).toEqual([...files.keys()].sort());
    for (const [file, content] of files) expect(readFileSync(join(folder, file), 'utf8'), file).toBe(content);
  });

  test('every document names the same analysed and enrolled numbers', () => {
    const { evaluable, enrol } = solve(spec).study.sample_size;
    for (const [file, content] of files) {
      if (!file.endsWith('.md')) continue;
      expect(content, file).toContain(`**${evaluable}**`);
      expect(content, file).toContain(`**${enrol}**`);
    }
  });

  test('no page holds a NaN, an undefined or an object', () => {
    for (const [file, content] of files) {
      expect(content, file).not.toMatch(/NaN|undefined|\[object|Infinity/);
    }
  });

  for (const language of ['r', 'python'] satisfies Language[]) {
    test(`every line of its appendix gives in ${language} the number printed beside it`, (context) => {
      if (isMissing(language)) context.skip();
      const blocks = codeBlocks(files.get('appendix.md') ?? '', language);
      expect(blocks.length).toBe(solve(spec).aims.length);
      for (const block of blocks) {
        const lines = runPrintedLines(block, language);
        expect(lines.length).toBeGreaterThan(8);
        const wrong = lines.filter((line) => !(largestDifference(line) <= PRINTED_PRECISION));
        expect(wrong).toEqual([]);
      }
    }, 600_000);
  }
});
