/** Citations by author and year, after the seventh edition of the APA manual (2020; rules from memory). Titles are
 *  printed as given: what is a proper name in them only an author knows. Exports: apa, apaEntry, apaLabel. */

import { verifiedFields } from '../../sources/sources.ts';
import type { Reference } from '../../spec/study.ts';
import { addressOf, appearsIn, compareKeys, dateOf, editionOf, filled, sortKey, stopped } from './fields.ts';
import { type Markup, markdown } from './markup.ts';
import { type Name, namesOf } from './names.ts';
import type { Style, Work } from './style.ts';

const NO_DATE = 'n.d.';
/** All authors are listed up to here; of more, the first 19 and the last. */
const LISTED_AUTHORS = 20;

export const apa: Style = {
  inText(works) {
    const groups = new Map<string, string[]>();
    for (const work of sorted(works)) {
      const label = apaLabel(work.reference, '&');
      groups.set(label, [...(groups.get(label) ?? []), dated(work)]);
    }
    return [...groups].map(([label, dates]) => `${label}, ${dates.join(', ')}`).join('; ');
  },
  enclosed: (inText) => `(${inText})`,
  narrative: (work) => `${apaLabel(work.reference, 'and')} (${dated(work)})`,
  list: (works) => sorted(works).map(({ reference, suffix }) => apaEntry(reference, suffix)),
};

/** The authors as a sentence names them: 'Gatsonis & Sampson', 'Kelley et al.', or the title where there is none. */
export function apaLabel(reference: Reference, and: '&' | 'and', markup: Markup = markdown): string {
  const [first, second, ...others] = namesOf(reference).map(({ family }) => markup.text(family));
  if (first === undefined) {
    const title = markup.text(filled(reference.title) ?? 'Untitled');
    return appearsIn(reference) === 'itself' ? markup.italic(title) : `“${title}”`;
  }
  if (second === undefined) return first;
  return others.length === 0 ? `${first} ${and} ${second}` : `${first} et al.`;
}

/** One entry of the list of references, without what was not verified. */
export function apaEntry(given: Reference, suffix = '', markup: Markup = markdown): string {
  const reference = verifiedFields(given);
  const names = namesOf(reference).map((name) => listedName(name, markup));
  const date = `(${dated({ reference, suffix }, markup)}).`;
  const title = titlePart(reference, markup);
  const opening = names.length === 0 ? `${title} ${date}` : `${stopped(authorList(names))} ${date} ${title}`;
  const address = addressOf(reference);
  const parts = [opening, placePart(reference, markup), address === null ? '' : markup.link(address)];
  return markup.line(parts.filter((part) => part !== '').join(' '));
}

function authorList(names: readonly string[]): string {
  const last = names.at(-1) ?? '';
  if (names.length === 1) return last;
  if (names.length > LISTED_AUTHORS) return `${names.slice(0, LISTED_AUTHORS - 1).join(', ')}, … ${last}`;
  return `${names.slice(0, -1).join(', ')}, & ${last}`;
}

function listedName({ family, initials, particle, generation }: Name, markup: Markup): string {
  const letters = initials.map((initial) => initial.replace(/-/g, '.-').concat('.')).join(' ');
  const given = [letters, markup.text(particle)].filter((part) => part !== '').join(' ');
  return [markup.text(family), given, markup.text(generation)].filter((part) => part !== '').join(', ');
}

function dated({ reference, suffix }: Pick<Work, 'reference' | 'suffix'>, markup: Markup = markdown): string {
  const date = dateOf(reference);
  const isYear = date !== null && /^-?\d+$/.test(date);
  return `${date === null ? NO_DATE : markup.text(date)}${suffix !== '' && !isYear ? '-' : ''}${suffix}`;
}

/** The title with what is said in parentheses and brackets behind it. */
function titlePart(reference: Reference, markup: Markup): string {
  const title = markup.text(filled(reference.title) ?? 'Untitled');
  if (appearsIn(reference) !== 'itself') return stopped(title);
  const edition = editionOf(reference);
  const [number, volume] = [filled(reference.number), filled(reference.volume)];
  const details = [
    edition === null ? null : `${markup.text(edition)} ed.`,
    volume === null ? null : `Vol. ${markup.text(volume)}`,
    number === null ? null : markup.text(number),
  ].filter((detail) => detail !== null);
  const form = FORMS[reference.type];
  return stopped(
    [
      markup.italic(title),
      details.length === 0 ? '' : `(${details.join(', ')})`,
      form === undefined ? '' : `[${form}]`,
    ]
      .filter((part) => part !== '')
      .join(' '),
  );
}

const FORMS: Readonly<Record<string, string>> = {
  dataset: 'Data set',
  software: 'Computer software',
  thesis: 'Thesis',
};

/** Journal, book or publisher, with a full stop at the end; '' where nothing is known. */
function placePart(reference: Reference, markup: Markup): string {
  const container = filled(reference['container-title']);
  const publisher = filled(reference.publisher);
  const authors = namesOf(reference);
  const isOwnPublisher = authors.length === 1 && authors[0]?.family === publisher;
  const published = publisher === null || isOwnPublisher ? '' : stopped(markup.text(publisher));
  if (container === null) return published;
  switch (appearsIn(reference)) {
    case 'journal':
      return stopped(journalPlace(reference, container, markup));
    case 'book':
      return `${stopped(`In ${bookPlace(reference, container, markup)}`)} ${published}`.trim();
    case 'itself':
      return stopped(markup.text(container));
  }
}

function journalPlace(reference: Reference, container: string, markup: Markup): string {
  const [volume, issue] = [filled(reference.volume), filled(reference.issue)];
  const numbered = [
    volume === null ? '' : markup.italic(markup.text(volume)),
    issue === null ? '' : `(${markup.text(issue)})`,
  ].join('');
  return [markup.italic(markup.text(container)), numbered, pages(reference, markup)]
    .filter((part) => part !== '')
    .join(', ');
}

function bookPlace(reference: Reference, container: string, markup: Markup): string {
  const [edition, volume, page] = [editionOf(reference), filled(reference.volume), filled(reference.page)];
  const details = [
    edition === null ? null : `${markup.text(edition)} ed.`,
    volume === null ? null : `Vol. ${markup.text(volume)}`,
    page === null ? null : `${/[-–—,]/.test(page) ? 'pp.' : 'p.'} ${pages(reference, markup)}`,
  ].filter((detail) => detail !== null);
  const title = markup.italic(markup.text(container));
  return details.length === 0 ? title : `${title} (${details.join(', ')})`;
}

/** '516–524'; 'Article e123' where a journal numbers articles, not pages. */
function pages(reference: Reference, markup: Markup): string {
  const page = filled(reference.page);
  const number = filled(reference.number);
  if (page === null) return number === null ? '' : `Article ${markup.text(number)}`;
  if (/^[a-z]+\d+$/i.test(page)) return `Article ${markup.text(page)}`;
  return markup.text(page.replace(/\s*[-–—]+\s*/g, '–'));
}

function sorted(works: readonly Work[]): Work[] {
  const keyOf = (work: Work) => {
    const names = namesOf(work.reference).map(({ family, initials }) => `${family} ${initials.join(' ')}`);
    const who = names.length === 0 ? (filled(work.reference.title) ?? '') : names.join(' ');
    return [sortKey(who), dateOf(work.reference) ?? '', work.suffix, work.number].join('\0');
  };
  return works
    .map((work) => ({ work, key: keyOf(work) }))
    .sort((a, b) => compareKeys(a.key, b.key))
    .map(({ work }) => work);
}
