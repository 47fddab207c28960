import Ajv2020 from 'ajv/dist/2020.js';
import { describe, expect, test } from 'vitest';
import resultSchema from '../schema/result.json' with { type: 'json' };
import { newSpecs, solve } from '../src/index.ts';
import { nestedSpec } from './support/nested-spec.ts';

const validate = new Ajv2020.default({ allErrors: true, allowUnionTypes: true }).compile(resultSchema);

describe('the machine contract', () => {
  test.each(Object.entries(newSpecs))(
    'the result of the starter spec of %s fits its schema',
    (_name, text) => {
      const result = JSON.parse(JSON.stringify(solve(text)));
      validate(result);
      expect(validate.errors).toBeNull();
    },
  );

  test('numbers have all their digits', () => {
    const [aim] = solve(nestedSpec()).aims;
    expect(aim?.power).toBeCloseTo(0.9004737714, 9);
    expect(String(aim?.power).length).toBeGreaterThanOrEqual(16);
    expect(aim?.effect).toMatchObject({ partial_r2: 0.06 });
    expect(Object.keys(aim?.detectable_effect ?? {})).toEqual(expect.arrayContaining(['f2', 'partial_r2']));
  });

  test('with find power, power is at the given number; with find detectable-effect the effect has the target power', () => {
    const [given] = solve(nestedSpec({ find: 'power', evaluable: 180 })).aims;
    const [found] = solve(nestedSpec({ find: 'detectable-effect', evaluable: 180 })).aims;
    expect(given?.sample_size).toEqual({ evaluable: 180, unrounded: null, enrol: 216 });
    const effect = found?.detectable_effect?.partial_r2 ?? 0;
    const [back] = solve(nestedSpec({ find: 'power', evaluable: 180, partialR2: effect })).aims;
    expect(back?.power).toBeCloseTo(0.9, 12);
    expect(given?.power).toBeLessThan(0.9);
  });

  test('the same spec as YAML text, JSON text and object gives the same result, hash included', () => {
    const spec = nestedSpec();
    const result = solve(spec);
    expect(solve(JSON.stringify(spec))).toEqual(result);
    expect(solve(`# a comment\n${JSON.stringify(spec, null, 2)}`)).toEqual(result);
  });
});
