import { mkdir, readdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterEach, describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { DeskWork } from '../../../src-main/desk/desk-work.ts';
import { Jobs } from '../../../src-main/desk/jobs.ts';
import { deskAtHand, PLAIN_WORK, READING, type DeskAtHand } from './desk-at-hand.ts';

let hand: DeskAtHand;
afterEach(() => hand.close());

async function press(project: NormProject, name: string): Promise<string> {
  const { job } = await hand.ask('press', { project, name });
  const end = await hand.endOf(job);
  if (end.state !== 'done' || end.result.kind !== 'pressed') throw new Error(JSON.stringify(end));
  return end.result.pressed.folder;
}

describe('jobs', () => {
  it('tell how they ended once', async () => {
    hand = await deskAtHand();
    const { job } = await hand.ask('draw-pages', { project: newProject('x') });
    expect(await hand.endOf(job)).toEqual({
      state: 'done',
      result: { kind: 'drawn', drawn: { pdf: 'JVBERi0=', pages: 1, sections: [], remarks: [] } },
    });
    expect(await hand.problem('job-state', { job })).toMatch(/was collected/);
    const handle = hand.desk.giveHandle(join(hand.folder, 'empty.csv'));
    const tally = await hand.ask('tally-cohort', { handle, reading: READING });
    expect(await hand.endOf(tally.job)).toEqual({
      state: 'failed',
      problem: 'empty.csv holds no scores. Choose another file.',
    });
  });

  it('report their progress, stop when asked, and a late answer changes nothing', async () => {
    let aborted = false;
    const work: DeskWork = {
      ...PLAIN_WORK,
      async press(_request, hooks, signal) {
        hooks.onProgress(7, 'Drawing page 3');
        await new Promise((resolve) => signal.addEventListener('abort', resolve));
        aborted = true;
        hooks.onProgress(0.9, 'late');
        return { ok: false, problem: 'late' };
      },
    };
    hand = await deskAtHand({}, work);
    const { job } = await hand.ask('draw-pages', { project: newProject('x') });
    await wait(5);
    expect(await hand.ask('job-state', { job })).toEqual({ state: 'running', progress: 1, doing: 'Drawing page 3' });
    await hand.ask('cancel-job', { job });
    expect(await hand.ask('job-state', { job })).toEqual({ state: 'cancelled' });
    await hand.desk.close();
    expect(aborted).toBe(true);
  });

  it('that meet a fault of the program end with a sentence', async () => {
    const broken: DeskWork = {
      ...PLAIN_WORK,
      press: () => Promise.reject(new Error('a cell is missing')),
      lookAtCohort: () => Promise.reject(new Error('no reader')),
    };
    hand = await deskAtHand({}, broken);
    const { job } = await hand.ask('draw-pages', { project: newProject('x') });
    const end = await hand.endOf(job);
    expect(end.state === 'failed' && end.problem).toContain('a cell is missing');
    const handle = hand.desk.giveHandle(join(hand.folder, 'a.csv'));
    expect(await hand.problem('look-at-cohort', { handle, reading: null })).toMatch(/fault of its own \(no reader\)/);
    const pressed = await hand.ask('press', { project: newProject('x'), name: 'x' });
    expect((await hand.endOf(pressed.job)).state).toBe('failed');
    expect(await readdir(join(hand.folder, 'projects'))).toEqual([]);
  });

  it('that nobody collects are dropped after a while', async () => {
    hand = await deskAtHand();
    const jobs = new Jobs(20);
    const job = jobs.start(() => Promise.resolve({ ok: false, problem: 'x' }));
    await wait(60);
    expect(jobs.collect(job)).toBeNull();
  });
});

describe('pressed files', () => {
  it('go into a folder named after project and edition; a second press replaces what the first wrote', async () => {
    hand = await deskAtHand();
    const project = newProject('Ostrey Vale');
    const folder = await press(project, 'Spring.normloom');
    expect(folder).toBe(join(hand.folder, 'projects', 'Spring – edition 1.0'));
    expect(await press(project, 'Spring.normloom')).toBe(folder);
    expect((await readdir(folder)).sort()).toEqual(['booklet.pdf', 'tables.csv']);
    expect(await readdir(join(hand.folder, 'projects'))).toEqual(['Spring – edition 1.0']);
    expect(await readFile(join(folder, 'tables.csv'), 'utf8')).toBe('tables.csv of Ostrey Vale');
    const next = { ...project, release: { ...project.release, edition: '2/b' } };
    expect(await press(next, 'Spring')).toBe(join(hand.folder, 'projects', 'Spring – edition 2-b'));
  });

  it('never replace what somebody else wrote or changed', async () => {
    hand = await deskAtHand();
    const project = newProject('Ostrey Vale');
    const first = join(hand.folder, 'projects', 'Spring – edition 1.0');
    await mkdir(first, { recursive: true });
    await writeFile(join(first, 'tables.csv'), 'mine');
    const second = await press(project, 'Spring');
    expect(second).toBe(`${first} (2)`);
    expect(await readFile(join(first, 'tables.csv'), 'utf8')).toBe('mine');
    await writeFile(join(second, 'notes.txt'), 'a note beside them is no hindrance');
    expect(await press(project, 'Spring')).toBe(second);
    await writeFile(join(second, 'tables.csv'), 'changed by hand');
    expect(await press(project, 'Spring')).toBe(`${first} (3)`);
    expect(await readFile(join(second, 'tables.csv'), 'utf8')).toBe('changed by hand');
    // Another project of the same name.
    expect(await press(newProject('Another survey'), 'Spring')).toBe(`${first} (4)`);
  });

  it('are shown where the host can, else named', async () => {
    const shown: string[] = [];
    hand = await deskAtHand({
      showFolder: (folder) => {
        shown.push(folder);
        return Promise.resolve();
      },
    });
    const folder = await press(newProject('x'), 'x');
    expect(await hand.ask('show-pressed', {})).toBeNull();
    expect(shown).toEqual([folder]);
  });
});

describe('about', () => {
  it('tells the file the program was opened with, by a handle', async () => {
    hand = await deskAtHand({ openedWith: '/somewhere/readers.CSV' });
    const about = await hand.ask('about', {});
    expect(about).toMatchObject({ version: '0.0.1', host: 'browser', openedWith: { kind: 'cohort' } });
    expect(JSON.stringify(about.openedWith)).not.toContain('somewhere');
    const project = hand.again({ openedWith: '/somewhere/a.normloom' });
    expect((await project.ask('about', {})).openedWith?.kind).toBe('project');
  });
});
