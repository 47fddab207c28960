/** Text (YAML, or JSON, which reads the same way) → plain data with the position of every node. Specs come
 *  from anywhere: size, depth and number of nodes are limited, and whatever a data file has no need of
 *  (tags, merge keys, keys that reach into JavaScript) is refused by name. */

import {
  boolCoreTag,
  EVENT_ID,
  type Event,
  floatCoreTag,
  getScalarValue,
  intCoreTag,
  NOT_RESOLVED,
  nullCoreTag,
  parseEvents,
  SCALAR_STYLE,
  type ScalarEvent,
  YAMLException,
} from 'js-yaml';
import { type Problem, ProblemError } from '../problem.ts';
import { formatPath, type Segments } from './path.ts';
import { Positions } from './positions.ts';
import { shown, shownCharacter } from './shown.ts';
import { syntaxMessage } from './syntax-messages.ts';

/** A spec of forty aims has a few thousand nodes; a reference list of a thousand items some thirty thousand. */
export const LIMITS = { bytes: 1_048_576, depth: 64, nodes: 100_000 } as const;

const FORBIDDEN_KEYS = new Set(['__proto__', 'constructor', 'prototype']);

/** Control characters (tab and line ends apart), which no document can print, and halves of a surrogate pair. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is looked for
const UNPRINTABLE = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\ufffe\uffff]|\p{Surrogate}/u;

export interface Reading {
  /** Plain data; undefined when nothing could be read. */
  tree: unknown;
  positions: Positions;
  problems: Problem[];
}

/** Never throws: what is wrong with the text is in `problems`. */
export function read(text: string): Reading {
  const source = text.startsWith('\ufeff') ? text.slice(1) : text;
  const positions = new Positions(source);
  const failed = (problem: Problem): Reading => ({ tree: undefined, positions, problems: [problem] });
  const bytes = source.length > LIMITS.bytes ? source.length : new TextEncoder().encode(source).length;
  if (bytes > LIMITS.bytes) {
    return failed(
      problemAt(
        'too-large',
        'The file is larger than 1 MiB (1,048,576 bytes), the most that is read. Shorten it.',
      ),
    );
  }
  let events: Event[];
  try {
    // The parser's own limit only keeps its recursion short; ours is exact, and counts aliases too.
    events = parseEvents(source, { maxDepth: LIMITS.depth + 2 });
  } catch (error) {
    const known = error instanceof YAMLException ? error : null;
    const position = positions.at(known?.mark?.position ?? 0);
    if (known && /maxDepth/.test(known.reason)) return failed({ ...tooDeep(''), position });
    return failed({ ...problemAt('syntax', syntaxMessage(known?.reason ?? '')), position });
  }
  const builder = new TreeBuilder(source, events, positions);
  try {
    const tree = builder.document();
    return { tree, positions, problems: builder.problems };
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error;
    return { tree: undefined, positions, problems: [...builder.problems, ...error.problems] };
  }
}

function problemAt(code: string, message: string, path = ''): Problem {
  return { level: 'error', code, path, message };
}

function tooDeep(path: string): Problem {
  return problemAt(
    'too-deep',
    `Lists and keys are nested more than ${LIMITS.depth} deep here, which no spec needs. Flatten them.`,
    path,
  );
}

interface Built {
  value: unknown;
  /** Nodes in it, aliases counted as what they stand for. */
  size: number;
  height: number;
}

const NOTHING: Built = { value: null, size: 1, height: 0 };

class TreeBuilder {
  readonly problems: Problem[] = [];
  readonly #source: string;
  readonly #events: readonly Event[];
  readonly #positions: Positions;
  /** null while the anchored node is still being read. */
  readonly #anchors = new Map<string, Built | null>();
  #next = 0;
  #nodes = 0;

  constructor(source: string, events: readonly Event[], positions: Positions) {
    this.#source = source;
    this.#events = events;
    this.#positions = positions;
  }

  document(): unknown {
    const first = this.#take();
    if (!first || this.#peek()?.type === EVENT_ID.POP) {
      throw new ProblemError([
        problemAt('empty', 'The file is empty. `samplecase new` writes a spec to start from.'),
      ]);
    }
    const { value } = this.#node([], null);
    this.#take();
    const second = this.#peek();
    if (second) {
      const next = this.#events[this.#next + 1];
      const offset = (next && startOf(next)) ?? this.#source.length;
      this.#report(
        'several-documents',
        'A second document begins here (after ---). A file holds one spec: remove the rest.',
        [],
        offset,
      );
    }
    return value;
  }

  #peek(): Event | undefined {
    return this.#events[this.#next];
  }

  #take(): Event | undefined {
    return this.#events[this.#next++];
  }

  /** The node that begins at the next event. `key` is the offset of the key it belongs to. */
  #node(path: Segments, key: number | null): Built {
    const event = this.#take();
    if (!event) return NOTHING;
    const start = startOf(event) ?? key ?? this.#source.length;
    this.#positions.add(
      formatPath(path),
      key,
      start,
      event.type === EVENT_ID.SEQUENCE || event.type === EVENT_ID.MAPPING,
    );
    if (event.type === EVENT_ID.ALIAS)
      return this.#alias(this.#source.slice(event.anchorStart, event.anchorEnd), path, start);
    if (event.type === EVENT_ID.DOCUMENT || event.type === EVENT_ID.POP) return NOTHING;
    if (path.length > LIMITS.depth) throw new ProblemError([this.#at(tooDeep(formatPath(path)), start)]);
    this.#spend(1, path, start);
    if (event.tagStart >= 0) {
      const tag = this.#source.slice(event.tagStart, event.tagEnd);
      this.#report(
        'tag',
        `The tag ${shown(tag)} is not read. Remove it; numbers and texts are told apart without tags.`,
        path,
        start,
      );
    }
    const anchor = event.anchorStart >= 0 ? this.#source.slice(event.anchorStart, event.anchorEnd) : null;
    if (anchor !== null) this.#anchors.set(anchor, null);
    const built = this.#content(event, path, start);
    if (anchor !== null) this.#anchors.set(anchor, built);
    return built;
  }

  #content(event: Event, path: Segments, start: number): Built {
    if (event.type === EVENT_ID.SEQUENCE) return this.#sequence(path);
    if (event.type === EVENT_ID.MAPPING) return this.#mapping(path);
    return { value: this.#scalar(event as ScalarEvent, path, start), size: 1, height: 0 };
  }

  #sequence(path: Segments): Built {
    const value: unknown[] = [];
    let size = 1;
    let height = 0;
    while (this.#peek()?.type !== EVENT_ID.POP) {
      const item = this.#node([...path, value.length], null);
      value.push(item.value);
      size += item.size;
      height = Math.max(height, item.height);
    }
    this.#take();
    return { value, size, height: height + 1 };
  }

  #mapping(path: Segments): Built {
    const value: Record<string, unknown> = {};
    const seen = new Map<string, number>();
    let size = 1;
    let height = 0;
    while (this.#peek()?.type !== EVENT_ID.POP) {
      const keyStart = startOf(this.#peek()) ?? this.#source.length;
      const key = this.#key(path, keyStart);
      const first = key === null ? undefined : seen.get(key);
      if (key === null || first !== undefined) {
        // What is dropped is still read through, so that what follows is checked too.
        this.#node([...path, key ?? '?'], keyStart);
        if (key !== null && first !== undefined) this.#duplicate(path, key, first, keyStart);
        continue;
      }
      seen.set(key, keyStart);
      const item = this.#node([...path, key], keyStart);
      if (!FORBIDDEN_KEYS.has(key)) value[key] = item.value;
      size += item.size;
      height = Math.max(height, item.height);
    }
    this.#take();
    return { value, size, height: height + 1 };
  }

  /** The key at the next event; null, with the problem reported, when it cannot be one. */
  #key(path: Segments, start: number): string | null {
    const event = this.#peek();
    if (event?.type !== EVENT_ID.SCALAR) {
      this.#node([...path, '?'], null);
      this.#report(
        'key-not-text',
        'A key must be a word followed by a colon, not a list, a mapping or an alias.',
        path,
        start,
      );
      return null;
    }
    this.#take();
    this.#spend(1, path, start);
    const text = getScalarValue(this.#source, event);
    const where = [...path, text];
    if (event.tagStart >= 0 || event.anchorStart >= 0) {
      this.#report(
        'tag',
        `The key ${shown(text)} has a tag or an anchor, which keys may not have. Remove it.`,
        where,
        start,
      );
    }
    if (event.style === SCALAR_STYLE.PLAIN && typeof resolvePlain(text) !== 'string') {
      this.#report(
        'key-not-text',
        `The key ${shown(text)} is not a word. Keys are words, such as title.`,
        path,
        start,
      );
      return null;
    }
    if (FORBIDDEN_KEYS.has(text)) {
      this.#report(
        'forbidden-key',
        `The key ${shown(text)} is not allowed anywhere. Remove it.`,
        where,
        start,
      );
    } else if (text === '<<') {
      this.#report('merge-key', 'Merge keys (<<) are not read. Write the keys out.', where, start);
      return null;
    } else if (UNPRINTABLE.test(text)) {
      this.#report(
        'unprintable',
        `A key holds ${unprintable(text)}, which cannot be printed. Remove it.`,
        path,
        start,
      );
      return null;
    }
    return text;
  }

  #duplicate(path: Segments, key: string, first: number, start: number): void {
    const { line } = this.#positions.at(first);
    this.#report(
      'duplicate-key',
      `The key ${shown(key)} is given twice; the first is on line ${line}. Keep one.`,
      [...path, key],
      start,
    );
  }

  #scalar(event: ScalarEvent, path: Segments, start: number): unknown {
    const text = getScalarValue(this.#source, event);
    const value = event.style === SCALAR_STYLE.PLAIN ? resolvePlain(text) : text;
    if (typeof value === 'number' && !Number.isFinite(value)) {
      this.#report(
        'not-finite',
        `Found ${shown(text)}, but a number must be finite. Write it in digits.`,
        path,
        start,
      );
      return null;
    }
    if (typeof value === 'string' && UNPRINTABLE.test(value)) {
      this.#report(
        'unprintable',
        `The text holds ${unprintable(value)}, which cannot be printed. Remove it.`,
        path,
        start,
      );
    }
    return value;
  }

  #alias(name: string, path: Segments, start: number): Built {
    const target = this.#anchors.get(name);
    if (target) {
      if (path.length + target.height > LIMITS.depth)
        throw new ProblemError([this.#at(tooDeep(formatPath(path)), start)]);
      this.#spend(target.size, path, start);
      return target;
    }
    const why =
      target === null ? 'stands inside what it names' : 'names an anchor that is not defined before it';
    this.#report('alias', `The alias ${shown(`*${name}`)} ${why}. Write the value out.`, path, start);
    return NOTHING;
  }

  /** Counts nodes. An alias counts as all it stands for, so that a few lines cannot become millions. */
  #spend(nodes: number, path: Segments, start: number): void {
    this.#nodes += nodes;
    if (this.#nodes <= LIMITS.nodes) return;
    const message = `The file has more than ${LIMITS.nodes.toLocaleString('en')} values up to here, aliases counted as what they stand for. Shorten it.`;
    throw new ProblemError([this.#at(problemAt('too-many-values', message, formatPath(path)), start)]);
  }

  #report(code: string, message: string, path: Segments, offset: number): void {
    this.problems.push(this.#at(problemAt(code, message, formatPath(path)), offset));
  }

  #at(problem: Problem, offset: number): Problem {
    return { ...problem, position: this.#positions.at(offset) };
  }
}

/** A plain scalar by the rules of YAML 1.2's core schema: null, true or false, a number, otherwise text. */
function resolvePlain(text: string): unknown {
  for (const tag of [nullCoreTag, boolCoreTag, intCoreTag, floatCoreTag]) {
    const value = tag.resolve(text, false, tag.tagName);
    // -0 becomes 0: the two are one number to a reader, and to canonical JSON.
    if (value !== NOT_RESOLVED) return value === 0 ? 0 : value;
  }
  return text;
}

function startOf(event: Event | undefined): number | null {
  if (!event) return null;
  if (event.type === EVENT_ID.SCALAR) {
    if (event.valueStart < 0) return null;
    // The value of a quoted text begins after its quotation mark.
    const isQuoted = event.style === SCALAR_STYLE.SINGLE_QUOTED || event.style === SCALAR_STYLE.DOUBLE_QUOTED;
    return isQuoted ? event.valueStart - 1 : event.valueStart;
  }
  if (event.type === EVENT_ID.SEQUENCE || event.type === EVENT_ID.MAPPING) return event.start;
  return event.type === EVENT_ID.ALIAS ? event.anchorStart - 1 : null;
}

function unprintable(text: string): string {
  return `the character ${shownCharacter(UNPRINTABLE.exec(text)?.[0] ?? '')}`;
}
