import { describe, expect, test } from 'vitest';
import { countWords } from '../../../src/document/markdown/words.ts';

describe('countWords', () => {
  test.each([
    ['', 0],
    ['One two\nthree.\n', 3],
    ['A **bold** and *slanted* phrase, `code` too.', 7],
    ['At α = .05 the power is .900.', 8],
    ['We need 12\u202f000 people.', 4],
    ['Twelve – or 12 % – of them.', 8],
    ['Escaped \\*stars\\* and &amp; signs', 5],
    ['- one\n- two three\n', 3],
    ['1. one\n2. two three\n', 3],
    ['> quoted words', 2],
    ['See <https://example.org>.', 2],
  ])('%j has %i', (markdown, count) => {
    expect(countWords(markdown)).toBe(count);
  });

  test('leaves out what is no prose', () => {
    const prose = 'Two words.\n';
    const others = [
      '# A heading of many words\n',
      '**A caption in words**\n\n| head of table | b |\n| --- | --- |\n| cell of table | 1 |\n',
      '```r\nx <- mean(y) # of y\n```\n',
      '    a = b + c\n',
      '![A figure of some kind](a.svg)\n',
      '## References\n\nCohen, J. (1988). *A book*.\n\nGreen, S. (1991). *Another*.\n',
    ];
    for (const other of others) expect(countWords(`${prose}\n${other}`)).toBe(2);
    expect(countWords([prose, ...others].join('\n'))).toBe(2);
  });

  test('counts what follows the references under another heading', () => {
    expect(countWords('## References\n\nCohen, J. (1988).\n\n## Review\n\nThree more words.\n')).toBe(3);
  });

  test('counts a bold sentence that is no caption', () => {
    expect(countWords('**At most 20 can be had.**\n\nMore.\n')).toBe(7);
  });
});
