/** What a reference says of place, date and address, as far as both styles need it. */

import type { Reference } from '../../spec/study.ts';

/** A publication of its own prints its title in the place where a part prints what it appeared in. */
export function appearsIn(reference: Reference): 'journal' | 'book' | 'itself' {
  const { type } = reference;
  if (filled(reference['container-title']) === null) return 'itself';
  if (type.startsWith('article')) return 'journal';
  if (type === 'chapter' || type === 'paper-conference' || type.startsWith('entry')) return 'book';
  return 'itself';
}

/** The year, or the date in words; null where there is none. */
export function dateOf({ issued }: Reference): string | null {
  return filled(issued?.literal) ?? filled(issued?.['date-parts']?.[0]?.[0]);
}

/** The text of a field; null where it is missing or blank. */
export function filled(field: string | number | undefined): string | null {
  const text = field === undefined ? '' : String(field).trim();
  return text === '' ? null : text;
}

/** '2nd'; null for the first edition, which is not mentioned. An edition in words stays as typed. */
export function editionOf({ edition }: Reference): string | null {
  const text = filled(edition);
  if (text === null || text === '1') return null;
  if (!/^\d+$/.test(text)) return text.replace(/\s*\b(?:ed\.?|edition)$/i, '');
  const ending = /1[123]$/.test(text) ? 'th' : ({ 1: 'st', 2: 'nd', 3: 'rd' }[text.at(-1) ?? ''] ?? 'th');
  return `${text}${ending}`;
}

/** The address under which the publication is found: its DOI as an address, else its URL; null where neither is one
 *  that a page may link to. */
export function addressOf({ DOI, URL: url }: Reference): string | null {
  const doi = filled(DOI)?.replace(/^(?:https?:\/\/(?:dx\.)?doi\.org\/|doi:\s*)/i, '');
  if (doi !== undefined && /^10\.\d{4,9}\/\S+$/.test(doi)) return `https://doi.org/${encoded(doi)}`;
  const address = filled(url);
  return address !== null && /^https?:\/\/\S+$/i.test(address) ? encoded(address) : null;
}

/** Percent-encodes what would end the address or is not ASCII; what is encoded already stays. */
function encoded(address: string): string {
  return address.replace(/[^\x21-\x7e]|[<>"\\^`{|}]/gu, (character) => percentEncoded(character));
}

function percentEncoded(character: string): string {
  return encodeURIComponent(/\p{Surrogate}/u.test(character) ? '\ufffd' : character);
}

/** Ends a text with a full stop unless it ends with a mark of its own, inside quotes or italics as well. */
export function stopped(text: string): string {
  return /[.?!…][”’"'*\u2069]*$/u.test(text) ? text : `${text}.`;
}

/** Letters without marks and case: the same order on every machine. */
export function sortKey(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').replace(/[’']/g, '').toLowerCase();
}

export function compareKeys(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
