/** Templates → Markdown. Templates hold the prose and say which sentences may go; helpers lay out paragraphs and
 *  tables, count, and cite. No template computes or formats a number. */

import type Handlebars from 'handlebars';
import runtime from 'handlebars/runtime.js';
import { templates as builtIn } from '../generated/templates.ts';
import type { CitationLog } from './citations/citations.ts';
import { markdownTable, type Table } from './table.ts';

/** Precompiled templates by path below templates/, such as `parts/losses`. */
export type TemplateSet = Readonly<Record<string, object>>;

/** A sentence a page holds, as its template declares it. */
export interface Sentence {
  id: string;
  /** Place in the order in which sentences may be dropped, the lowest first; null when it must stay. */
  drop: number | null;
  /** Reporting items the sentence answers, such as C10. */
  reports: string[];
}

export interface Rendering {
  markdown: string;
  sentences: Sentence[];
}

export interface RenderRequest {
  /** Path of the document template: `documents/ethics`. */
  template: string;
  view: object;
  citations: CitationLog;
  /** Ids of sentences left out. */
  dropped: ReadonlySet<string>;
}

export type TemplateRenderer = (request: RenderRequest) => Rendering;

/** What one rendering gathers while its templates run. */
interface Progress extends Pick<RenderRequest, 'citations' | 'dropped'> {
  sentences: Sentence[];
  /** Droppable sentences printed so far. */
  said: Set<string>;
}

/** @param overrides a user's own templates, which replace ours path by path */
export function templateRenderer(overrides: TemplateSet): TemplateRenderer {
  const handlebars = (runtime as unknown as typeof Handlebars).create();
  for (const [path, compiled] of Object.entries({ ...builtIn, ...overrides })) {
    handlebars.registerPartial(path, handlebars.template(compiled as TemplateSpecification));
  }
  let progress: Progress;
  handlebars.registerHelper(helpers(() => progress));
  return ({ template, view, citations, dropped }) => {
    const render = handlebars.partials[template] as Handlebars.TemplateDelegate | undefined;
    if (render === undefined) throw new Error(`no template ${template}`);
    progress = { citations, dropped, sentences: [], said: new Set() };
    return { markdown: tidy(render(view)), sentences: progress.sentences };
  };
}

function helpers(now: () => Progress): Record<string, Handlebars.HelperDelegate> {
  return {
    sentence(this: unknown, id: string, options: Handlebars.HelperOptions) {
      const { drop, reports } = options.hash as { drop?: number; reports?: string };
      const { sentences, dropped, said } = now();
      sentences.push({ id, drop: drop ?? null, reports: reports?.split(' ') ?? [] });
      if (dropped.has(id)) return '';
      const text = oneLine(options.fn(this));
      // What has been said of one aim need not be said again of the next.
      if (drop !== undefined && said.has(text)) return '';
      said.add(text);
      return `${text} `;
    },
    paragraph(this: unknown, options: Handlebars.HelperOptions) {
      const text = oneLine(options.fn(this));
      return text === '' ? '' : `\n${text}\n\n`;
    },
    table: (table: Table) => `\n${markdownTable(table)}\n`,
    count: (number: number, singular: string, plural: string) =>
      `${inWords(number)} ${number === 1 ? singular : plural}`,
    cite: (keys: string | string[], form?: unknown) =>
      now().citations.cite(Array.isArray(keys) ? keys : [keys], citationForm(form)),
    citations: () => now().citations.list().length > 0,
    references: () =>
      now()
        .citations.list()
        .map((entry) => `${entry}\n`)
        .join('\n'),
  };
}

/** A template that is whole in itself, such as the shell of the page: it holds no sentences and cites nothing. */
export function renderWhole(path: string, view: object, overrides: TemplateSet): string {
  const compiled = overrides[path] ?? builtIn[path];
  if (compiled === undefined) throw new Error(`no template ${path}`);
  return (runtime as unknown as typeof Handlebars).create().template(compiled as TemplateSpecification)(view);
}

type TemplateSpecification = Parameters<typeof Handlebars.template>[0];

/** ` (Cohen, 1988)` after a phrase; `Cohen, 1988` inside a parenthesis of the template; `Cohen (1988)` in a sentence. */
function citationForm(form: unknown): 'parenthetical' | 'bare' | 'narrative' {
  return form === 'bare' || form === 'narrative' ? form : 'parenthetical';
}

/** Templates wrap where they like: white space inside a sentence is one space. No-break spaces stay. */
function oneLine(text: string): string {
  return text.replace(/[ \t\r\n]+/g, ' ').trim();
}

/** At most one blank line, one line feed at the end. */
function tidy(markdown: string): string {
  return `${markdown
    .replace(/[ \t]+$/gm, '')
    .replace(/\n{3,}/g, '\n\n')
    .trim()}\n`;
}

const WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

function inWords(number: number): string {
  return WORDS[number] ?? String(number);
}
