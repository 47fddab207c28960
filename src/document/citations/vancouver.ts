/** Citations numbered by first use, after the recommendations of the ICMJE and Citing Medicine (rules from memory).
 *  Journals keep their full names. Exports: vancouver, vancouverEntry. */

import { verifiedFields } from '../../sources/sources.ts';
import type { Reference } from '../../spec/study.ts';
import { apaLabel } from './apa.ts';
import { addressOf, appearsIn, dateOf, editionOf, filled, stopped } from './fields.ts';
import { type Markup, markdown } from './markup.ts';
import { type Name, namesOf } from './names.ts';
import type { Style } from './style.ts';

/** Of more authors, the first six are listed. */
const LISTED_AUTHORS = 6;
const LISTED_INITIALS = 2;

export const vancouver: Style = {
  inText: (works) => ranges(works.map(({ number }) => number)),
  enclosed: (inText) => `[${inText}]`,
  narrative: (work) => `${apaLabel(work.reference, 'and')} [${work.number}]`,
  list: (works) =>
    [...works]
      .sort((a, b) => a.number - b.number)
      .map(({ number, reference }) => `${number}. ${vancouverEntry(reference)}`),
};

/** '1–3,5,7,8': three numbers or more in a row become a range. */
function ranges(numbers: readonly number[]): string {
  const runs: number[][] = [];
  for (const number of [...new Set(numbers)].sort((a, b) => a - b)) {
    const run = runs.at(-1);
    if (run !== undefined && run.at(-1) === number - 1) run.push(number);
    else runs.push([number]);
  }
  return runs.map((run) => (run.length > 2 ? `${run[0]}–${run.at(-1)}` : run.join(','))).join(',');
}

/** One entry of the list of references, without its number and without what was not verified. */
export function vancouverEntry(given: Reference, markup: Markup = markdown): string {
  const reference = verifiedFields(given);
  const names = namesOf(reference).map((name) => listedName(name, markup));
  const listed = names.length > LISTED_AUTHORS ? [...names.slice(0, LISTED_AUTHORS), 'et al.'] : names;
  const address = addressOf(reference);
  const parts = [
    listed.length === 0 ? '' : stopped(listed.join(', ')),
    titlePart(reference, markup),
    placePart(reference, markup),
    address === null ? '' : `${isOnline(reference) ? 'Available from: ' : ''}${markup.link(address)}`,
  ];
  return markup.line(parts.filter((part) => part !== '').join(' '));
}

function listedName({ family, initials, particle, generation }: Name, markup: Markup): string {
  const letters = initials.join('').replace(/-/g, '').slice(0, LISTED_INITIALS);
  const suffix = generation.replace(/\.$/, '');
  return [markup.text(family), letters, markup.text(particle), markup.text(suffix)]
    .filter((part) => part !== '')
    .join(' ');
}

function isOnline({ type, DOI }: Reference): boolean {
  return DOI === undefined && ['webpage', 'post', 'post-weblog', 'dataset', 'software'].includes(type);
}

function titlePart(reference: Reference, markup: Markup): string {
  const title = markup.text(filled(reference.title) ?? 'Untitled');
  const form = {
    dataset: ' [dataset]',
    software: ' [software]',
    thesis: ' [thesis]',
    webpage: ' [Internet]',
  };
  return stopped(`${title}${form[reference.type as keyof typeof form] ?? ''}`);
}

function placePart(reference: Reference, markup: Markup): string {
  const date = dateOf(reference);
  const year = date === null ? '[date unknown]' : markup.text(date);
  const container = filled(reference['container-title']);
  if (container !== null && appearsIn(reference) === 'journal') {
    return `${stopped(markup.text(container))} ${stopped(`${year}${journalPlace(reference, markup)}`)}`;
  }
  const edition = editionOf(reference);
  const [volume, number, page] = [reference.volume, reference.number, reference.page].map(filled);
  const isPart = appearsIn(reference) === 'book';
  return [
    isPart && container !== null ? stopped(`In: ${markup.text(container)}`) : '',
    edition === null ? '' : `${markup.text(edition)} ed.`,
    volume ? stopped(`Vol. ${markup.text(volume)}`) : '',
    number ? stopped(markup.text(number)) : '',
    stopped([publisherOf(reference, markup), year].filter((part) => part !== '').join('; ')),
    isPart && page ? stopped(`p. ${markup.text(shortened(page))}`) : '',
  ]
    .filter((part) => part !== '')
    .join(' ');
}

/** 'Chapel Hill: University of North Carolina' */
function publisherOf(reference: Reference, markup: Markup): string {
  const site = appearsIn(reference) === 'itself' ? reference['container-title'] : undefined;
  return [reference['publisher-place'], reference.publisher ?? site]
    .map(filled)
    .filter((part) => part !== null)
    .map((part) => markup.text(part))
    .join(': ');
}

/** ';106(3):516-24' */
function journalPlace(reference: Reference, markup: Markup): string {
  const [volume, issue] = [filled(reference.volume), filled(reference.issue)];
  const page = filled(reference.page) ?? filled(reference.number);
  const numbered = `${volume === null ? '' : markup.text(volume)}${issue === null ? '' : `(${markup.text(issue)})`}`;
  const paged = page === null ? '' : `:${markup.text(shortened(page))}`;
  return numbered === '' && paged === '' ? '' : `;${numbered}${paged}`;
}

/** '516-524' → '516-24': the last page without the digits that it repeats. */
function shortened(page: string): string {
  const match = /^(\d+)\s*[-–—]+\s*(\d+)$/.exec(page);
  if (match === null) return page.replace(/\s*[–—]+\s*/g, '-');
  const [first = '', last = ''] = match.slice(1);
  if (first.length !== last.length) return `${first}-${last}`;
  const same = [...first].findIndex((digit, index) => digit !== last[index]);
  return same < 0 ? first : `${first}-${last.slice(same)}`;
}
