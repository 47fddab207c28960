/** A spec that is piped in. */

import { decodeText, readDescriptor } from './read-text.ts';

const STANDARD_INPUT = 0;

/** @throws {ProblemError} when it is too large or no UTF-8 text */
export function readStandardInput(): string {
  return decodeText(readDescriptor(STANDARD_INPUT, 'Standard input'), 'Standard input');
}
