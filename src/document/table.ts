/** A table as data, and the one way in which it is laid out in Markdown. Cells are Markdown already. */

export interface Table {
  caption: string;
  columns: { head: string; align: 'left' | 'right' }[];
  rows: string[][];
}

export function markdownTable({ caption, columns, rows }: Table): string {
  const line = (cells: readonly string[]) => `| ${cells.join(' | ')} |`;
  return [
    `**${caption}**`,
    '',
    line(columns.map(({ head }) => head)),
    line(columns.map(({ align }) => (align === 'right' ? '---:' : '---'))),
    ...rows.map(line),
  ].join('\n');
}
