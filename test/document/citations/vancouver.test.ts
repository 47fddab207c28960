import { describe, expect, test } from 'vitest';
import { vancouverEntry } from '../../../src/document/citations/vancouver.ts';
import { source } from '../../../src/sources/sources.ts';
import type { Reference } from '../../../src/spec/study.ts';

const reference = (fields: Omit<Reference, 'id'>): Reference => ({ id: 'invented', ...fields });
const in2019 = { issued: { 'date-parts': [[2019]] } };
const people = (count: number) =>
  Array.from({ length: count }, (_, index) => ({ family: `Author${index + 1}`, given: 'Anna B. C.' }));

describe('an entry of the list in Vancouver style', () => {
  // Example of the committee's list of sample references (from memory; month and day left out, journal in full).
  test('an article', () => {
    const item = reference({
      type: 'article-journal',
      author: [
        { family: 'Halpern', given: 'Scott D.' },
        { family: 'Ubel', given: 'Peter A.' },
        { family: 'Caplan', given: 'Arthur L.' },
      ],
      issued: { 'date-parts': [[2002, 7, 25]] },
      title: 'Solid-organ transplantation in HIV-infected patients',
      'container-title': 'New England Journal of Medicine',
      volume: 347,
      issue: 4,
      page: '284-287',
    });
    expect(vancouverEntry(item)).toBe(
      'Halpern SD, Ubel PA, Caplan AL. Solid-organ transplantation in HIV-infected patients. New England Journal of Medicine. 2002;347(4):284-7.',
    );
  });

  test.each([
    ['516-524', '516-24'],
    ['1057–1073', '1057-73'],
    ['99-101', '99-101'],
    ['12-12', '12'],
    ['S12-S18', 'S12-S18'],
    ['e081477', 'e081477'],
    ['264', '264'],
  ])('pages %s as %s', (page, text) => {
    const item = reference({ type: 'article', author: people(1), ...in2019, title: 'T', page, volume: 2 });
    expect(vancouverEntry({ ...item, 'container-title': 'Journal' })).toBe(
      `Author1 AB. T. Journal. 2019;2:${text}.`,
    );
  });

  test('what was not verified is left out', () => {
    expect(vancouverEntry(source('sampson1974'))).toBe(
      'Sampson AR. A tale of two regressions. Journal of the American Statistical Association. 1974.',
    );
  });

  test('a book with its edition, a chapter, a report', () => {
    expect(vancouverEntry(source('cohen1988'))).toBe(
      'Cohen J. Statistical power analysis for the behavioral sciences. 2nd ed. Lawrence Erlbaum Associates; 1988.',
    );
    const chapter = reference({
      type: 'chapter',
      author: people(1),
      ...in2019,
      title: 'Doors',
      'container-title': 'Houses',
      page: '110-120',
      publisher: 'Invented Press',
      'publisher-place': 'Nowhere',
    });
    expect(vancouverEntry(chapter)).toBe(
      'Author1 AB. Doors. In: Houses. Nowhere: Invented Press; 2019. p. 110-20.',
    );
    expect(vancouverEntry(source('lenth2007'))).toBe(
      'Lenth RV. Post hoc power: Tables and commentary. Technical Report 378. University of Iowa, Department of Statistics and Actuarial Science; 2007.',
    );
  });

  test('a web page without date, a data set', () => {
    const page = reference({
      type: 'webpage',
      author: [{ literal: 'Lodge Keepers’ Union' }],
      title: 'Stoves in use',
      'container-title': 'Union pages',
      URL: 'https://example.org/stoves',
    });
    expect(vancouverEntry(page)).toBe(
      'Lodge Keepers’ Union. Stoves in use [Internet]. Union pages; [date unknown]. Available from: <https://example.org/stoves>',
    );
    const data = reference({
      type: 'dataset',
      author: people(1),
      ...in2019,
      title: 'Lungs',
      publisher: 'Archive',
    });
    expect(vancouverEntry(data)).toBe('Author1 AB. Lungs [dataset]. Archive; 2019.');
  });

  test('six authors, then et al.', () => {
    const entry = (count: number) =>
      vancouverEntry(reference({ type: 'book', title: 'T', author: people(count) }));
    expect(entry(6)).toContain('Author6 AB. T.');
    expect(entry(7)).toContain('Author6 AB, et al. T.');
  });

  test.each([
    [{ family: 'Rey', given: 'Jean-Paul' }, 'Rey JP'],
    [{ family: 'van Breukelen', given: 'G. J. P.' }, 'van Breukelen GJ'],
    [{ family: 'Hippel', given: 'Paul T. von' }, 'Hippel PT von'],
    [{ family: 'Rey', given: 'Frank E., Jr.' }, 'Rey FE Jr'],
    [{ literal: 'World Health Organization' }, 'World Health Organization'],
  ])('the name %j', (author, text) => {
    expect(vancouverEntry(reference({ type: 'book', title: 'T', author: [author] }))).toMatch(
      new RegExp(`^${text}\\. T\\.`),
    );
  });

  test('a reference of nothing but an id', () => {
    expect(vancouverEntry(reference({ type: 'document' }))).toBe('Untitled. [date unknown].');
  });
});
