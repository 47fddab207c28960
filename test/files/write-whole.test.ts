import * as fs from 'node:fs';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { writeWhole } from '../../src/files/write-whole.ts';

// Failures that a test run as root cannot cause for real.
vi.mock('node:fs', async (original) => {
  const real = await original<typeof import('node:fs')>();
  return { ...real, renameSync: vi.fn(real.renameSync), fsyncSync: vi.fn(real.fsyncSync) };
});

let folder = '';
const at = (name: string): string => join(folder, name);
const failure = (code: string): Error => Object.assign(new Error(code), { code });

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'samplecase-write-'));
});

afterEach(() => {
  vi.mocked(fs.renameSync).mockReset();
  vi.mocked(fs.fsyncSync).mockReset();
  rmSync(folder, { recursive: true, force: true });
});

describe('writing files whole', () => {
  it('writes new files, makes folders and replaces what is there', () => {
    writeFileSync(at('b.md'), 'old and longer');
    writeWhole([
      { path: at('new/deep/a.md'), content: 'α\n' },
      { path: at('b.md'), content: 'new' },
    ]);
    expect(readFileSync(at('new/deep/a.md'), 'utf8')).toBe('α\n');
    expect(readFileSync(at('b.md'), 'utf8')).toBe('new');
    expect(readdirSync(folder).sort()).toEqual(['b.md', 'new']);
  });

  it('replaces a link and not the file that it leads to', () => {
    writeFileSync(at('elsewhere'), 'kept');
    symlinkSync(at('elsewhere'), at('link'));
    writeWhole([{ path: at('link'), content: 'new' }]);
    expect(readFileSync(at('elsewhere'), 'utf8')).toBe('kept');
    expect(readFileSync(at('link'), 'utf8')).toBe('new');
  });

  it('reaches the disk before the name does', () => {
    writeWhole([{ path: at('a'), content: 'x' }]);
    const [synced] = vi.mocked(fs.fsyncSync).mock.invocationCallOrder;
    const [renamed] = vi.mocked(fs.renameSync).mock.invocationCallOrder;
    expect(synced).toBeLessThan(renamed ?? 0);
  });

  it('writes nothing when there is nothing to write', () => {
    writeWhole([]);
    expect(readdirSync(folder)).toEqual([]);
  });
});

describe('when a file cannot be written', () => {
  it('a folder in its place leaves every other file as it was', () => {
    writeFileSync(at('a'), 'old');
    mkdirSync(at('b'));
    expect(() =>
      writeWhole([
        { path: at('a'), content: 'new' },
        { path: at('b'), content: 'x' },
      ]),
    ).toThrow(`${at('b')} is a folder, so no file can be written there. Nothing was written.`);
    expect(readFileSync(at('a'), 'utf8')).toBe('old');
    expect(readdirSync(folder).sort()).toEqual(['a', 'b']);
  });

  it('a file in the place of its folder leaves every other file as it was', () => {
    writeFileSync(at('a'), 'old');
    writeFileSync(at('file'), '');
    for (const path of [at('file/x.md'), at('file/deeper/x.md')]) {
      expect(() =>
        writeWhole([
          { path: at('a'), content: 'new' },
          { path, content: 'x' },
        ]),
      ).toThrow(
        `${path} cannot be written: a part of its path is a file, not a folder. Nothing was written.`,
      );
    }
    expect(readFileSync(at('a'), 'utf8')).toBe('old');
    expect(readdirSync(folder).sort()).toEqual(['a', 'file']);
  });

  it('a full disk leaves the old file, and no temporary one', () => {
    writeFileSync(at('a'), 'old');
    vi.mocked(fs.fsyncSync).mockImplementationOnce(() => {
      throw failure('ENOSPC');
    });
    expect(() => writeWhole([{ path: at('a'), content: 'new' }])).toThrow(
      `${at('a')} cannot be written: the disk is full. Nothing was written.`,
    );
    expect(readFileSync(at('a'), 'utf8')).toBe('old');
    expect(readdirSync(folder)).toEqual(['a']);
  });

  it('a rename that fails leaves the old file and says what was written before it', () => {
    writeFileSync(at('b'), 'old');
    vi.mocked(fs.renameSync)
      .mockImplementationOnce((from, to) => {
        writeFileSync(to, readFileSync(from));
        rmSync(from);
      })
      .mockImplementationOnce(() => {
        throw failure('EACCES');
      });
    const files = ['a', 'b', 'c'].map((name) => ({ path: at(name), content: 'new' }));
    expect(() => writeWhole(files)).toThrow(
      `${at('b')} may not be written with your permissions. Written before it: ${at('a')}.`,
    );
    expect(readFileSync(at('a'), 'utf8')).toBe('new');
    expect(readFileSync(at('b'), 'utf8')).toBe('old');
    expect(existsSync(at('c'))).toBe(false);
    expect(readdirSync(folder).sort()).toEqual(['a', 'b']);
  });

  it.each([
    ['EROFS', 'the disk is read-only.'],
    ['EDQUOT', 'the disk is full.'],
    ['ENOENT', 'its folder is missing.'],
    ['ENAMETOOLONG', 'its name is too long.'],
    ['EIO', '(EIO).'],
  ])('%s is put into words', (code, words) => {
    vi.mocked(fs.renameSync).mockImplementationOnce(() => {
      throw failure(code);
    });
    expect(() => writeWhole([{ path: at('a'), content: 'x' }])).toThrow(words);
    expect(readdirSync(folder)).toEqual([]);
  });

  it('a name that is too long is refused by the disk itself', () => {
    const path = at('x'.repeat(300));
    expect(() => writeWhole([{ path, content: 'x' }])).toThrow('its name is too long. Nothing was written.');
    expect(readdirSync(folder)).toEqual([]);
  });
});
