import fc from 'fast-check';
import { afterEach, describe, expect, it } from 'vitest';
import { newSpecs } from '../../src/generated/new-specs.ts';
import { type ParsedSpec, parseSpec } from '../../src/spec/parse.ts';
import { validSpec } from './valid-spec.ts';

/** Whatever the text: either a study, or problems that a person can act on. */
function isAnswered({ study, problems }: ParsedSpec): void {
  if (study === null) expect(problems.length).toBeGreaterThan(0);
  else expect(problems).toEqual([]);
  for (const { position, message, level } of problems) {
    expect(level).toBe('error');
    expect(position?.line).toBeGreaterThan(0);
    expect(position?.column).toBeGreaterThan(0);
    expect(message).toMatch(/^\S.*[.?]$/su);
    expect(message).not.toMatch(/\bundefined\b|\bNaN\b|\[object/);
  }
}

const inherited = Object.getOwnPropertyNames(Object.prototype).sort();

afterEach(() => {
  expect(Object.getOwnPropertyNames(Object.prototype).sort()).toEqual(inherited);
  expect(Object.getOwnPropertyNames(Array.prototype)).not.toContain('polluted');
});

const HOSTILE = [
  '__proto__',
  'constructor',
  'prototype',
  'toString',
  'hasOwnProperty',
  'length',
  '<<',
  '',
  '\u202e',
  '0',
];

/** Any JSON, with keys that specs know and keys that reach into JavaScript. */
const anyJson = fc.letrec<{ value: unknown }>((tie) => ({
  value: fc.oneof(
    { depthSize: 'medium' },
    fc.constantFrom<unknown>(
      null,
      true,
      false,
      '',
      'linear-nested',
      'sample-size',
      'power',
      1,
      0,
      -1,
      0.05,
      1e300,
      -0,
    ),
    fc.string(),
    fc.double({ noNaN: true, noDefaultInfinity: true }),
    fc.array(tie('value'), { maxLength: 4 }),
    fc
      .array(
        fc.tuple(
          fc.oneof(
            fc.constantFrom(
              'samplecase',
              'study',
              'aims',
              'id',
              'method',
              'inputs',
              'effect',
              'criteria',
              'find',
              'partial_r2',
              'value',
              'low',
              'cite',
              'sample',
              'losses',
              'references',
            ),
            fc.constantFrom(...HOSTILE),
            fc.string(),
          ),
          tie('value'),
        ),
        { maxLength: 6 },
      )
      .map((entries) =>
        entries.reduce<Record<string, unknown>>((object, [key, value]) => {
          Object.defineProperty(object, key, { value, enumerable: true, configurable: true, writable: true });
          return object;
        }, {}),
      ),
  ),
})).value;

/** Paths to every node of a tree. */
function pathsOf(value: unknown, path: (string | number)[] = []): (string | number)[][] {
  if (typeof value !== 'object' || value === null) return [path];
  const children = Array.isArray(value) ? [...value.entries()] : Object.entries(value);
  return [path, ...children.flatMap(([key, child]) => pathsOf(child, [...path, key]))];
}

function replaced(value: unknown, path: readonly (string | number)[], by: unknown): unknown {
  const [first, ...rest] = path;
  if (first === undefined) return by;
  const copy = Array.isArray(value) ? [...value] : { ...(value as object) };
  (copy as Record<string | number, unknown>)[first] = replaced(
    (value as Record<string | number, unknown>)[first],
    rest,
    by,
  );
  return copy;
}

describe('any text is answered and none throws', () => {
  it('random bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 300 }), (bytes) =>
        isAnswered(parseSpec(new TextDecoder().decode(bytes))),
      ),
      { numRuns: 500 },
    );
  });

  it('random Unicode, with the signs of YAML', () => {
    const sign = fc.constantFrom(
      ...'-:?,[]{}#&*!|>\'"%@`\n\t ~<=.0aé'.split(''),
      '\r\n',
      '---\n',
      ': ',
      '- ',
      '&a ',
      '*a',
      '!!',
      '\ufeff',
      '\ud800',
    );
    const text = fc.array(
      fc.oneof({ weight: 5, arbitrary: sign }, fc.string({ unit: 'binary', maxLength: 3 })),
      { maxLength: 60 },
    );
    fc.assert(
      fc.property(text, (parts) => isAnswered(parseSpec(parts.join('')))),
      { numRuns: 1500 },
    );
  });

  it('random JSON', () => {
    fc.assert(
      fc.property(anyJson, (tree) => isAnswered(parseSpec(JSON.stringify(tree)))),
      { numRuns: 1000 },
    );
  });

  it('a valid spec with one to three places replaced by anything', () => {
    const spec = validSpec();
    const paths = pathsOf(spec).slice(1);
    const change = fc.tuple(fc.constantFrom(...paths), anyJson);
    fc.assert(
      fc.property(fc.array(change, { minLength: 1, maxLength: 3 }), (changes) => {
        const mutated = changes.reduce<unknown>(
          (tree, [path, value]) => (has(tree, path) ? replaced(tree, path, value) : tree),
          spec,
        );
        isAnswered(parseSpec(JSON.stringify(mutated)));
      }),
      { numRuns: 1500 },
    );
  });

  it('a valid file with characters deleted, doubled or swapped', () => {
    const text = Object.values(newSpecs)[0] ?? '';
    const edit = fc.record({
      at: fc.nat(text.length),
      length: fc.nat(30),
      kind: fc.constantFrom('delete', 'double', 'insert'),
      sign: fc.constantFrom(...':-[]{}"\'#&*!\n\t '.split('')),
    });
    fc.assert(
      fc.property(fc.array(edit, { minLength: 1, maxLength: 4 }), (edits) => {
        const edited = edits.reduce((so, { at, length, kind, sign }) => {
          const middle = so.slice(at, at + length);
          const between = kind === 'delete' ? '' : kind === 'double' ? middle + middle : sign + middle;
          return so.slice(0, at) + between + so.slice(at + length);
        }, text);
        isAnswered(parseSpec(edited));
      }),
      { numRuns: 800 },
    );
  });

  it('the same text gives the same answer', () => {
    fc.assert(
      fc.property(anyJson, (tree) => {
        const text = JSON.stringify(tree);
        const once = parseSpec(text);
        const twice = parseSpec(text);
        expect(twice.problems).toEqual(once.problems);
      }),
      { numRuns: 200 },
    );
  });
});

function has(tree: unknown, path: readonly (string | number)[]): boolean {
  const parent = path
    .slice(0, -1)
    .reduce<unknown>(
      (value, key) =>
        typeof value === 'object' && value !== null
          ? (value as Record<string | number, unknown>)[key]
          : undefined,
      tree,
    );
  return typeof parent === 'object' && parent !== null;
}
