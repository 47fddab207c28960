import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { writeReferences } from '../../src/build/write-assets.ts';
import { sourceKeys } from '../../src/generated/source-keys.ts';
import { source, sources, verifiedFields } from '../../src/sources/sources.ts';
import type { Reference } from '../../src/spec/study.ts';

const root = join(import.meta.dirname, '..', '..');

describe('the built-in references', () => {
  test('are those of sources.json (else: npm run generate)', () => {
    const generated = join(root, 'src', 'generated', 'references.ts');
    expect(readFileSync(generated, 'utf8')).toBe(writeReferences(root));
    expect([...sourceKeys]).toEqual(sources.map(({ id }) => id).sort());
  });

  test('have keys of their own, in order', () => {
    const keys = sources.map(({ id }) => id);
    expect(keys).toEqual([...new Set(keys)].sort());
    expect(keys.length).toBeGreaterThan(30);
  });

  test.each(sources.map((item) => [item.id, item] as const))('%s can be cited', (_, item) => {
    expect(item.title).toMatch(/^\S.*[^.\s]$/);
    expect(item.author?.length).toBeGreaterThan(0);
    expect(item.issued?.['date-parts']?.[0]?.[0]).toBeTypeOf('number');
    expect(['full', 'partial', 'memory']).toContain(item.custom?.verified);
    expect(item.custom?.use).toBeTruthy();
    if (item.DOI !== undefined) {
      expect(item.DOI).toMatch(/^10\.\d{4,9}\/\S+$/);
      expect(['seen', 'pattern', 'standards', 'memory']).toContain(item.custom?.doi);
    }
  });

  test('of a key that does not exist are a defect', () => {
    expect(source('cohen1988').title).toMatch(/^Statistical power analysis/);
    expect(() => source('nobody1900')).toThrow("src/sources/sources.json holds no item 'nobody1900'");
  });
});

describe('verifiedFields', () => {
  const whole: Reference = {
    id: 'invented2020',
    type: 'article-journal',
    title: 'Invented',
    volume: '7',
    issue: '2',
    page: '1-9',
    DOI: '10.1000/invented',
  };

  test.each([
    ['full', 'seen', ['volume', 'issue', 'page', 'DOI']],
    ['full', 'pattern', ['volume', 'issue', 'page', 'DOI']],
    ['full', 'standards', ['volume', 'issue', 'page', 'DOI']],
    ['full', 'memory', ['volume', 'issue', 'page']],
    ['partial', 'seen', ['DOI']],
    ['memory', 'memory', []],
  ])('verified %s, DOI %s: prints %j', (verified, doi, fields) => {
    const shown = verifiedFields({ ...whole, custom: { verified, doi } });
    expect(Object.keys(shown).filter((key) => ['volume', 'issue', 'page', 'DOI'].includes(key))).toEqual(
      fields,
    );
    expect(shown.title).toBe('Invented');
  });

  test('prints no DOI of which nothing is said', () => {
    expect(verifiedFields({ ...whole, custom: { verified: 'full' } })).not.toHaveProperty('DOI');
  });

  test('leaves a user’s reference whole', () => {
    expect(verifiedFields(whole)).toBe(whole);
    const noted = { ...whole, custom: { use: 'read in the library' } };
    expect(verifiedFields(noted)).toBe(noted);
  });
});
