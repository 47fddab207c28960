import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { assembleSpecSchema } from '../../src/build/assemble-schema.ts';
import { literal } from '../../src/build/generated-file.ts';
import { readSchemaSources } from '../../src/build/schema-sources.ts';
import { inputsOfMethods } from '../../src/build/write-inputs.ts';
import { writeReference } from '../../src/build/write-reference.ts';
import { writeSpecTypes } from '../../src/build/write-types.ts';
import { writeValidator } from '../../src/build/write-validator.ts';
import { validSpec } from '../spec/valid-spec.ts';

const root = join(import.meta.dirname, '..', '..');
const sources = readSchemaSources(root);
const schema = assembleSpecSchema(sources);
const inputs = inputsOfMethods(schema, sources.fragments.keys());

describe('what is generated', () => {
  it('schema/README.md is what the schema says now (else: npm run generate)', () => {
    expect(readFileSync(join(root, 'schema', 'README.md'), 'utf8')).toBe(writeReference(schema, inputs));
  });

  it('the reference page names every key of the schema, and no table row is cut by a bar', () => {
    const page = writeReference(schema, inputs);
    for (const { quantities, others, criteria } of Object.values(inputs)) {
      for (const { path } of [...quantities, ...others])
        expect(page).toContain(`\`inputs.${path.join('.')}\``);
      for (const { key } of criteria) expect(page).toContain(`\`criteria.${key}\``);
    }
    for (const row of page.split('\n').filter((line) => line.startsWith('| `'))) {
      expect(row.match(/(?<!\\)\|/g)).toHaveLength(5);
    }
  });

  it('types and validator are the same at every run, and need no import', async () => {
    const parts = { validateSpec: '#' };
    expect(await writeSpecTypes(schema, sources.fragments)).toBe(
      await writeSpecTypes(schema, sources.fragments),
    );
    const validator = await writeValidator(schema, parts, root);
    expect(await writeValidator(schema, parts, root)).toBe(validator);
    // A module from a data URL has no place from which it could import.
    const { validateSpec } = await import(`data:text/javascript,${encodeURIComponent(validator)}`);
    expect(validateSpec(validSpec())).toBe(true);
    expect(validateSpec({ ...validSpec(), samplecase: 2 })).toBe(false);
    expect(validator.includes(root)).toBe(false);
  });

  it('a literal reads back as the value', () => {
    const value = {
      a: [1, 'b"\u2028', null, true],
      'c-d': { e: [{ f: [] }], g: {} },
      h: -Infinity,
      i: Infinity,
      j: 0.1,
    };
    expect(new Function(`return ${literal(value)}`)()).toEqual(value);
  });
});
