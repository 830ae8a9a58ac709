import { readdir, readFile, rm, writeFile, mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { PROJECT_VERSION } from '../../../shared-core/norms/norm-project.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { Drafts } from '../../../src-main/project-file/drafts.ts';
import { projectWithTally } from '../project-file/sample-projects.ts';
import { deskAtHand, type DeskAtHand } from './desk-at-hand.ts';

const draft = 'a-draft-name';
let hand: DeskAtHand;
beforeEach(async () => {
  hand = await deskAtHand();
});
afterEach(() => hand.close());

const projects = (...parts: string[]): string => join(hand.folder, 'projects', ...parts);

describe('projects on the desk', () => {
  it('are saved under a free name, opened again the same, and saved again into the same file', async () => {
    const project = projectWithTally('Ostrey Vale', 4);
    await mkdir(projects(), { recursive: true });
    await writeFile(projects('Spring.normloom'), 'not ours');
    const saved = await hand.ask('save-project', { draft, handle: null, name: 'Spring.normloom', project });
    expect(saved?.file).toBe('Spring (2).normloom');
    expect(projectFromText(await readFile(projects('Spring (2).normloom'), 'utf8'))).toEqual({ ok: true, project });
    expect(await readFile(projects('Spring.normloom'), 'utf8')).toBe('not ours');

    const later = hand.again();
    const [listing] = (await later.ask('list-projects', {})).recent;
    expect(listing).toMatchObject({ file: 'Spring (2).normloom', title: 'Ostrey Vale' });
    const opened = await later.ask('open-project', { handle: listing?.handle ?? '' });
    expect(opened).toMatchObject({ project, file: 'Spring (2).normloom', cohort: null });
    const changed = { ...project, subtitle: 'Form B' };
    const again = { draft: opened.draft, handle: opened.handle, name: 'ignored', project: changed };
    expect(await later.ask('save-project', again)).toMatchObject({
      handle: opened.handle,
      file: 'Spring (2).normloom',
    });
    expect(projectFromText(await readFile(projects('Spring (2).normloom'), 'utf8'))).toEqual({
      ok: true,
      project: changed,
    });
    expect((await readdir(projects())).sort()).toEqual(['Spring (2).normloom', 'Spring.normloom']);
  });

  it('never leave the projects folder, whatever their name', async () => {
    const ask = { draft, handle: null, project: newProject('x') };
    expect((await hand.ask('save-project', { ...ask, name: '../../outside' }))?.file).toBe('-..-outside.normloom');
    expect((await hand.ask('save-project', { ...ask, name: 'nul' }))?.file).toBe('_nul.normloom');
    expect((await hand.ask('save-project', { ...ask, name: '' }))?.file).toBe('Norm project.normloom');
    expect((await readdir(hand.folder)).sort()).toEqual(['assets', 'data', 'projects']);
  });

  it('are not written over a file that another program changed in between', async () => {
    const saved = await hand.ask('save-project', { draft, handle: null, name: 'a', project: newProject('one') });
    const handle = saved?.handle ?? null;
    await writeFile(projects('a.normloom'), projectToText(newProject('by another')));
    const ask = { draft, name: 'a', project: newProject('two') };
    const beside = await hand.ask('save-project', { ...ask, handle });
    expect(beside).toMatchObject({
      file: 'a (2).normloom',
      remark: expect.stringMatching(/^a\.normloom was changed/) as string,
    });
    expect(await readFile(projects('a.normloom'), 'utf8')).toBe(projectToText(newProject('by another')));
    expect(await readFile(projects('a (2).normloom'), 'utf8')).toBe(projectToText(newProject('two')));
    const next = { ...ask, handle: beside?.handle ?? null, project: newProject('three') };
    expect(await hand.ask('save-project', next)).toMatchObject({ file: 'a (2).normloom', remark: null });
    // A file that was taken away is simply made again.
    await rm(projects('a (2).normloom'));
    expect((await hand.ask('save-project', next))?.file).toBe('a (2).normloom');
  });

  it('of a newer program or damaged are refused with a sentence and left alone', async () => {
    const newer = projectToText(newProject('x')).replace(`"version": ${PROJECT_VERSION}`, '"version": 7');
    await writeFile(join(hand.folder, 'newer.normloom'), newer);
    await writeFile(join(hand.folder, 'torn.normloom'), newer.slice(0, 99));
    const open = (name: string): Promise<string> =>
      hand.problem('open-project', { handle: hand.desk.giveHandle(join(hand.folder, name)) });
    expect(await open('newer.normloom')).toMatch(/saved by a newer Normloom \(file version 7/);
    expect(await open('torn.normloom')).toMatch(/damaged/);
    expect(await readFile(join(hand.folder, 'newer.normloom'), 'utf8')).toBe(newer);
    expect((await hand.ask('list-projects', {})).recent).toEqual([]);
  });

  it('keep unknown keys out, of files and of what the page sends', async () => {
    const stranger = { ...newProject('x'), secret: 'of the page', sheet: { ...newProject('x').sheet, path: '/home' } };
    await hand.ask('save-project', { draft, handle: null, name: 'a', project: stranger });
    expect(await readFile(projects('a.normloom'), 'utf8')).toBe(projectToText(newProject('x')));
  });

  it('find their cohort file beside them by name and size', async () => {
    const project = projectWithTally('Ostrey Vale', 1);
    const path = join(hand.folder, 'a.normloom');
    await writeFile(path, projectToText(project));
    await writeFile(join(hand.folder, 'readers.csv'), 'score\n1\n2\n3\n');
    const { cohort } = await hand.ask('open-project', { handle: hand.desk.giveHandle(path) });
    expect((await hand.ask('look-at-cohort', { handle: cohort ?? '', reading: null })).file).toBe('readers.csv');
    await writeFile(join(hand.folder, 'readers.csv'), 'score\n1\n2\n');
    expect((await hand.ask('open-project', { handle: hand.desk.giveHandle(path) })).cohort).toBeNull();
    const source = project.source === null ? null : { ...project.source, file: '../readers.csv', bytes: 10 };
    await mkdir(join(hand.folder, 'below'));
    await writeFile(join(hand.folder, 'below', 'b.normloom'), projectToText({ ...project, source }));
    const below = hand.desk.giveHandle(join(hand.folder, 'below', 'b.normloom'));
    expect((await hand.ask('open-project', { handle: below })).cohort).toBeNull();
  });

  it('that were uploaded or came with the program are copies: saving makes a new file', async () => {
    const text = projectToText(newProject('The sample'));
    await writeFile(join(hand.folder, 'assets', 'sample-cohorts', 'ostrey-vale.normloom'), text);
    const sample = await hand.ask('open-sample', {});
    expect(sample).toMatchObject({ handle: null, file: null, project: newProject('The sample') });
    await writeFile(join(hand.folder, 'upload-7'), text);
    const copy = hand.desk.giveHandle(join(hand.folder, 'upload-7'), { name: 'mine.normloom', standing: 'copy' });
    const uploaded = await hand.ask('open-project', { handle: copy });
    expect(uploaded).toMatchObject({ handle: null, file: 'mine.normloom' });
    expect((await hand.ask('list-projects', {})).recent).toEqual([]);
    const ask = { draft: uploaded.draft, name: 'mine.normloom', project: newProject('Changed') };
    expect((await hand.ask('save-project', { ...ask, handle: copy }))?.file).toBe('mine.normloom');
    expect(await readFile(join(hand.folder, 'upload-7'), 'utf8')).toBe(text);
  });

  it('are saved where the dialog says, and not at all when it was closed', async () => {
    const chosen: (string | null)[] = [join(hand.folder, 'here.normloom'), null, join(hand.folder, 'here')];
    const suggested: string[] = [];
    const window = hand.again({
      dialogs: {
        chooseFile: () => Promise.resolve(join(hand.folder, 'here.normloom')),
        chooseFolder: () => Promise.resolve(null),
        chooseSave: (_kind, path) => {
          suggested.push(path);
          return Promise.resolve(chosen.shift() ?? null);
        },
      },
    });
    const ask = { draft, handle: null, name: 'A: B', project: newProject('x') };
    expect((await window.ask('save-project', ask))?.file).toBe('here.normloom');
    expect(await window.ask('save-project', ask)).toBeNull();
    expect((await window.ask('save-project', ask))?.file).toBe('here (2).normloom');
    expect(suggested[0]).toBe(projects('A- B.normloom'));
    const found = await window.ask('choose-file', { kind: 'project' });
    expect((await window.ask('open-project', { handle: found?.handle ?? '' })).file).toBe('here.normloom');
  });
});

describe('work that was not saved', () => {
  it('comes back after the program died, with its file, and is gone once saved or given up', async () => {
    const saved = await hand.ask('save-project', { draft, handle: null, name: 'a', project: newProject('one') });
    const handle = saved?.handle ?? null;
    await hand.ask('keep-draft', { draft, handle, project: newProject('two') });
    await hand.ask('keep-draft', { draft: 'never-saved', handle: null, project: newProject('new') });

    const later = hand.again();
    const { drafts, problems } = await later.ask('list-projects', {});
    expect(problems).toEqual([]);
    expect(drafts.map(({ title, file }) => [title, file]).sort()).toEqual([
      ['new', ''],
      ['two', 'a.normloom'],
    ]);
    const opened = await later.ask('open-draft', { draft });
    expect(opened).toMatchObject({ draft, project: newProject('two'), file: 'a.normloom' });
    const ask = { draft, handle: opened.handle, name: 'a', project: opened.project };
    expect((await later.ask('save-project', ask))?.file).toBe('a.normloom');
    expect(await later.ask('open-draft', { draft: 'never-saved' })).toMatchObject({ handle: null, file: null });
    await later.ask('forget-draft', { draft: 'never-saved' });
    expect((await later.ask('list-projects', {})).drafts).toEqual([]);
    expect(await readFile(projects('a.normloom'), 'utf8')).toBe(projectToText(newProject('two')));
  });

  it('and was kept while an older state was being saved stays', async () => {
    const drafts = new Drafts(join(hand.folder, 'data'));
    await drafts.keep({ draft, file: null, at: 1, project: newProject('newer') });
    await drafts.forgetSaved(draft, projectToText(newProject('older')));
    expect((await hand.ask('list-projects', {})).drafts.map(({ title }) => title)).toEqual(['newer']);
    await drafts.forgetSaved(draft, projectToText(newProject('newer')));
    expect((await hand.ask('list-projects', {})).drafts).toEqual([]);
  });

  it('is kept when saving fails', async () => {
    await writeFile(join(hand.folder, 'projects'), 'a file where the folder should be');
    const ask = { draft, handle: null, name: 'a', project: newProject('dear work') };
    expect(await hand.problem('save-project', ask)).toMatch(/^The project could not be saved: .*\.$/);
    expect((await hand.ask('list-projects', {})).drafts.map(({ title }) => title)).toEqual(['dear work']);
  });

  it('without its file is offered without one', async () => {
    const saved = await hand.ask('save-project', { draft, handle: null, name: 'a', project: newProject('one') });
    await hand.ask('keep-draft', { draft, handle: saved?.handle ?? null, project: newProject('two') });
    await rm(projects('a.normloom'));
    expect(await hand.again().ask('open-draft', { draft })).toMatchObject({ handle: null, file: null });
  });
});
