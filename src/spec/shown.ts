/** A user's own text inside a message. */

/** Quoted, shortened, and with nothing in it that could steer a terminal or turn the line around. */
export function shown(text: string): string {
  const short = text.length > 60 ? `${text.slice(0, 57)}…` : text;
  return JSON.stringify(short).replace(
    /[\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069\u2028\u2029]|\p{Surrogate}/gu,
    shownCharacter,
  );
}

/** A character by its number: `U+200F`. */
export function shownCharacter(character: string): string {
  return `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`;
}

/** Any value of a spec in a few words. */
export function shownValue(value: unknown): string {
  if (value === null || value === undefined) return 'nothing';
  if (typeof value === 'string') return value === '' ? 'an empty text' : shown(value);
  if (Array.isArray(value)) return value.length === 0 ? 'an empty list' : 'a list';
  if (typeof value === 'object') {
    const keys = Object.keys(value);
    if (keys.length === 0) return 'an empty group of keys';
    return `a group of keys (${keys.slice(0, 4).map(shownKey).join(', ')}${keys.length > 4 ? ', …' : ''})`;
  }
  return String(value);
}

function shownKey(key: string): string {
  return /^[\w$-]{1,40}$/.test(key) ? key : shown(key);
}

/** `a`, `a or b`, `a, b or c`. */
export function listed(items: readonly string[], word: 'and' | 'or'): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} ${word} ${items.at(-1)}`;
}
