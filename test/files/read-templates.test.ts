import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { readTemplates } from '../../src/files/read-templates.ts';

let folder = '';

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'samplecase-templates-'));
});

afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe("a user's templates", () => {
  it('are read by their path below the folder, other files left aside', () => {
    mkdirSync(join(folder, 'parts'));
    writeFileSync(join(folder, 'parts', 'losses.hbs'), 'Losses');
    writeFileSync(join(folder, 'top.hbs'), 'Top');
    writeFileSync(join(folder, 'README.md'), 'no template');
    expect(readTemplates(folder)).toEqual({ 'parts/losses': 'Losses', top: 'Top' });
  });

  it('must be there', () => {
    expect(() => readTemplates(folder)).toThrow(`There is no .hbs file in ${folder}.`);
    expect(() => readTemplates(join(folder, 'nowhere'))).toThrow(
      `There is no file ${join(folder, 'nowhere')}.`,
    );
    writeFileSync(join(folder, 'file'), '');
    expect(() => readTemplates(join(folder, 'file'))).toThrow(
      `${join(folder, 'file')} is a file; a folder of templates is needed.`,
    );
  });
});
