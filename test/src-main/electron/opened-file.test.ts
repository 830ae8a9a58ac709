import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fileToOpen } from '../../../src-main/electron/opened-file.ts';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'normloom-opened-'));
  mkdirSync(join(folder, 'program'));
  writeFileSync(join(folder, 'grade 4.normloom'), '{}');
  writeFileSync(join(folder, 'scores.csv'), 'score\n1\n');
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe('the file to open', () => {
  it('is found among switches and the program’s own folder, relative to where the user is', () => {
    expect(fileToOpen(['grade 4.normloom'], folder)).toBe(join(folder, 'grade 4.normloom'));
    expect(fileToOpen(['program', '--allow-file-access', join(folder, 'scores.csv'), '--flag'], '/')).toBe(
      join(folder, 'scores.csv'),
    );
  });

  it('is null where none is named or none is there', () => {
    expect(fileToOpen([], folder)).toBeNull();
    expect(fileToOpen(['program', '--scores.csv'], folder)).toBeNull();
    expect(fileToOpen(['absent.normloom'], folder)).toBeNull();
  });
});
