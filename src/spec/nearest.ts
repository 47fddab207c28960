/** "Did you mean …?" */

import { distance } from 'fastest-levenshtein';

/** The candidate nearest to a word, if it is near enough for a slip of the pen: at most three edits, and fewer
 *  than half of the letters. Case, hyphens and underscores cost nothing. */
export function nearest(word: string, candidates: readonly string[]): string | null {
  const plain = (text: string): string => text.toLowerCase().replace(/[^a-z0-9]/g, '');
  // A slip is short; a text of a thousand letters is none, and would take long to compare.
  if (word.length > 80) return null;
  let best: { candidate: string; edits: number } | null = null;
  for (const candidate of candidates) {
    const edits = distance(plain(word), plain(candidate));
    const isNear = edits <= 3 && edits * 2 < Math.max(plain(candidate).length, 2);
    if (isNear && (!best || edits < best.edits)) best = { candidate, edits };
  }
  return best?.candidate ?? null;
}
