import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { load } from 'js-yaml';
import MarkdownIt from 'markdown-it';
import { describe, expect, test } from 'vitest';
import { check, renderAll } from '../../src/index.ts';
import { breachesOf } from '../support/html-rules.ts';
import { type HtmlElement, parseStrictly, textOf } from '../support/html-tree.ts';

const examples = join(import.meta.dirname, '..', '..', 'examples');
const HOSTILE = '<script>x</script> | *a* _b_ {{c}} `d` [e](f) ![g](h) & &amp; # $z$ ~~i~~ https://a_b*';
/** How HTML writes it as text. */
const AS_HTML = HOSTILE.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');

/** Keys whose values are looked up or enumerated, not written by the author. */
const FIXED = new Set(
  'id method find role basis kind risk data_collection counts predictor_values type cite citations formats DOI URL primary_aims aim rule'.split(
    ' ',
  ),
);

function hostile(value: unknown, key = ''): unknown {
  if (typeof value === 'string') return FIXED.has(key) ? value : HOSTILE;
  if (Array.isArray(value)) return value.map((item) => hostile(item, key));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([name, item]) => [name, hostile(item, name)]));
}

/** Figures break and shorten their labels; that they escape them, their own tests say. */
function withoutFigures(element: HtmlElement): HtmlElement {
  const children = element.children
    .filter((child) => typeof child === 'string' || child.name !== 'svg')
    .map((child) => (typeof child === 'string' ? child : withoutFigures(child)));
  return { ...element, children };
}

const KINDS = ['ethics', 'grant', 'preregistration', 'protocol', 'appendix'];

describe.each(readdirSync(examples))('%s with markup in every text', (name) => {
  const spec = hostile(load(readFileSync(join(examples, name, 'spec.yaml'), 'utf8'))) as object;
  const documents = KINDS.map((kind) => ({ kind, formats: ['html', 'markdown'] }));
  const { report } = check({ ...spec, documents });
  const rendered = report === null ? [] : renderAll(report);
  const of = (kind: string, format: string) =>
    rendered.find((one) => one.kind === kind && one.format === format)?.content ?? '';

  test.each(KINDS)('prints it as typed in the %s page', (kind) => {
    const page = parseStrictly(of(kind, 'html'));
    expect(breachesOf(page)).toEqual([]);
    const left = textOf(withoutFigures(page)).replaceAll('\u00a0', ' ').split(AS_HTML).join('');
    expect(
      left.match(/.{0,40}(?:script&gt;|\*a|_b_|\{\{c|`d`|\[e\]|\]\(|\$z|~~i|a_b).{0,40}/g) ?? [],
    ).toEqual([]);
  });

  test.each(KINDS)('prints it as typed where another program renders the Markdown of the %s', (kind) => {
    const html = new MarkdownIt({ html: true, linkify: true }).render(of(kind, 'markdown'));
    expect(html.match(/<(?:script|s)\b[^>]*>|(?:href|src)="[fh]"/g) ?? []).toEqual([]);
  });
});
