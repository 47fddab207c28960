/** Looking into a spec that may not be valid yet: what is missing or of another kind is simply not found. */

export type Group = Readonly<Record<string, unknown>>;

export function isGroup(value: unknown): value is Group {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** One key or entry; undefined when there is none. */
export function childOf(value: unknown, segment: string | number): unknown {
  if (typeof segment === 'number') return Array.isArray(value) ? value[segment] : undefined;
  return isGroup(value) && Object.hasOwn(value, segment) ? value[segment] : undefined;
}

/** What a path leads to; undefined when it leads nowhere. */
export function valueAt(tree: unknown, path: readonly (string | number)[]): unknown {
  return path.reduce(childOf, tree);
}

/** The entries of a list; empty when it is none. */
export function entriesOf(value: unknown): readonly unknown[] {
  return Array.isArray(value) ? value : [];
}
