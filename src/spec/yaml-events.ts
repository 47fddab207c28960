/** What the YAML parser's events mean, as far as a spec needs it. */

import {
  boolCoreTag,
  EVENT_ID,
  type Event,
  floatCoreTag,
  intCoreTag,
  NOT_RESOLVED,
  nullCoreTag,
  SCALAR_STYLE,
} from 'js-yaml';

/** A plain scalar by the rules of YAML 1.2's core schema: null, true or false, a number, otherwise text. */
export function resolvePlain(text: string): unknown {
  for (const tag of [nullCoreTag, boolCoreTag, intCoreTag, floatCoreTag]) {
    const value = tag.resolve(text, false, tag.tagName);
    // -0 becomes 0: the two are one number to a reader, and to canonical JSON.
    if (value !== NOT_RESOLVED) return value === 0 ? 0 : value;
  }
  return text;
}

/** Offset at which a node begins; null for one that is left out, as after `key:`. */
export function startOf(event: Event | undefined): number | null {
  switch (event?.type) {
    case EVENT_ID.SCALAR: {
      if (event.valueStart < 0) return null;
      // The value of a quoted text begins after its quotation mark.
      const isQuoted =
        event.style === SCALAR_STYLE.SINGLE_QUOTED || event.style === SCALAR_STYLE.DOUBLE_QUOTED;
      return isQuoted ? event.valueStart - 1 : event.valueStart;
    }
    case EVENT_ID.SEQUENCE:
    case EVENT_ID.MAPPING:
      return event.start;
    case EVENT_ID.ALIAS:
      return event.anchorStart - 1;
    default:
      return null;
  }
}
