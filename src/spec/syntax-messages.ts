/** What the YAML parser complains of, as a sentence that says what to do. */

const SENTENCES: readonly (readonly [RegExp, string])[] = [
  [/tab characters/, 'A tab is used for indentation here. Indent with spaces.'],
  [
    /within a (single|double) quoted scalar/,
    'A quotation mark is opened and not closed before this place. Close it, or double it if it belongs to the text.',
  ],
  [/within a flow collection/, 'A bracket [ or { is opened and not closed before this place. Close it.'],
  [/missed comma/, 'A comma is missing here between two entries in brackets.'],
  [
    /expected the node content/,
    'Two commas follow each other in brackets. Remove one, or put a value between them.',
  ],
  [
    /bad indentation of a mapping entry/,
    'This line cannot be read. Give it the indentation of the keys around it, and put a text in quotes if it contains ": " or begins with a sign such as @, %, & or *.',
  ],
  [
    /indentation of a sequence entry/,
    'This list entry cannot be read. Give every entry of a list the same indentation.',
  ],
  [
    /end of the stream or a document separator|deficient indentation/,
    'This line does not belong to what stands before it. Give it the indentation of the keys or list entries around it.',
  ],
  [
    /expected ':'|multiline key|whitespace character is expected/,
    'A key needs a colon and a space after it, on the same line. Add them, or put the text in quotes.',
  ],
  [
    /escape sequence|hexadecimal/,
    'A backslash in double quotes begins an escape that is not known. Write two backslashes, or use single quotes.',
  ],
  [
    /null byte|non-printable|JSON character/,
    'A character here is not text. Save the file as UTF-8, and remove it.',
  ],
  [
    /directive|document/,
    'Lines that begin with % or that separate documents are not needed here. Remove them.',
  ],
  [/anchor|alias/, 'An anchor (&name) or alias (*name) is incomplete here. Write the value out.'],
];

export function syntaxMessage(reason: string): string {
  const found = SENTENCES.find(([pattern]) => pattern.test(reason));
  return (
    found?.[1] ?? 'This line cannot be read as YAML. Check indentation, quotation marks and brackets near it.'
  );
}
