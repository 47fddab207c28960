import { describe, expect, it } from 'vitest';
import { ProblemError } from '../../src/problem.ts';
import { type ParseOptions, parseSpec } from '../../src/spec/parse.ts';
import { changed } from './valid-spec.ts';

const text = JSON.stringify(changed(['references'], 'refs.json'));

function said(options: ParseOptions): string[] {
  return parseSpec(text, { file: 'study.yaml', ...options }).problems.map(
    ({ file, position, path, message }) => `${file}:${position?.line ?? '-'} ${path} ${message}`,
  );
}

describe('references in a file of their own', () => {
  it('are asked for by the path in the spec', () => {
    const asked: string[] = [];
    const { study, problems } = parseSpec(text, {
      readReferences: (path) => {
        asked.push(path);
        return '[{"id": "harbour2020", "title": "Invented"}]';
      },
    });
    expect(asked).toEqual(['refs.json']);
    expect(problems).toEqual([]);
    expect(study?.references).toEqual([{ id: 'harbour2020', type: 'document', title: 'Invented' }]);
  });

  it('need a reader', () => {
    expect(said({})).toEqual([
      'study.yaml:1 references References in a file cannot be read here. Write the items into the spec.',
    ]);
  });

  it('that cannot be read are one problem of the spec, and no citation is called unresolved', () => {
    const readReferences = (): string => {
      throw new ProblemError([
        { level: 'error', code: 'unreadable-file', path: '', message: 'There is no file refs.json.' },
      ]);
    };
    expect(said({ readReferences })).toEqual(['study.yaml:1 references There is no file refs.json.']);
  });

  it.each([
    ['{"id": "a"}', 'refs.json:1  Found a group of keys (id), but a list of CSL-JSON items is needed.'],
    [
      '[{"id": "harbour2020"},\n {"title": "x"}]',
      'refs.json:2 [1].id The key "id" is missing. It takes text. The name by which cite refers to it.',
    ],
    [
      '[{"id": "harbour2020", "author": "Smith", "issued": {"date-parts": [[2020, {}]]}}]',
      'refs.json:1 [0].author Found "Smith", but a list is needed.',
      'refs.json:1 [0].issued.date-parts[0][1] Found an empty group of keys, but a whole number or text is needed.',
    ],
    [
      '[{"id": "harbour2020", "URL": "javascript:alert(1)"}]',
      'refs.json:1 [0].URL Found "javascript:alert(1)", but an address that begins with https:// or http:// is needed.',
    ],
    [
      '[{"id": "harbour2020"},\n\n {"id": "harbour2020"}]',
      'refs.json:3 [1].id Two references have the id "harbour2020". Give each an id of its own, so that a citation names one.',
    ],
    [
      '[{"id": "harbour2020"',
      'refs.json:1  A bracket [ or { is opened and not closed before this place. Close it.',
    ],
  ])('%j is answered with its own file and line', (content, ...answers) => {
    expect(said({ readReferences: () => content })).toEqual(answers);
  });

  it('keep keys that no page prints, and have pages as text', () => {
    const { study } = parseSpec(text, {
      readReferences: () => '[{"id": "harbour2020", "type": "book", "page": 12, "language": "en"}]',
    });
    expect(study?.references).toEqual([{ id: 'harbour2020', type: 'book', page: '12', language: 'en' }]);
  });

  it('are part of the hash exactly as written', () => {
    const hashOf = (content: string): string | undefined =>
      parseSpec(text, { readReferences: () => content }).study?.hash;
    const inSpec = parseSpec(JSON.stringify(changed(['references'], [{ id: 'harbour2020', page: 12 }])));
    expect(hashOf('[{"page": 12, "id": "harbour2020"}]')).toBe(inSpec.study?.hash);
    expect(hashOf('[{"page": "12", "id": "harbour2020"}]')).not.toBe(inSpec.study?.hash);
  });

  it('that fail for a reason of ours are not hidden', () => {
    const readReferences = (): string => {
      throw new TypeError('a defect');
    };
    expect(() => parseSpec(text, { readReferences })).toThrow('a defect');
  });
});
