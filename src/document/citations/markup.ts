/** How a citation is written down: in Markdown for a page, or plain for a terminal. */

import { escapeMarkdown, shownAsTyped } from '../markdown/escape.ts';

export interface Markup {
  /** A text of the reference as it prints. */
  text(typed: string): string;
  /** Of marked-up text. */
  italic(text: string): string;
  /** Of an address that `address` checked. */
  link(url: string): string;
  /** The whole entry, which begins a line. */
  line(text: string): string;
}

export const markdown: Markup = {
  // Inside a line a number by itself needs no escaping, which would make volumes hard to read.
  text: (typed) => (/^\d+$/.test(typed) ? typed : escapeMarkdown(typed)),
  italic: (text) => `*${text}*`,
  link: (url) => `<${url}>`,
  line: (text) => text.replace(/^(\d{1,9})\. /, '$1\\. '),
};

export const plain: Markup = {
  text: shownAsTyped,
  italic: (text) => text,
  link: (url) => url,
  line: (text) => text,
};
