import { chmod, mkdir, mkdtemp, readdir, readFile, rm, symlink, truncate, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { PROJECT_VERSION } from '../../../shared-core/norms/norm-project.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { diskTrouble } from '../../../src-main/project-file/disk-trouble.ts';
import { Drafts } from '../../../src-main/project-file/drafts.ts';
import { ProjectSaver } from '../../../src-main/project-file/project-saver.ts';
import { MAX_PROJECT_BYTES, readProject } from '../../../src-main/project-file/project-store.ts';
import { fingerprintOf } from '../../../src-main/project-file/stored-text.ts';
import { Recents } from '../../../src-main/project-file/recents.ts';
import { projectWithTally } from './sample-projects.ts';

let folder = '';
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'normloom-files-'));
});
afterEach(() => rm(folder, { recursive: true, force: true }));

const at = (...parts: string[]): string => join(folder, ...parts);

async function problemOf(path: string): Promise<string> {
  const read = await readProject(path);
  if (read.ok) throw new Error('a problem was expected');
  return read.problem;
}

describe('reading a project file', () => {
  it('gives back what was written, with the fingerprint of the bytes', async () => {
    const project = projectWithTally('Ostrey Vale', 3);
    const text = projectToText(project);
    await writeFile(at('a.normloom'), text);
    expect(await readProject(at('a.normloom'))).toEqual({
      ok: true,
      project,
      edition: null,
      fingerprint: fingerprintOf(text),
    });
  });

  it('explains a damaged file, a newer one, a folder, a missing one and one that is too large, and touches none', async () => {
    const text = projectToText(projectWithTally('Ostrey Vale', 3));
    await writeFile(at('half.normloom'), text.slice(0, text.length / 2));
    await writeFile(at('newer.normloom'), text.replace(`"version": ${PROJECT_VERSION}`, '"version": 99'));
    await writeFile(at('latin.normloom'), Buffer.from([0x7b, 0xff, 0xfe, 0x7d]));
    await writeFile(at('large.normloom'), '');
    await truncate(at('large.normloom'), MAX_PROJECT_BYTES + 1);
    await mkdir(at('folder.normloom'));
    expect(await problemOf(at('half.normloom'))).toMatch(/damaged.*broke off.*not touched/);
    expect(await problemOf(at('newer.normloom'))).toMatch(/newer Normloom \(file version 99.*not touched/);
    expect(await problemOf(at('latin.normloom'))).toMatch(/damaged.*UTF-8/);
    expect(await problemOf(at('large.normloom'))).toMatch(/larger than 64 MB/);
    expect(await problemOf(at('folder.normloom'))).toMatch(/not a file/);
    expect(await problemOf(at('none.normloom'))).toMatch(/no longer there/);
    expect(await readFile(at('newer.normloom'), 'utf8')).toBe(
      text.replace(`"version": ${PROJECT_VERSION}`, '"version": 99'),
    );
    expect(await readFile(at('half.normloom'), 'utf8')).toBe(text.slice(0, text.length / 2));
  });

  it('leaves unknown keys behind', async () => {
    await writeFile(at('a.normloom'), projectToText(newProject('x')).replace('{', '{ "stranger": {"a": 1}, '));
    const read = await readProject(at('a.normloom'));
    expect(read.ok && read.project).toEqual(newProject('x'));
  });
});

describe('saving into the user’s folders', () => {
  const saver = (): ProjectSaver => new ProjectSaver(at('data'), Date.now);

  it('never replaces a file it was not given: new files get a free name', async () => {
    await mkdir(at('work'));
    await writeFile(at('work', 'a.normloom'), 'someone else’s');
    expect(await saver().createBeside(at('work'), 'a', '.normloom', 'mine')).toBe(at('work', 'a (2).normloom'));
    expect(await saver().createBeside(at('work'), 'a', '.normloom', 'mine')).toBe(at('work', 'a (3).normloom'));
    expect(await readFile(at('work', 'a.normloom'), 'utf8')).toBe('someone else’s');
    expect(await readdir(at('work'))).toEqual(['a (2).normloom', 'a (3).normloom', 'a.normloom']);
    expect(await readdir(at('data', 'unfinished'))).toEqual([]);
  });

  it('saves through a link to the file it stands for', async () => {
    await writeFile(at('real.normloom'), 'old');
    await symlink(at('real.normloom'), at('link.normloom'));
    await saver().replace(at('link.normloom'), 'new');
    expect(await readFile(at('real.normloom'), 'utf8')).toBe('new');
  });

  it('sweeps only what an interrupted save left, never a file of the user’s that looks like it', async () => {
    await mkdir(at('data', 'unfinished'), { recursive: true });
    const begun = Date.now();
    await writeFile(at('data', 'unfinished', 'note'), `${begun}\n${at('a.normloom')}`);
    await writeFile(at('a.normloom.4123456789'), 'half');
    await writeFile(at('a.normloom.20241231'), 'a backup made by hand, last year');
    await utimes(at('a.normloom.20241231'), new Date(begun - 9e9), new Date(begun - 9e9));
    await writeFile(at('b.normloom.4123456789'), 'of another file');
    await saver().sweep();
    expect((await readdir(folder)).sort()).toEqual(['a.normloom.20241231', 'b.normloom.4123456789', 'data']);
    await saver().sweep();
    expect(await readdir(at('data', 'unfinished'))).toEqual([]);
  });

  it('says what a disk’s refusal means', () => {
    const full = Object.assign(new Error('ENOSPC: no space left'), { code: 'ENOSPC' });
    expect(diskTrouble('a.normloom', 'saved', full)).toBe(
      'a.normloom could not be saved: the disk is full. Make room and try again.',
    );
    expect(diskTrouble('a.normloom', 'saved', new Error('odd'))).toBe('a.normloom could not be saved: odd.');
  });
});

describe('drafts', () => {
  const draft = 'aaaa-bbbb-cccc';

  it('are listed while they differ from their file, newest first, and forgotten when they do not', async () => {
    const drafts = new Drafts(at('data'));
    const project = newProject('First');
    const text = projectToText(project);
    await writeFile(at('a.normloom'), text);
    const file = { path: at('a.normloom'), fingerprint: fingerprintOf(text) };
    await drafts.keep({ draft, file, at: 5, project });
    await drafts.keep({ draft: 'other-one', file, at: 7, project: newProject('Changed') });
    await drafts.keep({ draft: 'without-file', file: null, at: 9, project });
    const found = await new Drafts(at('data')).list();
    expect(found.problems).toEqual([]);
    expect(found.drafts.map((each) => each.draft)).toEqual(['without-file', 'other-one']);
    expect(await readdir(at('data', 'drafts'))).toEqual(['other-one.draft', 'without-file.draft']);
    expect(await drafts.read('other-one')).toEqual({
      ok: true,
      draft: { draft: 'other-one', file, at: 7, project: newProject('Changed') },
    });
  });

  it('that are damaged are put aside and told, those of a newer program stay, and the rest is listed', async () => {
    const drafts = new Drafts(at('data'));
    await drafts.keep({ draft, file: null, at: 1, project: newProject('Good') });
    await writeFile(at('data', 'drafts', 'torn-draft.draft'), '{"format": "normloom-dr');
    await writeFile(
      at('data', 'drafts', 'newer-draft.draft'),
      JSON.stringify({
        format: 'normloom-draft',
        version: 1,
        file: null,
        at: 1,
        project: '{"format":"normloom-project","version":9}',
      }),
    );
    await writeFile(at('data', 'drafts', 'NOT A DRAFT'), 'x');
    for (const round of [1, 2]) {
      const found = await drafts.list();
      expect(
        found.drafts.map((each) => each.draft),
        `round ${round}`,
      ).toEqual([draft]);
      expect(found.problems).toHaveLength(2);
      expect(found.problems[0]).toMatch(/damaged.*put aside as .*torn-draft\.draft/);
      expect(found.problems[1]).toMatch(/newer Normloom/);
    }
    expect(await readdir(at('data', 'drafts-put-aside'))).toEqual(['torn-draft.draft']);
    expect(await readdir(at('data', 'drafts'))).toContain('newer-draft.draft');
  });

  it('keep the order they were asked in, however fast', async () => {
    const drafts = new Drafts(at('data'));
    const keep = (title: string): Promise<void> =>
      drafts.keep({ draft, file: null, at: 1, project: newProject(title) });
    await Promise.all([keep('1'), keep('2'), drafts.forget(draft), keep('3'), keep('4')]);
    const read = await drafts.read(draft);
    expect(read.ok && read.draft.project.title).toBe('4');
    await Promise.all([keep('5'), drafts.forget(draft)]);
    expect((await drafts.list()).drafts).toEqual([]);
  });

  it('refuse a name that is a path', async () => {
    await expect(new Drafts(at('data')).forget('../../aaaaaaaa')).rejects.toThrow(/small letters/);
  });
});

describe('recent projects', () => {
  it('are the last twelve, last used first; missing files are not shown but keep their place', async () => {
    const recents = new Recents(at('data'), 'projects');
    for (let number = 0; number < 14; number += 1) {
      await writeFile(at(`${number}.normloom`), 'x');
      await recents.add(at(`${number}.normloom`), `Title ${number}`);
    }
    await recents.add(at('5.normloom'), 'Title 5, changed');
    await rm(at('13.normloom'));
    const titles = async (): Promise<string[]> => (await recents.list()).map(({ title }) => title);
    expect(await titles()).toEqual(['Title 5, changed', ...[12, 11, 10, 9, 8, 7, 6, 4, 3, 2].map((n) => `Title ${n}`)]);
    await writeFile(at('13.normloom'), 'x');
    expect((await titles())[1]).toBe('Title 13');
  });

  it('count as none when their list is damaged, and can be added to again', async () => {
    await mkdir(at('data'));
    await writeFile(at('data', 'recent-projects.json'), '{"projects": 3');
    const recents = new Recents(at('data'), 'projects');
    expect(await recents.list()).toEqual([]);
    await writeFile(at('a.normloom'), 'x');
    await chmod(at('a.normloom'), 0o600);
    await recents.add(at('a.normloom'), 'A');
    expect((await recents.list()).map(({ path }) => path)).toEqual([at('a.normloom')]);
  });
});
