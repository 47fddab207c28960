/** One text for one content: canonical JSON (RFC 8785), and its hash, which the documents print. */

import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

/** The package's types say that its function is a property of the import; in Node it is the import. */
const serialise = canonicalize as unknown as (tree: unknown) => string | undefined;

/** Keys sorted, numbers in their shortest form, no white space. The same for YAML and JSON, whatever the order of keys. */
export function canonicalJson(tree: unknown): string {
  const text = serialise(tree);
  if (text === undefined) throw new TypeError('canonicalJson: tree must be JSON data.');
  return text;
}

/** SHA-256 of the canonical JSON, as 64 hexadecimal digits. */
export function specHash(tree: unknown): string {
  return createHash('sha256').update(canonicalJson(tree), 'utf8').digest('hex');
}
