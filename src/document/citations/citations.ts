/** What a document cites, in the order in which it does. Exports: CitationLog. */

import type { CitationStyle, Reference } from '../../spec/study.ts';
import { apa, apaLabel } from './apa.ts';
import { compareKeys, dateOf, filled, sortKey } from './fields.ts';
import type { Style, Work } from './style.ts';
import { vancouver } from './vancouver.ts';

const STYLES: Record<CitationStyle, Style> = { apa, vancouver };

/** `parenthetical` follows a phrase and brings its space: ' (Cohen, 1988)', ' [1]'. `bare` stands inside a parenthesis
 *  of the sentence: 'Cohen, 1988', '[1]'. `narrative` is part of the sentence: 'Cohen (1988)', 'Cohen [1]'. */
export type CitationForm = 'parenthetical' | 'bare' | 'narrative';

/** Cites in one style and remembers what was cited. All text is Markdown. */
export class CitationLog {
  readonly #style: Style;
  readonly #isNumbered: boolean;
  readonly #references: ReadonlyMap<string, Reference>;
  readonly #works = new Map<string, Work>();
  readonly #suffixes: ReadonlyMap<string, string>;

  /** `references` holds every reference that could be cited. Those that share authors and year are told apart by a
   *  letter, whether or not all of them are cited, as the letter is printed before the last citation is known. */
  constructor(style: CitationStyle, references: ReadonlyMap<string, Reference>) {
    this.#style = STYLES[style];
    this.#isNumbered = style === 'vancouver';
    this.#references = references;
    this.#suffixes = suffixesOf(references);
  }

  /** The citation of the keys as text; '' for no keys. @throws {Error} key without a reference: a defect, since a spec
   *  is checked before */
  cite(keys: readonly string[], form: CitationForm): string {
    if (keys.length === 0) return '';
    const works = [...new Set(keys)].map((key) => this.#work(key));
    if (form === 'narrative') return joined(works.map((work) => this.#style.narrative(work)));
    const inText = this.#style.inText(works);
    if (form === 'parenthetical') return ` ${this.#style.enclosed(inText)}`;
    return this.#isNumbered ? this.#style.enclosed(inText) : inText;
  }

  /** Entries of all that was cited, in the order of the style; those of a numbered style bring their numbers. */
  list(): string[] {
    return this.#style.list([...this.#works.values()]);
  }

  #work(key: string): Work {
    const known = this.#works.get(key);
    if (known !== undefined) return known;
    const reference = this.#references.get(key);
    if (reference === undefined) throw new Error(`no reference has the id '${key}'`);
    const work = {
      reference,
      number: this.#works.size + 1,
      suffix: this.#suffixes.get(key) ?? '',
    };
    this.#works.set(key, work);
    return work;
  }
}

function joined(items: readonly string[]): string {
  return items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}

/** 'a', 'b', … by key, in the order of titles, for references that would be cited alike. */
function suffixesOf(references: ReadonlyMap<string, Reference>): Map<string, string> {
  const alike = new Map<string, { key: string; title: string }[]>();
  for (const [key, reference] of references) {
    const label = `${apaLabel(reference, '&')}, ${dateOf(reference)}`;
    const title = sortKey(filled(reference.title) ?? '').replace(/^(?:a|an|the) /, '');
    alike.set(label, [...(alike.get(label) ?? []), { key, title }]);
  }
  const groups = [...alike.values()].filter((group) => group.length > 1);
  return new Map(
    groups.flatMap((group) =>
      group
        .sort((a, b) => compareKeys(a.title, b.title) || compareKeys(a.key, b.key))
        .map(({ key }, index) => [key, letters(index)] as const),
    ),
  );
}

/** 0 → a, 25 → z, 26 → aa. */
function letters(index: number): string {
  const rest = Math.floor(index / 26);
  return `${rest === 0 ? '' : letters(rest - 1)}${String.fromCharCode(97 + (index % 26))}`;
}
