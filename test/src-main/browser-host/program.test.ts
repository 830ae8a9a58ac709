import { chmod, mkdir, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { JobState } from '../../../shared-core/desk.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { fingerprintOf } from '../../../src-main/project-file/stored-text.ts';
import { projectWithTally } from '../project-file/sample-projects.ts';
import { buildHost, runHost, type Environment, type RunningHost } from './built-host.ts';

const PEOPLE = 200_000;
let program = '';
let folder = '';
let environment: Environment = {};

beforeAll(async () => {
  program = await buildHost();
  folder = await mkdtemp(join(tmpdir(), 'normloom-host-'));
  environment = {
    NORMLOOM_DATA: join(folder, 'data'),
    NORMLOOM_FOLDER: join(folder, 'projects'),
    TMPDIR: join(folder, 'temporary'),
    DISPLAY: undefined,
    WAYLAND_DISPLAY: undefined,
  };
  await mkdir(join(folder, 'temporary'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

const start = (words: readonly string[] = ['--no-window'], more: Environment = {}): Promise<RunningHost> =>
  runHost(program, words, { ...environment, ...more });

/** The first state of a job that `enough` accepts. */
async function stateOf(host: RunningHost, job: string, enough: (state: JobState) => boolean): Promise<JobState> {
  for (;;) {
    const state = await host.ask('job-state', { job });
    if (enough(state)) return state;
    await wait(2);
  }
}

describe('a kill of the whole program in the midst of reading a cohort', () => {
  const rows = Array.from({ length: PEOPLE }, (_, row) => `${row},${(row * 7) % 41},${'ABC'[row % 3]}`);
  const cohort = `id,score,form\n${rows.join('\n')}\n`;
  const saved = projectWithTally('Saved', 5);
  const unsaved = { ...saved, subtitle: 'Not yet saved' };

  it.each([0, 0.2, 0.6])('at %d of the file loses nothing', async (moment) => {
    await rm(join(folder, 'data'), { recursive: true, force: true });
    await rm(join(folder, 'projects'), { recursive: true, force: true });
    const host = await start();
    await host.enter();
    const ask = { draft: 'work-in-progress', name: 'Spring', project: saved };
    const file = await host.ask('save-project', { ...ask, handle: null });
    await host.ask('keep-draft', { draft: ask.draft, handle: file?.handle ?? null, project: unsaved });
    const handle = await host.upload('readers.csv', cohort);
    const { reading } = await host.ask('look-at-cohort', { handle, reading: null });
    const { job } = await host.ask('tally-cohort', { handle, reading });
    const far = (state: JobState): boolean => state.state !== 'running' || state.progress >= moment;
    const state = await stateOf(host, job, far);
    expect(state.state).toBe('running');
    host.child.kill('SIGKILL');
    await host.ended;

    const again = await start();
    await again.enter();
    const { drafts, recent, problems } = await again.ask('list-projects', {});
    expect(problems).toEqual([]);
    expect(recent.map((each) => each.file)).toEqual(['Spring.normloom']);
    expect(drafts).toMatchObject([{ draft: 'work-in-progress', file: 'Spring.normloom', title: 'Saved' }]);
    expect((await again.ask('open-draft', { draft: ask.draft })).project).toEqual(unsaved);
    expect(await readFile(join(folder, 'projects', 'Spring.normloom'), 'utf8')).toBe(projectToText(saved));
    expect(await readdir(join(folder, 'data', 'uploads'))).toEqual([]);

    const next = await again.upload('readers.csv', cohort);
    const tally = await again.ask('tally-cohort', { handle: next, reading });
    const end = await stateOf(again, tally.job, (each) => each.state !== 'running');
    expect(end).toMatchObject({
      state: 'done',
      result: { kind: 'tallied', tallied: { source: { file: 'readers.csv', rowsRead: PEOPLE, rowsKept: PEOPLE } } },
    });
    again.child.kill('SIGTERM');
    expect(await again.ended).toEqual([0, null]);
    expect(await readdir(join(folder, 'data', 'uploads'))).toEqual([]);
  });
});

describe('pressing the sample', () => {
  const name = 'Ostrey Vale';

  it('leaves nothing half-pressed after a kill, and the next press writes every file whole', async () => {
    const projects = join(folder, 'pressed');
    const host = await start(['--no-window', '--folder', projects]);
    await host.enter();
    const { project } = await host.ask('open-sample', {});
    const { job } = await host.ask('press', { project, name });
    await stateOf(host, job, (state) => state.state !== 'running' || state.progress > 0.05);
    host.child.kill('SIGKILL');
    await host.ended;
    const left = await readdir(projects);
    expect(left).toHaveLength(1);
    expect(left[0]).toMatch(/^\.normloom-press-/);

    const again = await start(['--no-window', '--folder', projects]);
    await again.enter();
    await again.ask('list-projects', {});
    expect(await readdir(projects)).toEqual([]);
    const press = await again.ask('press', { project, name });
    const end = await stateOf(again, press.job, (state) => state.state !== 'running');
    if (end.state !== 'done' || end.result.kind !== 'pressed') throw new Error(JSON.stringify(end));
    const { pressed } = end.result;
    expect(await readdir(projects)).toEqual(['Ostrey Vale – edition 1.0']);
    expect(pressed.folder).toBe(join(projects, 'Ostrey Vale – edition 1.0'));
    expect(pressed.files.map(({ file }) => file).sort()).toEqual((await readdir(pressed.folder)).sort());
    for (const { file, sha256 } of pressed.files) {
      expect(fingerprintOf(await readFile(join(pressed.folder, file))), file).toBe(sha256);
    }
    again.child.kill('SIGTERM');
    await again.ended;
  });
});

describe('the program', () => {
  /** Stands in for a browser: notes what it was started with, and stays as long as it is told. */
  async function browser(name: string, stays: number): Promise<{ readonly path: string; readonly notes: string }> {
    const path = join(folder, name);
    const notes = join(folder, `${name}.json`);
    const script = `#!${process.execPath}
require('node:fs').writeFileSync(${JSON.stringify(notes)}, JSON.stringify(process.argv.slice(2)));
setTimeout(() => undefined, ${stays});
`;
    await writeFile(path, script);
    await chmod(path, 0o755);
    return { path, notes };
  }

  const noted = async (notes: string): Promise<readonly string[]> => {
    for (;;) {
      const text = await readFile(notes, 'utf8').catch(() => '');
      if (text !== '') return JSON.parse(text) as readonly string[];
      await wait(20);
    }
  };

  it('opens a window with a profile of its own and ends, profile and all, when the window closes', async () => {
    const { path, notes } = await browser('short-browser', 150);
    const host = await start([], { BROWSER_PATH: path, DISPLAY: ':1' });
    const words = await noted(notes);
    expect(words).toContain(`--app=${host.address}`);
    expect(words.find((word) => word.startsWith(`--user-data-dir=${join(folder, 'temporary')}`))).toBeDefined();
    expect(await host.ended).toEqual([0, null]);
    expect((await readdir(join(folder, 'temporary'))).filter((name) => name.startsWith('normloom-'))).toEqual([]);
  });

  it.each(['SIGINT', 'SIGTERM'] as const)('closes its window on %s and leaves nothing behind', async (signal) => {
    const { path, notes } = await browser(`long-browser-${signal}`, 60_000);
    const host = await start([], { BROWSER_PATH: path, DISPLAY: ':1' });
    await noted(notes);
    host.child.kill(signal);
    expect(await host.ended).toEqual([0, null]);
    expect((await readdir(join(folder, 'temporary'))).filter((name) => name.startsWith('normloom-'))).toEqual([]);
  });

  it('opens with the file it was given, and makes no folder before something is saved', async () => {
    const project = join(folder, 'given.normloom');
    await writeFile(project, projectToText(newProject('Given')));
    const host = await start([project, '--no-window', '--folder', join(folder, 'elsewhere')]);
    await host.enter();
    const about = await host.ask('about', {});
    expect(about).toMatchObject({
      host: 'browser',
      folder: join(folder, 'elsewhere'),
      openedWith: { kind: 'project' },
    });
    const opened = await host.ask('open-project', { handle: about.openedWith?.handle ?? '' });
    expect(opened.project.title).toBe('Given');
    expect(await readdir(folder)).not.toContain('elsewhere');
    host.child.kill('SIGINT');
    await host.ended;
  });
});
