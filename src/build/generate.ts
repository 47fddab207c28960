/** Makes src/generated/ and schema/README.md from schema/, templates/ and src/methods/. Run by
 *  `npm run generate`. What does not exist yet is noted on stderr and left out. */

import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { assembleResultSchema, assembleSpecSchema } from './assemble-schema.ts';
import { GENERATED, literal, writeFolder, writeIfChanged } from './generated-file.ts';
import { readSchemaSources } from './schema-sources.ts';
import { writePageStyle, writeReferences } from './write-assets.ts';
import { writeCatalogue, writeNewSpecs, writeSourceKeys, writeVersion } from './write-catalogue.ts';
import { inputsOfMethods, writeInputs } from './write-inputs.ts';
import { writeReference } from './write-reference.ts';
import { writeTemplates } from './write-templates.ts';
import { writeResultTypes, writeSpecTypes } from './write-types.ts';
import { writeValidator, writeValidatorTypes } from './write-validator.ts';

const root = fileURLToPath(new URL('../../', import.meta.url));
const note = (text: string): void => {
  process.stderr.write(`generate: ${text}; left out\n`);
};

const sources = readSchemaSources(root);
const names = [...sources.fragments.keys()];
const spec = assembleSpecSchema(sources);
const result = assembleResultSchema(sources);
const validators = { validateSpec: '#', validateSharedAim: '#/$defs/aim' };
const inputs = inputsOfMethods(spec, names);
const json = (schema: unknown): string => `${JSON.stringify(schema, null, 2)}\n`;

const files = new Map<string, string>([
  ['spec.schema.json', json(spec)],
  [
    'spec-schema.ts',
    [GENERATED, `export const specSchema: { [keyword: string]: unknown } = ${literal(spec)};`, ''].join('\n'),
  ],
  ['spec.ts', await writeSpecTypes(spec, sources.fragments)],
  ['validate-spec.js', await writeValidator(spec, validators, root)],
  ['validate-spec.d.ts', writeValidatorTypes(Object.keys(validators))],
  ['inputs.ts', writeInputs(inputs)],
  ['catalogue.ts', writeCatalogue(root, names, note)],
  ['templates.ts', writeTemplates(root, note)],
  ['new-specs.ts', writeNewSpecs(names, sources.starters, note)],
  ['source-keys.ts', writeSourceKeys(root, note)],
  ['references.ts', writeReferences(root)],
  ['page-style.ts', writePageStyle(root)],
  ['version.ts', writeVersion(root)],
]);
if (result) {
  files.set('result.schema.json', json(result));
  files.set('result.ts', await writeResultTypes(result));
} else {
  note('no schema/result.json');
}
writeFolder(join(root, 'src', 'generated'), files);
writeIfChanged(join(root, 'schema', 'README.md'), writeReference(spec, inputs));
