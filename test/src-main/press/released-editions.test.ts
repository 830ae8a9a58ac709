import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { editionFromText } from '../../../shared-core/norms/edition-file.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { pressInto, releaseInto } from '../../../src-main/press/press-files.ts';
import { readBack } from '../../../src-main/press/read-back/read-back.ts';
import { editionFileName } from '../../../src-main/press/released-editions.ts';
import { programVersion } from '../../../src-main/program-version.ts';
import { builtSet } from '../../shared-core/norms/small-projects.ts';
import { sampleProject } from '../../shared-core/pages/sample-norm-set.ts';

const project = sampleProject({ scale: { min: 0, max: 9, step: 1 } }, (sample) => ({
  ...sample,
  release: {
    ...sample.release,
    analyst: 'A. Weir',
    checker: 'J. Lund',
    answers: builtSet(sample).queries.map(({ id }) => ({ query: id, reason: 'A sample.' })),
  },
}));

let folder: string;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'normloom-release-'));
});
afterEach(() => rm(folder, { recursive: true, force: true }));

function withNotes(notes: string): NormProject {
  return { ...project, sheet: { ...project.sheet, notes } };
}

async function problemOf(reply: ReturnType<typeof releaseInto>): Promise<string> {
  const ended = await reply;
  return ended.ok ? 'was done' : ended.problem;
}

describe('an edition file', () => {
  it.each([
    ['1.0', 'edition-1.0.normedition'],
    [' 2 ', 'edition-2.normedition'],
    ['2026/1', 'edition-2026-1.normedition'],
    ['..', 'edition-.normedition'],
  ])('of edition %s is called %s', (edition, name) => {
    expect(editionFileName(edition)).toBe(name);
  });
});

describe('releaseInto', () => {
  it('writes the files of the press and freezes the project, its signatures and every fingerprint beside them', async () => {
    const released = await releaseInto(project, folder);
    if (!released.ok) throw new Error(released.problem);
    const { files, editionFile, readBack: compared } = released.value;
    expect(editionFile).toBe('edition-1.0.normedition');
    expect((await readdir(folder)).sort()).toEqual(files.map(({ file }) => file).sort());
    const text = await readFile(join(folder, editionFile ?? ''), 'utf8');
    const read = editionFromText(text);
    expect(read).toEqual({
      ok: true,
      edition: {
        program: { name: 'Normloom', version: programVersion() },
        edition: '1.0',
        date: '2026-06-01',
        check: builtSet(project).check,
        analyst: 'A. Weir',
        checker: 'J. Lund',
        files: files.slice(0, -1),
        readBack: { cellsCompared: compared.cells, cellsRecomputed: compared.recomputed },
        project,
      },
    });
    expect(files.slice(0, -1).map(({ file }) => file)).toEqual([
      ...['booklet.pdf', 'tables.xlsx', 'tables.csv', 'norm-set.json', 'certificate.json', 'certificate.pdf'],
    ]);
  });

  it('refuses what is not ready, and leaves no folder', async () => {
    const into = join(folder, 'none');
    const unsigned = { ...project, release: { ...project.release, checker: '' } };
    expect(await problemOf(releaseInto(unsigned, into))).toBe(
      'This edition cannot be released yet. Nobody has signed as checker. Name who checked the tables.',
    );
    const bare = { ...project, sheet: { ...project.sheet, cautions: '' } };
    expect(await problemOf(releaseInto(bare, into))).toMatch(/Still open: The cautions are gone\./);
    expect(await readdir(folder)).toEqual([]);
  });

  it('guards its folder: its own files may be written again, others may not', async () => {
    await releaseInto(project, folder);
    const before = await readFile(join(folder, 'booklet.pdf'));
    const same = [await releaseInto(project, folder), await pressInto(project, folder)];
    expect(same.map(({ ok }) => ok)).toEqual([true, true]);
    const others = [
      releaseInto(withNotes('Other.'), folder),
      pressInto(withNotes('Other.'), folder),
      releaseInto({ ...project, release: { ...project.release, edition: '1.1' } }, folder),
    ];
    for (const other of others) {
      expect(await problemOf(other)).toBe(
        'The folder holds the released edition 1.0 (edition-1.0.normedition), and these files are not its own. Nothing ' +
          'was written: raise the number of the edition, or use another folder.',
      );
    }
    expect((await readFile(join(folder, 'booklet.pdf'))).equals(before)).toBe(true);
    await writeFile(join(folder, 'edition-1.0.normedition'), 'half a fi');
    expect(await problemOf(pressInto(project, folder))).toMatch(
      /^The folder holds edition-1\.0\.normedition, which cannot be read/,
    );
  });
});

describe('an edition read back', () => {
  async function readEditionFile(against: NormProject, text: (told: string) => string = (told) => told) {
    await releaseInto(project, folder);
    const bytesOf = (file: string) => readFile(join(folder, file));
    const told = (await bytesOf('edition-1.0.normedition')).toString('utf8');
    const files = [
      { file: 'e', bytes: Buffer.from(text(told)) },
      { file: 'tables.csv', bytes: await bytesOf('tables.csv') },
    ];
    return readBack(files, builtSet(against));
  }

  it('agrees with its project and with the files beside it', async () => {
    const read = await readEditionFile(project);
    expect(read).toMatchObject({ ok: true, value: [{ kind: 'edition', cells: 7, differences: [] }, { kind: 'csv' }] });
  });

  it('tells another project, even where it prints the same, and a file that was changed', async () => {
    const read = await readEditionFile({ ...project, release: { ...project.release, answers: [] } });
    if (!read.ok) throw new Error(read.problem);
    expect(read.value[0]?.differences.map(({ column }) => column)).toContain('SHA-256 of the project');
    const changed = await readEditionFile(project, (told) => told.replace('A. Weir', 'B. Weir'));
    expect(changed.ok ? '' : changed.problem).toMatch(/^e cannot be opened \(The edition file is damaged \(its seal/);
  });
});
