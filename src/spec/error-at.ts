import type { Problem } from '../problem.ts';
import { formatPath, type Segments } from './path.ts';

/** A problem of level error; its line and column are added where the file is known. */
export function errorAt(code: string, path: Segments, message: string): Problem {
  return { level: 'error', code, path: formatPath(path), message };
}
