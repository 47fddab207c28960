import fc from 'fast-check';
import MarkdownIt from 'markdown-it';
import { describe, expect, test } from 'vitest';
import { escapeMarkdown, shownAsTyped } from '../../../src/document/markdown/escape.ts';

/** The strictest reader of CommonMark, and the one that sees most markup: HTML, tables, strikethrough, bare links. */
const renderers = [new MarkdownIt('commonmark'), new MarkdownIt({ html: true, linkify: true })] as const;

/** What is left for a reader: the text of the page. */
function seen(html: string): string {
  const entities: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"' };
  return html
    .replace(/<[^>]*>/g, '')
    .replace(/&(amp|lt|gt|quot);/g, (_, name: string) => entities[name] ?? '')
    .trim();
}

/** Tags of the text's own, apart from those of its place. Links are allowed: an address prints as typed. */
function markup(html: string): string[] {
  return (html.match(/<[^>]*>/g) ?? []).filter((tag) => !/^<\/?(p|table|thead|tbody|tr|th|td|a)\b/.test(tag));
}

const places: Record<string, (text: string) => string> = {
  'a paragraph': (text) => text,
  'the middle of a sentence': (text) => `Before ${text} after.`,
  'the start of a sentence': (text) => `${text}. And more.`,
  quotes: (text) => `The aim “${text}” is (${text}).`,
};

const HOSTILE = [
  '<script>alert(1)</script>',
  '<!-- comment -->',
  '<b>bold</b> & <i',
  '<https://example.org>',
  '<a@example.org>',
  'a < b and c > d, p <.05, x<y',
  'a | b || c |',
  '\\| and \\\\| and \\',
  '*x* **y** ***z***',
  '_x_ __y__ partial_r2 _a_b_ snake_case_',
  '`code` ``more`` ```',
  '{{x}} {{{y}}} {{> z}} {{#if a}}',
  '[x](y) ![x](y) [x][y] [x]: /url "title" [^1] ![',
  '[^1]: a note',
  '[x]: javascript:alert(1)',
  '# heading',
  '###### heading',
  '- item',
  '+ item',
  '-',
  '---',
  '- - -',
  '===',
  '1. item',
  '1) item',
  '12',
  '123456789',
  '> quotation',
  '&amp; &lt; &#35; &#x22; &copy; &nosuch; & &;',
  '~~gone~~ ~sub~ ~~~',
  '$x$ and $$y$$, $5 and $6',
  'http://example.org/a_b*c and www.example.org/~me?a=1&amp;b=2',
  'https://example.org/plain_page',
  'ftp://x_/_y_',
  'me@example.org',
  'line one\nline two\r\n\r\n    line three\ttab',
  '    indented',
  '\u00a0no-break\u00a0space\u00a0',
  '!',
  '![',
  '|---|---|',
  ':---:',
  'trailing backslash\\',
  'two spaces  \nand a break',
];

describe('escapeMarkdown', () => {
  test.each(HOSTILE)('prints %j as typed', (text) => {
    for (const renderer of renderers) {
      for (const place of Object.values(places)) {
        const html = renderer.render(place(escapeMarkdown(text)));
        expect(seen(html)).toBe(place(shownAsTyped(text)).trim());
        expect(markup(html)).toEqual([]);
      }
    }
  });

  const units = fc.oneof(
    fc.constantFrom(...'\\`*_{}[]()#+-.!|~<>&;:=$^"\'@/%1aA \n\t'),
    fc.constantFrom(
      '&amp;',
      '&#35;',
      '<b>',
      '```',
      '~~',
      '1.',
      '- ',
      '](',
      '![',
      'http://',
      'www.',
      '__',
      '\\|',
    ),
    fc.string({ unit: 'binary', maxLength: 2 }),
  );
  const text = fc.array(units, { maxLength: 24 }).map((parts) => parts.join(''));

  for (const [name, place] of Object.entries(places)) {
    test(`prints any text as typed in ${name}`, () => {
      fc.assert(
        fc.property(text, (typed) => {
          for (const renderer of renderers) {
            const html = renderer.render(place(escapeMarkdown(typed)));
            expect(seen(html)).toBe(place(shownAsTyped(typed)).trim());
            expect(markup(html)).toEqual([]);
          }
        }),
        { numRuns: 500 },
      );
    });
  }

  test('prints any text as typed in cells of a table', () => {
    fc.assert(
      fc.property(text, text, (first, second) => {
        const [a, b] = [escapeMarkdown(first), escapeMarkdown(second)];
        const html = renderers[1].render(`| head | head |\n| --- | --- |\n| ${a} | ${b} |\n`);
        const cells = [...html.matchAll(/<td>(.*)<\/td>/g)].map((match) => seen(match[1] ?? ''));
        expect(cells).toEqual([shownAsTyped(first), shownAsTyped(second)]);
        expect(markup(html)).toEqual([]);
      }),
      { numRuns: 500 },
    );
  });

  test('prints any text as typed in items of a list', () => {
    fc.assert(
      fc.property(text, (typed) => {
        const html = renderers[0].render(`- ${escapeMarkdown(typed)}`);
        expect(seen(html)).toBe(shownAsTyped(typed));
      }),
    );
  });

  test.each([
    'Staff of mountain lodges (adults), surveyed once – in winter.',
    'A 5-point change; r2_full and partial_r2 at p < .05, n > 30: about 12 % (low–high).',
    'Mean of 1.5 L, e.g. FEV₁/FVC; “quoted” and O’Brien & Sons #3 + #4 = 7!',
    'See https://example.org/a-page?x=1.',
    '-5 to 5 °C',
    '1.5 litres',
  ])('leaves prose as it is: %s', (prose) => {
    expect(escapeMarkdown(prose)).toBe(prose);
  });

  test('folds lines, and nothing is left of white space alone', () => {
    expect(escapeMarkdown('one\r\n\r\n two\u2028three ')).toBe('one two three');
    expect(escapeMarkdown(' \n\t ')).toBe('');
  });
});

describe('shownAsTyped', () => {
  test('shows control characters', () => {
    expect(shownAsTyped('a\u0000b\u001bc\u007fd\u0085e\u009ff')).toBe('a␀b␛c␡d e\ufffdf');
  });

  test('replaces halves of characters, which no file can hold', () => {
    expect(shownAsTyped('a\ud800b')).toBe('a\ufffdb');
    expect(shownAsTyped('a😀b')).toBe('a😀b');
  });

  test('isolates text from right to left', () => {
    expect(shownAsTyped('جراحة القلب')).toBe('\u2068جراحة القلب\u2069');
    expect(shownAsTyped('שלום')).toBe('\u2068שלום\u2069');
    expect(shownAsTyped('plain')).toBe('plain');
  });

  test('keeps a text from leaving its isolate, or leaving one open', () => {
    expect(shownAsTyped('a\u202eb')).toBe('\u2068a\u202eb\u2069');
    expect(shownAsTyped('a\u2069\u202eb')).toBe('\u2068a\ufffd\u202eb\u2069');
    expect(shownAsTyped('a\u2067b')).toBe('\u2068a\u2067b\u2069\u2069');
    expect(shownAsTyped('a\u2067b\u2069c')).toBe('\u2068a\u2067b\u2069c\u2069');
  });

  test('changes nothing when applied to what it returns, apart from isolating once more', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (text) => {
        const shown = shownAsTyped(text);
        fc.pre(!shown.startsWith('\u2068'));
        expect(shownAsTyped(shown)).toBe(shown);
      }),
    );
  });
});
