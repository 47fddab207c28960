/** The HTML file around the body of a document: one file, no script, nothing loaded from anywhere. Exports: renderPage. */

import { pageStyle } from '../generated/page-style.ts';
import { version } from '../generated/version.ts';
import type { DocumentKind } from '../spec/study.ts';
import { shownAsTyped } from './markdown/escape.ts';
import { renderWhole, type TemplateSet } from './templates.ts';

export interface Page {
  /** As typed; shown in the browser's title and at the foot. */
  title: string;
  kind: DocumentKind;
  /** From `toHtml`. */
  bodyHtml: string;
  overrides: TemplateSet;
}

const KINDS: Record<DocumentKind, string> = {
  ethics: 'Ethics application',
  grant: 'Grant application',
  preregistration: 'Preregistration',
  protocol: 'Study protocol',
  appendix: 'Appendix for reviewers',
};

/** Everything is forbidden but the one style sheet, known by its hash, and images inside the file. */
const POLICY = `default-src 'none'; style-src ${pageStyle.source}; img-src data:; base-uri 'none'; form-action 'none'`;

export function renderPage({ title, kind, bodyHtml, overrides }: Page): string {
  const view = {
    policy: POLICY,
    generator: `Samplecase ${version}`,
    title: escaped(shownAsTyped(title)),
    style: pageStyle.css,
    kind: KINDS[kind],
    body: bodyHtml,
  };
  return renderWhole('page/shell', view, overrides);
}

function escaped(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
