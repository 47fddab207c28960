/** How much is read of a file that may come from anywhere. A spec of forty aims has a few thousand nodes; a list of
 *  a thousand references some thirty thousand. */
export const LIMITS = {
  bytes: 1_048_576,
  depth: 64,
  nodes: 100_000,
  /** Characters of a key. */
  keyLength: 200,
  /** Problems put into words; a file with more is mended in rounds. */
  problems: 200,
} as const;
