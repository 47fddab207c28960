/** Markdown → the body of a page. Exports: toHtml.
 *
 *  No HTML of the text's own, no script, no style attribute: alignment is a class. Headings get ids that depend on
 *  their words only (`section-losses`). Tables and code can be scrolled with the keyboard and have a name. An image
 *  whose source names a given figure becomes that figure, with its alternative text as caption; an image from
 *  elsewhere could not be part of a single file and leaves its alternative text. */

import { captionOf, createParser, type Env, type MarkdownIt, type Token } from './parser.ts';

/** @param figures SVG by the name under which the Markdown shows it, such as `ventilation-power.svg` */
export function toHtml(markdown: string, figures: ReadonlyMap<string, string>): string {
  const page: Page = { figures, ids: new Set(), tables: 0 };
  pageParser ??= createPageParser();
  return pageParser.render(markdown, { page });
}

interface Page {
  figures: ReadonlyMap<string, string>;
  /** Ids of headings given so far. */
  ids: Set<string>;
  /** Tables so far. */
  tables: number;
}

let pageParser: MarkdownIt | undefined;

function createPageParser(): MarkdownIt {
  const parser = createParser();
  const { escapeHtml } = parser.utils;
  parser.core.ruler.push('page', (state) => {
    for (const [index, token] of state.tokens.entries()) {
      if (token.type === 'heading_open')
        token.attrSet('id', headingId(state.tokens[index + 1], pageOf(state.env)));
      if (token.type === 'th_open' || token.type === 'td_open') alignByClass(token);
      if (token.type === 'inline') showFigure(state.tokens, index, pageOf(state.env));
    }
    headRows(state.tokens);
  });
  Object.assign(parser.renderer.rules, {
    table_open(tokens, index, options, env, renderer) {
      const page = pageOf(env);
      page.tables += 1;
      const caption = tokens[index] === undefined ? null : captionOf(tokens[index]);
      const id = `table-${page.tables}`;
      const name = caption === null ? 'aria-label="Table"' : `aria-labelledby="${id}"`;
      const title =
        caption === null
          ? ''
          : `<caption id="${id}">${renderer.renderInline(caption, options, env)}</caption>\n`;
      return `<div class="table" role="group" tabindex="0" ${name}>\n<table>\n${title}`;
    },
    table_close: () => '</table>\n</div>\n',
    image(tokens, index, options, env, renderer) {
      const token = tokens[index];
      const figure = pageOf(env).figures.get(String(token?.attrGet('src') ?? ''));
      return figure ?? renderer.renderInlineAsText(token?.children ?? [], options, env);
    },
    figure(tokens, index, options, env, renderer) {
      const image = tokens[index]?.children?.[0];
      const figure = pageOf(env).figures.get(String(image?.attrGet('src') ?? '')) ?? '';
      const caption = renderer.renderInline(image?.children ?? [], options, env);
      return `<figure>\n${figure}\n<figcaption>${caption}</figcaption>\n</figure>\n`;
    },
    // A percent sign stays on the line of its number.
    text: (tokens, index) => escapeHtml((tokens[index]?.content ?? '').replace(/(\d) (?=%)/g, '$1\u00a0')),
    fence(tokens, index) {
      const { content = '', info = '' } = tokens[index] ?? {};
      const language = /^[\w-]*/.exec(info)?.[0] ?? '';
      return codeBlock(escapeHtml(content), language);
    },
    code_block: (tokens, index) => codeBlock(escapeHtml(tokens[index]?.content ?? ''), ''),
  } satisfies MarkdownIt['renderer']['rules']);
  return parser;
}

function pageOf(env: Env | undefined): Page {
  return env?.page as Page;
}

const LANGUAGES: Readonly<Record<string, string>> = { r: 'R', python: 'Python' };

function codeBlock(escaped: string, language: string): string {
  const [name, attribute] =
    language === ''
      ? ['Formula', '']
      : [`Lines in ${LANGUAGES[language] ?? language}`, ` class="language-${language}"`];
  return `<pre tabindex="0" role="group" aria-label="${name}"><code${attribute}>${escaped}</code></pre>\n`;
}

function headingId(inline: Token | undefined, { ids }: Page): string {
  const words = (inline?.children ?? []).map(({ content }) => content).join('');
  const slug = words
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-|-$/g, '')
    .toLowerCase();
  const base = `section-${slug}`.replace(/-$/, '');
  let id = base;
  for (let count = 2; ids.has(id); count++) id = `${base}-${count}`;
  ids.add(id);
  return id;
}

/** `style="text-align:right"`, which the page's policy forbids, to `class="right"`. */
function alignByClass(token: Token): void {
  const alignment = /^text-align:(\w+)$/.exec(String(token.attrGet('style') ?? ''))?.[1];
  token.attrs = (token.attrs ?? []).filter(([name]) => name !== 'style');
  if (alignment !== undefined) token.attrJoin('class', alignment);
}

/** Names what heads what: cells of the head their column, the first cell of a row that row unless it is empty. */
function headRows(tokens: readonly Token[]): void {
  for (const [index, token] of tokens.entries()) {
    if (token.type === 'th_open') token.attrSet('scope', 'col');
    const isFirst = token.type === 'td_open' && tokens[index - 1]?.type === 'tr_open';
    if (!isFirst || tokens[index + 1]?.content === '') continue;
    token.tag = 'th';
    token.attrSet('scope', 'row');
    const close = tokens[index + 2];
    if (close?.type === 'td_close') close.tag = 'th';
  }
}

/** A paragraph that is a figure and nothing else makes room for it. */
function showFigure(tokens: Token[], index: number, { figures }: Page): void {
  const [open, inline, close] = tokens.slice(index - 1, index + 2);
  const [image, ...others] = inline?.children ?? [];
  const isFigure =
    open?.type === 'paragraph_open' &&
    image?.type === 'image' &&
    others.length === 0 &&
    figures.has(String(image.attrGet('src')));
  if (!isFigure || inline === undefined || close === undefined) return;
  open.hidden = true;
  close.hidden = true;
  inline.type = 'figure';
}
