import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatPath, parentPath } from '../../src/spec/path.ts';

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

  it('the parent of a path is the path without its last segment, whatever the keys', () => {
    const segment = fc.oneof(
      fc.nat(50),
      fc.string(),
      fc.constantFrom('aims', 'x-y', '$schema', 'a"]', '\u202e', '\\'),
    );
    fc.assert(
      fc.property(fc.array(segment, { minLength: 1, maxLength: 6 }), (segments) => {
        expect(parentPath(formatPath(segments))).toBe(formatPath(segments.slice(0, -1)));
      }),
    );
    expect(parentPath('')).toBeNull();
  });
});
