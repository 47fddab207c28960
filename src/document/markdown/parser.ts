/** How our Markdown is read: CommonMark with tables, no HTML, no links but those written as such, and a line in bold
 *  before a table as its caption. */

import MarkdownIt, { type MarkdownIt as Parser, type Token } from 'markdown-it';

export type { Env, MarkdownIt, Token } from 'markdown-it';

export function createParser(): Parser {
  const parser = new MarkdownIt({ html: false, linkify: false, typographer: false });
  parser.core.ruler.push('captions', (state) => {
    state.tokens = withCaptions(state.tokens);
  });
  return parser;
}

/** The caption of a table, as tokens of its text; null where there is none. */
export function captionOf(table: Token): Token[] | null {
  return (table.meta?.caption as Token[] | undefined) ?? null;
}

/** Moves the paragraph before a table into the table if it is all in bold. */
function withCaptions(tokens: readonly Token[]): Token[] {
  const kept: Token[] = [];
  for (const token of tokens) {
    if (token.type === 'table_open') {
      const caption = boldText(kept.slice(-3));
      if (caption !== null) {
        kept.splice(-3);
        token.meta = { ...token.meta, caption };
      }
    }
    kept.push(token);
  }
  return kept;
}

function boldText(paragraph: readonly Token[]): Token[] | null {
  const [open, inline, close] = paragraph;
  if (open?.type !== 'paragraph_open' || inline?.type !== 'inline' || close?.type !== 'paragraph_close') {
    return null;
  }
  const children = (inline.children ?? []).filter(({ type, content }) => type !== 'text' || content !== '');
  const isBold =
    children[0]?.type === 'strong_open' &&
    children.findIndex(({ type }) => type === 'strong_close') === children.length - 1;
  return isBold ? children.slice(1, -1) : null;
}
