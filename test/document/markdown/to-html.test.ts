import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { escapeMarkdown, shownAsTyped } from '../../../src/document/markdown/escape.ts';
import { toHtml } from '../../../src/document/markdown/to-html.ts';

const SVG = '<svg role="img"><title>Power</title></svg>';
const html = (markdown: string, figures: [string, string][] = []) => toHtml(markdown, new Map(figures));

describe('toHtml', () => {
  test('gives headings ids that depend on their words', () => {
    expect(html('# Sample size\n\n## Losses & more\n\n### Café “light”\n')).toBe(
      '<h1 id="section-sample-size">Sample size</h1>\n' +
        '<h2 id="section-losses-more">Losses &amp; more</h2>\n' +
        '<h3 id="section-cafe-light">Café “light”</h3>\n',
    );
  });

  test('tells headings of the same words apart', () => {
    const ids = [...html('## A\n\n## A\n\n## “”\n\n## !\n\n## A 2\n').matchAll(/id="([^"]*)"/g)].map(
      (match) => match[1],
    );
    expect(ids).toEqual(['section-a', 'section-a-2', 'section', 'section-2', 'section-a-2-2']);
  });

  test('makes the bold line before a table its caption and name', () => {
    expect(html('**Number of *people***\n\n| effect | power |\n| --- | ---: |\n| **.06** | 235 |\n')).toBe(
      [
        '<div class="table" role="group" tabindex="0" aria-labelledby="table-1">',
        '<table>',
        '<caption id="table-1">Number of <em>people</em></caption>',
        '<thead>',
        '<tr>',
        '<th scope="col">effect</th>',
        '<th class="right" scope="col">power</th>',
        '</tr>',
        '</thead>',
        '<tbody>',
        '<tr>',
        '<th scope="row"><strong>.06</strong></th>',
        '<td class="right">235</td>',
        '</tr>',
        '</tbody>',
        '</table>',
        '</div>',
        '',
      ].join('\n'),
    );
  });

  test('names a table without caption, and heads no row with an empty cell', () => {
    const page = html('**Bold** and more.\n\n| a | b |\n| :-: | --- |\n|  | 1 |\n');
    expect(page).toContain('<p><strong>Bold</strong> and more.</p>');
    expect(page).toContain(
      '<div class="table" role="group" tabindex="0" aria-label="Table">\n<table>\n<thead>',
    );
    expect(page).toContain('<td class="center"></td>\n<td>1</td>');
  });

  test('two bold phrases are no caption', () => {
    expect(html('**One** **two**\n\n| a |\n| --- |\n')).toContain(
      '<p><strong>One</strong> <strong>two</strong></p>',
    );
  });

  test('puts a figure in the place of its image', () => {
    expect(html('![Power of “a” *here*](a.svg)\n', [['a.svg', SVG]])).toBe(
      `<figure>\n${SVG}\n<figcaption>Power of “a” <em>here</em></figcaption>\n</figure>\n`,
    );
    expect(html('See ![this](a.svg) here.\n', [['a.svg', SVG]])).toBe(`<p>See ${SVG} here.</p>\n`);
  });

  test('leaves the words of an image that it was not given', () => {
    expect(html('![A photo](https://example.org/photo.png)\n')).toBe('<p>A photo</p>\n');
  });

  test('shows code that the keyboard can scroll', () => {
    expect(html('```r\nx <- 1\n```\n')).toBe(
      '<pre tabindex="0" role="group" aria-label="Lines in R"><code class="language-r">x &lt;- 1\n</code></pre>\n',
    );
    expect(html('```python\n1\n```\n')).toContain(
      'aria-label="Lines in Python"><code class="language-python">',
    );
    expect(html('    λ = f²·n\n')).toBe(
      '<pre tabindex="0" role="group" aria-label="Formula"><code>λ = f²·n\n</code></pre>\n',
    );
    expect(html('```r" onload="x\n```\n')).toContain('<code class="language-r">');
  });

  test('lets no HTML, no scripted address and no bare address through', () => {
    const page = html(
      '<b onclick="x">b</b> [a](javascript:x) <https://example.org/?a=1&b> https://example.org\n',
    );
    expect(page).toBe(
      '<p>&lt;b onclick=&quot;x&quot;&gt;b&lt;/b&gt; [a](javascript:x) <a href="https://example.org/?a=1&amp;b">https://example.org/?a=1&amp;b</a> https://example.org</p>\n',
    );
  });

  test('prints any text of a user as typed, in a paragraph, a heading, a caption, a cell and a list', () => {
    const text = fc.array(
      fc.oneof(
        fc.constantFrom(...'\\`*_{}[]()#+-.!|~<>&;:=$"\' \n1a'),
        fc.string({ unit: 'binary', maxLength: 2 }),
      ),
      { maxLength: 20 },
    );
    fc.assert(
      fc.property(text, (parts) => {
        const typed = parts.join('');
        const escaped = escapeMarkdown(typed);
        fc.pre(escaped !== '');
        const page = html(
          `${escaped}\n\n## Of ${escaped} x\n\n**By ${escaped} x**\n\n| h |\n| --- |\n| ${escaped} |\n\n- ${escaped}\n`,
        );
        const shown = page
          .replace(/<[^>]*>/g, '\n')
          .replace(
            /&(amp|lt|gt|quot);/g,
            (_, name: string) => ({ amp: '&', lt: '<', gt: '>', quot: '"' })[name] ?? '',
          )
          .replaceAll('\u00a0%', ' %')
          .split('\n')
          .filter((line) => line.trim() !== '');
        const plain = shownAsTyped(typed).replaceAll('\u00a0%', ' %');
        expect(shown).toEqual([plain, `Of ${plain} x`, `By ${plain} x`, 'h', plain, plain]);
        expect(page).not.toMatch(/ style=/);
      }),
      { numRuns: 500 },
    );
  });

  test('keeps a percent sign on the line of its number', () => {
    expect(html('Of them 12 % decline, 5 % each, and % of none.')).toBe(
      '<p>Of them 12\u00a0% decline, 5\u00a0% each, and % of none.</p>\n',
    );
  });

  test('has no memory of the page before', () => {
    const markdown = '# A\n\n**c**\n\n| a |\n| --- |\n| 1 |\n';
    expect(html(markdown)).toBe(html(markdown));
  });
});
