/** Report + requests → documents in every format asked for: view → Markdown, shortened if need be → HTML. */

import type { FullReport } from '../report.ts';
import { sources } from '../sources/sources.ts';
import type { DocumentFormat, DocumentKind, DocumentRequest, Reference } from '../spec/study.ts';
import { CitationLog } from './citations/citations.ts';
import { toHtml } from './markdown/to-html.ts';
import { countWords } from './markdown/words.ts';
import { renderPage } from './page.ts';
import { type Rendering, type TemplateRenderer, type TemplateSet, templateRenderer } from './templates.ts';
import { type Figure, figuresOf } from './view/aim-figures.ts';
import { buildView, kindWords, type StudyView } from './view/view.ts';

export interface RenderedFile {
  /** Path below the output folder. */
  name: string;
  content: string;
}

export interface RenderedDocument {
  kind: DocumentKind;
  format: DocumentFormat;
  /** The document itself. */
  content: string;
  /** The document and the figures it shows, as files. */
  files: RenderedFile[];
  /** Words of prose. */
  words: number;
  /** Sentences for the person who ran it, such as that a limit of words cannot be met. */
  remarks: string[];
}

/** The documents asked for. What they share is made once: the view, the figures, the references. */
export function renderDocuments(
  report: FullReport,
  requests: readonly DocumentRequest[],
  overrides: TemplateSet,
): RenderedDocument[] {
  const shared: Shared = {
    title: report.study.title,
    view: buildView(report),
    figures: report.sensitivities.flatMap((sensitivity) => figuresOf(sensitivity, report.study)),
    references: new Map([...sources, ...report.study.references].map((item) => [item.id, item])),
    overrides,
    render: templateRenderer(overrides),
  };
  return requests.flatMap((request) => renderDocument(shared, request));
}

interface Shared {
  title: string;
  view: StudyView;
  figures: Figure[];
  references: ReadonlyMap<string, Reference>;
  overrides: TemplateSet;
  render: TemplateRenderer;
}

function renderDocument(shared: Shared, request: DocumentRequest): RenderedDocument[] {
  const { kind } = request;
  const view = { ...shared.view, ...kindWords(kind) };
  const attempt = (dropped: ReadonlySet<string>) =>
    shared.render({
      template: `documents/${kind}`,
      view,
      citations: new CitationLog(request.citations, shared.references),
      dropped,
    });
  const { markdown, words, remarks } = fitted(attempt, request);
  const figures = shared.figures.filter(({ name }) => markdown.includes(`](${name})`));
  return request.formats.map((format) => {
    const content =
      format === 'markdown'
        ? markdown
        : renderPage({
            title: `${view.title}: ${shared.title}`,
            kind,
            overrides: shared.overrides,
            bodyHtml: toHtml(markdown, new Map(figures.map(({ name, svg }) => [name, svg]))),
          });
    const name = `${kind}.${format === 'markdown' ? 'md' : 'html'}`;
    const shown =
      format === 'markdown' ? figures.map(({ name: file, svg }) => ({ name: file, content: svg })) : [];
    return { kind, format, content, files: [{ name, content }, ...shown], words, remarks };
  });
}

/** Leave out optional sentences, lowest in the declared order first, until the limit of words is met. */
function fitted(
  attempt: (dropped: ReadonlySet<string>) => Rendering,
  { kind, words: limit }: DocumentRequest,
): { markdown: string; words: number; remarks: string[] } {
  const whole = attempt(new Set());
  let rendering = whole;
  let words = countWords(rendering.markdown);
  if (limit === null) return { markdown: rendering.markdown, words, remarks: [] };
  const order = [...new Map(whole.sentences.map((one) => [one.id, one.drop]))]
    .filter((entry): entry is [string, number] => entry[1] !== null)
    .sort((a, b) => a[1] - b[1]);
  const dropped = new Set<string>();
  for (const [id] of order) {
    if (words <= limit) break;
    dropped.add(id);
    rendering = attempt(dropped);
    words = countWords(rendering.markdown);
  }
  const outcome =
    words <= limit
      ? `${words} words of at most ${limit}`
      : `${words} words although at most ${limit} were asked for: what is left may not be dropped`;
  const left = dropped.size === 0 ? '' : ` (left out: ${[...dropped].join(', ')})`;
  return { markdown: rendering.markdown, words, remarks: [`${kind}: ${outcome}${left}`] };
}
