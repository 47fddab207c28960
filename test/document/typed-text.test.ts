import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { load } from 'js-yaml';
import MarkdownIt from 'markdown-it';
import { describe, expect, test } from 'vitest';
import { render } from '../../src/index.ts';
import { breachesOf } from '../support/html-rules.ts';
import { parseStrictly, textOf } from '../support/html-tree.ts';

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

describe.each(readdirSync(examples))('%s with markup in every text', (name) => {
  const spec = hostile(load(readFileSync(join(examples, name, 'spec.yaml'), 'utf8'))) as object;

  test.each(['ethics', 'grant', 'preregistration', 'protocol', 'appendix'] as const)(
    'prints it as typed in the %s page',
    (kind) => {
      const page = parseStrictly(render(spec, kind, 'html'));
      expect(breachesOf(page)).toEqual([]);
      const left = textOf(page).replaceAll('\u00a0', ' ').split(AS_HTML).join('');
      expect(left.match(/.{0,40}(?:script&gt;|\*a|_b_|\{\{c|`d`|\[e\]|\]\(|\$z|~~i|a_b).{0,40}/g) ?? []).toEqual([]);
    },
  );

  test('prints it as typed in Markdown that another program renders', () => {
    const html = new MarkdownIt({ html: true, linkify: true }).render(render(spec, 'protocol', 'markdown'));
    expect(html.match(/<(?:script|s|img)\b[^>]*>|href="f"/g)).toBeNull();
  });
});
