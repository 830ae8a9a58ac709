import { mkdir, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { JobState, RosterChoice } from '../../../shared-core/desk.ts';
import { editionFromText } from '../../../shared-core/norms/edition-file.ts';
import { nextEdition } from '../../../shared-core/norms/next-edition.ts';
import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { settledProject } from '../../shared-core/norms/small-projects.ts';
import { deskAtHand, READING, type DeskAtHand } from './desk-at-hand.ts';

const project = { ...settledProject(), title: 'Ostrey Vale' };
const EDITION = 'edition-1.0.normedition';

let hand: DeskAtHand;
beforeEach(async () => {
  hand = await deskAtHand();
});
afterEach(() => hand.close());

const projects = (...parts: string[]): string => join(hand.folder, 'projects', ...parts);

function withNotes(notes: string): NormProject {
  return { ...project, sheet: { ...project.sheet, notes } };
}

function numbered(edition: string, of: NormProject = project): NormProject {
  return { ...of, release: { ...of.release, edition } };
}

async function ended(request: 'press' | 'release', of: NormProject): Promise<JobState> {
  const { job } = await hand.ask(request, { project: of, name: of.title });
  return hand.endOf(job);
}

/** The folder that a press or release ends in, by its name, and the name of its edition file. */
async function done(request: 'press' | 'release', of: NormProject): Promise<readonly [string, string | null]> {
  const state = await ended(request, of);
  if (state.state !== 'done' || state.result.kind !== 'pressed') throw new Error(JSON.stringify(state));
  const { folder, editionFile } = state.result.pressed;
  return [basename(folder), editionFile];
}

async function contents(...folder: readonly string[]): Promise<Readonly<Record<string, string>>> {
  const names = (await readdir(projects(...folder))).sort();
  return Object.fromEntries(
    await Promise.all(names.map(async (name) => [name, await readFile(projects(...folder, name), 'utf8')] as const)),
  );
}

describe('a release', () => {
  it('freezes the edition beside its files, and the same content again changes nothing', async () => {
    const first = 'Ostrey Vale – edition 1.0';
    expect(await done('press', project)).toEqual([first, null]);
    expect(await done('release', project)).toEqual([first, EDITION]);
    const released = await contents(first);
    expect(Object.keys(released)).toEqual(['booklet.pdf', EDITION, 'tables.csv']);
    const read = editionFromText(released[EDITION] ?? '');
    expect(read.ok && read.edition.project).toEqual(project);
    expect(await done('release', project)).toEqual([first, EDITION]);
    expect(await done('press', project)).toEqual([first, null]);
    expect(await contents(first)).toEqual(released);
    expect(await readdir(projects())).toEqual([first]);
  });

  it('is never overwritten: other content under its number is refused, a proof of it goes elsewhere', async () => {
    const [first] = await done('release', project);
    const released = await contents(first);
    const refused = await ended('release', withNotes('Another note.'));
    expect(refused).toEqual({
      state: 'failed',
      problem:
        'Edition 1.0 was released before, with other contents; it lies in “Ostrey Vale – edition 1.0” and was left as ' +
        'it is. Raise the number of this edition, and release it again.',
    });
    // What is not printed is frozen, too: the answer to a query, say.
    const answers = [{ query: 'x', reason: 'y' }];
    expect(await ended('release', { ...project, release: { ...project.release, answers } })).toMatchObject({
      state: 'failed',
    });
    expect((await done('press', withNotes('Another note.')))[0]).toBe(`${first} (2)`);
    expect((await done('press', withNotes('A third note.')))[0]).toBe(`${first} (2)`);
    expect(await contents(first)).toEqual(released);
    expect((await done('release', numbered('1.1', withNotes('Another note.'))))[0]).toBe('Ostrey Vale – edition 1.1');
    expect(await contents(first)).toEqual(released);
    expect((await readdir(projects())).sort()).toEqual([first, `${first} (2)`, 'Ostrey Vale – edition 1.1']);
  });

  it('is made whole again where a file of it was lost, and left alone where one was changed', async () => {
    const [first] = await done('release', project);
    const released = await contents(first);
    await rm(projects(first, 'tables.csv'));
    // The list of pressed files is lost as well, as on another machine.
    await rm(join(hand.folder, 'data', 'pressed.json'));
    expect((await done('release', project))[0]).toBe(first);
    expect(await contents(first)).toEqual(released);
    await writeFile(projects(first, 'tables.csv'), 'changed by hand');
    expect((await done('release', project))[0]).toBe(`${first} (2)`);
    expect(await contents(`${first} (2)`)).toEqual(released);
    expect(await readFile(projects(first, 'tables.csv'), 'utf8')).toBe('changed by hand');
  });

  it('does not meet another survey of the same name, nor a file that only looks like an edition', async () => {
    const [first] = await done('release', project);
    expect((await done('release', { ...project, subtitle: 'Form C' }))[0]).toBe(`${first} (2)`);
    await mkdir(projects('Ostrey Vale – edition 7'));
    await writeFile(projects('Ostrey Vale – edition 7', 'edition-7.normedition'), '{}');
    expect((await done('release', numbered('7')))[0]).toBe('Ostrey Vale – edition 7 (2)');
  });
});

describe('an erratum', () => {
  const after = numbered('1.1', withNotes('Another note.'));

  async function made(roster: RosterChoice | null, write: boolean) {
    const { job } = await hand.ask('make-erratum', { before: project, after, roster, cut: '', write });
    const state = await hand.endOf(job);
    if (state.state !== 'done' || state.result.kind !== 'erratum') throw new Error(JSON.stringify(state));
    return state.result.erratum;
  }

  it('is looked at without leaving anything, and written apart from the releases, people apart from all else', async () => {
    const path = join(hand.folder, 'roster.csv');
    await writeFile(path, 'name,grade,score\nAnn,4,3\nBen,10,x\n');
    const reading = { ...READING, roles: [], decisions: { ...READING.decisions, raggedRow: 'keep-readable' as const } };
    const columns = { score: 'score', person: 'name', by: ['grade'] };
    const roster = { handle: hand.desk.giveHandle(path), reading, columns };
    const seen = await made(roster, false);
    expect(seen).toMatchObject({ people: { rows: 2, unchanged: 1, changed: 0, unplaced: 1 }, written: null });
    expect(await readdir(projects()).catch(() => [])).toEqual([]);
    const written = await made(roster, true);
    expect(written.people).toEqual(seen.people);
    expect(written.written?.folder).toBe(projects('Ostrey Vale – erratum of edition 1.0, people'));
    expect((await made(null, true)).written?.files.map(({ file }) => file)).toEqual(['erratum.txt', 'erratum.csv']);
    expect((await made(null, true)).people).toBeNull();
    const folders = ['Ostrey Vale – erratum of edition 1.0', 'Ostrey Vale – erratum of edition 1.0, people'];
    expect((await readdir(projects())).sort()).toEqual(folders);
    expect(Object.keys(await contents(folders[1] ?? ''))).toEqual(['erratum-people.csv', 'erratum.csv', 'erratum.txt']);
  });

  it('that cannot be made ends with a sentence and leaves no folder', async () => {
    const bare = { ...project, tally: null };
    const { job } = await hand.ask('make-erratum', { before: bare, after, roster: null, cut: '', write: true });
    expect(await hand.endOf(job)).toMatchObject({ state: 'failed' });
    expect(await readdir(projects())).toEqual([]);
  });
});

describe('an edition file', () => {
  it('opens as a new project that goes on from it, into which nothing is saved', async () => {
    const [first] = await done('release', project);
    const path = projects(first, EDITION);
    const text = await readFile(path, 'utf8');
    const read = editionFromText(text);
    if (!read.ok) throw new Error(read.problem);
    const handle = hand.desk.giveHandle(path);
    const opened = await hand.ask('open-project', { handle });
    expect(opened).toMatchObject({ handle: null, file: null, project: nextEdition(read.edition) });
    expect(opened.project.release).toMatchObject({ edition: '1.1', analyst: '', checker: '' });
    expect(opened.earlier).toEqual({
      file: EDITION,
      project,
      released: { check: '0000-0000', analyst: 'A. Weir', checker: 'J. Lund' },
    });
    expect((await hand.ask('list-projects', {})).recent).toEqual([]);
    const ask = { draft: opened.draft, name: 'Next', project: opened.project };
    expect((await hand.ask('save-project', { ...ask, handle }))?.file).toBe('Next.normloom');
    expect(await readFile(path, 'utf8')).toBe(text);
  });

  it('is looked at for a comparison, as a project is', async () => {
    const [first] = await done('release', project);
    await writeFile(projects('other.normloom'), projectToText(withNotes('Other.')));
    const look = (...parts: string[]) =>
      hand.ask('look-at-edition', { handle: hand.desk.giveHandle(projects(...parts)) });
    expect(await look(first, EDITION)).toMatchObject({ file: EDITION, project, released: { check: '0000-0000' } });
    expect(await look('other.normloom')).toEqual({
      file: 'other.normloom',
      project: withNotes('Other.'),
      released: null,
    });
    await writeFile(
      projects('torn.normedition'),
      (await readFile(projects(first, EDITION), 'utf8')).replace('2026', '2027'),
    );
    const handle = hand.desk.giveHandle(projects('torn.normedition'));
    expect(await hand.problem('look-at-edition', { handle })).toMatch(/its seal does not fit/);
    expect(await hand.problem('open-project', { handle })).toMatch(/its seal does not fit/);
  });

  it('is a project to the host that was opened with it', async () => {
    const [first] = await done('release', project);
    const about = await hand.again({ openedWith: projects(first, EDITION) }).ask('about', {});
    expect(about.openedWith?.kind).toBe('project');
  });
});
