/** Words of prose in a document. Exports: countWords.
 *
 *  Prose are paragraphs and lists. Headings, tables with their captions, code, formulas, figures and the list of
 *  references are not: limits on length leave them out, or a form has its own field for them. A word is what stands
 *  between two spaces, as word processors count: `α = .05` has three. */

import { createParser, type MarkdownIt, type Token } from './parser.ts';

let parser: MarkdownIt | undefined;

export function countWords(markdown: string): number {
  parser ??= createParser();
  let words = 0;
  let tables = 0;
  let isHeading = false;
  let isReferences = false;
  for (const { type, nesting, content, children } of parser.parse(markdown, {})) {
    if (type === 'table_open' || type === 'table_close') tables += nesting;
    if (type === 'heading_open' || type === 'heading_close') isHeading = nesting === 1;
    if (type !== 'inline') continue;
    if (isHeading) isReferences = content === 'References';
    else if (tables === 0 && !isReferences) words += wordsOf(textOf(children ?? []));
  }
  return words;
}

function textOf(children: readonly Token[]): string {
  return children
    .map(({ type, content }) => {
      if (type === 'text' || type === 'code_inline') return content;
      return type === 'softbreak' || type === 'hardbreak' ? ' ' : '';
    })
    .join('');
}

/** Numbers grouped by narrow no-break spaces (12 000) are one word. */
function wordsOf(text: string): number {
  return text.match(/[^\s]+(?:\u202f[^\s]+)*/g)?.length ?? 0;
}
