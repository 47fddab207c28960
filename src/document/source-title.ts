/** A built-in source as one plain line, for the terminal. */

import { source } from '../sources/sources.ts';
import { apaEntry } from './citations/apa.ts';
import { plain } from './citations/markup.ts';

export function sourceTitle(key: string): string {
  return apaEntry(source(key), '', plain);
}
