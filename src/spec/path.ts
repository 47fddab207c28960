/** Paths into a spec as people read them: `aims[0].inputs.added`. */

export type Segments = readonly (string | number)[];

const PLAIN_KEY = /^[A-Za-z_$][\w$-]*$/;

/** `['aims', 0, 'inputs']` → `aims[0].inputs`; a key that is no plain word is quoted in brackets. */
export function formatPath(segments: Segments): string {
  let path = '';
  for (const segment of segments) {
    if (typeof segment === 'number') path += `[${segment}]`;
    else if (!PLAIN_KEY.test(segment)) path += `[${quoted(segment)}]`;
    else path += path === '' ? segment : `.${segment}`;
  }
  return path;
}

/** The way back, up to the first thing that is no path. */
export function parsePath(path: string): Segments {
  const segments: (string | number)[] = [];
  const next = /\[(\d+)\]|\[("(?:[^"\\]|\\.)*")\]|\.?([A-Za-z_$][\w$-]*)/y;
  for (let match = next.exec(path); match; match = next.exec(path)) {
    const [, index, key, word] = match;
    if (index !== undefined) segments.push(Number(index));
    else segments.push(key === undefined ? (word ?? '') : String(JSON.parse(key)));
  }
  return segments;
}

/** As JSON, with marks that reorder a line written as escapes. */
function quoted(key: string): string {
  return JSON.stringify(key).replace(
    /[\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069\u2028\u2029]/g,
    (mark) => `\\u${mark.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
}
