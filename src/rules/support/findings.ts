/** A rule speaks once an aim: what it found in several places becomes one finding. */

import type { Finding, Level } from '../rule.ts';

export interface Part {
  path: string;
  level: Level;
  message: string;
}

const LEVELS: readonly Level[] = ['error', 'warning', 'note'];

/** One finding of the gravest level, at the place of the gravest part, its message all parts in that order. */
export function together(aim: string | null, parts: readonly (Part | null)[]): Finding[] {
  const found = parts
    .filter((part) => part !== null)
    .sort((a, b) => LEVELS.indexOf(a.level) - LEVELS.indexOf(b.level));
  const [gravest] = found;
  if (gravest === undefined) return [];
  const { path, level } = gravest;
  return [{ path, aim, level, message: found.map(({ message }) => message).join(' ') }];
}
