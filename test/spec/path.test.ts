import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatPath, parsePath } from '../../src/spec/path.ts';

describe('paths', () => {
  it.each([
    [[], ''],
    [['aims'], 'aims'],
    [['aims', 0, 'inputs', 'added'], 'aims[0].inputs.added'],
    [[2, 'id'], '[2].id'],
    [['a b', 'c"]', ''], '["a b"]["c\\"]"][""]'],
  ])('%j is written %j', (segments, path) => {
    expect(formatPath(segments)).toBe(path);
  });

  it('are read back, whatever the keys', () => {
    const segment = fc.oneof(
      fc.nat(50),
      fc.string({ unit: 'grapheme' }),
      fc.constantFrom('aims', 'x-y', '$schema', 'a"]', '\u202e', '\\', '', '0'),
    );
    fc.assert(
      fc.property(fc.array(segment, { maxLength: 6 }), (segments) => {
        expect(parsePath(formatPath(segments))).toEqual(segments);
      }),
    );
  });

  it('are read up to the first thing that is no path', () => {
    expect(parsePath('aims[0] and more')).toEqual(['aims', 0]);
  });
});
