/** Text (YAML, or JSON, which reads the same way) → plain data with the position of every node. Specs come
 *  from anywhere: size, depth and number of nodes are limited, and whatever a data file has no need of
 *  (tags, merge keys, keys that reach into JavaScript) is refused by name. */

import { type Event, parseEvents, YAMLException } from 'js-yaml';
import { type Problem, ProblemError } from '../problem.ts';
import { errorAt } from './error-at.ts';
import { LIMITS } from './limits.ts';
import { Positions } from './positions.ts';
import { syntaxMessage } from './syntax-messages.ts';
import { TOO_DEEP, TreeBuilder } from './tree-builder.ts';

export interface Reading {
  /** Plain data; undefined when nothing could be read. */
  tree: unknown;
  positions: Positions;
  problems: Problem[];
}

/** Never throws for the sake of the text: what is wrong with it is in `problems`. */
export function read(text: string): Reading {
  const source = text.startsWith('\ufeff') ? text.slice(1) : text;
  if (isTooLarge(source)) {
    const message = 'The file is larger than 1 MiB (1,048,576 bytes), the most that is read. Shorten it.';
    return { tree: undefined, positions: new Positions(''), problems: [errorAt('too-large', [], message)] };
  }
  const positions = new Positions(source);
  const events = parse(source, positions);
  if (!Array.isArray(events)) return { tree: undefined, positions, problems: [events] };
  const builder = new TreeBuilder(source, events, positions);
  try {
    const tree = builder.document();
    return { tree, positions, problems: builder.problems };
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error;
    return { tree: undefined, positions, problems: [...builder.problems, ...error.problems] };
  }
}

/** The events, or why there are none. The parser is not ours: whatever it throws means that it cannot read on. */
function parse(source: string, positions: Positions): Event[] | Problem {
  try {
    // The parser's own limit only keeps its recursion short; that of the builder is exact, and counts aliases.
    return parseEvents(source, { maxDepth: LIMITS.depth + 2 });
  } catch (error) {
    const { reason = '', mark } = error instanceof YAMLException ? error : {};
    const position = positions.at(mark?.position ?? 0);
    if (/maxDepth/.test(reason)) return { ...errorAt('too-deep', [], TOO_DEEP), position };
    return { ...errorAt('syntax', [], syntaxMessage(reason)), position };
  }
}

function isTooLarge(source: string): boolean {
  // A character has at least one byte: a text of a gigabyte need not be encoded to be refused.
  return source.length > LIMITS.bytes || new TextEncoder().encode(source).length > LIMITS.bytes;
}
