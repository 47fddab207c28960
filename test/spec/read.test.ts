import { describe, expect, it } from 'vitest';
import { LIMITS } from '../../src/spec/limits.ts';
import { read } from '../../src/spec/read.ts';

/** What is said about a text, as `line:column code: message`. */
function said(text: string): string[] {
  return read(text).problems.map(
    ({ position, code, message }) => `${position?.line}:${position?.column} ${code}: ${message}`,
  );
}

describe('reading YAML and JSON', () => {
  it('reads scalars by the core schema of YAML 1.2', () => {
    const text =
      'a: 1\nb: .5\nc: 1e-3\nd: true\ne: null\nf: ~\ng:\nh: no\ni: 2024-01-01\nj: "1"\nk: 0x1F\nl: 012\nm: -0\nn: 1_000';
    expect(read(text)).toMatchObject({
      tree: {
        a: 1,
        b: 0.5,
        c: 0.001,
        d: true,
        e: null,
        f: null,
        g: null,
        h: 'no',
        i: '2024-01-01',
        j: '1',
        k: 31,
        l: 12,
        m: 0,
        n: '1_000',
      },
      problems: [],
    });
    expect(Object.is((read('m: -0').tree as { m: number }).m, 0)).toBe(true);
  });

  it('reads JSON, indented by tabs or not, to the same tree as YAML', () => {
    const json = '{\n\t"a": [1, 2.5e3, "x\\u00e9\\/"],\n\t"b": {"c": null}\n}';
    expect(read(json)).toMatchObject({ tree: JSON.parse(json), problems: [] });
    expect(read('a: [1, 2500, xé/]\nb:\n  c:\n').tree).toEqual(read(json).tree);
  });

  it('keeps a byte order mark out of the text and of the columns', () => {
    expect(read('\ufeffa: 1')).toMatchObject({ tree: { a: 1 }, problems: [] });
    expect(read('\ufeffa: .inf').problems[0]?.position).toEqual({ line: 1, column: 4 });
  });

  it.each([['\n'], ['\r\n'], ['\r']])('counts lines that end in %j', (end) => {
    const { tree, problems } = read(
      ['a: 1', 'b:', '  - x', '  - .nan', 'c: |', '  two', '  lines', ''].join(end),
    );
    expect(problems[0]?.position).toEqual({ line: 4, column: 5 });
    expect((tree as { c: string }).c).toBe('two\nlines\n');
  });

  it('follows anchors and aliases', () => {
    expect(read('a: &x {b: [1]}\nc: *x\nd: [*x, *x]')).toMatchObject({
      tree: { a: { b: [1] }, c: { b: [1] }, d: [{ b: [1] }, { b: [1] }] },
      problems: [],
    });
  });

  it('gives each node its place: a scalar at its value, a collection at its key', () => {
    const { positions } = read('study:\n  title: "A"\naims:\n  - id: one\n    inputs: {added: 3}\n');
    const at = (path: string): string => {
      const place = positions.find(path, 'not-allowed');
      return `${place.line}:${place.column}`;
    };
    expect(at('study')).toBe('1:1');
    expect(at('study.title')).toBe('2:10');
    expect(at('aims[0]')).toBe('4:5');
    expect(at('aims[0].inputs')).toBe('5:5');
    expect(at('aims[0].inputs.added')).toBe('5:21');
    expect(at('aims[0].inputs.effect.partial_r2')).toBe('5:5');
    expect(at('nowhere["at all"][3].known')).toBe('1:1');
    expect(positions.find('study.title', 'unknown-key')).toEqual({ line: 2, column: 3 });
  });
});

it('leaves a number beyond the largest as text, which the schema then refuses', () => {
  expect(read('a: 1e999').tree).toEqual({ a: '1e999' });
});

describe('limits on what is read', () => {
  it('refuses more than 1 MiB and reads 1 MiB', () => {
    const comment = (bytes: number): string => `a: 1\n#${'x'.repeat(bytes - 6)}`;
    expect(read(comment(LIMITS.bytes)).problems).toEqual([]);
    expect(said(comment(LIMITS.bytes + 1))).toEqual([
      'undefined:undefined too-large: The file is larger than 1 MiB (1,048,576 bytes), the most that is read. Shorten it.',
    ]);
  });

  it('counts bytes and not characters', () => {
    expect(said(`# ${'é'.repeat(LIMITS.bytes / 2)}`)).toHaveLength(1);
  });

  it('refuses more than 64 levels, written out or through aliases', () => {
    const nested = (levels: number): string => `${'['.repeat(levels)}1${']'.repeat(levels)}`;
    expect(read(nested(64)).problems).toEqual([]);
    expect(said(nested(65))).toEqual([
      '1:66 too-deep: Lists and keys are nested more than 64 deep here, which no spec needs. Flatten them.',
    ]);
    expect(
      said(`- &a ${nested(40)}\n- &b ${nested(20).replace('1', '*a')}\n- ${nested(3).replace('1', '*b')}\n`),
    ).toEqual([]);
    expect(said(`- &a ${nested(40)}\n- ${nested(30).replace('1', '*a')}`)).toEqual([
      '2:33 too-deep: Lists and keys are nested more than 64 deep here, which no spec needs. Flatten them.',
    ]);
  });

  it('refuses aliases that multiply into millions of values', () => {
    const lines = ['a0: &a0 [x, x, x, x, x, x, x, x, x]'];
    for (let level = 1; level <= 9; level++)
      lines.push(`a${level}: &a${level} [${`*a${level - 1}, `.repeat(9)}]`);
    const { tree, problems } = read(lines.join('\n'));
    expect(tree).toBeUndefined();
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatchObject({
      code: 'too-many-values',
      message:
        'The file has more than 100,000 values up to here, aliases counted as what they stand for. Shorten it.',
    });
  });

  it('refuses more than 100,000 values without any alias', () => {
    expect(read(`[${'1,'.repeat(LIMITS.nodes - 1)}]`).problems).toEqual([]);
    expect(read(`[${'1,'.repeat(LIMITS.nodes)}]`).problems[0]?.code).toBe('too-many-values');
  });
});

describe('what a data file has no need of', () => {
  it.each([
    ['', 'undefined:undefined empty: The file is empty. `samplecase new` writes a spec to start from.'],
    [
      '# a comment\n',
      'undefined:undefined empty: The file is empty. `samplecase new` writes a spec to start from.',
    ],
    ['a: 1\na: 2\n', '2:1 duplicate-key: The key "a" is given twice; the first is on line 1. Keep one.'],
    [
      '{"a": {"b": 1, "b": 2}}',
      '1:16 duplicate-key: The key "b" is given twice; the first is on line 1. Keep one.',
    ],
    [
      'a: !!str 1',
      '1:10 tag: The tag "!!str" is not read. Remove it; numbers and texts are told apart without tags.',
    ],
    [
      'a: !<tag:x,2000:y> {b: 1}',
      '1:20 tag: The tag "!<tag:x,2000:y>" is not read. Remove it; numbers and texts are told apart without tags.',
    ],
    [
      '!!set {a, b}',
      '1:7 tag: The tag "!!set" is not read. Remove it; numbers and texts are told apart without tags.',
    ],
    ['__proto__: {a: 1}', '1:1 forbidden-key: The key "__proto__" is not allowed anywhere. Remove it.'],
    ['a: {"constructor": 1}', '1:5 forbidden-key: The key "constructor" is not allowed anywhere. Remove it.'],
    ['1: a', '1:1 key-not-text: The key "1" is not a word. Keys are words, such as title.'],
    ['null: a', '1:1 key-not-text: The key "null" is not a word. Keys are words, such as title.'],
    [
      '? [a, b]\n: 1',
      '1:3 key-not-text: A key must be a word followed by a colon, not a list, a mapping or an alias.',
    ],
    [
      'a: &x b\n*x : 1',
      '2:1 key-not-text: A key must be a word followed by a colon, not a list, a mapping or an alias.',
    ],
    ['&x a: 1', '1:4 tag: The key "a" has a tag or an anchor, which keys may not have. Remove it.'],
    ['a: &x {b: 1}\nc:\n  <<: *x', '3:3 merge-key: Merge keys (<<) are not read. Write the keys out.'],
    [
      'a: 1\n---\nb: 2',
      '3:1 several-documents: A second document begins here (after ---). A file holds one spec: remove the rest.',
    ],
    ['a: .inf', '1:4 not-finite: Found ".inf", but a number must be finite. Write it in digits.'],
    ['a: -.INF', '1:4 not-finite: Found "-.INF", but a number must be finite. Write it in digits.'],
    ['a: .nan', '1:4 not-finite: Found ".nan", but a number must be finite. Write it in digits.'],
    [
      'a: *nowhere',
      '1:4 alias: The alias "*nowhere" names an anchor that is not defined before it. Write the value out.',
    ],
    ['a: &x [*x]', '1:8 alias: The alias "*x" stands inside what it names. Write the value out.'],
    [
      'a: "x\\u0000y"',
      '1:4 unprintable: The text holds the character U+0000, which cannot be printed. Remove it.',
    ],
    [
      'a: "\\ud800"',
      '1:4 unprintable: The text holds the character U+D800, which cannot be printed. Remove it.',
    ],
    ['"a\\e": 1', '1:1 unprintable: A key holds the character U+001B, which cannot be printed. Remove it.'],
    ['a:\n\tb: 1', '2:1 syntax: A tab is used for indentation here. Indent with spaces.'],
    [
      'a: "x',
      '1:6 syntax: A quotation mark is opened and not closed before this place. Close it, or double it if it belongs to the text.',
    ],
    ['a: [1, 2', '1:9 syntax: A bracket [ or { is opened and not closed before this place. Close it.'],
    [
      'a: [1 2] 3',
      '1:10 syntax: This line cannot be read. Give it the indentation of the keys around it, and put a text in quotes if it contains ": " or begins with a sign such as @, %, & or *.',
    ],
    ['a: {b: 1 c: 2}', '1:11 syntax: A comma is missing here between two entries in brackets.'],
    [
      'a: b: c',
      '1:5 syntax: This line cannot be read. Give it the indentation of the keys around it, and put a text in quotes if it contains ": " or begins with a sign such as @, %, & or *.',
    ],
    [
      'a: "\\q"',
      '1:6 syntax: A backslash in double quotes begins an escape that is not known. Write two backslashes, or use single quotes.',
    ],
    [
      'a: 1\n  b: 2',
      '2:4 syntax: This line cannot be read. Give it the indentation of the keys around it, and put a text in quotes if it contains ": " or begins with a sign such as @, %, & or *.',
    ],
    [
      'title\nquestion: x',
      '2:9 syntax: This line does not belong to what stands before it. Give it the indentation of the keys or list entries around it.',
    ],
  ])('%j is answered in one sentence or two', (text, answer) => {
    expect(said(text)).toEqual([answer]);
  });

  it('reports every such thing in a file, not the first', () => {
    expect(said('a: .inf\na: 2\n__proto__: 3\nb: !x 1\n1: 2\n').map((line) => line.split(' ')[1])).toEqual([
      'not-finite:',
      'duplicate-key:',
      'forbidden-key:',
      'tag:',
      'key-not-text:',
    ]);
  });

  it('keeps the first of two values', () => {
    expect(read('a: 1\nb: 2\na: {c: 3}\n').tree).toEqual({ a: 1, b: 2 });
  });

  it('never reaches into the prototype', () => {
    const { tree } = read(
      '{"__proto__": {"polluted": 1}, "a": {"constructor": {"prototype": {"polluted": 1}}}}',
    );
    expect(tree).toEqual({ a: {} });
    expect(Object.getPrototypeOf(tree)).toBe(Object.prototype);
    expect(({} as { polluted?: number }).polluted).toBeUndefined();
  });
});
