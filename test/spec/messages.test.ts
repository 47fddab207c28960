import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { Problem } from '../../src/problem.ts';
import { parseSpec } from '../../src/spec/parse.ts';

/** Each spec in test/messages/ stands beside everything that is said about it, to be read as prose.
 *  `vitest -u` writes what is said now; read it before you keep it. */
const FOLDER = join(import.meta.dirname, '..', 'messages');

const specs = readdirSync(FOLDER).filter((name) => name.endsWith('.yaml'));

describe('everything said about a spec with many faults', () => {
  it.each(specs)('%s is answered as its text file says', async (name) => {
    const { problems, study } = parseSpec(readFileSync(join(FOLDER, name), 'utf8'), { file: name });
    expect(study).toBeNull();
    await expect(problems.map(line).join('\n')).toMatchFileSnapshot(
      join(FOLDER, name.replace('.yaml', '.txt')),
    );
  });

  it.each(specs)(
    '%s gives every problem a line, a path and two plain sentences at most of our own',
    (name) => {
      const { problems } = parseSpec(readFileSync(join(FOLDER, name), 'utf8'), { file: name });
      for (const problem of problems) {
        expect(problem.position, problem.message).toBeDefined();
        expect(problem.message).toMatch(/[.?]$/);
        expect(problem.message).not.toMatch(
          /must NOT|must have required|must match|additional propert|oneOf|undefined|NaN/,
        );
      }
    },
  );
});

function line({ file, position, path, message }: Problem): string {
  return `${file}:${position?.line}:${position?.column}  ${path}\n    ${message}\n`;
}
