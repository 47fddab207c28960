import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { writePageStyle } from '../../src/build/write-assets.ts';
import { marginPlot } from '../../src/document/figures/margin-plot.ts';
import { powerCurve } from '../../src/document/figures/power-curve.ts';
import { escapeMarkdown } from '../../src/document/markdown/escape.ts';
import { toHtml } from '../../src/document/markdown/to-html.ts';
import { renderPage } from '../../src/document/page.ts';
import { version } from '../../src/generated/version.ts';
import { examinePage, isBrowserMissing, NOTHING_FOUND, openBrowser } from '../support/browser.ts';
import { breachesOf } from '../support/html-rules.ts';
import { parseStrictly } from '../support/html-tree.ts';

const root = join(import.meta.dirname, '..', '..');
const hostile = `<script>alert(1)</script> <b> & " ' | * _x_ {{x}} [a](javascript:x) \u202egnp.exe שלום \u0000`;

const figures = new Map([
  [
    'light-power.svg',
    powerCurve({
      prefix: 'light-curve',
      title: `Power of ${hostile}`,
      description: hostile,
      xLabel: 'keepers analysed',
      yLabel: 'power',
      points: [20, 60, 100, 140].map((n) => ({ n, value: 1 - 8 / n, low: 1 - 12 / n, high: 1 - 4 / n })),
      target: 0.9,
      planned: { n: 80, value: 0.9 },
      band: 'slope 0.2 to 0.4',
    }),
  ],
  [
    'light-margins.svg',
    marginPlot({
      prefix: 'light-margins',
      title: 'How far the assumptions can slip',
      description: 'For each assumption its planned value and its limits.',
      rows: [
        {
          label: 'slope',
          unit: 'points per hour',
          planned: 0.3,
          plannedText: '0.3 points per hour',
          limits: [{ floor: 'power .80', value: 0.26, text: '0.26 points per hour' }],
          low: 0.2,
          high: 0.4,
        },
      ],
    }),
  ],
]);

const typed = escapeMarkdown(hostile);
const wide = Array.from({ length: 24 }, (_, index) => `column ${index}`);
const markdown = `# Sample size

A paragraph about ${typed} with **80** keepers and <https://example.org/a_page>.

**Number of ${typed} to analyse**

| ${typed} | power .80 | power .90 |
| --- | ---: | :-: |
| **${typed}** | 60 | **80** |
|  | 70 | 90 |

**A table wider than the page**

| ${wide.join(' | ')} |
| ${wide.map(() => '---:').join(' | ')} |
| ${wide.map((_, index) => String(index)).join(' | ')} |

![Power of the aim “light” against the number analysed](light-power.svg)

![How far the assumptions can slip](light-margins.svg)

## Formula

    1 − β = P(F > F₁₋α), F noncentral with λ = f²·n and a line that goes on for longer than a page of paper is wide

### Lines in R

\`\`\`r
pf(qf(.05, 3, 226, lower.tail = FALSE), 3, 226, ncp = 235 * .064, lower.tail = FALSE) # a line that goes on for longer than a page
\`\`\`

- One
- Two

> A quotation.

## References

1. Cohen J. Statistical power analysis for the behavioral sciences. 2nd ed. 1988.

2. Green SB. How many subjects? *Multivariate Behavioral Research*. 1991.
`;

const page = (title = `Sample size: ${hostile}`) =>
  renderPage({ title, kind: 'appendix', bodyHtml: toHtml(markdown, figures), overrides: {} });

describe('the page', () => {
  test('is well formed and keeps to the rules of its elements', () => {
    expect(breachesOf(parseStrictly(page()))).toEqual([]);
  });

  test('allows its one style sheet by its hash, and nothing else', () => {
    const html = page();
    const style = /<style>([\s\S]*?)<\/style>/.exec(html)?.[1] ?? '';
    const hash = createHash('sha256').update(style).digest('base64');
    expect(html).toContain(
      `content="default-src 'none'; style-src 'sha256-${hash}'; img-src data:; base-uri 'none'; form-action 'none'"`,
    );
    expect(html.match(/<style/g)).toHaveLength(1);
    expect(html).not.toMatch(/<script|<link|<iframe|\sstyle=|\son\w+=/);
    expect(style).not.toMatch(/url\(|@import/);
  });

  test('shows the title as typed', () => {
    expect(page('Sample size: A < B & C')).toContain('<title>Sample size: A &lt; B &amp; C</title>');
    expect(page('two\nlines')).toContain('<title>two lines</title>');
  });

  test('says what made it, and of which kind it is', () => {
    expect(page()).toContain(`<meta name="generator" content="Samplecase ${version}">`);
    expect(page()).toContain('<p>Appendix for reviewers</p>');
  });

  test('holds the body as given', () => {
    const bodyHtml = '<h1>A</h1>\n<pre><code>x  \n\n\n\ny\n</code></pre>\n';
    expect(renderPage({ title: 'A', kind: 'grant', bodyHtml, overrides: {} })).toContain(
      `<main>\n${bodyHtml}</main>`,
    );
  });

  test('carries the style sheet of templates/page (else: npm run generate)', () => {
    expect(readFileSync(join(root, 'src', 'generated', 'page-style.ts'), 'utf8')).toBe(writePageStyle(root));
  });
});

describe.skipIf(isBrowserMissing())('the page in a browser', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  test('needs no repair, keeps to its policy, loads nothing, is accessible and fits the window', async () => {
    expect(await examinePage(browser, page())).toEqual(NOTHING_FOUND);
  });

  test('a page that breaks the rules is found out', async () => {
    const broken = page()
      .replace('<p>A paragraph', '<p style="color: red">A paragraph')
      .replace('<h2 id="section-formula">', '<h4 id="section-formula">')
      .replace('</h2>\n<pre', '</h4>\n<pre')
      .replace('<blockquote>', '<p><blockquote>')
      .replace('</blockquote>', '</blockquote></p>')
      .replace('<ul>', '<img src="https://example.org/a.png">\n<ul>');
    const found = await examinePage(browser, broken);
    expect(found.policy.join()).toContain('style-src');
    expect(found.policy.join()).toContain('img-src');
    expect(found.repairs).not.toEqual([]);
    expect(found.structure.join()).toContain('attribute style of <p>');
    expect(found.structure.join()).toContain('<h4> after level 1');
    expect(found.accessibility.join()).toContain('image-alt');
  });

  test('prints on A4 without cutting anything off', async () => {
    const context = await browser.newContext({ viewport: { width: 627, height: 900 } });
    const printed = await context.newPage();
    await printed.setContent(page().replace(/\| column[^\n]*/g, ''));
    await printed.emulateMedia({ media: 'print' });
    const figure = (await printed.evaluate(
      'document.querySelector("figure svg").getBoundingClientRect().width',
    )) as number;
    // 12 cm at 96 pixels an inch.
    expect(figure).toBeCloseTo((12 / 2.54) * 96, 0);
    const code = (await printed.evaluate(
      '[...document.querySelectorAll("pre")].map((pre) => pre.scrollWidth - pre.clientWidth)',
    )) as number[];
    expect(code).toEqual([0, 0]);
    await context.close();
  });
});
