import { describe, expect, test } from 'vitest';
import { apaEntry, apaLabel } from '../../../src/document/citations/apa.ts';
import { plain } from '../../../src/document/citations/markup.ts';
import { source } from '../../../src/sources/sources.ts';
import type { Reference } from '../../../src/spec/study.ts';

const reference = (fields: Omit<Reference, 'id'>): Reference => ({ id: 'invented', ...fields });
const in2019 = { issued: { 'date-parts': [[2019]] } };
const people = (count: number) =>
  Array.from({ length: count }, (_, index) => ({ family: `Author${index + 1}`, given: 'Anna B.' }));

describe('an entry of the list in APA style', () => {
  // Example of the publisher of the style (from memory).
  test('an article with a DOI', () => {
    const item = reference({
      type: 'article-journal',
      author: [
        { family: 'Grady', given: 'J. S.' },
        { family: 'Her', given: 'M.' },
        { family: 'Moreno', given: 'G.' },
        { family: 'Perez', given: 'C.' },
        { family: 'Yelinek', given: 'J.' },
      ],
      ...in2019,
      title:
        'Emotions in storybooks: A comparison of storybooks that represent ethnic and racial groups in the United States',
      'container-title': 'Psychology of Popular Media Culture',
      volume: '8',
      issue: '3',
      page: '207-217',
      DOI: '10.1037/ppm0000185',
    });
    expect(apaEntry(item)).toBe(
      'Grady, J. S., Her, M., Moreno, G., Perez, C., & Yelinek, J. (2019). Emotions in storybooks: A comparison of storybooks that represent ethnic and racial groups in the United States. *Psychology of Popular Media Culture*, *8*(3), 207–217. <https://doi.org/10.1037/ppm0000185>',
    );
  });

  test('an article whose title asks a question', () => {
    expect(apaEntry(source('green1991'))).toBe(
      'Green, S. B. (1991). How many subjects does it take to do a regression analysis? *Multivariate Behavioral Research*, *26*(3), 499–510.',
    );
  });

  test('an article in a journal that numbers articles', () => {
    expect(apaEntry(source('clark2013'))).toMatch(/ \*BMJ\*, \*346\*, Article f1135\. <https:/);
  });

  test('what was not verified is left out', () => {
    expect(apaEntry(source('sampson1974'))).toBe(
      'Sampson, A. R. (1974). A tale of two regressions. *Journal of the American Statistical Association*.',
    );
  });

  test('a DOI with brackets becomes an address that Markdown reads whole', () => {
    expect(apaEntry(source('hsieh1998'))).toContain(
      '<https://doi.org/10.1002/(SICI)1097-0258(19980730)17:14%3C1623::AID-SIM871%3E3.0.CO;2-S>',
    );
  });

  test('a book with its edition', () => {
    expect(apaEntry(source('cohen1988'))).toBe(
      'Cohen, J. (1988). *Statistical power analysis for the behavioral sciences* (2nd ed.). Lawrence Erlbaum Associates.',
    );
  });

  test.each([
    ['1', '*Title*.'],
    [3, '*Title* (3rd ed.).'],
    ['11', '*Title* (11th ed.).'],
    ['22', '*Title* (22nd ed.).'],
    ['Revised edition', '*Title* (Revised ed.).'],
  ])('edition %s', (edition, text) => {
    expect(apaEntry(reference({ type: 'book', title: 'Title', author: people(1), edition }))).toContain(text);
  });

  test('a chapter', () => {
    const chapter = reference({
      type: 'chapter',
      author: people(1),
      ...in2019,
      title: 'Doors',
      'container-title': 'Houses',
      edition: 2,
      volume: 1,
      page: '10-20',
      publisher: 'Invented Press',
    });
    expect(apaEntry(chapter)).toBe(
      'Author1, A. B. (2019). Doors. In *Houses* (2nd ed., Vol. 1, pp. 10–20). Invented Press.',
    );
  });

  test('a report and a standard, with number and publisher', () => {
    expect(apaEntry(source('lenth2007'))).toBe(
      'Lenth, R. V. (2007). *Post hoc power: Tables and commentary* (Technical Report 378). University of Iowa, Department of Statistics and Actuarial Science.',
    );
    const standard = reference({
      type: 'standard',
      author: [{ literal: 'Invented Bureau of Standards' }],
      ...in2019,
      title: 'Wooden ladders',
      number: 'IBS 12-6',
      publisher: 'Invented Bureau of Standards',
    });
    expect(apaEntry(standard)).toBe('Invented Bureau of Standards. (2019). *Wooden ladders* (IBS 12-6).');
  });

  test('a web page without date, a data set and a program', () => {
    const page = reference({
      type: 'webpage',
      author: [{ literal: 'Lodge Keepers’ Union' }],
      title: 'Stoves in use',
      'container-title': 'Union pages',
      URL: 'https://example.org/stoves_in_use?a=1',
    });
    expect(apaEntry(page)).toBe(
      'Lodge Keepers’ Union. (n.d.). *Stoves in use*. Union pages. <https://example.org/stoves_in_use?a=1>',
    );
    const data = reference({
      type: 'dataset',
      author: people(1),
      ...in2019,
      title: 'Lungs',
      publisher: 'Archive',
    });
    expect(apaEntry(data)).toBe('Author1, A. B. (2019). *Lungs* [Data set]. Archive.');
    expect(apaEntry({ ...data, type: 'software' })).toContain('*Lungs* [Computer software].');
  });

  test('a work without author stands under its title', () => {
    const item = reference({ type: 'book', title: 'Stoves', ...in2019, publisher: 'Press' });
    expect(apaEntry(item)).toBe('*Stoves*. (2019). Press.');
    expect(apaLabel(item, '&')).toBe('*Stoves*');
    const article = reference({ type: 'article-newspaper', title: 'Stoves', 'container-title': 'Daily' });
    expect(apaLabel(article, '&')).toBe('“Stoves”');
  });

  test('a reference of nothing but an id', () => {
    expect(apaEntry(reference({ type: 'document' }))).toBe('*Untitled*. (n.d.).');
  });

  test.each([
    [1, 'Author1, A. B. (n.d.)'],
    [2, 'Author1, A. B., & Author2, A. B. (n.d.)'],
    [20, 'Author19, A. B., & Author20, A. B. (n.d.)'],
    [21, 'Author19, A. B., … Author21, A. B. (n.d.)'],
    [40, 'Author19, A. B., … Author40, A. B. (n.d.)'],
  ])('%s authors', (count, end) => {
    const entry = apaEntry(reference({ type: 'book', title: 'Title', author: people(count) }));
    expect(entry).toContain(end);
    expect(entry.split('Author').length - 1).toBe(Math.min(count, 20));
  });

  test.each([
    [{ family: 'Rey', given: 'Jean-Paul' }, 'Rey, J.-P.'],
    [{ family: 'Chan', given: 'An-Wen' }, 'Chan, A.-W.'],
    [{ family: 'Rey', given: 'J.A.' }, 'Rey, J. A.'],
    [{ family: 'Rey', given: 'JA' }, 'Rey, J. A.'],
    [{ family: 'Rey', given: 'élodie maria' }, 'Rey, É. M.'],
    [{ family: 'van Breukelen', given: 'G. J. P.' }, 'van Breukelen, G. J. P.'],
    [{ family: 'Hippel', given: 'Paul T. von' }, 'Hippel, P. T. von.'],
    [{ family: 'Rey', given: 'Frank E., Jr.' }, 'Rey, F. E., Jr.'],
    [{ family: 'Plato' }, 'Plato.'],
    [{ given: 'Madonna' }, 'Madonna.'],
    [{ literal: 'World Health Organization' }, 'World Health Organization.'],
    [{ family: ' ', literal: 'Group' }, 'Group.'],
  ])('the name %j', (author, text) => {
    expect(apaEntry(reference({ type: 'book', title: 'T', author: [author] }))).toBe(`${text} (n.d.). *T*.`);
  });

  test('dates in words', () => {
    const item = reference({ type: 'book', title: 'T', author: people(1), issued: { literal: 'in press' } });
    expect(apaEntry(item)).toContain('(in press).');
    expect(apaEntry(item, 'b')).toContain('(in press-b).');
    expect(apaEntry({ ...item, issued: { 'date-parts': [['2020', 5]] } }, 'b')).toContain('(2020b).');
    expect(apaEntry(reference({ type: 'book', title: 'T', author: people(1) }), 'a')).toContain('(n.d.-a).');
  });

  test('fields print as typed, whatever they hold', () => {
    const item = reference({
      type: 'article-journal',
      author: [{ family: '<b>', given: '*' }],
      title: 'A | B [x](y) _z_',
      'container-title': '`J`',
      volume: '*',
      page: '1\n2',
      DOI: 'javascript:alert(1)',
      URL: 'javascript:alert(1)',
    });
    expect(apaEntry(item)).toBe('\\<b>. (n.d.). A \\| B \\[x\\](y) \\_z\\_. *\\`J\\`*, *\\**, 1 2.');
  });

  test('a name of digits does not begin a list', () => {
    const item = reference({ type: 'book', title: 'T', author: [{ literal: '1984' }] });
    expect(apaEntry(item)).toBe('1984\\. (n.d.). *T*.');
  });

  test('plain, for a terminal', () => {
    expect(apaEntry(source('benton2003'), '', plain)).toBe(
      'Benton, D., & Krishnamoorthy, K. (2003). Computing discrete mixtures of continuous distributions: Noncentral chisquare, noncentral t and the distribution of the square of the sample multiple correlation coefficient. Computational Statistics & Data Analysis.',
    );
  });
});
