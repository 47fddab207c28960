import fc from 'fast-check';
import { afterEach, describe, expect, it } from 'vitest';
import { newSpecs } from '../../src/generated/new-specs.ts';
import { LIMITS } from '../../src/spec/limits.ts';
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

/** Files that once took minutes or gigabytes, or could: the time limit of the test is the check. */
describe('a hostile file of up to 1 MiB is answered like any other', () => {
  const start = 'samplecase: 1\nstudy: {title: t, question: q, population: p, design: d}\n';
  const aim = (effect: string): string =>
    `aims: [{id: a, role: primary, objective: o, outcome: {name: n, unit: u}, analysis: a, method: linear-nested, inputs: {added: 1, adjusted_for: 1, effect: ${effect}}, criteria: {alpha: 0.05, power: 0.9}, find: sample-size}]\n`;
  const many = (count: number, entry: (index: number) => string): string =>
    Array.from({ length: count }, (_, index) => entry(index)).join(',');

  it.each<[string, string]>([
    ['a number of 900,000 digits in quotation marks', start + aim(`{f2: "${'1'.repeat(900_000)},"}`)],
    ['thirty thousand aims', `${start}aims: [${many(30_000, () => '{}')}]`],
    ['forty thousand unknown keys', `${start}${many(40_000, (i) => `\nk${i}: 1`).replaceAll(',', '')}`],
    [
      'ninety thousand formats',
      `${start}${aim('{f2: 0.1}')}documents: [{kind: grant, formats: [${many(90_000, () => 'html')}]}]`,
    ],
    [
      'forty thousand citations among fifteen thousand references',
      `${start}${aim(`{f2: {value: 0.1, cite: [${many(40_000, (i) => `abcdefgh${i}`)}]}}`)}references: [${many(15_000, (i) => `{id: abcdefgx${i}}`)}]`,
    ],
    [
      'sixty long keys inside each other',
      `${start}x: ${many(60, () => `{${'k'.repeat(190)}: `).replaceAll(',', '')}[${many(80_000, () => '1')}]${'}'.repeat(60)}`,
    ],
    ['half a million brackets', '['.repeat(500_000)],
  ])('%s', (_, text) => {
    const answer = parseSpec(text);
    isAnswered(answer);
    expect(answer.problems.length).toBeLessThanOrEqual(LIMITS.problems + 1);
  });

  it('the problems that are not put into words are said to be there', () => {
    const { problems } = parseSpec(`${start}aims: [${many(30_000, () => '{}')}]`);
    expect(problems.at(-1)?.message).toBe(
      'Not all problems are shown: there are more from here on. Mend the 200 above first.',
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
