/** A user's text as Markdown that prints it as typed: in a sentence, at the start of one, in a table cell, in a list.
 *  Exports: escapeMarkdown, shownAsTyped.
 *
 *  Holds for CommonMark, for the tables, strikethrough, footnotes and autolinks of GitHub, and for dollar signs where
 *  they mark mathematics. Only what could be read as markup is escaped, so that prose stays readable. */

const FIRST_STRONG_ISOLATE = '\u2068';
const POP_ISOLATE = '\u2069';
const OPENS_ISOLATE = /[\u2066-\u2068]/;
/** Blocks of right-to-left scripts (Unicode, DerivedBidiClass: R and AL) and the controls of direction. */
const RIGHT_TO_LEFT =
  /[\u0590-\u08ff\ufb1d-\ufdff\ufe70-\ufefc\u{10800}-\u{10fff}\u{1e800}-\u{1efff}\u200e\u200f\u202a-\u202e\u2066-\u2069]/u;

/** Escapes a text. Line breaks are folded to a space each; what cannot be seen or would turn the sentence around it is
 *  shown or contained, as `shownAsTyped` says. */
export function escapeMarkdown(text: string): string {
  const shown = shownAsTyped(text);
  // A lone number would begin a list with the full stop that a sentence puts behind it.
  if (/^\d{1,9}$/.test(shown)) return `&#${shown.charCodeAt(0)};${shown.slice(1)}`;
  return withoutAutolinks(escapedStart(shown.replace(INLINE, escapedInline)));
}

/** The characters that a page shows for a text: white space folded, control characters as pictures (␀), and text from
 *  right to left isolated, so that it cannot reorder what stands around it. */
export function shownAsTyped(text: string): string {
  const folded = text
    .replace(/\p{Surrogate}/gu, '\ufffd')
    .replace(/[ \t\n\v\f\r\u0085\u2028\u2029]+/g, ' ')
    .trim()
    .replace(/\p{Control}/gu, picture);
  return RIGHT_TO_LEFT.test(folded) ? isolated(folded) : folded;
}

function picture(control: string): string {
  const code = control.charCodeAt(0);
  if (code < 0x20) return String.fromCharCode(0x2400 + code);
  return code === 0x7f ? '\u2421' : '\ufffd';
}

/** A text cannot end the isolate it stands in, nor leave one open behind it. */
function isolated(text: string): string {
  let open = 0;
  const balanced = [...text].map((character) => {
    if (OPENS_ISOLATE.test(character)) open += 1;
    if (character !== POP_ISOLATE) return character;
    if (open === 0) return '\ufffd';
    open -= 1;
    return character;
  });
  return `${FIRST_STRONG_ISOLATE}${balanced.join('')}${POP_ISOLATE.repeat(open + 1)}`;
}

/** What may be markup anywhere in a line. `_` inside a word and `<` before a space are not; `&` is before a name. */
const INLINE = /[\\`*[\]|~$]|_+|<(?! )|&(?=#?[a-z0-9]+;)/gi;

function escapedInline(found: string, offset: number, text: string): string {
  if (!found.startsWith('_')) return `\\${found}`;
  const isInsideWord =
    /[\p{L}\p{N}]$/u.test(text.slice(0, offset)) && /^[\p{L}\p{N}]/u.test(text.slice(offset + found.length));
  return isInsideWord ? found : found.replaceAll('_', '\\_');
}

/** Headings, quotations, lists, rules and underlines of headings are only at the start of a line. */
function escapedStart(text: string): string {
  return text.replace(/^(?:[#>=]|[-+](?=[-+ ]|$))/, '\\$&').replace(/^(\d{1,9})([.)])(?= |$)/, '$1\\$2');
}

/** An address in which something is escaped must not become a link, which would show the backslashes. */
function withoutAutolinks(text: string): string {
  return text.replace(/\S+/g, (word) =>
    word.includes('\\') ? word.replace(/:(?=\/\/)|(?<=www)\./gi, '\\$&') : word,
  );
}
