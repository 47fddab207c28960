/** Words that a rule looks for in what the author wrote. A mention counts only where its clause does not deny it: "no
 *  outcome is imputed" plans no imputation. */

import type { Aim } from '../../spec/study.ts';

export interface Text {
  path: string;
  text: string;
}

export interface Mention {
  path: string;
  /** The words found, as written. */
  words: string;
  /** The clause they stand in. */
  clause: string;
}

const DENIAL =
  /\b(?:no|not|none|never|without|neither|nor|cannot|avoid\w*|instead of|rather than)\b|n['’]t\b|\bnon-$/i;

/** The first place where the pattern stands undenied. */
export function mention(texts: readonly Text[], pattern: RegExp): Mention | null {
  for (const { path, text } of texts) {
    for (const clause of clausesOf(text)) {
      const match = pattern.exec(clause);
      if (match === null || DENIAL.test(clause.slice(0, match.index))) continue;
      return { path, words: match[0], clause };
    }
  }
  return null;
}

/** Sentences, split again at semicolons and before a contrast. */
function clausesOf(text: string): string[] {
  return text
    .replace(/\s+/g, ' ')
    .split(/(?<=[.!?;]) |, (?=but |while |whereas )/)
    .map((clause) => clause.trim());
}

/** What the aim asks and how it will be answered. */
export function purposeOf(aim: Aim): Text[] {
  return [
    { path: `aims[${aim.index}].objective`, text: aim.objective },
    { path: `aims[${aim.index}].analysis`, text: aim.analysis },
  ];
}

/** The reasons given for the aim's numbers. */
export function notesOf(aim: Aim): Text[] {
  return Object.values(aim.quantities).flatMap(({ path, note }) =>
    note === null ? [] : [{ path: `${path}.note`, text: note }],
  );
}

/** Words with a letter or digit in them. */
export function countWords(text: string): number {
  return text.split(/\s+/).filter((word) => /[\p{L}\p{N}]/u.test(word)).length;
}
