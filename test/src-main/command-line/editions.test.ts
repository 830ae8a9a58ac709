import { createHash } from 'node:crypto';
import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { editionFromText, editionToText, type FrozenEdition } from '../../../shared-core/norms/edition-file.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { projectOf } from '../../shared-core/norms/small-projects.ts';
import { fileForTest, folderForTest, normloom } from './run-normloom.ts';

const FILES = ['booklet.pdf', 'tables.xlsx', 'tables.csv', 'norm-set.json', 'certificate.json', 'certificate.pdf'];
const EDITION = 'edition-1.0.normedition';
const SIGNED = ['--analyst', 'A. Weir', '--checker', 'J. Lund'] as const;

// A run that presses takes its time on a slow machine, and some tests press several times.
vi.setConfig({ testTimeout: 180_000, hookTimeout: 180_000 });

const small = projectOf([10, 12, 20, 14, 9, 8]);
const project: NormProject = {
  ...small,
  release: { ...small.release, date: '2026-06-15', answers: answersFor('documentation', 'small-group:[]') },
};

function answersFor(...queries: readonly string[]): NormProject['release']['answers'] {
  return queries.map((query) => ({ query, reason: 'A class.' }));
}

let home: string;
/** The project file, not signed, and where it was released. */
let source: string;
let folder: string;
let released: string;

beforeAll(() => {
  home = mkdtempSync(join(tmpdir(), 'normloom-editions-'));
  folder = join(home, 'released');
  mkdirSync(folder);
  source = join(home, 'small.normloom');
  writeFileSync(source, projectToText(project));
  const ran = normloom(['release', source, '--into', folder, ...SIGNED]);
  expect([ran.exit, ran.stderr]).toEqual([0, `Edition 1.0 is released and frozen in ${EDITION}.\n`]);
  released = ran.stdout;
});

afterAll(() => rmSync(home, { recursive: true, force: true }));

function frozen(): FrozenEdition {
  const read = editionFromText(readFileSync(join(folder, EDITION), 'utf8'));
  if (!read.ok) throw new Error(read.problem);
  return read.edition;
}

function sha256(path: string): string {
  return createHash('sha256').update(readFileSync(path)).digest('hex');
}

/** Every file of a folder with its SHA-256. */
function bytesIn(place: string): Readonly<Record<string, string>> {
  return Object.fromEntries(
    readdirSync(place)
      .sort()
      .map((file) => [file, sha256(join(place, file))]),
  );
}

describe('release', () => {
  it('writes the files, freezes the signed project with their fingerprints, and leaves the project file as it is', () => {
    expect(readdirSync(folder).sort()).toEqual([...FILES, EDITION].sort());
    expect(released).toBe([...FILES, EDITION].map((file) => `${sha256(join(folder, file))}  ${file}\n`).join(''));
    const edition = frozen();
    expect(edition.files.map(({ file, sha256: told }) => `${told}  ${file}\n`).join('')).toBe(
      released.split('\n').slice(0, -2).join('\n') + '\n',
    );
    expect([edition.analyst, edition.checker]).toEqual(['A. Weir', 'J. Lund']);
    expect(edition.project).toEqual({
      ...project,
      release: { ...project.release, analyst: 'A. Weir', checker: 'J. Lund' },
    });
    expect(readFileSync(source, 'utf8')).toBe(projectToText(project));
  });

  it('says what is missing', () => {
    const into = join(folderForTest(), 'out');
    const unsigned = normloom(['release', source, '--into', into]);
    expect([unsigned.exit, unsigned.stdout]).toEqual([3, '']);
    expect(unsigned.stderr).toBe(
      'normloom: small.normloom: This edition cannot be released yet. Nobody has signed as analyst. Name who ' +
        'prepared the tables. Nobody has signed as checker. Name who checked the tables.\n',
    );
    const alone = normloom(['release', source, '--into', into, '--analyst', 'A. Weir', '--checker', 'a. weir']);
    expect(alone.stderr).toContain('Analyst and checker are the same person.');
    expect(normloom(['release', source, ...SIGNED])).toMatchObject({
      exit: 2,
      stderr: expect.stringContaining('--into FOLDER') as string,
    });
    const again = normloom(['release', join(folder, EDITION), '--into', into]);
    expect([again.exit, again.stderr]).toEqual([3, expect.stringContaining('is a released edition already.')]);
  });

  it('gives the same bytes of every file in any time zone and language, and changes nothing the second time', () => {
    const before = bytesIn(folder);
    const elsewhere = folderForTest();
    const environment = { TZ: 'Pacific/Kiritimati', LANG: 'tr_TR.UTF-8', LC_ALL: 'tr_TR.UTF-8' };
    expect(normloom(['release', source, '--into', elsewhere, ...SIGNED], environment).stdout).toBe(released);
    expect(bytesIn(elsewhere)).toEqual(before);
    expect(normloom(['release', source, '--into', folder, ...SIGNED])).toMatchObject({
      exit: 0,
      stdout: released,
    });
    expect(bytesIn(folder)).toEqual(before);
  });

  it('is never overwritten', () => {
    const before = bytesIn(folder);
    const other = ['release', source, '--into', folder, '--analyst', 'A. Weir', '--checker', 'K. Ames'];
    for (const words of [other, ['press', changed(), '--into', folder]]) {
      const ran = normloom(words);
      expect([ran.exit, ran.stdout]).toEqual([3, '']);
      expect(ran.stderr).toContain('The folder holds the released edition 1.0');
    }
    expect(bytesIn(folder)).toEqual(before);
  });
});

/** The project of an edition 1.1 that prints a decimal, as a file. */
function changed(): string {
  const release = { ...project.release, edition: '1.1' };
  const table = { ...project.table, decimals: 1 } as const;
  return fileForTest('next.normloom', projectToText({ ...project, table, release }));
}

describe('an edition file', () => {
  it('presses to the same bytes as released, in any time zone and language, certificates included', () => {
    const places = [
      ['Asia/Kathmandu', 'ar_EG.UTF-8'],
      ['UTC', 'C'],
    ] as const;
    for (const [zone, language] of places) {
      const elsewhere = folderForTest();
      const ran = normloom(['press', join(folder, EDITION), '--into', elsewhere], {
        TZ: zone,
        LANG: language,
        LC_ALL: language,
      });
      expect(ran).toEqual({
        exit: 0,
        stdout: released.split('\n').slice(0, -2).join('\n') + '\n',
        stderr: 'Edition 1.0: the same bytes as released.\n',
      });
      expect({ ...bytesIn(elsewhere), [EDITION]: sha256(join(folder, EDITION)) }).toEqual(bytesIn(folder));
    }
  });

  it('that pressed otherwise in its day exits 3 and tells which file differs, and how its cells are compared', () => {
    const edition = frozen();
    const files = edition.files.map((file) =>
      file.file.startsWith('certificate') ? { ...file, sha256: 'e'.repeat(64) } : file,
    );
    const old = { ...edition, files, program: { ...edition.program, version: '0.0.9' } };
    const path = fileForTest('old.normedition', editionToText(old));
    const into = folderForTest();
    const ran = normloom(['press', path, '--into', into]);
    expect(ran.exit).toBe(3);
    expect(readdirSync(into).sort()).toEqual(FILES.toSorted());
    expect(ran.stderr).toMatch(
      /^normloom: certificate\.json and certificate\.pdf are not, byte for byte, as released with edition 1\.0, which Normloom 0\.0\.9 pressed; this is Normloom \S+\. Whether a printed cell differs is told by: normloom read-back certificate\.json --against old\.normedition\.\n$/,
    );
    const compared = normloom(['read-back', join(into, 'booklet.pdf'), '--against', path]);
    expect([compared.exit, compared.stderr]).toEqual([0, '']);
  });

  it('stands wherever a project does: read-back, queries, compare, erratum', () => {
    const edition = join(folder, EDITION);
    const all = [...FILES, EDITION].map((file) => join(folder, file));
    const read = normloom(['read-back', ...all, '--against', edition]);
    expect([read.exit, read.stderr]).toEqual([0, '']);
    expect(read.stdout.trimEnd().split('\n').at(-1)).toMatch(
      /^edition-1\.0\.normedition: edition, 12 cells compared, no difference$/,
    );
    expect(normloom(['queries', edition])).toMatchObject({ exit: 0, stderr: 'No query is open.\n' });
    const compared = normloom(['compare', edition, changed()]);
    expect([compared.exit, compared.stderr]).toEqual([0, '']);
    expect(compared.stdout).toContain('ranks are printed: as whole numbers → to one decimal');
    const erratum = normloom(['erratum', edition, changed()]);
    expect(erratum.stdout).toMatch(
      /^Erratum\n\nThis corrects: .*, edition 1\.0 of .*\nCorrected by: .*, edition 1\.1 of /,
    );
  });

  it('whose check this version works out otherwise is compared with a remark', () => {
    const path = fileForTest('old.normedition', editionToText({ ...frozen(), check: '0000-0000' }));
    const ran = normloom(['compare', path, source]);
    expect(ran.exit).toBe(0);
    expect(ran.stderr).toMatch(
      /^old\.normedition was released by Normloom \S+ with check 0000-0000; this version gives/,
    );
  });

  it('that was changed by hand is refused everywhere', () => {
    const text = readFileSync(join(folder, EDITION), 'utf8').replace('A. Weir', 'B. Weir');
    const path = fileForTest('forged.normedition', text);
    const words: readonly (readonly string[])[] = [
      ['press', path, '--into', folderForTest()],
      ['queries', path],
      ['compare', path, source],
      ['read-back', join(folder, 'tables.csv'), '--against', path],
    ];
    for (const each of words) {
      const ran = normloom(each);
      expect([ran.exit, ran.stdout]).toEqual([3, '']);
      expect(ran.stderr).toContain('forged.normedition: The edition file is damaged (its seal does not fit');
    }
  });
});
