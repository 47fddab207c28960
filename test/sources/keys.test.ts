import { expect, test } from 'vitest';
import { methods, rules, sourceTitle } from '../../src/index.ts';

test('every source that a method or a rule names is among the built-in ones', () => {
  const named = [...Object.values(methods), ...rules].flatMap(({ sources }) => sources.map(({ key }) => key));
  expect(named.length).toBeGreaterThan(20);
  for (const key of named) expect(sourceTitle(key)).toMatch(/\(\d{4}|n\.d\.\)/);
});
