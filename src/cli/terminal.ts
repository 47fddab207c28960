/** What people see on a terminal: colours where they are welcome, and tables. */

import type { Problem } from '../index.ts';

const CODES = { bold: 1, red: 31, yellow: 33, cyan: 36 } as const;

export type Paint = (style: keyof typeof CODES, text: string) => string;

/** NO_COLOR (no-color.org) and streams that are no terminal get plain text. */
export function painter(stream: { isTTY?: boolean }): Paint {
  const plain = stream.isTTY !== true || (process.env.NO_COLOR ?? '') !== '' || process.env.TERM === 'dumb';
  return (style, text) => (plain ? text : `\u001b[${CODES[style]}m${text}\u001b[0m`);
}

const LEVEL_STYLE = { error: 'red', warning: 'yellow', note: 'cyan' } as const;

/** One problem: where, what, and what to do. */
export function problemText(problem: Problem, paint: Paint): string {
  const { file, position, path, level, code, message } = problem;
  const place =
    position === undefined ? (file ?? '') : `${file ?? 'spec'}:${position.line}:${position.column}`;
  const answer = problem.acknowledged === undefined ? '' : `\n    answered: ${visible(problem.acknowledged)}`;
  const head = [place, paint(LEVEL_STYLE[level], level), code, path].filter((part) => part !== '').join('  ');
  return `${head}\n    ${visible(message)}${answer}`;
}

/** Text of a user, safe to show: a control character could move the cursor or recolour what follows. */
export function visible(text: string): string {
  return text.replace(/\p{Cc}/gu, (character) =>
    character === '\n' || character === '\t'
      ? ' '
      : `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
}

/** Columns padded to the widest cell; numbers to the right. */
export function terminalTable(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const widths = head.map((cell, column) =>
    Math.max(width(cell), ...rows.map((row) => width(row[column] ?? ''))),
  );
  const isNumeric = head.map((_, column) => rows.every((row) => /^([−<>.\d].*|)$/.test(row[column] ?? '')));
  const line = (cells: readonly string[]) =>
    cells
      .map((cell, column) => {
        const space = ' '.repeat(Math.max(0, (widths[column] ?? 0) - width(cell)));
        return isNumeric[column] ? space + cell : cell + space;
      })
      .join('  ')
      .trimEnd();
  const rule = widths.map((size) => '─'.repeat(size)).join('  ');
  return [line(head), rule, ...rows.map(line)].join('\n');
}

/** Code points; good enough for the Latin and Greek of our tables. */
function width(text: string): number {
  return [...text.normalize('NFC')].length;
}

/** Lines of at most `columns` characters. */
export function wrap(text: string, columns = 88, indent = ''): string {
  const lines: string[] = [];
  let line = indent;
  for (const word of text.split(/\s+/)) {
    if (line.length + word.length + 1 > columns && line.trim() !== '') {
      lines.push(line);
      line = indent;
    }
    line += (line === indent ? '' : ' ') + word;
  }
  return [...lines, line].join('\n');
}
