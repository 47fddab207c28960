import { join } from 'node:path';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { describe, expect, it } from 'vitest';
import { assembleSpecSchema } from '../../src/build/assemble-schema.ts';
import type { JsonSchema } from '../../src/build/json-schema.ts';
import { readSchemaSources, type SchemaSources } from '../../src/build/schema-sources.ts';
import { inputsOfMethods } from '../../src/build/write-inputs.ts';

const root = join(import.meta.dirname, '..', '..');
const sources = readSchemaSources(root);

/** A method of another kind, to see that nothing rests on the names of those that exist. */
const INVENTED: JsonSchema = {
  title: 'Invented',
  description: 'An interval of nothing in particular.',
  type: 'object',
  properties: {
    inputs: {
      type: 'object',
      required: ['knots'],
      additionalProperties: false,
      properties: {
        knots: { type: 'integer', minimum: 2, title: 'knots', 'x-symbol': 'q' },
        shape: { enum: ['round', 'square'], default: 'round' },
        is_paired: { type: 'boolean' },
        wear: {
          type: 'object',
          additionalProperties: false,
          required: ['left'],
          properties: {
            left: {
              $ref: '../quantity.json#/$defs/reliability',
              title: 'wear of the left',
              'x-unit': 'outcome',
            },
            right: { $ref: '../quantity.json#/$defs/reliability' },
          },
        },
        effect: {
          type: 'object',
          additionalProperties: false,
          properties: { shift: { $ref: '../quantity.json#/$defs/correlation' } },
          oneOf: [{ title: 'shift', required: ['shift'] }],
        },
      },
    },
    criteria: { $ref: '../spec.json#/$defs/intervalCriteria' },
    find: { enum: ['sample-size', 'width'] },
  },
};

function withFragment(fragment: JsonSchema): SchemaSources {
  return { ...sources, fragments: new Map([...sources.fragments, ['invented', fragment]]) };
}

function changedFragment(change: (properties: Record<string, JsonSchema>) => void): SchemaSources {
  const fragment = structuredClone(INVENTED);
  change(fragment.properties as Record<string, JsonSchema>);
  return withFragment(fragment);
}

function validator(schema: JsonSchema) {
  const annotations = ['x-symbol', 'x-unit', 'x-allowed', 'x-variable', 'x-key'];
  return new Ajv2020({
    discriminator: true,
    allowUnionTypes: true,
    keywords: annotations,
    strict: false,
  }).compile(schema);
}

const aim = {
  id: 'a',
  role: 'primary',
  objective: 'o',
  outcome: { name: 'n', unit: 'u' },
  analysis: 'a',
  method: 'invented',
  inputs: { knots: 2, wear: { left: 1 }, effect: { shift: -0.5 } },
  criteria: { confidence: 0.95, width: 0.2 },
  find: 'width',
};
const spec = (change: object): object => ({
  samplecase: 1,
  study: { title: 't', question: 'q', population: 'p', design: 'd' },
  aims: [{ ...aim, ...change }],
});

describe('the assembled schema', () => {
  it('is valid JSON Schema 2020-12 and refers to nothing outside itself', () => {
    const schema = assembleSpecSchema(sources);
    expect(new Ajv2020({ strict: false }).validateSchema(schema)).toBe(true);
    expect(schema.$schema).toBe('https://json-schema.org/draft/2020-12/schema');
    const references = [...JSON.stringify(schema).matchAll(/"\$ref":"([^"]*)"/g)].map(
      (match) => match[1] ?? '',
    );
    expect(references.length).toBeGreaterThan(10);
    for (const reference of references) {
      expect(reference).toMatch(/^#\/\$defs\//);
      expect(schema.$defs).toHaveProperty([reference.replace('#/$defs/', '')]);
    }
  });

  it('has a closed branch for every fragment', () => {
    const { $defs } = assembleSpecSchema(withFragment(INVENTED)) as { $defs: Record<string, JsonSchema> };
    for (const method of [...sources.fragments.keys(), 'invented']) {
      expect($defs[method]).toMatchObject({
        additionalProperties: false,
        properties: { method: { const: method } },
      });
    }
  });

  it('takes a fragment it has never seen', () => {
    const isValid = validator(assembleSpecSchema(withFragment(INVENTED)));
    expect(isValid(spec({}))).toBe(true);
    expect(isValid(spec({ inputs: { knots: 2, wear: { left: 1 } } }))).toBe(false);
    expect(isValid(spec({ inputs: { knots: 2, wear: { left: 1 }, effect: {} } }))).toBe(false);
    expect(isValid(spec({ inputs: { ...aim.inputs, wear: { left: 0 } } }))).toBe(false);
    expect(isValid(spec({ inputs: { ...aim.inputs, more: 1 } }))).toBe(false);
    expect(isValid(spec({ find: 'power' }))).toBe(false);
    expect(isValid(spec({ more: 1 }))).toBe(false);
  });

  it.each<[string, SchemaSources, RegExp]>([
    [
      'no criteria',
      changedFragment((properties) => delete properties.criteria),
      /criteria must be an object/,
    ],
    ['no forms', changedFragment(({ inputs }) => delete effectOf(inputs).oneOf), /needs oneOf/],
    [
      'a form without keys',
      changedFragment(({ inputs }) => Object.assign(effectOf(inputs), { oneOf: [{}] })),
      /needs required keys/,
    ],
    [
      'a name that a definition has',
      { ...sources, fragments: new Map([['study', INVENTED]]) },
      /two definitions are called study/,
    ],
  ])('refuses a fragment with %s', (_, faulty, message) => {
    expect(() => assembleSpecSchema(faulty)).toThrow(message);
  });
});

function effectOf(inputs: JsonSchema = {}): JsonSchema {
  return (inputs.properties as Record<string, JsonSchema>).effect as JsonSchema;
}

describe('the inputs of a method as data', () => {
  const inputs = (from: SchemaSources) => inputsOfMethods(assembleSpecSchema(from), ['invented']).invented;

  it('tell quantities from other inputs, at any depth, with their words, units and ranges', () => {
    const its = inputs(withFragment(INVENTED));
    expect(
      its?.quantities.map(({ key, path, title, unit, kind, inEffect, required }) => ({
        key,
        path,
        title,
        unit,
        kind,
        inEffect,
        required,
      })),
    ).toEqual([
      {
        key: 'left',
        path: ['wear', 'left'],
        title: 'wear of the left',
        unit: 'outcome',
        kind: 'reliability',
        inEffect: false,
        required: true,
      },
      {
        key: 'right',
        path: ['wear', 'right'],
        title: 'right',
        unit: '',
        kind: 'reliability',
        inEffect: false,
        required: false,
      },
      {
        key: 'shift',
        path: ['effect', 'shift'],
        title: 'shift',
        unit: '',
        kind: 'correlation',
        inEffect: true,
        required: false,
      },
    ]);
    expect(its?.quantities[0]?.range).toEqual({
      minimum: 0,
      maximum: 1,
      minimumIncluded: false,
      maximumIncluded: true,
    });
    expect(
      its?.others.map(({ key, kind, default: preset, choices }) => ({ key, kind, preset, choices })),
    ).toEqual([
      { key: 'knots', kind: 'whole-number', preset: null, choices: [] },
      { key: 'shape', kind: 'choice', preset: 'round', choices: ['round', 'square'] },
      { key: 'is_paired', kind: 'switch', preset: null, choices: [] },
    ]);
    expect(its?.forms).toEqual([{ title: 'shift', keys: ['shift'] }]);
    expect(its?.criteria.map(({ key }) => key)).toEqual(['confidence', 'width', 'assurance']);
    expect(its?.finds).toEqual(['sample-size', 'width']);
  });

  it('refuse two quantities of one name', () => {
    const twice = changedFragment(({ inputs: own }) => {
      (own?.properties as Record<string, JsonSchema>).left = { $ref: '../quantity.json#/$defs/real' };
    });
    expect(() => inputs(twice)).toThrow('schema/methods/invented.json: two quantities are called left.');
  });

  it('refuse criteria with neither alpha nor confidence', () => {
    const without = changedFragment((properties) => {
      properties.criteria = { type: 'object', properties: { width: { type: 'number' } } };
    });
    expect(() => inputs(without)).toThrow('criteria need alpha or confidence');
  });
});
