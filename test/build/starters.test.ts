import { describe, expect, it } from 'vitest';
import { methodInputs } from '../../src/generated/inputs.ts';
import { newSpecs } from '../../src/generated/new-specs.ts';
import type { MethodName } from '../../src/generated/spec.ts';
import { parseSpec } from '../../src/spec/parse.ts';

const methods = Object.keys(methodInputs) as MethodName[];

describe.each(methods)('the starter spec of %s', (method) => {
  const text = newSpecs[method];

  it('is there, and valid as it stands', () => {
    const { study, problems } = parseSpec(text);
    expect(problems).toEqual([]);
    expect(study?.aims.map((aim) => aim.method)).toContain(method);
  });

  it('begins with the line that editors read, and the version', () => {
    expect(text.split('\n').slice(0, 2)).toEqual([
      '# yaml-language-server: $schema=SCHEMA_PATH',
      'samplecase: 1',
    ]);
  });

  it('says that it is invented, and states a basis for every assumption', () => {
    expect(text).toMatch(/invented/i);
    const { study } = parseSpec(text);
    const quantities = [
      ...(study?.aims.flatMap((aim) => Object.values(aim.quantities)) ?? []),
      ...(study?.sample.losses.map((loss) => loss.proportion) ?? []),
    ];
    expect(quantities.length).toBeGreaterThan(0);
    expect(quantities.filter(({ basis }) => basis === null).map(({ path }) => path)).toEqual([]);
  });

  it('is complete: documents, losses and references are shown', () => {
    const { study } = parseSpec(text);
    expect(study?.documents.length).toBeGreaterThan(0);
    expect(study?.sample.losses.length).toBeGreaterThan(0);
    expect(study?.references.length).toBeGreaterThan(0);
  });
});
