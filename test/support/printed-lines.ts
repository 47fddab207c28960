/** Runs the recompute lines that a page prints, with R and with Python, and compares what each gives with what is
 *  printed beside it. */

import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { interpreter, type Language } from './interpreters.ts';

export interface ComparedLine {
  line: string;
  values: number[];
  printed: number[];
}

/** Code blocks of a language in a Markdown page. */
export function codeBlocks(markdown: string, language: Language): string[] {
  return [...markdown.matchAll(new RegExp(`^\`\`\`${language}\\n([\\s\\S]*?)^\`\`\`$`, 'gm'))].map(
    (match) => match[1] ?? '',
  );
}

export function runPrintedLines(block: string, language: Language): ComparedLine[] {
  const folder = mkdtempSync(join(tmpdir(), 'printed-lines-'));
  try {
    const file = join(folder, 'block');
    writeFileSync(file, block);
    const runner = join(import.meta.dirname, language === 'r' ? 'printed-lines.R' : 'printed-lines.py');
    const { status, stdout, stderr } = spawnSync(interpreter(language), [runner, file], { encoding: 'utf8' });
    if (status !== 0) throw new Error(`${language} stopped: ${stderr}`);
    return stdout
      .split('\n')
      .filter((line) => line !== '')
      .map((line) => {
        const [text = '', values = '', printed = ''] = line.split('\t');
        const numbers = (list: string) => list.trim().split(/\s+/).map(Number);
        return { line: text, values: numbers(values), printed: numbers(printed) };
      });
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Largest relative difference between what a line gives and what it prints; infinite when the counts differ. */
export function largestDifference({ values, printed }: ComparedLine): number {
  if (values.length !== printed.length) return Number.POSITIVE_INFINITY;
  return Math.max(
    ...printed.map((expected, index) => {
      const value = values[index] ?? Number.NaN;
      const difference = Math.abs(value - expected) / Math.max(Math.abs(expected), 1e-300);
      return Number.isNaN(difference) ? Number.POSITIVE_INFINITY : difference;
    }),
  );
}
