/** Events of the YAML parser → plain data and the place of every node. What cannot be kept is reported and
 *  dropped, and the rest is read on, so that a file's faults are found together. */

import {
  type AliasEvent,
  EVENT_ID,
  type Event,
  getScalarValue,
  type MappingEvent,
  SCALAR_STYLE,
  type ScalarEvent,
  type SequenceEvent,
} from 'js-yaml';
import { type Problem, ProblemError } from '../problem.ts';
import { errorAt } from './error-at.ts';
import { LIMITS } from './limits.ts';
import type { Segments } from './path.ts';
import { Place, type Positions } from './positions.ts';
import { shown, shownCharacter } from './shown.ts';
import { resolvePlain, startOf } from './yaml-events.ts';

/** Keys through which an object reaches into JavaScript itself. */
const FORBIDDEN_KEYS = new Set(['__proto__', 'constructor', 'prototype']);

/** Control characters (tab and line ends apart), which no document can print, and halves of a surrogate pair. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is looked for
const UNPRINTABLE = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\ufffe\uffff]|\p{Surrogate}/u;

export const TOO_DEEP = `Lists and keys are nested more than ${LIMITS.depth} deep here, which no spec needs. Flatten them.`;

interface Built {
  value: unknown;
  /** Nodes in it, aliases counted as what they stand for. */
  size: number;
  height: number;
}

const NOTHING: Built = { value: null, size: 1, height: 0 };

interface Where {
  parent: Place | null;
  segment: string | number;
  /** Offset of the key; null for an entry of a list. */
  key: number | null;
}

export class TreeBuilder {
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

  /** The one document of the file. @throws {ProblemError} when it is empty or exceeds a limit */
  document(): unknown {
    const first = this.#take();
    if (!first || this.#peek()?.type === EVENT_ID.POP) {
      throw new ProblemError([
        errorAt('empty', [], 'The file is empty. `samplecase new` writes a spec to start from.'),
      ]);
    }
    const { value } = this.#node({ parent: null, segment: '', key: null });
    this.#take();
    if (this.#peek()) {
      const start = startOf(this.#events[this.#next + 1]) ?? this.#source.length;
      const message = 'A second document begins here (after ---). A file holds one spec: remove the rest.';
      this.#report('several-documents', [], start, message);
    }
    return value;
  }

  #peek(): Event | undefined {
    return this.#events[this.#next];
  }

  #take(): Event | undefined {
    return this.#events[this.#next++];
  }

  #node(where: Where): Built {
    const event = this.#take();
    if (!event || event.type === EVENT_ID.DOCUMENT || event.type === EVENT_ID.POP) return NOTHING;
    const isCollection = event.type === EVENT_ID.SEQUENCE || event.type === EVENT_ID.MAPPING;
    const value = startOf(event) ?? where.key ?? this.#source.length;
    const place = new Place({ ...where, value, isCollection });
    this.#positions.root ??= place;
    if (event.type === EVENT_ID.ALIAS) return this.#alias(event, place);
    this.#refuseDepth(place, 0);
    this.#spend(1, place);
    this.#refuseTag(event, place);
    if (event.anchorStart < 0) return this.#content(event, place);
    const anchor = this.#source.slice(event.anchorStart, event.anchorEnd);
    this.#anchors.set(anchor, null);
    const built = this.#content(event, place);
    this.#anchors.set(anchor, built);
    return built;
  }

  #content(event: SequenceEvent | MappingEvent | ScalarEvent, place: Place): Built {
    if (event.type === EVENT_ID.SEQUENCE) return this.#sequence(place);
    if (event.type === EVENT_ID.MAPPING) return this.#mapping(place);
    return { value: this.#scalar(event, place), size: 1, height: 0 };
  }

  #sequence(place: Place): Built {
    const value: unknown[] = [];
    let size = 1;
    let height = 0;
    while (this.#peek()?.type !== EVENT_ID.POP) {
      const item = this.#node({ parent: place, segment: value.length, key: null });
      value.push(item.value);
      size += item.size;
      height = Math.max(height, item.height);
    }
    this.#take();
    return { value, size, height: height + 1 };
  }

  #mapping(place: Place): Built {
    const value: Record<string, unknown> = {};
    const seen = new Map<string, number>();
    let size = 1;
    let height = 0;
    while (this.#peek()?.type !== EVENT_ID.POP) {
      const start = startOf(this.#peek()) ?? this.#source.length;
      const key = this.#key(place, start);
      const first = key === null ? undefined : seen.get(key);
      if (key !== null && first !== undefined) this.#duplicate(place, key, first, start);
      const item = this.#node({ parent: place, segment: key ?? '?', key: start });
      if (key === null || first !== undefined) continue;
      seen.set(key, start);
      if (!FORBIDDEN_KEYS.has(key)) value[key] = item.value;
      size += item.size;
      height = Math.max(height, item.height);
    }
    this.#take();
    return { value, size, height: height + 1 };
  }

  /** The key at the next event; null, with the problem reported, when it cannot be one. */
  #key(place: Place, start: number): string | null {
    const event = this.#peek();
    const refuse = (code: string, message: string): null => {
      this.#report(code, place.path, start, message);
      return null;
    };
    if (event?.type !== EVENT_ID.SCALAR) {
      this.#node({ parent: place, segment: '?', key: null });
      return refuse(
        'key-not-text',
        'A key must be a word followed by a colon, not a list, a mapping or an alias.',
      );
    }
    this.#take();
    this.#spend(1, place);
    const text = getScalarValue(this.#source, event);
    if (event.tagStart >= 0 || event.anchorStart >= 0) {
      refuse('tag', `The key ${shown(text)} has a tag or an anchor, which keys may not have. Remove it.`);
    }
    if (event.style === SCALAR_STYLE.PLAIN && typeof resolvePlain(text) !== 'string') {
      return refuse('key-not-text', `The key ${shown(text)} is not a word. Keys are words, such as title.`);
    }
    if (text === '<<') return refuse('merge-key', 'Merge keys (<<) are not read. Write the keys out.');
    if (UNPRINTABLE.test(text)) {
      return refuse('unprintable', `A key holds ${unprintable(text)}, which cannot be printed. Remove it.`);
    }
    if (text.length > LIMITS.keyLength) {
      return refuse(
        'key-too-long',
        `The key ${shown(text)} has more than ${LIMITS.keyLength} characters. Shorten it.`,
      );
    }
    if (FORBIDDEN_KEYS.has(text)) {
      refuse('forbidden-key', `The key ${shown(text)} is not allowed anywhere. Remove it.`);
    }
    return text;
  }

  #duplicate(place: Place, key: string, first: number, start: number): void {
    const { line } = this.#positions.at(first);
    const message = `The key ${shown(key)} is given twice; the first is on line ${line}. Keep one.`;
    this.#report('duplicate-key', [...place.path, key], start, message);
  }

  #scalar(event: ScalarEvent, place: Place): unknown {
    const text = getScalarValue(this.#source, event);
    const value = event.style === SCALAR_STYLE.PLAIN ? resolvePlain(text) : text;
    if (typeof value === 'number' && !Number.isFinite(value)) {
      const message = `Found ${shown(text)}, but a number must be finite. Write it in digits.`;
      this.#report('not-finite', place.path, place.value, message);
      return null;
    }
    if (typeof value === 'string' && UNPRINTABLE.test(value)) {
      const message = `The text holds ${unprintable(value)}, which cannot be printed. Remove it.`;
      this.#report('unprintable', place.path, place.value, message);
    }
    return value;
  }

  #alias(event: AliasEvent, place: Place): Built {
    const name = this.#source.slice(event.anchorStart, event.anchorEnd);
    const target = this.#anchors.get(name);
    if (target) {
      this.#refuseDepth(place, target.height);
      this.#spend(target.size, place);
      return target;
    }
    const why =
      target === null ? 'stands inside what it names' : 'names an anchor that is not defined before it';
    const message = `The alias ${shown(`*${name}`)} ${why}. Write the value out.`;
    this.#report('alias', place.path, place.value, message);
    return NOTHING;
  }

  #refuseTag(event: SequenceEvent | MappingEvent | ScalarEvent, place: Place): void {
    if (event.tagStart < 0) return;
    const tag = shown(this.#source.slice(event.tagStart, event.tagEnd));
    const message = `The tag ${tag} is not read. Remove it; numbers and texts are told apart without tags.`;
    this.#report('tag', place.path, place.value, message);
  }

  #refuseDepth(place: Place, height: number): void {
    if (place.depth + height <= LIMITS.depth) return;
    this.#stop('too-deep', place, TOO_DEEP);
  }

  /** Counts nodes. An alias counts as all it stands for, so that a few lines cannot become millions. */
  #spend(nodes: number, place: Place): void {
    this.#nodes += nodes;
    if (this.#nodes <= LIMITS.nodes) return;
    const most = LIMITS.nodes.toLocaleString('en');
    this.#stop(
      'too-many-values',
      place,
      `The file has more than ${most} values up to here, aliases counted as what they stand for. Shorten it.`,
    );
  }

  #stop(code: string, place: Place, message: string): never {
    this.#report(code, place.path, place.value, message);
    throw new ProblemError(this.problems.splice(-1));
  }

  #report(code: string, path: Segments, offset: number, message: string): void {
    this.problems.push({ ...errorAt(code, path, message), position: this.#positions.at(offset) });
  }
}

function unprintable(text: string): string {
  return `the character ${shownCharacter(UNPRINTABLE.exec(text)?.[0] ?? '')}`;
}
