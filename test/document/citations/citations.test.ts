import fc from 'fast-check';
import MarkdownIt from 'markdown-it';
import { describe, expect, test } from 'vitest';
import { CitationLog } from '../../../src/document/citations/citations.ts';
import { sources } from '../../../src/sources/sources.ts';
import type { CitationStyle, Reference } from '../../../src/spec/study.ts';

const builtIn = new Map(sources.map((item) => [item.id, item]));
const log = (style: CitationStyle, references: ReadonlyMap<string, Reference> = builtIn) =>
  new CitationLog(style, references);

const byRey = (id: string, title: string, year: number | null): [string, Reference] => [
  id,
  {
    id,
    type: 'book',
    title,
    author: [{ family: 'Rey', given: 'A.' }],
    ...(year === null ? {} : { issued: { 'date-parts': [[year]] } }),
  },
];

describe('citations by author and year', () => {
  test.each([
    [['cohen1988'], ' (Cohen, 1988)', 'Cohen, 1988', 'Cohen (1988)'],
    [
      ['gatsonis1989'],
      ' (Gatsonis & Sampson, 1989)',
      'Gatsonis & Sampson, 1989',
      'Gatsonis and Sampson (1989)',
    ],
    [['ohagan2005'], " (O'Hagan et al., 2005)", "O'Hagan et al., 2005", "O'Hagan et al. (2005)"],
    [['vonhippel2007'], ' (von Hippel, 2007)', 'von Hippel, 2007', 'von Hippel (2007)'],
  ])('%j in its three forms', (keys, parenthetical, bare, narrative) => {
    expect(log('apa').cite(keys, 'parenthetical')).toBe(parenthetical);
    expect(log('apa').cite(keys, 'bare')).toBe(bare);
    expect(log('apa').cite(keys, 'narrative')).toBe(narrative);
  });

  test('several works stand in the order of the list, those of one author together', () => {
    const keys = ['hsieh1998', 'cohen1992', 'benton2003', 'cohen1988'];
    expect(log('apa').cite(keys, 'parenthetical')).toBe(
      ' (Benton & Krishnamoorthy, 2003; Cohen, 1988, 1992; Hsieh et al., 1998)',
    );
    expect(log('apa').cite(['cohen1988', 'green1991', 'lenth2001'], 'narrative')).toBe(
      'Cohen (1988), Green (1991) and Lenth (2001)',
    );
  });

  test('works that would be cited alike get letters by title', () => {
    const references = new Map([
      byRey('second', 'A stove', 2020),
      byRey('first', 'The lodge', 2020),
      byRey('other', 'Ladders', 2021),
      byRey('undated', 'Snow', null),
      byRey('undated-too', 'Ice', null),
    ]);
    const citations = log('apa', references);
    expect(citations.cite(['second', 'first', 'other'], 'bare')).toBe('Rey, 2020a, 2020b, 2021');
    expect(citations.cite(['first'], 'narrative')).toBe('Rey (2020a)');
    expect(citations.cite(['undated', 'undated-too'], 'bare')).toBe('Rey, n.d.-a, n.d.-b');
    expect(citations.list()).toEqual([
      'Rey, A. (n.d.-a). *Ice*.',
      'Rey, A. (n.d.-b). *Snow*.',
      'Rey, A. (2020a). *The lodge*.',
      'Rey, A. (2020b). *A stove*.',
      'Rey, A. (2021). *Ladders*.',
    ]);
  });

  test('the list is alphabetical, one author before the same with others', () => {
    const citations = log('apa');
    citations.cite(['sampson1974', 'kelley2003', 'kelley2008', 'benton2003'], 'bare');
    citations.cite(['vonhippel2007'], 'bare');
    expect(citations.list().map((entry) => entry.slice(0, 12))).toEqual([
      'Benton, D., ',
      'Kelley, K. (',
      'Kelley, K., ',
      'Sampson, A. ',
      'von Hippel, ',
    ]);
  });

  test('more than 26 alike go on with two letters', () => {
    const references = new Map(
      Array.from({ length: 28 }, (_, index) =>
        byRey(`k${index}`, `T${String(index).padStart(2, '0')}`, 2020),
      ),
    );
    const citations = log('apa', references);
    expect(citations.cite(['k25'], 'bare')).toBe('Rey, 2020z');
    expect(citations.cite(['k27'], 'bare')).toBe('Rey, 2020ab');
  });
});

describe('citations by number', () => {
  test('number works by first use', () => {
    const citations = log('vancouver');
    expect(citations.cite(['cohen1988'], 'parenthetical')).toBe(' [1]');
    expect(citations.cite(['gatsonis1989', 'cohen1988'], 'parenthetical')).toBe(' [1,2]');
    expect(citations.cite(['gatsonis1989'], 'bare')).toBe('[2]');
    expect(citations.cite(['gatsonis1989'], 'narrative')).toBe('Gatsonis and Sampson [2]');
    expect(citations.cite(['green1991'], 'narrative')).toBe('Green [3]');
    expect(citations.cite(['green1991', 'cohen1988', 'gatsonis1989'], 'parenthetical')).toBe(' [1–3]');
    expect(citations.cite(['lenth2001', 'cohen1988', 'green1991'], 'parenthetical')).toBe(' [1,3,4]');
    expect(citations.cite(['lenth2001', 'sampson1974', 'green1991', 'cohen1988'], 'parenthetical')).toBe(
      ' [1,3–5]',
    );
    expect(citations.list().map((entry) => entry.slice(0, 10))).toEqual([
      '1. Cohen J',
      '2. Gatsoni',
      '3. Green S',
      '4. Lenth R',
      '5. Sampson',
    ]);
  });
});

describe.each(['apa', 'vancouver'] as const)('any style (%s)', (style) => {
  test('cites nothing for no keys, and lists nothing', () => {
    const citations = log(style);
    expect(citations.cite([], 'parenthetical')).toBe('');
    expect(citations.list()).toEqual([]);
  });

  test('lists a work once, however often it is cited', () => {
    const citations = log(style);
    citations.cite(['cohen1988', 'cohen1988'], 'parenthetical');
    citations.cite(['cohen1988'], 'narrative');
    expect(citations.list()).toHaveLength(1);
  });

  test('an unknown key is a defect', () => {
    expect(() => log(style).cite(['nobody1900'], 'bare')).toThrow("no reference has the id 'nobody1900'");
  });

  test('any fields print as typed: no markup comes from a user, no entry leaves its line', () => {
    const text = fc.string({ unit: 'binary', maxLength: 12 });
    const field = fc.oneof(
      text,
      fc.constantFrom('<i>', '*', '[x](y)', '1.', '1984', '# a', '`', '|', 'A.\n\nB'),
    );
    const anyReference = fc.record(
      {
        type: fc.constantFrom('article-journal', 'book', 'chapter', 'report', 'webpage', 'dataset', 'odd'),
        title: field,
        author: fc.array(fc.record({ family: field, given: field, literal: field }, { requiredKeys: [] })),
        issued: fc.record({ literal: field }),
        'container-title': field,
        publisher: field,
        volume: field,
        issue: field,
        page: field,
        number: field,
        edition: field,
        DOI: field,
        URL: field,
      },
      { requiredKeys: ['type'] },
    );
    const renderer = new MarkdownIt({ html: true });
    fc.assert(
      fc.property(fc.array(anyReference, { minLength: 1, maxLength: 3 }), (items) => {
        const references = new Map(
          items.map((item, index) => [`k${index}`, { id: `k${index}`, ...item } as Reference]),
        );
        const citations = log(style, references);
        const inText = citations.cite([...references.keys()], 'parenthetical');
        const list = citations.list();
        expect([inText, ...list].filter((line) => line.includes('\n'))).toEqual([]);
        const tags = renderer.render(list.join('\n\n')).match(/<(?!\/?(?:p|em|a|ol|li)\b)[^>]*>/g);
        expect(tags).toBeNull();
        expect(renderer.render(list.join('\n\n')).match(/<ol/g) ?? []).toHaveLength(style === 'apa' ? 0 : 1);
      }),
      { numRuns: 300 },
    );
  });
});
